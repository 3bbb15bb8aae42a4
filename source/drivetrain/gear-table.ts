/**
 * The run of `travel.ts` in one gear with its integrals kept: the speeds are cut once into cells, and each cell's distance
 * and time are worked out when a run first crosses it. Same answers, for a rack of runs at a fraction of the work.
 */
import type {GearMotion} from './gear-motion.ts';
import {cellOf} from './monotone-cubic.ts';
import {
	balancedBefore,
	brakingDistanceM,
	cruise,
	evenly,
	type Goal,
	gentle,
	holds,
	integrate,
	integrateSliver,
	newtonCap,
	newtonEnd,
	type Stretch,
	settled,
	type Travel,
} from './travel.ts';

/** Up to this share of a piece three points of quadrature do. */
const sliverShare = 0.02;

export class GearTable {
	readonly #motion: GearMotion;
	/** Rising from 0 to the limiter: the kinks, the speeds at which the acceleration is 0, and cuts between them. */
	readonly #edges: number[];
	readonly #cells: Stretch[] = [];
	#entry: {fromMps: number; toMps: number; piece: Stretch} | undefined;

	constructor(motion: GearMotion) {
		this.#motion = motion;
		this.#edges = cellEdges(motion);
	}

	/** As `travel(motion, fromMps, goal)`. */
	travel(fromMps: number, goal: Goal): Travel {
		const rising = this.#motion.acceleration(fromMps) >= 0;
		let [speed, distance, time] = [fromMps, 0, 0];
		let cell = cellOf(this.#edges, fromMps);
		if (!rising && speed === this.#edges[cell]) cell--;
		for (;;) {
			if (rising && speed >= goal.toMps) return {speedMps: speed, distanceM: distance, timeS: time, why: 'speed'};
			if (speed <= 0 && !rising) return {speedMps: 0, distanceM: distance, timeS: time, why: 'stopped'};
			const room = goal.distanceM - distance - brakingDistanceM(speed, goal.braking);
			if (room <= 0) return {speedMps: speed, distanceM: distance, timeS: time, why: 'end'};
			const far = this.#cellEnd(cell, speed, rising, goal);
			if (holds(this.#motion, speed, far))
				return cruise({speedMps: speed, distanceM: distance, timeS: time, why: 'end'}, room);
			const piece = this.#piece(cell, speed, far);
			if (distance + piece.distanceM + brakingDistanceM(far, goal.braking) > goal.distanceM)
				return this.#meet({speedMps: speed, distanceM: distance, timeS: time, why: 'end'}, far, piece, goal);
			distance += piece.distanceM;
			time += piece.timeS;
			speed = far;
			if (rising && far === this.#edges[cell + 1]) cell++;
			else if (!rising && far === this.#edges[cell]) cell--;
		}
	}

	#cellEnd(cell: number, speedMps: number, rising: boolean, goal: Goal): number {
		const entry = goal.braking?.entryMps ?? 0;
		if (!rising) return entry < speedMps && entry > this.#edges[cell]! ? entry : this.#edges[cell]!;
		const edge = Math.min(this.#edges[cell + 1] ?? goal.toMps, goal.toMps);
		return entry > speedMps && entry < edge ? entry : edge;
	}

	/** A whole cell is kept; of the parts, the last one that was asked for: every run after a shift starts with the same. */
	#piece(cell: number, fromMps: number, toMps: number): Stretch {
		if (fromMps === this.#edges[cell] && toMps === this.#edges[cell + 1]) {
			this.#cells[cell] ??= integrate(this.#motion, fromMps, toMps);
			return this.#cells[cell];
		}
		if (this.#entry?.fromMps !== fromMps || this.#entry.toMps !== toMps)
			this.#entry = {fromMps, toMps, piece: integrate(this.#motion, fromMps, toMps)};
		return this.#entry.piece;
	}

	/** Newton's method from the speed that an even acceleration over the piece would give; each step adds its own short integral. */
	#meet(here: Travel, farMps: number, whole: Stretch, goal: Goal): Travel {
		const [low, high] = here.speedMps < farMps ? [here.speedMps, farMps] : [farMps, here.speedMps];
		const room = (speedMps: number, distanceM: number) =>
			goal.distanceM - here.distanceM - distanceM - brakingDistanceM(speedMps, goal.braking);
		let speed = evenGuess(here.speedMps, farMps, room(here.speedMps, 0), room(farMps, whole.distanceM));
		let {distanceM, timeS} = integrate(this.#motion, here.speedMps, speed);
		for (let i = 0; i < newtonCap; i++) {
			const left = room(speed, distanceM);
			const next = Math.min(high, Math.max(low, speed + left / this.#roomSlope(speed, goal)));
			if (Math.abs(next - speed) <= newtonEnd * speed) break;
			const short = Math.abs(next - speed) <= sliverShare * (high - low);
			const step = short ? integrateSliver(this.#motion, speed, next) : integrate(this.#motion, speed, next);
			distanceM += step.distanceM;
			timeS += step.timeS;
			speed = next;
		}
		const there: Travel = {
			speedMps: speed,
			distanceM: here.distanceM + distanceM,
			timeS: here.timeS + timeS,
			why: 'end',
		};
		return evenly(there, room(speed, distanceM));
	}

	/** By how much the room shrinks for each m/s gained. */
	#roomSlope(speedMps: number, goal: Goal): number {
		const braking =
			goal.braking !== undefined && speedMps > goal.braking.entryMps ? goal.braking.brakingMps2 : Infinity;
		return speedMps / this.#motion.acceleration(speedMps) + speedMps / braking;
	}
}

/** Below this speed nothing is cut any more. */
const standstillMps = 1e-9;

/** Between two speeds, where the room falls to 0 if it falls evenly with V². */
function evenGuess(fromMps: number, toMps: number, roomFrom: number, roomTo: number): number {
	const share = roomFrom / (roomFrom - roomTo);
	return Math.sqrt(fromMps ** 2 + share * (toMps ** 2 - fromMps ** 2));
}

/** A speed and the acceleration there. */
type Mark = {readonly speedMps: number; readonly mps2: number};

/** The kinks and the speeds of no acceleration, cut until the acceleration changes little over each cell. */
function cellEdges(motion: GearMotion): number[] {
	const mark = (speedMps: number): Mark => ({speedMps, mps2: motion.acceleration(speedMps)});
	let low = mark(motion.breaks[0]!);
	const edges = [low.speedMps];
	for (let i = 1; i < motion.breaks.length; i++) {
		const high = mark(motion.breaks[i]!);
		const middle = mark((low.speedMps + high.speedMps) / 2);
		if (gentle(low.mps2, middle.mps2, high.mps2)) edges.push(high.speedMps);
		else cutAround(motion, low, high, edges);
		low = high;
	}
	return edges;
}

/** A piece with a zero of the acceleration in it is cut there first. */
function cutAround(motion: GearMotion, low: Mark, high: Mark, edges: number[]): void {
	const zero = balancedBefore(motion, low.speedMps, high.speedMps);
	if (zero === undefined || zero <= low.speedMps || zero >= high.speedMps) {
		cut(motion, low, high, edges);
		return;
	}
	const balanced = {speedMps: zero, mps2: 0};
	cut(motion, low, balanced, edges);
	cut(motion, balanced, high, edges);
}

function cut(motion: GearMotion, low: Mark, high: Mark, edges: number[]): void {
	const speedMps = (low.speedMps + high.speedMps) / 2;
	const middle = {speedMps, mps2: motion.acceleration(speedMps)};
	const tiny = high.speedMps - low.speedMps <= settled * high.speedMps || high.speedMps <= standstillMps;
	if (tiny || gentle(low.mps2, middle.mps2, high.mps2)) {
		edges.push(high.speedMps);
		return;
	}
	cut(motion, low, middle, edges);
	cut(motion, middle, high, edges);
}
