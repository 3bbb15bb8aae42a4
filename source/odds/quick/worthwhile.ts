/** Which sequences of gears are worth trying on a straight in a draw: draws move them against each other by hundredths of a second. */
import {atExit, type Carry, type Entry, type Finish, finished, shifted} from '../../drivetrain/sequence.ts';
import {finishesTogether} from '../../drivetrain/shared-sequences.ts';
import type {Course} from '../../drivetrain/straight.ts';
import type {QuickGears} from './quick-gears.ts';

/** By first gear: a bit for each last gear. A first gear without entry is worth everything. */
export type Worthwhile = readonly (number | undefined)[];

/**
 * What a sequence may lose to the fastest with the documents' own numbers and still be tried in every draw: five times what
 * makes two of them count as equally fast, and several times what draws move them by.
 */
const tooSlowS = 0.1;

const everything = ~0;

/** The sequences that finish within `tooSlowS` of the fastest, and those that did not finish: another draw may finish them. */
export function worthwhileOn(gears: QuickGears, course: Course, startGears: readonly number[]): Worthwhile {
	const finishes = finishesOf(gears, course, startGears, []);
	const fastestS = Math.min(...finishes.map(({timeS}) => timeS));
	const bits: number[] = [];
	for (const first of startGears) bits[first] = everything;
	for (const {firstGear, entered, timeS} of finishes) {
		if (timeS > fastestS + tooSlowS) bits[firstGear]! &= ~(1 << (firstGear + entered.length));
	}
	return bits;
}

/** Their finishes; all that there are where none of them does. */
export function finishesWorthwhile(
	gears: QuickGears,
	course: Course,
	startGears: readonly number[],
	worthwhile: Worthwhile,
): Finish[] {
	const finishes = finishesOf(gears, course, startGears, worthwhile);
	return finishes.length > 0 ? finishes : finishesTogether(gears, course, startGears);
}

function finishesOf(
	gears: QuickGears,
	course: Course,
	startGears: readonly number[],
	worthwhile: Worthwhile,
): Finish[] {
	const carry: Carry = (gear, fromMps, goal) => gears.carry(gear, fromMps, goal);
	const finishes: Finish[] = [];
	const {highestGear} = course;
	for (const first of startGears) {
		const bits = (worthwhile[first] ?? everything) & ~(everything << (highestGear + 1));
		let entered: readonly Entry[] = [];
		let from = atExit(course);
		for (let gear = first; bits >> gear > 0; gear++) {
			if (((bits >> gear) & 1) === 1) {
				const finish = finished(gears, course, first, entered, carry);
				if (finish !== undefined) finishes.push(finish);
			}
			if (bits >> (gear + 1) <= 0) break;
			const next = shifted(gears, course, gear, from, carry);
			if (next === undefined) break;
			entered = [...entered, next];
			from = next;
		}
	}
	return finishes;
}
