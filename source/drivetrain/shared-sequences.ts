/** Every sequence that can be driven, at a fraction of the work: shared ways, kept integrals, and none that cannot matter. */
import {leastTimeS} from './least-time.ts';
import type {Gears} from './road-gears.ts';
import {atExit, brakingOf, type Carry, type Entry, type Finish, finished, type Place, shifted} from './sequence.ts';
import type {Course} from './straight.ts';
import {brakingDistanceM} from './travel.ts';

/** How a gear was run to the end from some place, to hold others in the same gear against. */
type Reference = {readonly from: Place; readonly finish: Finish};

/**
 * The finishes from each start gear. Sequences from the same gear go on from one another; one is left out, before its last
 * gear is integrated, where a bound shows that it loses more than `sameTimeS` to another.
 */
export function finishesTogether(gears: Gears, course: Course, startGears: readonly number[]): Finish[] {
	const shared = new SharedSequences(gears, course);
	for (const first of startGears) shared.addFrom(first);
	return shared.finishes;
}

class SharedSequences {
	readonly finishes: Finish[] = [];
	readonly #gears: Gears;
	readonly #course: Course;
	readonly #references: (Reference | undefined)[] = [];
	/** Whoever takes longer cannot be chosen. */
	#boundS = Number.POSITIVE_INFINITY;

	constructor(gears: Gears, course: Course) {
		this.#gears = gears;
		this.#course = course;
	}

	addFrom(first: number): void {
		if (this.#leastFromStartS(first) > this.#boundS) return;
		let entered: readonly Entry[] = [];
		let from = atExit(this.#course);
		for (let gear = first; ; gear++) {
			if (this.#leastTotalS(gear, from) <= this.#boundS) this.#finish(first, entered, from);
			if (gear === this.#course.highestGear) return;
			const next = shifted(this.#gears, this.#course, gear, from, this.#carry);
			if (next === undefined) return;
			entered = [...entered, next];
			from = next;
		}
	}

	/** A bound below the time of every sequence from a gear. */
	#leastFromStartS(first: number): number {
		if (this.#boundS === Number.POSITIVE_INFINITY) return 0;
		const {exitMps, lengthM, highestGear} = this.#course;
		let most = 0;
		for (let gear = first; gear <= highestGear; gear++) most = Math.max(most, this.#gears.mostMps2(gear, exitMps));
		return leastTimeS(lengthM, exitMps, most);
	}

	readonly #carry: Carry = (gear, fromMps, goal) => this.#gears.carry(gear, fromMps, goal);

	#finish(first: number, entered: readonly Entry[], from: Place): void {
		const finish = finished(this.#gears, this.#course, first, entered, this.#carry);
		if (finish === undefined) return;
		this.finishes.push(finish);
		this.#boundS = Math.min(this.#boundS, finish.timeS + this.#gears.vehicle.sameTimeS);
		this.#references[first + entered.length] ??= {from, finish};
	}

	/**
	 * A bound below the whole time of a run that is in a gear at a place: where it comes by the speed at which a finished run
	 * was in the same gear, it is later by their difference, and for what it has less to go it saves no more time than the
	 * finished run took at the lowest speed there. 0 where nothing is known.
	 */
	#leastTotalS(gear: number, from: Place): number {
		const reference = this.#references[gear];
		if (reference === undefined || from.speedMps > reference.from.speedMps) return 0;
		const {speedMps, distanceM, timeS} = reference.from;
		const goal = {distanceM: this.#course.lengthM - from.distanceM, toMps: speedMps, braking: undefined};
		const run = this.#carry(gear, from.speedMps, goal);
		if (run.why !== 'speed') return 0;
		const ahead = Math.max(0, from.distanceM + run.distanceM - distanceM);
		return (
			reference.finish.timeS + (from.timeS + run.timeS - timeS) - ahead / lowestMps(this.#course, reference, ahead)
		);
	}
}

/** The lowest speed at which the finished run was on its last meters of full throttle: a car that gains speed is never below an earlier one. */
function lowestMps(course: Course, {from, finish}: Reference, lastM: number): number {
	const before = finish.shortlyBefore;
	if (before === undefined || before.speedMps < from.speedMps) return from.speedMps;
	const brakesM = brakingDistanceM(before.speedMps, brakingOf(course));
	const room = course.lengthM - from.distanceM - before.distanceM - brakesM;
	return lastM <= room ? before.speedMps : from.speedMps;
}
