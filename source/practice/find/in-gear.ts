/** A full-throttle run cut into stretches of one gear, and what lies between them. */
import type {Stretch} from './full-throttle.ts';
import type {Pace, Steps} from './steps.ts';

export type InGear = Stretch & {readonly gear: number};

/** Samples without a gear between two stretches of the same gear that are passed over. */
const mostStray = 2;

/** The stretches in one gear, in order; strays of a sample or two inside one do not end it. */
export function* inGear(gears: Uint8Array, {from, to}: Stretch, pace: Pace): Steps<InGear[]> {
	const stretches: {from: number; to: number; readonly gear: number}[] = [];
	for (let i = from; i <= to; i++) {
		if (pace.isDue()) yield;
		const gear = gears[i]!;
		if (gear === 0) continue;
		const last = stretches.at(-1);
		if (last?.gear === gear && i - last.to <= mostStray + 1) last.to = i;
		else stretches.push({from: i, to: i, gear});
	}
	return stretches;
}

/** What lies before, between and after the stretches, with the stretches on both sides. */
export type Between = Stretch & {readonly before: InGear | undefined; readonly after: InGear | undefined};

export function between({from, to}: Stretch, stretches: readonly InGear[]): Between[] {
	const gaps: Between[] = [];
	for (let i = 0; i <= stretches.length; i++) {
		const [before, after] = [stretches[i - 1], stretches[i]];
		const gap = {from: before === undefined ? from : before.to + 1, to: after === undefined ? to : after.from - 1};
		if (gap.to >= gap.from || (before !== undefined && after !== undefined)) gaps.push({...gap, before, after});
	}
	return gaps;
}
