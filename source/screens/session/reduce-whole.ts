/** A document put back as a whole: to what is saved, or to what is shipped. */
import type {Action} from './action.ts';
import {current, type Documents, type OpenDocument, withDocument, withJson} from './documents.ts';
import {amended, recorded} from './history.ts';
import type {Session} from './session.ts';

export function reduceWhole(session: Session, action: Action & {do: 'whole to' | 'forgotten'}): Session {
	if (action.do === 'forgotten') return forgotten(session, action.document);
	return session.place.at === 'differences' ? wholeTo(session, session.place.kind, action.which) : session;
}

function wholeTo(session: Session, kind: 'track' | 'car', which: 'saved' | 'shipped'): Session {
	const {present} = session.history;
	const document = current(present, kind);
	const json = which === 'saved' && document.from !== 'saved' ? undefined : document[which];
	if (json === undefined) return {...session, notice: `There is no ${which} ${kind} of this name.`};
	const documents = withJson(present, kind, json);
	if (documents === present) return {...session, notice: `It is as the ${which} one already.`};
	return {
		...session,
		history: recorded(session.history, documents),
		notice: `The ${which} ${kind} is back. u undoes it.`,
	};
}

/** Nothing is saved of it any more, in every state of the history; a shipped one of its name is then looked at. */
function forgotten(session: Session, {id, kind, shipped}: OpenDocument): Session {
	const from = shipped === undefined ? 'new' : 'shipped';
	const marked = (state: Documents): Documents => {
		const one = state.open[id];
		return one === undefined
			? state
			: withDocument(state, {...one, from, saved: shipped, savedNotes: undefined, plan: undefined});
	};
	const history = amended(session.history, marked);
	if (shipped === undefined) return {...session, history};
	const document = {...history.present.open[id]!, json: shipped, notes: undefined};
	const documents = withDocument(history.present, document);
	return {...session, history: recorded(history, documents), ...(kind === 'track' && {plan: undefined})};
}
