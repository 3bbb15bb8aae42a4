import {describe, expect, test} from 'vitest';
import {airState, mergedAir, vaporPressurePa} from '../../source/drivetrain/air.ts';
import type {Air} from '../../source/drivetrain/track.ts';
import {relativeError} from '../close.ts';

const noAir: Air = {temperatureC: undefined, pressurePa: undefined, humidity: undefined, dewPointC: undefined};

describe('vapor pressure', () => {
	// Recomputed: IAPWS SR1-86 (Wagner & Pruss), and the error of Buck's 1981 formula against it in per cent.
	test.each([
		[0.01, 611.657, 0.0],
		[10, 1228.112, -0.042],
		[20, 2339.194, -0.082],
		[25, 3169.824, -0.088],
		[30, 4246.92, -0.08],
		[35, 5629.057, -0.056],
		[40, 7385.11, -0.013],
		[50, 12_352.479, 0.136],
	])("at %f °C is within Buck's own 0.2 %% of IAPWS", (temperatureC, pascals, percent) => {
		const error = 100 * (vaporPressurePa(temperatureC) / pascals - 1);
		expect(Math.abs(error)).toBeLessThan(0.2);
		expect(Math.abs(error - percent)).toBeLessThan(0.0006);
	});

	// Published: ASHRAE Fundamentals 2017, ch. 1, table 3, through psychrolib's tests; 40 CFR 1065.645's worked example
	// (9.5 °C, and 20 °C).
	test.each([
		[5, 872.6],
		[25, 3169.7],
		[50, 12_351.3],
		[9.5, 1186.581],
		[20, 2337.1],
	])('at %f °C is within 0.2 %% of the tables', (temperatureC, pascals) => {
		expect(relativeError(vaporPressurePa(temperatureC), pascals)).toBeLessThan(0.002);
	});
});

describe('density', () => {
	// CIPM-2007 (400 ppm CO2) and psychrolib 1.1.1, both recomputed; the gas law lies below CIPM by the compressibility.
	test.each([
		[101_325, 20, 0.5, 1.199314, 1.198898],
		[101_325, 15, 0, 1.225521, undefined],
		[101_325, 25, 0, 1.184301, 1.183958],
		[99_000, 25, 0, 1.157118, undefined],
		[100_000, 25, 0.5, 1.161824, 1.161476],
		[95_461, 30, 0.4, 1.089927, 1.089662],
		[101_325, 30, 0.8, 1.150012, 1.149673],
		[90_000, 40, 0.3, 0.992095, undefined],
	])(
		'at %d Pa, %d °C and humidity %f agrees with CIPM-2007 and psychrolib',
		(pressurePa, temperatureC, humidity, cipm, psychrolib) => {
			const {densityKgM3} = airState({...noAir, temperatureC, pressurePa, humidity});
			expect(relativeError(densityKgM3, cipm)).toBeLessThan(6e-4);
			expect(densityKgM3).toBeLessThan(cipm);
			if (psychrolib !== undefined) expect(relativeError(densityKgM3, psychrolib)).toBeLessThan(1e-4);
		},
	);

	// Published: psychrolib's test GetMoistAirDensity(30 °C, W 0.02, 95461 Pa) = 1.08411986348219 (given as good to 3e-4).
	// A humidity ratio W is the vapor pressure p·W/(0.621945 + W).
	test('at a given humidity ratio is psychrolib’s', () => {
		const humidity = (95_461 * 0.02) / (0.621945 + 0.02) / vaporPressurePa(30);
		const {densityKgM3} = airState({...noAir, temperatureC: 30, pressurePa: 95_461, humidity});
		expect(relativeError(densityKgM3, 1.08411986348219)).toBeLessThan(1e-4);
	});

	// Published: ASHRAE Fundamentals 2017, table 2: dry air at 25 °C and 101325 Pa takes 0.8443 m³/kg.
	test('of dry air is ASHRAE’s', () => {
		const {densityKgM3} = airState({...noAir, temperatureC: 25, pressurePa: 101_325});
		expect(relativeError(1 / densityKgM3, 0.8443)).toBeLessThan(1e-3);
	});
});

describe('the state of the air', () => {
	test('without air, and without any of its fields, is the dry reference of J1349', () => {
		for (const air of [undefined, noAir]) {
			expect(airState(air)).toMatchObject({
				temperatureC: 25,
				pressurePa: 99_000,
				vaporPressurePa: 0,
				dryPressurePa: 99_000,
			});
		}
	});

	// Published: 40 CFR 1065.645's example: 50.77 % at 20 °C (psat 2.3371 kPa) in 99.980 kPa is 0.011868 of the air.
	test('holds the share of vapor that 40 CFR 1065.645 works out', () => {
		const {vaporPressurePa: vapor, pressurePa} = airState({
			...noAir,
			temperatureC: 20,
			pressurePa: 99_980,
			humidity: 0.5077,
		});
		expect(relativeError(vapor / pressurePa, 0.011868)).toBeLessThan(0.002);
	});

	test('by dew point is the state by the humidity that it stands for', () => {
		const humidity = vaporPressurePa(15) / vaporPressurePa(28);
		const byHumidity = airState({...noAir, temperatureC: 28, humidity});
		const byDewPoint = airState({...noAir, temperatureC: 28, dewPointC: 15});
		expect(byDewPoint.vaporPressurePa).toBe(vaporPressurePa(15));
		expect(relativeError(byDewPoint.densityKgM3, byHumidity.densityKgM3)).toBeLessThan(1e-15);
	});

	test('colder than the dew point is saturated', () => {
		expect(airState({...noAir, temperatureC: 10, dewPointC: 15}).vaporPressurePa).toBe(vaporPressurePa(10));
	});
});

describe('air with a change', () => {
	const base: Air = {temperatureC: 24, pressurePa: 97_900, humidity: 0.4, dewPointC: undefined};

	test('keeps what the change does not give', () => {
		expect(mergedAir(base, {...noAir, temperatureC: 14})).toEqual({...base, temperatureC: 14});
		expect(mergedAir(base, noAir)).toEqual(base);
		expect(mergedAir(base, undefined)).toEqual(base);
		expect(mergedAir(undefined, base)).toEqual(base);
		expect(mergedAir(undefined, undefined)).toBeUndefined();
	});

	test('has either humidity or dew point, the one given last', () => {
		const dew = mergedAir(base, {...noAir, dewPointC: 12})!;
		expect(dew).toEqual({...base, humidity: undefined, dewPointC: 12});
		expect(mergedAir(dew, {...noAir, humidity: 0})).toEqual({...base, humidity: 0, dewPointC: undefined});
	});
});
