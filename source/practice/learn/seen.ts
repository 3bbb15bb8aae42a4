/** What somebody saw at the end of a straight, and what it says of the circumference. */
import {brentRoot} from '../../drivetrain/brent.ts';
import {mphMps} from '../../drivetrain/constants.ts';
import {growthReferenceMps, speedAtRpmMps} from '../../drivetrain/tire.ts';
import type {Track} from '../../drivetrain/track.ts';
import type {Candidate} from '../../planning/candidates.ts';
import type {Plan} from '../../planning/plan.ts';
import type {AskModel} from './model.ts';
import {type Known, known, type Reading, together} from './reading.ts';
import {untrimmed} from './trim.ts';

export type Seen = {
	/** Index among the track's straights. */
	readonly index: number;
	/** Highest RPM seen, and its standard deviation where it is given. */
	readonly rpm: number;
	readonly rpmSe?: number | undefined;
	/** Speed there, where it is known. */
	readonly speedMps?: number | undefined;
	readonly speedSe?: number | undefined;
	/** Counted from 1; undefined: the gear that the model takes there. */
	readonly gear?: number | undefined;
	readonly candidate: Candidate;
};

/** What is taken for right where no speed is known: one number cannot tell the two apart. */
export type Held = 'circumference' | 'speed';

/** A peak-hold tachometer is read to about this: its steps, and a lap that was not the best. */
export const tachometerSe = 20;
/** A speed that somebody gives, from a stopwatch or a receiver. */
export const givenSpeedSe = 0.5 * mphMps;
/** A speed of the model that is taken for right is right to about this. */
export const heldSpeedSe = 1 * mphMps;
/** A rolled-out circumference that is taken for right, as a fraction: 1/10 in of 87 in. */
export const heldCircumferenceShare = 0.001;

/** One number's word on the circumference at standstill, m. */
export type CircumferenceReading = {
	readonly seen: Seen;
	readonly rolloutM: Known;
	/** Whether the speed is one that was seen, or the model's, which was held. */
	readonly speed: 'seen' | 'held';
};

/**
 * The circumference at standstill by what was seen: from a known speed C0 = 60·V·(1 + κ)·R/n ÷ (1 + γ·(V/V_ref)²); from a held one,
 * the circumference with which the model's run turns the RPM that was seen. Undefined where the speed is not known and the
 * circumference is held, or where no circumference within 10 % does it.
 */
export function circumferenceSeen(plan: Plan, ask: AskModel, seen: Seen, held: Held): CircumferenceReading | undefined {
	const {growth, slip} = plan.base.vehicle;
	const rpmShare = (seen.rpmSe ?? tachometerSe) / seen.rpm;
	if (seen.speedMps !== undefined) {
		const gear = seen.gear ?? ask(bare(plan.track, seen), untrimmed)?.endGear;
		const overall = gear === undefined ? undefined : seen.candidate.train.overall[gear - 1];
		if (overall === undefined) return undefined;
		const share = together(rpmShare, (seen.speedSe ?? givenSpeedSe) / seen.speedMps);
		const value = fromSpeed(seen, overall, growth, slip);
		return {seen, rolloutM: known(value, value * share), speed: 'seen'};
	}
	if (held === 'circumference') return undefined;
	return withHeldSpeed(plan, ask, seen, rpmShare);
}

/** The inverse of `engineRpm` for the circumference at standstill. */
function fromSpeed({rpm, speedMps}: Seen, overall: number, growth: number, slip: number): number {
	const circumference = (60 * speedMps! * (1 + slip) * overall) / rpm;
	return circumference / (1 + growth * (speedMps! / growthReferenceMps) ** 2);
}

function withHeldSpeed(plan: Plan, ask: AskModel, seen: Seen, rpmShare: number): CircumferenceReading | undefined {
	const {rolloutM} = plan.base.vehicle;
	const reading = bare(plan.track, seen);
	const over = (rollout: number) => (ask(reading, {...untrimmed, rollout})?.endRpm ?? Number.NaN) - seen.rpm;
	const factor = brentRoot(over, 1 - widest, 1 + widest, 1e-9);
	const endMps = factor === undefined ? undefined : ask(reading, {...untrimmed, rollout: factor})?.endMps;
	if (factor === undefined || endMps === undefined) return undefined;
	const share = together(rpmShare, heldSpeedSe / endMps);
	return {seen, rolloutM: known(rolloutM * factor, rolloutM * factor * share), speed: 'held'};
}
/** Beyond this the circumference is not what is wrong. */
const widest = 0.1;

/**
 * What was seen as a reading of the run: with the speed that was given, or, the circumference held, with the one that the RPM
 * says. `rolloutM` is the circumference at standstill that holds from here on.
 */
export function readingOf(plan: Plan, ask: AskModel, seen: Seen, held: Held, rolloutM: Known): Reading {
	const reading = bare(plan.track, seen);
	const {growth, slip} = plan.base.vehicle;
	if (seen.speedMps !== undefined)
		return {...reading, endMps: known(seen.speedMps, seen.speedSe ?? givenSpeedSe), speedSeen: true};
	const gear = seen.gear ?? ask(reading, untrimmed)?.endGear;
	const overall = gear === undefined ? undefined : seen.candidate.train.overall[gear - 1];
	if (held === 'speed' || overall === undefined) return reading;
	const speedMps = speedAtRpmMps(seen.rpm, overall, rolloutM.value, growth, slip);
	const share = together((seen.rpmSe ?? tachometerSe) / seen.rpm, rolloutM.se / rolloutM.value);
	if (!Number.isFinite(speedMps)) return reading;
	return {...reading, endMps: known(speedMps, speedMps * share), limited: isLimited(plan, seen)};
}

/** Without a speed. The run ends in the gear that was seen, where one was. */
function bare(track: Track, {index, candidate, gear, rpm, rpmSe}: Seen): Reading {
	const straight = track.straights[index]!;
	const lowest = (straight.gears ?? track.gears)?.lowest ?? 1;
	return {
		index,
		name: straight.name,
		candidate,
		gear,
		endMps: undefined,
		endRpm: known(rpm, rpmSe ?? tachometerSe),
		speedSeen: false,
		exitMps: undefined,
		lengthM: undefined,
		timeS: undefined,
		gears: gear === undefined ? undefined : {lowest: Math.min(lowest, gear), highest: gear},
		limited: false,
	};
}

/** An engine that the ignition holds turns no faster, whatever drag and power are. */
function isLimited({base}: Plan, {rpm}: Seen): boolean {
	return Math.abs(rpm - base.vehicle.limiterRpm) <= limiterReachRpm;
}
export const limiterReachRpm = 15;
