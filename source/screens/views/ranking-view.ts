/** The ranking as a table: which columns there are, which of them a width has room for, and the rows that a height has. */

import {visible} from '../../documents/visible.ts';
import type {Row, Setting} from '../../planning/results.ts';
import {fitColumns} from '../../text/layout.ts';
import {absent, fixed, rpm, rpmDown, rpmUp, signed} from '../../text/units.ts';
import {displayWidth} from '../../text/width.ts';
import {listWindow} from '../parts/list-window.ts';
import type {Meaning} from '../parts/pieces.ts';
import type {TableColumn, TableRow} from '../parts/table-line.ts';
import {checkNamed, highestRpm, limitMarginRpm, lowestExitRpm, shiftsPerLap} from '../session/figures.ts';
import type {Placed} from '../session/rows.ts';
import type {Session} from '../session/session.ts';
import {marksOf} from './marks.ts';

export type RankingTable = {
	readonly columns: readonly TableColumn[];
	readonly rows: Record<string, string>[];
	/** Of the rows here. */
	readonly selected: number;
	/** The first one here of all. */
	readonly start: number;
};

type Given = {
	readonly session: Session;
	readonly setting: Setting;
	readonly shown: readonly Placed[];
	readonly cursor: number;
	readonly compared: Row | undefined;
};

type Column = {
	readonly head: string;
	readonly align: 'left' | 'right';
	/** 0 stays whatever the width; of the others the highest goes first. */
	readonly keep: number;
	/** May be cut to so many characters before others are left out. */
	readonly shortest?: number;
	readonly text: (placed: Placed, given: Given) => string;
	readonly tone?: (row: TableRow) => Meaning;
};

const difference = (mine: number | null, its: number | null | undefined, digits = 0): string =>
	signed(mine === null || its == null ? null : mine - its, digits);

const verdictTone = (row: TableRow): Meaning =>
	row.verdict === 'FAIL' ? 'fail' : row.verdict === 'near' ? 'near' : 'pass';

const columns: readonly Column[] = [
	{head: '#', align: 'right', keep: 0, text: ({place}) => String(place ?? ''), tone: () => 'muted'},
	{head: 'pair', align: 'left', keep: 0, text: ({row}) => row.pair, tone: () => 'strong'},
	{head: 'set', align: 'left', keep: 2, shortest: 3, text: ({row}) => visible(row.gearbox)},
	{head: 'ratio', align: 'right', keep: 8, text: ({row}) => fixed(row.pairRatio, 4)},
	{
		head: 'verdict',
		align: 'left',
		keep: 0,
		text: ({row}) => (row.verdict === 'fail' ? 'FAIL' : row.verdict),
		tone: verdictTone,
	},
	{head: 'highest', align: 'right', keep: 3, text: ({row}) => rpmUp(highestRpm(row))},
	{head: 'margin', align: 'right', keep: 0, text: ({row}) => rpmDown(limitMarginRpm(row))},
	{head: 'where', align: 'left', keep: 6, shortest: 9, text: ({row}) => visible(checkNamed(row, 'limit')?.at ?? '')},
	{
		head: 'situation',
		align: 'left',
		keep: 9,
		shortest: 8,
		text: ({row}) => visible(checkNamed(row, 'limit')?.situation ?? ''),
		tone: () => 'muted',
	},
	{head: 'exit', align: 'right', keep: 5, text: ({row}) => rpm(lowestExitRpm(row))},
	{
		head: 'of band',
		align: 'right',
		keep: 7,
		text: ({row}, {setting}) => difference(lowestExitRpm(row), setting.bandLowRpm),
	},
	{head: 'shifts', align: 'right', keep: 4, text: ({row}) => String(shiftsPerLap(row))},
	{head: 'lap s', align: 'right', keep: 10, text: ({row}) => (row.fastestS === null ? absent : fixed(row.fastestS, 3))},
	{head: 'gain s', align: 'right', keep: 1, text: ({row}) => signed(row.gainS, 3)},
];

