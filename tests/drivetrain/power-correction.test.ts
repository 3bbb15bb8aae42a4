import {describe, expect, test} from 'vitest';
import {airState} from '../../source/drivetrain/air.ts';
import {correctionFactor, outsideStandard} from '../../source/drivetrain/power-correction.ts';
import {relativeError} from '../close.ts';

const inHg = 3386.389;
const fahrenheit = (degrees: number) => (degrees - 32) / 1.8;
const dry = (pressurePa: number, temperatureC: number) =>
	airState({pressurePa, temperatureC, humidity: 0, dewPointC: undefined});

// Recomputed: J1349 as commonly published for JUN 1990; J607 with 460/520 R; ISO 1585 (naturally aspirated, formula from memory).
describe.each([
	[990, 25, 1.0, 1.040037, 1.0],
	[1013.25, 15, 0.953414, 0.998996, 0.952814],
	[1013.25, 20, 0.963211, 1.007621, 0.962705],
	[1000, 30, 0.99796, 1.038229, 0.997925],
	[980, 35, 1.031876, 1.068113, 1.032504],
	[950, 25, 1.049684, 1.083828, 1.050737],
	[900, 20, 1.107065, 1.134413, 1.109844],
	[850, 10, 1.159317, 1.180492, 1.16413],
])('dry air of %f hPa and %f °C', (hpa, temperatureC, j1349, j607, iso1585) => {
	const air = dry(100 * hpa, temperatureC);

	test('has the J1349 factor', () => {
		expect(relativeError(correctionFactor('J1349', air), j1349)).toBeLessThan(1e-5);
	});

	test('has a J1349 factor that tracks ISO 1585', () => {
		expect(relativeError(correctionFactor('J1349', air), iso1585)).toBeLessThan(0.005);
	});

	// The rounded 460/520 R of the table and the exact scale differ by up to 2.1e-5 at 35 °C.
	test('has the J607 factor', () => {
		expect(relativeError(correctionFactor('J607', air), j607)).toBeLessThan(2.5e-5);
	});

	// Published: B. Bowling, DIY-EFI mailing list, 1 March 1995: 29.92/(baro − pv)·√((459.7 + T_F)/519.7).
	test('has the J607 factor in its published US form', () => {
		const rankine = 1.8 * temperatureC + 32 + 459.7;
		const published = (29.92 / ((100 * hpa) / inHg)) * Math.sqrt(rankine / 519.7);
		expect(relativeError(correctionFactor('J607', air), published)).toBeLessThan(3e-6);
	});

	test('leaves a curve in the day’s own air alone', () => {
		expect(correctionFactor('air', air)).toBe(1);
	});
});

// Recomputed with the IF97 vapor pressure; Buck's differs by up to 0.1 %.
test.each([
	[29.0, 85, 0.6, 1.04928, 1.08346],
	[30.1, 70, 0.4, 0.96988, 1.0135],
	[28.5, 95, 0.7, 1.10293, 1.13074],
	[24.9, 80, 0.3, 1.2268, 1.23993],
])('humid air of %f inHg, %f °F and humidity %f has its factors', (inches, degreesF, humidity, j1349, j607) => {
	const air = airState({pressurePa: inches * inHg, temperatureC: fahrenheit(degreesF), humidity, dewPointC: undefined});
	expect(relativeError(correctionFactor('J1349', air), j1349)).toBeLessThan(3e-4);
	expect(relativeError(correctionFactor('J607', air), j607)).toBeLessThan(3e-4);
});

test('a track without air is a day of factor 1', () => {
	expect(correctionFactor('J1349', airState(undefined))).toBeCloseTo(1, 14);
});

test('J607 promises 4 % more than J1349', () => {
	const reference = airState(undefined);
	expect(Math.abs(correctionFactor('J607', reference) - 1.04)).toBeLessThan(3e-4);
});

test('J607 is 1 on its own day', () => {
	expect(correctionFactor('J607', dry(29.92 * inHg, fahrenheit(60)))).toBeCloseTo(1, 14);
});

test('J1349 holds from 0.93 to 1.07; the others give no range', () => {
	expect([0.9299, 0.93, 1, 1.07, 1.0701].map(factor => outsideStandard('J1349', factor))).toEqual([
		true,
		false,
		false,
		false,
		true,
	]);
	expect(outsideStandard('J607', 1.2)).toBe(false);
	expect(outsideStandard('air', 1)).toBe(false);
});
