/** The highest RPM anywhere against the limit in force. */
import {withoutLimiter} from '../check-names.ts';
import type {Condition} from '../conditions.ts';
import {measuredRpm} from '../measured.ts';
import type {Verdict} from '../results.ts';
import type {PlaceRun} from '../run-place.ts';
import {eachRun, type RowRun} from '../run-row.ts';
import {roundingRpm} from '../words.ts';
import {checkOf, type Ground, type Reading, type RowCheck, shiftPart, worseOf} from './check.ts';

export const limit: RowCheck = (row, ground) => {
	let worst: Reading | undefined;
	eachRun(row, (run, {condition}) => {
		if (run.state === 'overLimit') worst = worseOf(worst, tooFast(run, condition));
		if (run.state === 'ran' || run.state === 'held') worst = worseOf(worst, highest(run, condition.name, ground));
	});
	for (const reading of measuredReadings(row, ground)) worst = worseOf(worst, reading);
	return checkOf('limit', worst);
};

/** Fail above the limit; near within the margin, which halves once the model agrees with what was measured. */
export function limitVerdict(rpm: number, {plan, anchored}: Ground): Verdict {
	const margin = plan.limit.rpm - rpm;
	if (margin < -roundingRpm) return 'fail';
	return margin < plan.car.margins.limitRpm / (anchored ? 2 : 1) - roundingRpm ? 'near' : 'pass';
}

function reading(
	rpm: number,
	ground: Ground,
	place: string,
	part: string,
	situation: string,
	remark?: string,
): Reading {
	const bound = ground.plan.limit.rpm;
	return {verdict: limitVerdict(rpm, ground), value: rpm, bound, margin: bound - rpm, place, part, situation, remark};
}

function highest({place, result, sequence}: PlaceRun, situation: string, ground: Ground): Reading {
	let rpm = result.exitRpm;
	let part = 'exit';
	let remark: string | undefined;
	if (result.endRpm > rpm) {
		rpm = result.endRpm;
		part = 'end';
	}
	for (const shift of result.shifts) {
		if (shift.rpm <= rpm) continue;
		rpm = shift.rpm;
		part = shiftPart(shift.from);
	}
	if (result.minimumRpm !== null && result.minimumRpm > rpm) {
		rpm = result.minimumRpm;
		part = 'minimum';
	}
	// A restart may be shifted out of early; a straight is driven to its end.
	const reachRpm = place.isRestart ? 0 : (sequence?.reachRpm ?? 0);
	if (reachRpm > result.endRpm + roundingRpm && reachRpm > rpm) {
		rpm = reachRpm;
		part = 'end';
		remark = withoutLimiter;
	}
	return reading(rpm, ground, place.name, part, situation, remark);
}

/** The exit is above what every allowed gear may turn, limiter included. */
function tooFast({place, result}: PlaceRun, {name, vehicle: {topRpm}}: Condition): Reading {
	return {
		verdict: 'fail',
		value: result.exitRpm,
		bound: topRpm,
		margin: topRpm - result.exitRpm,
		place: place.name,
		part: 'exit',
		situation: name,
		remark: 'above the limit in every allowed gear',
	};
}

/** Measured in the base, so it counts only where the base is run. */
function measuredReadings(row: RowRun, ground: Ground): Reading[] {
	const base = row.situations.find(({condition}) => condition.name === ground.plan.base.name);
	if (base === undefined) return [];
	return ground.measured.flatMap(point => {
		const run = base.places[point.index]!;
		if (run.state !== 'ran' && run.state !== 'held') return [];
		const rpm = measuredRpm(ground.plan, point, row.candidate, run.result.endGear);
		return rpm === undefined ? [] : [reading(rpm, ground, point.straight, 'measured', base.condition.name)];
	});
}
