import fc from 'fast-check';
import {describe, expect, test} from 'vitest';
import {gaussLegendre} from '../../source/drivetrain/gauss-legendre.ts';
import {cellOf, type MonotoneCubic, monotoneCubic, slopeAt, valueAt} from '../../source/drivetrain/monotone-cubic.ts';
import {relativeError} from '../close.ts';
import {runs} from '../runs.ts';

// Published: Fritsch & Carlson, SIAM J. Numer. Anal. 17 (1980), data RPN14, in full digits and as NAG's example rounds it.
const rpnX = [7.99, 8.09, 8.19, 8.7, 9.2, 10, 12, 15, 20];
const rpn14 = [0, 2.76429e-5, 4.37498e-2, 0.169183, 0.469428, 0.94374, 0.998636, 0.999919, 0.999994];
const nag = [0, 0.27643e-4, 0.4375e-1, 0.16918, 0.46943, 0.94374, 0.99864, 0.99992, 0.99999];
const places = Array.from({length: 11}, (_, i) => 7.99 + i * 1.201);

describe('on the RPN14 data', () => {
	// Published: NAG's e01bec/e01bff example, printed to four decimals, frozen in scipy's test suite too.
	test('prints what NAG prints', () => {
		const printed = [0, 0.464, 0.9645, 0.9965, 0.9992, 0.9998, 0.9999, 1, 1, 1, 1];
		const curve = monotoneCubic(rpnX, nag);
		places.forEach((x, i) => {
			expect(Math.abs(valueAt(curve, x) - printed[i]!)).toBeLessThan(5e-5);
		});
	});

	// Recomputed: scipy 1.10.1 pchip, printed to eight decimals.
	test('has the values of scipy', () => {
		const ofNag = [0, 0.46401626, 0.96447118, 0.99649246, 0.99924266, 0.99977336, 0.99992563, 0.99995467];
		const ofRpn14 = [0, 0.46401431, 0.96446961, 0.99648809, 0.99923975, 0.99977114, 0.99992502, 0.99995609];
		const curves = [monotoneCubic(rpnX, nag), monotoneCubic(rpnX, rpn14)];
		[ofNag, ofRpn14].forEach((values, k) => {
			values.forEach((value, i) => {
				expect(Math.abs(valueAt(curves[k]!, places[i]!) - value)).toBeLessThan(6e-9);
			});
		});
	});

	// Recomputed: scipy 1.10.1 pchip.
	test.each([
		[
			'NAG',
			nag,
			[0, 0.0005525106809, 0.3358730165, 0.349444554, 0.5969623906, 0.06032597053, 0.0008983279074, 2.940516888e-5, 0],
		],
		[
			'RPN14',
			rpn14,
			[0, 0.0005525086819, 0.3358768346, 0.3494491677, 0.5969582389, 0.06032184552, 0.0009003953828, 3.142468363e-5, 0],
		],
	])("has scipy's node slopes (%s)", (_, y, slopes) => {
		const curve = monotoneCubic(rpnX, y);
		rpnX.forEach((x, i) => {
			expect(Math.abs(slopeAt(curve, x) - slopes[i]!)).toBeLessThan(1e-9);
		});
	});

	// Recomputed: scipy 1.10.1 pchip.
	test('has the integral of scipy', () => {
		expect(Math.abs(integral(monotoneCubic(rpnX, rpn14), 0, 8) - 10.764813505)).toBeLessThan(1e-9);
	});
});

describe('on other data', () => {
	// Data published (Akima, J. ACM 17, 1970, no. 3); values recomputed with scipy 1.10.1 pchip.
	test("has scipy's values between Akima's points", () => {
		const curve = monotoneCubic([0, 2, 3, 5, 6, 8, 9, 11, 12, 14, 15], [10, 10, 10, 10, 10, 10, 10.5, 15, 50, 60, 85]);
		const expected = [
			[7, 10],
			[8.5, 10.1544811321],
			[10, 11.7695501325],
			[11.5, 31.8925619835],
			[13, 55.1363636364],
			[14.5, 69.6666666667],
		];
		for (const [x, y] of expected) expect(relativeError(valueAt(curve, x!), y!)).toBeLessThan(1e-11);
	});

	// Data published (Gillespie 1992, p. 32); slopes and values recomputed with scipy 1.10.1 pchip. The slopes of Steffen
	// (1990), 0.029375, 0.03125, 0.035 ..., and of Fritsch & Carlson's own step, 0.03, 0.03125 ..., are others.
	test("has scipy's slopes, values and integral on Gillespie's torque curve", () => {
		const rpm = Array.from({length: 12}, (_, i) => 800 + 400 * i);
		const curve = monotoneCubic(rpm, [120, 132, 145, 160, 175, 181, 190, 198, 200, 201, 198, 180]);
		const slopes = [
			0.02875, 0.0312, 0.034821428571, 0.0375, 0.021428571429, 0.018, 0.021176470588, 0.008, 0.0033333333333, 0,
			-0.012857142857, -0.06375,
		];
		slopes.forEach((slope, i) => {
			expect(Math.abs(slopeAt(curve, rpm[i]!) - slope)).toBeLessThan(1e-12);
		});
		const middles = [
			125.8775, 138.31892857, 152.36607143, 168.30357143, 178.17142857, 185.34117647, 194.65882353, 199.23333333,
			200.66666667, 200.14285714, 191.54464286,
		];
		middles.forEach((value, i) => {
			expect(Math.abs(valueAt(curve, 1000 + 400 * i) - value)).toBeLessThan(6e-9);
		});
		expect(integral(curve, 3, 11)).toBeCloseTo(606_550, 7);
	});

	test('two points make a straight line', () => {
		const line = monotoneCubic([1, 3], [10, 14]);
		expect([1, 1.5, 2, 3].map(x => valueAt(line, x))).toEqual([10, 11, 12, 14]);
		expect(slopeAt(line, 2)).toBe(2);
	});
});

