import fc from 'fast-check';
import {describe, expect, test} from 'vitest';
import type {Engine} from '../../source/drivetrain/car.ts';
import {inchM, mileM, mphMps} from '../../source/drivetrain/constants.ts';
import {peakPower, powerBand, powerW, ratedTorque, scaledTorque} from '../../source/drivetrain/engine.ts';
import {overallRatios} from '../../source/drivetrain/gear-pair.ts';
import {monotoneCubic, valueAt} from '../../source/drivetrain/monotone-cubic.ts';
import {speedAtRpmMps} from '../../source/drivetrain/tire.ts';
import {relativeError} from '../close.ts';
import {runs} from '../runs.ts';

// Definitions: 1 lbf = 0.45359237 kg × 9.80665 m/s²; 1 hp = 550 ft lbf/s.
const lbf = 0.45359237 * 9.80665;
const lbfFt = lbf * 12 * inchM;
const hp = 550 * lbfFt;
const noLimit = Number.POSITIVE_INFINITY;

const engineOf = (curve: Engine['curve']) => ({curve, power: 1}) as Engine;

// Published: T. D. Gillespie, Fundamentals of Vehicle Dynamics (SAE, 1992), example problem 1, p. 32: rpm and lbf ft.
const rpm = [800, 1200, 1600, 2000, 2400, 2800, 3200, 3600, 4000, 4400, 4800, 5200];
const torque = [120, 132, 145, 160, 175, 181, 190, 198, 200, 201, 198, 180];
const gillespie = ratedTorque(engineOf(rpm.map((value, i) => ({rpm: value, torqueNm: torque[i]! * lbfFt}))));

test('an engine that has a share of its dyno curve has that share of every torque', () => {
	const points = rpm.map((value, i) => ({rpm: value, torqueNm: torque[i]! * lbfFt}));
	const weaker = ratedTorque({...engineOf(points), power: 0.98});
	for (const speed of [500, 1000, 3333, 6000])
		expect(relativeError(valueAt(weaker, speed), 0.98 * valueAt(gillespie, speed))).toBeLessThan(1e-12);
});

describe('power', () => {
	// Recomputed, GNU units 2.22: K = 33000/(2π) = 5252.113122032546, 1 hp = 745.69987158227022 W.
	test('in hp is lbf ft × rpm / 5252', () => {
		expect(relativeError(hp, 745.6998715822702)).toBeLessThan(1e-15);
		expect(relativeError(lbfFt, 1.3558179483314)).toBeLessThan(1e-15);
		const flat = monotoneCubic([1000, 9000], [lbfFt, lbfFt]);
		expect(relativeError(powerW(flat, 5252.113122032546), hp)).toBeLessThan(1e-14);
	});

	// Recomputed from the table, to three decimals.
	test("at Gillespie's points is the table's", () => {
		const horsepower = [
			18.278, 30.159, 44.173, 60.928, 79.968, 96.494, 115.763, 135.717, 152.32, 168.389, 180.956, 178.214,
		];
		rpm.forEach((value, i) => {
			expect(powerW(gillespie, value) / hp).toBeCloseTo(horsepower[i]!, 3);
		});
	});

	// Recomputed with pchip torque: 182.659 hp at 4937 rpm; the table itself is highest at 4800.
	test("peaks between Gillespie's points", () => {
		const peak = peakPower(gillespie, noLimit);
		expect(peak.powerW / hp).toBeCloseTo(182.659, 3);
		expect(Math.round(peak.rpm)).toBe(4937);
	});

	// From memory (Mannering & Washburn): M = a·n − b·n², 92 lbf ft at 3200 rpm; recomputed, exactly: power peaks at 4/3 of that, 66.434 hp.
	test('of a parabolic torque curve peaks at 4/3 of the RPM of peak torque', () => {
		const points = Array.from({length: 121}, (_, i) => 100 + 50 * i);
		const parabola = monotoneCubic(
			points,
			points.map(n => 92 * lbfFt * (n / 3200) * (2 - n / 3200)),
		);
		const peak = peakPower(parabola, noLimit);
		expect(relativeError(peak.rpm, 12_800 / 3)).toBeLessThan(1e-4);
		expect(relativeError(peak.powerW / hp, 66.434)).toBeLessThan(1e-5);
	});
});

