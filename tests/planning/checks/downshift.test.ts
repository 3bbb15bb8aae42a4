import {describe, expect, test} from 'vitest';
import {speedAtRpmMps} from '../../../source/drivetrain/tire.ts';
import {downshift} from '../../../source/planning/checks/downshift.ts';
import {type Change, fakeRow, groundOf, planOf} from '../fake-row.ts';

const plan = planOf();
const {overall} = fakeRow(plan).candidate.train;
/** (9200 − 200)·1.24/1.58: what fourth turns where third would turn 9000. */
const bound = (9000 * 1.24) / 1.58;
const speedAt = (rpm: number) =>
	speedAtRpmMps(rpm, overall[3]!, plan.base.vehicle.rolloutM, plan.base.vehicle.growth, 0);
const of = (rpm: number, back: Change = {result: {exitGear: 3}}) =>
	downshift(
		fakeRow(plan, [{result: {finalSpeedMps: speedAt(rpm), exitGear: 4}}, {lastGear: 3, ...back}]),
		groundOf(plan),
	);

describe('downshift', () => {
	test('passes up to the RPM at which the gear below would turn at the limit less 200, and is near above', () => {
		expect(of(bound - 1)).toMatchObject({verdict: 'pass', at: 'Front entry 4-3', situation: 'Base'});
		expect(of(bound - 1)!.bound).toBeCloseTo(bound, 9);
		expect(of(bound - 1)!.margin).toBeCloseTo(1, 6);
		expect(of(bound + 1)!.verdict).toBe('near');
	});

	test('does not apply where the next straight starts in the same gear', () => {
		expect(of(bound + 1, {lastGear: 4, result: {exitGear: 4}})).toBeUndefined();
	});

	test('goes around: the last straight is followed by the first', () => {
		const row = fakeRow(plan, [
			{lastGear: 3, result: {exitGear: 3}},
			{result: {exitGear: 3, finalSpeedMps: speedAt(8000)}},
		]);
		expect(downshift(row, groundOf(plan))).toMatchObject({at: 'Back entry 4-3', verdict: 'near'});
	});
});
