/** Channels without their gaps, strays and noise: for finding where things happen, never for what is measured there. */
import {quantile} from '../fit/robust.ts';
import type {Pace, Steps} from './steps.ts';

/** Gaps bridged in a straight line; the ends are held. All 0 where there is nothing. */
export function* bridged(values: Float32Array, pace: Pace): Steps<Float32Array> {
	const full = values.slice();
	let last = -1;
	for (let i = 0; i < full.length; i++) {
		if (pace.isDue()) yield;
		if (Number.isNaN(full[i]!)) continue;
		const step = last < 0 ? 0 : (full[i]! - full[last]!) / (i - last);
		for (let j = last + 1; j < i; j++) {
			if (pace.isDue()) yield;
			full[j] = last < 0 ? full[i]! : full[last]! + step * (j - last);
		}
		last = i;
	}
	full.fill(last < 0 ? 0 : full[last]!, last + 1);
	return full;
}

/** The middle one of each three in a row: single strays go. NaN where one of them is. The ends stay. */
export function* middleOfThree(values: Float32Array, pace: Pace): Steps<Float32Array> {
	const middle = values.slice();
	for (let i = 1; i < values.length - 1; i++) {
		if (pace.isDue()) yield;
		const [a, b, c] = [values[i - 1]!, values[i]!, values[i + 1]!];
		middle[i] = a + b + c - Math.max(a, b, c) - Math.min(a, b, c);
	}
	return middle;
}

/** Mean over `width` samples about each one, fewer at the ends. */
export function* movingMean(values: Float32Array, width: number, pace: Pace): Steps<Float32Array> {
	const half = Math.floor(width / 2);
	const means = values.slice();
	if (half === 0) return means;
	const sums = new Float64Array(values.length + 1);
	for (let i = 0; i < values.length; i++) {
		if (pace.isDue()) yield;
		sums[i + 1] = sums[i]! + values[i]!;
	}
	for (let i = 0; i < values.length; i++) {
		if (pace.isDue()) yield;
		const [from, to] = [Math.max(0, i - half), Math.min(values.length, i + half + 1)];
		means[i] = (sums[to]! - sums[from]!) / (to - from);
	}
	return means;
}

/** What is told from a long channel is told from at most about this many of its samples. */
const enough = 20_000;

/** Every so many-th of a channel is enough to tell a quantile by. */
export const everyOf = (samples: number): number => Math.max(1, Math.floor(samples / enough));

/** Quantile of a long channel, roughly; NaN does not count. */
export function roughQuantile(values: ArrayLike<number>, share: number): number {
	const some: number[] = [];
	for (let i = 0; i < values.length; i += everyOf(values.length)) if (!Number.isNaN(values[i]!)) some.push(values[i]!);
	return quantile(Float64Array.from(some).sort(), share);
}
