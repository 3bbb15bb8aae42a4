/** What happens under power: wheelspin, shifts, missed shifts, the limiter, and which samples are steady. */
import type {Channels} from './channels.ts';
import {sampleState} from './findings.ts';
import type {Stretch} from './full-throttle.ts';
import type {GearPlaces} from './gears.ts';
import {type Between, between, type InGear, inGear} from './in-gear.ts';
import type {Pace, Steps} from './steps.ts';

export type ShiftSeen = {
	readonly from: number;
	/** Undefined: full throttle ended first. */
	readonly into: number | undefined;
	/** Last sample in the one gear, first in the other. */
	readonly leftAt: number;
	readonly enteredAt: number;
	readonly missed: boolean;
};

export type Power = {
	readonly state: Uint8Array;
	/** One entry for each full-throttle run. */
	readonly inGear: readonly (readonly InGear[])[];
	readonly shifts: readonly (readonly ShiftSeen[])[];
};

/** After an exit, a shift or wheelspin the driveline swings; before a shift or a lift the throttle runs ahead. */
const settleS = 0.25;
const afterSpinS = 0.4;
const beforeEndS = 0.1;
/** A flare to more than this above the gear is an engine running free, not a tire spinning. */
const freeShare = 0.14;
/** An upshift in which the engine gained this much ran free; one that took this much longer than it should came late. */
const flareShare = 0.025;
const lateS = 0.35;

export function* powerOf(
	channels: Channels,
	gears: Uint8Array,
	places: GearPlaces,
	stretches: readonly Stretch[],
	shiftTimeS: number,
	limiterRpm: number,
): Steps<Power> {
	const state = new Uint8Array(gears.length);
	for (let i = 0; i < gears.length; i++) {
		if (channels.pace.isDue()) yield;
		if (gears[i]! > 0) state[i] = sampleState.inGear;
	}
	const all: InGear[][] = [];
	const shifts: ShiftSeen[][] = [];
	for (const stretch of stretches) {
		const pieces = yield* inGear(gears, stretch, channels.pace);
		const gaps = between(stretch, pieces);
		const seen: ShiftSeen[] = [];
		for (const gap of gaps) yield* markSpin(channels, state, gears, places, gap);
		for (const one of pieces) yield* markSteady(channels, state, one, stretch);
		yield* markLimiter(channels, state, stretch, limiterRpm);
		for (const gap of gaps) seen.push(...(yield* shiftIn(channels, gap, shiftTimeS)));
		all.push(pieces);
		shifts.push(seen);
	}
	return {state, inGear: all, shifts};
}

/** Samples above the gear that follows, or that goes on: the wheels spin. They take that gear. */
function* markSpin(
	channels: Channels,
	state: Uint8Array,
	gears: Uint8Array,
	places: GearPlaces,
	gap: Between,
): Steps<void> {
	const gear = gap.after?.gear;
	if (gear === undefined || (gap.before !== undefined && gap.before.gear !== gear)) return;
	const above = (i: number) => Math.log(channels.overall[i]!) - places.at[gear - 1]!;
	const highest = yield* secondHighestIn(gap, above, channels.pace);
	if (gap.before !== undefined && highest > freeShare) return;
	for (let i = gap.from; i <= gap.to; i++) {
		if (channels.pace.isDue()) yield;
		if (!(above(i) > places.within)) continue;
		state[i] = sampleState.spin;
		gears[i] = gear;
	}
}

/** The second highest: one reading alone may be astray. */
function* secondHighestIn({from, to}: Stretch, of: (i: number) => number, pace: Pace): Steps<number> {
	let [highest, second] = [Number.NEGATIVE_INFINITY, Number.NEGATIVE_INFINITY];
	for (let i = from; i <= to; i++) {
		if (pace.isDue()) yield;
		const value = of(i);
		if (value > highest) [highest, second] = [value, highest];
		else if (value > second) second = value;
	}
	return from === to ? highest : second;
}

function* markSteady({run, rateHz, pace}: Channels, state: Uint8Array, one: InGear, whole: Stretch): Steps<void> {
	const spun = state[one.from - 1] === sampleState.spin;
	const startS = run.timeS[one.from]! + (spun ? afterSpinS : settleS);
	const endS = run.timeS[one.to]! - beforeEndS;
	// At a sample a second the exit and the shift lie somewhere between two samples: the one inside is whole.
	const coarse = 1 / rateHz > settleS;
	for (let i = one.from; i <= one.to; i++) {
		if (pace.isDue()) yield;
		const timeS = run.timeS[i]!;
		const inside = coarse ? i > whole.from || i > one.from : timeS >= startS && timeS <= endS;
		if (state[i] === sampleState.inGear && inside) state[i] = sampleState.steady;
	}
}

/** Of the limiter's RPM: how far about it the engine is taken to be held. */
const limiterBand = 0.006;
/** For so long without getting faster by more than a share. */
const heldS = 0.3;
const heldShare = 0.002;

function* markLimiter(
	{run: {timeS}, middleRpm, pace}: Channels,
	state: Uint8Array,
	{from, to}: Stretch,
	limiterRpm: number,
): Steps<void> {
	const near = (i: number) => Math.abs(middleRpm[i]! / limiterRpm - 1) <= limiterBand;
	for (let i = from; i <= to; i++) {
		if (pace.isDue()) yield;
		if (!near(i)) continue;
		let last = i;
		while (last < to && near(last + 1)) {
			if (pace.isDue()) yield;
			last++;
		}
		const third = Math.max(1, Math.floor((last - i + 1) / 3));
		const begin = yield* meanOf(middleRpm, i, i + third - 1, pace);
		const rose = (yield* meanOf(middleRpm, last - third + 1, last, pace)) - begin;
		if (timeS[last]! - timeS[i]! >= heldS && rose <= heldShare * limiterRpm)
			state.fill(sampleState.limiter, i, last + 1);
		i = last;
	}
}

function* meanOf(values: Float32Array, from: number, to: number, pace: Pace): Steps<number> {
	let sum = 0;
	for (let i = from; i <= to; i++) {
		if (pace.isDue()) yield;
		sum += values[i]!;
	}
	return sum / (to - from + 1);
}

function* shiftIn({run, rateHz, middleRpm, pace}: Channels, gap: Between, shiftTimeS: number): Steps<ShiftSeen[]> {
	const {before, after} = gap;
	if (before === undefined) return [];
	const flare = (yield* secondHighestIn(gap, i => middleRpm[i]!, pace)) / run.rpm[before.to]! - 1;
	if (after === undefined) {
		const ran = flare > flareShare && run.timeS[gap.to]! - run.timeS[gap.from]! > shiftTimeS;
		return ran ? [{from: before.gear, into: undefined, leftAt: before.to, enteredAt: gap.to, missed: true}] : [];
	}
	if (after.gear < before.gear) return [];
	const tookS = run.timeS[after.from]! - run.timeS[before.to]! - 1 / rateHz;
	const late = tookS > shiftTimeS + lateS + 1 / rateHz;
	if (after.gear === before.gear) {
		// The same gear again: only an engine that ran free makes it a shift that was tried.
		if (!(flare > freeShare)) return [];
		return [{from: before.gear, into: after.gear, leftAt: before.to, enteredAt: after.from, missed: true}];
	}
	const missed = flare > flareShare || late;
	return [{from: before.gear, into: after.gear, leftAt: before.to, enteredAt: after.from, missed}];
}
