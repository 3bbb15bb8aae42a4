/** The plan's own model, asked for the run of one straight as practice had it. */
import type {Car} from '../../drivetrain/car.ts';
import {speedAtRpmMps} from '../../drivetrain/tire.ts';
import type {Straight, Track} from '../../drivetrain/track.ts';
import {planFor} from '../../planning/plan.ts';
import {runPlace} from '../../planning/run-place.ts';
import type {Reading} from './reading.ts';
import {type Trim, trimmed} from './trim.ts';

/** The run of a straight; speeds and RPM at the end of full throttle, as they would be without a limiter. */
export type ModelRun = {
	readonly endMps: number;
	readonly endRpm: number;
	readonly endGear: number;
	/** Null where the straight has no length. */
	readonly timeS: number | null;
	/** Distance on the limiter in this run. */
	readonly limiterM: number;
};

/** What may be changed of a run: the exit speed, to see how much hangs on it. */
export type Nudge = {readonly exitMps?: number};

/** Asks the model for the run of a reading; undefined where the car does not run there. */
export type AskModel = (reading: Reading, trim: Trim, nudge?: Nudge) => ModelRun | undefined;

/** The model of a car at a track in the situation `Base`. Both must be such that a plan can be made of them. */
export function modelOf(car: Car, track: Track): AskModel {
	const alone = {...track, situations: track.situations.slice(0, 1), pitRoad: undefined, restart: undefined};
	return (reading, trim, {exitMps = reading.exitMps?.value} = {}) => {
		const straight = straightOf(track, reading, exitMps);
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

function runOf(car: Car, track: Track, {candidate}: Reading): ModelRun | undefined {
	const plan = planFor(car, track);
	if (!plan.ok) return undefined;
	const {base, roads} = plan.value;
	const place = base.places[0]!;
	const {state, result} = runPlace(base, place, roads.gearsFor(candidate.train)(place.road));
	if (state !== 'ran') return undefined;
	const {endSpeedMps, endRpm, endGear, timeS, limiterM, reachRpm} = result;
	if (limiterM === 0 || reachRpm === null) return {endMps: endSpeedMps, endRpm, endGear, timeS, limiterM};
	const {rolloutM, growth, slip} = base.vehicle;
	const endMps = speedAtRpmMps(reachRpm, candidate.train.overall[endGear - 1]!, rolloutM, growth, slip);
	return {endMps, endRpm: reachRpm, endGear, timeS, limiterM};
}
