/** The whole screen as lines, for a size: what is drawn where. A pure function of the state, the size and where lists stood. */

import {visible} from '../../documents/visible.ts';
import {absent, unitsOf} from '../../text/units.ts';
import {wrap} from '../../text/width.ts';
import {beside, blank, clipped, line, type Pieces, piece, tall} from '../parts/pieces.ts';
import {tableBar, tableHeading, tableLine, tableWidth} from '../parts/table-line.ts';
import type {Wrong} from '../session/answer.ts';
import {current, titleOf} from '../session/documents.ts';
import {scopesOf} from '../session/held-scopes.ts';
import type {State} from '../session/live.ts';
import {cursorIn, type Placed} from '../session/rows.ts';
import {aheadView} from './ahead-view.ts';
import {changesView} from './changes-view.ts';
import {chooseView} from './choose-view.ts';
import {editView} from './edit-view.ts';
import {handOverView, qrLines} from './hand-over-view.ts';
import {headerView, settingOf} from './header-view.ts';
import {helpView} from './help-view.ts';
import {keyLines} from './key-line.ts';
import {lifeHalves, lifePlaceView} from './life-place-view.ts';
import {noticeLines} from './notice-view.ts';
import {oddsRows, oddsTold} from './odds-place-view.ts';
import {pictureView} from './picture-view.ts';
import {practiceView} from './practice-view.ts';
import {type RankingTable, rankingTable} from './ranking-view.ts';
import {reasonView, sentenceView} from './reason-view.ts';
import {scrolled} from './scrolled.ts';
import {takeInView} from './take-in-view.ts';
import {trackHistoryView} from './track-history-view.ts';
import {whyHalves, whyView} from './why-view.ts';

export type Size = {readonly width: number; readonly height: number; readonly ascii: boolean};
export const leastSize = {width: 80, height: 24} as const;

export type Frame = {
	readonly top: readonly Pieces[];
	/** The ranking, where it is the place; `beside` stands to its right. */
	readonly table: RankingTable | undefined;
	readonly beside: readonly Pieces[];
	readonly bottom: readonly Pieces[];
};

/** All lines from top to bottom, as they are without a component to lay them out. */
export function frameLines({top, table, beside: side, bottom}: Frame): Pieces[] {
	if (table === undefined) return [...top, ...bottom];
	const {columns, rows, selected} = table;
	const lines = [
		tableHeading(columns),
		...rows.map((row, i) => (i === selected ? tableBar(row, columns) : tableLine(row, columns))),
	];
	return [...top, ...lines.map((one, i): Pieces => [...one, ...(side[i] ?? [])]), ...bottom];
}

/** From this width on the reasons stand beside the ranking, or halves beside each other. */
const wide = 120;
/** The ranking beside its reasons takes no more than this. */
const widestTable = 104;
const tableShare = 0.65;
/** From this height on there are two lines of keys. */
const roomy = 30;

