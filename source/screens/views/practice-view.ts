/** The practice: numbers with the model beside them, what would change, and what a log shows. */
import type {Findings, MountedVerdict} from '../../practice/find/findings.ts';
import type {Compared} from '../../practice/learn/compared.ts';
import {type Block, cell, gap, type Making, tableOf, text} from '../../text/blocks.ts';
import {drawChart} from '../../text/chart.ts';
import {foundView} from '../../text/found-view.ts';
import {layOut} from '../../text/layout.ts';
import {comparedColumns, comparedLegend, notesOn} from '../../text/learn-view.ts';
import {fittedLines} from '../../text/learned-words.ts';
import {lapChart, lapLegend, lapTitle, ratioChart, ratioTitle} from '../../text/practice-pictures.ts';
import {absent, type Units, unitsOf} from '../../text/units.ts';
import {beside, blank, clipped, line, type Pieces, piece, tall} from '../parts/pieces.ts';
import type {PracticeScene} from '../session/live-practice.ts';
import type {Pane, Practice} from '../session/practice.ts';
import {panesOf, practiceOf, straightNames} from '../session/practice-of.ts';
import type {Place, Session} from '../session/session.ts';
import {type Line, linesOf, type Taught} from '../session/taught.ts';
import {scrolled} from './scrolled.ts';

type Given = {
	readonly session: Session;
	readonly place: Place & {at: 'practice'};
	readonly scene: PracticeScene | undefined;
	readonly width: number;
	readonly height: number;
	readonly ascii: boolean;
};

/** From this width on what would change stands beside the numbers. */
const wide = 120;

export function practiceView(given: Given): Pieces[] {
	const {session, scene, width, height, place} = given;
	const practice = practiceOf(session);
	const head = [clipped(headPieces(practice, place.pane, scene?.taught), width), blank];
	const body = height - head.length;
	if (scene?.taught === undefined) return [...head, line('A moment.', 'muted')];
	const told = scene.taught;
	return [...head, ...tall(paneLines({...given, height: body}, practice, told), body)];
}

const paneNames: Record<Pane, string> = {
	numbers: 'numbers',
	changes: 'changes',
	log: 'log',
	gears: 'gears',
	lap: 'lap',
};

/** Where the numbers come from, and what there is to look at. */
function headPieces(practice: Practice, pane: Pane, taught: Taught | undefined): Pieces {
	const {log, held} = practice;
	const byHand = taught === undefined ? '' : `By hand, ${taught.inCar ?? 'nothing'} in the car, ${held} held`;
	const from = log === undefined ? byHand : `${log.label}: ${taught?.lesson?.learning.from ?? 'a log'}`;
	const tabs = panesOf(practice).flatMap(one => [
		piece(' '),
		one === pane ? piece(` ${paneNames[one]} `, 'chosen') : piece(` ${paneNames[one]} `, 'muted'),
	]);
	return [piece('Practice', 'strong'), ...tabs, piece(`   ${from}`, 'muted')];
}

function paneLines(given: Given, practice: Practice, taught: Taught): readonly Pieces[] {
	const {place, width, height} = given;
	if (place.pane === 'changes') return changeLines(given, taught, width, height);
	if (place.pane === 'log' && practice.log) {
		const {findings, remarks} = practice.log;
		const notes = [...remarks, ...notesOn(findings)].map(note => text(`- ${note}`, 'plain', 2));
		const units = unitsOf(given.session.units);
		return scrolled(layOut([...foundView(findings, units), gap, ...notes], width), place.scroll, height);
	}
	if (place.pane === 'gears' || place.pane === 'lap') return pictureLines(given, taught, place.pane);
	if (width < wide) return scrolled(numberLines(given, practice, taught, width), place.scroll, height);
	const left = Math.floor((width - 3) * 0.55);
	return beside(
		tall(numberLines(given, practice, taught, left), height),
		left,
		tall(changeLines({...given, place: {...place, cursor: -1}}, taught, width - left - 3, height), height),
		'│',
	);
}

