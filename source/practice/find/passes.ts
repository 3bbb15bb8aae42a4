/** Full-throttle runs measured: speeds, engine speeds and gears at both ends, time and length. */
import {medianLine} from '../fit/robust.ts';
import type {Channels} from './channels.ts';
import type {Pass} from './findings.ts';
import {sampleState} from './findings.ts';
import type {Stretch} from './full-throttle.ts';
import type {InGear} from './in-gear.ts';
import type {Pace, Steps} from './steps.ts';

/** What a pass is by itself; its lap and straight come later. */
export type Measured = Omit<Pass, 'lap' | 'straight' | 'good'>;

/** The ends are read off a line through so much of the log, by at most so many samples. */
const edgeS = 0.5;
const mostSamples = 24;
const fewestSamples = 3;

export function* measured(
	channels: Channels,
	state: Uint8Array | undefined,
	stretches: readonly Stretch[],
	gearsIn: readonly (readonly InGear[])[],
): Steps<Measured[]> {
	const passes: Measured[] = [];
	for (const [i, stretch] of stretches.entries())
		passes.push(yield* measure(channels, state, stretch, stretches[i - 1]?.to, gearsIn[i] ?? []));
	return passes;
}

function* measure(
	channels: Channels,
	state: Uint8Array | undefined,
	{from, to}: Stretch,
	endBefore: number | undefined,
	gears: readonly InGear[],
): Steps<Measured> {
	const {run, smoothMps, middleRpm, pace} = channels;
	const endMps = edge(channels, run.speedMps, to, from, -1) ?? smoothMps[to]!;
	const last = gears.at(-1);
	const inLast = last === undefined || last.to < to - 2 ? from : Math.max(from, last.from);
	return {
		from,
		to,
		startS: run.timeS[from]!,
		startM: run.distanceM[from]!,
		exitMps: edge(channels, run.speedMps, from, to, 1) ?? smoothMps[from]!,
		endMps,
		minimumMps: endBefore === undefined ? undefined : yield* lowestIn(smoothMps, endBefore, from, pace),
		highestMps: Math.max(endMps, yield* highestIn(smoothMps, from, to, pace)),
		highestRpm: known(yield* highestIn(middleRpm, from, to, pace)),
		endRpm: edge(channels, run.rpm, to, inLast, -1),
		exitGear: gears[0]?.gear,
		endGear: last?.gear,
		timeS: run.timeS[to]! - run.timeS[from]!,
		lengthM: run.distanceM[to]! - run.distanceM[from]!,
		spinS: yield* spent(run.timeS, state, {from, to}, sampleState.spin, pace),
		limiterM: yield* spent(run.distanceM, state, {from, to}, sampleState.limiter, pace),
	};
}

/**
 * The value at sample `at` by a line of medians through the samples from there on, toward `limit`. Too few within reach: the
 * sample's own value; undefined where it is a gap.
 */
function edge(
	{run: {timeS}, rateHz}: Channels,
	values: Float32Array,
	at: number,
	limit: number,
	way: 1 | -1,
): number | undefined {
	const reach = Math.min(Math.abs(limit - at), Math.floor(edgeS * rateHz));
	const every = Math.max(1, Math.ceil(reach / mostSamples));
	const [x, y]: [number[], number[]] = [[], []];
	for (let off = 0; off <= reach; off += every) {
		const i = at + way * off;
		if (Number.isNaN(values[i]!)) continue;
		x.push(timeS[i]! - timeS[at]!);
		y.push(values[i]!);
	}
	if (x.length >= fewestSamples) return medianLine(x, y).at(0);
	return Number.isNaN(values[at]!) ? undefined : values[at]!;
}

/** How much of time or distance went by in a state. */
function* spent(
	along: Float64Array,
	state: Uint8Array | undefined,
	{from, to}: Stretch,
	which: number,
	pace: Pace,
): Steps<number> {
	if (state === undefined) return 0;
	let sum = 0;
	for (let i = from; i < to; i++) {
		if (pace.isDue()) yield;
		if (state[i] === which) sum += along[i + 1]! - along[i]!;
	}
	return sum;
}

function* lowestIn(values: Float32Array, from: number, to: number, pace: Pace): Steps<number> {
	let lowest = Number.POSITIVE_INFINITY;
	for (let i = from; i <= to; i++) {
		if (pace.isDue()) yield;
		if (values[i]! < lowest) lowest = values[i]!;
	}
	return lowest;
}

const known = (value: number) => (Number.isNaN(value) ? undefined : value);

/** NaN where nothing was read. */
export function* highestIn(values: Float32Array, from: number, to: number, pace: Pace): Steps<number> {
	let highest = Number.NEGATIVE_INFINITY;
	for (let i = from; i <= to; i++) {
		if (pace.isDue()) yield;
		if (values[i]! > highest) highest = values[i]!;
	}
	return highest === Number.NEGATIVE_INFINITY ? Number.NaN : highest;
}
