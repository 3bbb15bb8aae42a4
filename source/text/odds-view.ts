/** The odds as a person reads them: one line a row, what is decided, what matters most, and what one tooth is worth. */
import type {BreakEven, Neighbor, OneTooth, ToothRow} from '../odds/one-tooth.ts';
import type {Matters, Odds, OddsRow} from '../odds/results.ts';
import type {Setting} from '../planning/results.ts';
import {type Block, type Cell, cell, gap, type Making, tableOf, text} from './blocks.ts';
import {chanceText, decisionSentences, inputLines, mattersSentences, percent} from './chances-view.ts';
import {caution, type Heading, headingView} from './heading-view.ts';
import {absent, fixed, rpmDown, rpmUp, signed, type UnitSystem, type Units} from './units.ts';

export type OddsAnswer = {
	heading: Heading;
	setting: Setting;
	odds: Odds;
	matters: Matters | undefined;
	tooth: OneTooth | undefined;
	/** How many rows to show from the first; the installed one is shown besides. */
	top: number;
};

type Placed = {place: number; row: OddsRow; risk: number | null};

/** Without a risk of one's own, from here on a row is shown as failing. */
const likely = 0.5;

const overCell = ({row, risk}: Placed): Cell => {
	if (row.over === null) return cell(absent, 'muted');
	const tone = row.over.value > (risk ?? likely) ? 'fail' : row.over.value > 0 ? 'near' : 'pass';
	return cell(chanceText(row.over), tone);
};

export const oddsColumns: readonly Making<Placed>[] = [
	{head: '#', align: 'right', keep: 0, cell: ({place}) => cell(String(place), 'muted')},
	{head: 'pair', align: 'left', keep: 0, cell: ({row}) => cell(row.pair + (row.installed ? '*' : ''), 'strong')},
	{head: 'set', align: 'left', keep: 0, shortest: 4, cell: ({row}) => cell(row.gearbox)},
	{head: 'over limit', align: 'right', keep: 0, cell: overCell},
	{
		head: 'fastest',
		align: 'right',
		keep: 0,
		cell: ({row}) => cell(chanceText(row.first)),
	},
	{head: 'loss s', align: 'right', keep: 1, cell: ({row}) => cell(row.lossS === null ? absent : fixed(row.lossS, 3))},
	{
		head: 'mean s',
		align: 'right',
		keep: 2,
		cell: ({row}) => cell(row.timeS === null ? absent : fixed(row.timeS.mean, 3)),
	},
	{head: '± s', align: 'right', keep: 4, cell: ({row}) => cell(row.timeS === null ? absent : fixed(row.timeS.sd, 3))},
	{
		head: 'top rpm',
		align: 'right',
		keep: 3,
		cell: ({row: {highestRpm}}) =>
			cell(highestRpm === null ? absent : `${fixed(highestRpm.mean, 0)} ± ${fixed(highestRpm.sd, 0)}`),
	},
	{
		head: 'draws',
		align: 'right',
		keep: 5,
		cell: ({row}) => cell(row.barred === null ? String(row.draws) : absent, 'muted'),
	},
];

const legend =
	'over limit: chance of passing the RPM limit anywhere, in any situation; fastest: chance of being that among the allowed; loss: how much slower where it is not';

/** The rows as a table, from the first; used by the screen too. */
export const oddsTable = (odds: Odds, shown: readonly OddsRow[]): Block =>
	tableOf(
		oddsColumns,
		shown.map(row => ({place: odds.rows.indexOf(row) + 1, row, risk: odds.risk})),
	);

export const oddsView = (answer: OddsAnswer, units: Units, system: UnitSystem): Block[] => {
	const {heading, setting, odds, matters, tooth, top} = answer;
	const open = odds.rows.filter(({barred}) => barred === null);
	const shown = odds.rows.filter((row, i) => (i < top && row.barred === null) || row.installed);
	const barred = odds.rows.length - open.length;
	const within = odds.risk === null ? '' : ` within a risk of ${percent(odds.risk)}`;
	const what = `odds of ${open.length} choices${within}`;
	return [
		...headingView(heading, what, setting, units),
		text(
			`${odds.draws} draws, the same for every row; seed ${odds.seed}; ± is one standard error of a chance`,
			'muted',
			2,
		),
		gap,
		oddsTable(odds, shown),
		text(legend, 'muted', 2),
		...(barred > 0 ? [text(`${barred} more cannot be mounted (rules, housing, stock or miles).`, 'muted')] : []),
		gap,
		...decisionSentences(odds).map(sentence => text(sentence, 'plain', 2)),
		...(matters === undefined ? [] : [gap, ...mattersSentences(matters).map(sentence => text(sentence, 'plain', 2))]),
		...(tooth === undefined ? [] : [gap, ...toothView(tooth, odds.rpmLimit, units)]),
		gap,
		text('How well each number is taken to be known, one standard deviation:', 'muted'),
		...inputLines(odds.inputs, system).map(line => text(`- ${line}.`, 'muted', 2)),
		...(odds.notDrawn.length > 0 ? [text(`- Stated, but not drawn: ${odds.notDrawn.join(', ')}.`, 'near', 2)] : []),
		gap,
		text(caution, 'muted'),
	];
};

