/** One straight for many gearbox sets: sequences of gears that begin alike are carried on from where they part. */
import {chosenOf, fastestOf} from '../drivetrain/choose-sequence.ts';
import type {RoadGears} from '../drivetrain/road-gears.ts';
import {mayStart} from '../drivetrain/run-straight.ts';
import {atExit, brakingOf, type Carry, type Entry, type Finish, finished, shifted} from '../drivetrain/sequence.ts';
import type {Course} from '../drivetrain/straight.ts';
import {brakingDistanceM} from '../drivetrain/travel.ts';

/** What of a run decides between sets. */
export type StraightTime = {
	readonly fastestS: number;
	/** Whether the sequence of the tie-break comes to the limiter or above the limit. */
	readonly pastTop: boolean;
};

/** A sequence so far: where its gears were entered, how it ends in the last of them, and how it goes on by the next option. */
type Chain = {
	readonly entered: readonly Entry[];
	readonly finish: Finish | undefined;
	/** Null where the shift is not complete before the end. */
	readonly next: (Chain | null)[];
};

/** What is known of a start gear with one option. */
type Start = {
	/** By the option of the next gear: whether a run may start here. */
	readonly allowed: boolean[];
	chain: Chain | undefined;
};

/** With one pair, in one situation. */
export class SharedChains {
	readonly #course: Course;
	readonly #sameTimeS: number;
	readonly #canBrake: boolean;
	/** By the gear, then its option. */
	readonly #starts: readonly Start[][];

	constructor(course: Course, sameTimeS: number) {
		this.#course = course;
		this.#sameTimeS = sameTimeS;
		this.#canBrake = brakingDistanceM(course.exitMps, brakingOf(course)) <= course.lengthM;
		this.#starts = Array.from({length: course.highestGear + 1}, (): Start[] => []);
	}

	/**
	 * What `runStraight` says of the set: all its sequences, and the same choice among them; undefined where nothing runs. Of
	 * each gear `options` has the number of its ratio among those of the gear, from 0; the same number is the same ratio.
	 * `makeGears` gives its gears and is called only where they are not known from other sets.
	 */
	time(options: readonly number[], makeGears: () => RoadGears): StraightTime | undefined {
		if (!this.#canBrake) return undefined;
		let made: RoadGears | undefined;
		const gears = () => {
			made ??= makeGears();
			return made;
		};
		const finishes: Finish[] = [];
		for (let gear = this.#course.lowestGear; gear <= this.#course.highestGear; gear++)
			this.#collect(gear, options, gears, finishes);
		if (finishes.length === 0) return undefined;
		return {fastestS: fastestOf(finishes).timeS, pastTop: chosenOf(finishes, this.#sameTimeS).pastTop};
	}

	/** The finishes of all sequences from a gear. */
	#collect(first: number, options: readonly number[], gears: () => RoadGears, finishes: Finish[]): void {
		const starts = this.#starts[first]!;
		starts[options[first - 1]!] ??= {allowed: [], chain: undefined};
		const start = starts[options[first - 1]!]!;
		const next = first === this.#course.highestGear ? 0 : options[first]!;
		start.allowed[next] ??= mayStart(gears(), this.#course, first);
		if (!start.allowed[next]) return;
		start.chain ??= this.#chain(first, [], gears());
		let chain: Chain | null = start.chain;
		for (let gear = first; chain !== null; gear++) {
			if (chain.finish !== undefined) finishes.push(chain.finish);
			if (gear === this.#course.highestGear) return;
			const option = options[gear]!;
			if (chain.next[option] === undefined) chain.next[option] = this.#goOn(first, gear, chain, gears());
			chain = chain.next[option]!;
		}
	}

	#goOn(first: number, gear: number, chain: Chain, gears: RoadGears): Chain | null {
		const from = chain.entered.at(-1) ?? atExit(this.#course);
		const entry = shifted(gears, this.#course, gear, from, carryIn(gears));
		return entry === undefined ? null : this.#chain(first, [...chain.entered, entry], gears);
	}

	#chain(first: number, entered: readonly Entry[], gears: RoadGears): Chain {
		return {entered, finish: finished(gears, this.#course, first, entered, carryIn(gears)), next: []};
	}
}

const carryIn =
	(gears: RoadGears): Carry =>
	(gear, fromMps, goal) =>
		gears.table(gear).travel(fromMps, goal);
