/** Rows with results put in by hand, so that a check can be tried exactly at its bound. */
import type {Car} from '../../source/drivetrain/car.ts';
import type {Track} from '../../source/drivetrain/track.ts';
import {candidateOf} from '../../source/planning/candidates.ts';
import type {Ground} from '../../source/planning/checks/check.ts';
import type {Condition} from '../../source/planning/conditions.ts';
import {type Plan, planFor} from '../../source/planning/plan.ts';
import type {StraightResult} from '../../source/planning/results.ts';
import type {PlaceRun} from '../../source/planning/run-place.ts';
import type {RowRun} from '../../source/planning/run-row.ts';
import {car, rackPair, track} from './build.ts';

export function planOf(aCar: Car = car(), aTrack: Track = track()): Plan {
	const plan = planFor(aCar, aTrack);
	if (!plan.ok) throw new Error(JSON.stringify(plan.faults));
	return plan.value;
}

export const groundOf = (plan: Plan, change: Partial<Ground> = {}): Ground => ({
	plan,
	measured: [],
	anchored: false,
	...change,
});

export type Change = Partial<Omit<PlaceRun, 'result'>> & {result?: Partial<StraightResult>};

/** A run in fourth gear at 8,000 rpm that no check has anything against. */
export function fakeRun(plan: Plan, index: number, change: Change = {}, condition: Condition = plan.base): PlaceRun {
	const place = index < 0 ? condition.restart! : condition.places[index]!;
	const lastGear = change.lastGear ?? 4;
	return {
		place,
		course: place.courses.get(5),
		state: 'ran',
		lastGear,
		sequence: undefined,
		spareGripN: {exit: 1000, minimum: 1000},
		...change,
		result: {
			name: place.name,
			timeS: 6,
			fastestS: 6,
			exitSpeedMps: place.straight.exitMps,
			exitRpm: 8000,
			exitGear: 4,
			endSpeedMps: 55,
			endRpm: 8500,
			endGear: lastGear,
			finalSpeedMps: 40,
			limiterM: 0,
			reachRpm: 8500,
			minimumSpeedMps: null,
			minimumRpm: null,
			shifts: [],
			remarks: [],
			...change.result,
		},
	};
}

/** A row in the base alone, each straight by its change. */
export function fakeRow(plan: Plan, straights: Change[] = [], change: Partial<RowRun> = {}): RowRun {
	return {
		candidate: candidateOf(plan.car, rackPair(33, 38), plan.car.gearboxes[0]!),
		situations: [
			{
				condition: plan.base,
				places: plan.base.places.map((_, i) => fakeRun(plan, i, straights[i])),
				restart: undefined,
			},
		],
		pitRoad: undefined,
		...change,
	};
}

export const shift = (change: Partial<StraightResult['shifts'][number]> = {}) => ({
	from: 3,
	rpm: 9000,
	lightRpm: 8900,
	rpmAfter: 8000,
	speedMps: 50,
	distanceM: 80,
	timeS: 2,
	leftS: 2,
	...change,
});
