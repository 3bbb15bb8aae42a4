/** A run told along the way: speed and time at distances from the exit to the end of the straight. */
import {coast} from './coast.ts';
import type {RoadGears} from './road-gears.ts';
import {brakingOf} from './sequence.ts';
import type {Course, SequenceRun} from './straight.ts';

export type TracePoint = {
	readonly distanceM: number;
	readonly speedMps: number;
	/** Since the exit. */
	readonly timeS: number;
	/** Counted from 1; the one just left during a shift. */
	readonly gear: number;
};

/**
 * `count` points evenly spaced in distance, the first at the exit and the last at the end; count ≥ 2. Times agree with the
 * run's to the rounding of the quadrature, but for the interruptions, whose speed is drawn as falling evenly.
 */
export function speedTrace(gears: RoadGears, course: Course, run: SequenceRun, count: number): TracePoint[] {
	const legs = legsOf(gears, course, run);
	return Array.from({length: count}, (_, i) => {
		const distanceM = (course.lengthM * i) / (count - 1);
		const leg = legs.findLast(({from}) => from.distanceM <= distanceM) ?? legs[0]!;
		return underBraking(course, run, leg.at(distanceM), distanceM);
	});
}

type Here = {readonly distanceM: number; readonly speedMps: number; readonly timeS: number};
/** A stretch in one gear, or out of gear during a shift. */
type Leg = {readonly from: Here; at(distanceM: number): TracePoint};

function legsOf(gears: RoadGears, course: Course, {firstGear, shifts}: SequenceRun): Leg[] {
	const legs: Leg[] = [];
	let from: Here = {distanceM: 0, speedMps: course.exitMps, timeS: 0};
	for (const shift of shifts) {
		legs.push(driven(gears, shift.from, from));
		const coasted = coast(gears.vehicle, gears.forces, shift.speedMps, gears.vehicle.shiftTimeS);
		const start: Here = shift;
		const end: Here = {
			distanceM: start.distanceM + coasted.distanceM,
			speedMps: coasted.speedMps,
			timeS: start.timeS + gears.vehicle.shiftTimeS,
		};
		legs.push(interrupted(shift.from, start, end));
		from = end;
	}
	legs.push(driven(gears, firstGear + shifts.length, from));
	return legs;
}

function driven(gears: RoadGears, gear: number, from: Here): Leg {
	const toMps = gears.motion(gear).limiterMps;
	const at = (distanceM: number): TracePoint => {
		const goal = {distanceM: distanceM - from.distanceM, toMps, braking: undefined};
		const run = gears.table(gear).travel(from.speedMps, goal);
		// At the limiter the speed is held over what is left.
		const leftM = run.why === 'speed' ? goal.distanceM - run.distanceM : 0;
		return {distanceM, speedMps: run.speedMps, timeS: from.timeS + run.timeS + leftM / run.speedMps, gear};
	};
	return {from, at};
}

function interrupted(gear: number, from: Here, to: Here): Leg {
	const between = (share: number, one: number, other: number) => one + share * (other - one);
	const at = (distanceM: number): TracePoint => {
		const share = to.distanceM > from.distanceM ? (distanceM - from.distanceM) / (to.distanceM - from.distanceM) : 1;
		return {
			distanceM,
			speedMps: between(share, from.speedMps, to.speedMps),
			timeS: between(share, from.timeS, to.timeS),
			gear,
		};
	};
	return {from, at};
}

/** Once the brakes are on, V² = V_e² + 2·a_b·(L − s), and the time counts back from the end. */
function underBraking(course: Course, run: SequenceRun, point: TracePoint, distanceM: number): TracePoint {
	const braking = brakingOf(course);
	if (braking === undefined) return point;
	const {entryMps, brakingMps2} = braking;
	const bound = Math.sqrt(entryMps ** 2 + 2 * brakingMps2 * (course.lengthM - distanceM));
	if (point.speedMps <= bound) return point;
	return {...point, speedMps: bound, timeS: run.timeS - (bound - entryMps) / brakingMps2};
}
