/** The normal distribution's quantile, from additions, multiplications, divisions and square roots alone: the same on every machine. */

/**
 * Coefficients of M. J. Wichura, "Algorithm AS 241: the percentage points of the normal distribution", Appl. Stat. 37 (1988), PPND16, to
 * the digits that a double holds.
 */
const central = {
	a: [
		3.3871328727963665, 133.14166789178438, 1971.5909503065513, 13731.69376550946, 45921.95393154987, 67265.7709270087,
		33430.57558358813, 2509.0809287301227,
	],
	b: [
		1, 42.31333070160091, 687.1870074920579, 5394.196021424751, 21213.794301586597, 39307.89580009271,
		28729.085735721943, 5226.495278852854,
	],
} as const;
const middle = {
	a: [
		1.4234371107496835, 4.630337846156546, 5.769497221460691, 3.6478483247632045, 1.2704582524523684,
		0.2417807251774506, 0.022723844989269184, 0.0007745450142783414,
	],
	b: [
		1, 2.053191626637759, 1.6763848301838038, 0.6897673349851, 0.14810397642748008, 0.015198666563616457,
		0.0005475938084995345, 1.0507500716444169e-9,
	],
} as const;
const far = {
	a: [
		6.657904643501103, 5.463784911164114, 1.7848265399172913, 0.29656057182850487, 0.026532189526576124,
		0.0012426609473880784, 2.7115555687434876e-5, 2.0103343992922881e-7,
	],
	b: [
		1, 0.599832206555888, 0.1369298809227358, 0.014875361290850615, 0.0007868691311456133, 1.8463183175100548e-5,
		1.421511758316446e-7, 2.0442631033899397e-15,
	],
} as const;

const centralHalfWidth = 0.425;
const middleEnd = 5;

/** The value below which a standard normal number falls with probability p, 0 < p < 1; relative error about 1e-16. */
export function normalQuantile(p: number): number {
	const q = p - 0.5;
	if (Math.abs(q) <= centralHalfWidth) return q * ratio(central, centralHalfWidth * centralHalfWidth - q * q);
	const r = Math.sqrt(-logarithm(q < 0 ? p : 1 - p));
	const value = r <= middleEnd ? ratio(middle, r - 1.6) : ratio(far, r - middleEnd);
	return q < 0 ? -value : value;
}

function ratio({a, b}: {readonly a: readonly number[]; readonly b: readonly number[]}, x: number): number {
	return polynomial(a, x) / polynomial(b, x);
}

const polynomial = (coefficients: readonly number[], x: number) =>
	coefficients.reduceRight((sum, coefficient) => sum * x + coefficient, 0);

const ln2 = Math.LN2;
/** ln m = 2·artanh((m − 1)/(m + 1)); for m from 1/√2 to √2 this many terms reach the last digit. */
const terms = 12;

/** ln x for 0 < x ≤ 1, by halving and a series: `Math.log` may differ in the last bit from one engine to another. */
function logarithm(x: number): number {
	let [m, halvings] = [x, 0];
	for (; m < Math.SQRT1_2; m *= 2) halvings++;
	const z = (m - 1) / (m + 1);
	let sum = 0;
	for (let i = terms; i >= 0; i--) sum = sum * z * z + 1 / (2 * i + 1);
	return 2 * z * sum - halvings * ln2;
}
