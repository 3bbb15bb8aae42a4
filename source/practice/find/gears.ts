/** The gear at each sample, by the ratio of engine speed to road speed. */
import type {Channels} from './channels.ts';
import {samplesIn} from './channels.ts';
import type {Mounted} from './findings.ts';
import type {Stretch} from './full-throttle.ts';
import type {Pace, Steps} from './steps.ts';

/** Where each gear lies, by the documents' circumference: logarithms, gear 1 first. */
export type GearPlaces = {
	readonly at: readonly number[];
	/** Overall ratios of the gears. */
	readonly overall: readonly number[];
	/** How far from it counts as in gear. */
	readonly within: number;
	/** Below it, with a closed throttle: the tire does not slip then. */
	readonly below: number;
};

/** The least and the most that counts as in gear, as logarithms; four spreads of its hump between. */
const leastWithin = 0.008;
const mostWithin = 0.02;
const spreads = 4;
/** Of the distance to the next gear. */
const gapShare = 0.35;
/** A gear held for less is a stray reading. */
const shortestS = 0.06;

export function gearPlaces({best, clusters}: Pick<Mounted, 'best' | 'clusters'>, slip: number): GearPlaces | undefined {
	if (best === undefined) return undefined;
	const shift = Math.log(best.circumferenceFactor);
	const {overall} = best.candidate.train;
	const at = overall.map(ratio => Math.log(ratio) - shift);
	const gap = Math.min(
		...at
			.slice(1)
			.map((x, i) => at[i]! - x)
			.filter(x => x > 0),
	);
	const spread = Math.max(0, ...clusters.map(cluster => cluster.spread));
	const within = Math.min(gapShare * gap, Math.max(leastWithin, Math.min(mostWithin, spreads * spread)));
	return {at, overall, within, below: Math.min(gapShare * gap, within + Math.log(1 + slip))};
}

/** Counted from 1; 0 where no gear fits. `stretches`: at full throttle, where no tire slips less than it should. */
export function* gearsOf(
	{overall, rateHz, pace}: Channels,
	places: GearPlaces,
	stretches: readonly Stretch[],
): Steps<Uint8Array> {
	const {at, within, below} = places;
	const gears = new Uint8Array(overall.length);
	let next = 0;
	for (let i = 0; i < overall.length; i++) {
		if (pace.isDue()) yield;
		while (next < stretches.length && stretches[next]!.to < i) next++;
		const low = next < stretches.length && stretches[next]!.from <= i ? within : below;
		const x = Math.log(overall[i]!);
		for (let gear = 0; gear < at.length; gear++) {
			const off = x - at[gear]!;
			if (off <= within && off >= -low) {
				gears[i] = gear + 1;
				break;
			}
		}
	}
	yield* dropShort(gears, samplesIn(shortestS, rateHz), pace);
	return gears;
}

/** Samples of another kind that a stretch in one gear may have in it. */
const mostStray = 2;

/** Stretches in one gear that have fewer than `least` samples become 0: strays that fell on a ratio. */
function* dropShort(gears: Uint8Array, least: number, pace: Pace): Steps<void> {
	let [from, last, count] = [0, -1, 0];
	for (let i = 0; i <= gears.length; i++) {
		if (pace.isDue()) yield;
		const gear = gears[i] ?? 0;
		if (gear === 0 && i < gears.length) continue;
		if (last >= 0 && gear === gears[last] && i - last <= mostStray + 1) [last, count] = [i, count + 1];
		else {
			if (last >= 0 && count < least) gears.fill(0, from, last + 1);
			[from, last, count] = [i, i, 1];
		}
	}
}
