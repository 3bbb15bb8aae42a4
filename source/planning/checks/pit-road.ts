/** Whether the driver can hold pit-road speed on the tachometer: some gear must be clean and under the limit. */
import {checkOf, type RowCheck} from './check.ts';

export const pitRoad: RowCheck = (row, {plan}) => {
	const run = row.pitRoad;
	if (run === undefined) return undefined;
	const bound = plan.car.margins.cleanRpm;
	const clean = run.toleranceRpms.flatMap((rpm, i) => (rpm >= bound && rpm <= plan.limit.rpm ? [i + 1] : []));
	const inPitGear = clean.includes(run.gear);
	return checkOf('pitRoad', {
		verdict: clean.length > 0 ? 'pass' : 'near',
		value: run.toleranceRpm,
		bound,
		margin: run.toleranceRpm - bound,
		place: 'pit road',
		remark: clean.length > 0 && !inPitGear ? `gear ${run.gear} is not clean there; gear ${clean[0]} is` : undefined,
	});
};
