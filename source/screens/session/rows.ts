/** The rows of the ranking that are looked at, in the order that was chosen. */
import {rowName} from '../../planning/rank-rack.ts';
import type {Row} from '../../planning/results.ts';
import {limitMarginRpm, lowestExitRpm, shiftsPerLap} from './figures.ts';

/** A row with its place in the ranking, counted from 1; undefined before there is one. */
export type Placed = {readonly place: number | undefined; readonly name: string; readonly row: Row};

export const orders = ['place', 'ratio', 'margin', 'exit rpm', 'shifts'] as const;
export type Order = (typeof orders)[number];

export type Filter = {
	readonly hideFailing: boolean;
	readonly gearbox: string | undefined;
	/** Rows with less to the limit than this are hidden. */
	readonly leastMarginRpm: number | undefined;
};
export const noFilter: Filter = {hideFailing: false, gearbox: undefined, leastMarginRpm: undefined};

export function placedRows(rows: readonly Row[]): Placed[] {
	return rows.map((row, i) => ({place: i + 1, name: rowName(row), row}));
}

export function shownRows(rows: readonly Placed[], order: Order, filter: Filter): Placed[] {
	const kept = rows.filter(({row}) => passes(row, filter));
	return order === 'place'
		? kept
		: kept.sort((a, b) => valueBy[order](b.row) - valueBy[order](a.row) || placeOf(a) - placeOf(b));
}

function passes(row: Row, {hideFailing, gearbox, leastMarginRpm}: Filter): boolean {
	if (hideFailing && row.verdict === 'fail') return false;
	if (gearbox !== undefined && row.gearbox !== gearbox) return false;
	return leastMarginRpm === undefined || (limitMarginRpm(row) ?? Number.NEGATIVE_INFINITY) >= leastMarginRpm;
}

const placeOf = ({place}: Placed): number => place ?? 0;

/** The largest comes first. */
const valueBy: Record<Exclude<Order, 'place'>, (row: Row) => number> = {
	ratio: row => row.pairRatio,
	margin: row => limitMarginRpm(row) ?? Number.NEGATIVE_INFINITY,
	'exit rpm': row => lowestExitRpm(row) ?? Number.NEGATIVE_INFINITY,
	shifts: row => -shiftsPerLap(row),
};

/** Where the cursor stands: on the row of that name, else on the first. */
export const cursorIn = (rows: readonly Placed[], name: string | undefined): number =>
	Math.max(
		0,
		rows.findIndex(row => row.name === name),
	);

/** The next shorter (`+1`) or taller (`-1`) pair on the same gearbox set, whatever is hidden; undefined at the end of the rack. */
export function stepped(rows: readonly Placed[], from: Placed, by: 1 | -1): Placed | undefined {
	const ahead = rows
		.filter(({row}) => row.gearbox === from.row.gearbox && (row.pairRatio - from.row.pairRatio) * by > 0)
		.sort((a, b) => (a.row.pairRatio - b.row.pairRatio) * by || placeOf(a) - placeOf(b));
	return ahead[0];
}
