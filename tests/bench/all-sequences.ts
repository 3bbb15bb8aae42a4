/** Every sequence of gears on a straight, as phases that any integrator of ordinary differential equations can do. */
import {type RoadForces, resistanceN} from '../../source/drivetrain/forces.ts';
import type {RoadGears} from '../../source/drivetrain/road-gears.ts';
import {atExit, type Carry, type Entry, type Finish, finished, shifted} from '../../source/drivetrain/sequence.ts';
import type {Course, Vehicle} from '../../source/drivetrain/straight.ts';
import {circumferenceM} from '../../source/drivetrain/tire.ts';
import {travel} from '../../source/drivetrain/travel.ts';

export type Slopes = (x: number, y: number[]) => number[];

/** y at `to` where it starts as `start` at `from`. The `kinks`, rising, are where the slopes are not smooth, as far as that is known. */
export type Integrator = (
	slopes: Slopes,
	from: number,
	start: number[],
	to: number,
	kinks: readonly number[],
) => number[];

/** The sequences that reach the end, by the plain way; straights under braking are not among those timed. */
export function sequencesOf(gears: RoadGears, course: Course): Finish[] {
	const carry: Carry = (gear, fromMps, goal) => travel(gears.motion(gear), fromMps, goal);
	const finishes: Finish[] = [];
	for (let first = course.lowestGear; first <= course.highestGear; first++) {
		const bound = first === course.highestGear ? gears.topMps(first) : gears.shift(first).speedMps;
		if (course.exitMps > bound) continue;
		const entered: Entry[] = [];
		for (let gear = first; gear <= course.highestGear; gear++) {
			const finish = finished(gears, course, first, [...entered], carry);
			if (finish !== undefined) finishes.push(finish);
			const next = gear < course.highestGear && shifted(gears, course, gear, entered.at(-1) ?? atExit(course), carry);
			if (!next) break;
			entered.push(next);
		}
	}
	return finishes;
}

/**
 * The time of a sequence by an integrator. It is told beforehand at what speed each shift is and whether the limiter ends
 * the last gear, so that it need not look for events: to a known speed it integrates over speed, out of gear over time, and to
 * the end over distance.
 */
export function timeBy(integrate: Integrator, gears: RoadGears, course: Course, sequence: Finish): number {
	let [speedMps, distanceM, timeS] = [course.exitMps, 0, 0];
	const toSpeed = (gear: number, toMps: number) => {
		const motion = gears.motion(gear);
		const slopes: Slopes = v => {
			const slowness = 1 / motion.acceleration(v);
			return [v * slowness, slowness];
		};
		if (toMps > speedMps)
			[distanceM, timeS] = integrate(slopes, speedMps, [distanceM, timeS], toMps, motion.breaks) as [number, number];
		speedMps = toMps;
	};
	sequence.entered.forEach(({shiftMps}, i) => {
		toSpeed(sequence.firstGear + i, shiftMps);
		const {shiftTimeS} = gears.vehicle;
		const start = [speedMps, distanceM];
		[speedMps, distanceM] = integrate(outOfGear(gears.vehicle, gears.forces), 0, start, shiftTimeS, []) as [
			number,
			number,
		];
		timeS += shiftTimeS;
	});
	const lastGear = sequence.firstGear + sequence.entered.length;
	if (sequence.heldFrom !== undefined) {
		toSpeed(lastGear, sequence.heldFrom.speedMps);
		return timeS + (course.lengthM - distanceM) / speedMps;
	}
	const motion = gears.motion(lastGear);
	const overDistance: Slopes = (_, [v]) => [motion.acceleration(v!) / v!, 1 / v!];
	return integrate(overDistance, distanceM, [speedMps, timeS], course.lengthM, [])[1]!;
}

/** The same so finely that only rounding is left, with the solver's own speed at the end: what it misses of the length is made up there. */
export function referenceTime(gears: RoadGears, course: Course, sequence: Finish): number {
	return timeBy(finely, gears, course, {...sequence, heldFrom: sequence.fullThrottleEnd});
}

const fineSteps = 1000;

/** The classical method of Runge and Kutta in small steps from kink to kink. */
const finely: Integrator = (slopes, from, start, to, kinks) => {
	const edges = [from, ...kinks.filter(kink => kink > from && kink < to), to];
	let y = start;
	for (let i = 1; i < edges.length; i++) {
		const step = (edges[i]! - edges[i - 1]!) / fineSteps;
		for (let k = 0; k < fineSteps; k++) y = stepped(slopes, edges[i - 1]! + k * step, y, step);
	}
	return y;
};

function stepped(slopes: Slopes, x: number, y: number[], step: number): number[] {
	const moved = (slope: number[], by: number) => y.map((value, i) => value + by * slope[i]!);
	const k1 = slopes(x, y);
	const k2 = slopes(x + step / 2, moved(k1, step / 2));
	const k3 = slopes(x + step / 2, moved(k2, step / 2));
	const k4 = slopes(x + step, moved(k3, step));
	return y.map((value, i) => value + (step / 6) * (k1[i]! + 2 * k2[i]! + 2 * k3[i]! + k4[i]!));
}

/** Coasting, over time. */
function outOfGear({massKg, wheelInertiaKgM2, rolloutM, growth}: Vehicle, forces: RoadForces): Slopes {
	return (_, [v]) => {
		const perInertia = ((2 * Math.PI) / circumferenceM(rolloutM, growth, v!)) ** 2;
		return [-resistanceN(forces, v!) / (massKg + perInertia * wheelInertiaKgM2), v!];
	};
}
