/** Every pair and set through every situation, and the faults that only running shows. */
import type {Car} from '../drivetrain/car.ts';
import type {Track} from '../drivetrain/track.ts';
import {candidatesOf} from './candidates.ts';
import type {Ground} from './checks/check.ts';
import {done, failed} from './faults.ts';
import {isAnchored, measuredPoints} from './measured.ts';
import {type PlanOptions, planFor} from './plan.ts';
import {rackFaults} from './rack-faults.ts';
import type {Outcome} from './results.ts';
import {type RowRun, runRow} from './run-row.ts';

export type RackRuns = {
	readonly ground: Ground;
	/** In the order of the rack. */
	readonly runs: readonly RowRun[];
};

export function runRack(car: Car, track: Track, options: PlanOptions): Outcome<RackRuns> {
	const plan = planFor(car, track, options);
	if (!plan.ok) return plan;
	const runs = candidatesOf(plan.value.car).map(candidate => runRow(plan.value, candidate));
	const faults = rackFaults(plan.value, runs);
	if (faults.length > 0) return failed(faults);
	const measured = measuredPoints(plan.value);
	return done({ground: {plan: plan.value, measured, anchored: isAnchored(measured)}, runs});
}
