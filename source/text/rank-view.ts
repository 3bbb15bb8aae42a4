/** The ranking as a person reads it: one line a row, the reasons, the remarks. */
import {checkNames} from '../planning/check-names.ts';
import {rowName} from '../planning/rank-rack.ts';
import type {Check, Ranking, Row} from '../planning/results.ts';
import {type Block, cell, gap, type Making, tableOf, text} from './blocks.ts';
import {closingView, type Heading, headingView, verdictCell} from './heading-view.ts';
import {absent, fixed, rpm, rpmDown, rpmUp, seconds, signed, type Units} from './units.ts';

export type RankAnswer = {
	heading: Heading;
	ranking: Ranking;
	/** How many rows to show from the first; the installed one is shown besides. */
	top: number;
	/** The one situation asked for. */
	situation?: string | undefined;
	/** The chance of passing the limit, by the name of the row; only where a risk was asked for. */
	chances?: ReadonlyMap<string, string> | undefined;
};

type Placed = {place: number; row: Row; bandLowRpm: number; chance: string | undefined};

const checkOf = (row: Row, name: Check['check']): Check | undefined => row.checks.find(check => check.check === name);

const limitPlace = (row: Row): string => {
	const limit = checkOf(row, 'limit');
	return [limit?.at, limit?.situation].filter(Boolean).join(', ');
};

/** The lowest RPM at which the throttle is picked up, over the situations; null where there is none. */
const lowestExitRpm = (row: Row): number | null => {
	const exits = row.situations.flatMap(situation => situation.straights.map(straight => straight.exitRpm));
	return exits.length > 0 ? Math.min(...exits) : null;
};

/** Shifts in one lap of the first situation. */
const shiftsPerLap = (row: Row): string => {
	const [base] = row.situations;
	return base ? String(base.straights.reduce((sum, straight) => sum + straight.shifts.length, 0)) : absent;
};

const overBand = ({row, bandLowRpm}: Placed): string => {
	const lowest = lowestExitRpm(row);
	return signed(lowest === null ? null : lowest - bandLowRpm, 0);
};

/** The checks that the verdict comes from; nothing beside a pass. */
const verdictCauses = ({verdict, checks}: Row): string => {
	const causes = checks.filter(check => verdict !== 'pass' && check.verdict === verdict);
	return causes.map(({check}) => checkNames[check]).join(', ');
};

const columns: readonly Making<Placed>[] = [
	{head: '#', align: 'right', keep: 0, cell: ({place}) => cell(String(place), 'muted')},
	{head: 'pair', align: 'left', keep: 0, cell: ({row}) => cell(row.pair + (row.installed ? '*' : ''), 'strong')},
	{head: 'ratio', align: 'right', keep: 10, cell: ({row}) => cell(fixed(row.pairRatio, 4))},
	{head: 'set', align: 'left', keep: 0, shortest: 4, cell: ({row}) => cell(row.gearbox)},
	{head: 'time s', align: 'right', keep: 1, cell: ({row}) => cell(seconds(row.fastestS))},
	{head: 'gain s', align: 'right', keep: 5, cell: ({row}) => cell(signed(row.gainS, 3))},
	{head: 'top rpm', align: 'right', keep: 2, cell: ({row}) => cell(rpmUp(checkOf(row, 'limit')?.value ?? null))},
	{head: 'where', align: 'left', keep: 7, shortest: 12, cell: ({row}) => cell(limitPlace(row), 'muted')},
	{head: 'margin', align: 'right', keep: 3, cell: ({row}) => cell(rpmDown(checkOf(row, 'limit')?.margin ?? null))},
	{head: 'exit rpm', align: 'right', keep: 4, cell: ({row}) => cell(rpm(lowestExitRpm(row)))},
	{head: 'band', align: 'right', keep: 6, cell: placed => cell(overBand(placed))},
	{head: 'shifts', align: 'right', keep: 9, cell: ({row}) => cell(shiftsPerLap(row))},
	{head: 'verdict', align: 'left', keep: 0, cell: ({row}) => verdictCell(row.verdict)},
];

const causesColumn: Making<Placed> = {
	head: 'because of',
	align: 'left',
	keep: 8,
	shortest: 14,
	cell: ({row}) => cell(verdictCauses(row), 'muted'),
};

const chanceColumn: Making<Placed> = {
	head: 'over limit',
	align: 'right',
	keep: 0,
	cell: ({chance}) => cell(chance ?? absent),
};

/** The causes have a column where there is one to tell. */
const columnsFor = (shown: readonly Placed[]): readonly Making<Placed>[] => {
	const told = shown.some(({row}) => verdictCauses(row) !== '') ? [...columns, causesColumn] : columns;
	return shown.some(({chance}) => chance !== undefined) ? [...told.slice(0, 4), chanceColumn, ...told.slice(4)] : told;
};

/** The first rows, and the installed one wherever it stands. */
const shownRows = ({ranking, top, chances}: RankAnswer): Placed[] =>
	ranking.rows
		.map((row, index) => ({
			place: index + 1,
			row,
			bandLowRpm: ranking.setting.bandLowRpm,
			chance: chances?.get(rowName(row)),
		}))
		.filter(({place, row}) => place <= top || row.installed);

const reasonsView = (shown: readonly Placed[]): Block[] => {
	const widest = Math.max(...shown.map(({place}) => String(place).length));
	return shown.map(({place, row}) => {
		const start = `${String(place).padStart(widest)}  ${row.pair} ${row.gearbox}  `;
		return text(start + row.reason, 'plain', widest + 2);
	});
};

const legend = (shown: readonly Placed[]): string =>
	[
		...(shown.some(({row}) => row.installed) ? ['* in the car'] : []),
		'time s: in the fastest gears',
		'margin: below the limit',
		'exit rpm: the lowest',
		'band: that above its low end',
	].join('; ');

const moreView = ({ranking}: RankAnswer, shown: readonly Placed[]): Block[] => {
	const more = ranking.rows.length - shown.length;
	return more > 0 ? [text(`${more} more; --top ${ranking.rows.length} shows all.`, 'muted')] : [];
};

export const rankView = (answer: RankAnswer, units: Units): Block[] => {
	const {heading, ranking, situation} = answer;
	const shown = shownRows(answer);
	const only = situation === undefined ? '' : `, in "${situation}" alone`;
	const what = `${ranking.rows.length} choices ranked${only}`;
	return [
		...headingView(heading, what, ranking.setting, units),
		gap,
		tableOf(columnsFor(shown), shown),
		text(legend(shown), 'muted', 2),
		...moreView(answer, shown),
		gap,
		...reasonsView(shown),
		gap,
		...closingView([...ranking.remarks, ...(ranking.rows[0]?.remarks ?? [])]),
	];
};
