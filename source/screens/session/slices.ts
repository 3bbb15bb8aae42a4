/** Works through steps in slices, so that keys are answered and drawn in between. */
import type {Clock} from './ranker.ts';

/** Short enough that no key waits noticeably. */
const sliceMs = 12;

export class Slices {
	readonly #clock: Clock;
	#cancel: (() => void) | undefined;

	constructor(clock: Clock) {
		this.#clock = clock;
	}

	/**
	 * Leaves what is under way and begins this: the first slice at once, of so many milliseconds, the rest later. `onStep` gets what
	 * the steps tell, `onEnd` their answer and whether it was there at once.
	 */
	start<Told, T>(
		steps: Generator<Told, T, void>,
		firstMs: number,
		onStep: (told: Told) => void,
		onEnd: (answer: T, atOnce: boolean) => void,
	): void {
		this.stop();
		const slice = (budgetMs: number, atOnce: boolean) => {
			const end = this.#clock.now() + budgetMs;
			do {
				const step = steps.next();
				if (step.done) return onEnd(step.value, atOnce);
				onStep(step.value);
			} while (this.#clock.now() < end);
			this.#cancel = this.#clock.later(() => {
				this.#cancel = undefined;
				slice(sliceMs, false);
			});
		};
		slice(firstMs, true);
	}

	/** Whether there was anything to leave. */
	stop(): boolean {
		const wasUnderWay = this.#cancel !== undefined;
		this.#cancel?.();
		this.#cancel = undefined;
		return wasUnderWay;
	}
}
