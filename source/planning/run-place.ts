/** One straight in one situation with one pair and set: what the solver says, in the words of the answer. */
import {gripLimitN} from '../drivetrain/forces.ts';
import type {RoadGears} from '../drivetrain/road-gears.ts';
import {runStraight} from '../drivetrain/run-straight.ts';
import type {Course, SequenceRun, StraightRun, Vehicle} from '../drivetrain/straight.ts';
import {engineRpm} from '../drivetrain/tire.ts';
import type {Condition, Place} from './conditions.ts';
import type {StraightResult} from './results.ts';
import {lengthText, speedText} from './words.ts';

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
	/** Grip less thrust at full throttle in the exit gear, N: where it is positive the engine is the limit. */
	readonly spareGripN: {readonly exit: number; readonly minimum: number};
	readonly result: StraightResult;
};

/** RPM of a vehicle in the gear of an overall ratio; `slip` is the full-throttle one unless given. */
export function rpmAt(vehicle: Vehicle, overall: number, speedMps: number, slip = vehicle.slip): number {
	return engineRpm(speedMps, overall, vehicle.rolloutM, vehicle.growth, slip);
}

type Ran = Extract<StraightRun, {kind: 'ran'}>;

/** A straight in a situation, in the gears of the tie-break. */
export function runPlace(condition: Condition, place: Place, gears: RoadGears): PlaceRun {
	const course = place.courses.get(gears.train.overall.length);
	const drive = {condition, place, gears, course};
	if (course === undefined) return notRun(drive, 'noGear');
	if (place.straight.lengthM === undefined) return hold(drive, course);
	const run = runStraight(gears, course);
	if (run.kind !== 'ran') return notRun(drive, run.kind);
	return ran(drive, place.isRestart ? inGearOfLeastTime(gears, course, run) : run.chosen, run.fastest.timeS);
}

/** The restart starts in the gear of least time; after that the tie-break holds as everywhere. */
function inGearOfLeastTime(gears: RoadGears, course: Course, run: Ran): SequenceRun {
	const {chosen, fastest} = run;
	if (chosen.firstGear === fastest.firstGear) return chosen;
	const again = runStraight(gears, {...course, startGear: fastest.firstGear});
	return again.kind === 'ran' ? again.chosen : fastest;
}

type Drive = {
	readonly condition: Condition;
	readonly place: Place;
	readonly gears: RoadGears;
	readonly course: Course | undefined;
};

function ran(drive: Drive, sequence: SequenceRun, fastestS: number): PlaceRun {
	const {place, gears, course} = drive;
	const {firstGear, lastGear} = sequence;
	const {exitMps} = place.straight;
	const result: StraightResult = {
		name: place.name,
		timeS: sequence.timeS,
		fastestS,
		exitSpeedMps: exitMps,
		exitRpm: gears.motion(firstGear).rpmAt(exitMps),
		exitGear: firstGear,
		endSpeedMps: sequence.topMps,
		endRpm: sequence.topRpm,
		endGear: sequence.topGear,
		finalSpeedMps: sequence.finalMps,
		limiterM: sequence.limiterM,
		reachRpm: sequence.reachRpm,
		...minimum(drive, firstGear),
		shifts: [...sequence.shifts],
		remarks: sequenceRemarks(sequence, place),
	};
	return {place, course, state: 'ran', lastGear, sequence, spareGripN: spareGripN(drive, firstGear), result};
}

/** A straight without length: the gear in use at its speeds is the one in which the car would drive there. */
function hold(drive: Drive, course: Course): PlaceRun {
	const {place, gears} = drive;
	const {exitMps, endMps = exitMps} = place.straight;
	if (exitMps > gears.motion(course.highestGear).speedAt(gears.vehicle.topRpm)) return notRun(drive, 'overLimit');
	const exitGear = gearAt(gears, course, exitMps, course.lowestGear);
	const endGear = gearAt(gears, course, endMps, exitGear);
	const result: StraightResult = {
		name: place.name,
		timeS: null,
		fastestS: null,
		exitSpeedMps: exitMps,
		exitRpm: gears.motion(exitGear).rpmAt(exitMps),
		exitGear,
		endSpeedMps: endMps,
		endRpm: gears.motion(endGear).rpmAt(endMps),
		endGear,
		finalSpeedMps: endMps,
		limiterM: 0,
		reachRpm: null,
		...minimum(drive, exitGear),
		shifts: [],
		remarks: [],
	};
	return {
		place,
		course,
		state: 'held',
		lastGear: endGear,
		sequence: undefined,
		spareGripN: spareGripN(drive, exitGear),
		result,
	};
}

/** The shortest gear from `lowest` up whose shift speed is not behind at this speed; the last allowed one if all are. */
function gearAt(gears: RoadGears, course: Course, speedMps: number, lowest: number): number {
	let gear = lowest;
	while (gear < course.highestGear && gears.shift(gear).speedMps < speedMps) gear++;
	return gear;
}

/** Nothing ran: the exit is shown in the highest gear that it may start in, where its RPM is lowest. */
function notRun(drive: Drive, state: PlaceRun['state']): PlaceRun {
	const {place, gears, course} = drive;
	const gear = course?.startGear ?? course?.highestGear ?? gears.train.overall.length;
	const {exitMps} = place.straight;
	const rpm = gears.motion(gear).rpmAt(exitMps);
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
		...minimum(drive, gear),
		shifts: [],
		remarks: [notRunRemarks[state] ?? state],
	};
	return {place, course, state, lastGear: gear, sequence: undefined, spareGripN: spareGripN(drive, gear), result};
}

const notRunRemarks: Partial<Record<PlaceRun['state'], string>> = {
	overLimit: 'exit speed above the limit in every allowed gear',
	stops: 'stops before the end',
	noGear: 'the gearbox has none of the allowed gears',
	cannotBrake: 'cannot brake to the entry speed in this length',
};

function minimum({condition, place, gears}: Drive, exitGear: number) {
	const {minimumMps} = place.straight;
	if (minimumMps === undefined) return {minimumSpeedMps: null, minimumRpm: null};
	const overall = gears.train.overall[exitGear - 1]!;
	return {
		minimumSpeedMps: minimumMps,
		minimumRpm: rpmAt(gears.vehicle, overall, minimumMps, condition.steadySlip),
	};
}

function spareGripN({place, gears}: Drive, gear: number) {
	const spareAt = (speedMps: number) => gripLimitN(gears.forces, speedMps) - gears.motion(gear).thrustN(speedMps);
	const {exitMps, minimumMps} = place.straight;
	return {exit: spareAt(exitMps), minimum: spareAt(minimumMps ?? exitMps)};
}

function sequenceRemarks(sequence: SequenceRun, place: Place): string[] {
	const remarks: string[] = [];
	if (sequence.slows) {
		remarks.push(`slows from ${speedText(place.straight.exitMps)}, to ${speedText(sequence.finalMps)} at the end`);
	}
	if (sequence.entryMissed) remarks.push('never reaches its entry speed: no braking');
	if (sequence.pushed) remarks.push('the grade pushes the car past the limiter: speed held there');
	if (sequence.limiterM > 0) remarks.push(`on the limiter for ${lengthText(sequence.limiterM)}`);
	return remarks;
}
