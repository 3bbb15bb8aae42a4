/**
 * Monotone piecewise cubic interpolation (Fritsch & Carlson, SIAM J. Numer. Anal. 17, 1980) with the shape-preserving
 * slopes of Fritsch & Butland (1984), what most libraries call PCHIP. Never leaves [y_i, y_i+1] inside a cell.
 */
export type MonotoneCubic = {
	/** The nodes, strictly rising; length n ≥ 2. */
	readonly x: Float64Array;
	/** Four coefficients a cell, lowest power first, in powers of (x − x_i): length 4(n − 1). */
	readonly coefficients: Float64Array;
	/** Value at the last node. */
	readonly last: number;
};

/** The interpolant through (x_i, y_i). `x` strictly rising, both of length n ≥ 2, all finite. */
export function monotoneCubic(x: readonly number[], y: readonly number[]): MonotoneCubic {
	const slopes = nodeSlopes(x, y);
	const coefficients = new Float64Array(4 * (x.length - 1));
	for (let i = 0; i < x.length - 1; i++) {
		const h = x[i + 1]! - x[i]!;
		const secant = (y[i + 1]! - y[i]!) / h;
		const [left, right] = [slopes[i]!, slopes[i + 1]!];
		coefficients.set([y[i]!, left, (3 * secant - 2 * left - right) / h, (left + right - 2 * secant) / (h * h)], 4 * i);
	}
	return {x: Float64Array.from(x), coefficients, last: y[y.length - 1]!};
}

/** Value at `x`; outside the nodes the nearest end value is held. */
export function valueAt(curve: MonotoneCubic, x: number): number {
	const {x: nodes, coefficients: c} = curve;
	const last = nodes.length - 1;
	if (x <= nodes[0]!) return c[0]!;
	if (x >= nodes[last]!) return curve.last;
	const i = cellOf(nodes, x);
	const u = x - nodes[i]!;
	return c[4 * i]! + u * (c[4 * i + 1]! + u * (c[4 * i + 2]! + u * c[4 * i + 3]!));
}

/** Derivative at `x`; 0 outside the nodes. At an inner node both sides agree. */
export function slopeAt(curve: MonotoneCubic, x: number): number {
	const {x: nodes, coefficients: c} = curve;
	if (x < nodes[0]! || x > nodes[nodes.length - 1]!) return 0;
	const i = Math.min(cellOf(nodes, x), nodes.length - 2);
	const u = x - nodes[i]!;
	return c[4 * i + 1]! + u * (2 * c[4 * i + 2]! + 3 * u * c[4 * i + 3]!);
}

/** Index i of the cell with nodes[i] ≤ x < nodes[i + 1], by bisection; the ends are held. */
export function cellOf(nodes: ArrayLike<number>, x: number): number {
	let low = 0;
	let high = nodes.length - 1;
	while (high - low > 1) {
		const middle = (low + high) >> 1;
		if (nodes[middle]! <= x) low = middle;
		else high = middle;
	}
	return low;
}

function nodeSlopes(x: readonly number[], y: readonly number[]): number[] {
	const n = x.length;
	const h = Array.from({length: n - 1}, (_, i) => x[i + 1]! - x[i]!);
	const secant = h.map((step, i) => (y[i + 1]! - y[i]!) / step);
	if (n === 2) return [secant[0]!, secant[0]!];
	const inner = h.slice(1).map((_, i) => innerSlope(h[i]!, h[i + 1]!, secant[i]!, secant[i + 1]!));
	return [
		endSlope(h[0]!, h[1]!, secant[0]!, secant[1]!),
		...inner,
		endSlope(h[n - 2]!, h[n - 3]!, secant[n - 2]!, secant[n - 3]!),
	];
}

/** Weighted harmonic mean of the secants on both sides; 0 at an extremum of the data. */
function innerSlope(h0: number, h1: number, secant0: number, secant1: number): number {
	if (secant0 * secant1 <= 0) return 0;
	const [w0, w1] = [2 * h1 + h0, h1 + 2 * h0];
	return (w0 + w1) / (w0 / secant0 + w1 / secant1);
}

/** Three-point slope at an end, held to what keeps the shape. */
function endSlope(h0: number, h1: number, secant0: number, secant1: number): number {
	const slope = ((2 * h0 + h1) * secant0 - h0 * secant1) / (h0 + h1);
	if (slope * secant0 <= 0) return 0;
	if (secant0 * secant1 < 0 && Math.abs(slope) > 3 * Math.abs(secant0)) return 3 * secant0;
	return slope;
}
