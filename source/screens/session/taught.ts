/** What practice teaches, as the views and keys see it. Types and what is cheap: what works it out is in `teaching.ts`. */
import type {Takeable} from '../../practice/learn/accept.ts';
import type {Lesson} from '../../practice/learn/lesson.ts';
import type {LapPicture, RatioPicture} from '../../practice/learn/pictures.ts';
import type {Proposal} from '../../practice/learn/proposals.ts';
import type {Documents} from './documents.ts';

export type Taught = {
	/** Undefined where nothing was seen yet. */
	readonly lesson: Lesson | undefined;
	readonly takeables: readonly Takeable[];
	/** The documents with all that is proposed in them; undefined where nothing is. */
	readonly after: Documents | undefined;
	readonly pictures: {readonly ratio: RatioPicture; readonly lap: LapPicture | undefined} | undefined;
	/** "33/38 A": what is in the car, where that is known. */
	readonly inCar: string | undefined;
	readonly wrong: string | undefined;
};

/** One of the lines of what would change: a proposal, or what can be taken back. */
export type Line =
	| {readonly is: 'proposal'; readonly proposal: Proposal}
	| {readonly is: 'learned'; readonly name: string; readonly taken: readonly Takeable[]};

export function linesOf({lesson, takeables}: Taught): Line[] {
	const names = [...new Set(takeables.map(({name}) => name))];
	return [
		...(lesson?.proposals ?? []).map((proposal): Line => ({is: 'proposal', proposal})),
		...names.map((name): Line => ({is: 'learned', name, taken: takeables.filter(one => one.name === name)})),
	];
}
