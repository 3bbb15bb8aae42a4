/** Long work step by step: loops over samples rest now and then, for a caller that has other things to do in between. */

/** What is being looked for, as it is told to whoever waits: "Finding gears …". */
export type Sought = 'full throttle' | 'laps and straights' | 'the pair' | 'gears' | 'events';

/** Rests again and again on the way to its answer; now and then it says what it looks for next. */
export type Steps<T> = Generator<Sought | undefined, T, void>;

/** Samples that are looked at between two rests: some tenths of a millisecond. */
export const samplesAStep = 8192;

/** Counts the samples that were looked at since the last rest. One for all loops of a finding, so that short ones add up. */
export class Pace {
	#left = samplesAStep;

	/** Whether it is time to rest, now that one more sample was looked at. */
	isDue(): boolean {
		this.#left--;
		if (this.#left > 0) return false;
		this.#left = samplesAStep;
		return true;
	}
}
