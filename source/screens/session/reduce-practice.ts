/** What may happen at the practice of a track. */
import {withEdits} from '../../documents/edits.ts';
import type {Action} from './action.ts';
import {current, type Kind, withJson} from './documents.ts';
import {recorded} from './history.ts';
import {practiceOf} from './practice-of.ts';
import type {Place, Session} from './session.ts';

export const practicePlace: Place = {at: 'practice', pane: 'numbers', cursor: 0, scroll: 0};

export function reducePractice(session: Session, place: Place & {at: 'practice'}, action: Action): Session {
	const practice = practiceOf(session);
	switch (action.do) {
		case 'see': {
			const others = practice.seen.filter(({straight}) => straight !== action.straight);
			const {straight, text} = action;
			return {
				...session,
				over: undefined,
				practice: {...practice, seen: text === undefined ? others : [...others, {straight, text}]},
			};
		}
		case 'hold':
			return {...session, practice: {...practice, held: action.held}};
		case 'learn grip':
			return {...session, practice: {...practice, grip: action.grip}};
		case 'show log': {
			const shown = {...session, practice: {...practice, log: action.log}, over: undefined};
			return {...shown, place: {...place, pane: 'numbers', cursor: 0, scroll: 0}};
		}
		case 'show pane':
			return {...session, place: {...place, pane: action.pane, cursor: 0, scroll: 0}};
		case 'move in practice':
			return {...session, place: {...place, cursor: Math.max(0, Math.min(action.count - 1, place.cursor + action.by))}};
		case 'learn':
			return learned(session, action);
		default:
			return session;
	}
}

function learned(session: Session, {edits, notice}: Action & {do: 'learn'}): Session {
	const documents = (['track', 'car'] as const).reduce((before, kind: Kind) => {
		if (edits[kind].length === 0) return before;
		return withJson(before, kind, withEdits(current(before, kind).json, edits[kind]));
	}, session.history.present);
	return {...session, history: recorded(session.history, documents), notice};
}
