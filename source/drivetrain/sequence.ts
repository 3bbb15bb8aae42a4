/** One rising sequence of gears on a straight: carried through shift by shift, and told in full. */
import {resistanceN} from './forces.ts';
import {fastestMps} from './gear-motion.ts';
import type {Gears, RoadGears} from './road-gears.ts';
import type {Course, GearShift, SequenceRun} from './straight.ts';
import {type Braking, brakingDistanceM, type Goal, type Travel} from './travel.ts';

/** Somewhere on a straight, since the exit. */
export type Place = {readonly speedMps: number; readonly distanceM: number; readonly timeS: number};

/** Where a gear takes over after a shift, and the speed at which the interruption began. */
export type Entry = Place & {readonly shiftMps: number};

/** How a gear carries the car on: by fresh quadrature, or by a table that keeps its integrals. */
export type Carry = (gear: number, fromMps: number, goal: Goal) => Travel;

/** A sequence that reached the end: the first gear, where each later gear was entered, and the end of full throttle. */
export type Finish = {
	readonly firstGear: number;
	readonly entered: readonly Entry[];
	/** Where the limiter was met; undefined where it was not. */
	readonly heldFrom: Place | undefined;
	readonly fullThrottleEnd: Place;
	/** A place shortly before the end of full throttle, its distance since the last gear was entered; undefined where none is known. */
	readonly shortlyBefore: Travel['shortlyBefore'] | undefined;
	readonly timeS: number;
	readonly limiterM: number;
	/** On the limiter, or above the limit where the limiter stands higher. */
	readonly pastTop: boolean;
};

export const atExit = (course: Course): Place => ({speedMps: course.exitMps, distanceM: 0, timeS: 0});

/** A straight that ends under braking; undefined without an entry speed. */
export function brakingOf(course: Course): Braking | undefined {
	const {entryMps, brakingMps2} = course;
	return entryMps === undefined || brakingMps2 === undefined ? undefined : {entryMps, brakingMps2};
}

/** From a place to the next gear's start; undefined where the shift is not complete before the end or the brakes. */
export function shifted(gears: Gears, course: Course, gear: number, from: Place, carry: Carry): Entry | undefined {
	const {speedMps: shiftMps, coasted} = gears.shiftFrom(gear, from.speedMps);
	const braking = brakingOf(course);
	const atOnce = {distanceM: 0, timeS: 0, why: 'speed'};
	const goal = {distanceM: course.lengthM - from.distanceM, toMps: shiftMps, braking};
	const run = from.speedMps >= shiftMps ? atOnce : carry(gear, from.speedMps, goal);
	if (run.why !== 'speed') return undefined;
	const distanceM = from.distanceM + run.distanceM + coasted.distanceM;
	const {speedMps} = coasted;
	if (distanceM + brakingDistanceM(speedMps, braking) > course.lengthM || speedMps <= 0) return undefined;
	return {shiftMps, speedMps, distanceM, timeS: from.timeS + run.timeS + gears.vehicle.shiftTimeS};
}

/** From a place to the end in one gear; undefined where the car stops. */
export function finished(
	gears: Gears,
	course: Course,
	firstGear: number,
	entered: readonly Entry[],
	carry: Carry,
): Finish | undefined {
	const gear = firstGear + entered.length;
	const from = entered.at(-1) ?? atExit(course);
	const braking = brakingOf(course);
	const run = carry(gear, from.speedMps, {
		distanceM: course.lengthM - from.distanceM,
		toMps: gears.limiterMps(gear),
		braking,
	});
	if (run.why === 'stopped') return undefined;
	const speedMps = run.speedMps;
	const distanceM = from.distanceM + run.distanceM;
	const timeS = from.timeS + run.timeS;
	const heldFrom = run.why === 'speed' ? {speedMps, distanceM, timeS} : undefined;
	const limiterM = heldFrom === undefined ? 0 : roomM(course, heldFrom, braking);
	const throttleS = timeS + limiterM / speedMps;
	return {
		firstGear,
		entered,
		heldFrom,
		fullThrottleEnd: {speedMps, distanceM: distanceM + limiterM, timeS: throttleS},
		shortlyBefore: run.shortlyBefore,
		timeS: throttleS + brakingTimeS(speedMps, braking),
		limiterM,
		pastTop: limiterM > 0 || speedMps > gears.topMps(gear) * (1 + Number.EPSILON),
	};
}

