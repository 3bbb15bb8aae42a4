/** A line being typed, with the place where the next character goes. */
import {displayWidth} from '../../text/width.ts';
import type {EditLine} from '../parts/edit-line.ts';
import {after} from '../parts/graphemes.ts';
import {type Pieces, piece} from '../parts/pieces.ts';

/** With a `room` a long line loses its start, so that the caret stays in view. */
export function caretPieces({text, caret}: EditLine, room = Number.POSITIVE_INFINITY): Pieces {
	const end = after(text, caret);
	const start = startFor(text, end, room);
	return [
		piece(`${start > 0 ? '…' : ''}${text.slice(start, caret)}`),
		piece(caret < text.length ? text.slice(caret, end) : ' ', 'caret'),
		piece(text.slice(end)),
	];
}

function startFor(text: string, end: number, room: number): number {
	let start = 0;
	while (start < end && displayWidth(text.slice(start, end)) > room - 2) start = after(text, start);
	return start;
}
