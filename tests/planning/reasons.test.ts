import {describe, expect, test} from 'vitest';
import {candidateOf} from '../../source/planning/candidates.ts';
import {failureReason} from '../../source/planning/failure-reasons.ts';
import type {Judged} from '../../source/planning/order.ts';
import {reasonsOf} from '../../source/planning/reasons.ts';
import type {Check, Row} from '../../source/planning/results.ts';
import {rowOf} from '../../source/planning/row.ts';
import {car, rackPair, situation, track} from './build.ts';
import {type Change, fakeRow, groundOf, planOf, shift} from './fake-row.ts';

const plan = planOf(car(), track({situations: [situation('Base')], restart: undefined}));

function judged(driving: number, driven: number, ...straights: Change[]): Judged {
	const candidate = candidateOf(plan.car, rackPair(driving, driven), plan.car.gearboxes[0]!);
	const run = fakeRow(plan, straights, {candidate});
	return {run, row: rowOf(run, groundOf(plan))};
}

const timed = (fastestS: number, endRpm = 8500, change: Change['result'] = {}): Change => ({
	result: {fastestS, endRpm, ...change},
});

describe('the reason', () => {
	test('of the first says how far it is ahead and how far from the limit', () => {
		const rows = [judged(33, 38, timed(6, 9120)), judged(32, 39, timed(6.05))];
		expect(reasonsOf(rows, plan)[0]).toBe(
			'Fastest of 2 that fail no check: 0.050 s a lap ahead of 32/39 A; highest RPM 9120 at Front end, 80 under the limit.',
		);
	});

	test('of a slower row says what it loses, and where most', () => {
		const rows = [judged(33, 38, timed(6), timed(6)), judged(32, 39, timed(6.01), timed(6.031))];
		expect(reasonsOf(rows, plan)[1]).toBe(
			'0.041 s a lap slower than 33/38 A, most on Back (0.031 s); 700 under the limit.',
		);
	});

	test('of level rows says what tells them apart, at 0.02 s and below', () => {
		const shifts = [shift({rpm: 8000})];
		const rows = [
			judged(33, 38, timed(6, 9100, {shifts})),
			judged(32, 39, timed(6.015, 8900)),
			judged(31, 40, timed(6.021)),
		];
		const reasons = reasonsOf(rows, plan);
		expect(reasons[0]).toBe(
			'Fastest of 3 that fail no check, level with 32/39 A (0.015 s a lap): margin 100 rpm against 300, 1 shift against 0.',
		);
		expect(reasons[1]).toMatch(
			/^Level with 33\/38 A \(0\.015 s a lap slower\): margin 300 rpm against 100, 0 shifts against 1/,
		);
		expect(reasons[2]).toMatch(/^0\.021 s a lap slower than 33\/38 A/);
	});

	test('rounds a margin down, a highest RPM up, and a lead that does not show as what it is under', () => {
		const rows = [judged(33, 38, timed(6, 9120.4)), judged(32, 39, timed(6.0001, 9100.000000000004))];
		expect(reasonsOf(rows, plan)[0]).toBe(
			'Fastest of 2 that fail no check, level with 32/39 A (under 0.001 s a lap): margin 79 rpm against 100.',
		);
	});

	test('of the only one that fails no check says so, and of rows without times who has the widest margin', () => {
		const [pass, fail] = [judged(33, 38), judged(32, 39, timed(5, 9400))];
		expect(reasonsOf([pass, fail], plan)).toEqual([
			'The only one of 2 that fails no check: highest RPM 8500 at Front end, 700 under the limit.',
			'Over the limit: 9400 at Front end, 200 above 9200.',
		]);
	});

	test('of the first says that none passes where none does', () => {
		const rows = [judged(33, 38, timed(5, 9300)), judged(32, 39, timed(6, 9400))];
		expect(reasonsOf(rows, plan)[0]).toBe(
			'Each of the 2 fails a check. Over the limit: 9300 at Front end, 100 above 9200.',
		);
	});
});

describe('a failure', () => {
	const fails = (check: Partial<Check>): string =>
		failureReason({
			checks: [
				{check: 'limit', verdict: 'fail', value: null, bound: null, margin: null, at: '', situation: '', ...check},
			],
		} as Row);

	test('is one sentence for each check that can fail', () => {
		const tow = {at: 'Front end', situation: 'In the tow'};
		expect(fails({...tow, value: 9310, bound: 9200, margin: -110})).toBe(
			'Over the limit: 9310 at Front end (In the tow), 110 above 9200.',
		);
		expect(fails({...tow, value: 9310, bound: 9200, margin: -110, remark: 'without the limiter'})).toBe(
			'Over the limit: 9310 at Front end (In the tow) without the limiter, 110 above 9200.',
		);
		expect(fails({...tow, check: 'limiter', value: 36.576})).toBe(
			'On the limiter for 120 ft (37 m) at Front end (In the tow).',
		);
		expect(fails({check: 'band', at: 'Back exit', situation: 'Base', remark: 'stops before the end'})).toBe(
			'Back exit: stops before the end.',
		);
		expect(fails({check: 'housing', value: 70, bound: 71})).toBe(
			'Does not fit the housing: tooth sum 70, nearest accepted 71.',
		);
		expect(fails({check: 'stock'})).toBe('No set on hand.');
		expect(fails({check: 'mileage', value: 1250 * 1609.344, bound: 1200 * 1609.344})).toBe(
			'Out of miles: 1250 miles (2012 km) of 1200 miles (1931 km).',
		);
		expect(fails({check: 'permitted', remark: 'x'})).toBe('Not permitted: x.');
	});

	test('names what else fails', () => {
		const two = judged(33, 38, timed(6, 9400, {limiterM: 3}));
		expect(failureReason(two.row)).toBe('Over the limit: 9400 at Front end, 200 above 9200; also on the limiter.');
	});
});
