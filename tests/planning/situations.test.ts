import fc from 'fast-check';
import {describe, expect, test} from 'vitest';
import {
	apply,
	carAt,
	carIn,
	headwindMps,
	keepsVehicle,
	replacedBy,
	straightIn,
	windIn,
} from '../../source/planning/situations.ts';
import {runs} from '../runs.ts';
import {add, car, scale, set, situation, straight, track} from './build.ts';

const degree = Math.PI / 180;

describe('a change', () => {
	test('adds, scales or replaces, and without one the value stays', () => {
		expect(apply(add(-3), 40)).toBe(37);
		expect(apply(scale(0.85), 40)).toBe(34);
		expect(apply(set(38), 40)).toBe(38);
		expect(apply(undefined, 40)).toBe(40);
	});
});

describe('the car in a situation', () => {
	test('changes mass, drag and grip, and both tires by rollout', () => {
		const changed = carIn(
			situation('x', {mass: add(10), drag: scale(0.5), grip: set(1), rollout: add(-0.01)}),
			car({massKg: 1600, dragAreaM2: 1, tires: {...car().tires, leftM: 2.1, rightM: 2.2}}),
		);
		expect([changed.massKg, changed.dragAreaM2, changed.grip]).toEqual([1610, 0.5, 1]);
		expect(changed.tires.leftM).toBeCloseTo(2.09, 12);
		expect(changed.tires.rightM).toBeCloseTo(2.19, 12);
	});

	test('at a track has the track’s own numbers, where they are given', () => {
		const own = {
			tires: {leftM: 2},
			grip: 1.1,
			power: 0.98,
			massKg: undefined,
			dragAreaM2: undefined,
			downforceAreaM2: 2,
		};
		const changed = carAt(track({car: own}), car({massKg: 1600, tires: {...car().tires, rightM: 2.2}}));
		expect([changed.tires.leftM, changed.tires.rightM, changed.grip, changed.massKg]).toEqual([2, 2.2, 1.1, 1600]);
		expect(changed.engines.map(({power}) => power)).toEqual([0.98]);
		expect(replacedBy(own)).toEqual(['tires', 'grip', 'power', 'downforce area']);
	});

	test('is the base’s vehicle where only speeds and wind change', () => {
		expect(keepsVehicle(situation('x', {exit: add(1), headwindMps: 2, wind: {speedMps: 3}}))).toBe(true);
		expect(keepsVehicle(situation('x', {rollout: add(0.1)}))).toBe(false);
		expect(keepsVehicle(situation('x', {power: {kind: 'scale', factor: 1}}))).toBe(false);
	});
});

describe('a straight in a situation', () => {
	test('changes only the speeds that it has', () => {
		const change = situation('x', {exit: add(1), minimum: add(-1), entry: set(30), end: scale(2)});
		expect(straightIn(change, straight('s', {exitMps: 40, minimumMps: 30}))).toMatchObject({
			exitMps: 41,
			minimumMps: 29,
			entryMps: undefined,
			endMps: undefined,
		});
		const held = straight('s', {exitMps: 40, endMps: 50, lengthM: undefined});
		expect(straightIn(change, held)).toMatchObject({exitMps: 41, endMps: 100});
	});
});

describe('headwind', () => {
	test('is the whole wind against the heading, and none across it', () => {
		const fromWest = {speedMps: 4, fromRad: 270 * degree};
		expect(headwindMps(fromWest, 270 * degree)).toBe(4);
		expect(headwindMps(fromWest, 90 * degree)).toBeCloseTo(-4, 12);
		expect(headwindMps(fromWest, 0)).toBeCloseTo(0, 12);
	});

	test('is 0 without a heading, a speed or a direction', () => {
		expect(headwindMps({speedMps: 4, fromRad: 0}, undefined)).toBe(0);
		expect(headwindMps({speedMps: 4}, 0)).toBe(0);
		expect(headwindMps({fromRad: 0}, 0)).toBe(0);
	});

	test('out and back is the same wind with the other sign', () => {
		fc.assert(
			fc.property(
				fc.double({min: 0, max: 7, noNaN: true}),
				fc.double({min: 0, max: 7, noNaN: true}),
				(fromRad, heading) => {
					const wind = {speedMps: 5, fromRad};
					expect(headwindMps(wind, heading) + headwindMps(wind, heading + Math.PI)).toBeCloseTo(0, 10);
				},
			),
			{numRuns: runs(50, 1000)},
		);
	});

	test('of a situation keeps what it does not replace', () => {
		expect(windIn(situation('x', {wind: {speedMps: 9}}), {speedMps: 4, fromRad: 1})).toEqual({speedMps: 9, fromRad: 1});
		expect(windIn(situation('x'), undefined)).toEqual({});
	});
});
