/** One straight in one situation with one pair and set, as far as odds need it: the time, and the highest RPM. */

import {outcomeOf} from '../../drivetrain/run-straight.ts';
import {type Finish, highest, reachMps} from '../../drivetrain/sequence.ts';
import {finishesTogether} from '../../drivetrain/shared-sequences.ts';
import type {Course} from '../../drivetrain/straight.ts';
import type {Condition, Place} from '../../planning/conditions.ts';
import {rpmAt} from '../../planning/run-place.ts';
import {roundingRpm} from '../../planning/words.ts';
import type {QuickGears} from './quick-gears.ts';
import {finishesWorthwhile, type Worthwhile} from './worthwhile.ts';

export type QuickRun = {
	/** In the fastest gears; NaN where nothing runs. */
	readonly fastestS: number;
	/** As the limit check reads it: exit, `minimum`, shifts and the end, and what it would reach without the limiter. */
	readonly highestRpm: number;
	/** In use at the end of the straight, counted from 1. */
	readonly endGear: number;
	/** Whether the answer's gears touch the limiter. */
	readonly onLimiter: boolean;
	/** Whether it is driven at all: not above every gear's limit, to the end. */
	readonly runs: boolean;
	/** The exit is above what every allowed gear may turn. */
	readonly overLimit: boolean;
};

const notRun: QuickRun = {
	fastestS: Number.NaN,
	highestRpm: Number.NaN,
	endGear: 0,
	onLimiter: false,
	runs: false,
	overLimit: false,
};

/** As `runPlace` and the limit check would have it, of a straight with length; without `worthwhile` of all sequences. */
export function quickPlace(
	condition: Condition,
	place: Place,
	course: Course,
	gears: QuickGears,
	worthwhile?: Worthwhile,
): QuickRun {
	const outcome = outcomeOf(gears, course, startGears =>
		worthwhile === undefined
			? finishesTogether(gears, course, startGears)
			: finishesWorthwhile(gears, course, startGears, worthwhile),
	);
	if (outcome.kind === 'overLimit') return {...notRun, overLimit: true};
	if (outcome.kind !== 'ran') return notRun;
	const {chosen, fastest} = outcome;
	const top = highest(course, chosen);
	return {
		fastestS: fastest.timeS,
		highestRpm: highestRpm(condition, place, course, gears, chosen, top),
		endGear: top.gear,
		onLimiter: chosen.limiterM > 0,
		runs: true,
		overLimit: false,
	};
}

function highestRpm(
	{vehicle, steadySlip}: Condition,
	{straight, isRestart}: Place,
	course: Course,
	gears: QuickGears,
	{firstGear, entered, heldFrom}: Finish,
	top: {readonly gear: number; readonly speedMps: number},
): number {
	const rpmIn = (gear: number, speedMps: number) => rpmAt(vehicle, gears.overallOf(gear), speedMps);
	const endRpm = rpmIn(top.gear, top.speedMps);
	let rpm = Math.max(rpmIn(firstGear, straight.exitMps), endRpm);
	for (const [i, {shiftMps}] of entered.entries()) rpm = Math.max(rpm, rpmIn(firstGear + i, shiftMps));
	if (straight.minimumMps !== undefined)
		rpm = Math.max(rpm, rpmAt(vehicle, gears.overallOf(firstGear), straight.minimumMps, steadySlip));
	if (heldFrom === undefined || isRestart) return rpm;
	const lastGear = firstGear + entered.length;
	const reach = rpmIn(lastGear, reachMps(gears, course, lastGear, heldFrom));
	return reach > endRpm + roundingRpm ? Math.max(rpm, reach) : rpm;
}
