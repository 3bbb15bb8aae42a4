/** The practice of the track that is looked at. */
import {current} from './documents.ts';
import {readTrackOf} from './forms.ts';
import {type Pane, type Practice, panes} from './practice.ts';
import type {Session} from './session.ts';

/** Without a log there is nothing of it to look at. */
export const panesOf = (practice: Practice): readonly Pane[] =>
	practice.log === undefined ? ['numbers', 'changes'] : panes;

/** Of the track that is looked at; a new one where nothing was seen of it. */
export function practiceOf({practice, history}: Session): Practice {
	const {track} = history.present;
	return practice?.track === track ? practice : {track, seen: [], held: 'circumference', grip: false, log: undefined};
}

/** The names of the straights; none of a track that cannot be read. */
export function straightNames({history}: Session): readonly string[] {
	const reading = readTrackOf(current(history.present, 'track').json);
	return reading.ok ? reading.value.straights.map(({name}) => name) : [];
}
