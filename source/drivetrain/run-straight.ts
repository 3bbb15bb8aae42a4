/** The run on a straight: every rising sequence of gears, and the choice among them. */
import {chosenOf, fastestOf} from './choose-sequence.ts';
import {type Gears, RoadGears} from './road-gears.ts';
import {atExit, brakingOf, type Carry, described, type Entry, type Finish, finished, shifted} from './sequence.ts';
import {finishesTogether} from './shared-sequences.ts';
import type {Course, GearTrain, StraightRun, Vehicle} from './straight.ts';
import {brakingDistanceM, travel} from './travel.ts';

/**
 * The run from the exit to the end of the straight. Fast: sequences that start in the same gear share their way, and each
 * gear's integrals are kept in `gears` for every run on the same kind of road. Agrees with `runStraightPlainly` to 1e-9.
 */
export function runStraight(gears: RoadGears, course: Course): StraightRun {
	return run(gears, course, startGears => finishesTogether(gears, course, startGears));
}

/** The definition: each straight and each sequence by itself, integrated afresh. What the fast way is tested and timed against. */
export function runStraightPlainly(vehicle: Vehicle, train: GearTrain, course: Course): StraightRun {
	const gears = new RoadGears(vehicle, train, course);
	return run(gears, course, startGears => {
		const carry: Carry = (gear, fromMps, goal) => travel(gears.motion(gear), fromMps, goal);
		return startGears.flatMap(first =>
			gearsFrom(first, course.highestGear).flatMap(last => sequence(gears, course, first, last, carry) ?? []),
		);
	});
}

function run(gears: RoadGears, course: Course, finishesOf: (startGears: number[]) => Finish[]): StraightRun {
	const outcome = outcomeOf(gears, course, finishesOf);
	if (outcome.kind !== 'ran') return outcome;
	const {chosen, fastest} = outcome;
	const told = described(gears, course, chosen);
	return {kind: 'ran', chosen: told, fastest: fastest === chosen ? told : described(gears, course, fastest)};
}

/** The same before it is told in full. */
export type RunOutcome =
	| {readonly kind: 'ran'; readonly chosen: Finish; readonly fastest: Finish}
	| {readonly kind: Exclude<StraightRun['kind'], 'ran'>};

/** How a straight is run with any kind of gears, by the sequences that `finishesOf` gives for the start gears. */
export function outcomeOf(gears: Gears, course: Course, finishesOf: (startGears: number[]) => Finish[]): RunOutcome {
	if (brakingDistanceM(course.exitMps, brakingOf(course)) > course.lengthM) return {kind: 'cannotBrake'};
	const startGears: number[] = [];
	for (let gear = course.lowestGear; gear <= course.highestGear; gear++)
		if (mayStart(gears, course, gear)) startGears.push(gear);
	if (startGears.length === 0) return {kind: 'overLimit'};
	const finishes = finishesOf(startGears);
	if (finishes.length === 0) return {kind: 'stops'};
	return {kind: 'ran', chosen: chosenOf(finishes, gears.vehicle.sameTimeS), fastest: fastestOf(finishes)};
}

const gearsFrom = (lowest: number, highest: number) =>
	Array.from({length: Math.max(0, highest - lowest + 1)}, (_, i) => lowest + i);

/** No one starts above the limit, nor in a gear whose shift speed is already behind; a start gear that is given only heeds the limit. */
export function mayStart(gears: Gears, course: Course, gear: number): boolean {
	if (course.startGear !== undefined) return gear === course.startGear && course.exitMps <= gears.topMps(gear);
	if (gear === course.highestGear) return course.exitMps <= gears.topMps(gear);
	return course.exitMps <= gears.capMps(gear) && course.exitMps <= gears.shift(gear).speedMps;
}

function sequence(gears: RoadGears, course: Course, first: number, last: number, carry: Carry): Finish | undefined {
	const entered: Entry[] = [];
	for (let gear = first; gear < last; gear++) {
		const next = shifted(gears, course, gear, entered.at(-1) ?? atExit(course), carry);
		if (next === undefined) return undefined;
		entered.push(next);
	}
	return finished(gears, course, first, entered, carry);
}