test('outside the nodes the end value is held, with no slope', () => {
	const curve = monotoneCubic([1, 2, 4], [5, 7, 8]);
	expect([0, 1, 4, 9].map(x => valueAt(curve, x))).toEqual([5, 5, 8, 8]);
	expect([0, 9].map(x => slopeAt(curve, x))).toEqual([0, 0]);
});

test('a cell is found by its left node', () => {
	expect([0, 1, 1.9, 2, 3.9, 4, 9].map(x => cellOf([1, 2, 4, 5], x))).toEqual([0, 0, 0, 1, 1, 2, 2]);
});

// Steps and heights as they come from dyno sheets, including repeated values.
const data = fc
	.array(fc.tuple(fc.integer({min: 1, max: 1000}), fc.integer({min: -300, max: 300})), {minLength: 3, maxLength: 12})
	.map(rows => ({
		x: rows.map((_, i) => rows.slice(0, i + 1).reduce((sum, [step]) => sum + step, 0)),
		y: rows.map(row => row[1]),
	}));
const inCell = [0, 0.1, 0.25, 0.5, 0.8, 0.97, 1];
const roundingOf = (y: readonly number[]) => 1e-11 * (1 + Math.max(...y.map(Math.abs)));

describe('for any data', () => {
	test('passes through the points and never leaves what lies between two neighbors', () => {
		fc.assert(
			fc.property(data, ({x, y}) => {
				const curve = monotoneCubic(x, y);
				const rounding = roundingOf(y);
				for (let i = 0; i + 1 < x.length; i++) {
					expect(Math.abs(valueAt(curve, x[i]!) - y[i]!)).toBeLessThanOrEqual(rounding);
					for (const share of inCell) {
						const value = valueAt(curve, x[i]! + share * (x[i + 1]! - x[i]!));
						expect(value).toBeGreaterThanOrEqual(Math.min(y[i]!, y[i + 1]!) - rounding);
						expect(value).toBeLessThanOrEqual(Math.max(y[i]!, y[i + 1]!) + rounding);
					}
				}
			}),
			{numRuns: runs(200, 20_000)},
		);
	});

	test('the slope has the sign of the data everywhere, and is the same from both sides of a node', () => {
		fc.assert(
			fc.property(data, ({x, y}) => {
				const curve = monotoneCubic(x, y);
				const rounding = roundingOf(y);
				for (let i = 0; i + 1 < x.length; i++) {
					const rise = Math.sign(y[i + 1]! - y[i]!);
					for (const share of inCell) {
						const slope = slopeAt(curve, x[i]! + share * (x[i + 1]! - x[i]!));
						if (rise === 0) expect(Math.abs(slope)).toBeLessThanOrEqual(rounding);
						else expect(slope * rise).toBeGreaterThanOrEqual(-rounding);
					}
					const [c1, c2, c3] = [1, 2, 3].map(power => curve.coefficients[4 * i + power]!) as [number, number, number];
					const h = x[i + 1]! - x[i]!;
					expect(Math.abs(c1 + h * (2 * c2 + 3 * h * c3) - slopeAt(curve, x[i + 1]!))).toBeLessThanOrEqual(rounding);
				}
			}),
			{numRuns: runs(200, 20_000)},
		);
	});

	test('a straight line stays one; scaling either axis scales the curve; reversed data mirrors it', () => {
		fc.assert(
			fc.property(data, fc.double({min: 0, max: 1, noNaN: true}), ({x, y}, share) => {
				const at = x[0]! + share * (x.at(-1)! - x[0]!);
				const rounding = 10 * roundingOf(y);
				expect(
					Math.abs(
						valueAt(
							monotoneCubic(
								x,
								x.map(value => 3 - 2 * value),
							),
							at,
						) -
							(3 - 2 * at),
					),
				).toBeLessThan(1e-8);
				const value = valueAt(monotoneCubic(x, y), at);
				const scaled = monotoneCubic(
					x.map(v => 7 * v + 5),
					y.map(v => 4 - 3 * v),
				);
				expect(Math.abs(valueAt(scaled, 7 * at + 5) - (4 - 3 * value))).toBeLessThan(rounding);
				const mirrored = monotoneCubic(x.map(v => -v).reverse(), [...y].reverse());
				expect(Math.abs(valueAt(mirrored, -at) - value)).toBeLessThan(rounding);
			}),
			{numRuns: runs(200, 20_000)},
		);
	});
});

/** From node `from` to node `to`; two Gauss points a cell are exact for a cubic. */
function integral(curve: MonotoneCubic, from: number, to: number): number {
	const {nodes, weights} = gaussLegendre(2);
	let sum = 0;
	for (let i = from; i < to; i++) {
		const [middle, half] = [(curve.x[i + 1]! + curve.x[i]!) / 2, (curve.x[i + 1]! - curve.x[i]!) / 2];
		nodes.forEach((node, k) => {
			sum += weights[k]! * half * valueAt(curve, middle + half * node);
		});
	}
	return sum;
}
