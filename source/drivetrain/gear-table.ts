/**
 * The run of `travel.ts` in one gear with its integrals kept: each cell's distance and time are worked out when a run first
 * crosses it. Same answers, for a rack of runs at a fraction of the work.
 */
import type {GearMotion} from './gear-motion.ts';
import {endless, gentle, integrate, integrateSliver, type Stretch} from './quadrature.ts';
import {type Cell, gains, SpeedCells} from './speed-cells.ts';
import {
	brakingDistanceM,
	cruise,
	earlierBy,
	evenly,
	type Goal,
	holds,
	newtonCap,
	newtonEnd,
	type Travel,
	travel,
} from './travel.ts';

/** The cubic is nearly straight: regula falsi is there in three steps. */
const guessSteps = 3;

/** Newton squares its error: after a step this small, relatively, nothing is left. */
const newtonLast = 1e-7;

/** Up to this share of a piece three points of quadrature do. */
const sliverShare = 0.02;

type Part = {readonly fromMps: number; readonly toMps: number; readonly stretch: Stretch};

const keptParts = 4;

export class GearTable {
	readonly #motion: GearMotion;
	readonly #cells: SpeedCells;
	/** The parts of cells that were asked for last: every run after a shift starts and ends with the same. */
	readonly #parts: Part[] = [];
	#oldest = 0;

	constructor(motion: GearMotion) {
		this.#motion = motion;
		this.#cells = new SpeedCells(motion);
	}

