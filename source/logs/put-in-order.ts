/** Samples along an axis that never falls: the clock of the log or, where it has none, its distance. */
import type {Numbers, Samples} from './samples.ts';

export type Order = {
	/** Samples without a place on the axis. */
	readonly unplaced: number;
	/** Single samples that leap back or ahead and are followed by others in order. */
	readonly outOfOrder: number;
	/** Where the axis begins anew, as values of the new axis. */
	readonly restarts: readonly number[];
};

/**
 * Rewrites the axis from 0 on and leaves out what has no place on it, in place. A single sample out of order is left out. Where
 * the axis falls and goes on from there, a new part begins: it is joined to the part before by a step as long as the last one.
 */
export function putInOrder(samples: Samples, axisName: 'time' | 'distance'): Order {
	const axis = samples.get(axisName)!;
	const restarts: number[] = [];
	let [length, unplaced, outOfOrder] = [0, 0, 0];
	// The last sample kept and the one before it in the same part, as the log has them; and what is added to this part.
	let [last, before, added, step] = [Number.NaN, Number.NaN, Number.NaN, 0];
	for (let i = 0; i < axis.length; i++) {
		const raw = axis[i]!;
		if (Number.isNaN(raw)) {
			unplaced++;
			continue;
		}
		const falls = raw < last;
		if (falls && nextKnown(axis, i) >= last) {
			outOfOrder++;
			continue;
		}
		if (falls && raw >= before) {
			// The one before it leapt ahead.
			outOfOrder++;
			length--;
			[last, before] = [before, Number.NaN];
		} else if (falls) {
			added += last + step - raw;
			restarts.push(raw + added);
			last = Number.NaN;
		}
		if (length === 0) added = -raw;
		if (raw > last) step = raw - last;
		[before, last] = [last, raw];
		if (length < i) samples.move(i, length);
		axis[length++] = raw + added;
	}
	samples.cut(length);
	return {unplaced, outOfOrder, restarts};
}

/** The next value that is there; NaN at the end. */
export function nextKnown(values: Numbers, at: number): number {
	for (let i = at + 1; i < values.length; i++) if (!Number.isNaN(values[i]!)) return values[i]!;
	return Number.NaN;
}
