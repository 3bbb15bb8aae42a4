import {describe, expect, test} from 'vitest';
import type {Car, RackPair} from '../../../source/drivetrain/car.ts';
import type {Track} from '../../../source/drivetrain/track.ts';
import {candidateOf} from '../../../source/planning/candidates.ts';
import type {RowCheck} from '../../../source/planning/checks/check.ts';
import {housing, mileage, stock} from '../../../source/planning/checks/hardware.ts';
import {permitted} from '../../../source/planning/checks/permitted.ts';
import {car, pair, rackPair, track} from '../build.ts';
import {fakeRow, groundOf, planOf} from '../fake-row.ts';

function of(check: RowCheck, mounted: RackPair, change: Partial<Car> = {}, trackChange: Partial<Track> = {}) {
	const plan = planOf(car(change), track(trackChange));
	const candidate = candidateOf(plan.car, mounted, plan.car.gearboxes[0]!);
	return check(fakeRow(plan, [], {candidate}), groundOf(plan));
}

describe('housing', () => {
	const rack = {...car().rack, toothSums: [71, 72]};

	test('passes a tooth sum that the case accepts and fails its neighbors', () => {
		expect(of(housing, rackPair(33, 38), {rack})).toMatchObject({verdict: 'pass', value: 71, margin: 0});
		expect(of(housing, rackPair(33, 37), {rack})).toMatchObject({verdict: 'fail', value: 70, bound: 71, margin: -1});
		expect(of(housing, rackPair(33, 40), {rack})).toMatchObject({verdict: 'fail', bound: 72});
	});

	test('does not apply where every sum fits', () => {
		expect(of(housing, rackPair(33, 38))).toBeUndefined();
	});
});

describe('stock', () => {
	test('needs one set on hand', () => {
		expect(of(stock, rackPair(33, 38, {sets: 1}))).toMatchObject({verdict: 'pass', margin: 0});
		expect(of(stock, rackPair(33, 38, {sets: 0}))).toMatchObject({verdict: 'fail', margin: -1});
	});
});

describe('mileage', () => {
	const worn = (milesM: number) => of(mileage, rackPair(33, 38, {milesM, maxMilesM: 1000}));

	test('passes up to nine tenths, is near up to the most, and fails above', () => {
		expect(worn(900)).toMatchObject({verdict: 'pass', margin: 100});
		expect(worn(901)!.verdict).toBe('near');
		expect(worn(1000)).toMatchObject({verdict: 'near', margin: 0});
		expect(worn(1001)).toMatchObject({verdict: 'fail', value: 1001, bound: 1000, margin: -1});
	});

	test('does not apply without a most', () => {
		expect(of(mileage, rackPair(33, 38))).toBeUndefined();
	});
});

describe('permitted', () => {
	const none = {rpmLimit: undefined, gearboxes: undefined, pairs: undefined};

	test('passes what both rule books list', () => {
		const rules = {short: {...none, gearboxes: ['A']}};
		expect(of(permitted, rackPair(33, 38), {rules}, {rules: {...none, pairs: [pair(33, 38)]}})).toMatchObject({
			verdict: 'pass',
			at: '',
			situation: '',
		});
	});

	test('fails what the car’s rules for this type of track or the track’s own leave out', () => {
		const rules = {short: {...none, gearboxes: ['B']}};
		expect(of(permitted, rackPair(33, 38), {rules})!.verdict).toBe('fail');
		const flippedOnly = {...none, pairs: [pair(38, 33)]};
		expect(of(permitted, rackPair(33, 38), {}, {rules: flippedOnly})!.remark).toBe(
			'33/38 is not among the pairs of the rules',
		);
	});

	test('does not apply without a list, nor by the rules of another type of track', () => {
		expect(of(permitted, rackPair(33, 38))).toBeUndefined();
		expect(of(permitted, rackPair(33, 38), {rules: {road: {...none, gearboxes: ['B']}}})).toBeUndefined();
	});

	test('fails a gearbox that has none of the allowed gears', () => {
		const plan = planOf();
		expect(permitted(fakeRow(plan, [{state: 'noGear'}]), groundOf(plan))).toMatchObject({
			verdict: 'fail',
			remark: 'gearbox A has none of the gears allowed on Front',
		});
	});
});
