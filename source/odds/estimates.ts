/** From draws in independent sets to a value with its standard error. */
import type {Estimate, Spread} from './results.ts';

/** Independently scrambled sets: enough to tell a standard error from, few enough that each is long. */
export const replicates = 8;

/** The set that a draw belongs to, and its number there: the sets take turns. */
export const replicateOf = (draw: number): number => draw % replicates;
export const indexOf = (draw: number): number => Math.floor(draw / replicates);

/**
 * Mean over the draws, with the standard error from the means of the sets, each of which is a draw of its own: the spread of
 * k independent means ÷ √k. Within a set the points are spread evenly, so it is smaller than that of as many random draws.
 */
export function meanOf(count: number, valueAt: (draw: number) => number): Estimate {
	const sums = new Float64Array(replicates);
	const counts = new Float64Array(replicates);
	for (let draw = 0; draw < count; draw++) {
		sums[draw % replicates]! += valueAt(draw);
		counts[draw % replicates]! += 1;
	}
	const means = [...sums].flatMap((sum, i) => (counts[i]! > 0 ? [sum / counts[i]!] : []));
	if (means.length === 0) return {value: Number.NaN, error: Number.NaN};
	const value = sums.reduce((total, sum) => total + sum, 0) / count;
	if (means.length < 2) return {value, error: Number.NaN};
	const squares = means.reduce((total, mean) => total + (mean - value) ** 2, 0);
	return {value, error: Math.sqrt(squares / (means.length - 1) / means.length)};
}

/** As `meanOf`, of something that happens or not: never surer than half a draw. */
export function chanceOf(count: number, partAt: (draw: number) => number): Estimate {
	const {value, error} = meanOf(count, partAt);
	return {value, error: Math.max(Number.isNaN(error) ? 1 / 2 : error, 1 / (2 * count))};
}

/** Mean and standard deviation of what is known; null where fewer than two values are. */
export function spreadOf(values: ArrayLike<number>, count: number): Spread | null {
	let known = 0;
	let sum = 0;
	for (let i = 0; i < count; i++) {
		if (Number.isNaN(values[i]!)) continue;
		known++;
		sum += values[i]!;
	}
	if (known < 2) return null;
	const mean = sum / known;
	let squares = 0;
	for (let i = 0; i < count; i++) if (!Number.isNaN(values[i]!)) squares += (values[i]! - mean) ** 2;
	return {mean, sd: Math.sqrt(squares / (known - 1))};
}
