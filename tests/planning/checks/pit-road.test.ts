import {describe, expect, test} from 'vitest';
import {pitRoad} from '../../../source/planning/checks/pit-road.ts';
import {runPitRoad} from '../../../source/planning/run-row.ts';
import {add, car, inch, mph, situation, track} from '../build.ts';
import {fakeRow, groundOf, planOf} from '../fake-row.ts';

const plan = planOf();
const ground = groundOf(plan);
const of = (gear: number, toleranceRpms: number[]) =>
	pitRoad(fakeRow(plan, [], {pitRoad: {gear, rpm: 1, toleranceRpm: toleranceRpms[gear - 1]!, toleranceRpms}}), ground)!;

describe('pitRoad', () => {
	test('passes where a gear is clean at limit + tolerance, from 2500 rpm up to the limit', () => {
		expect(of(1, [2500, 2000])).toMatchObject({verdict: 'pass', value: 2500, bound: 2500, margin: 0});
		expect(of(1, [9200, 2499])).toMatchObject({verdict: 'pass'});
	});

	test('is near where no gear is', () => {
		expect(of(1, [2499.5, 2000])).toMatchObject({verdict: 'near', margin: -0.5, at: 'pit road', situation: ''});
		expect(of(2, [9200.5, 2499])).toMatchObject({verdict: 'near'});
	});

	test('says which gear is clean where the pit gear is not', () => {
		expect(of(2, [3000, 2000])).toMatchObject({verdict: 'pass', remark: 'gear 2 is not clean there; gear 1 is'});
	});

	test('does not apply to a track without one', () => {
		expect(pitRoad(fakeRow(plan), ground)).toBeUndefined();
	});
});

describe('the pit gear', () => {
	const {candidate} = fakeRow(plan);
	const at = (limitMps: number, gear?: number) =>
		runPitRoad(planOf(car(), track({pitRoad: {limitMps, toleranceMps: 5 * mph, gear}})), candidate)!;

	test('is the lowest with 1000 rpm under the limit at limit + tolerance', () => {
		expect(at(40 * mph).gear).toBe(1);
		const fast = at(60 * mph);
		expect(fast.gear).toBe(2);
		expect(fast.toleranceRpms[0]).toBeGreaterThan(8200);
		expect(fast.toleranceRpms[1]).toBeLessThanOrEqual(8200);
	});

	test('is the given one, and the highest where none is slow enough', () => {
		expect(at(40 * mph, 3).gear).toBe(3);
		expect(at(300 * mph).gear).toBe(5);
	});

	test('turns without slip on the largest tire of the situations', () => {
		// 40 mph = 17.8816 m/s; C = (2/(1/2.2+1/2.2)) + 0.0254 m; R1 = 2.9·(38/33)·3.25 = 10.85303
		const tires = {leftM: 2.2, rightM: 2.2, growth: 0, slip: 0.03, steadySlip: 0, diameterM: undefined};
		const wide = situation('Wide', {rollout: add(inch)});
		const run = runPitRoad(planOf(car({tires}), track({situations: [situation('Base'), wide]})), candidate)!;
		expect(run.rpm).toBeCloseTo((60 * 17.8816 * 10.8530303) / 2.2254, 4);
	});
});
