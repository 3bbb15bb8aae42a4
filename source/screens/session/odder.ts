/** Works out odds in slices, after everything else has had its turn. */

import type {OneTooth} from '../../odds/one-tooth.ts';
import type {OddsAsked, OddsSoFar} from './odds-asked.ts';
import type {OddsSteps} from './odds-work.ts';
import type {Clock} from './ranker.ts';

/** Short enough that no key waits noticeably. */
const sliceMs = 10;
/** An answer and a drawing cost as much as a few slices. */
const tellMs = 250;

const nothing: OddsSoFar = {odds: undefined, matters: undefined, isDone: false};

type Work = typeof import('./odds-work.ts');
type ToothSteps = ReturnType<Work['toothOf']>;

export class Odder {
	readonly #clock: Clock;
	readonly #changed: () => void;
	#work: Work | undefined;
	#loading = false;
	#asked: OddsAsked | undefined;
	#steps: OddsSteps | undefined;
	#soFar: OddsSoFar = nothing;
	#toothRow: string | undefined;
	#toothSteps: ToothSteps;
	#tooth: OneTooth | undefined;
	#cancel: (() => void) | undefined;
	#told = 0;

	constructor(clock: Clock, changed: () => void) {
		this.#clock = clock;
		this.#changed = changed;
	}

	/** What odds need, loaded once there is something to work out; undefined until then. */
	get work(): Work | undefined {
		return this.#work;
	}

	/** What is known of what is asked; what was asked before is left if it is another. */
	soFar(asked: OddsAsked): OddsSoFar {
		const before = this.#asked;
		if (before?.ranked !== asked.ranked || before.risk !== asked.risk || before.documents !== asked.documents)
			this.#begin(asked);
		this.#later();
		return this.#soFar;
	}

	/** What one tooth of a row is worth, once it is known; worked out after the rest. */
	tooth(row: string): OneTooth | undefined {
		if (this.#toothRow !== row) {
			this.#toothRow = row;
			this.#toothSteps = undefined;
			this.#tooth = undefined;
		}
		this.#later();
		return this.#tooth;
	}

	#begin(asked: OddsAsked): void {
		this.#asked = asked;
		this.#soFar = nothing;
		this.#steps = this.#work?.workOn(asked);
		this.#toothSteps = undefined;
		this.#tooth = undefined;
		this.#toothRow = undefined;
		this.#told = this.#clock.now();
	}

	get #isIdle(): boolean {
		return this.#soFar.isDone && (this.#toothRow === undefined || this.#tooth !== undefined);
	}

	#later(): void {
		if (this.#cancel !== undefined || this.#isIdle) return;
		if (this.#work === undefined) {
			this.#load();
			return;
		}
		this.#cancel = this.#clock.later(() => {
			this.#cancel = undefined;
			this.#slice();
		});
	}

	#load(): void {
		if (this.#loading) return;
		this.#loading = true;
		void import('./odds-work.ts').then(work => {
			this.#work = work;
			if (this.#asked !== undefined) this.#steps = work.workOn(this.#asked);
			this.#later();
		});
	}

	#slice(): void {
		const end = this.#clock.now() + sliceMs;
		const wasDone = this.#soFar.isDone;
		let told: (() => OddsSoFar) | undefined;
		do {
			if (this.#soFar.isDone) this.#toothStep();
			else {
				const step = this.#steps!.next();
				if (step.done) this.#soFar = step.value;
				else told = step.value;
			}
		} while (!this.#isIdle && this.#clock.now() < end);
		const now = this.#clock.now();
		if (this.#isIdle || this.#soFar.isDone !== wasDone || now - this.#told > tellMs) {
			if (told !== undefined && !this.#soFar.isDone) this.#soFar = told();
			this.#told = now;
			this.#changed();
		}
		this.#later();
	}

	#toothStep(): void {
		this.#toothSteps ??= this.#work!.toothOf(this.#asked!, this.#toothRow!);
		const step = this.#toothSteps?.next();
		if (step === undefined || step.done) this.#tooth = step?.value ?? {of: noTooth, neighbors: []};
	}
}

const noTooth = {row: '', pairRatio: Number.NaN, timeS: null, highestRpm: null, marginRpm: null, ends: []};
