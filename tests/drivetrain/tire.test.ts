import fc from 'fast-check';
import {describe, expect, test} from 'vitest';
import {inchM, mileM, mphMps} from '../../source/drivetrain/constants.ts';
import {circumferenceM, engineRpm, harmonicRolloutM, speedAtRpmMps} from '../../source/drivetrain/tire.ts';
import {relativeError} from '../close.ts';
import {roadCars} from '../road-cars.ts';
import {runs} from '../runs.ts';

const rollout = fc.double({min: 1, max: 4, noNaN: true});
const overall = fc.double({min: 1, max: 20, noNaN: true});
const slip = fc.double({min: 0, max: 0.1, noNaN: true});
const growth = fc.double({min: 0, max: 0.03, noNaN: true});

describe('the rollout of an axle', () => {
	test('is the harmonic mean: 2 m and 3 m roll on 2.4 m', () => {
		expect(harmonicRolloutM(2, 3)).toBeCloseTo(2.4, 14);
		expect(harmonicRolloutM(2.2, 2.2)).toBeCloseTo(2.2, 14);
	});

	test('lies between both tires, at or below their plain mean', () => {
		fc.assert(
			fc.property(rollout, rollout, (left, right) => {
				const mean = harmonicRolloutM(left, right);
				expect(mean).toBeGreaterThanOrEqual(Math.min(left, right) * (1 - 1e-15));
				expect(mean).toBeLessThanOrEqual(((left + right) / 2) * (1 + 1e-15));
			}),
			{numRuns: runs(100, 10_000)},
		);
	});

	test('is what a differential whose two wheels cover the same ground turns on', () => {
		const [left, right, distance] = [2.19, 2.23, 1000];
		const caseTurns = (distance / left + distance / right) / 2;
		expect(relativeError(distance / caseTurns, harmonicRolloutM(left, right))).toBeLessThan(1e-14);
	});
});

describe('growth', () => {
	test('is its stated fraction at 100 mph, a quarter of it at 50 mph, none at rest', () => {
		expect(relativeError(circumferenceM(2.2, 0.01, 44.704), 2.222)).toBeLessThan(1e-14);
		expect(relativeError(circumferenceM(2.2, 0.01, 22.352), 2.2055)).toBeLessThan(1e-14);
		expect(circumferenceM(2.2, 0.01, 0)).toBe(2.2);
	});
});

describe('engine speed from road speed', () => {
	// Published: Mannering & Washburn, Principles of Highway Engineering and Traffic Analysis, problem 2.7: 130 mph, 2.5,
	// r 12.6 in, slippage 3 %; the answer is 4469.15 rpm (a stored homework page). Their slippage i is V = ω·r·(1 − i).
	test('agrees with Mannering & Washburn 2.7', () => {
		const rpm = engineRpm(130 * mphMps, 2.5, 2 * Math.PI * 12.6 * inchM, 0, slipRatio(0.03));
		expect(rpm).toBeCloseTo(4469.15, 2);
	});

	// Inputs published (homework pages), results recomputed: 2.6 is 3600 rpm, 3.2, r 14 in, 3.5 %; the other is 4500 rpm, 3, 15 in, 2 %.
	test('backwards it gives the road speeds of two more of their problems', () => {
		const first = speedAtRpmMps(3600, 3.2, 2 * Math.PI * 14 * inchM, 0, slipRatio(0.035));
		expect(relativeError(first, 132.634 * 12 * inchM)).toBeLessThan(5e-6);
		const second = speedAtRpmMps(4500, 3, 2 * Math.PI * 15 * inchM, 0, slipRatio(0.02));
		expect(relativeError(second, 192.423 * 12 * inchM)).toBeLessThan(5e-6);
		expect(relativeError(second, 131.197 * mphMps)).toBeLessThan(5e-6);
	});

	// Exact pairs by SAE J670's definition, SR = ω·Re/V − 1.
	test('takes the slip ratio of SAE J670, not the slippage of V = ω·r·(1 − i)', () => {
		for (const [slippage, ratio] of [
			[0.03, 0.0309278],
			[0.02, 0.0204082],
			[0.05, 0.0526316],
		] as const) {
			const free = engineRpm(50, 3, 2, 0, 0);
			expect(engineRpm(50, 3, 2, 0, ratio) / free).toBeCloseTo(1 / (1 - slippage), 7);
		}
	});

	test('a shorter ratio turns the engine faster, a longer tire slower, each in proportion', () => {
		const base = engineRpm(50, 4, 2.2, 0.01, 0.02);
		expect(relativeError(engineRpm(50, 4.4, 2.2, 0.01, 0.02), 1.1 * base)).toBeLessThan(1e-14);
		expect(relativeError(engineRpm(50, 4, 2.2 * 1.1, 0.01, 0.02), base / 1.1)).toBeLessThan(1e-14);
	});
});