	/** As `travel(motion, fromMps, goal)`. */
	travel(fromMps: number, goal: Goal): Travel {
		let speedMps = fromMps;
		let distanceM = 0;
		let timeS = 0;
		let cell = this.#cells.from(fromMps);
		if (cell !== undefined && !this.#fits(cell, fromMps)) return travel(this.#motion, fromMps, goal);
		const rising = cell !== undefined && gains(cell);
		if (rising && speedMps >= goal.toMps) return {speedMps, distanceM, timeS, why: 'speed'};
		while (cell !== undefined) {
			const room = goal.distanceM - distanceM - brakingDistanceM(speedMps, goal.braking);
			if (room <= 0) return {speedMps, distanceM, timeS, why: 'end'};
			const far = farEnd(cell, speedMps, rising, goal);
			if (holds(this.#motion, speedMps, far)) return cruise({speedMps, distanceM, timeS, why: 'end'}, room);
			const stretch = this.#stretch(cell, speedMps, far);
			if (stretch === endless) return this.#onPlainly({speedMps, distanceM, timeS}, goal);
			if (distanceM + stretch.distanceM + brakingDistanceM(far, goal.braking) > goal.distanceM)
				return this.#meet({speedMps, distanceM, timeS, why: 'end'}, far, stretch, goal);
			distanceM += stretch.distanceM;
			timeS += stretch.timeS;
			speedMps = far;
			if (rising && speedMps >= goal.toMps) return {speedMps, distanceM, timeS, why: 'speed'};
			if (rising && far === cell.highMps) cell = this.#cells.above(cell);
			else if (!rising && far === cell.lowMps) cell = this.#cells.below(cell);
		}
		return {speedMps, distanceM, timeS, why: 'stopped'};
	}

	/** The rest of a run that comes to a speed at which the acceleration is 0 inside a cell. */
	#onPlainly(here: Stretch & {speedMps: number}, goal: Goal): Travel {
		const rest = travel(this.#motion, here.speedMps, {...goal, distanceM: goal.distanceM - here.distanceM});
		return {...rest, distanceM: here.distanceM + rest.distanceM, timeS: here.timeS + rest.timeS};
	}

	/** Whether one quadrature serves from a speed inside the cell on; not so at a speed that the resistances just hold. */
	#fits(cell: Cell, speedMps: number): boolean {
		const here = this.#motion.acceleration(speedMps);
		return gentle(here, here, gains(cell) ? cell.highMps2 : cell.lowMps2);
	}

	/** The speed at which the car was `timeS` seconds before it reached `atMps` gaining speed; 0 where it gains none. */
	speedBefore(atMps: number, timeS: number): number {
		let speed = atMps;
		let left = timeS;
		for (let cell = this.#cells.under(atMps); cell !== undefined; cell = this.#cells.below(cell)) {
			const tookS = this.#stretch(cell, cell.lowMps, speed).timeS;
			if (tookS < 0) return 0;
			if (tookS >= left) return earlierBy(this.#motion, cell.lowMps, speed, left);
			left -= tookS;
			speed = cell.lowMps;
		}
		return 0;
	}

	/** A whole cell is kept, and the last few parts. */
	#stretch(cell: Cell, fromMps: number, toMps: number): Stretch {
		if (fromMps === cell.lowMps && toMps === cell.highMps) return this.#cells.stretchOf(cell);
		for (const part of this.#parts) {
			if (part.fromMps === fromMps && part.toMps === toMps) return part.stretch;
		}
		const stretch = integrate(this.#motion, fromMps, toMps);
		this.#parts[this.#oldest] = {fromMps, toMps, stretch};
		this.#oldest = (this.#oldest + 1) % keptParts;
		return stretch;
	}

	/** Newton's method from a guess that is nearly there; each step adds its own short integral. */
	#meet(here: Travel, farMps: number, whole: Stretch, goal: Goal): Travel {
		const low = Math.min(here.speedMps, farMps);
		const high = Math.max(here.speedMps, farMps);
		let speed = this.#guess(here, farMps, whole, goal);
		let {distanceM, timeS} = integrate(this.#motion, here.speedMps, speed);
		for (let i = 0; i < newtonCap; i++) {
			const left = roomM(here, distanceM, speed, goal);
			const next = Math.min(high, Math.max(low, speed + left / this.#roomSlope(speed, goal)));
			const change = Math.abs(next - speed);
			if (change <= newtonEnd * speed) break;
			const short = change <= sliverShare * (high - low);
			const step = short ? integrateSliver(this.#motion, speed, next) : integrate(this.#motion, speed, next);
			distanceM += step.distanceM;
			timeS += step.timeS;
			speed = next;
			if (change <= newtonLast * speed) break;
		}
		const there: Travel = {
			speedMps: speed,
			distanceM: here.distanceM + distanceM,
			timeS: here.timeS + timeS,
			why: 'end',
			shortlyBefore: here,
		};
		return evenly(there, roomM(here, distanceM, speed, goal));
	}

	/**
	 * Where the room would fall to 0 if V² ran over the distance as the cubic with the right values and slopes (2·a) at both
	 * ends of the piece. The piece's speeds are
	 * not left. Braking adds to it in proportion to V².
	 */
	#guess(here: Travel, farMps: number, whole: Stretch, goal: Goal): number {
		const squared = here.speedMps ** 2;
		const farSquared = farMps ** 2;
		const slope = 2 * whole.distanceM * this.#motion.acceleration(here.speedMps);
		const farSlope = 2 * whole.distanceM * this.#motion.acceleration(farMps);
		const bend = 3 * (farSquared - squared) - 2 * slope - farSlope;
		const twist = 2 * (squared - farSquared) + slope + farSlope;
		const least = Math.min(squared, farSquared);
		const most = Math.max(squared, farSquared);
		let low = 0;
		let lowRoom = roomM(here, 0, here.speedMps, goal);
		let high = 1;
		let highRoom = roomM(here, whole.distanceM, farMps, goal);
		let speed = here.speedMps;
		for (let i = 0; i < guessSteps; i++) {
			const part = low + ((high - low) * lowRoom) / (lowRoom - highRoom);
			const guess = squared + part * (slope + part * (bend + part * twist));
			speed = Math.sqrt(Math.min(most, Math.max(least, guess)));
			const room = roomM(here, part * whole.distanceM, speed, goal);
			if (room > 0) {
				low = part;
				lowRoom = room;
			} else {
				high = part;
				highRoom = room;
			}
		}
		return speed;
	}

	/** By how much the room shrinks for each m/s gained. */
	#roomSlope(speedMps: number, goal: Goal): number {
		const braking =
			goal.braking !== undefined && speedMps > goal.braking.entryMps ? goal.braking.brakingMps2 : Infinity;
		return speedMps / this.#motion.acceleration(speedMps) + speedMps / braking;
	}
}

/** The end of the cell on the way, or the goal's speed or the entry speed before it. */
function farEnd(cell: Cell, speedMps: number, rising: boolean, goal: Goal): number {
	const entry = goal.braking?.entryMps ?? 0;
	const edge = rising ? Math.min(cell.highMps, goal.toMps) : cell.lowMps;
	return (entry > speedMps && entry < edge) || (entry < speedMps && entry > edge) ? entry : edge;
}

/** What is left of the distance before the brakes must go on, so far on from a place. */
function roomM(here: Travel, furtherM: number, speedMps: number, goal: Goal): number {
	return goal.distanceM - here.distanceM - furtherM - brakingDistanceM(speedMps, goal.braking);
}
