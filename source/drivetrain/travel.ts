/**
 * Motion whose acceleration depends on speed alone, piece by piece between the kinks of a(V). Where a falls toward 0 the
 * integrals diverge, as they should; the pieces are halved toward that speed.
 */
import {balancedBefore} from './balance.ts';
import {brentRoot} from './brent.ts';
import {cellOf} from './monotone-cubic.ts';
import {endless, gentle, integrate, integrateSliver, type Motion, type Stretch} from './quadrature.ts';

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
	/** With `end`, where it is known: a place on the way shortly before. */
	readonly shortlyBefore?: {readonly speedMps: number; readonly distanceM: number};
};

/** This close to a speed at which the acceleration is 0, relatively, the car is taken to stay at it. */
export const settled = 1e-13;

/** Newton doubles its digits: more steps than this are never needed from a guess inside one piece. */
export const newtonCap = 12;
export const newtonEnd = 4e-16;

/** The run from a speed until the goal is met, with the driver at full throttle. */
export function travel(motion: Motion, fromMps: number, goal: Goal): Travel {
	let here: Travel = {speedMps: fromMps, distanceM: 0, timeS: 0, why: 'end'};
	const rising = motion.acceleration(fromMps) >= 0;
	for (;;) {
		if (rising && here.speedMps >= goal.toMps) return {...here, why: 'speed'};
		if (here.speedMps <= 0 && !rising) return {...here, why: 'stopped'};
		if (roomM(here, goal) <= 0) return here;
		const bound = pieceEnd(motion, here.speedMps, rising, goal);
		const next = nextPiece(motion, here.speedMps, bound);
		if (next === undefined) return cruise(here, roomM(here, goal));
		const there: Travel = {
			speedMps: next.endMps,
			distanceM: here.distanceM + next.distanceM,
			timeS: here.timeS + next.timeS,
			why: 'end',
		};
		if (roomM(there, goal) < 0) return meet(motion, here, next.endMps, goal);
		here = there;
	}
}

/** The piece from a speed toward another, shortened until it can be integrated; undefined where the car holds its speed. */
function nextPiece(motion: Motion, fromMps: number, boundMps: number): (Stretch & {endMps: number}) | undefined {
	let endMps = gentleEnd(motion, fromMps, boundMps);
	while (!holds(motion, fromMps, endMps)) {
		const stretch = integrate(motion, fromMps, endMps);
		if (stretch !== endless) return {...stretch, endMps};
		endMps = gentleEnd(motion, fromMps, (fromMps + endMps) / 2);
	}
	return undefined;
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
	const entry = goal.braking?.entryMps ?? 0;
	const kink = rising ? Math.min(breakAbove(motion, speedMps), goal.toMps) : breakBelow(motion, speedMps);
	const next = (entry > speedMps && entry < kink) || (entry < speedMps && entry > kink) ? entry : kink;
	const [start, middle] = [motion.acceleration(speedMps), motion.acceleration((speedMps + next) / 2)];
	if (gentle(start, middle, motion.acceleration(next))) return next;
	return balancedBefore(motion, speedMps, next) ?? next;
}

/** The end of the piece, drawn nearer until the acceleration changes little over it. */
function gentleEnd(motion: Motion, fromMps: number, boundMps: number): number {
	const start = motion.acceleration(fromMps);
	let [end, atEnd] = [boundMps, motion.acceleration(boundMps)];
	while (Math.abs(end - fromMps) > settled * fromMps) {
		const middle = (fromMps + end) / 2;
		const atMiddle = motion.acceleration(middle);
		if (gentle(start, atMiddle, atEnd)) break;
		[end, atEnd] = [middle, atMiddle];
	}
	return end;
}

/** Whether the way to the next speed is no way at all and the acceleration falls to 0 on it; a kink or a goal so near is passed. */
export function holds(motion: Motion, speedMps: number, nextMps: number): boolean {
	if (Math.abs(nextMps - speedMps) > settled * speedMps) return false;
	const [here, next] = [motion.acceleration(speedMps), motion.acceleration(nextMps)];
	return nextMps === speedMps || !gentle(here, here, next);
}

/** The car holds its speed to the end; at no speed it stands. */
export function cruise(here: Travel, roomM: number): Travel {
	return here.speedMps > 0 ? evenly(here, roomM) : {...here, why: 'stopped'};
}

/**
 * What is left of the distance at an even speed. Where the acceleration is next to nothing, meters lie between two
 * neighboring doubles of speed, and a search for the speed at the end leaves as much over.
 */
export function evenly(here: Travel, leftM: number): Travel {
	if (here.speedMps <= 0) return here;
	return {...here, distanceM: here.distanceM + leftM, timeS: here.timeS + leftM / here.speedMps};
}

/** Inside the piece that starts here: where the distance ends or the brakes go on. */
function meet(motion: Motion, here: Travel, endMps: number, goal: Goal): Travel {
	const at = (speedMps: number): Travel => {
		const part = integrate(motion, here.speedMps, speedMps);
		return {speedMps, distanceM: here.distanceM + part.distanceM, timeS: here.timeS + part.timeS, why: 'end'};
	};
	const speed = brentRoot(speedMps => roomM(at(speedMps), goal), here.speedMps, endMps);
	const there = at(speed ?? here.speedMps);
	return evenly(there, roomM(there, goal));
}

/**
 * The speed at which the car, gaining speed inside one piece, was `timeS` seconds before it reached `atMps`, not below
 * `lowMps`: Newton's method on the time, from the speed that an even acceleration would give.
 */
export function earlierBy(motion: Motion, lowMps: number, atMps: number, timeS: number): number {
	const slowed = (fromMps: number, byS: number) => Math.max(lowMps, fromMps - byS * motion.acceleration(fromMps));
	let speed = slowed(atMps, timeS);
	let left = timeS - integrate(motion, speed, atMps).timeS;
	for (let i = 0; i < newtonCap; i++) {
		const next = slowed(speed, left);
		if (Math.abs(next - speed) <= newtonEnd * speed) break;
		left -= integrateSliver(motion, next, speed).timeS;
		speed = next;
	}
	return speed;
}

/** The nearest kink below a speed above 0. */
function breakBelow({breaks}: Motion, speedMps: number): number {
	const cell = cellOf(breaks, speedMps);
	return breaks[cell] === speedMps ? (breaks[cell - 1] ?? 0) : (breaks[cell] ?? 0);
}

/** The nearest kink above a speed; Infinity beyond the last. */
function breakAbove({breaks}: Motion, speedMps: number): number {
	const next = speedMps < (breaks[0] ?? Infinity) ? 0 : cellOf(breaks, speedMps) + 1;
	const kink = breaks[next] ?? Infinity;
	return kink > speedMps ? kink : Infinity;
}
