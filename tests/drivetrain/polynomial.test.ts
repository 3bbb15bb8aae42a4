import fc from 'fast-check';
import {expect, test} from 'vitest';
import {signChanges} from '../../source/drivetrain/polynomial.ts';
import {runs} from '../runs.ts';

test('a constant never changes sign, a line once', () => {
	expect(signChanges([3], -1, 1)).toEqual([]);
	expect(signChanges([], -1, 1)).toEqual([]);
	expect(signChanges([-1, 2], 0, 1)).toEqual([0.5]);
	expect(signChanges([-1, 2], 0.6, 1)).toEqual([]);
});

test('where it only touches zero it changes no sign', () => {
	// (x − 1/2)²
	expect(signChanges([0.25, -1, 1], 0, 1)).toEqual([]);
});

// Wilkinson's kind, small: (x − 1)(x − 2)(x − 3)(x − 4) = 24 − 50x + 35x² − 10x³ + x⁴.
test('all four of a quartic are found, rising', () => {
	signChanges([24, -50, 35, -10, 1], 0, 5).forEach((root, i) => {
		expect(Math.abs(root - (i + 1))).toBeLessThan(1e-13);
	});
	expect(signChanges([24, -50, 35, -10, 1], 0, 5)).toHaveLength(4);
	expect(signChanges([24, -50, 35, -10, 1], 1.5, 3.5)).toHaveLength(2);
});

test('the roots that a cubic was made from are found again', () => {
	const gap = fc.double({min: 0.05, max: 0.5, noNaN: true});
	fc.assert(
		fc.property(gap, gap, gap, fc.constantFrom(-3, 2), (first, second, third, lead) => {
			const [a, b, c] = [first, first + second, first + second + third];
			const cubic = [-a * b * c, a * b + b * c + c * a, -(a + b + c), 1].map(value => value * lead);
			const found = signChanges(cubic, 0, 2);
			expect(found).toHaveLength(3);
			[a, b, c].forEach((root, i) => {
				expect(Math.abs(found[i]! - root)).toBeLessThan(1e-11);
			});
		}),
		{numRuns: runs(200, 20_000)},
	);
});