describe("Gillespie's car, gear by gear", () => {
	// Gears, efficiencies, final drive 2.92 at 0.99 and 801 rev/mi published (p. 32); the rest recomputed with 801 rev/mi exact.
	// The book's own 2290 lb and 26.4 mph in first, 537 lb and 113 mph in fifth (from memory) agree.
	const overall = overallRatios([4.28, 2.79, 1.83, 1.36, 1], {driving: 40, driven: 40}, 2.92);
	const efficiency = [0.966, 0.967, 0.972, 0.973, 0.97];
	const rollout = mileM / 801;
	const speed = (engineRpm: number, gear: number) => speedAtRpmMps(engineRpm, overall[gear]!, rollout, 0, 0);

	test.each([
		[1, 2289.88, 26.372, 5.9937, 31.167],
		[2, 1494.25, 40.456, 9.1946, 47.812],
		[3, 985.17, 61.679, 14.018, 72.893],
		[4, 732.9, 82.995, 18.8624, 98.084],
		[5, 537.24, 112.873, 25.6529, 133.395],
	])('gear %i gives %f lb at most, and %f mph at 4400 rpm', (gear, pounds, mphAt4400, mphPer1000, mphAt5200) => {
		const k = gear - 1;
		expect(relativeError(speed(4400, k) / mphMps, mphAt4400)).toBeLessThan(3e-5);
		expect(relativeError(speed(1000, k) / mphMps, mphPer1000)).toBeLessThan(1e-5);
		expect(relativeError(speed(5200, k) / mphMps, mphAt5200)).toBeLessThan(3e-5);
		// What the engine gives less the losses, over the road speed, is the thrust.
		const thrustN = (powerW(gillespie, 4400) * efficiency[k]! * 0.99) / speed(4400, k);
		expect(relativeError(thrustN / lbf, pounds)).toBeLessThan(1e-5);
	});

	test("agrees with the book's rounded answers", () => {
		expect(relativeError(speed(4400, 0) / mphMps, 26.4)).toBeLessThan(0.002);
		expect(relativeError(speed(4400, 4) / mphMps, 113)).toBeLessThan(0.002);
	});
});

describe('the power band', () => {
	test('with constant torque runs from the share of the last RPM to the last RPM', () => {
		const flat = monotoneCubic([2000, 6000, 10_000], [400, 400, 400]);
		expect(relativeError(powerBand(flat, 0.9, noLimit).lowRpm, 9000)).toBeLessThan(1e-12);
		expect(powerBand(flat, 0.9, noLimit).highRpm).toBe(10_000);
	});

	test('ends at the limit where that comes first, and is measured by the power there', () => {
		const flat = monotoneCubic([2000, 6000, 10_000], [400, 400, 400]);
		const band = powerBand(flat, 0.9, 8000);
		expect(relativeError(band.lowRpm, 7200)).toBeLessThan(1e-12);
		expect(band.highRpm).toBe(8000);
		expect(peakPower(flat, 8000).rpm).toBe(8000);
	});

	// By hand: straight torque 800 − n/10 makes P ∝ 800n − n²/10, a parabola with its peak at 4000; P ≥ 0.91·P_peak within 30 % of it.
	test('with straight falling torque lies evenly around the peak', () => {
		const falling = monotoneCubic([1000, 3500, 5000, 7000], [700, 450, 300, 100]);
		const band = powerBand(falling, 0.91, noLimit);
		expect(relativeError(peakPower(falling, noLimit).rpm, 4000)).toBeLessThan(1e-12);
		expect(relativeError(band.lowRpm, 2800)).toBeLessThan(1e-12);
		expect(relativeError(band.highRpm, 5200)).toBeLessThan(1e-12);
	});

	test('leaves out what lies beyond a dip', () => {
		const dip = monotoneCubic([4000, 5000, 6000, 7000, 8000], [500, 500, 300, 500, 450]);
		const band = powerBand(dip, 0.65, noLimit);
		// 5000 rpm × 500 N m is 0.694 of the highest power, but 6000 × 300 between them is only 0.5.
		expect(powerW(dip, 5000)).toBeGreaterThan(0.65 * peakPower(dip, noLimit).powerW);
		expect(band.lowRpm).toBeGreaterThan(6000);
		expect(band.highRpm).toBe(8000);
	});

	test('of the whole peak is the peak alone; with a limit below the curve it is the limit alone', () => {
		const peak = peakPower(gillespie, noLimit).rpm;
		expect(powerBand(gillespie, 1, noLimit)).toEqual({lowRpm: peak, highRpm: peak});
		expect(powerBand(gillespie, 0.9, 600)).toEqual({lowRpm: 600, highRpm: 600});
		expect(peakPower(gillespie, 600).powerW).toBe(powerW(gillespie, 600));
	});
});

