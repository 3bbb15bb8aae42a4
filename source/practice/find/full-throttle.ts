/** Stretches at full throttle: from the throttle where it is logged, else from the speed's rise. */
import type {Channels} from './channels.ts';
import {bridged, roughQuantile} from './smooth.ts';
import type {Steps} from './steps.ts';

/** First and last sample. */
export type Stretch = {readonly from: number; readonly to: number};

export type FullThrottle = {
	readonly stretches: readonly Stretch[];
	/** `speed`: there is no throttle that can be used, or it is held down all lap. */
	readonly by: 'throttle' | 'speed';
};

/** Of the highest throttle in the log: what counts as full. */
const fullShare = 0.95;
/** A throttle that never passes this, or moves less than this, tells nothing. */
const leastFull = 0.5;
const leastMove = 0.2;
/** A lift shorter than this is a shift or a stray reading. */
const longestLiftS = 0.35;
const shortestS = 0.8;

/** `lapM`: of the lap, where known; a stretch as long as that has no lift in it to tell a straight by. */
export function* fullThrottle(channels: Channels, lapM: number | undefined): Steps<FullThrottle> {
	const {run} = channels;
	const stretches = run.throttle === null ? undefined : yield* byThrottle(channels, run.throttle);
	const longestM = Math.max(0, ...(stretches ?? []).map(({from, to}) => run.distanceM[to]! - run.distanceM[from]!));
	if (stretches !== undefined && longestM < (lapM ?? Number.POSITIVE_INFINITY)) return {stretches, by: 'throttle'};
	return {stretches: yield* bySpeed(channels), by: 'speed'};
}

function* byThrottle(channels: Channels, logged: Float32Array): Steps<Stretch[] | undefined> {
	const throttle = yield* bridged(logged, channels.pace);
	const full = roughQuantile(throttle, 0.995);
	if (!(full >= leastFull) || full - roughQuantile(throttle, 0.02) < leastMove) return undefined;
	const stretches: Stretch[] = [];
	let from = -1;
	for (let i = 0; i <= throttle.length; i++) {
		if (channels.pace.isDue()) yield;
		const on = i < throttle.length && throttle[i]! >= fullShare * full;
		if (on && from < 0) from = i;
		if (!on && from >= 0) {
			stretches.push({from, to: i - 1});
			from = -1;
		}
	}
	return longEnough(channels, joined(channels, stretches));
}

function joined({run: {timeS}, rateHz}: Channels, stretches: readonly Stretch[]): Stretch[] {
	const whole: Stretch[] = [];
	for (const stretch of stretches) {
		const last = whole.at(-1);
		// A sample each side belongs to the stretches: at one sample a second any lift is longer.
		if (last !== undefined && timeS[stretch.from]! - timeS[last.to]! < longestLiftS + 1 / rateHz && rateHz > 2) {
			whole[whole.length - 1] = {from: last.from, to: stretch.to};
		} else whole.push(stretch);
	}
	return whole;
}

function longEnough({run: {timeS}}: Channels, stretches: readonly Stretch[]): Stretch[] {
	return stretches.filter(({from, to}) => timeS[to]! - timeS[from]! >= shortestS);
}

/** Of the range of speeds in the log, what a rise must come to; and the least that counts. */
const riseShare = 0.12;
const leastRiseMps = 1.2;
/** Of the hardest acceleration on a rise: where full throttle is taken to begin. */
const beginShare = 0.6;

/** From each low of the speed to the next high, where the acceleration has set in. */
function* bySpeed(channels: Channels): Steps<Stretch[]> {
	const {smoothMps: v} = channels;
	const range = roughQuantile(v, 0.98) - roughQuantile(v, 0.1);
	const rise = Math.max(leastRiseMps, riseShare * range);
	const stretches: Stretch[] = [];
	let [low, high, rising] = [0, 0, false];
	for (let i = 1; i < v.length; i++) {
		if (channels.pace.isDue()) yield;
		if (rising && v[i]! > v[high]!) high = i;
		if (!rising && v[i]! < v[low]!) low = i;
		if (rising && v[i]! < v[high]! - rise) {
			stretches.push({from: yield* onset(channels, low, high), to: high});
			[rising, low] = [false, i];
		} else if (!rising && v[i]! > v[low]! + rise) [rising, high] = [true, i];
	}
	if (rising) stretches.push({from: yield* onset(channels, low, high), to: high});
	return longEnough(channels, stretches);
}

/** The first sample of a rise whose acceleration, over a quarter of a second, comes near the hardest. */
function* onset({smoothMps: v, run: {timeS}, rateHz, pace}: Channels, low: number, high: number): Steps<number> {
	const span = Math.max(1, Math.round(rateHz / 4));
	const hardness = (i: number) => (v[i + span]! - v[i]!) / (timeS[i + span]! - timeS[i]!);
	let hardest = 0;
	for (let i = low; i + span <= high; i++) {
		if (pace.isDue()) yield;
		hardest = Math.max(hardest, hardness(i));
	}
	for (let i = low; i + span <= high; i++) {
		if (pace.isDue()) yield;
		if (hardness(i) >= beginShare * hardest) return i;
	}
	return low;
}
