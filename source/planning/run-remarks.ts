/** What the runs of the whole rack show: cars that slow, entries never reached, RPM beyond the dyno's points. */
import type {Plan} from './plan.ts';
import type {PlaceRun} from './run-place.ts';
import {eachRun, type RowRun} from './run-row.ts';
import {counted, listed, rpmText} from './words.ts';

export function runRemarks(plan: Plan, rows: readonly RowRun[]): string[] {
	return [
		...straightRemarks(plan, rows, run => run.sequence?.slows === true, 'the car slows'),
		...straightRemarks(
			plan,
			rows,
			// On the limiter it is the limiter that is told.
			({sequence}) => sequence?.entryMissed === true && sequence.limiterM === 0,
			'runs below its entry speed, without braking,',
		),
		...curveRemarks(plan, rows),
	];
}

/** "Back: the car slows in every row (Base and Long run)." */
function straightRemarks(
	plan: Plan,
	rows: readonly RowRun[],
	holds: (run: PlaceRun) => boolean,
	what: string,
): string[] {
	return plan.track.straights.flatMap(({name}, i) => {
		const situations = plan.conditions.flatMap((condition, k) => {
			const count = rows.filter(row => holds(row.situations[k]!.places[i]!)).length;
			return count === 0 ? [] : [{name: condition.name, count}];
		});
		if (situations.length === 0) return [];
		const most = Math.max(...situations.map(({count}) => count));
		const span = most === rows.length ? 'in every row' : `in ${most} of ${counted(rows.length, 'row')}`;
		return [`${name}: ${what} ${span} (${listed(situations.map(situation => situation.name))}).`];
	});
}

/** The curve is not known outside its points: the torque of the nearest one is held there. */
function curveRemarks({engine: {curve}}: Plan, rows: readonly RowRun[]): string[] {
	const [first, last] = [curve[0]!.rpm, curve.at(-1)!.rpm];
	let [lowest, highest] = [first, last];
	for (const row of rows) {
		eachRun(row, ({state, result}) => {
			if (state !== 'ran') return;
			lowest = Math.min(lowest, result.exitRpm);
			highest = Math.max(highest, result.endRpm);
			for (const {rpm, rpmAfter} of result.shifts) {
				lowest = Math.min(lowest, rpmAfter);
				highest = Math.max(highest, rpm);
			}
		});
	}
	const remarks: string[] = [];
	if (lowest < first) {
		remarks.push(
			`The curve starts at ${rpmText(first)}: its torque is held below, where rows run down to ${rpmText(lowest)}.`,
		);
	}
	if (highest > last) {
		remarks.push(
			`The curve ends at ${rpmText(last)}: its torque is held above, where rows run up to ${rpmText(highest)}.`,
		);
	}
	return remarks;
}
