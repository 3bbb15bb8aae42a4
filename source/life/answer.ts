/** Engine life and fuel of one pair against another, at a track that has been ranked. */
import type {Car} from '../drivetrain/car.ts';
import type {Track} from '../drivetrain/track.ts';
import {done, failed, fault} from '../planning/faults.ts';
import {type Ranked, rankSteps, rowName} from '../planning/rank-rack.ts';
import {remarksOn} from '../planning/remarks.ts';
import type {Outcome, Row} from '../planning/results.ts';
import {finish} from '../planning/run-rack.ts';
import {consumptionRemarks, fuelAssumptions, lapAssumptions, lifeAssumptions} from './assumptions.ts';
import {type Compared, type Comparison, comparedRows} from './compared-rows.ts';
import {engineLifeOf} from './engine-life.ts';
import {type FuelUse, fuelOf} from './fuel.ts';
import {type LapParts, lapParts} from './lap-parts.ts';
import {meanLap} from './mean-lap.ts';
import type {About, FuelAnswer, LifeAnswer} from './results.ts';
import {stepRpm} from './slice.ts';
import type {Tally} from './tally.ts';

export type LifeOptions = Comparison & {
	/** The only situation; the mean over all unless given. */
	readonly situation?: string | undefined;
	/** Laps of the race; the track's unless given. */
	readonly laps?: number | undefined;
	/** Unless given, `belowLimitRpm` under the limit. */
	readonly aboveRpm?: number | undefined;
};

/** Time above an RPM unless one is given: this far under the limit. */
const belowLimitRpm = 500;

export function lifeAnswer(car: Car, track: Track, options: LifeOptions = {}): Outcome<LifeAnswer> {
	return ofRanked(car, track, options, lifeOfRows);
}

export function fuelAnswer(car: Car, track: Track, options: LifeOptions = {}): Outcome<FuelAnswer> {
	return ofRanked(car, track, options, fuelOfRows);
}

function ofRanked<T>(
	car: Car,
	track: Track,
	options: LifeOptions,
	answer: (ranked: Ranked, compared: Compared, options: LifeOptions) => T,
): Outcome<T> {
	if (track.straights.every(({lengthM}) => lengthM === undefined))
		return failed([fault('track', 'straights', 'no straight with a length', '"length" on one straight at least')]);
	const ranked = finish(rankSteps(car, track, {situation: options.situation}));
	if (!ranked.ok) return ranked;
	const compared = comparedRows(ranked.value, options);
	return compared.ok ? done(answer(ranked.value, compared.value, options)) : compared;
}

/** Of rows of the ranking that run. */
export function lifeOfRows(ranked: Ranked, compared: Compared, options: LifeOptions): LifeAnswer {
	const aboveRpm = options.aboveRpm ?? ranked.ground.plan.limit.rpm - belowLimitRpm;
	const about = aboutLap(ranked, compared, options);
	const pairs = compared.rows.map(row => engineLifeOf(row, meanLapOf(ranked, row, aboveRpm), wholeLaps(about)));
	return {...about, assumptions: [...about.assumptions, ...lifeAssumptions], aboveRpm, stepRpm, pairs};
}

/** As `lifeOfRows`. */
export function fuelOfRows(ranked: Ranked, compared: Compared, options: LifeOptions): FuelAnswer {
	const {car, engine, limit} = ranked.ground.plan;
	const about = aboutLap(ranked, compared, options);
	const use: FuelUse = {
		consumptionKgPerJ: engine.fuelConsumptionKgPerJ,
		densityKgM3: car.fuelDensityKgM3,
		tankM3: car.tankM3 ?? null,
	};
	return {
		...about,
		assumptions: [...about.assumptions, ...fuelAssumptions],
		remarks: [...tankRemarks(use), ...consumptionRemarks(use.consumptionKgPerJ), ...about.remarks],
		fuelConsumptionKgPerJ: use.consumptionKgPerJ,
		fuelDensityKgM3: use.densityKgM3,
		tankM3: use.tankM3,
		pairs: compared.rows.map(row => fuelOf(row, meanLapOf(ranked, row, limit.rpm), use, about.lapM, about.laps)),
	};
}

function meanLapOf({ground, runs}: Ranked, row: Row, aboveRpm: number): Tally {
	return meanLap(runs.get(rowName(row))!, ground.plan, lapParts(ground.plan.track), aboveRpm);
}

function aboutLap({ranking, ground, runs}: Ranked, {rows, remarks}: Compared, options: LifeOptions): About {
	const {plan} = ground;
	const parts = lapParts(plan.track);
	const laps = options.laps ?? plan.track.laps ?? null;
	return {
		setting: ranking.setting,
		situation: options.situation ?? null,
		situations: plan.conditions.filter(({weight}) => weight > 0).length,
		laps,
		lapM: parts.lapM ?? null,
		cornerM: parts.cornerM ?? null,
		assumptions: lapAssumptions(parts),
		remarks: [
			...remarks,
			...rows.filter(({verdict}) => verdict === 'fail').map(row => `${rowName(row)} fails a check. ${row.reason}`),
			...raceRemarks(laps, parts),
			...remarksOn(
				ground,
				rows.map(row => runs.get(rowName(row))!),
			),
		],
	};
}

/** Laps of the race that can be told of: none where parts of the lap are left out. */
function wholeLaps({laps, lapM}: About): number | null {
	return lapM === null ? null : laps;
}

function raceRemarks(laps: number | null, {lapM}: LapParts): string[] {
	if (lapM === undefined) return ['Parts of the lap are left out: nothing is told of fuel or of a whole race.'];
	return laps === null ? ['No race length: the track has no "laps".'] : [];
}

function tankRemarks({tankM3}: FuelUse): string[] {
	return tankM3 === null ? ['The car has no "tank".'] : [];
}
