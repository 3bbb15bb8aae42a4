/** The places about the tracks ahead: what may be changed there. */
import {defaultSteps, mostSteps} from '../../loading/load-results.ts';
import type {Action} from './action.ts';
import type {Place, Session} from './session.ts';

export const loadPlace: Place & {at: 'load'} = {
	at: 'load',
	cursor: 0,
	scroll: 0,
	shorter: defaultSteps,
	taller: defaultSteps,
	eachSet: false,
};
export const gearsPlace: Place & {at: 'gears'} = {at: 'gears', cursor: 0, scroll: 0, together: false};

export type AheadPlace = Place & {at: 'load' | 'gears'};

export const isAhead = (place: Place): place is AheadPlace => place.at === 'load' || place.at === 'gears';

/** Ids of the tracks that lie ahead. */
export const aheadIn = ({ahead, history}: Pick<Session, 'ahead' | 'history'>): readonly string[] =>
	ahead ?? [history.present.track];

export function aheadBy(place: Place, count: number, by: 1 | -1): Action | undefined {
	if (!isAhead(place)) return undefined;
	return {do: 'go', place: {...place, cursor: Math.max(0, Math.min(count - 1, place.cursor + by))}};
}

type Change = 'more shorter' | 'more taller' | 'each set' | 'one set for all';

export function changedAhead(change: Change, place: Place): Action | undefined {
	if (place.at === 'gears') return {do: 'go', place: {...place, together: !place.together, scroll: 0}};
	if (place.at !== 'load') return undefined;
	const more = (steps: number) => (steps + 1) % (mostSteps + 1);
	if (change === 'more shorter') return {do: 'go', place: {...place, shorter: more(place.shorter)}};
	if (change === 'more taller') return {do: 'go', place: {...place, taller: more(place.taller)}};
	return {do: 'go', place: {...place, eachSet: !place.eachSet}};
}
