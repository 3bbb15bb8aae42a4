/**
 * Motion whose acceleration depends on speed alone: t = ∫ dV / a(V) and s = ∫ V dV / a(V), by Gauss-Legendre quadrature
 * between the kinks of a. Where a falls toward 0 the integral diverges, as it should; the pieces are halved toward that speed.
 */
import {brentRoot} from './brent.ts';
import {gaussLegendre} from './gauss-legendre.ts';

export type Motion = {
	/** Acceleration at a road speed from 0 up, m/s². */
	acceleration(speedMps: number): number;
	/** Rising speeds between which the acceleration is smooth. */
	readonly breaks: readonly number[];
};

export type Braking = {readonly entryMps: number; readonly brakingMps2: number};

export type Goal = {
	/** How far it may go at most. */
	readonly distanceM: number;
	/** It ends when this speed is reached from below. */
	readonly toMps: number;
	/** The brakes must be on early enough to be at the entry speed at the end of the distance. */
	readonly braking: Braking | undefined;
};

export type Travel = {
	readonly speedMps: number;
	readonly distanceM: number;
	readonly timeS: number;
	/** `speed`: at the goal's speed; `end`: at the end or the braking point; `stopped`: the car came to rest. */
	readonly why: 'speed' | 'end' | 'stopped';
};

/** Points a piece: on pieces over which the acceleration changes by no more than a factor of two the error is below 1e-10. */
const {nodes, weights} = gaussLegendre(8);

/** A piece is halved until the acceleration at its end is within this factor of that at its start. */
const steepest = 0.4;

/** This close to a speed at which the acceleration is 0, relatively, the car is taken to stay at it. */
export const settled = 1e-13;

/** The run from a speed until the goal is met, with the driver at full throttle. */
export function travel(motion: Motion, fromMps: number, goal: Goal): Travel {
	let here: Travel = {speedMps: fromMps, distanceM: 0, timeS: 0, why: 'end'};
	const rising = motion.acceleration(fromMps) >= 0;
	for (;;) {
		if (rising && here.speedMps >= goal.toMps) return {...here, why: 'speed'};
		if (here.speedMps <= 0 && !rising) return {...here, why: 'stopped'};
		if (roomM(here, goal) <= 0) return here;
		const bound = pieceEnd(motion, here.speedMps, rising, goal);
		const end = gentleEnd(motion, here.speedMps, bound);
		if (Math.abs(end - here.speedMps) <= settled * here.speedMps) return cruise(here, goal);
		const piece = integrate(motion, here.speedMps, end);
		const there: Travel = {
			speedMps: end,
			distanceM: here.distanceM + piece.distanceM,
			timeS: here.timeS + piece.timeS,
			why: 'end',
		};
		if (roomM(there, goal) < 0) return meet(motion, here, end, goal);
		here = there;
	}
}

/** Distance and time over which the acceleration, of one sign, takes the car from one speed to another. */
export function integrate(motion: Motion, fromMps: number, toMps: number): {distanceM: number; timeS: number} {
	const [middle, half] = [(fromMps + toMps) / 2, (toMps - fromMps) / 2];
	let [distanceM, timeS] = [0, 0];
	for (let i = 0; i < nodes.length; i++) {
		const speed = middle + half * nodes[i]!;
		const weight = weights[i]! / motion.acceleration(speed);
		timeS += weight;
		distanceM += weight * speed;
	}
	return {distanceM: distanceM * half, timeS: timeS * half};
}

/** Distance under braking from a speed to the entry speed, V² − V_e² = 2·a_b·s; 0 from below it or without braking. */
export function brakingDistanceM(speedMps: number, braking: Braking | undefined): number {
	if (braking === undefined || speedMps <= braking.entryMps) return 0;
	return (speedMps ** 2 - braking.entryMps ** 2) / (2 * braking.brakingMps2);
}

/** What is left of the distance before the brakes must go on. */
function roomM(at: Travel, goal: Goal): number {
	return goal.distanceM - at.distanceM - brakingDistanceM(at.speedMps, goal.braking);
}

/** The next speed at which something changes: a kink, the goal, the entry speed, or where the acceleration is 0. */
function pieceEnd(motion: Motion, speedMps: number, rising: boolean, goal: Goal): number {
	const marks = [...motion.breaks, goal.braking?.entryMps ?? 0];
	const next = rising
		? Math.min(goal.toMps, ...marks.filter(mark => mark > speedMps))
		: Math.max(0, ...marks.filter(mark => mark < speedMps));
	return balancedBefore(motion, speedMps, next) ?? next;
}

/** The first speed on the way at which the acceleration is 0 or changes sign; undefined where it does neither. */
export function balancedBefore(motion: Motion, fromMps: number, toMps: number): number | undefined {
	const acceleration = (speedMps: number) => motion.acceleration(speedMps);
	const positive = acceleration((3 * fromMps + toMps) / 4) > 0;
	let before = fromMps;
	for (const place of [(fromMps + toMps) / 2, toMps]) {
		if (acceleration(place) > 0 !== positive) {
			return brentRoot(acceleration, before, place) ?? before;
		}
		before = place;
	}
	return undefined;
}

/** The end of the piece, drawn nearer until the acceleration changes little over it. */
function gentleEnd(motion: Motion, fromMps: number, boundMps: number): number {
	const start = motion.acceleration(fromMps);
	let end = boundMps;
	while (Math.abs(end - fromMps) > settled * fromMps && !gentle(start, motion.acceleration(end)))
		end = (fromMps + end) / 2;
	return end;
}

/** Whether two accelerations are near enough for one quadrature between them: any pole of 1/a then lies outside the piece by its length. */
export function gentle(from: number, to: number): boolean {
	const ratio = to / from;
	return ratio >= steepest && ratio <= 1 / steepest;
}

/** The car holds its speed to the end. */
function cruise(here: Travel, goal: Goal): Travel {
	const room = roomM(here, goal);
	return {...here, distanceM: here.distanceM + room, timeS: here.timeS + room / here.speedMps};
}

/** Inside the piece that starts here: where the distance ends or the brakes go on. */
function meet(motion: Motion, here: Travel, endMps: number, goal: Goal): Travel {
	const at = (speedMps: number): Travel => {
		const part = integrate(motion, here.speedMps, speedMps);
		return {speedMps, distanceM: here.distanceM + part.distanceM, timeS: here.timeS + part.timeS, why: 'end'};
	};
	const speed = brentRoot(speedMps => roomM(at(speedMps), goal), here.speedMps, endMps);
	return at(speed ?? here.speedMps);
}

/** The speed at which the car was `timeS` seconds before it reached `atMps` gaining speed, but not below `floorMps`. */
export function speedBefore(motion: Motion, atMps: number, timeS: number, floorMps: number): number {
	let [speed, left] = [atMps, timeS];
	while (speed > floorMps) {
		const next = Math.max(floorMps, ...motion.breaks.filter(mark => mark < speed));
		const end = gentleEnd(motion, speed, next);
		const took = integrate(motion, end, speed).timeS;
		if (took >= left || took < 0) {
			const before = (earlier: number) => integrate(motion, earlier, speed).timeS - left;
			return brentRoot(before, end, speed) ?? floorMps;
		}
		left -= took;
		speed = end;
	}
	return floorMps;
}
