/** What practice teaches, as a person reads it: what was fitted, the model against practice, what would change. */
import type {Setting} from '../planning/results.ts';
import type {Findings, NoteCode} from '../practice/find/findings.ts';
import type {Compared} from '../practice/learn/compared.ts';
import type {Effect} from '../practice/learn/effect.ts';
import type {Learning} from '../practice/learn/learn.ts';
import type {LapPicture, RatioPicture} from '../practice/learn/pictures.ts';
import type {Proposal, ProposalRow} from '../practice/learn/proposals.ts';
import {isUnclear} from '../practice/learn/unclear.ts';
import {type Block, cell, gap, type Making, tableOf, text} from './blocks.ts';
import {foundView} from './found-view.ts';
import {closingView, type Heading, headingView} from './heading-view.ts';
import {fittedLines} from './learned-words.ts';
import {lapChart, lapLegend, lapTitle, picture, ratioChart, ratioTitle} from './practice-pictures.ts';
import {absent, fixed, rpm, signed, type Units} from './units.ts';

export function fittedView(learning: Learning): Block[] {
	const lines = fittedLines(learning);
	return [
		text('What it teaches', 'strong'),
		...(lines.length === 0
			? [text('Nothing that can be told; why is said at the end.', 'near')]
			: lines.map(one => text(one, 'plain', 2))),
	];
}

export const comparedLegend = 'was, is: the model less practice, before and after';

/** Practice beside the model: `was` and `is` are the model less practice, before and after. */
export function comparedView(compared: readonly Compared[], units: Units): Block[] {
	if (compared.length === 0) return [];
	return [
		text('Model against practice', 'strong'),
		tableOf(comparedColumns(units, compared), compared, 2),
		text(comparedLegend, 'muted', 2),
	];
}

/** The straight's name first. */
export function comparedColumns(units: Units, compared: readonly Compared[]): Making<Compared>[] {
	const isTimed = compared.some(({reading}) => reading.timeS !== undefined);
	const some = (wanted: boolean, ...makings: Making<Compared>[]) => (wanted ? makings : []);
	const speed = (value: number | undefined, seen: number | undefined) =>
		value === undefined || seen === undefined ? absent : signedSpeed(units, value - seen);
	const difference = (value: number | null | undefined, seen: number | undefined, digits: number) =>
		value === undefined || value === null || seen === undefined ? absent : signed(value - seen, digits);
	return [
		{head: 'straight', align: 'left', keep: 0, shortest: 8, cell: ({reading}) => cell(reading.name)},
		{
			head: `end ${units.label('speed')}`,
			align: 'right',
			keep: 1,
			cell: ({reading}) =>
				cell(units.number('speed', reading.endMps?.value ?? null), reading.speedSeen ? 'strong' : 'plain'),
		},
		{
			head: 'was',
			align: 'right',
			keep: 3,
			cell: ({reading, before}) => cell(speed(before?.endMps, reading.endMps?.value)),
		},
		{
			head: 'is',
			align: 'right',
			keep: 2,
			cell: ({reading, after}) => cell(speed(after?.endMps, reading.endMps?.value), 'strong'),
		},
		{
			head: 'rpm',
			align: 'right',
			keep: 0,
			cell: ({reading}) => cell(rpm(reading.endRpm?.value ?? null), 'strong'),
		},
		{
			head: 'was',
			align: 'right',
			keep: 1,
			cell: ({reading, before}) => cell(difference(before?.endRpm, reading.endRpm?.value, 0)),
		},
		{
			head: 'is',
			align: 'right',
			keep: 0,
			cell: ({reading, after}) => cell(difference(after?.endRpm, reading.endRpm?.value, 0), 'strong'),
		},
		...some(
			isTimed,
			{
				head: 'time s',
				align: 'right',
				keep: 4,
				cell: ({reading}) => cell(reading.timeS ? fixed(reading.timeS.value, 3) : absent),
			},
			{
				head: 'was',
				align: 'right',
				keep: 6,
				cell: ({reading, before}) => cell(difference(before?.timeS, reading.timeS?.value, 3)),
			},
			{
				head: 'is',
				align: 'right',
				keep: 5,
				cell: ({reading, after}) => cell(difference(after?.timeS, reading.timeS?.value, 3)),
			},
		),
	];
}

const signedSpeed = (units: Units, differenceMps: number): string => {
	const text = units.number('speed', differenceMps);
	return text.startsWith('-') || Number(text) === 0 ? text : `+${text}`;
};

