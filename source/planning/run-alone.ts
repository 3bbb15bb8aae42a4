/** One pair and set by itself, before the rest of the rack has been run. */
import type {Car} from '../drivetrain/car.ts';
import type {Track} from '../drivetrain/track.ts';
import {candidateOf, gearboxNamed, onRack} from './candidates.ts';
import {chosenFrom} from './choice.ts';
import {done, failed, fault} from './faults.ts';
import {type PlanOptions, planFor, settingOf} from './plan.ts';
import type {Choice, Outcome, SingleRun} from './results.ts';
import {rowOf} from './row.ts';
import {groundOf} from './run-rack.ts';
import {runRow} from './run-row.ts';

/**
 * The row of the pair and set chosen, without what only the whole rack tells: its reason, its gain, and the faults that
 * hold for every row.
 */
export function runAlone(car: Car, track: Track, choice: Choice = {}, options: PlanOptions = {}): Outcome<SingleRun> {
	const plan = planFor(car, track, options);
	if (!plan.ok) return plan;
	const chosen = chosenFrom(car, choice);
	if (!chosen.ok) return chosen;
	const pair = onRack(plan.value.car, chosen.value.pair);
	const gearbox = gearboxNamed(plan.value.car, chosen.value.gearbox);
	if (pair === undefined || gearbox === undefined)
		return failed([
			fault('car', 'installed', 'a pair or set that is not there', 'a pair on the rack and a set of the car'),
		]);
	const ground = groundOf(plan.value);
	const row = rowOf(runRow(plan.value, candidateOf(plan.value.car, pair, gearbox)), ground);
	return done({setting: settingOf(plan.value, ground.anchored), row, remarks: []});
}
