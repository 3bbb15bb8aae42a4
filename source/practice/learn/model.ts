/** The plan's own model, asked for the run of one straight as practice had it. */
import type {Car} from '../../drivetrain/car.ts';
import {speedAtRpmMps} from '../../drivetrain/tire.ts';
import type {Straight, Track} from '../../drivetrain/track.ts';
import {planFor} from '../../planning/plan.ts';
import {rpmAt, runPlace} from '../../planning/run-place.ts';
import type {Reading} from './reading.ts';
import {type Trim, trimmed} from './trim.ts';

/**
 * The run of a straight, as it would be without a limiter: speed and RPM at the end of full throttle where practice says which
 * run it was, else the highest on the straight, which is what somebody sees.
 */
export type ModelRun = {
	readonly endMps: number;
	readonly endRpm: number;
	readonly endGear: number;
	/** Null where the straight has no length. */
	readonly timeS: number | null;
	/** Distance on the limiter in this run. */
	readonly limiterM: number;
};

/** What may be changed of a run, to see how much hangs on it. */
export type Nudge = {readonly exitMps?: number; readonly lengthM?: number};

/** Asks the model for the run of a reading; undefined where the car does not run there. */
export type AskModel = (reading: Reading, trim: Trim, nudge?: Nudge) => ModelRun | undefined;

/** The model of a car at a track in the situation `Base`. Both must be such that a plan can be made of them. */
export function modelOf(car: Car, track: Track): AskModel {
	const alone = {...track, situations: track.situations.slice(0, 1), pitRoad: undefined, restart: undefined};
	return (reading, trim, {exitMps = reading.exitMps?.value, lengthM = reading.lengthM} = {}) => {
		const straight = straightOf(track, {...reading, lengthM}, exitMps);
		return runOf(car, trimmed(car, {...alone, straights: [straight]}, trim), reading) ?? undefined;
	};
}

function straightOf(track: Track, reading: Reading, exitMps: number | undefined): Straight {
	const straight = track.straights[reading.index]!;
	const ownRun = reading.lengthM !== undefined;
	return {
		...straight,
		measured: undefined,
		minimumMps: undefined,
		exitMps: exitMps ?? straight.exitMps,
		gears: reading.gears ?? straight.gears,
		// A logged run ends where the driver lifts; braking comes after it.
		...(ownRun && {lengthM: reading.lengthM, endMps: undefined, entryMps: undefined, brakingMps2: undefined}),
	};
}

function runOf(car: Car, track: Track, {candidate, lengthM}: Reading): ModelRun | undefined {
	const plan = planFor(car, track);
	if (!plan.ok) return undefined;
	const {base, roads} = plan.value;
	const place = base.places[0]!;
	const {state, result, lastGear} = runPlace(base, place, roads.gearsFor(candidate.train)(place.road));
	if (state !== 'ran') return undefined;
	const {endSpeedMps, endRpm, endGear, finalSpeedMps, timeS, limiterM, reachRpm} = result;
	const overall = (gear: number) => candidate.train.overall[gear - 1]!;
	if (limiterM > 0 && reachRpm !== null) {
		const {rolloutM, growth, slip} = base.vehicle;
		const endMps = speedAtRpmMps(reachRpm, overall(endGear), rolloutM, growth, slip);
		return {endMps, endRpm: reachRpm, endGear, timeS, limiterM};
	}
	// A car that slows has its highest speed at the exit.
	if (lengthM === undefined || finalSpeedMps === endSpeedMps)
		return {endMps: endSpeedMps, endRpm, endGear, timeS, limiterM};
	const finalRpm = rpmAt(base.vehicle, overall(lastGear), finalSpeedMps);
	return {endMps: finalSpeedMps, endRpm: finalRpm, endGear: lastGear, timeS, limiterM};
}
