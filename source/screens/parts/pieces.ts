/** What the views of the screen are made of: pieces of text whose meaning is named. The theme makes them bold or colored. */

import {visible} from '../../documents/visible.ts';
import type {Tone} from '../../text/blocks.ts';
import {cut, displayWidth, padTo} from '../../text/width.ts';

/** Beside the tones of the text answers: what is chosen, where the caret stands, a key, a QR code. */
export type Meaning = Tone | 'chosen' | 'caret' | 'key' | 'code';
export type Piece = {readonly text: string; readonly tone: Meaning};
/** One line of the screen. */
export type Pieces = readonly Piece[];

/** What a stranger's text could do to a terminal becomes visible here. */
export const piece = (text: string, tone: Meaning = 'plain'): Piece => ({text: visible(text), tone});
export const line = (text: string, tone: Meaning = 'plain'): Pieces => [piece(text, tone)];
export const blank: Pieces = [];

export const widthOf = (pieces: Pieces): number => pieces.reduce((sum, {text}) => sum + displayWidth(text), 0);

/** The pieces made no wider than this: cut with a mark. */
export function clipped(pieces: Pieces, width: number): Pieces {
	const fit: Piece[] = [];
	let left = width;
	for (const [index, {text, tone}] of pieces.entries()) {
		if (left <= 0) break;
		const follows = pieces.slice(index + 1).some(later => later.text.trim() !== '');
		// A piece that just fits is cut all the same when something is left out behind it.
		const full = follows && displayWidth(text) === left ? cut(`${text} `, left) : cut(text, left);
		fit.push({text: full, tone});
		left -= displayWidth(full);
	}
	return fit;
}

/** The pieces made exactly so wide: cut, or filled with blanks. */
export function fitted(pieces: Pieces, width: number): Pieces {
	const fit = clipped(pieces, width);
	const left = width - widthOf(fit);
	return left > 0 ? [...fit, {text: ' '.repeat(left), tone: 'plain'}] : fit;
}

/** Text and what stands at the far end of the same line. */
export function spread(left: Pieces, right: Pieces, width: number): Pieces {
	const room = width - widthOf(right);
	if (right.length === 0) return clipped(left, width);
	return room < 1 ? clipped(left, width) : [...fitted(left, room - 1), piece(' '), ...right];
}

/** Columns of lines beside each other, with a rule between. */
export function beside(left: readonly Pieces[], leftWidth: number, right: readonly Pieces[], rule: string): Pieces[] {
	const height = Math.max(left.length, right.length);
	return Array.from({length: height}, (_, i) => [
		...fitted(left[i] ?? blank, leftWidth),
		piece(` ${rule} `, 'muted'),
		...(right[i] ?? blank),
	]);
}

/** Exactly so many lines: cut with a note of how many more there are, or filled with blank ones. */
export function tall(lines: readonly Pieces[], height: number): Pieces[] {
	if (height <= 0) return [];
	if (lines.length > height) {
		const more = lines.length - height + 1;
		return [...lines.slice(0, height - 1), line(`… ${more} more lines`, 'muted')];
	}
	return [...lines, ...Array.from({length: height - lines.length}, () => blank)];
}

/** Padded to a column. */
export const padded = (
	text: string,
	width: number,
	tone: Meaning = 'plain',
	align: 'left' | 'right' = 'left',
): Piece => ({text: padTo(visible(text), width, align), tone});