type NumberRow = {
	readonly name: string;
	readonly isHere: boolean;
	readonly typed: string;
	readonly compared: Compared | undefined;
};

function numberLines(
	{session, place, scene}: Given,
	practice: Practice,
	taught: Taught,
	width: number,
): readonly Pieces[] {
	const {lesson} = taught;
	const units = unitsOf(session.units);
	const rows = straightNames(session).map(
		(name, i): NumberRow => ({
			name,
			isHere: i === place.cursor && place.pane === 'numbers',
			typed: practice.seen.find(one => one.straight === name)?.text ?? '',
			compared: lesson?.learning.compared.find(({reading}) => reading.index === i),
		}),
	);
	const blocks: Block[] = [
		tableOf(numberColumns(units, practice, rows), rows),
		...(lesson === undefined ? [] : [text(comparedLegend, 'muted')]),
	];
	const told = layOut([gap, ...toldBlocks(taught)], width);
	// What comes of it stands first: on a small screen the rest is scrolled to.
	return [...layOut(blocks, width), ...effectLines(scene, width), ...told];
}

function numberColumns(units: Units, practice: Practice, rows: readonly NumberRow[]): Making<NumberRow>[] {
	const learned = rows.flatMap(({compared}) => (compared === undefined ? [] : [compared]));
	const shared = learned.length === 0 ? [] : comparedColumns(units, learned).slice(1);
	return [
		{head: '', align: 'left', keep: 0, cell: ({isHere}) => cell(isHere ? '▸' : ' ', 'strong')},
		{
			head: 'straight',
			align: 'left',
			keep: 0,
			shortest: 8,
			cell: ({name, isHere}) => cell(name, isHere ? 'strong' : 'plain'),
		},
		...(practice.log === undefined
			? [
					{
						head: 'seen',
						align: 'left',
						keep: 0,
						shortest: 10,
						cell: ({typed}: NumberRow) => cell(typed === '' ? absent : typed, typed === '' ? 'muted' : 'strong'),
					} as const,
				]
			: []),
		...shared.map(
			(making): Making<NumberRow> => ({
				...making,
				cell: ({compared}) => (compared === undefined ? cell('') : making.cell(compared)),
			}),
		),
	];
}

const nothingYet =
	'Type the highest RPM seen at the end of a straight: 8420, or 8420 gear 4 185 mph. f reads a logged run instead.';

const nothingMatched =
	'No straight of this track was found in the log: is it a run at another track? Tab shows why, under log.';

function toldBlocks({lesson, wrong}: Taught): Block[] {
	if (wrong !== undefined) return [text(wrong, 'fail')];
	if (lesson === undefined) return [text(nothingYet, 'muted')];
	const {findings, learning} = lesson;
	const mounted =
		findings && findings.mounted.verdict !== 'asInstalled' ? [text(mountedWords(findings), 'near', 2)] : [];
	const unmatched = findings && learning.compared.length === 0 ? [text(nothingMatched, 'near', 2)] : [];
	return [...mounted, ...unmatched, ...fittedLines(learning).map(words => text(words, 'plain', 2))];
}

/** In one line; the whole of it is told where the log is. */
function mountedWords({mounted: {verdict, best}}: Findings): string {
	const fits = best === undefined ? '' : `: the log fits ${best.candidate.pairName} ${best.candidate.gearbox.name}`;
	const words: Record<Exclude<MountedVerdict, 'asInstalled'>, string> = {
		otherFits: `The log does not fit the pair in the car${fits}`,
		flippedFits: `The gears seem to be on the wrong shafts${fits}`,
		nothingFits: 'The log fits no pair of this car: is it another car, or another unit',
		noInstalled: `The car does not say which pair is in it${fits}`,
		unknown: 'There is too little at full throttle to tell the pair',
	};
	return `${words[verdict as keyof typeof words]}. Tab shows why, under log.`;
}

