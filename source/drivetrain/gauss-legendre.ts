export type Quadrature = {
	readonly nodes: Float64Array;
	readonly weights: Float64Array;
	/** Each gives, summed with the integrand's values, one of the last two Legendre coefficients: how much the rule does not see. */
	readonly lastCoefficient: Float64Array;
	readonly nextToLastCoefficient: Float64Array;
};

/** Newton doubles its digits at each step from a start that is good to two of them; more than these are never needed. */
const cap = 20;

/**
 * Gauss-Legendre nodes (rising) and weights on [−1, 1], exact for polynomials up to degree 2·order − 1. Newton's method on
 * the Legendre polynomial from the start values cos(π·(i + 3/4)/(order + 1/2)); weights 2/((1 − x²)·P′(x)²) (Abramowitz &
 * Stegun 25.4.29). `order` from 1 to a few hundred.
 */
export function gaussLegendre(order: number): Quadrature {
	const nodes = new Float64Array(order);
	const weights = new Float64Array(order);
	for (let i = 0; i < Math.ceil(order / 2); i++) {
		const x = 2 * i + 1 === order ? 0 : legendreRoot(order, Math.cos((Math.PI * (i + 0.75)) / (order + 0.5)));
		const weight = 2 / ((1 - x * x) * legendre(order, x).slope ** 2);
		nodes[i] = -x;
		nodes[order - 1 - i] = x;
		weights[i] = weight;
		weights[order - 1 - i] = weight;
	}
	return {
		nodes,
		weights,
		lastCoefficient: coefficientWeights(nodes, weights, order - 1),
		nextToLastCoefficient: coefficientWeights(nodes, weights, Math.max(0, order - 2)),
	};
}

/** The discrete Legendre coefficient of degree k: (k + 1/2)·Σ w_i·P_k(x_i)·f_i. */
function coefficientWeights(nodes: Float64Array, weights: Float64Array, degree: number): Float64Array {
	return nodes.map((node, i) => (degree + 0.5) * weights[i]! * legendre(degree, node).value);
}

function legendreRoot(order: number, start: number): number {
	let x = start;
	for (let i = 0; i < cap; i++) {
		const {value, slope} = legendre(order, x);
		const step = value / slope;
		x -= step;
		if (Math.abs(step) <= Number.EPSILON) break;
	}
	return x;
}

/** P_n and its derivative at |x| < 1, by Bonnet's recursion. */
function legendre(order: number, x: number): {value: number; slope: number} {
	let [before, value] = [0, 1];
	for (let k = 1; k <= order; k++) [before, value] = [value, ((2 * k - 1) * x * value - (k - 1) * before) / k];
	return {value, slope: (order * (before - x * value)) / (1 - x * x)};
}
