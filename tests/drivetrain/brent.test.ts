import fc from 'fast-check';
import {describe, expect, test} from 'vitest';
import {brentRoot} from '../../source/drivetrain/brent.ts';
import {relativeError} from '../close.ts';
import {runs} from '../runs.ts';

describe('a root', () => {
	// Wallis's equation, 1685, the classic example for Newton's method; the root in all digits recomputed.
	test('of x³ − 2x − 5 is 2.0945514815423265', () => {
		expect(relativeError(brentRoot(x => x ** 3 - 2 * x - 5, 2, 3)!, 2.0945514815423265)).toBeLessThan(1e-15);
	});

	// Published: OEIS A003957.
	test('of cos x = x is 0.7390851332151607', () => {
		expect(relativeError(brentRoot(x => Math.cos(x) - x, 0, 1)!, 0.7390851332151607)).toBeLessThan(1e-15);
	});

	test('is found whichever way the ends lie and whichever sign they have', () => {
		const root = Math.SQRT2;
		for (const f of [(x: number) => x * x - 2, (x: number) => 2 - x * x]) {
			expect(relativeError(brentRoot(f, 0, 5)!, root)).toBeLessThan(1e-15);
			expect(relativeError(brentRoot(f, 5, 0)!, root)).toBeLessThan(1e-15);
		}
	});

	test('is within the tolerance asked for', () => {
		expect(Math.abs(brentRoot(x => Math.exp(x) - 2, -10, 10, 1e-3)! - Math.LN2)).toBeLessThan(1e-3);
	});

	test('is found by far fewer calls than bisection on smooth functions', () => {
		let calls = 0;
		brentRoot(
			x => {
				calls++;
				return Math.exp(x) - 2;
			},
			-10,
			10,
		);
		expect(calls).toBeLessThan(20);
	});

	test('of any monotone cubic lies between the ends and is right', () => {
		const coefficient = fc.double({min: 0.01, max: 10, noNaN: true});
		fc.assert(
			fc.property(coefficient, coefficient, fc.double({min: -0.99, max: 0.99, noNaN: true}), (c1, c3, root) => {
				const f = (x: number) => (x - root) * (c1 + c3 * (x - root) ** 2);
				expect(Math.abs(brentRoot(f, -1, 1)! - root)).toBeLessThan(1e-15);
			}),
			{numRuns: runs(200, 20_000)},
		);
	});
});

describe('at the edge', () => {
	test('ends of the same sign, no width or a NaN give undefined', () => {
		expect(brentRoot(x => x * x + 1, -1, 1)).toBeUndefined();
		expect(brentRoot(x => x, 1, 1)).toBeUndefined();
		expect(brentRoot(() => Number.NaN, 0, 1)).toBeUndefined();
		expect(brentRoot(x => (x < 0.5 ? Number.NaN : 1), 0, 1)).toBeUndefined();
		expect(brentRoot(x => (x < 0.5 ? 1 : Number.NaN), 0, 1)).toBeUndefined();
	});

	test('an end that is the root is returned', () => {
		expect(brentRoot(x => x - 1, 1, 2)).toBe(1);
		expect(brentRoot(x => x - 2, 1, 2)).toBe(2);
		expect(brentRoot(x => x - 1, 1, 1)).toBe(1);
	});

	test('a jump is found as well as a root', () => {
		expect(relativeError(brentRoot(x => (x < 0.3 ? -1 : 1), 0, 1)!, 0.3)).toBeLessThan(1e-14);
		expect(
			relativeError(brentRoot(x => (x < 0.3 ? Number.NEGATIVE_INFINITY : Number.POSITIVE_INFINITY), 0, 1)!, 0.3),
		).toBeLessThan(1e-14);
	});

	test('a root as flat as x⁹, or at 0 on a wide bracket, ends within the cap', () => {
		let calls = 0;
		const flat = (x: number) => {
			calls++;
			return (x - 0.1) ** 9;
		};
		expect(Math.abs(brentRoot(flat, -1, 3)! - 0.1)).toBeLessThan(1e-6);
		expect(Math.abs(brentRoot(x => x ** 3, -1e9, 3e8)!)).toBeLessThan(1e-3);
		expect(calls).toBeLessThanOrEqual(202);
	});

	test('a NaN on the way ends too', () => {
		const f = (x: number) => (x > 0.4 && x < 0.6 ? Number.NaN : x - 0.5);
		const place = brentRoot(f, 0, 1)!;
		expect(place).toBeGreaterThanOrEqual(0);
		expect(place).toBeLessThanOrEqual(1);
	});
});
