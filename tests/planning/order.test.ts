import {describe, expect, test} from 'vitest';
import {candidateOf} from '../../source/planning/candidates.ts';
import {compareRows, type Judged} from '../../source/planning/order.ts';
import {rowOf} from '../../source/planning/row.ts';
import {car, rackPair, track} from './build.ts';
import {type Change, fakeRow, groundOf, planOf} from './fake-row.ts';

const plan = planOf(car(), track({restart: undefined}));

function judged(driving: number, driven: number, change: Change, gearbox = 0, sets = 1): Judged {
	const candidate = candidateOf(plan.car, rackPair(driving, driven, {sets}), plan.car.gearboxes[gearbox]!);
	const run = fakeRow(plan, [change], {candidate});
	return {run, row: rowOf(run, groundOf(plan))};
}

const comesFirst = (one: Judged, other: Judged) => {
	expect(compareRows(one, other)).toBeLessThan(0);
	expect(compareRows(other, one)).toBeGreaterThan(0);
};

describe('of two rows the first is', () => {
	test('the one without a failed check, even if it is slower', () => {
		comesFirst(judged(33, 38, {result: {fastestS: 7}}), judged(32, 39, {result: {fastestS: 6, endRpm: 9300}}));
	});

	test('the faster, even if it is only near', () => {
		comesFirst(judged(33, 38, {result: {fastestS: 5.9, endRpm: 9190}}), judged(32, 39, {result: {fastestS: 6}}));
	});

	test('the one with a time', () => {
		comesFirst(
			judged(33, 38, {result: {fastestS: 60, endRpm: 9300}}),
			judged(32, 39, {state: 'overLimit', result: {exitRpm: 9201}}),
		);
	});

	test('at equal times the one with the larger margin to the limit', () => {
		comesFirst(judged(33, 38, {result: {endRpm: 8600}}), judged(32, 39, {result: {endRpm: 8700}}));
	});

	test('then the one of the earlier gearbox, then of fewer driving teeth, then of fewer driven teeth, then of more sets', () => {
		comesFirst(judged(33, 38, {}, 0), judged(32, 39, {}, 1));
		comesFirst(judged(32, 39, {}), judged(33, 38, {}));
		comesFirst(judged(33, 37, {}), judged(33, 38, {}));
		comesFirst(judged(33, 38, {}, 0, 2), judged(33, 38, {}, 0, 1));
	});
});
