/** Channels without their gaps, strays and noise: for finding where things happen, never for what is measured there. */
import {quantile} from '../fit/robust.ts';

/** Gaps bridged in a straight line; the ends are held. All 0 where there is nothing. */
export function bridged(values: Float32Array): Float32Array {
	const full = values.slice();
	let last = -1;
	for (let i = 0; i < full.length; i++) {
		if (Number.isNaN(full[i]!)) continue;
		const step = last < 0 ? 0 : (full[i]! - full[last]!) / (i - last);
		for (let j = last + 1; j < i; j++) full[j] = last < 0 ? full[i]! : full[last]! + step * (j - last);
		last = i;
	}
	full.fill(last < 0 ? 0 : full[last]!, last + 1);
	return full;
}

/** The middle one of each three in a row: single strays go. NaN where one of them is. The ends stay. */
export function middleOfThree(values: Float32Array): Float32Array {
	const middle = values.slice();
	for (let i = 1; i < values.length - 1; i++) {
		const [a, b, c] = [values[i - 1]!, values[i]!, values[i + 1]!];
		middle[i] = a + b + c - Math.max(a, b, c) - Math.min(a, b, c);
	}
	return middle;
}

/** Mean over `width` samples about each one, fewer at the ends. */
export function movingMean(values: Float32Array, width: number): Float32Array {
	const half = Math.floor(width / 2);
	if (half === 0) return values.slice();
	const sums = new Float64Array(values.length + 1);
	for (let i = 0; i < values.length; i++) sums[i + 1] = sums[i]! + values[i]!;
	return values.map((_, i) => {
		const [from, to] = [Math.max(0, i - half), Math.min(values.length, i + half + 1)];
		return (sums[to]! - sums[from]!) / (to - from);
	});
}

/** Quantile of a long channel from at most this many of its samples; NaN does not count. */
const enough = 20_000;

export function roughQuantile(values: ArrayLike<number>, share: number): number {
	const every = Math.max(1, Math.floor(values.length / enough));
	const some: number[] = [];
	for (let i = 0; i < values.length; i += every) if (!Number.isNaN(values[i]!)) some.push(values[i]!);
	return quantile(Float64Array.from(some).sort(), share);
}
