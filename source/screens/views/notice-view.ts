/** Above the keys: what was just done, or the question that lies over the place. One line unless there is more to tell. */

import {visible} from '../../documents/visible.ts';
import {wrap} from '../../text/width.ts';
import {blank, clipped, line, type Pieces, piece, widthOf} from '../parts/pieces.ts';
import {current, type Documents, titleOf, unsaved} from '../session/documents.ts';
import {straightNames} from '../session/practice-of.ts';
import type {Asked, Over, Session} from '../session/session.ts';
import {caretPieces} from './caret.ts';

const questions: Record<Exclude<Asked, 'seen'> | 'margin' | 'risk', string> = {
	risk: 'Accepted chance of passing the RPM limit: ',
	margin: 'Least margin to the limit, RPM: ',
	file: 'Write it to the file: ',
	notes: 'Notes for the plan: ',
	directory: 'Write all that is kept to the directory: ',
	log: 'Read the logged run in the file: ',
};

/** What went wrong may need a path and what to do. */
const mostLines = 4;

export function noticeLines(session: Session, width: number): Pieces[] {
	const {over, notice} = session;
	if (over?.is === 'margin') return entryLines(questions.margin, over.line, over.wrong, width);
	if (over?.is === 'risk') return entryLines(questions.risk, over.line, over.wrong, width);
	if (over?.is === 'entry') {
		const question = over.asks === 'seen' ? seenQuestion(session) : questions[over.asks];
		return entryLines(question, over.line, over.wrong, width);
	}
	if (over !== undefined) return [clipped(questionPieces(over, session), width)];
	return notice === undefined ? [blank] : told(notice, width).map(text => line(text, 'strong'));
}

const told = (words: string, width: number): string[] => wrap(visible(words), width).slice(0, mostLines);

function questionPieces(over: Over, {place, history}: Session): Pieces {
	switch (over.is) {
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
		default:
			return blank;
	}
}

/** The straight that the number is of. */
function seenQuestion(session: Session): string {
	const name = straightNames(session)[session.place.at === 'practice' ? session.place.cursor : 0] ?? 'the straight';
	return `Highest RPM on ${name}, and gear 4 or 185 mph where known: `;
}

type Entry = Parameters<typeof caretPieces>[0];

/** What is wrong stands on the same line where it fits, else below. */
function entryLines(question: string, typed: Entry, wrong: string | undefined, width: number): Pieces[] {
	const head = [piece(question, 'strong'), ...caretPieces(typed, width - question.length)];
	if (wrong === undefined) return [clipped(head, width)];
	const beside = [...head, piece(` ${wrong}`, 'fail')];
	if (widthOf(beside) <= width) return [beside];
	return [clipped(head, width), ...told(wrong, width).map(text => line(text, 'fail'))];
}

const unsavedNames = (documents: Documents): string =>
	unsaved(documents)
		.map(({json}) => visible(String(json.name)))
		.join(', ');
