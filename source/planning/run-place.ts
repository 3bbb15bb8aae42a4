/** One straight in one situation with one pair and set: what the solver says, in the words of the answer. */
import {runStraight} from '../drivetrain/run-straight.ts';
import {shiftSpeedMps} from '../drivetrain/shift-point.ts';
import type {Course, GearTrain, SequenceRun, StraightRun, Vehicle} from '../drivetrain/straight.ts';
import {engineRpm} from '../drivetrain/tire.ts';
import type {Condition, Place} from './conditions.ts';
import type {StraightResult} from './results.ts';
import {feetText, mphText} from './words.ts';

export type PlaceRun = {
	readonly place: Place;
	/** Undefined only with `noGear`. */
	readonly course: Course | undefined;
	/** `held`: no length, only RPM. `noGear`: the gearbox has none of the allowed gears. The others are the solver's. */
	readonly state: 'held' | 'noGear' | StraightRun['kind'];
	/** In use at the end of the straight. */
	readonly lastGear: number;
	/** What the answer takes its gears from; undefined where nothing ran. */
	readonly sequence: SequenceRun | undefined;
	readonly result: StraightResult;
};

/** RPM of a vehicle in the gear of an overall ratio; `slip` is the full-throttle one unless given. */
export function rpmAt(vehicle: Vehicle, overall: number, speedMps: number, slip = vehicle.slip): number {
	return engineRpm(speedMps, overall, vehicle.rolloutM, vehicle.growth, slip);
}

/** A straight in a situation, in the gears of the tie-break. */
export function runPlace(condition: Condition, train: GearTrain, place: Place): PlaceRun {
	const course = place.courses.get(train.overall.length);
	if (course === undefined) return notRun(condition, train, place, course, 'noGear');
	if (place.straight.lengthM === undefined) return hold(condition, train, place, course);
	const run = runStraight(condition.vehicle, train, course);
	if (run.kind !== 'ran') return notRun(condition, train, place, course, run.kind);
	return ran(condition, train, place, course, run.chosen, run.fastest.timeS);
}

/** The restart, in the gears of least time. */
export function runRestart(condition: Condition, train: GearTrain, place: Place): PlaceRun {
	const course = place.courses.get(train.overall.length)!;
	const run = runStraight(condition.vehicle, train, course);
	if (run.kind !== 'ran') return notRun(condition, train, place, course, run.kind);
	return ran(condition, train, place, course, run.fastest, run.fastest.timeS);
}

function ran(
	condition: Condition,
	train: GearTrain,
	place: Place,
	course: Course,
	sequence: SequenceRun,
	fastestS: number,
): PlaceRun {
	const {firstGear, lastGear} = sequence;
	const {exitMps} = place.straight;
	const result: StraightResult = {
		name: place.name,
		timeS: sequence.timeS,
		fastestS,
		exitSpeedMps: exitMps,
		exitRpm: rpmAt(condition.vehicle, train.overall[firstGear - 1]!, exitMps),
		exitGear: firstGear,
		endSpeedMps: sequence.topMps,
		endRpm: sequence.topRpm,
		endGear: sequence.topGear,
		finalSpeedMps: sequence.finalMps,
		limiterM: sequence.limiterM,
		reachRpm: sequence.reachRpm,
		...minimum(condition, train, place, firstGear),
		shifts: [...sequence.shifts],
		remarks: sequenceRemarks(sequence, place),
	};
	return {place, course, state: 'ran', lastGear, sequence, result};
}

/** A straight without length: the gear in use at its speeds is the one in which the car would drive there. */
function hold(condition: Condition, train: GearTrain, place: Place, course: Course): PlaceRun {
	const {vehicle} = condition;
	const {exitMps, endMps = exitMps} = place.straight;
	const top = course.highestGear - 1;
	if (rpmAt(vehicle, train.overall[top]!, exitMps) > vehicle.topRpm) {
		return notRun(condition, train, place, course, 'overLimit');
	}
	const exitGear = gearAt(vehicle, train, course, exitMps, course.lowestGear);
	const endGear = gearAt(vehicle, train, course, endMps, exitGear);
	const result: StraightResult = {
		name: place.name,
		timeS: null,
		fastestS: null,
		exitSpeedMps: exitMps,
		exitRpm: rpmAt(vehicle, train.overall[exitGear - 1]!, exitMps),
		exitGear,
		endSpeedMps: endMps,
		endRpm: rpmAt(vehicle, train.overall[endGear - 1]!, endMps),
		endGear,
		finalSpeedMps: endMps,
		limiterM: 0,
		reachRpm: null,
		...minimum(condition, train, place, exitGear),
		shifts: [],
		remarks: [],
	};
	return {place, course, state: 'held', lastGear: endGear, sequence: undefined, result};
}

/** The shortest gear from `lowest` up whose shift speed is not behind at this speed; the last allowed one if all are. */
function gearAt(vehicle: Vehicle, train: GearTrain, course: Course, speedMps: number, lowest: number): number {
	let gear = lowest;
	while (gear < course.highestGear && shiftSpeedMps(vehicle, train, course, gear) <= speedMps) gear++;
	return gear;
}

/** Nothing ran: the exit is shown in the highest gear that it may start in, where its RPM is lowest. */
function notRun(
	condition: Condition,
	train: GearTrain,
	place: Place,
	course: Course | undefined,
	state: PlaceRun['state'],
): PlaceRun {
	const gear = course?.startGear ?? course?.highestGear ?? train.overall.length;
	const {exitMps} = place.straight;
	const rpm = rpmAt(condition.vehicle, train.overall[gear - 1]!, exitMps);
	const result: StraightResult = {
		name: place.name,
		timeS: null,
		fastestS: null,
		exitSpeedMps: exitMps,
		exitRpm: rpm,
		exitGear: gear,
		endSpeedMps: exitMps,
		endRpm: rpm,
		endGear: gear,
		finalSpeedMps: exitMps,
		limiterM: 0,
		reachRpm: null,
		...minimum(condition, train, place, gear),
		shifts: [],
		remarks: [notRunRemarks[state] ?? state],
	};
	return {place, course, state, lastGear: gear, sequence: undefined, result};
}

const notRunRemarks: Partial<Record<PlaceRun['state'], string>> = {
	overLimit: 'exit speed above the limit in every allowed gear',
	stops: 'stops before the end',
	noGear: 'the gearbox has none of the allowed gears',
	cannotBrake: 'cannot brake to the entry speed in this length',
};

function minimum(condition: Condition, train: GearTrain, place: Place, exitGear: number) {
	const {minimumMps} = place.straight;
	if (minimumMps === undefined) return {minimumSpeedMps: null, minimumRpm: null};
	const rpm = rpmAt(condition.vehicle, train.overall[exitGear - 1]!, minimumMps, condition.steadySlip);
	return {minimumSpeedMps: minimumMps, minimumRpm: rpm};
}

function sequenceRemarks(sequence: SequenceRun, place: Place): string[] {
	const remarks: string[] = [];
	if (sequence.slows) {
		remarks.push(`slows from ${mphText(place.straight.exitMps)}, to ${mphText(sequence.finalMps)} at the end`);
	}
	if (sequence.entryMissed) remarks.push('never reaches its entry speed: no braking');
	if (sequence.pushed) remarks.push('the grade pushes the car past the limiter: speed held there');
	if (sequence.limiterM > 0) remarks.push(`on the limiter for ${feetText(sequence.limiterM)}`);
	return remarks;
}
