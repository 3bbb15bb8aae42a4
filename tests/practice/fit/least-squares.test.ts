import {describe, expect, test} from 'vitest';
import {leastSquares, residualSd, standardErrors} from '../../../source/practice/fit/least-squares.ts';
import {longley, norris} from './reference-sets.ts';

/** How many digits two numbers agree in, at most 15; the measure that NIST uses (log relative error). */
function digits(found: number, certified: number): number {
	const error = certified === 0 ? Math.abs(found) : Math.abs(found - certified) / Math.abs(certified);
	return error === 0 ? 15 : Math.min(15, -Math.log10(error));
}

const fewest = (found: ArrayLike<number>, certified: readonly number[]) =>
	Math.min(...certified.map((value, i) => digits(found[i]!, value)));

const ones = (count: number) => new Float64Array(count).fill(1);

test.each([
	['Norris', norris, 11],
	['Longley', longley, 8],
] as const)('%s: coefficients, standard errors and residuals', (_, {columns, y, ...certified}, least) => {
	const fit = leastSquares(columns, y)!;
	expect(fewest(fit.coefficients, certified.coefficients)).toBeGreaterThan(least);
	expect(fewest(standardErrors(fit), certified.standardErrors)).toBeGreaterThan(least);
	expect(digits(residualSd(fit.residuals, columns.length), certified.residualSd)).toBeGreaterThan(least);
});

// NIST's sets of that name, from memory.
describe('Wampler: a polynomial of the fifth degree over 0 to 20', () => {
	const x = Float64Array.from({length: 21}, (_, i) => i);
	const columns = [0, 1, 2, 3, 4, 5].map(power => x.map(value => value ** power));
	const sumOf = (base: number) => x.map(value => columns.reduce((sum, _, power) => sum + (base * value) ** power, 0));
	// What Wampler3 to 5 add to Wampler1, 1, 100 and 10000 times.
	const added = [
		759, -2048, 2048, -2048, 2523, -2048, 2048, -2048, 1838, -2048, 2048, -2048, 1838, -2048, 2048, -2048, 2523, -2048,
		2048, -2048, 759,
	];
	const errors = [
		2152.3262467817, 2363.55173469681, 779.343524331583, 101.47550755035, 5.64566512170752, 0.112324854679312,
	];

	test('Wampler1: every coefficient is 1, to 8 digits', () => {
		expect(fewest(leastSquares(columns, sumOf(1))!.coefficients, [1, 1, 1, 1, 1, 1])).toBeGreaterThan(8);
	});

	test('Wampler2: the coefficients are powers of a tenth, to 11 digits', () => {
		const found = leastSquares(columns, sumOf(0.1))!.coefficients;
		expect(fewest(found, [1, 0.1, 0.01, 0.001, 0.0001, 0.00001])).toBeGreaterThan(11);
	});

	test.each([
		['Wampler3', 1, 8],
		['Wampler4', 100, 7],
		['Wampler5', 10_000, 5],
	])('%s: noise %d times over, to %d digits', (_, times, least) => {
		const y = sumOf(1).map((value, i) => value + times * added[i]!);
		const fit = leastSquares(columns, y)!;
		expect(fewest(fit.coefficients, [1, 1, 1, 1, 1, 1])).toBeGreaterThan(least);
		expect(
			fewest(
				standardErrors(fit),
				errors.map(error => error * times),
			),
		).toBeGreaterThan(10);
		expect(digits(residualSd(fit.residuals, 6), 2360.14502379268 * times)).toBeGreaterThan(10);
	});
});

test('columns that do not determine the coefficients give no fit', () => {
	const x = Float64Array.of(1, 2, 3, 4);
	expect(leastSquares([ones(4), x, x.map(value => 3 * value + 2)], x)).toBeUndefined();
	expect(leastSquares([ones(4), new Float64Array(4)], x)).toBeUndefined();
	expect(leastSquares([ones(1), Float64Array.of(2)], Float64Array.of(1))).toBeUndefined();
});

test('a weight of 3 is the same as the reading three times', () => {
	const [x, y] = [Float64Array.of(1, 2, 4, 7), Float64Array.of(2, 3, 7, 6)];
	const weighted = leastSquares([ones(4), x], y, Float64Array.of(1, 3, 1, 1))!;
	const repeated = leastSquares([ones(6), Float64Array.of(1, 2, 2, 2, 4, 7)], Float64Array.of(2, 3, 3, 3, 7, 6))!;
	expect([...weighted.coefficients].map(b => b.toFixed(12))).toEqual(
		[...repeated.coefficients].map(b => b.toFixed(12)),
	);
	expect([...weighted.inverse].map(b => b.toFixed(12))).toEqual([...repeated.inverse].map(b => b.toFixed(12)));
});
