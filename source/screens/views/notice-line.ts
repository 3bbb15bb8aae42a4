/** The line above the keys: what was just done, or the question that lies over the place. */
import {visible} from '../../documents/visible.ts';
import {clipped, line, type Piece, type Pieces, piece, widthOf} from '../parts/pieces.ts';
import {current, type Documents, titleOf, unsaved} from '../session/documents.ts';
import type {Asked, Session} from '../session/session.ts';
import {caretPieces} from './caret.ts';

const questions: Record<Asked | 'margin', string> = {
	margin: 'Least margin to the limit, RPM: ',
	file: 'Write it to the file: ',
	notes: 'Notes for the plan: ',
	directory: 'Write all that is kept to the directory: ',
};

export function noticeLine(session: Session, width: number): Pieces {
	return clipped(noticePieces(session, width), width);
}

function noticePieces({over, notice, place, history}: Session, width: number): Pieces {
	switch (over?.is) {
		case 'quitting':
			return [piece(` Not saved: ${unsavedNames(history.present)}. `, 'near'), piece(' Leave?')];
		case 'recovery':
			return [
				piece(' An earlier session ended with unsaved changes. ', 'near'),
				piece(` ${unsavedNames(over.documents)}`),
			];
		case 'overwriting':
			return [piece(` ${over.file} is there already. `, 'near'), piece(' Write over it?')];
		case 'forgetting': {
			const name = place.at === 'differences' ? titleOf(current(history.present, place.kind)) : '';
			return [piece(` Forget what is saved of ${name}? `, 'near'), piece(' Its file stays, ending in .bak.')];
		}
		case 'margin':
			return entryPieces(questions.margin, over.line, over.wrong, width);
		case 'entry':
			return entryPieces(questions[over.asks], over.line, over.wrong, width);
		default:
			return line(notice ?? '', 'strong');
	}
}

type Entry = Parameters<typeof caretPieces>[0];

/** The least that is left for what is typed. */
const leastRoom = 20;

function entryPieces(question: string, typed: Entry, wrong: string | undefined, width: number): Piece[] {
	const head = piece(question, 'strong');
	const told = wrong === undefined ? [] : [piece(` ${wrong}`, 'fail')];
	const room = Math.max(leastRoom, width - widthOf([head, ...told]));
	return [head, ...caretPieces(typed, room), ...told];
}

const unsavedNames = (documents: Documents): string =>
	unsaved(documents)
		.map(({json}) => visible(String(json.name)))
		.join(', ');
