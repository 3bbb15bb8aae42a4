/** One pair and set on every straight: gears, shifts, top speed, time; then all checks. */
import type {Row, Shift, SingleRun, SituationResult, StraightResult} from '../planning/results.ts';
import {type Block, cell, gap, type Making, tableOf, text} from './blocks.ts';
import {checkView} from './check-view.ts';
import {closingView, type Heading, headingView} from './heading-view.ts';
import {choiceWords} from './rpm-view.ts';
import {fixed, rpm, rpmDown, rpmUp, seconds, signed, type Units} from './units.ts';

const gears = ({exitGear, shifts}: StraightResult): string =>
	[exitGear, ...shifts.map(shift => shift.from + 1)].join('-');

const straightColumns = (straights: readonly StraightResult[], units: Units): Making<StraightResult>[] => {
	const speed = (head: string) => `${head} ${units.label('speed')}`;
	const held = straights.some(straight => straight.limiterM > 0);
	const reaches = straights.some(straight => (straight.reachRpm ?? 0) > straight.endRpm);
	const minimum = straights.some(straight => straight.minimumRpm !== null);
	const brakes = straights.some(straight => straight.finalSpeedMps !== straight.endSpeedMps);
	const some = <T>(wanted: boolean, making: Making<T>): Making<T>[] => (wanted ? [making] : []);
	return [
		{head: 'straight', align: 'left', keep: 0, shortest: 8, cell: each => cell(each.name)},
		{head: 'gears', align: 'left', keep: 0, cell: each => cell(gears(each), 'strong')},
		...some<StraightResult>(minimum, {
			head: 'min rpm',
			align: 'right',
			keep: 8,
			cell: each => cell(rpm(each.minimumRpm)),
		}),
		{head: speed('exit'), align: 'right', keep: 5, cell: each => cell(units.number('speed', each.exitSpeedMps))},
		{head: 'exit rpm', align: 'right', keep: 3, cell: each => cell(rpm(each.exitRpm))},
		{head: speed('top'), align: 'right', keep: 2, cell: each => cell(units.number('speed', each.endSpeedMps))},
		{head: 'top rpm', align: 'right', keep: 1, cell: each => cell(rpmUp(each.endRpm))},
		...some<StraightResult>(reaches, {
			head: 'reach rpm',
			align: 'right',
			keep: 7,
			cell: each => cell(rpmUp(each.reachRpm)),
		}),
		...some<StraightResult>(held, {
			head: `limiter ${units.label('distance')}`,
			align: 'right',
			keep: 6,
			cell: each => cell(units.number('distance', each.limiterM)),
		}),
		...some<StraightResult>(brakes, {
			head: speed('end'),
			align: 'right',
			keep: 10,
			cell: each => cell(units.number('speed', each.finalSpeedMps)),
		}),
		{head: 'time s', align: 'right', keep: 1, cell: each => cell(seconds(each.timeS))},
		{head: 'fastest s', align: 'right', keep: 9, cell: each => cell(seconds(each.fastestS), 'muted')},
	];
};

type ShiftOn = Shift & {straight: string};

/** Shift and light RPM are rounded down: they are driven by. */
const shiftColumns = (units: Units): Making<ShiftOn>[] => [
	{head: 'shift on', align: 'left', keep: 0, shortest: 8, cell: each => cell(each.straight)},
	{head: 'gears', align: 'left', keep: 0, cell: each => cell(`${each.from}-${each.from + 1}`, 'strong')},
	{head: 'at rpm', align: 'right', keep: 0, cell: each => cell(rpmDown(each.rpm))},
	{head: 'light rpm', align: 'right', keep: 1, cell: each => cell(rpmDown(each.lightRpm))},
	{head: 'after rpm', align: 'right', keep: 2, cell: each => cell(rpm(each.rpmAfter))},
	{head: units.label('speed'), align: 'right', keep: 3, cell: each => cell(units.number('speed', each.speedMps))},
	{
		head: `at ${units.label('distance')}`,
		align: 'right',
		keep: 4,
		cell: each => cell(units.number('distance', each.distanceM)),
	},
	{head: 'after s', align: 'right', keep: 5, cell: each => cell(seconds(each.timeS))},
	{head: 'left s', align: 'right', keep: 6, cell: each => cell(seconds(each.leftS))},
];

const straightsOf = ({straights, restart}: SituationResult): StraightResult[] => [
	...straights,
	...(restart ? [restart] : []),
];

/** One situation: the straights, the restart as the last line, and the shifts. */
export const situationView = (situation: SituationResult, units: Units): Block[] => {
	const straights = straightsOf(situation);
	const shifts = straights.flatMap(straight => straight.shifts.map(shift => ({...shift, straight: straight.name})));
	const remarks = straights.flatMap(straight => straight.remarks.map(remark => `- ${straight.name}: ${remark}`));
	return [
		text(`${situation.name} · ${seconds(situation.timeS)} s (fastest ${seconds(situation.fastestS)} s)`, 'strong', 2),
		tableOf(straightColumns(straights, units), straights, 2),
		...(shifts.length > 0 ? [gap, tableOf(shiftColumns(units), shifts, 2)] : []),
		...remarks.map(remark => text(remark, 'plain', 2)),
		gap,
	];
};

const rowWords = (row: Row): string => {
	const gain = row.gainS === null ? [] : [`gain over the installed ${signed(row.gainS, 3)} s`];
	const times = row.timeS === null ? ['no times'] : [`${seconds(row.timeS)} s (fastest ${seconds(row.fastestS)} s)`];
	return [`verdict ${row.verdict === 'fail' ? 'FAIL' : row.verdict}`, ...times, ...gain].join(' · ');
};

const pitRoadView = ({pitRoad}: Row): Block[] => {
	if (!pitRoad) return [];
	const limit = `${rpmDown(pitRoad.rpm)} rpm at the limit`;
	const tolerance = `${rpmDown(pitRoad.toleranceRpm)} at limit and tolerance, never above`;
	return [text(`Pit road · gear ${pitRoad.gear} · ${limit} · ${tolerance}`, 'plain', 2), gap];
};

export const runView = (heading: Heading, {setting, row, remarks}: SingleRun, units: Units): Block[] => [
	...headingView(heading, `${choiceWords(row)}, pair ratio ${fixed(row.pairRatio, 4)}`, setting, units),
	text(rowWords(row), row.verdict, 2),
	text(row.reason, 'plain'),
	gap,
	...row.situations.flatMap(situation => situationView(situation, units)),
	...pitRoadView(row),
	...checkView(row.checks, units),
	gap,
	...closingView([...remarks, ...row.remarks]),
];
