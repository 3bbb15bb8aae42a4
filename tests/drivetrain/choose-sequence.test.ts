import {describe, expect, test} from 'vitest';
import {chosenOf, fastestOf} from '../../source/drivetrain/choose-sequence.ts';
import type {Finish} from '../../source/drivetrain/sequence.ts';

/** A finish of so many shifts, so long at the limiter. */
function finish(timeS: number, shifts: number, limiterM = 0): Finish {
	const place = {speedMps: 50, distanceM: 100, timeS: 1};
	return {
		firstGear: 1,
		entered: Array.from({length: shifts}, () => ({...place, shiftMps: 51})),
		heldFrom: limiterM > 0 ? place : undefined,
		fullThrottleEnd: place,
		shortlyBefore: undefined,
		timeS,
		limiterM,
		pastTop: limiterM > 0,
	};
}

describe('the sequence driven', () => {
	test('is the only one', () => {
		const only = finish(10, 3, 40);
		expect(chosenOf([only], 0.02)).toBe(only);
		expect(fastestOf([only])).toBe(only);
	});

	test('is the fastest where the others are slower by more than what counts as the same time', () => {
		const fastest = finish(10, 3, 40);
		expect(chosenOf([finish(10.03, 0), fastest, finish(10.021, 1)], 0.02)).toBe(fastest);
		expect(fastestOf([finish(10.03, 0), fastest])).toBe(fastest);
	});

	test('never touches the limiter if one as fast does not, whatever its shifts', () => {
		const clean = finish(10.015, 4);
		expect(chosenOf([finish(10, 1, 5), clean, finish(10.01, 0, 0.1)], 0.02)).toBe(clean);
	});

	test('has the fewest shifts of those that do not touch it', () => {
		const fewest = finish(10.019, 1);
		expect(chosenOf([finish(10, 3), fewest, finish(10.001, 2), finish(10.01, 0, 1)], 0.02)).toBe(fewest);
	});

	test('is the fastest of those with as many shifts', () => {
		const best = finish(10.004, 1);
		expect(chosenOf([finish(10.01, 1), best, finish(10.006, 1), finish(10, 2)], 0.02)).toBe(best);
	});

	test('has the fewest shifts where all touch the limiter', () => {
		const fewest = finish(10.01, 1, 90);
		expect(chosenOf([finish(10, 2, 5), fewest, finish(10.005, 3, 1)], 0.02)).toBe(fewest);
	});

	test('may be slower by exactly what counts as the same time', () => {
		const level = finish(10.5, 0);
		expect(chosenOf([finish(10, 1), level], 0.5)).toBe(level);
		expect(chosenOf([finish(10, 1), level], 0.499)).not.toBe(level);
	});

	test('is the fastest alone where no two times count as the same', () => {
		const fastest = finish(10, 3, 40);
		expect(chosenOf([finish(10.0001, 0), fastest], 0)).toBe(fastest);
	});

	test('does not depend on the order they come in, but for exact ties, where the first stays', () => {
		const all = [finish(10, 2), finish(10.01, 1), finish(10.012, 1), finish(10.005, 3, 2)];
		expect(chosenOf(all, 0.02)).toBe(all[1]);
		expect(chosenOf([...all].reverse(), 0.02)).toBe(all[1]);
		const [one, other] = [finish(10, 1), finish(10, 1)];
		expect(chosenOf([one, other], 0.02)).toBe(one);
		expect(fastestOf([one, other])).toBe(one);
	});
});
