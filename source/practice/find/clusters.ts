/** The humps of the overall ratio at full throttle: one a gear that was used. */
import {median, robustSd} from '../fit/robust.ts';
import type {Channels} from './channels.ts';
import type {Stretch} from './full-throttle.ts';
import {everyOf} from './smooth.ts';
import type {Steps} from './steps.ts';

/** A hump: middle, robust standard deviation of the logarithm, samples within. */
export type Hump = {
	readonly overall: number;
	readonly spread: number;
	readonly samples: number;
	/** What the gear column says in most of its samples; undefined without one. */
	readonly logged: number | undefined;
};

/** Bins of the logarithm of the ratio: 0.2 % each, from 1 to 40. */
const binWidth = 0.002;
const bins = Math.ceil(Math.log(40) / binWidth);
/** A hump reaches so far to each side: growth and rollout off by a little spread it, the next gear is further. */
const reach = 0.015;
/** Humps of gears are at least this far apart. */
const apart = 0.04;
/** Of the samples at full throttle, and in number, what makes a hump. */
const leastShare = 0.01;
const leastSamples = 5;

export type Humps = {
	/** By falling number of samples. */
	readonly humps: readonly Hump[];
	/** Root mean square of the speeds at full throttle. */
	readonly speedMps: number;
};

export function* humpsOf(channels: Channels, stretches: readonly Stretch[]): Steps<Humps> {
	const {overall, smoothMps, pace} = channels;
	const counts = new Float64Array(bins);
	let [total, squares] = [0, 0];
	for (const {from, to} of stretches) {
		for (let i = from; i <= to; i++) {
			if (pace.isDue()) yield;
			const bin = Math.floor(Math.log(overall[i]!) / binWidth);
			if (!(bin >= 0 && bin < bins)) continue;
			counts[bin]! += 1;
			total++;
			squares += smoothMps[i]! ** 2;
		}
	}
	const centers = centersOf(counts, Math.max(leastSamples, leastShare * total));
	const humps: Hump[] = [];
	for (const center of centers) {
		const hump = yield* humpAt(channels, stretches, center);
		if (hump.samples >= leastSamples) humps.push(hump);
	}
	return {humps, speedMps: total === 0 ? 0 : Math.sqrt(squares / total)};
}

/** The fullest window, then the fullest of what is left further off, and so on; as logarithms. */
function centersOf(counts: Float64Array, least: number): number[] {
	const half = Math.round(reach / binWidth);
	const sums = new Float64Array(bins + 1);
	for (let i = 0; i < bins; i++) sums[i + 1] = sums[i]! + counts[i]!;
	const within = (bin: number) => sums[Math.min(bins, bin + half + 1)]! - sums[Math.max(0, bin - half)]!;
	const order = Array.from(counts.keys()).filter(bin => within(bin) >= least);
	order.sort((one, other) => within(other) - within(one));
	const centers: number[] = [];
	for (const bin of order) {
		const at = (bin + 0.5) * binWidth;
		if (centers.every(center => Math.abs(center - at) >= apart) && standsOut(counts, bin)) centers.push(at);
	}
	return centers;
}

/** At least half of what lies in and beside the window lies in it: the tail of a wheelspin or of shifts is flat. */
function standsOut(counts: Float64Array, bin: number): boolean {
	const half = Math.round(reach / binWidth);
	let [inside, beside] = [0, 0];
	for (let i = bin - 2 * half; i <= bin + 2 * half; i++) {
		const count = counts[i] ?? 0;
		if (Math.abs(i - bin) <= half) inside += count;
		else beside += count;
	}
	return inside >= 2 * beside;
}

function* humpAt({overall, run, pace}: Channels, stretches: readonly Stretch[], center: number): Steps<Hump> {
	const column = run.gear;
	const inside: number[] = [];
	const counts = new Map<number, number>();
	for (const {from, to} of stretches) {
		for (let i = from; i <= to; i++) {
			if (pace.isDue()) yield;
			const logarithm = Math.log(overall[i]!);
			if (!(Math.abs(logarithm - center) <= reach)) continue;
			inside.push(logarithm);
			if (column !== null) counts.set(column[i]!, (counts.get(column[i]!) ?? 0) + 1);
		}
	}
	const every = everyOf(inside.length);
	const some = every === 1 ? inside : inside.filter((_, i) => i % every === 0);
	const middle = median(some);
	const [most] = [...counts].sort(([, many], [, few]) => few - many);
	const logged = most !== undefined && most[0] >= 1 && 2 * most[1] > inside.length ? most[0] : undefined;
	return {overall: Math.exp(middle), spread: robustSd(some, middle), samples: inside.length, logged};
}
