/**
 * Sanity bands, not validation: the data have catalogue power, weights without a driver and unknown starts. One generic
 * model for all cars: grip holds, then constant power, against air and rolling resistance.
 */
import {readFileSync} from 'node:fs';
import {createRequire} from 'node:module';
import {describe, expect, test} from 'vitest';
import {mileM, mphMps} from '../../source/drivetrain/constants.ts';
import {travel} from '../../source/drivetrain/travel.ts';

const require = createRequire(import.meta.url);
const readJson = (path: string) => JSON.parse(readFileSync(path, 'utf8'));

const lb = 0.45359237;
const hp = 550 * 0.3048 * lb * 9.80665;
const driverKg = 136;

type Model = {readonly grip: number; readonly efficiency: number};

/** Drag area 0.85 m², rolling 0.012, air 1.225 kg/m³, rotating parts 8 % of the mass. */
function run(weightLb: number, powerHp: number, {grip, efficiency}: Model, goal: {distanceM: number; toMps: number}) {
	const massKg = weightLb * lb + driverKg;
	const powerW = efficiency * powerHp * hp;
	const holdN = grip * massKg * 9.80665;
	const resistanceN = (v: number) => 0.5 * 1.225 * 0.85 * v * v + 0.012 * massKg * 9.80665;
	const motion = {
		acceleration: (v: number) => (Math.min(holdN, powerW / v) - resistanceN(v)) / (1.08 * massKg),
		breaks: [0, powerW / holdN],
	};
	return travel(motion, 0, {...goal, braking: undefined}).timeS;
}

const mean = (values: readonly number[]) => values.reduce((sum, value) => sum + value, 0) / values.length;

function correlation(x: readonly number[], y: readonly number[]): number {
	const [mx, my] = [mean(x), mean(y)];
	const covariance = mean(x.map((value, i) => (value - mx) * (y[i]! - my)));
	return covariance / Math.sqrt(mean(x.map(value => (value - mx) ** 2)) * mean(y.map(value => (value - my) ** 2)));
}

/** Ranks from 1, ties sharing their mean: the correlation of these is Spearman's. */
function ranks(values: readonly number[]): number[] {
	return values.map(value => {
		const below = values.filter(other => other < value).length;
		return below + (values.filter(other => other === value).length + 1) / 2;
	});
}

const median = (values: readonly number[]) => [...values].sort((a, b) => a - b)[Math.floor(values.length / 2)]!;

// Published: Henderson & Velleman, Biometrics 37 (1981) 391-411, from Motor Trend 1974: quarter mile in s, wt in 1000 lb.
// npm mtcars 0.1.0, the same as R's in all columns.
describe('32 road cars of 1974 over the quarter mile', () => {
	const cars = readJson(require.resolve('mtcars')) as {wt: number; hp: number; qsec: number}[];
	const times = cars.map(car =>
		run(1000 * car.wt, car.hp, {grip: 0.5, efficiency: 0.75}, {distanceM: mileM / 4, toMps: 1000}),
	);
	const measured = cars.map(car => car.qsec);

	test('correlate with the model, at 1.25 s or better and none off by more than 20 %', () => {
		expect(cars.length).toBe(32);
		expect(correlation(times, measured)).toBeGreaterThan(0.78);
		expect(Math.sqrt(mean(times.map((time, i) => (time - measured[i]!) ** 2)))).toBeLessThan(1.25);
		for (const [i, time] of times.entries()) expect(Math.abs(time / measured[i]! - 1)).toBeLessThan(0.2);
	});

	// Recomputed: the same model and parameters give r 0.814 and 1.028 s.
	test('give the figures of the same model elsewhere', () => {
		expect(correlation(times, measured)).toBeCloseTo(0.814, 2);
		expect(Math.sqrt(mean(times.map((time, i) => (time - measured[i]!) ** 2)))).toBeCloseTo(1.028, 1);
	});

	test('are all slower than their power without any loss', () => {
		for (const [i, car] of cars.entries()) {
			const idealS = 4.80261 * Math.cbrt((1000 * car.wt) / car.hp);
			expect(times[i]).toBeGreaterThan(idealS);
			expect(measured[i]).toBeGreaterThan(idealS);
		}
	});
});

// Published: the StatLib cars data (1982), npm vega-datasets 3.2.1: 0 to 60 mph in s; six rows have no power.
describe('400 road cars of 1970 to 1982 from 0 to 60 mph', () => {
	type Row = {Horsepower: number | null; Weight_in_lbs: number; Acceleration: number};
	const path = new URL('../../node_modules/vega-datasets/data/cars.json', import.meta.url).pathname;
	const cars = (readJson(path) as Row[]).filter(car => car.Horsepower !== null);
	const times = cars.map(car =>
		run(car.Weight_in_lbs, car.Horsepower!, {grip: 0.3, efficiency: 0.7}, {distanceM: 1e6, toMps: 60 * mphMps}),
	);
	const measured = cars.map(car => car.Acceleration);

	test('rank as in the model, with a median error of 10 % or less', () => {
		expect(cars.length).toBe(400);
		expect(correlation(ranks(times), ranks(measured))).toBeGreaterThan(0.75);
		expect(median(times.map((time, i) => Math.abs(time / measured[i]! - 1)))).toBeLessThan(0.1);
	});

	// Recomputed: the same model gives r 0.801 and Spearman 0.792.
	test('give the figures of the same model elsewhere', () => {
		expect(correlation(times, measured)).toBeCloseTo(0.801, 1);
		expect(correlation(ranks(times), ranks(measured))).toBeCloseTo(0.792, 1);
	});
});
