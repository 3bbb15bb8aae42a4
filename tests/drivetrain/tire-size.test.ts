import {describe, expect, test} from 'vitest';
import {mileM} from '../../source/drivetrain/constants.ts';
import {etrtoCircumferenceM, overallDiameterM, parseTireSize, withinEtrto} from '../../source/drivetrain/tire-size.ts';
import {relativeError} from '../close.ts';
import {turnsPerMile} from '../road-cars.ts';

// Diameters exact by ISO 4000-1 (formula from memory); 3.05 D in mm and rev/mi recomputed.
const sizes: readonly [size: string, diameterMm: number, rollingMm: number, perMile: number][] = [
	['185/70R14', 614.6, 1874.5, 858.5],
	['175/70R13', 575.2, 1754.4, 917.3],
	['205/60R15', 627.0, 1912.3, 841.6],
	['185/60R14', 577.6, 1761.7, 913.5],
	['195/60R14', 589.6, 1798.3, 894.9],
	['175/70R14', 600.6, 1831.8, 878.5],
	['155/80R13', 578.2, 1763.5, 912.6],
	['185/65R15', 621.5, 1895.6, 849.0],
	['195/65R15', 634.5, 1935.2, 831.6],
	['275/40R17', 651.8, 1988.0, 809.5],
	['205/55R16', 631.9, 1927.3, 835.0],
	['225/45R17', 634.3, 1934.6, 831.9],
];

describe.each(sizes)('%s', (text, diameterMm, rollingMm, perMile) => {
	const size = parseTireSize(text)!;
	const diameterM = overallDiameterM(size.widthMm, size.aspectPercent, size.rimIn);

	test('has the overall diameter of ISO 4000-1', () => {
		expect(relativeError(diameterM, diameterMm / 1000)).toBeLessThan(1e-14);
	});

	test('rolls on 3.05 diameters, not on π of them', () => {
		expect(1000 * etrtoCircumferenceM(diameterM)).toBeCloseTo(rollingMm, 0);
		expect(Math.abs(mileM / etrtoCircumferenceM(diameterM) - perMile)).toBeLessThan(0.06);
		expect((Math.PI * diameterM) / etrtoCircumferenceM(diameterM)).toBeCloseTo(1.03003, 5);
		expect(withinEtrto(Math.PI * diameterM, diameterM)).toBe(false);
	});
});

test.each(Object.entries(turnsPerMile))('%s rolls on road cars as far as ETRTO allows it to', (text, observed) => {
	const size = parseTireSize(text)!;
	expect(withinEtrto(mileM / observed, overallDiameterM(size.widthMm, size.aspectPercent, size.rimIn))).toBe(true);
});

test('ETRTO allows 1.5 % above and 2.5 % below', () => {
	const middle = etrtoCircumferenceM(0.65);
	expect([1.0149, 1.0151, 0.9751, 0.9749].map(factor => withinEtrto(factor * middle, 0.65))).toEqual([
		true,
		false,
		true,
		false,
	]);
});

test('a size is read with its usual prefixes, letters and spaces', () => {
	const size = {widthMm: 275, aspectPercent: 40, rimIn: 17};
	for (const text of ['275/40R17', 'P275/40R17', '275/40ZR17', '275/40 R 17', '275/40r17', ' LT275/40R17 ']) {
		expect(parseTireSize(text)).toEqual(size);
	}
	expect(parseTireSize('225/70R19.5')).toEqual({widthMm: 225, aspectPercent: 70, rimIn: 19.5});
});

test('what is not a metric radial size is undefined', () => {
	for (const text of ['', '86.5 in', '275/40-17', '275/40R', '000/40R17', '275/00R17', '275/40R17X', '27.5x10-15']) {
		expect(parseTireSize(text)).toBeUndefined();
	}
});