export function frameOf(state: State, size: Size, previousStart: number): Frame {
	if (size.width < leastSize.width || size.height < leastSize.height) return tooSmall(size);
	const {session, answer, scene} = state;
	const {width, height} = size;
	const cursor = cursorIn(scene.shown, session.row);
	const here = scene.shown[cursor];
	const counts = {shown: scene.shown.length, all: scene.all.length};
	const head = [...headerView(session, answer, counts, here, width), rule(width)];
	const foot = [
		...noticeLines(session, width),
		...keyLines(scopesOf(session), width, height < roomy ? 1 : 2, size.ascii),
	];
	const body = height - head.length - foot.length;
	const qr = qrLines(state, size, keyLines(scopesOf(session), width, 1, size.ascii));
	if (qr !== undefined) return {top: qr, table: undefined, beside: [], bottom: []};
	const plain = (lines: readonly Pieces[]): Frame => ({
		top: [...head, ...tall(lines, body).map(one => clipped(one, width))],
		table: undefined,
		beside: [],
		bottom: foot,
	});

	if (session.over?.is === 'help')
		return plain(scrolled(helpView(scopesOf({...session, over: undefined}), size.ascii), session.over.scroll, body));
	if (session.place.at === 'choose') {
		const given = {
			place: session.place,
			choices: scene.choices,
			documents: session.history.present,
			units: session.units,
		};
		return plain(chooseView(given, width, body));
	}
	if (session.place.at === 'edit') return plain(editView(session, session.place, width, body));
	const documents = session.history.present;
	if (session.place.at === 'take in') return plain(takeInView(session.place, width, body));
	if (session.place.at === 'history') {
		const given = {place: session.place, draft: session.draft, track: titleOf(current(documents, 'track'))};
		return plain(trackHistoryView(given, width, body));
	}
	if (session.place.at === 'differences')
		return plain(changesView(current(documents, session.place.kind), session.place.scroll, width, body));
	if (session.place.at === 'load' || session.place.at === 'gears')
		return plain(aheadView(state, session.place, width, body));
	if (answer.is === 'faulty') return plain(wrongView(answer.wrong, width));

	if (session.place.at === 'practice') {
		const given = {session, place: session.place, scene: scene.practice, width, height: body, ascii: size.ascii};
		return plain(practiceView(given));
	}
	if (session.place.at === 'hand over') return plain(handOverView(state, session.place, body, size));
	if (here === undefined)
		return plain([
			line('No row passes the filter. h shows failing rows, b all sets, n with nothing typed any margin.', 'muted'),
		]);
	if (session.place.at === 'why') return plain(whyLines(state, here, session.place.scroll, width, body));
	if (session.place.at === 'life') return plain(lifeLines(state, here, session.place.scroll, width, body));
	if (session.place.at === 'odds') return plain(oddsLines(state, cursor, session.place.scroll, width, body));
	if (session.place.at === 'pictures') return plain(pictureLines(state, here, size, body));
	// A place without a line above does not compile.
	session.place.at satisfies 'ranking';
	return ranking(state, here, cursor, size, previousStart, {head, foot, body});
}

type Around = {readonly head: readonly Pieces[]; readonly foot: readonly Pieces[]; readonly body: number};

function ranking(
	state: State,
	here: Placed,
	cursor: number,
	{width}: Size,
	previousStart: number,
	{head, foot, body}: Around,
): Frame {
	const {session, answer, scene} = state;
	const setting = settingOf(answer)!;
	const compared = comparedIn(state)?.row;
	const given = {session, setting, shown: scene.shown, cursor, compared};
	if (width < wide) {
		const reason = reasonView(here.row, width);
		const under = [rule(width), ...tall(reason, reasonHeight(body, scene.shown.length))];
		const table = rankingTable(given, width, body - under.length, previousStart);
		return {top: head, table: padTable(table, body - under.length), beside: [], bottom: [...under, ...foot]};
	}
	const table = rankingTable(given, Math.min(widestTable, Math.round(width * tableShare)), body, previousStart);
	const side = width - tableWidth(table.columns) - 3;
	const lines = scene.ranked === undefined ? reasonView(here.row, side) : whyView(whyOf(state, here), side);
	const column = tall(lines, body).map((one): Pieces => [piece(' │ ', 'muted'), ...clipped(one, side)]);
	return {top: head, table: padTable(table, body), beside: column, bottom: foot};
}

/** A quarter of the room, from five lines on a small screen to nine; all that few rows leave. The same for every row. */
function reasonHeight(body: number, rows: number): number {
	const quarter = Math.max(5, Math.min(9, Math.floor(body / 4)));
	const left = body - rows - 2;
	return Math.max(quarter, Math.min(left, 12));
}

/** The room that the rows do not need stays blank. */
const padTable = (table: RankingTable, height: number): RankingTable => ({
	...table,
	rows: [...table.rows, ...Array.from({length: Math.max(0, height - 1 - table.rows.length)}, () => ({' ': ' '}))],
});

