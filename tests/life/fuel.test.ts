import {describe, expect, test} from 'vitest';
import {monotoneCubic} from '../../source/drivetrain/monotone-cubic.ts';
import {RoadGears} from '../../source/drivetrain/road-gears.ts';
import {runStraight} from '../../source/drivetrain/run-straight.ts';
import {fuelOf} from '../../source/life/fuel.ts';
import {straightSlices} from '../../source/life/straight-slices.ts';
import {addLap, emptyTally} from '../../source/life/tally.ts';
import type {Row} from '../../source/planning/results.ts';
import {sampleCourse, sampleVehicle, trainOf} from '../drivetrain/sample-car.ts';

const horsepowerW = 745.6998715822702;
const poundKg = 0.45359237;
const gallonM3 = 3.785411784e-3;
const row = {pair: '33/38', gearbox: 'A', installed: true, verdict: 'pass'} as Row;
const worked = (energyJ: number, timeS: number) => ({...emptyTally(), energyJ, timeS});
const use = (changes: Partial<Parameters<typeof fuelOf>[2]> = {}) => ({
	consumptionKgPerJ: 0.3 / 3.6e6,
	densityKgM3: 745,
	tankM3: 20 * gallonM3,
	...changes,
});

test('500 hp for 10 minutes at 0.50 lb/(hp h) burns 41.667 lb, 6.7017 gal of 6.2173 lb', () => {
	// Recomputed.
	const consumptionKgPerJ = (0.5 * poundKg) / (horsepowerW * 3600);
	const fuel = fuelOf(row, worked(500 * horsepowerW * 600, 600), use({consumptionKgPerJ}), 1, 1);
	expect(fuel.fuelPerLapKg! / poundKg).toBeCloseTo(41.667, 3);
	expect(fuel.fuelPerLapM3! / gallonM3).toBeCloseTo(6.7017, 3);
});

test('270 g/kWh of 43 MJ/kg is a thermal efficiency of 0.3101', () => {
	// Recomputed: 3600 / (0.270 · 43 000).
	const fuel = fuelOf(row, worked(1e6, 1), use({consumptionKgPerJ: 0.27 / 3.6e6}), 1, 1);
	expect(1e6 / (fuel.fuelPerLapKg! * 43e6)).toBeCloseTo(0.3101, 4);
});

test('an 11 gal can weighs almost 70 lb', () => {
	// Common practice, no source: 11 gal of 0.745 kg/L are 68.4 lb (recomputed).
	expect((11 * gallonM3 * 745) / poundKg).toBeCloseTo(68.4, 1);
});

test('laps, tanks and stops follow from the fuel of a lap', () => {
	// 3 MJ at 0.3 kg/kWh are 0.25 kg, 0.33557 L: 225.6 laps to 75.708 L (recomputed).
	const fuel = fuelOf(row, worked(3e6, 20), use(), 800, 500);
	expect(fuel.fuelPerLapKg).toBeCloseTo(0.25, 12);
	expect(fuel.lapsPerTank).toBeCloseTo(225.61, 2);
	expect(fuel.tanksPerRace).toBeCloseTo(500 / 225.61, 4);
	expect(fuel.fuelStops).toBe(2);
	expect(fuel.fuelM3PerM).toBeCloseTo(fuel.fuelPerLapM3! / 800, 15);
	expect(fuelOf(row, worked(3e6, 20), use(), 800, 200).fuelStops).toBe(0);
});

test('what is not known is null', () => {
	const partial = fuelOf(row, worked(3e6, 20), use(), null, 500);
	expect([partial.fuelPerLapKg, partial.fuelM3PerM, partial.fuelPerRaceM3, partial.lapsPerTank]).toEqual([
		null,
		null,
		null,
		null,
	]);
	const tankless = fuelOf(row, worked(3e6, 20), use({tankM3: null}), 800, null);
	expect([tankless.lapsPerTank, tankless.tanksPerRace, tankless.fuelStops, tankless.fuelPerRaceKg]).toEqual([
		null,
		null,
		null,
		null,
	]);
	expect(tankless.fuelPerLapKg).toBeCloseTo(0.25, 12);
});

describe('constant power', () => {
	/** 300 kW at any RPM, in points close enough for the cubic between them; 1500 kg against 0.539 kg/m of drag. */
	const rpms = Array.from({length: 900}, (_, i) => 1000 + 10 * i);
	const vehicle = sampleVehicle({
		massKg: 1500,
		dragAreaM2: 0.88,
		airDensityKgM3: 1.225,
		downforceAreaM2: 0,
		rolling: 0,
		grip: 10,
		wheelInertiaKgM2: 0,
		undrivenInertiaKgM2: 0,
		engineInertiaKgM2: 0,
		growth: 0,
		torqueNm: monotoneCubic(
			rpms,
			rpms.map(rpm => 300_000 / ((2 * Math.PI * rpm) / 60)),
		),
		slip: 0,
		limiterRpm: 9900,
		topRpm: 9900,
		shiftCapRpm: 9900,
	});

	test.each([
		[400, 7.62318037],
		[800, 13.637341572],
	])('over %d m from 40 m/s the work is power times %d s', (lengthM, timeS) => {
		// Recomputed closed form of constant power against drag.
		const course = sampleCourse({exitMps: 40, lengthM, highestGear: 1});
		const gears = new RoadGears(vehicle, trainOf([4], 1), course);
		const run = runStraight(gears, course);
		if (run.kind !== 'ran') throw new Error(run.kind);
		const tally = emptyTally();
		const slices = straightSlices(gears, course, run.chosen, 0, 8000);
		addLap(tally, {slices, timeS: run.chosen.timeS}, 1, 8000);
		expect(tally.timeS).toBeCloseTo(timeS, 6);
		expect(Math.abs(tally.energyJ / (300_000 * timeS) - 1)).toBeLessThan(1e-6);
		// 0.3 kg/kWh.
		expect(fuelOf(row, tally, use(), lengthM, 1).fuelPerLapKg).toBeCloseTo((0.3 * 300 * timeS) / 3600, 6);
	});
});
