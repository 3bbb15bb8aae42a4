/** Every sequence that can be driven, at a fraction of the work: shared ways, kept integrals, and none that cannot matter. */
import type {RoadGears} from './road-gears.ts';
import {atExit, brakingOf, type Carry, type Entry, type Finish, finished, type Place, shifted} from './sequence.ts';
import type {Course} from './straight.ts';
import {brakingDistanceM} from './travel.ts';

/** How a gear was run to the end from some place, to hold others in the same gear against. */
type Reference = {readonly from: Place; readonly finish: Finish};

/**
 * The finishes from each start gear. Sequences from the same gear go on from one another; one is left out, before its last
 * gear is integrated, where a bound shows that it loses more than `sameTimeS` to another.
 */
export function finishesTogether(gears: RoadGears, course: Course, startGears: readonly number[]): Finish[] {
	const carry: Carry = (gear, fromMps, goal) => gears.table(gear).travel(fromMps, goal);
	const references: Reference[] = [];
	const finishes: Finish[] = [];
	let boundS = Number.POSITIVE_INFINITY;
	for (const first of startGears) {
		let entered: readonly Entry[] = [];
		for (let gear = first; ; gear++) {
			const from = entered.at(-1) ?? atExit(course);
			if (leastTotalS(course, gear, from, references[gear], carry) <= boundS) {
				const finish = finished(gears, course, first, entered, carry);
				if (finish !== undefined) {
					finishes.push(finish);
					boundS = Math.min(boundS, finish.timeS + gears.vehicle.sameTimeS);
					references[gear] ??= {from, finish};
				}
			}
			if (gear === course.highestGear) break;
			const next = shifted(gears, course, gear, from, carry);
			if (next === undefined) break;
			entered = [...entered, next];
		}
	}
	return finishes;
}

/**
 * A bound below the whole time of a run that is in a gear at a place: where it comes by the speed at which a finished run
 * was in the same gear, it is later by their difference, and for what it has less to go it saves no more time than the
 * finished run took at the lowest speed there. 0 where nothing is known.
 */
function leastTotalS(
	course: Course,
	gear: number,
	from: Place,
	reference: Reference | undefined,
	carry: Carry,
): number {
	if (reference === undefined || from.speedMps > reference.from.speedMps) return 0;
	const {speedMps, distanceM, timeS} = reference.from;
	const goal = {distanceM: course.lengthM - from.distanceM, toMps: speedMps, braking: undefined};
	const run = carry(gear, from.speedMps, goal);
	if (run.why !== 'speed') return 0;
	const ahead = Math.max(0, from.distanceM + run.distanceM - distanceM);
	return reference.finish.timeS + (from.timeS + run.timeS - timeS) - ahead / lowestMps(course, reference, ahead);
}

/** The lowest speed at which the finished run was on its last meters of full throttle: a car that gains speed is never below an earlier one. */
function lowestMps(course: Course, {from, finish}: Reference, lastM: number): number {
	const before = finish.shortlyBefore;
	if (before === undefined || before.speedMps < from.speedMps) return from.speedMps;
	const room = course.lengthM - before.distanceM - brakingDistanceM(before.speedMps, brakingOf(course));
	return lastM <= room ? before.speedMps : from.speedMps;
}
