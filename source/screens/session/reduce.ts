/** The session after an action: the one place where it changes. Pure. */

import {withValue} from '../../documents/json.ts';
import {quantityOf} from '../../documents/quantity.ts';
import {edited, editLine} from '../parts/edit-line.ts';
import type {Action} from './action.ts';
import {aheadIn} from './ahead-place.ts';
import {current, type Documents, lookAt, newDocument, type OpenDocument, withJson, withNotes} from './documents.ts';
import {amended, type History, recorded, redone, undone} from './history.ts';
import {reduceForm} from './reduce-form.ts';
import {reduceHistory, typedInDraft} from './reduce-history.ts';
import {reducePractice} from './reduce-practice.ts';
import {acceptedRisk} from './reduce-risk.ts';
import {reduceTakeIn, typedInTakeIn} from './reduce-take-in.ts';
import {reduceWhole} from './reduce-whole.ts';
import type {Session} from './session.ts';

export function reduce(before: Session, action: Action): Session {
	// A notice lasts until the next key.
	const session = before.notice === undefined ? before : {...before, notice: undefined};
	switch (action.do) {
		case 'go':
			return {...session, place: action.place, over: undefined};
		case 'cover':
			return {...session, over: action.over};
		case 'tell':
			return {...session, notice: action.notice};
		case 'selectRow':
			return {...session, row: action.row};
		case 'compareWith':
			return {...session, comparison: action.row};
		case 'plan':
			return {...session, plan: action.row, notice: planWords(action.row)};
		case 'install':
			return installed(session, action.pair, action.gearbox);
		case 'order':
			return {...session, order: action.order};
		case 'filter':
			return {...session, filter: action.filter};
		case 'situate':
			return {...session, situation: action.situation};
		case 'read in':
			return {...session, units: action.units};
		case 'take':
			return taken(session, lookAt(session.history.present, action.document));
		case 'start new':
			return startedNew(session, action.kind);
		case 'recover':
			return {...taken(session, action.documents), notice: 'The unsaved session is back. u undoes even this.'};
		case 'saved':
			return saved(session, action.document, action.plan);
		case 'undo':
			return timeTravelled(session, undone(session.history), 'Nothing to undo.');
		case 'redo':
			return timeTravelled(session, redone(session.history), 'Nothing to redo.');
		case 'type':
			return typed(session, action);
		case 'accept risk':
			return acceptedRisk(session);
		case 'accept margin':
			return acceptedMargin(session);
		case 'move choice':
			return session.place.at === 'choose'
				? {...session, place: {...session.place, cursor: Math.max(0, session.place.cursor + action.by)}}
				: session;
		case 'scroll':
			return scrolledBy(session, action.by);
		case 'show item':
			return session.place.at === 'hand over'
				? {...session, place: {...session.place, item: action.item, scroll: 0}}
				: session;
		case 'note':
			return noted(session, action.text);
		case 'toggle ahead':
			return toggledAhead(session, action.id);
		case 'whole to':
		case 'forgotten':
			return reduceWhole(session, action);
		default:
			return inPlace(session, action);
	}
}

/** What only one place knows. */
function inPlace(session: Session, action: Action): Session {
	const {place, over} = session;
	if (over?.is === 'entry' && action.do === 'refuse') return {...session, over: {...over, wrong: action.wrong}};
	if (place.at === 'edit') return reduceForm(session, place, action);
	if (place.at === 'take in') return reduceTakeIn(session, place, action);
	if (place.at === 'practice') return reducePractice(session, place, action);
	return place.at === 'history' ? reduceHistory(session, place, action) : session;
}

function scrolledBy(session: Session, by: number): Session {
	const {place, over} = session;
	if (over) return over.is === 'help' ? {...session, over: {...over, scroll: Math.max(0, over.scroll + by)}} : session;
	return 'scroll' in place ? {...session, place: {...place, scroll: Math.max(0, place.scroll + by)}} : session;
}

function toggledAhead(session: Session, id: string): Session {
	const ids = aheadIn(session);
	return {...session, ahead: ids.includes(id) ? ids.filter(one => one !== id) : [...ids, id]};
}

