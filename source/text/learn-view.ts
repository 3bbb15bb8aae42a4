/** What practice teaches, as a person reads it: what was fitted, the model against practice, what would change. */
import {speedText} from '../planning/words.ts';
import type {Anchor, StraightAnchor} from '../practice/learn/anchor.ts';
import type {CircumferenceLearned} from '../practice/learn/circumference.ts';
import type {Compared} from '../practice/learn/compared.ts';
import type {Learning} from '../practice/learn/learn.ts';
import type {Proposal, ProposalRow} from '../practice/learn/proposals.ts';
import {type Block, cell, type Making, tableOf, text} from './blocks.ts';
import {absent, fixed, rpm, signed, type Units} from './units.ts';

const inchM = 0.0254;
const mmM = 1e-3;

/** "87.95 in (2233.9 mm) ± 0.05 in". */
export function circumferenceText(value: number, se?: number): string {
	const number = `${fixed(value / inchM, 2)} in (${fixed(value / mmM, 0)} mm)`;
	return se === undefined ? number : `${number}, known to ${fixed(se / inchM, 2)} in (${fixed(se / mmM, 1)} mm)`;
}

const percent = (share: number, digits: number) => `${fixed(100 * share, digits)} %`;

export function fittedView({circumference, held, anchor, readings}: Learning): Block[] {
	const lines = [
		...(circumference === undefined ? [] : circumferenceWords(circumference)),
		...(held === undefined ? [] : [heldWords[held]]),
		...anchorWords(
			anchor,
			readings.filter(({limited}) => limited).map(({name}) => name),
		),
	];
	return [
		text('What it teaches', 'strong'),
		...(lines.length === 0 ? [text('Nothing that can be told.', 'near')] : lines.map(one => text(one, 'plain', 2))),
	];
}

const heldWords: Record<NonNullable<Learning['held']>, string> = {
	circumference:
		'Held: the circumference. RPM alone cannot tell it from the speed, so the RPM says how fast the car was; with "speed" held it would correct the circumference.',
	speed:
		'Held: the model\'s speed. RPM alone cannot tell it from the circumference, so the RPM says how far a turn of the tire goes; with "circumference" held it would correct drag or power.',
};

function circumferenceWords({rolloutM, factor, growth, slipHeld, growthHeld}: CircumferenceLearned): string[] {
	const before = rolloutM.value / factor;
	const start = `Rolling circumference at standstill ${circumferenceText(rolloutM.value, rolloutM.se)}; by the documents ${circumferenceText(before)}, ${signed(100 * (factor - 1), 2)} %.`;
	const grown =
		growth === undefined
			? `Growth was held at ${percent(growthHeld, 2)}, slip at ${percent(slipHeld, 1)}.`
			: `Growth at 100 mph ${percent(growth.value, 2)}, known to ${percent(growth.se, 2)}; by the documents ${percent(growthHeld, 2)}. Slip was held at ${percent(slipHeld, 1)}: n/V alone cannot tell it from the circumference.`;
	return [start, grown];
}

function anchorWords(anchor: Anchor | undefined, limited: readonly string[]): string[] {
	const onLimiter = limited.map(name => `${name} ends on the limiter: it says nothing about drag and power.`);
	if (anchor === undefined) return onLimiter;
	const factor = (name: string, what: Anchor['drag']) =>
		what === undefined ? [] : [`${name} ${signed(100 * (what.value - 1), 1)} %, known to ${percent(what.se, 1)}.`];
	const lost = anchor.straights
		.filter(({alone}) => alone === undefined)
		.map(
			({reading, tells, beforeMps}) =>
				`${reading.name} is ${speedText(Math.abs(beforeMps))} ${beforeMps > 0 ? 'faster' : 'slower'} than the model: no ${tells} within reason explains that. Check gear, pair, length and exit speed.`,
		);
	const scattered =
		anchor.misfit !== undefined && anchor.misfit > scattersFrom
			? [
					`The straights disagree by ${fixed(anchor.misfit, 1)} times what their numbers are known to: something else differs between them, such as wind or length.`,
				]
			: [];
	return [...factor('Drag area', anchor.drag), ...factor('Power', anchor.power), ...scattered, ...lost, ...onLimiter];
}
/** Of two straights one in twenty misfits is above 2. */
const scattersFrom = 2;

type Line = {readonly compared: Compared; readonly anchored: StraightAnchor | undefined};

/** Practice beside the model: `was` and `is` are the model less practice, before and after. */
export function comparedView({compared, anchor}: Pick<Learning, 'compared' | 'anchor'>, units: Units): Block[] {
	if (compared.length === 0) return [];
	const lines = compared.map((one): Line => {
		const anchored = anchor?.straights.find(({reading}) => reading.index === one.reading.index);
		return {compared: one, anchored};
	});
	return [
		text('Model against practice', 'strong'),
		tableOf(comparedColumns(units, lines), lines, 2),
		text(legendFor(lines), 'muted', 2),
	];
}

