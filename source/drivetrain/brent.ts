/** Steps after which the best guess so far is the answer. Smooth functions take about ten, a jump about fifty. */
const cap = 200;

/**
 * A root of `f` between `low` and `high`, bracketed and never left: Brent's method (R. P. Brent, Algorithms for Minimization
 * Without Derivatives, 1973, ch. 4). Undefined where the two ends have the same sign or `f` is NaN there. The root is within
 * `tolerance` plus four units in the last place; 0 asks for all that doubles give.
 */
export function brentRoot(f: (x: number) => number, low: number, high: number, tolerance = 0): number | undefined {
	let [a, b] = [low, high];
	let [fa, fb] = [f(a), f(b)];
	if (fa === 0) return a;
	if (fb === 0) return b;
	if (!(fa < 0 === fb > 0) || Number.isNaN(fa) || Number.isNaN(fb)) return undefined;
	// b is the best guess, a the one before it, c the last with the opposite sign of b.
	let [c, fc] = [a, fa];
	let step = b - a;
	let before = step;
	for (let i = 0; i < cap; i++) {
		if (fb > 0 === fc > 0) {
			[c, fc] = [a, fa];
			step = b - a;
			before = step;
		}
		if (Math.abs(fc) < Math.abs(fb)) {
			[a, b, c] = [b, c, b];
			[fa, fb, fc] = [fb, fc, fb];
		}
		const near = 2 * Number.EPSILON * Math.abs(b) + tolerance / 2;
		const half = (c - b) / 2;
		if (Math.abs(half) <= near || fb === 0) return b;
		const guess = interpolated(a, b, c, fa, fb, fc);
		const closingIn = Math.abs(before) >= near && Math.abs(fa) > Math.abs(fb);
		if (closingIn && isShort(guess, half, before, near)) {
			before = step;
			step = guess;
		} else {
			step = half;
			before = half;
		}
		[a, fa] = [b, fb];
		b += Math.abs(step) > near ? step : Math.sign(half) * near;
		fb = f(b);
	}
	return b;
}

/** The step from b to the root of the inverse quadratic through three points, or of the line through two. */
function interpolated(a: number, b: number, c: number, fa: number, fb: number, fc: number): number {
	const s = fb / fa;
	if (a === c) return ((c - b) * s) / (s - 1);
	const [q, r] = [fa / fc, fb / fc];
	const p = s * ((c - b) * q * (q - r) - (b - a) * (r - 1));
	return -p / ((q - 1) * (r - 1) * (s - 1));
}

/** Towards the other end of the bracket, by less than three quarters of it and half the step before the last. */
function isShort(guess: number, half: number, before: number, near: number): boolean {
	return guess * half > 0 && 2 * Math.abs(guess) < Math.min(3 * Math.abs(half) - near, Math.abs(before));
}
