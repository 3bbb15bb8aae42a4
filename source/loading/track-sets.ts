/** All sets with all pairs at one track: their lap times at once, and a whole row with every check where one is asked for. */
import type {Gearbox, RackPair} from '../drivetrain/car.ts';
import {candidateOf} from '../planning/candidates.ts';
import type {Ground} from '../planning/checks/check.ts';
import type {Row} from '../planning/results.ts';
import {rowOf} from '../planning/row.ts';
import {runRow} from '../planning/run-row.ts';
import {SetTimer, type SetTimes} from './set-times.ts';

/** A set with a pair, by their numbers. */
export type Choice = {readonly set: number; readonly pair: number};

/** Two sets that use the same gears have the same lap time but for the order of the sum. */
const sameLap = 1e-9;

export class TrackSets {
	readonly ground: Ground;
	readonly sets: readonly Gearbox[];
	readonly pairs: readonly RackPair[];
	readonly #mayUse: readonly boolean[];
	readonly #times: SetTimes[] = [];
	readonly #rows = new Map<number, Row>();

	/** `mayUse` says of every set whether the rules allow it. */
	constructor(ground: Ground, sets: readonly Gearbox[], pairs: readonly RackPair[], mayUse: readonly boolean[]) {
		this.ground = ground;
		this.sets = sets;
		this.pairs = pairs;
		this.#mayUse = mayUse;
	}

	/** Works out the lap times in steps; how far it is, as a part of 1. */
	*timeSteps(): Generator<number, void, void> {
		const timer = new SetTimer(this.ground.plan, this.sets);
		for (const pair of this.pairs) {
			const steps = timer.times(pair);
			let step = steps.next();
			for (; !step.done; step = steps.next()) yield this.#times.length / this.pairs.length;
			this.#times.push(step.value);
		}
	}

	/** The lap of a choice; infinite where it does not come round, where the rules forbid it, and, `passing`, where it surely fails. */
	lapS({set, pair}: Choice, passing: boolean): number {
		const {lapS, fails} = this.#times[pair]!;
		return !this.#mayUse[set] || (passing && fails[set] === 1) ? Number.POSITIVE_INFINITY : lapS[set]!;
	}

	/** The row of a choice with every check. */
	row({set, pair}: Choice): Row {
		const number = pair * this.sets.length + set;
		const known = this.#rows.get(number);
		if (known !== undefined) return known;
		const {plan} = this.ground;
		const row = rowOf(runRow(plan, candidateOf(plan.car, this.pairs[pair]!, this.sets[set]!)), this.ground);
		this.#rows.set(number, row);
		return row;
	}

	/** The choices by their laps, the fastest first; those of the same lap together. */
	*byLap(passing: boolean): Generator<readonly Choice[], void, void> {
		let done = Number.NEGATIVE_INFINITY;
		for (;;) {
			const next = this.#least(passing, done);
			if (next === Number.POSITIVE_INFINITY) return;
			done = next * (1 + sameLap);
			yield this.#between(passing, next, done);
		}
	}

	/** The least lap above a bound. */
	#least(passing: boolean, above: number): number {
		let least = Number.POSITIVE_INFINITY;
		for (let pair = 0; pair < this.pairs.length; pair++) {
			for (let set = 0; set < this.sets.length; set++) {
				const lap = this.lapS({set, pair}, passing);
				if (lap > above && lap < least) least = lap;
			}
		}
		return least;
	}

	#between(passing: boolean, from: number, to: number): Choice[] {
		return this.pairs.flatMap((_, pair) =>
			this.sets.flatMap((__, set) => {
				const lap = this.lapS({set, pair}, passing);
				return lap >= from && lap <= to ? [{set, pair}] : [];
			}),
		);
	}
}