const points = fc
	.array(fc.tuple(fc.integer({min: 50, max: 1500}), fc.integer({min: 50, max: 800})), {minLength: 3, maxLength: 10})
	.map(rows =>
		rows.map(([, torqueNm], i) => ({
			rpm: 1000 + rows.slice(0, i + 1).reduce((sum, [step]) => sum + step, 0),
			torqueNm,
		})),
	);
const shares = fc.double({min: 0.5, max: 0.99, noNaN: true});

describe('on any curve', () => {
	test('a fine scan finds no power above the peak and none below the share inside the band', () => {
		fc.assert(
			fc.property(points, shares, fc.integer({min: 1500, max: 14_000}), (curvePoints, share, limit) => {
				const curve = ratedTorque(engineOf(curvePoints));
				const first = curvePoints[0]!.rpm;
				fc.pre(limit > first);
				const last = Math.min(limit, curvePoints.at(-1)!.rpm);
				const peak = peakPower(curve, limit);
				const band = powerBand(curve, share, limit);
				expect(band.lowRpm).toBeGreaterThanOrEqual(first);
				expect(band.highRpm).toBeLessThanOrEqual(last);
				expect(peak.rpm).toBeGreaterThanOrEqual(band.lowRpm);
				expect(peak.rpm).toBeLessThanOrEqual(band.highRpm);
				for (let i = 0; i <= 400; i++) {
					const place = first + (i / 400) * (last - first);
					const power = powerW(curve, place);
					expect(power).toBeLessThanOrEqual(peak.powerW * (1 + 1e-12));
					if (place >= band.lowRpm && place <= band.highRpm) {
						expect(power).toBeGreaterThanOrEqual(share * peak.powerW * (1 - 1e-9));
					}
				}
				for (const end of [band.lowRpm, band.highRpm]) {
					if (end > first && end < last)
						expect(relativeError(powerW(curve, end), share * peak.powerW)).toBeLessThan(1e-9);
				}
			}),
			{numRuns: runs(60, 5000)},
		);
	});

	test('scaling torque scales power and does not move the band', () => {
		const factor = fc.double({min: 0.5, max: 2, noNaN: true});
		fc.assert(
			fc.property(points, shares, factor, (curvePoints, share, by) => {
				const curve = ratedTorque(engineOf(curvePoints));
				const scaled = scaledTorque(curve, by);
				for (const place of [0, 1500, 3333.3, 20_000]) {
					expect(relativeError(valueAt(scaled, place), by * valueAt(curve, place))).toBeLessThan(1e-12);
				}
				const [before, after] = [powerBand(curve, share, noLimit), powerBand(scaled, share, noLimit)];
				expect(relativeError(peakPower(scaled, noLimit).powerW, by * peakPower(curve, noLimit).powerW)).toBeLessThan(
					1e-12,
				);
				expect(relativeError(after.lowRpm, before.lowRpm)).toBeLessThan(1e-6);
				expect(relativeError(after.highRpm, before.highRpm)).toBeLessThan(1e-6);
			}),
			{numRuns: runs(100, 5000)},
		);
	});
});