/** What accepting all of it does. */
function effectLines(scene: PracticeScene | undefined, width: number): Pieces[] {
	const {effect, taught} = scene ?? {};
	if (taught?.lesson === undefined || effect === undefined) return [];
	const words = effect === 'working' ? 'Ranking with it …' : effect.words;
	return [blank, ...layOut([text(words, effect === 'working' ? 'muted' : 'strong')], width)];
}

function changeLines({place, ascii}: Given, taught: Taught, width: number, height: number): readonly Pieces[] {
	const lines = linesOf(taught);
	if (lines.length === 0)
		return layOut([text('Nothing would change, and nothing was learned before.', 'muted')], width);
	const rows = lines.flatMap((one, i) => changeRows(one, i === place.cursor));
	const cursor = rows.findIndex(({isHere}) => isHere);
	const drawn = layOut([tableOf(changeColumns, rows)], width, ascii);
	const start = Math.max(0, Math.min(cursor - Math.floor(height / 2), drawn.length - height));
	const shown = drawn.length <= height ? drawn : [drawn[0]!, ...drawn.slice(1 + start, start + height)];
	return shown;
}

type ChangeRow = {
	readonly isHere: boolean;
	readonly name: string;
	readonly what: string;
	readonly now: string;
	readonly becomes: string;
	readonly isLearned: boolean;
};

function changeRows(one: Line, isHere: boolean): ChangeRow[] {
	if (one.is === 'proposal')
		return one.proposal.rows.map((row, i) => ({
			isHere: isHere && i === 0,
			name: i === 0 ? one.proposal.name : '',
			what: row.label,
			now: row.now,
			becomes: String(row.value),
			isLearned: false,
		}));
	return one.taken.map(({entry, untouched}, i) => ({
		isHere: isHere && i === 0,
		name: i === 0 ? `back: ${one.name}` : '',
		what: entry.field.replace(/^(car|straights\[\d+\])\./, ''),
		now: String(entry.value),
		becomes: untouched ? `back to ${entry.before ?? 'not given'}` : 'changed since: stays',
		isLearned: true,
	}));
}

const changeColumns: readonly Making<ChangeRow>[] = [
	{head: '', align: 'left', keep: 0, cell: ({isHere}) => cell(isHere ? '▸' : ' ', 'strong')},
	{
		head: 'change',
		align: 'left',
		keep: 0,
		shortest: 10,
		cell: ({name, isHere}) => cell(name, isHere ? 'strong' : 'plain'),
	},
	{head: 'what', align: 'left', keep: 1, shortest: 12, cell: ({what}) => cell(what, 'muted')},
	{head: 'now', align: 'left', keep: 2, shortest: 8, cell: ({now}) => cell(now === '' ? absent : now)},
	{
		head: 'becomes',
		align: 'left',
		keep: 0,
		shortest: 12,
		cell: ({becomes, isLearned}) => cell(becomes, isLearned ? 'muted' : 'strong'),
	},
];

function pictureLines({width, height, ascii, session}: Given, taught: Taught, pane: 'gears' | 'lap'): Pieces[] {
	const {pictures, lesson} = taught;
	if (pictures === undefined || lesson === undefined) return [line('There is nothing to draw.', 'muted')];
	const {candidate} = lesson.learning;
	if (pane === 'gears') {
		const title = ratioTitle(candidate && `${candidate.pairName} ${candidate.gearbox.name}`);
		return [
			clipped(line(title, 'strong'), width),
			...drawChart(ratioChart(pictures.ratio), {width, height: height - 1, ascii}),
		];
	}
	if (pictures.lap === undefined) return [line('There is no good lap to draw.', 'muted')];
	const units = unitsOf(session.units);
	return [
		line(lapTitle(pictures.lap), 'strong'),
		...drawChart(lapChart(pictures.lap, units), {width, height: height - 2, ascii}),
		clipped(line(lapLegend, 'muted'), width),
	];
}
