/** Engine life and fuel of one pair against another, at a track that has been ranked. */
import type {Car} from '../drivetrain/car.ts';
import type {Track} from '../drivetrain/track.ts';
import {done, failed, fault} from '../planning/faults.ts';
import {type Ranked, rankSteps, rowName} from '../planning/rank-rack.ts';
import type {Outcome, Row} from '../planning/results.ts';
import {finish} from '../planning/run-rack.ts';
import {consumptionRemarks, fuelAssumptions, lapAssumptions} from './assumptions.ts';
import {type Comparison, comparedRows} from './compared-rows.ts';
import {engineLifeOf} from './engine-life.ts';
import {type FuelUse, fuelOf} from './fuel.ts';
import {lapParts} from './lap-parts.ts';
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
	answer: (ranked: Ranked, rows: readonly Row[], options: LifeOptions) => Outcome<T>,
): Outcome<T> {
	const ranked = finish(rankSteps(car, track, {situation: options.situation}));
	if (!ranked.ok) return ranked;
	const rows = comparedRows(ranked.value, options);
	return rows.ok ? answer(ranked.value, rows.value, options) : rows;
}

/** The rows are of the ranking. A row that does not run is a fault where it is the first, and is else left out with a remark. */
export function lifeOfRows(ranked: Ranked, rows: readonly Row[], options: LifeOptions): Outcome<LifeAnswer> {
	const aboveRpm = options.aboveRpm ?? ranked.ground.plan.limit.rpm - belowLimitRpm;
	const laps = toldLaps(ranked, rows, options, aboveRpm);
	if (!laps.ok) return laps;
	const {about, tallies} = laps.value;
	const pairs = tallies.map(([row, tally]) => engineLifeOf(row, tally, about.laps));
	return done({...about, aboveRpm, stepRpm, pairs});
}

/** As `lifeOfRows`. */
export function fuelOfRows(ranked: Ranked, rows: readonly Row[], options: LifeOptions): Outcome<FuelAnswer> {
	const {car, engine, limit} = ranked.ground.plan;
	const laps = toldLaps(ranked, rows, options, limit.rpm);
	if (!laps.ok) return laps;
	const {about, tallies} = laps.value;
	const use: FuelUse = {
		consumptionKgPerJ: engine.fuelConsumptionKgPerJ,
		densityKgM3: car.fuelDensityKgM3,
		tankM3: car.tankM3 ?? null,
	};
	return done({
		...about,
		assumptions: [...about.assumptions, ...fuelAssumptions],
		remarks: [...tankRemarks(use, about), ...consumptionRemarks(use.consumptionKgPerJ), ...about.remarks],
		fuelConsumptionKgPerJ: use.consumptionKgPerJ,
		fuelDensityKgM3: use.densityKgM3,
		tankM3: use.tankM3,
		pairs: tallies.map(([row, tally]) => fuelOf(row, tally, use, about.lapM, about.laps)),
	});
}

type ToldLaps = {about: About; tallies: (readonly [Row, Tally])[]};

function toldLaps(
	{ranking, ground, runs}: Ranked,
	rows: readonly Row[],
	options: LifeOptions,
	aboveRpm: number,
): Outcome<ToldLaps> {
	const {plan} = ground;
	const parts = lapParts(plan.track);
	if (plan.track.straights.every(({lengthM}) => lengthM === undefined))
		return failed([fault('track', 'straights', 'no straight with a length', '"length" on one straight at least')]);
	const tallies: (readonly [Row, Tally])[] = [];
	const remarks: string[] = [];
	for (const row of rows) {
		const tally = meanLap(runs.get(rowName(row))!, plan, parts, aboveRpm);
		if (tally !== undefined) tallies.push([row, tally]);
		else if (row === rows[0])
			return failed([fault('command', 'pair', `${rowName(row)} does not run here`, 'a pair and set that runs')]);
		else remarks.push(`${rowName(row)} does not run here.`);
	}
	const laps = options.laps ?? plan.track.laps ?? null;
	if (laps === null) remarks.push('No race length: the track has no "laps".');
	const about: About = {
		setting: ranking.setting,
		situation: options.situation ?? null,
		situations: plan.conditions.filter(({weight}) => weight > 0).length,
		laps,
		lapM: parts.lapM ?? null,
		cornerM: parts.cornerM ?? null,
		assumptions: lapAssumptions(parts),
		remarks: [...remarks, ...ranking.remarks],
	};
	return done({about, tallies});
}

function tankRemarks({tankM3}: FuelUse, {lapM}: About): string[] {
	return [
		...(lapM === null ? ['Parts of the lap are left out: its fuel is not known.'] : []),
		...(tankM3 === null ? ['The car has no "tank".'] : []),
	];
}
