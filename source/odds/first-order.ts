/** How much of the variance of an outcome comes from each input alone. */
import {coordinate} from './draws/sobol.ts';
import {indexOf, replicateOf, replicates} from './estimates.ts';
import type {Estimate} from './results.ts';

/** What a point of the unit cube gives; NaN where an outcome does not exist there. */
export type Outcomes = (point: readonly number[]) => readonly number[];

/**
 * First-order shares S_i = Var(E(Y | x_i)) / Var(Y) of each outcome (outer) and each of `dimensions` independent inputs
 * (inner), with standard errors from the independent sets of points. With points A and B, and A_i the point A with the i-th
 * coordinate of B: V_i = mean(Y(B)·(Y(A_i) − Y(A))), eq. (b) of table 2 in A. Saltelli, P. Annoni, I. Azzini, F. Campolongo,
 * M. Ratto and S. Tarantola, Comput. Phys. Commun. 181 (2010), 259-270; Y is counted from its mean, which leaves the
 * expectation and takes most of the scatter. An input that does little scatters little. Takes `points`·(2 + dimensions)
 * outcomes and yields after each. 0 where nothing varies.
 */
export function* firstOrderSteps(
	dimensions: number,
	outcomesAt: Outcomes,
	points: number,
	seed: number,
): Generator<void, Estimate[][], void> {
	const pairs: Pair[] = [];
	for (let draw = 0; draw < points; draw++) {
		const at = (dimension: number) => coordinate(indexOf(draw), dimension, replicateOf(draw), seed);
		const a = Array.from({length: dimensions}, (_, i) => at(i));
		const b = Array.from({length: dimensions}, (_, i) => at(dimensions + i));
		const [one, other] = [outcomesAt(a), outcomesAt(b)];
		yield;
		const mixed: (readonly number[])[] = [];
		for (let i = 0; i < dimensions; i++) {
			mixed.push(outcomesAt(a.map((value, k) => (k === i ? b[i]! : value))));
			yield;
		}
		pairs.push({replicate: replicateOf(draw), a: one, b: other, mixed});
	}
	const outcomes = pairs[0]?.a.length ?? 0;
	return Array.from({length: outcomes}, (_, k) => sharesOf(dimensions, pairs, k));
}

type Pair = {
	readonly replicate: number;
	readonly a: readonly number[];
	readonly b: readonly number[];
	readonly mixed: readonly (readonly number[])[];
};

function sharesOf(dimensions: number, pairs: readonly Pair[], outcome: number): Estimate[] {
	const known = pairs.filter(({a, b, mixed}) => [a, b, ...mixed].every(values => Number.isFinite(values[outcome])));
	const values = known.flatMap(({a, b}) => [a[outcome]!, b[outcome]!]);
	const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
	const variance = values.reduce((sum, value) => sum + (value - mean) ** 2, 0) / values.length;
	return Array.from({length: dimensions}, (_, i) => {
		if (!(variance > 0)) return {value: 0, error: 0};
		const parts = known.map(({replicate, a, b, mixed}) => ({
			replicate,
			part: ((b[outcome]! - mean) * (mixed[i]![outcome]! - a[outcome]!)) / variance,
		}));
		return meanOfSets(parts);
	});
}

/** The mean, with the standard error from the means of the sets. */
function meanOfSets(parts: readonly {readonly replicate: number; readonly part: number}[]): Estimate {
	const value = parts.reduce((sum, {part}) => sum + part, 0) / parts.length;
	const means = Array.from({length: replicates}, (_, set) => parts.filter(({replicate}) => replicate === set))
		.filter(set => set.length > 0)
		.map(set => set.reduce((sum, {part}) => sum + part, 0) / set.length);
	const squares = means.reduce((sum, mean) => sum + (mean - value) ** 2, 0);
	return {value, error: Math.sqrt(squares / Math.max(1, means.length - 1) / means.length)};
}