/** The whole story of a sequence that reached the end. */
export function described(gears: RoadGears, course: Course, finish: Finish): SequenceRun {
	const {firstGear, entered, fullThrottleEnd: end} = finish;
	const lastGear = firstGear + entered.length;
	const braking = brakingOf(course);
	const top = highest(course, finish);
	const topRpm = gears.motion(top.gear).rpmAt(top.speedMps);
	const reachRpm =
		finish.heldFrom === undefined
			? topRpm
			: gears.motion(lastGear).rpmAt(reachMps(gears, course, lastGear, finish.heldFrom));
	return {
		firstGear,
		lastGear,
		timeS: finish.timeS,
		topMps: top.speedMps,
		topGear: top.gear,
		topRpm,
		finalMps: braking === undefined ? end.speedMps : Math.min(end.speedMps, braking.entryMps),
		limiterM: finish.limiterM,
		reachRpm,
		shifts: entered.map((_, i) => shiftTold(gears, course, finish, i)),
		slows: end.speedMps < course.exitMps,
		entryMissed: braking !== undefined && end.speedMps < braking.entryMps,
		pushed: finish.heldFrom !== undefined && resistanceN(gears.forces, end.speedMps) < 0,
	};
}

function roomM(course: Course, place: Place, braking: Braking | undefined): number {
	return Math.max(0, course.lengthM - place.distanceM - brakingDistanceM(place.speedMps, braking));
}

function brakingTimeS(speedMps: number, braking: Braking | undefined): number {
	return braking === undefined ? 0 : Math.max(0, speedMps - braking.entryMps) / braking.brakingMps2;
}

/** The highest speed on the straight and the gear then in use. */
export function highest(
	course: Course,
	{firstGear, entered, fullThrottleEnd}: Finish,
): {readonly gear: number; readonly speedMps: number} {
	let top = {gear: firstGear, speedMps: course.exitMps};
	const raise = (gear: number, speedMps: number) => {
		if (speedMps > top.speedMps) top = {gear, speedMps};
	};
	for (const [i, entry] of entered.entries()) {
		raise(firstGear + i, entry.shiftMps);
		raise(firstGear + i + 1, entry.speedMps);
	}
	raise(firstGear + entered.length, fullThrottleEnd.speedMps);
	return top;
}

/** The highest speed in the gear had the limiter not cut, from where it was met. */
export function reachMps(gears: Gears, course: Course, gear: number, heldFrom: Place): number {
	const goal = {distanceM: course.lengthM - heldFrom.distanceM, toMps: fastestMps, braking: brakingOf(course)};
	return Math.max(heldFrom.speedMps, gears.carry(gear, heldFrom.speedMps, goal).speedMps);
}

function shiftTold(
	gears: RoadGears,
	course: Course,
	{firstGear, entered, fullThrottleEnd}: Finish,
	i: number,
): GearShift {
	const from = firstGear + i;
	const [gearStart, entry] = [entered[i - 1] ?? atExit(course), entered[i]!];
	const plan = gears.shiftFrom(from, gearStart.speedMps);
	return {
		from,
		rpm: plan.rpm,
		lightRpm: gears.motion(from).rpmAt(Math.max(gears.lightMps(from), gearStart.speedMps)),
		rpmAfter: plan.rpmAfter,
		speedMps: entry.shiftMps,
		distanceM: entry.distanceM - plan.coasted.distanceM,
		timeS: entry.timeS - gears.vehicle.shiftTimeS,
		leftS: fullThrottleEnd.timeS - entry.timeS,
	};
}
