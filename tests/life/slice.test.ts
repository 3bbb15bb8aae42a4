import {expect, test} from 'vitest';
import {cutsBetween, isAbove, stepOf} from '../../source/life/slice.ts';

const held = (rpm: number) => ({fromRpm: rpm, toRpm: rpm});

test('a step holds its upper end and not its lower one', () => {
	expect([8750, 8750.1, 9000, 9000.1].map(rpm => stepOf(held(rpm)) * 250)).toEqual([8500, 8750, 8750, 9000]);
});

test('an RPM that was a speed in between stays in its step', () => {
	expect(stepOf(held(9000.000000002)) * 250).toBe(8750);
});

test('standstill is in the first step', () => {
	expect(stepOf(held(0))).toBe(0);
});

test('cuts are the whole steps between, and the RPM asked about, in the order of travel', () => {
	expect(cutsBetween(7400, 8100, 7900)).toEqual([7500, 7750, 7900, 8000]);
	expect(cutsBetween(8100, 7400, 7900)).toEqual([8000, 7900, 7750, 7500]);
	expect(cutsBetween(7500, 7750, 7750)).toEqual([]);
	expect(cutsBetween(8000, 8000, 8000)).toEqual([]);
});

test('at an RPM is not above it', () => {
	expect(isAbove(held(8500), 8500)).toBe(false);
	expect(isAbove({fromRpm: 8500, toRpm: 8600}, 8500)).toBe(true);
	expect(isAbove({fromRpm: 8500, toRpm: 8400}, 8500)).toBe(false);
});
