/** What keys mean at the practice. */
import type {Action} from './action.ts';
import {entryFor, next} from './intents.ts';
import {panesOf, practiceOf, straightNames} from './practice-of.ts';
import type {Session} from './session.ts';

/** Of a straight, with what was typed before or with what begins now. */
export function seenEntry(session: Session, begun?: string): Action {
	const {place} = session;
	const practice = practiceOf(session);
	if (practice.log)
		return {do: 'tell', notice: `${practice.log.label} is shown; Del puts it away for numbers by hand.`};
	const straight = straightNames(session)[place.at === 'practice' ? place.cursor : 0];
	const before = practice.seen.find(one => one.straight === straight)?.text ?? '';
	return entryFor('seen', begun ?? before);
}

export function paneBy(session: Session, by: 1 | -1): Action | undefined {
	const {place} = session;
	return place.at === 'practice'
		? {do: 'show pane', pane: next(panesOf(practiceOf(session)), place.pane, by)}
		: undefined;
}

export function cleared(session: Session): Action | undefined {
	const {place} = session;
	if (place.at !== 'practice') return undefined;
	if (practiceOf(session).log) return {do: 'show log', log: undefined};
	const straight = straightNames(session)[place.cursor];
	return place.pane !== 'numbers' || straight === undefined ? undefined : {do: 'see', straight, text: undefined};
}

/** Grip shows in a log alone. */
export function gripToo(session: Session): Action {
	const {log, grip} = practiceOf(session);
	return log === undefined
		? {do: 'tell', notice: 'Grip is learned from a logged run: f reads one.'}
		: {do: 'learn grip', grip: !grip};
}