const legendFor = (lines: readonly Line[]): string =>
	[
		'was, is: the model less practice, before and after',
		...(lines.some(({anchored}) => anchored) ? ['alone: what this straight by itself asks for'] : []),
	].join('; ');

function comparedColumns(units: Units, lines: readonly Line[]): Making<Line>[] {
	const isTimed = lines.some(({compared}) => compared.reading.timeS !== undefined);
	const isAnchored = lines.some(({anchored}) => anchored);
	const some = (wanted: boolean, ...makings: Making<Line>[]) => (wanted ? makings : []);
	const speed = (value: number | undefined, seen: number | undefined) =>
		value === undefined || seen === undefined ? absent : signedSpeed(units, value - seen);
	const difference = (value: number | null | undefined, seen: number | undefined, digits: number) =>
		value === undefined || value === null || seen === undefined ? absent : signed(value - seen, digits);
	return [
		{head: 'straight', align: 'left', keep: 0, shortest: 8, cell: ({compared}) => cell(compared.reading.name)},
		{
			head: `end ${units.label('speed')}`,
			align: 'right',
			keep: 1,
			cell: ({compared: {reading}}) =>
				cell(units.number('speed', reading.endMps?.value ?? null), reading.speedSeen ? 'strong' : 'plain'),
		},
		{
			head: 'was',
			align: 'right',
			keep: 3,
			cell: ({compared: {reading, before}}) => cell(speed(before?.endMps, reading.endMps?.value)),
		},
		{
			head: 'is',
			align: 'right',
			keep: 2,
			cell: ({compared: {reading, after}}) => cell(speed(after?.endMps, reading.endMps?.value), 'strong'),
		},
		{
			head: 'rpm',
			align: 'right',
			keep: 0,
			cell: ({compared: {reading}}) => cell(rpm(reading.endRpm?.value ?? null), 'strong'),
		},
		{
			head: 'was',
			align: 'right',
			keep: 1,
			cell: ({compared: {reading, before}}) => cell(difference(before?.endRpm, reading.endRpm?.value, 0)),
		},
		{
			head: 'is',
			align: 'right',
			keep: 0,
			cell: ({compared: {reading, after}}) => cell(difference(after?.endRpm, reading.endRpm?.value, 0), 'strong'),
		},
		...some(
			isTimed,
			{
				head: 'time s',
				align: 'right',
				keep: 4,
				cell: ({compared: {reading}}) => cell(reading.timeS ? fixed(reading.timeS.value, 3) : absent),
			},
			{
				head: 'was',
				align: 'right',
				keep: 6,
				cell: ({compared: {reading, before}}) => cell(difference(before?.timeS, reading.timeS?.value, 3)),
			},
			{
				head: 'is',
				align: 'right',
				keep: 5,
				cell: ({compared: {reading, after}}) => cell(difference(after?.timeS, reading.timeS?.value, 3)),
			},
		),
		...some(isAnchored, {
			head: 'alone',
			align: 'left',
			keep: 7,
			cell: ({anchored}) => cell(aloneText(anchored), 'muted'),
		}),
	];
}

const signedSpeed = (units: Units, differenceMps: number): string => {
	const text = units.number('speed', differenceMps);
	return text.startsWith('-') || Number(text) === 0 ? text : `+${text}`;
};

/** "drag +5.7 %", with how well this straight knows it. */
function aloneText(anchored: StraightAnchor | undefined): string {
	if (anchored === undefined) return absent;
	const {tells, alone} = anchored;
	return alone === undefined
		? `no ${tells} does`
		: `${tells} ${signed(100 * (alone.value - 1), 1)} % to ${percent(alone.se, 1)}`;
}

/** What would be written, and what stands there now. */
export function proposalsView(proposals: readonly Proposal[], accepted: readonly string[]): Block[] {
	if (proposals.length === 0) return [text('Nothing would change in the documents.', 'plain')];
	const lines = proposals.flatMap(({name, rows}) =>
		rows.map((row, i) => ({name: i === 0 ? name : '', row, taken: accepted.includes(name)})),
	);
	return [
		text(accepted.length > 0 ? 'What was accepted' : 'What would change, once accepted', 'strong'),
		tableOf(proposalColumns, lines, 2),
	];
}

type ProposalLine = {readonly name: string; readonly row: ProposalRow; readonly taken: boolean};

const proposalColumns: readonly Making<ProposalLine>[] = [
	{head: 'accept', align: 'left', keep: 0, shortest: 10, cell: ({name, taken}) => cell(name, taken ? 'pass' : 'plain')},
	{head: 'what', align: 'left', keep: 1, shortest: 12, cell: ({row}) => cell(row.label)},
	{
		head: 'now',
		align: 'left',
		keep: 2,
		shortest: 8,
		cell: ({row}) => cell(row.now === '' ? absent : row.now, row.before === undefined ? 'muted' : 'plain'),
	},
	{head: 'learned', align: 'left', keep: 0, shortest: 12, cell: ({row}) => cell(writtenText(row.value), 'strong')},
];

/** The sign has no stand-in that says the same in ASCII. */
const writtenText = (value: string | number): string => String(value).replace(' ± ', ' +/- ');
