/** RPM at pace speed in the gear of the restart, against the power band. */

import {rpmAt} from '../run-place.ts';
import {pull} from './band.ts';
import {checkOf, type Reading, type RowCheck, worseOf} from './check.ts';

export const restart: RowCheck = (row, ground) => {
	let worst: Reading | undefined;
	for (const {condition, restart: run} of row.situations) {
		if (run?.state === 'stops') {
			const remark = 'stops before the end of the restart';
			worst = worseOf(worst, {
				verdict: 'fail',
				value: null,
				bound: null,
				margin: null,
				place: 'restart',
				situation: condition.name,
				remark,
			});
		}
		if (run?.state !== 'ran') continue;
		const {exitSpeedMps, exitGear} = run.result;
		const overall = row.candidate.train.overall[exitGear - 1]!;
		const rpm = rpmAt(condition.vehicle, overall, exitSpeedMps, condition.steadySlip);
		worst = worseOf(worst, {...pull(run, condition, ground, 'exit', rpm), part: ''});
	}
	return checkOf('restart', worst);
};