/** In place of the gain against the pair in the car. */
const comparing: readonly Column[] = [
	{
		head: '± highest',
		align: 'right',
		keep: 3,
		text: ({row}, {compared}) => difference(highestRpm(row), compared && highestRpm(compared)),
	},
	{
		head: '± exit',
		align: 'right',
		keep: 4,
		text: ({row}, {compared}) => difference(lowestExitRpm(row), compared && lowestExitRpm(compared)),
	},
	// A gain is time that is not needed.
	{
		head: 'gain s',
		align: 'right',
		keep: 1,
		text: ({row}, {compared}) => difference(compared?.fastestS ?? null, row.fastestS, 3),
	},
];

const gap = 2;
const marksWidth = 4;

/** `height` counts the heading too; `previousStart` is where the window stood before. */
export function rankingTable(given: Given, width: number, height: number, previousStart: number): RankingTable {
	const {shown, cursor, session} = given;
	const {start, end, pinned} = windowAndPinned(given, height - 1, previousStart);
	const {used, texts, natural} = cellsOf(given);
	const widths = widthsFor(used, natural, width - marksWidth - gap);
	const rowAt = (index: number): Record<string, string> => ({
		' ': marksOf(shown[index]!, session, index === cursor),
		...Object.fromEntries(used.map(({head}, column) => [head, texts[index]![column]!])),
	});
	const rows = [...Array.from({length: end - start}, (_, i) => rowAt(start + i)), ...pinned.map(rowAt)];
	const kept = used.flatMap(({head, align, tone}, i) =>
		widths[i] === 0 ? [] : [{head, align, width: widths[i]!, ...(tone && {tone})}],
	);
	return {columns: [{head: ' ', align: 'left', width: marksWidth}, ...kept], rows, selected: cursor - start, start};
}

/** Where the highest RPM is stands whole if that costs only columns that are kept less; else it is cut. */
function widthsFor(used: readonly Column[], natural: readonly number[], available: number): number[] {
	const uncut = used.map(column =>
		column.head === 'where' ? {...column, shortest: Number.POSITIVE_INFINITY} : column,
	);
	const whole = fitColumns(uncut, natural, available);
	const place = used.findIndex(({head}) => head === 'where');
	return whole[place] === 0 ? fitColumns(used, natural, available) : whole;
}

type Cells = {
	readonly compared: Row | undefined;
	readonly used: readonly Column[];
	readonly texts: readonly (readonly string[])[];
	/** How wide each column is with all its texts. */
	readonly natural: readonly number[];
};

/** The texts of all rows, made once for each list of rows: moving the cursor changes none of them. */
const made = new WeakMap<readonly Placed[], Cells>();

function cellsOf(given: Given): Cells {
	const {shown, compared} = given;
	const known = made.get(shown);
	if (known !== undefined && known.compared === compared) return known;
	const used = compared === undefined ? columns : [...columns.filter(({head}) => head !== 'gain s'), ...comparing];
	const texts = shown.map(placed => used.map(column => column.text(placed, given)));
	const natural = used.map(({head}, i) => Math.max(displayWidth(head), ...texts.map(row => displayWidth(row[i]!))));
	const cells = {compared, used, texts, natural};
	made.set(shown, cells);
	return cells;
}

/** What is in the car and what is compared with stay in view: below the others where the window is elsewhere. */
function windowAndPinned({shown, cursor, session}: Given, height: number, previousStart: number) {
	const whole = listWindow(shown.length, cursor, height, previousStart);
	const isOutside = (index: number) => index >= 0 && (index < whole.start || index >= whole.end);
	const wanted = [shown.findIndex(({row}) => row.installed), shown.findIndex(({name}) => name === session.comparison)];
	const outside = [...new Set(wanted.filter(isOutside))].sort((a, b) => a - b);
	if (outside.length === 0) return {...whole, pinned: []};
	const window = listWindow(shown.length, cursor, height - outside.length, previousStart);
	const pinned = wanted.filter(index => index >= 0 && (index < window.start || index >= window.end));
	return {...window, pinned: [...new Set(pinned)].sort((a, b) => a - b).slice(0, outside.length)};
}
