/** Where the next straight starts in a lower gear: whether the one below may be taken at the speed of the entry. */

import type {Candidate} from '../candidates.ts';
import type {Condition} from '../conditions.ts';
import type {Plan} from '../plan.ts';
import {type PlaceRun, rpmAt} from '../run-place.ts';
import {checkOf, type Reading, type RowCheck, worseOf} from './check.ts';

export const downshift: RowCheck = (row, {plan}) => {
	let worst: Reading | undefined;
	for (const {condition, places} of row.situations) {
		places.forEach((run, i) => {
			const next = places[(i + 1) % places.length]!;
			if (!inGear(run) || !inGear(next) || next.result.exitGear >= run.lastGear) return;
			worst = worseOf(worst, entry(run, condition, row.candidate, plan));
		});
	}
	return checkOf('downshift', worst);
};

/** RPM in gear k at the entry against (limit − margin)·i_k/i_k−1, at which gear k−1 would turn at the limit less the margin. */
function entry(run: PlaceRun, condition: Condition, {train}: Candidate, plan: Plan): Reading {
	const [overall, below] = [train.overall[run.lastGear - 1]!, train.overall[run.lastGear - 2]!];
	const value = rpmAt(condition.vehicle, overall, run.result.finalSpeedMps, condition.steadySlip);
	const bound = ((plan.limit.rpm - plan.car.margins.downshiftRpm) * overall) / below;
	return {
		verdict: value > bound ? 'near' : 'pass',
		value,
		bound,
		margin: bound - value,
		place: run.place.name,
		part: `entry ${run.lastGear}-${run.lastGear - 1}`,
		situation: condition.name,
	};
}

function inGear({state}: PlaceRun): boolean {
	return state === 'ran' || state === 'held';
}