function noted(session: Session, text: string): Session {
	const documents = withNotes(session.history.present, text);
	const words = text === '' ? 'No notes any more.' : 'Noted.';
	const notice = documents === session.history.present ? undefined : `${words} Ctrl+S saves them with the track.`;
	return {...withDocuments(session, documents), over: undefined, notice};
}

const planWords = (row: string | undefined) =>
	row === undefined ? 'No pair is chosen any more.' : `${row} is the plan. i puts it in the car.`;

export const withDocuments = (session: Session, documents: Documents): Session => ({
	...session,
	history: recorded(session.history, documents),
});

function installed(session: Session, pair: string, gearbox: string): Session {
	const documents = session.history.present;
	const json = withValue(current(documents, 'car').json, ['installed'], {pair, gearbox});
	return {
		...withDocuments(session, withJson(documents, 'car', json)),
		row: `${pair} ${gearbox}`,
		notice: `${pair} ${gearbox} is in the car now. u undoes it.`,
	};
}

/** Other documents: what was chosen among their rows does not carry over, and a situation only by name. */
function taken(session: Session, documents: Documents): Session {
	const {present} = session.history;
	const next = {...withDocuments(session, documents), place: {at: 'ranking'} as const, over: undefined};
	if (documents.track === present.track && documents.car === present.car) return next;
	return {...next, situation: undefined, plan: current(documents, 'track').plan};
}

function startedNew(session: Session, kind: 'track' | 'car'): Session {
	const documents = session.history.present;
	const next = taken(session, lookAt(documents, newDocument(kind, documents.open)));
	return {...next, place: {at: 'edit', kind, section: 0, row: 0, column: 0, editing: undefined}};
}

/** What was written is what a document is now compared with, in every state of the history. */
function saved(session: Session, {id, json, notes}: OpenDocument, plan: string | undefined): Session {
	const marked = (state: Documents): Documents => {
		const one = state.open[id];
		return one === undefined
			? state
			: {...state, open: {...state.open, [id]: {...one, from: 'saved', saved: json, savedNotes: notes, plan}}};
	};
	return {...session, history: amended(session.history, marked)};
}

function timeTravelled(session: Session, history: History<Documents> | undefined, otherwise: string): Session {
	if (history === undefined) return {...session, notice: otherwise};
	const {past, future} = history;
	const notice = `${past.length} ${past.length === 1 ? 'change' : 'changes'} to undo, ${future.length} to redo.`;
	return {...session, history, notice};
}

function typed(session: Session, {event}: Action & {do: 'type'}): Session {
	const {place, over} = session;
	if (over?.is === 'margin' || over?.is === 'risk' || over?.is === 'entry') {
		const line = edited(over.line, event);
		return line === undefined ? session : {...session, over: {...over, line, wrong: undefined}};
	}
	if (place.at === 'choose') {
		const search = edited(place.search, event);
		return search === undefined ? session : {...session, place: {...place, search, cursor: 0}};
	}
	if (place.at === 'take in') return typedInTakeIn(session, place, event);
	if (place.at === 'history') return typedInDraft(session, event);
	if (place.at === 'edit' && place.editing) {
		const line = edited(place.editing.line, event);
		return line === undefined ? session : {...session, place: {...place, editing: {line, wrong: undefined}}};
	}
	return session;
}

/** Nothing typed lets every row through again. */
function acceptedMargin(session: Session): Session {
	if (session.over?.is !== 'margin') return session;
	const text = session.over.line.text.trim();
	if (text === '') return {...session, over: undefined, filter: {...session.filter, leastMarginRpm: undefined}};
	const reading = quantityOf(text, 'number');
	if (!reading.ok) return {...session, over: {...session.over, wrong: `found ${reading.found}; allowed RPM, like 150`}};
	return {...session, over: undefined, filter: {...session.filter, leastMarginRpm: reading.value}};
}

/** The entry of the least margin, with what holds now. */
export const marginEntry = ({filter}: Session) =>
	({
		is: 'margin',
		line: editLine(filter.leastMarginRpm === undefined ? '' : String(filter.leastMarginRpm)),
		wrong: undefined,
	}) as const;