type Line = {name: string; rows: (ToothRow | undefined)[]; told: (row: ToothRow) => string};

/** The pair between its neighbors, then what would change the choice. */
export const toothView = ({of, neighbors}: OneTooth, limitRpm: number, units: Units): Block[] => {
	const taller = neighbors.find(({direction}) => direction === 'taller');
	const shorter = neighbors.find(({direction}) => direction === 'shorter');
	const rows = [taller, of, shorter];
	const lines: Line[] = [
		{name: '', rows: [taller, undefined, shorter], told: row => (row === taller ? 'taller' : 'shorter')},
		{name: 'time s', rows, told: ({timeS}) => (timeS === null ? absent : fixed(timeS, 3))},
		{name: 'highest rpm', rows, told: ({highestRpm}) => rpmUp(highestRpm)},
		{name: 'below the limit', rows, told: ({marginRpm}) => rpmDown(marginRpm)},
		...of.ends.map(({straight}, i) => ({
			name: `${straight} end`,
			rows,
			told: ({ends}: ToothRow) => `${fixed(ends[i]!.rpm, 0)}, ${rpmUp(ends[i]!.mostRpm)}`,
		})),
	];
	const column = (head: string, at: number): Making<Line> => ({
		head,
		align: 'right',
		keep: 0,
		cell: line => cell(line.rows[at] === undefined ? (line.name === '' ? '' : absent) : line.told(line.rows[at])),
	});
	const name = (row: ToothRow | undefined, kind: string) => row?.row ?? `no ${kind}`;
	return [
		text(
			`One tooth: ${of.row} beside the next on the rack with the same set; at the ends RPM as the track stands, and the most over the situations`,
			'strong',
			2,
		),
		tableOf(
			[
				{head: '', align: 'left', keep: 0, cell: line => cell(line.name, 'muted')},
				column(name(taller, 'taller'), 0),
				column(of.row, 1),
				column(name(shorter, 'shorter'), 2),
			],
			lines,
		),
		...neighbors
			.flatMap(neighbor => breakEvenSentences(of, neighbor, limitRpm, units))
			.map(one => text(one, 'plain', 2)),
	];
};

function breakEvenSentences(of: ToothRow, neighbor: Neighbor, limitRpm: number, units: Units): string[] {
	const shorter = neighbor.direction === 'shorter' ? neighbor : of;
	const same = changesText(neighbor.sameTime, units);
	const limit = changesText(neighbor.atLimit, units);
	return [
		same === undefined
			? `${neighbor.row} (${neighbor.direction}): no exit speed or tow in reach makes it as fast as ${of.row}${leadText(of, neighbor)}.`
			: `${neighbor.row} (${neighbor.direction}) is as fast as ${of.row}${leadText(of, neighbor)} with ${same}.`,
		limit === undefined
			? `${shorter.row}: no exit speed or tow in reach brings it to ${limitRpm} rpm.`
			: `${shorter.row} is just at ${limitRpm} rpm with ${limit}.`,
	];
}

function leadText(of: ToothRow, neighbor: ToothRow): string {
	if (of.timeS === null || neighbor.timeS === null) return '';
	return ` (now ${signed(neighbor.timeS - of.timeS, 3)} s)`;
}

/** "exits +1.9 mph, or 10.0 points less drag in the tow" */
function changesText({exitMps, towShare}: BreakEven, units: Units): string | undefined {
	const exits =
		exitMps === null ? [] : [`every exit ${exitMps < 0 ? '-' : '+'}${units.text('speed', Math.abs(exitMps))}`];
	const tows =
		towShare === null
			? []
			: [`${fixed(100 * Math.abs(towShare), 1)} points ${towShare < 0 ? 'less' : 'more'} drag in the tow`];
	const changes = [...exits, ...tows];
	return changes.length === 0 ? undefined : changes.join(', or with ');
}
