/** A line being typed, with the place where the next character goes. */

import type {EditLine} from '../parts/edit-line.ts';
import {after} from '../parts/graphemes.ts';
import {type Pieces, piece} from '../parts/pieces.ts';

export function caretPieces({text, caret}: EditLine): Pieces {
	const end = after(text, caret);
	return [
		piece(text.slice(0, caret)),
		piece(caret < text.length ? text.slice(caret, end) : ' ', 'caret'),
		piece(text.slice(end)),
	];
}
