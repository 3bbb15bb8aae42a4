/** What can be handed over of a row: the list of it, and what is selected. A QR code takes the whole window. */
import {wrap} from '../../text/width.ts';
import {beside, blank, clipped, line, type Pieces, padded, piece, tall} from '../parts/pieces.ts';
import {type Handed, type Item, items, rowToHandOver} from '../session/hand-over.ts';
import type {State} from '../session/live.ts';
import {cursorIn} from '../session/rows.ts';
import type {Place} from '../session/session.ts';
import {scrolled} from './scrolled.ts';

type HandOver = Place & {at: 'hand over'};
type Size = {readonly width: number; readonly height: number; readonly ascii: boolean};

const listWidth = 14;
/** Between a QR code and what stands beside it. */
const gap = 2;

/** `height` lines under the heading; `window` is all there is. */
export function handOverView(state: State, place: HandOver, height: number, window: Size): Pieces[] {
	const {session, scene, answer} = state;
	const row = rowToHandOver(session.plan, scene.all, scene.shown[cursorIn(scene.shown, session.row)]);
	if (row === undefined) return [line('No row passes the filter, and no pair is the plan.', 'muted')];
	const of: Pieces = [
		piece(row.words, 'strong'),
		piece(` · ${session.history.present.open[session.history.present.track]?.notes ?? 'no notes'}`, 'muted'),
	];
	const width = window.width - listWidth - 3;
	const body = height - 1;
	const waiting = answer.is === 'ready' ? 'A moment.' : 'Once the rack has been ranked.';
	const content = scene.handed === undefined ? [line(waiting, 'muted')] : contentLines(scene.handed, width, window);
	const right = scrolled(content, place.scroll, body);
	return [clipped(of, window.width), ...tall(beside(listLines(place.item), listWidth, right, '│'), body)];
}

const listLines = (selected: Item): Pieces[] =>
	items.map(item => [
		piece(item === selected ? '▸ ' : '  '),
		padded(item, listWidth - 2, item === selected ? 'chosen' : 'plain'),
	]);

function contentLines({text, draw}: Handed, width: number, window: Size): Pieces[] {
	const words = draw === undefined ? undefined : cannotDraw(draw, window);
	if (words !== undefined) return words.flatMap(one => [...wrap(one, width).map(part => line(part)), blank]);
	// Cautions belong to a card: nothing of its text is cut.
	return text
		.trimEnd()
		.split('\n')
		.flatMap(one => wrap(one, width, 2).map(part => line(part)));
}

type Draw = NonNullable<Handed['draw']>;

const roomFor = ({width, height}: Size) => ({columns: width, rows: height});

/** Why a QR code is not drawn, and what to do; undefined where it is. */
function cannotDraw(draw: Draw, window: Size): string[] | undefined {
	const instead = '"one line" is what is needed to act on the plan; c copies what would be in the code, f writes it.';
	if (window.ascii)
		return ['A QR code is drawn with block characters: there is none with --ascii, or read aloud.', instead];
	const drawn = draw(roomFor(window));
	if (drawn.ok) return undefined;
	const {columns, rows} = drawn.needs;
	if (columns === 0) return ['The plan is too long for any QR code.', instead];
	const needs = `This QR code needs a window of ${columns} × ${rows}; this one has ${window.width} × ${window.height}.`;
	return [`${needs} Make the window larger, or take the one line: "QR of line" is the smaller code.`, instead];
}

/** The QR code over the whole window, with the list beside it and the keys below it as far as there is room; undefined where none is drawn. */
export function qrLines(state: State, window: Size, keys: readonly Pieces[]): Pieces[] | undefined {
	const {session, scene} = state;
	if (session.place.at !== 'hand over' || session.over !== undefined || window.ascii) return undefined;
	const drawn = scene.handed?.draw?.(roomFor(window));
	if (!drawn?.ok) return undefined;
	const code = drawn.lines.map((text): Pieces => [{text, tone: 'code'}]);
	const room = window.width - (drawn.lines[0]?.length ?? 0) - gap;
	const side = room < listWidth ? [] : besideCode(state, session.place.item, room);
	const lines = code.map((one, i): Pieces => [...one, piece(' '.repeat(gap)), ...(side[i] ?? blank)]);
	const below = window.height - lines.length;
	return below < keys.length ? lines : [...tall(lines, window.height - keys.length), ...keys];
}

function besideCode({session, scene}: State, item: Item, room: number): Pieces[] {
	const row = rowToHandOver(session.plan, scene.all, scene.shown[cursorIn(scene.shown, session.row)]);
	const words = [row?.words ?? '', session.notice ?? '', 'Esc goes back.'].filter(text => text !== '');
	const told = words.flatMap(text => [...wrap(text, room).map(part => line(part)), blank]);
	return [...listLines(item), blank, ...told].map(one => clipped(one, room));
}
