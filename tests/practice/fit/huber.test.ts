import {describe, expect, test} from 'vitest';
import {huberFit, huberWeight} from '../../../source/practice/fit/huber.ts';
import {median, medianLine, quantile, robustSd} from '../../../source/practice/fit/robust.ts';
import {stackLoss} from './stack-loss.ts';

// Huber 1964: w(u) = min(1, k/|u|), k = 1.345.
test.each([
	[0, 1],
	[1.345, 1],
	[-1.345, 1],
	[2.69, 0.5],
	[-13.45, 0.1],
])('the weight at %d standard deviations is %d', (u, weight) => {
	expect(huberWeight(u)).toBeCloseTo(weight, 14);
});

test("Huber's fit of the stack loss data and its standard errors are those of the statistics packages", () => {
	const fit = huberFit(stackLoss.columns, stackLoss.y)!;
	for (const [j, value] of stackLoss.coefficients.entries()) {
		expect(Math.abs(fit.coefficients[j]! / value - 1)).toBeLessThan(5e-4);
		expect(Math.abs(Math.sqrt(fit.covariance[5 * j]!) / stackLoss.standardErrors[j]! - 1)).toBeLessThan(3e-3);
	}
});

test('one reading far off hardly moves the fit', () => {
	const x = Float64Array.from({length: 40}, (_, i) => i);
	const y = x.map((value, i) => 2 + 0.5 * value + 0.01 * Math.sin(7 * i));
	const columns = [x.map(() => 1), x];
	const clean = huberFit(columns, y)!;
	const spoiled = huberFit(
		columns,
		y.map((value, i) => (i === 35 ? 1e6 : value)),
	)!;
	expect(Math.abs(spoiled.coefficients[1]! - clean.coefficients[1]!)).toBeLessThan(3e-4);
	expect(spoiled.weights[35]!).toBeLessThan(1e-6);
});

test('readings that err together count as one: repeating each ten times does not shrink the standard error', () => {
	const x = Array.from({length: 30}, (_, i) => i / 10);
	const y = x.map((value, i) => 1 + value + 0.1 * Math.sin(13 * i));
	const columnsOf = (values: number[]) => [Float64Array.from(values, () => 1), Float64Array.from(values)];
	const once = huberFit(
		columnsOf(x),
		Float64Array.from(y),
		x.map((_, i) => i),
	)!;
	const repeat = <T>(values: T[]) => values.flatMap(value => Array.from({length: 10}, () => value));
	const often = huberFit(columnsOf(repeat(x)), Float64Array.from(repeat(y)), repeat(x.map((_, i) => i)))!;
	expect(Math.sqrt(often.covariance[3]! / once.covariance[3]!)).toBeGreaterThan(0.93);
	expect(Math.sqrt(often.covariance[3]! / once.covariance[3]!)).toBeLessThan(1.02);
	expect(
		Math.sqrt(huberFit(columnsOf(repeat(x)), Float64Array.from(repeat(y)))!.covariance[3]! / once.covariance[3]!),
	).toBeLessThan(0.5);
});

test('one group alone tells nothing of the error', () => {
	const x = Float64Array.of(1, 2, 3, 4);
	expect(huberFit([x.map(() => 1), x], x, [7, 7, 7, 7])!.covariance[0]).toBe(Number.POSITIVE_INFINITY);
});

test('an exact line is found exactly, with no error', () => {
	const x = Float64Array.of(1, 2, 3, 4);
	const fit = huberFit(
		[x.map(() => 1), x],
		x.map(value => 3 - value),
	)!;
	expect(fit.coefficients[1]!).toBeCloseTo(-1, 12);
	expect(fit.covariance[3]!).toBeLessThan(1e-20);
});

describe('medians', () => {
	test('the median of 3, 1 and 2 is 2; of four it is the mean of the middle two; of none NaN', () => {
		expect(median([3, 1, 2])).toBe(2);
		expect(median([4, 1, 3, 2])).toBe(2.5);
		expect(median([])).toBeNaN();
		expect(quantile([10, 20, 30], 0.25)).toBe(15);
	});

	test('the robust standard deviation of 1 to 5 is 1/0.6745', () => {
		expect(robustSd([5, 3, 1, 2, 4])).toBeCloseTo(1.4826022, 6);
	});

	test('the line of medians ignores a stray point', () => {
		const line = medianLine([0, 1, 2, 3, 4], [1, 3, 500, 7, 9]);
		expect(line.slope).toBe(2);
		expect(line.at(10)).toBe(21);
	});
});
