/** Ranks in slices, so that keys are answered while a long rack is still being run. */
import {type Ranked, rankSteps} from '../../planning/rank-rack.ts';
import type {Outcome} from '../../planning/results.ts';
import {runAlone} from '../../planning/run-alone.ts';
import {RunMemory} from '../../planning/run-memory.ts';
import type {Progress} from '../../planning/run-rack.ts';
import {type Answer, type Inputs, rankedIn, readBoth, wrongFromFault} from './answer.ts';

export type Clock = {
	/** Milliseconds; only differences count. */
	now(): number;
	/** Calls back when keys and drawing have had their turn; the result takes it back. */
	later(act: () => void): () => void;
};

/** What is done within these is shown in the same frame as the key: as long as a person takes it to happen at once. */
const firstSliceMs = 100;
/** Short enough that no key waits noticeably. */
const sliceMs = 12;
/** A drawing costs as much as a slice: progress is told no more often than this. */
const tellMs = 120;

const noProgress: Progress = {done: 0, total: 0};

type Steps = Generator<Progress, Outcome<Ranked>, void>;

export class Ranker {
	#answer: Answer;
	readonly #clock: Clock;
	readonly #changed: () => void;
	#cancel: (() => void) | undefined;
	readonly #memory = new RunMemory();
	#told = 0;
	#inputs: Inputs | undefined;

	constructor(clock: Clock, changed: () => void) {
		this.#clock = clock;
		this.#changed = changed;
		this.#answer = {is: 'working', progress: noProgress, first: undefined, before: undefined};
	}

	get answer(): Answer {
		return this.#answer;
	}

	/** Only the pair in the car at once; the rest once that has been drawn. */
	start(inputs: Inputs): void {
		this.#begin(inputs, 0);
	}

	/** Ranks anew: at once as far as a frame allows. */
	rank(inputs: Inputs): void {
		this.#begin(inputs, firstSliceMs);
	}

	/** Leaves what is under way; whether there was anything. */
	stop(): boolean {
		if (this.#answer.is !== 'working') return false;
		this.#cancel?.();
		this.#cancel = undefined;
		const {progress, before} = this.#answer;
		this.#answer = {is: 'stopped', progress, before};
		return true;
	}

	#begin(inputs: Inputs, budgetMs: number): void {
		this.#cancel?.();
		this.#cancel = undefined;
		const before = this.#isOfSame(inputs) ? rankedIn(this.#answer) : undefined;
		this.#inputs = inputs;
		const read = readBoth(inputs.documents);
		if (!read.ok) {
			this.#answer = {is: 'faulty', wrong: read.wrong};
			return;
		}
		const first = before === undefined ? runAlone(read.car, read.track, {}, inputs) : undefined;
		this.#answer = {is: 'working', progress: noProgress, first: first?.ok ? first.value : undefined, before};
		this.#told = this.#clock.now();
		this.#work(rankSteps(read.car, read.track, {situation: inputs.situation}, this.#memory), budgetMs);
	}

	/** What was ranked of another track or car would only mislead. */
	#isOfSame({documents: {track, car}}: Inputs): boolean {
		return this.#inputs?.documents.track === track && this.#inputs.documents.car === car;
	}

	/** One slice; what is left comes later. */
	#work(steps: Steps, budgetMs: number): void {
		if (budgetMs > 0 && this.#slice(steps, budgetMs)) return;
		this.#cancel = this.#clock.later(() => {
			this.#work(steps, sliceMs);
			this.#tell();
		});
	}

	/** At least one step; whether it was the last. */
	#slice(steps: Steps, budgetMs: number): boolean {
		const end = this.#clock.now() + budgetMs;
		do {
			const step = steps.next();
			if (step.done) {
				this.#answer = step.value.ok
					? {is: 'ready', ranked: step.value.value}
					: {is: 'faulty', wrong: step.value.faults.map(wrongFromFault)};
				return true;
			}
			if (this.#answer.is === 'working') this.#answer = {...this.#answer, progress: step.value};
		} while (this.#clock.now() < end);
		return false;
	}

	#tell(): void {
		const now = this.#clock.now();
		if (this.#answer.is === 'working' && now - this.#told < tellMs) return;
		this.#told = now;
		this.#changed();
	}
}
