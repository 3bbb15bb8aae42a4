/** What may happen at the history of a track: an entry typed, field by field. */
import {edited} from '../parts/edit-line.ts';
import type {KeyEvent} from '../terminal/key-event.ts';
import type {Action} from './action.ts';
import type {Place, Session} from './session.ts';
import {type Draft, draftFields} from './track-history.ts';

type AtHistory = Place & {at: 'history'};

export function reduceHistory(session: Session, place: AtHistory, action: Action): Session {
	const {draft} = session;
	switch (action.do) {
		case 'draft':
			return {...session, draft: action.draft, place: {...place, adding: true}};
		case 'leave draft':
			return {...session, place: {...place, adding: false}};
		case 'move in draft':
			return draft === undefined ? session : {...session, draft: movedIn(draft, action.by)};
		case 'refuse draft':
			return draft === undefined ? session : {...session, draft: {...draft, field: action.field, wrong: action.wrong}};
		case 'show history':
			return {...session, draft: undefined, place: {...place, entries: action.entries, adding: false, scroll: 0}};
		default:
			return session;
	}
}

export function typedInDraft(session: Session, event: KeyEvent): Session {
	const {draft} = session;
	const line = draft && edited(draft.lines[draft.field], event);
	if (draft === undefined || line === undefined) return session;
	return {...session, draft: {...draft, lines: {...draft.lines, [draft.field]: line}, wrong: undefined}};
}

function movedIn(draft: Draft, by: 1 | -1): Draft {
	const at = (draftFields.indexOf(draft.field) + by + draftFields.length) % draftFields.length;
	return {...draft, field: draftFields[at]!, wrong: undefined};
}
