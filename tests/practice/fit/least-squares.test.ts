/**
 * Reference sets of NIST, Statistical Reference Datasets, linear regression. Data and certified values from memory; that
 * they agree with each other to so many digits shows that both were remembered well.
 */
import {describe, expect, test} from 'vitest';
import {leastSquares, residualSd, standardErrors} from '../../../source/practice/fit/least-squares.ts';

/** How many digits two numbers agree in, at most 15; the measure that NIST uses (log relative error). */
function digits(found: number, certified: number): number {
	const error = certified === 0 ? Math.abs(found) : Math.abs(found - certified) / Math.abs(certified);
	return error === 0 ? 15 : Math.min(15, -Math.log10(error));
}

const fewest = (found: ArrayLike<number>, certified: readonly number[]) =>
	Math.min(...certified.map((value, i) => digits(found[i]!, value)));

const ones = (count: number) => new Float64Array(count).fill(1);

test('Norris: a line through 36 points, to 11 digits', () => {
	const y = Float64Array.of(
		0.1,
		338.8,
		118.1,
		888,
		9.2,
		228.1,
		668.5,
		998.5,
		449.1,
		778.9,
		559.2,
		0.3,
		0.1,
		778.1,
		668.8,
		339.3,
		448.9,
		10.8,
		557.7,
		228.3,
		998,
		888.8,
		119.6,
		0.3,
		0.6,
		557.6,
		339.3,
		888,
		998.5,
		778.9,
		10.2,
		117.6,
		228.9,
		668.4,
		449.2,
		0.2,
	);
	const x = Float64Array.of(
		0.2,
		337.4,
		118.2,
		884.6,
		10.1,
		226.5,
		666.3,
		996.3,
		448.6,
		777,
		558.2,
		0.4,
		0.6,
		775.5,
		666.9,
		338,
		447.5,
		11.6,
		556,
		228.1,
		995.8,
		887.6,
		120.2,
		0.3,
		0.3,
		556.8,
		339.1,
		887.2,
		999,
		779,
		11.1,
		118.3,
		229.2,
		669.1,
		448.9,
		0.5,
	);
	const fit = leastSquares([ones(36), x], y)!;
	expect(fewest(fit.coefficients, [-0.262323073774029, 1.00211681802045])).toBeGreaterThan(11);
	expect(fewest(standardErrors(fit), [0.232818234301152, 0.429796848199937e-3])).toBeGreaterThan(11);
	expect(digits(residualSd(fit.residuals, 2), 0.884796396144373)).toBeGreaterThan(11);
});

test('Longley: seven nearly dependent columns, to 8 digits', () => {
	const rows = [
		[60323, 83, 234289, 2356, 1590, 107608, 1947],
		[61122, 88.5, 259426, 2325, 1456, 108632, 1948],
		[60171, 88.2, 258054, 3682, 1616, 109773, 1949],
		[61187, 89.5, 284599, 3351, 1650, 110929, 1950],
		[63221, 96.2, 328975, 2099, 3099, 112075, 1951],
		[63639, 98.1, 346999, 1932, 3594, 113270, 1952],
		[64989, 99, 365385, 1870, 3547, 115094, 1953],
		[63761, 100, 363112, 3578, 3350, 116219, 1954],
		[66019, 101.2, 397469, 2904, 3048, 117388, 1955],
		[67857, 104.6, 419180, 2822, 2857, 118734, 1956],
		[68169, 108.4, 442769, 2936, 2798, 120445, 1957],
		[66513, 110.8, 444546, 4681, 2637, 121950, 1958],
		[68655, 112.6, 482704, 3813, 2552, 123366, 1959],
		[69564, 114.2, 502601, 3931, 2514, 125368, 1960],
		[69331, 115.7, 518173, 4806, 2572, 127852, 1961],
		[70551, 116.9, 554894, 4007, 2827, 130081, 1962],
	];
	const column = (j: number) => Float64Array.from(rows, row => row[j]!);
	const fit = leastSquares([ones(16), ...[1, 2, 3, 4, 5, 6].map(column)], column(0))!;
	const certified = [
		-3482258.63459582, 15.0618722713733, -0.35819179292591e-1, -2.02022980381683, -1.03322686717359,
		-0.511041056535807e-1, 1829.15146461355,
	];
	const errors = [
		890420.383607373, 84.9149257747669, 0.334910077722432e-1, 0.488399681651699, 0.214274163161675, 0.22607320006937,
		455.478499142212,
	];
	expect(fewest(fit.coefficients, certified)).toBeGreaterThan(8);
	expect(fewest(standardErrors(fit), errors)).toBeGreaterThan(8);
	expect(digits(residualSd(fit.residuals, 7), 304.854073561965)).toBeGreaterThan(8);
});

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