/** What would be written, and what stands there now; of what was accepted, what was written, and what was left. */
export function proposalsView(proposals: readonly Proposal[], accepted: readonly string[]): Block[] {
	if (proposals.length === 0) return [text('Nothing would change in the documents.', 'plain')];
	const taken = proposals.filter(({name}) => accepted.includes(name));
	const left = proposals.filter(({name}) => !accepted.includes(name));
	return [
		...tableWith('Accepted', taken),
		...tableWith(taken.length > 0 ? 'Not accepted' : 'What would change, once accepted', left),
	];
}

function tableWith(title: string, proposals: readonly Proposal[]): Block[] {
	if (proposals.length === 0) return [];
	const lines = proposals.flatMap(({name, rows}) => rows.map((row, i) => ({name: i === 0 ? name : '', row})));
	return [text(title, 'strong'), tableOf(proposalColumns, lines, 2)];
}

type ProposalLine = {readonly name: string; readonly row: ProposalRow};

const proposalColumns: readonly Making<ProposalLine>[] = [
	{head: 'accept', align: 'left', keep: 0, shortest: 10, cell: ({name}) => cell(name)},
	{head: 'what', align: 'left', keep: 1, shortest: 12, cell: ({row}) => cell(row.label)},
	{
		head: 'now',
		align: 'left',
		keep: 2,
		shortest: 8,
		cell: ({row}) => cell(row.now === '' ? absent : row.now, row.before === undefined ? 'muted' : 'plain'),
	},
	{head: 'learned', align: 'left', keep: 0, shortest: 12, cell: ({row}) => cell(String(row.value), 'strong')},
];

export type LearnAnswer = {
	readonly heading: Heading;
	readonly setting: Setting;
	readonly learning: Learning;
	readonly findings: Findings | undefined;
	readonly proposals: readonly Proposal[];
	/** Names of those that were written. */
	readonly accepted: readonly string[];
	readonly effect: Effect | undefined;
	/** What reading the log had to say. */
	readonly remarks: readonly string[];
	readonly pictures: {readonly ratio: RatioPicture; readonly lap: LapPicture | undefined} | undefined;
};

const pictureLines = 14;

/** What the view says elsewhere. */
const toldAbove: readonly NoteCode[] = ['pair', 'wrongCar', 'slipHeld', 'wheelspin'];
export const notesOn = (findings: Findings): string[] =>
	findings.notes.filter(({code}) => !toldAbove.includes(code)).map(note => note.text);

/** The whole answer. */
export function learnView(answer: LearnAnswer, units: Units): Block[] {
	const {heading, setting, learning, findings, proposals, accepted, effect, remarks} = answer;
	const {candidate, from} = learning;
	const withPair = candidate === undefined ? '' : `, with ${candidate.pairName} ${candidate.gearbox.name}`;
	const notes = [...remarks, ...(findings ? notesOn(findings) : [])];
	return [
		...headingView(heading, `learned from ${from}${withPair}`, setting, units),
		gap,
		...(findings === undefined ? [] : [...foundView(findings, units), gap]),
		...fittedView(learning),
		gap,
		...comparedView(learning.compared, units),
		...(learning.compared.length > 0 ? [gap] : []),
		...(effect === undefined ? [] : [text(effect.words, 'strong'), gap]),
		...proposalsView(proposals, accepted),
		...(proposals.length > 0 && accepted.length === 0
			? [text(isUnclear(findings) ? unclearWords : acceptWords, isUnclear(findings) ? 'near' : 'muted', 2)]
			: []),
		gap,
		...picturesView(answer, units),
		...closingView(notes),
	];
}

const acceptWords = 'Nothing is written yet: --accept all, or --accept NAME for one of them.';
const unclearWords = 'Before any of it is accepted, say what was in the car: --pair and --gearbox.';

function picturesView({pictures, learning}: LearnAnswer, units: Units): Block[] {
	if (pictures === undefined || pictures.ratio.points.length === 0) return [];
	const {ratio, lap} = pictures;
	return [
		text(
			ratioTitle(learning.candidate && `${learning.candidate.pairName} ${learning.candidate.gearbox.name}`),
			'strong',
			2,
		),
		picture(ratioChart(ratio), pictureLines),
		gap,
		...(lap === undefined
			? []
			: [text(lapTitle(lap), 'strong'), picture(lapChart(lap, units), pictureLines), text(lapLegend, 'muted', 2), gap]),
	];
}
