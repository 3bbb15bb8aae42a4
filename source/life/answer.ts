/** Engine life and fuel of one pair against another, at a track that has been ranked. */
import type {Car} from '../drivetrain/car.ts';
import type {Track} from '../drivetrain/track.ts';
import {done, failed, fault} from '../planning/faults.ts';
import {type Ranked, rankSteps} from '../planning/rank-rack.ts';
import type {Outcome} from '../planning/results.ts';
import {finish} from '../planning/run-rack.ts';
import {aboutLap, wholeLaps} from './about-lap.ts';
import {consumptionRemarks, fuelAssumptions, lifeAssumptions} from './assumptions.ts';
import {type Compared, comparedRows} from './compared-rows.ts';
import {engineLifeOf} from './engine-life.ts';
import {type FuelUse, fuelOf} from './fuel.ts';
import {aboveIn, meanLapOf} from './mean-lap.ts';
import type {LifeOptions} from './options.ts';
import type {FuelAnswer, LifeAnswer} from './results.ts';
import {stepRpm} from './slice.ts';

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
	const aboveRpm = aboveIn(ranked.ground.plan, options);
	const about = aboutLap(ranked, compared, options);
	const pairs = compared.rows.map(row => engineLifeOf(row, meanLapOf(ranked, row, options), wholeLaps(about)));
	return {...about, assumptions: [...about.assumptions, ...lifeAssumptions], aboveRpm, stepRpm, pairs};
}

/** As `lifeOfRows`. */
export function fuelOfRows(ranked: Ranked, compared: Compared, options: LifeOptions): FuelAnswer {
	const {car, engine} = ranked.ground.plan;
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
		pairs: compared.rows.map(row => fuelOf(row, meanLapOf(ranked, row, options), use, about.lapM, about.laps)),
	};
}

function tankRemarks({tankM3}: FuelUse): string[] {
	return tankM3 === null ? ['The car has no "tank".'] : [];
}
