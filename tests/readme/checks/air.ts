/** The day's air and what it does to the engine. */
import {airState, vaporPressurePa} from '../../../source/drivetrain/air.ts';
import {correctionFactor} from '../../../source/drivetrain/power-correction.ts';
import {standardPressurePa} from '../../../source/drivetrain/standard-atmosphere.ts';
import {casesOf, type OutsideCheck} from '../outside-check.ts';

const air = (pressurePa: number, temperatureC: number, humidity: number) =>
	airState({pressurePa, temperatureC, humidity, dewPointC: undefined});

/** Humidity ratio W to vapor pressure, by the ratio of the molar masses. */
const vaporOfRatioPa = (pressurePa: number, ratio: number) => (pressurePa * ratio) / (0.621945 + ratio);

/** Dry air in hPa and °C with the factors by SAE J1349 and J607. */
const dryDays = [
	['1.000000', '1.040037', 990, 25],
	['0.953414', '0.998996', 1013.25, 15],
	['0.963211', '1.007621', 1013.25, 20],
	['0.997960', '1.038229', 1000, 30],
	['1.031876', '1.068113', 980, 35],
	['1.049684', '1.083828', 950, 25],
	['1.107065', '1.134413', 900, 20],
	['1.159317', '1.180492', 850, 10],
] as const;

export const dayAndEngine: readonly OutsideCheck[] = [
	{
		what: 'Standard pressure from -500 to 10 000 m, six altitudes',
		source: 'ASHRAE Fundamentals 2017, ch. 1, table 1',
		mark: 'published',
		unit: 'Pa',
		cases: casesOf(
			[
				['107478', -500],
				['101325', 0],
				['95461', 500],
				['89875', 1000],
				['61640', 4000],
				['26436', 10_000],
			],
			standardPressurePa,
		),
		tolerance: 1.2e-5,
	},
	{
		what: 'Vapor pressure at the triple point',
		source: 'Wexler, J. Res. NBS 80A (1976)',
		mark: 'published',
		unit: 'Pa',
		cases: casesOf([['611.657', 0.01]], vaporPressurePa),
		tolerance: 1e-4,
	},
	{
		what: 'Vapor pressure at 5, 25 and 50 °C',
		source: 'ASHRAE Fundamentals 2017, ch. 1, table 3',
		mark: 'published',
		unit: 'Pa',
		cases: casesOf(
			[
				['872.6', 5],
				['3169.7', 25],
				['12351.3', 50],
			],
			vaporPressurePa,
		),
		tolerance: 2e-3,
	},
	{
		what: 'Moist-air density, 30 °C, 0.02 kg/kg, 95 461 Pa',
		source: 'psychrolib 1.1.1 (ASHRAE)',
		mark: 'published',
		unit: 'kg/m³',
		cases: casesOf([['1.0841199', 95_461, 30, 0.02]], (pressurePa, temperatureC, ratio) => {
			const humidity = vaporOfRatioPa(pressurePa, ratio) / vaporPressurePa(temperatureC);
			return air(pressurePa, temperatureC, humidity).densityKgM3;
		}),
		tolerance: 1e-4,
	},
	{
		what: 'Moist-air density, eight states of 15 to 40 °C',
		source: 'CIPM-2007 (Picard et al., Metrologia 45, 2008)',
		mark: 'recomputed',
		unit: 'kg/m³',
		cases: casesOf(
			[
				['1.199314', 101_325, 20, 0.5],
				['1.225521', 101_325, 15, 0],
				['1.184301', 101_325, 25, 0],
				['1.157118', 99_000, 25, 0],
				['1.161824', 100_000, 25, 0.5],
				['1.089927', 95_461, 30, 0.4],
				['1.150012', 101_325, 30, 0.8],
				['0.992095', 90_000, 40, 0.3],
			],
			(pressurePa, temperatureC, humidity) => air(pressurePa, temperatureC, humidity).densityKgM3,
		),
		tolerance: 6e-4,
	},
	{
		what: 'Power correction in dry air, eight days',
		source: 'SAE J1349, as commonly published for JUN 1990',
		mark: 'recomputed',
		cases: dryDays.map(([outside, , hpa, temperatureC]) => ({
			outside,
			ours: correctionFactor('J1349', air(100 * hpa, temperatureC, 0)),
		})),
		tolerance: 1e-5,
	},
	{
		what: 'Power correction in humid air, four days',
		source: 'SAE J1349 with the vapor pressure of IAPWS-IF97',
		mark: 'recomputed',
		cases: casesOf(
			[
				['1.04928', 29, 85, 0.6],
				['0.96988', 30.1, 70, 0.4],
				['1.10293', 28.5, 95, 0.7],
				['1.22680', 24.9, 80, 0.3],
			],
			(inHg, fahrenheit, humidity) =>
				correctionFactor('J1349', air(inHg * 3386.389, (fahrenheit - 32) / 1.8, humidity)),
		),
		tolerance: 3e-4,
	},
	{
		what: 'The older power correction in dry air, eight days',
		source: 'SAE J607 (60 °F, 29.92 inHg), with 460 and 520 °R',
		mark: 'recomputed',
		cases: dryDays.map(([, outside, hpa, temperatureC]) => ({
			outside,
			ours: correctionFactor('J607', air(100 * hpa, temperatureC, 0)),
		})),
		tolerance: 2.5e-5,
	},
];
