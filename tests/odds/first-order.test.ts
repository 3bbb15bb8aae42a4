import {expect, test} from 'vitest';
import {firstOrderSteps} from '../../source/odds/first-order.ts';
import {finish} from '../../source/planning/run-rack.ts';
import {runs} from '../runs.ts';
import {ishigami} from './ishigami.ts';

test("the Ishigami function's first-order shares", () => {
	const [shares] = finish(firstOrderSteps(3, point => [ishigami(point)], runs(8192, 65_536), 1));
	// Published: 0.3139, 0.4424 and 0 (Saltelli et al., Sensitivity Analysis in Practice, 2004).
	const published = [0.3139, 0.4424, 0];
	published.forEach((expected, i) => {
		expect(Math.abs(shares![i]!.value - expected)).toBeLessThan(runs(0.02, 0.005));
	});
	for (const {error} of shares!) expect(error).toBeLessThan(0.01);
});

test('of a sum each input has the share of its variance, whatever is added', () => {
	const coefficients = [3, 2, 1, 0];
	const outcomes = (point: readonly number[]) => [
		1e6 + point.reduce((sum, u, i) => sum + coefficients[i]! * u, 0),
		5,
		Number.NaN,
	];
	const [sum, constant, none] = finish(firstOrderSteps(4, outcomes, 1024, 3));
	[9 / 14, 4 / 14, 1 / 14, 0].forEach((expected, i) => {
		expect(Math.abs(sum![i]!.value - expected)).toBeLessThan(0.03);
	});
	for (const shares of [constant!, none!]) for (const share of shares) expect(share).toEqual({value: 0, error: 0});
});

test('the standard error is of the size of the error', () => {
	const inside = Array.from({length: 30}, (_, seed) => {
		const [shares] = finish(firstOrderSteps(3, point => [ishigami(point)], 512, seed));
		const {value, error} = shares![1]!;
		return Math.abs(value - 0.4424) < 2 * error;
	}).filter(Boolean).length;
	// With two standard errors from eight sets, some nine in ten.
	expect(inside).toBeGreaterThanOrEqual(22);
});
