/** What the intents of several places are made of. */
import {editLine} from '../parts/edit-line.ts';
import type {Action} from './action.ts';
import type {Asked} from './session.ts';

export const entryFor = (asks: Asked, text: string): Action => ({
	do: 'cover',
	over: {is: 'entry', asks, line: editLine(text), wrong: undefined},
});

/** The one so many after another in a circle; an unknown one counts as the first. */
export function next<T>(among: readonly T[], one: T, by: number): T {
	const at = Math.max(0, among.indexOf(one));
	return among[(at + by + among.length) % among.length]!;
}
