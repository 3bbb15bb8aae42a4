/** What one step shorter or taller is: the next pair ratio that can be told apart. */
import type {Row} from '../planning/results.ts';

/**
 * The steps from a ratio among rows of one gearbox set, nearest first; fewer where the rack ends. A step is every row from the
 * next ratio that is more than `stepRatio` (a fraction of 1) beyond the step before (first beyond `fromRatio`) up to and with
 * `stepRatio` beyond that one. So steps have no pair in common, and with 0 a step is one ratio, whichever its teeth.
 */
export function stepsFrom(
	rows: readonly Row[],
	fromRatio: number,
	way: 'shorter' | 'taller',
	stepRatio: number,
	count: number,
): Row[][] {
	/** Grows along the way. */
	const along = (ratio: number) => (way === 'shorter' ? ratio : 1 / ratio);
	const ordered = rows.toSorted((one, other) => along(one.pairRatio) - along(other.pairRatio));
	const steps: Row[][] = [];
	let bound = along(fromRatio) * (1 + stepRatio);
	for (const row of ordered) {
		const place = along(row.pairRatio);
		const last = steps.at(-1);
		if (!isBeyond(place, bound)) last?.push(row);
		else if (steps.length === count) break;
		else {
			steps.push([row]);
			bound = place * (1 + stepRatio);
		}
	}
	return steps;
}

/** Ratios of the same teeth sums divide out differently in the last digit. */
const rounding = 1e-9;

const isBeyond = (one: number, bound: number): boolean => one > bound * (1 + rounding);