const comparedIn = ({session, scene}: State): Placed | undefined =>
	scene.all.find(({name}) => name === session.comparison);

const whyOf = (state: State, here: Placed) => ({
	ranked: state.scene.ranked!,
	here,
	compared: comparedIn(state),
	units: unitsOf(state.session.units),
});

function whyLines(state: State, here: Placed, scroll: number, width: number, body: number): Pieces[] {
	if (state.scene.ranked === undefined) return reasonView(here.row, width);
	if (width < wide) return scrolled(whyView(whyOf(state, here), width), scroll, body);
	const half = Math.floor((width - 3) / 2);
	const [left, right] = whyHalves(whyOf(state, here), half, width - 3 - half);
	return beside(
		scrolled(left, Math.min(scroll, Math.max(0, left.length - body)), body),
		half,
		scrolled(right, scroll, body),
		'│',
	);
}

function lifeLines({session, scene}: State, here: Placed, scroll: number, width: number, body: number): Pieces[] {
	if (scene.ranked === undefined) return reasonView(here.row, width);
	const given = {
		ranked: scene.ranked,
		row: here.row,
		compared: scene.all.find(({name}) => name === session.comparison)?.row,
		situation: session.situation,
		units: unitsOf(session.units),
	};
	if (width < wide) return scrolled(lifePlaceView(given, width), scroll, body);
	const half = Math.floor((width - 3) / 2);
	const [left, right] = lifeHalves(given, half, width - 3 - half);
	return beside(
		scrolled(left, Math.min(scroll, Math.max(0, left.length - body)), body),
		half,
		scrolled(right, scroll, body),
		'│',
	);
}

function oddsLines({session, scene}: State, cursor: number, scroll: number, width: number, body: number): Pieces[] {
	const given = {shown: scene.odds, rows: scene.shown, cursor, units: session.units};
	if (width < wide) {
		const rows = oddsRows(given, width, Math.floor(body / 2));
		return [...rows, rule(width), ...scrolled(oddsTold(given, width), scroll, body - rows.length - 1)];
	}
	const half = Math.floor((width - 3) / 2);
	return beside(oddsRows(given, half, body), half, scrolled(oddsTold(given, width - 3 - half), scroll, body), '│');
}

function pictureLines(state: State, here: Placed, {width, ascii}: Size, body: number): Pieces[] {
	const {session, scene} = state;
	if (scene.ranked === undefined || session.place.at !== 'pictures') return reasonView(here.row, width);
	const reason = sentenceView(here.row, width).slice(0, 2);
	const given = {
		ranked: scene.ranked,
		here,
		compared: comparedIn(state),
		situation: session.situation,
		straight: session.place.straight,
		units: session.units,
	};
	return [...pictureView(session.place.picture, given, {width, height: body - reason.length, ascii}), ...reason];
}

const rule = (width: number): Pieces => line('─'.repeat(width), 'muted');

function wrongView(wrong: readonly Wrong[], width: number): Pieces[] {
	const head = line('This keeps the rack from being ranked. e changes it, u undoes the last change.', 'strong');
	const told = wrong.flatMap(({where, path, words}) => {
		const place = [where, path].filter(Boolean).join(': ');
		return wrap(visible(`${place === '' ? absent : place}: ${words}`), width - 2, 2).map((text, i) => [
			piece(i === 0 ? '! ' : '  ', 'fail'),
			piece(text),
		]);
	});
	return [head, blank, ...told];
}

function tooSmall({width, height}: Size): Frame {
	const needed = `Droprack needs ${leastSize.width} columns and ${leastSize.height} lines.`;
	const lines = [
		...wrap(needed, width),
		...wrap(`This window has ${width} and ${height}.`, width),
		...wrap('Nothing is lost: make it larger. Ctrl+C leaves.', width),
	];
	return {top: lines.slice(0, height).map(text => line(text)), table: undefined, beside: [], bottom: []};
}
