/** Every pair and set through every situation, and the faults that only running shows. */
import type {Car} from '../drivetrain/car.ts';
import type {Track} from '../drivetrain/track.ts';
import {candidatesOf} from './candidates.ts';
import type {Ground} from './checks/check.ts';
import {done, failed} from './faults.ts';
import {isAnchored, measuredPoints} from './measured.ts';
import {type Plan, type PlanOptions, planFor} from './plan.ts';
import {rackFaults} from './rack-faults.ts';
import type {Outcome} from './results.ts';
import type {RunMemory} from './run-memory.ts';
import {type RowRun, runRow} from './run-row.ts';

export type RackRuns = {
	readonly ground: Ground;
	/** In the order of the rack. */
	readonly runs: readonly RowRun[];
};

/** How far a rack has been run. */
export type Progress = {readonly done: number; readonly total: number};

export function runRack(car: Car, track: Track, options: PlanOptions): Outcome<RackRuns> {
	return finish(rackSteps(car, track, options));
}

/** The same row by row, for a caller that has other things to do in between. */
export function* rackSteps(
	car: Car,
	track: Track,
	options: PlanOptions,
	memory?: RunMemory,
): Generator<Progress, Outcome<RackRuns>, void> {
	const plan = planFor(car, track, options);
	if (!plan.ok) return plan;
	const candidates = candidatesOf(plan.value.car);
	const recall = memory?.recallFor(plan.value);
	const runs: RowRun[] = [];
	for (const candidate of candidates) {
		runs.push(runRow(plan.value, candidate, recall));
		yield {done: runs.length, total: candidates.length};
	}
	memory?.forget();
	const faults = rackFaults(plan.value, runs);
	return faults.length > 0 ? failed(faults) : done({ground: groundOf(plan.value), runs});
}

/** What the checks of every row stand on. */
export function groundOf(plan: Plan): Ground {
	const measured = measuredPoints(plan);
	return {plan, measured, anchored: isAnchored(measured)};
}

/** All steps at once. */
export function finish<T>(steps: Generator<unknown, T, void>): T {
	for (;;) {
		const step = steps.next();
		if (step.done) return step.value;
	}
}
