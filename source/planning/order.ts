/** The order of the rows, which does not depend on the order of the rack. */
import type {Row} from './results.ts';
import type {RowRun} from './run-row.ts';

export type Judged = {readonly run: RowRun; readonly row: Row};

/**
 * Rows without a failed check first; within each the least `fastestS` (null last), then the larger margin to the limit, then
 * the gearbox's name by code point, then the teeth. Of two entries with the same teeth the one with more sets, then fewer miles.
 */
export function compareRows(one: Judged, other: Judged): number {
	const [a, b] = [one.run.candidate, other.run.candidate];
	return (
		Number(one.row.verdict === 'fail') - Number(other.row.verdict === 'fail') ||
		ascending(one.row.fastestS ?? Number.POSITIVE_INFINITY, other.row.fastestS ?? Number.POSITIVE_INFINITY) ||
		ascending(limitMargin(other.row), limitMargin(one.row)) ||
		ascending(a.gearbox.name, b.gearbox.name) ||
		ascending(a.pair.driving, b.pair.driving) ||
		ascending(a.pair.driven, b.pair.driven) ||
		ascending(b.pair.sets, a.pair.sets) ||
		ascending(a.pair.milesM, b.pair.milesM)
	);
}

/** Margin to the RPM limit; minus infinity where the check has none. */
export function limitMargin(row: Row): number {
	return row.checks.find(({check}) => check === 'limit')?.margin ?? Number.NEGATIVE_INFINITY;
}

function ascending<T extends number | string>(one: T, other: T): number {
	return one < other ? -1 : one > other ? 1 : 0;
}
