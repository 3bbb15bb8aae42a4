/** Car and track made ready for every row: the engine in use, its bounds, the situations. */
import type {Car} from '../drivetrain/car.ts';
import {type PowerBand, peakPower, powerBand, ratedTorque} from '../drivetrain/engine.ts';
import {engineFor, type LimitInForce, limitInForce} from '../drivetrain/limits.ts';
import type {Situation, Track} from '../drivetrain/track.ts';
import {type Condition, conditionFor} from './conditions.ts';
import {documentFaults} from './document-faults.ts';
import {done, failed, fault, unknownName} from './faults.ts';
import type {Outcome, Setting} from './results.ts';
import {Roads} from './roads.ts';
import {situationFaults} from './situation-faults.ts';
import {carAt} from './situations.ts';
import type {EngineInUse} from './vehicle.ts';

export type Plan = EngineInUse & {
	/** As it is at this track. */
	readonly car: Car;
	readonly track: Track;
	readonly limit: LimitInForce;
	readonly band: PowerBand;
	readonly roads: Roads;
	/** The track as it stands. */
	readonly base: Condition;
	/** What is run and checked: every situation, or the one that was asked for. */
	readonly conditions: readonly Condition[];
	/** The indices of the conditions, those of one vehicle together. */
	readonly runOrder: readonly number[];
};

export type PlanOptions = {
	/** The only situation to run; all of them unless given. */
	readonly situation?: string | undefined;
};

/** The plan, or every fault that the documents have without running anything. */
export function planFor(carDocument: Car, track: Track, options: PlanOptions = {}): Outcome<Plan> {
	const car = carAt(track, carDocument);
	const engine = engineFor(car, track.type);
	const situations = track.situations.filter(({name}) => options.situation === undefined || name === options.situation);
	const faults = documentFaults(car, track);
	if (situations.length === 0) faults.push(unknownSituation(options.situation ?? '', track));
	if (engine === undefined) {
		const allowed = `an engine with "${track.type}" in its "for"`;
		return failed([...faults, fault('car', 'engines', `no engine for the track type ${track.type}`, allowed)]);
	}
	const limit = limitInForce(engine, car.rules[track.type], track.rules);
	const rated = ratedTorque(engine);
	const inUse = {engine, limitRpm: limit.rpm, rated, ratedPeak: peakPower(rated, limit.rpm)};
	faults.push(...situationFaults(car, track, inUse));
	if (faults.length > 0) return failed(faults);

	const roads = new Roads();
	const base = {...conditionFor(car, track, track.situations[0]!, inUse, roads, undefined), weight: 0};
	const band = powerBand(rated, engine.bandShare, limit.rpm);
	const conditions = situations.map((situation, i) => ({
		...(situation === track.situations[0] ? base : conditionFor(car, track, situation, inUse, roads, base)),
		weight: weightsOf(situations)[i]!,
	}));
	return done({...inUse, car, track, limit, band, roads, base, conditions, runOrder: byVehicle(conditions)});
}

/** What every answer says of the engine in use and the day. */
export function settingOf(plan: Plan, anchored: boolean): Setting {
	return {
		engine: plan.engine.name,
		rpmLimit: plan.limit.rpm,
		limitFrom: plan.limit.from,
		bandLowRpm: plan.band.lowRpm,
		bandHighRpm: plan.band.highRpm,
		peakPowerW: plan.ratedPeak.powerW / plan.base.correction,
		peakPowerRpm: plan.ratedPeak.rpm,
		correction: plan.base.correction,
		airDensityKgM3: plan.base.air.densityKgM3,
		anchored,
	};
}

/** Parts in the mean time that add up to 1. With no share at all the first situation stands for all. */
export function weightsOf(situations: readonly Pick<Situation, 'share'>[]): number[] {
	if (situations.length === 1) return [1];
	const total = situations.reduce((sum, {share}) => sum + share, 0);
	return situations.map(({share}, i) => (total > 0 ? share / total : i === 0 ? 1 : 0));
}

function unknownSituation(name: string, track: Track) {
	return unknownName(
		'command',
		'situation',
		name,
		track.situations.map(situation => situation.name),
	);
}

function byVehicle(conditions: readonly Condition[]): number[] {
	const vehicles = [...new Set(conditions.map(({vehicle}) => vehicle))];
	return vehicles.flatMap(vehicle => conditions.flatMap((condition, i) => (condition.vehicle === vehicle ? [i] : [])));
}
