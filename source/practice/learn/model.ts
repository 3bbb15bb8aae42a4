/** The plan's own model, asked for the run of one straight as practice had it. */
import type {Car} from '../../drivetrain/car.ts';
import type {GearMotion} from '../../drivetrain/gear-motion.ts';
import type {RoadGears} from '../../drivetrain/road-gears.ts';
import {speedTrace, type TracePoint} from '../../drivetrain/speed-trace.ts';
import {speedAtRpmMps} from '../../drivetrain/tire.ts';
import type {Straight, Track} from '../../drivetrain/track.ts';
import {type Plan, planFor} from '../../planning/plan.ts';
import {type PlaceRun, rpmAt, runPlace} from '../../planning/run-place.ts';
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

/** The run told along the way; undefined where the car does not run there. */
export type TraceModel = (reading: Reading, trim: Trim, nudge?: Nudge) => readonly TracePoint[] | undefined;

/** The model of a car at a track in the situation `Base`. Both must be such that a plan can be made of them. */
export function modelOf(car: Car, track: Track): AskModel {
	const run = runnerOf(car, track);
	return (reading, trim, nudge) => {
		const drive = run(reading, trim, nudge);
		return drive && described(drive, reading);
	};
}

/** How the car moves in a gear on the straight of a reading; undefined where no plan can be made of it. */
export type AskMotion = (reading: Reading, trim: Trim, gear: number) => GearMotion | undefined;

export function motionsOf(car: Car, track: Track): AskMotion {
	const prepare = preparer(car, track);
	return (reading, trim, gear) => prepare(reading, trim, {})?.gears.motion(gear);
}

/** The same model, told along the way. */
export function tracesOf(car: Car, track: Track): TraceModel {
	const run = runnerOf(car, track);
	return (reading, trim, nudge) => {
		const drive = run(reading, trim, nudge);
		if (drive?.run.sequence === undefined || drive.run.course === undefined) return undefined;
		return speedTrace(drive.gears, drive.run.course, drive.run.sequence, tracePoints);
	};
}
/** Points along a straight: more than a terminal has dots across. */
const tracePoints = 120;

type Prepared = {readonly plan: Plan; readonly gears: RoadGears};
type Drive = Prepared & {readonly run: PlaceRun};

function preparer(car: Car, track: Track) {
	const alone = {...track, situations: track.situations.slice(0, 1), pitRoad: undefined, restart: undefined};
	return (reading: Reading, trim: Trim, nudge: Nudge): Prepared | undefined => {
		const {exitMps = reading.exitMps?.value, lengthM = reading.lengthM} = nudge;
		const straight = straightOf(track, {...reading, lengthM}, exitMps);
		const plan = planFor(car, trimmed(car, {...alone, straights: [straight]}, trim));
		if (!plan.ok) return undefined;
		const {base, roads} = plan.value;
		return {plan: plan.value, gears: roads.gearsFor(reading.candidate.train)(base.places[0]!.road)};
	};
}

function runnerOf(car: Car, track: Track) {
	const prepare = preparer(car, track);
	return (reading: Reading, trim: Trim, nudge: Nudge = {}): Drive | undefined => {
		const prepared = prepare(reading, trim, nudge);
		if (prepared === undefined) return undefined;
		const {base} = prepared.plan;
		const run = runPlace(base, base.places[0]!, prepared.gears);
		return run.state === 'ran' ? {...prepared, run} : undefined;
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

function described({plan: {base}, run}: Drive, {candidate, lengthM}: Reading): ModelRun {
	const {result, lastGear} = run;
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
