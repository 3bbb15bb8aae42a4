/** Lap times of many gearbox sets with one pair, each straight run once for all the sets that are alike in its gears. */
import type {Gearbox, RackPair} from '../drivetrain/car.ts';
import type {RoadGears} from '../drivetrain/road-gears.ts';
import type {Course, GearTrain, Vehicle} from '../drivetrain/straight.ts';
import {speedAtRpmMps} from '../drivetrain/tire.ts';
import {candidateOf} from '../planning/candidates.ts';
import type {Place} from '../planning/conditions.ts';
import type {Plan} from '../planning/plan.ts';
import {SharedChains, type StraightTime} from './shared-chains.ts';

/** By the number of the set. */
export type SetTimes = {
	/** A lap, as a row's `fastestS`; infinite where the car does not come round, or no straight has a length. */
	readonly lapS: Float64Array;
	/** 1 where a straight passes the limit or comes to the limiter, which fails the row whatever else is checked. */
	readonly fails: Uint8Array;
};

/**
 * The sets' lap times with a pair. What a straight takes depends only on the gears from the lowest that may start on it to the
 * highest that is allowed there: sets alike in these share its time, and sets that begin alike share the way so far. So nothing is left out and nothing is estimated.
 */
export class SetTimer {
	readonly #plan: Plan;
	readonly #sets: readonly Gearbox[];
	/** Of every set, for each gear, the number of its ratio among those of the gear. */
	readonly #options: readonly (readonly number[])[];
	readonly #groups = new Map<string, Groups>();

	/** All sets have the same number of gears. */
	constructor(plan: Plan, sets: readonly Gearbox[]) {
		this.#plan = plan;
		this.#sets = sets;
		const ratios = sets[0]?.ratios.map((_, place) => [...new Set(sets.map(set => set.ratios[place]!))]) ?? [];
		this.#options = sets.map(set => set.ratios.map((ratio, place) => ratios[place]!.indexOf(ratio)));
	}

	/** Place by place, for a caller that has other things to do in between. */
	*times(pair: RackPair): Generator<void, SetTimes, void> {
		const trains = this.#sets.map(set => candidateOf(this.#plan.car, pair, set).train);
		const gearsOf = this.#plan.roads.gearsInCommon();
		const isTimed = this.#plan.track.straights.some(({lengthM}) => lengthM !== undefined);
		const lapS = new Float64Array(this.#sets.length).fill(isTimed ? 0 : Number.POSITIVE_INFINITY);
		const fails = new Uint8Array(this.#sets.length);
		for (const i of this.#plan.runOrder) {
			const {places, vehicle, weight} = this.#plan.conditions[i]!;
			for (const place of places.filter(({straight}) => straight.lengthM !== undefined)) {
				this.#add(place, vehicle, weight, trains, gearsOf, {lapS, fails});
				yield;
			}
		}
		return {lapS, fails};
	}

	#add(
		place: Place,
		vehicle: Vehicle,
		weight: number,
		trains: readonly GearTrain[],
		gearsOf: (train: GearTrain, road: number) => RoadGears,
		{lapS, fails}: SetTimes,
	): void {
		const course = place.courses.get(this.#sets[0]!.ratios.length);
		if (course === undefined) {
			lapS.fill(Number.POSITIVE_INFINITY);
			return;
		}
		const {groupOf, firsts} = this.#grouped(lowestStart(course, vehicle, trains), course.highestGear);
		const chains = new SharedChains(course, vehicle.sameTimeS);
		const runs = firsts.map(set => chains.time(this.#options[set]!, () => gearsOf(trains[set]!, place.road)));
		for (let set = 0; set < groupOf.length; set++) addRun(runs[groupOf[set]!], weight, set, lapS, fails);
	}

	/** Sets alike from one gear to another. */
	#grouped(lowest: number, highest: number): Groups {
		const key = `${lowest} ${highest}`;
		const known = this.#groups.get(key) ?? groupsOf(this.#sets, lowest, highest);
		this.#groups.set(key, known);
		return known;
	}
}

function addRun(run: StraightTime | undefined, weight: number, set: number, lapS: Float64Array, fails: Uint8Array) {
	if (run === undefined) lapS[set] = Number.POSITIVE_INFINITY;
	else lapS[set]! += weight * run.fastestS;
	if (run?.pastTop !== false) fails[set] = 1;
}

/**
 * The lowest gear in which some set may start on the straight: in those below, the exit speed is above the highest shift RPM
 * even with the tallest gear on hand. A gear that no run starts in is never used, since gears only rise.
 */
function lowestStart(course: Course, vehicle: Vehicle, trains: readonly GearTrain[]): number {
	if (course.startGear !== undefined) return course.startGear;
	for (let gear = course.lowestGear; gear < course.highestGear; gear++) {
		const tallest = trains.reduce((least, {overall}) => Math.min(least, overall[gear - 1]!), Number.POSITIVE_INFINITY);
		const {rolloutM, growth, slip, shiftCapRpm} = vehicle;
		if (course.exitMps <= speedAtRpmMps(shiftCapRpm, tallest, rolloutM, growth, slip)) return gear;
	}
	return course.highestGear;
}

/** Of every set the number of its group, and of every group its first set. */
type Groups = {readonly groupOf: Int32Array; readonly firsts: readonly number[]};

function groupsOf(sets: readonly Gearbox[], lowest: number, highest: number): Groups {
	const numbers = new Map<string, number>();
	const firsts: number[] = [];
	const groupOf = Int32Array.from(sets, ({ratios}, i) => {
		const key = ratios.slice(lowest - 1, highest).join(' ');
		const known = numbers.get(key);
		if (known !== undefined) return known;
		numbers.set(key, firsts.length);
		return firsts.push(i) - 1;
	});
	return {groupOf, firsts};
}
