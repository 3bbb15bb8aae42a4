/**
 * Motion whose acceleration depends on speed alone: t = ∫ dV / a(V) and s = ∫ V dV / a(V), by Gauss-Legendre quadrature
 * between the kinks of a. Where a falls toward 0 the integral diverges, as it should; the pieces are halved toward that speed.
 */
import {brentRoot} from './brent.ts';
import {gaussLegendre} from './gauss-legendre.ts';
import {cellOf} from './monotone-cubic.ts';

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

export type Stretch = {readonly distanceM: number; readonly timeS: number};

export type Travel = {
	readonly speedMps: number;
	readonly distanceM: number;
	readonly timeS: number;
	/** `speed`: at the goal's speed; `end`: at the end or the braking point; `stopped`: the car came to rest. */
	readonly why: 'speed' | 'end' | 'stopped';
	/** With `end`, where it is known: a place on the way shortly before. */
	readonly shortlyBefore?: {readonly speedMps: number; readonly distanceM: number};
};

const piece = gaussLegendre(6);
/** For the last, short steps of a search, a small part of a piece. */
const sliver = gaussLegendre(3);

/**
 * The rule's error is about the square of its last Legendre coefficients over the mean, so where those are below this it is
 * below 1e-9, and in practice 1e-11: the coefficients fall on between the last and twice their number.
 */
const smooth = 1e-4;
/** Where it is not that smooth the piece is halved, so often at most: the rest of a kink is then below 1e-6 of the piece. */
const mostHalvings = 10;

/** A piece is halved until the acceleration at its end is within this factor of that at its start. */
const steepest = 0.4;

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
		const end = gentleEnd(motion, here.speedMps, bound);
		if (holds(motion, here.speedMps, end)) return cruise(here, roomM(here, goal));
		const stretch = integrate(motion, here.speedMps, end);
		const there: Travel = {
			speedMps: end,
			distanceM: here.distanceM + stretch.distanceM,
			timeS: here.timeS + stretch.timeS,
			why: 'end',
		};
		if (roomM(there, goal) < 0) return meet(motion, here, end, goal);
		here = there;
	}
}

/** Distance and time over which the acceleration, of one sign, takes the car from one speed to another inside a piece. */
export function integrate(motion: Motion, fromMps: number, toMps: number, halvings = mostHalvings): Stretch {
	const {nodes, weights, lastCoefficient, nextToLastCoefficient} = piece;
	const middle = (fromMps + toMps) / 2;
	const half = (toMps - fromMps) / 2;
	let distanceM = 0;
	let timeS = 0;
	let last = 0;
	let nextToLast = 0;
	for (let i = 0; i < nodes.length; i++) {
		const speed = middle + half * nodes[i]!;
		const slowness = 1 / motion.acceleration(speed);
		timeS += weights[i]! * slowness;
		distanceM += weights[i]! * slowness * speed;
		last += lastCoefficient[i]! * slowness;
		nextToLast += nextToLastCoefficient[i]! * slowness;
	}
	if (halvings > 0 && Math.abs(last) + Math.abs(nextToLast) > (smooth / 2) * Math.abs(timeS)) {
		const one = integrate(motion, fromMps, middle, halvings - 1);
		const other = integrate(motion, middle, toMps, halvings - 1);
		return {distanceM: one.distanceM + other.distanceM, timeS: one.timeS + other.timeS};
	}
	return {distanceM: distanceM * half, timeS: timeS * half};
}

/** The same over a small part of a piece. */
export function integrateSliver(motion: Motion, fromMps: number, toMps: number): Stretch {
	const {nodes, weights} = sliver;
	const middle = (fromMps + toMps) / 2;
	const half = (toMps - fromMps) / 2;
	let distanceM = 0;
	let timeS = 0;
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
	const entry = goal.braking?.entryMps ?? 0;
	const kink = rising ? Math.min(breakAbove(motion, speedMps), goal.toMps) : breakBelow(motion, speedMps);
	const next = (entry > speedMps && entry < kink) || (entry < speedMps && entry > kink) ? entry : kink;
	const [start, middle] = [motion.acceleration(speedMps), motion.acceleration((speedMps + next) / 2)];
	if (gentle(start, middle, motion.acceleration(next))) return next;
	return balancedBefore(motion, speedMps, next) ?? next;
}

/** In so many steps a piece is looked through for a speed at which the acceleration is 0. */
const looks = 16;

/** What the acceleration is at the very start does not count: the car may have settled there. Part of the piece. */
const justAfter = 1e-6;

/** The first speed on the way at which the acceleration is 0 or changes sign; undefined where it does neither. */
export function balancedBefore(motion: Motion, fromMps: number, toMps: number): number | undefined {
	const acceleration = (speedMps: number) => motion.acceleration(speedMps);
	const at = (share: number) => fromMps + share * (toMps - fromMps);
	const positive = acceleration(at(justAfter)) > 0;
	for (let i = 1; i <= looks; i++) {
		if (acceleration(at(i / looks)) > 0 === positive) continue;
		const before = i === 1 ? at(justAfter) : at((i - 1) / looks);
		return brentRoot(acceleration, before, at(i / looks)) ?? before;
	}
	return undefined;
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

/**
 * Whether the accelerations at the start, the middle and the end of a piece are near enough for one quadrature: any pole of
 * 1/a then lies outside the piece by about its length. The middle tells a dip below 0 between two like ends.
 */
export function gentle(start: number, middle: number, end: number): boolean {
	const ratio = end / start;
	return middle / start > 0 && ratio >= steepest && ratio <= 1 / steepest;
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
