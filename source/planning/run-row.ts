/** One pair and set through every situation. */
import {engineRpm} from '../drivetrain/tire.ts';
import type {Candidate} from './candidates.ts';
import type {Condition, Place} from './conditions.ts';
import type {Plan} from './plan.ts';
import type {Recall} from './run-memory.ts';
import {type PlaceRun, runPlace} from './run-place.ts';

export type SituationRun = {
	readonly condition: Condition;
	/** In the order of the track's straights. */
	readonly places: readonly PlaceRun[];
	readonly restart: PlaceRun | undefined;
};

export type PitRoadRun = {
	/** Counted from 1. */
	readonly gear: number;
	/** At the pit-road limit, and at limit + tolerance. */
	readonly rpm: number;
	readonly toleranceRpm: number;
	/** At limit + tolerance in every gear. */
	readonly toleranceRpms: readonly number[];
};

export type RowRun = {
	readonly candidate: Candidate;
	readonly situations: readonly SituationRun[];
	readonly pitRoad: PitRoadRun | undefined;
};

const runAlways: Recall = (_, __, run) => run();

export function runRow(plan: Plan, candidate: Candidate, recall = runAlways): RowRun {
	const gearsOn = plan.roads.gearsFor(candidate.train);
	const run = (condition: Condition, place: Place) =>
		recall(place, candidate, () => runPlace(condition, place, gearsOn(place.road)));
	const situations: SituationRun[] = [];
	for (const i of plan.runOrder) {
		const condition = plan.conditions[i]!;
		situations[i] = {
			condition,
			places: condition.places.map(place => run(condition, place)),
			restart: condition.restart && run(condition, condition.restart),
		};
	}
	return {candidate, situations, pitRoad: runPitRoad(plan, candidate)};
}

/** Straights and restart of a row, one after the other, with the situation that each belongs to. */
export function eachRun(row: RowRun, visit: (run: PlaceRun, situation: SituationRun) => void): void {
	for (const situation of row.situations) {
		for (const run of situation.places) visit(run, situation);
		if (situation.restart !== undefined) visit(situation.restart, situation);
	}
}

/** The straights of a row without the restart. */
export function eachStraight(row: RowRun, visit: (run: PlaceRun, situation: SituationRun) => void): void {
	for (const situation of row.situations) for (const run of situation.places) visit(run, situation);
}

/** The lowest gear with so much RPM in hand under the limit is the pit gear unless one is given. */
const pitGearReserveRpm = 1000;

/**
 * RPM on pit road at a steady throttle, with the largest rollout over the situations: it gives the lowest RPM for the
 * speed, so that holding it is never over the pit-road limit.
 */
export function runPitRoad(plan: Plan, {train}: Candidate): PitRoadRun | undefined {
	const {pitRoad} = plan.track;
	if (pitRoad === undefined) return undefined;
	const rpmsAt = (speedMps: number) => pitRoadRpms(plan, train.overall, speedMps);
	const toleranceRpms = rpmsAt(pitRoad.limitMps + pitRoad.toleranceMps);
	const clear = toleranceRpms.findIndex(rpm => rpm <= plan.limit.rpm - pitGearReserveRpm);
	const given = pitRoad.gear !== undefined && pitRoad.gear <= toleranceRpms.length ? pitRoad.gear : undefined;
	const gear = given ?? (clear < 0 ? toleranceRpms.length : clear + 1);
	return {
		gear,
		rpm: rpmsAt(pitRoad.limitMps)[gear - 1]!,
		toleranceRpm: toleranceRpms[gear - 1]!,
		toleranceRpms,
	};
}

/** RPM in every gear at a pit-road speed. */
export function pitRoadRpms(plan: Plan, overall: readonly number[], speedMps: number): number[] {
	const rolloutM = Math.max(...plan.conditions.map(({vehicle}) => vehicle.rolloutM));
	const {growth, steadySlip} = plan.car.tires;
	return overall.map(ratio => engineRpm(speedMps, ratio, rolloutM, growth, steadySlip));
}