describe('road speed at an engine speed', () => {
	test('is the inverse of engine speed wherever the tire still lets RPM rise', () => {
		// RPM rises up to V_ref/√γ; near there the inverse is ill-conditioned, so stay below two thirds of it.
		const share = fc.double({min: 0.001, max: 0.66, noNaN: true});
		fc.assert(
			fc.property(rollout, overall, growth, slip, share, (c, r, g, k, s) => {
				const speed = s * Math.min(150, 44.704 / Math.sqrt(g));
				expect(relativeError(speedAtRpmMps(engineRpm(speed, r, c, g, k), r, c, g, k), speed)).toBeLessThan(1e-12);
			}),
			{numRuns: runs(300, 100_000)},
		);
	});

	test('without growth is linear, and small growth comes to the same', () => {
		fc.assert(
			fc.property(rollout, overall, slip, fc.double({min: 1, max: 12_000, noNaN: true}), (c, r, k, rpm) => {
				const linear = (rpm * c) / (60 * (1 + k) * r);
				expect(relativeError(speedAtRpmMps(rpm, r, c, 0, k), linear)).toBeLessThan(1e-14);
				expect(relativeError(speedAtRpmMps(rpm, r, c, 1e-18, k), linear)).toBeLessThan(1e-12);
			}),
			{numRuns: runs(100, 10_000)},
		);
	});

	test('is infinite where the tire outgrows the RPM, and finite just below', () => {
		// By hand: n(V) is greatest at V_ref/√γ, where it is 60·V_ref·R/(2·C0·√γ): 60·44.704·4/(2·2·0.2) = 13411.2 rpm.
		expect(speedAtRpmMps(13_411.3, 4, 2, 0.04, 0)).toBe(Number.POSITIVE_INFINITY);
		const speed = speedAtRpmMps(13_411.1, 4, 2, 0.04, 0);
		expect(speed).toBeGreaterThan(222);
		expect(speed).toBeLessThan(223.52);
	});

	test('at 0 rpm is 0', () => {
		expect(speedAtRpmMps(0, 4, 2, 0.04, 0)).toBe(0);
	});
});

test('the rollout learned from one road car predicts the RPM of every other car on that tire size within rounding', () => {
	let predictions = 0;
	for (const [size, knownOverall, knownRpm] of roadCars) {
		const rolloutM = (mileM * knownOverall) / knownRpm;
		for (const [, other, rpm] of roadCars.filter(car => car[0] === size && car[1] !== knownOverall)) {
			expect(relativeError(engineRpm(60 * mphMps, other, rolloutM, 0, 0), rpm)).toBeLessThan(0.0035);
			predictions++;
		}
	}
	expect(predictions).toBe(66);
});

test('revolutions a mile are those of the magazine', () => {
	// Published, as the table of road cars: 860.5 rev/mi for 185/70R14 is the median of eleven cars; 799.4 for 275/40R17 is one car, 1.67 and 1335 rpm.
	expect(relativeError(engineRpm(60 * mphMps, 2.51, mileM / 860.5, 0, 0), 2160)).toBeLessThan(1e-4);
	expect(relativeError(engineRpm(60 * mphMps, 1.67, mileM / 799.4, 0, 0), 1335)).toBeLessThan(1e-4);
});

function slipRatio(slippage: number): number {
	return slippage / (1 - slippage);
}
