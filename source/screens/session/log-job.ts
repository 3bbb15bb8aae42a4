/** A log that is being read and looked through: one at a time, and it can be left. */
import type {Clock} from './ranker.ts';
import {Slices} from './slices.ts';

export class LogJob {
	readonly #slices: Slices;
	#reading: AbortController | undefined;

	constructor(clock: Clock) {
		this.#slices = new Slices(clock);
	}

	get isUnderWay(): boolean {
		return this.#reading !== undefined;
	}

	/** Leaves the one before. The signal is for whoever reads; once it is aborted, what was read is not looked at. */
	begin(): AbortSignal {
		this.stop();
		this.#reading = new AbortController();
		return this.#reading.signal;
	}

	/** Looks through what was read. `onStep` and `onEnd` are not called any more once it was left. */
	lookThrough<Told, T>(
		steps: Generator<Told, T, void>,
		onStep: (told: Told) => void,
		onEnd: (answer: T) => void,
	): void {
		this.#slices.start(steps, 0, onStep, answer => {
			this.end();
			onEnd(answer);
		});
	}

	/** Nothing more comes of it. */
	end(): void {
		this.#reading = undefined;
	}

	/** Whether there was one to leave. */
	stop(): boolean {
		const wasUnderWay = this.isUnderWay;
		this.#reading?.abort();
		this.#slices.stop();
		this.end();
		return wasUnderWay;
	}
}
