/** RPM at every point in every gear. */
import type {RpmPoint, RpmTable} from '../planning/results.ts';
import {type Block, cell, gap, type Making, tableOf, text} from './blocks.ts';
import {closingView, type Heading, headingView} from './heading-view.ts';
import {absent, fixed, rpm, rpmDown, rpmUp, type Units} from './units.ts';

/** Marks stand behind the number, in color and without. */
const inUse = '*';
const above = '!';

export const isAboveLimit = (point: RpmPoint, gear: number, rpmLimit: number): boolean =>
	(point.rpm[gear - 1] ?? 0) > rpmLimit;

/** Driven by, and watched: never above what was computed, as on the cards. */
const isPitRoad = ({at}: RpmPoint): boolean => at.startsWith('pit road');

/** The longest name would leave the situations no room in 80 columns. */
const placeOf = ({at}: RpmPoint): string => (at === 'pit road + tolerance' ? 'pit + tolerance' : at);

const gearCell = (point: RpmPoint, gear: number, rpmLimit: number) => {
	const value = point.rpm[gear - 1] ?? null;
	const used = point.gear === gear;
	if (value === null) return cell(`${absent} `);
	if (isAboveLimit(point, gear, rpmLimit))
		return cell(rpmUp(value) + above + (used ? inUse : ' '), used ? 'fail' : 'muted');
	const shown = isPitRoad(point) ? rpmDown(value) : rpm(value);
	return cell(`${shown}${used ? inUse : ' '} `, used ? 'strong' : 'plain');
};

const columnsFor = ({overall, setting}: RpmTable, units: Units): Making<RpmPoint>[] => {
	const gears = overall.map((_, index) => index + 1);
	return [
		{head: 'at', align: 'left', keep: 0, shortest: 12, cell: point => cell(placeOf(point))},
		{head: 'situation', align: 'left', keep: 9, shortest: 6, cell: point => cell(point.situation, 'muted')},
		{head: units.label('speed'), align: 'right', keep: 1, cell: point => cell(units.number('speed', point.speedMps))},
		...gears.map(
			(gear): Making<RpmPoint> => ({
				head: `${gear}.  `,
				align: 'right',
				// The low gears matter least where the car is at speed.
				keep: gears.length - gear + 3,
				cell: point => gearCell(point, gear, setting.rpmLimit),
			}),
		),
	];
};

/** How the pair and the set are named above a table. */
export const choiceWords = (choice: {pair: string; gearbox: string; overall: readonly number[]}): string =>
	`${choice.pair} on set ${choice.gearbox}, overall ${choice.overall.map(ratio => fixed(ratio, 3)).join(' ')}`;

export const rpmView = (heading: Heading, answer: RpmTable, units: Units): Block[] => [
	...headingView(heading, choiceWords(answer), answer.setting, units),
	gap,
	tableOf(columnsFor(answer, units), answer.points),
	text(
		`1. to ${answer.overall.length}. the gears; ${inUse} gear in use; ${above} above the limit of ${rpm(answer.setting.rpmLimit)} rpm`,
		'muted',
		2,
	),
	gap,
	...closingView(answer.remarks),
];
