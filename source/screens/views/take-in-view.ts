/** A plan that was sent: asked for, then shown with its numbers computed again and what differs from one's own. */

import {visible} from '../../documents/visible.ts';
import {layOut} from '../../text/layout.ts';
import {planView, shortView} from '../../text/plan-view.ts';
import {wrap} from '../../text/width.ts';
import {blank, line, type Pieces, piece} from '../parts/pieces.ts';
import type {Place} from '../session/session.ts';
import type {Incoming} from '../session/take-in.ts';
import {caretPieces} from './caret.ts';
import {scrolled} from './scrolled.ts';

const question = 'Paste the plan, or type the name of a file: ';

const explained =
	'A message with a plan is read as it is, with greeting, quotes and signature; also the one line, the content of a QR code, and JSON. Nothing is taken over before you say so.';

export function takeInView(place: Place & {at: 'take in'}, width: number, height: number): Pieces[] {
	if (place.incoming) return scrolled(incomingLines(place.incoming, width), place.scroll, height);
	const wrong = (place.wrong ?? '')
		.split('\n')
		.filter(text => text !== '')
		.flatMap(text => wrap(visible(text), width - 2, 2))
		.map((text, i): Pieces => [piece(i === 0 ? '! ' : '  ', 'fail'), piece(text)]);
	return [
		[piece(question, 'strong'), ...caretPieces(place.line, width - question.length)],
		blank,
		...wrap(explained, width).map(text => line(text, 'muted')),
		blank,
		...wrong,
	];
}

function incomingLines(incoming: Incoming, width: number): Pieces[] {
	if (incoming.form === 'short') return layOut(shortView(incoming.fields), width);
	const end = 'Nothing is taken over yet. Enter takes the track over, with this pair, set and notes.';
	return layOut(planView(incoming.plan, incoming, incoming.differences, end), width);
}
