/** How much of the variance of an outcome comes from each input alone. */
import {coordinate} from './draws/sobol.ts';
import {indexOf, replicateOf, replicates} from './estimates.ts';
import type {Estimate} from './results.ts';

/** What a point of the unit cube gives; NaN where an outcome does not exist there. */
export type Outcomes = (point: readonly number[]) => readonly number[];

/**
 * First-order shares S_i = Var(E(Y | x_i)) / Var(Y) of each outcome (outer) and each of `dimensions` independent inputs
 * (inner), with standard errors from the independent sets of points. Pick and freeze: Y at a point, and Y′ at another that
 * shares its i-th coordinate alone; S = (mean(Y·Y′) − m²) / (mean((Y² + Y′²)/2) − m²), m the mean of (Y + Y′)/2, the estimator
 * T_N of A. Janon, T. Klein, A. Lagnoux, M. Nodet and C. Prieur, ESAIM: Probability and Statistics 18 (2014), eq. 6, which
 * no other beats in the limit. Takes `points`·(1 + dimensions) outcomes and yields after each point. 0 where nothing varies.
 */
export function* firstOrderSteps(
	dimensions: number,
	outcomesAt: Outcomes,
	points: number,
	seed: number,
): Generator<void, Estimate[][], void> {
	const sums: Moments[][][] = [];
	const origins: number[] = [];
	for (let draw = 0; draw < points; draw++) {
		const replicate = replicateOf(draw);
		const at = (dimension: number) => coordinate(indexOf(draw), dimension, replicate, seed);
		const one = Array.from({length: dimensions}, (_, i) => at(i));
		const other = Array.from({length: dimensions}, (_, i) => at(dimensions + i));
		const outcomes = outcomesAt(one);
		yield;
		for (let i = 0; i < dimensions; i++) {
			const frozen = outcomesAt(other.map((value, k) => (k === i ? one[i]! : value)));
			for (const [k, value] of outcomes.entries()) {
				if (Number.isNaN(value) || Number.isNaN(frozen[k]!)) continue;
				// Counted from the first value, so that a large mean costs no digits.
				origins[k] ??= value;
				sums[k] ??= Array.from({length: dimensions}, () => Array.from({length: replicates}, newMoments));
				add(sums[k][i]![replicate]!, value - origins[k], frozen[k]! - origins[k]);
			}
			yield;
		}
	}
	return sums.map(byInput => byInput.map(shareOf));
}

type Moments = {count: number; sum: number; product: number; square: number};

const newMoments = (): Moments => ({count: 0, sum: 0, product: 0, square: 0});

function add(moments: Moments, y: number, frozen: number): void {
	moments.count++;
	moments.sum += (y + frozen) / 2;
	moments.product += y * frozen;
	moments.square += (y * y + frozen * frozen) / 2;
}

/** The standard error is the jackknife's: from the values that leave one set out each. */
function shareOf(sets: readonly Moments[]): Estimate {
	const value = ratioOf(sets);
	const without = sets.map((_, left) => ratioOf(sets.filter((_, i) => i !== left)));
	const mean = without.reduce((sum, one) => sum + one, 0) / sets.length;
	const squares = without.reduce((sum, one) => sum + (one - mean) ** 2, 0);
	return {value, error: Math.sqrt((squares * (sets.length - 1)) / sets.length)};
}

function ratioOf(sets: readonly Moments[]): number {
	let [count, sum, product, square] = [0, 0, 0, 0];
	for (const set of sets) {
		count += set.count;
		sum += set.sum;
		product += set.product;
		square += set.square;
	}
	const variance = square / count - (sum / count) ** 2;
	return variance > 0 ? (product / count - (sum / count) ** 2) / variance : 0;
}
