import fc from 'fast-check';
import {expect, test} from 'vitest';
import {RoadGears} from '../../source/drivetrain/road-gears.ts';
import {type Corner, cornerRoad, cornerSlices, cornerTimeS} from '../../source/life/corner.ts';
import type {Slice} from '../../source/life/slice.ts';
import {within} from '../drivetrain/any-car.ts';
import {circumference, rpmOf} from '../drivetrain/equations.ts';
import {sampleTrain, sampleVehicle} from '../drivetrain/sample-car.ts';
import {runs} from '../runs.ts';
import {byOdex} from './by-odex.ts';

const vehicle = sampleVehicle();
const gears = new RoadGears(vehicle, sampleTrain, cornerRoad);
const corner = (changes: Partial<Corner> = {}): Corner => ({
	lengthM: 200,
	entryMps: 50,
	minimumMps: 40,
	exitMps: 44,
	entryGear: 4,
	exitGear: 4,
	downshiftRpm: 9000,
	steadySlip: 0.001,
	...changes,
});
const sum = (slices: readonly Slice[], field: 'timeS' | 'turns' | 'energyJ') =>
	slices.reduce((total, slice) => total + slice[field], 0);

test('each half takes its length over its mean speed', () => {
	// 100 m at 45 m/s and 100 m at 42 m/s (recomputed).
	expect(cornerTimeS(corner())).toBeCloseTo(100 / 45 + 100 / 42, 12);
	expect(sum(cornerSlices(gears, corner(), 8000), 'timeS')).toBeCloseTo(100 / 45 + 100 / 42, 12);
});

test('without a minimum the speed changes evenly from entry to exit', () => {
	expect(cornerTimeS(corner({minimumMps: undefined}))).toBeCloseTo(200 / 47, 12);
});

test('turns and work of a half, against its definition integrated by odex', () => {
	// Gaining from 40 to 44 m/s over 100 m, 1.68 m/s² (recomputed: (44² − 40²) / 200).
	const slices = cornerSlices(gears, corner({entryMps: 40}), 8000).filter(({toRpm, fromRpm}) => toRpm > fromRpm);
	const overall = sampleTrain.overall[3]!;
	const rpm = (v: number) => rpmOf({...vehicle, slip: 0.001}, overall, v);
	const power = (v: number) => {
		const wheels = (2 * Math.PI) / circumference(vehicle, v);
		const mass = 1640 + wheels ** 2 * (4 + 0.14 * overall ** 2);
		const rolling = 0.018 * (1640 * 9.80665 + 0.5 * 1.16 * 1.6 * v ** 2);
		return ((mass * 1.68 + 0.5 * 1.16 * 0.95 * v ** 2 + rolling) * v * 1.001) / 0.92;
	};
	const [turns, energyJ] = byOdex([v => rpm(v) / 60 / 1.68, v => power(v) / 1.68], 40, 44);
	expect(sum(slices, 'turns') / turns! - 1).toBeLessThan(1e-9);
	expect(Math.abs(sum(slices, 'energyJ') / energyJ! - 1)).toBeLessThan(1e-9);
});

test('slowing harder than the resistances do takes no power', () => {
	const slices = cornerSlices(gears, corner({entryMps: 70, exitMps: 40}), 8000);
	const slowing = slices.filter(({toRpm, fromRpm}) => toRpm < fromRpm);
	expect(sum(slowing, 'energyJ')).toBe(0);
});

test('it never takes more power than full throttle gives', () => {
	const hard = cornerSlices(gears, corner({lengthM: 20, entryMps: 30, minimumMps: 30, exitMps: 60}), 8000);
	// The sample engine peaks at 531 kW: 620 N m at 8000 rpm is 519 kW, 660 N m at 7000 rpm 484 kW (recomputed).
	for (const {energyJ, timeS} of hard.filter(slice => slice.timeS > 0)) expect(energyJ / timeS).toBeLessThan(532_000);
});

test('a slowing car takes a lower gear only where it may', () => {
	const slices = cornerSlices(
		gears,
		corner({entryMps: 80, minimumMps: 30, exitMps: 40, entryGear: 5, exitGear: 2}),
		8000,
	);
	const inLower = slices.filter(({gear}) => gear < 5);
	expect(Math.max(...inLower.flatMap(({fromRpm, toRpm}) => [fromRpm, toRpm]))).toBeCloseTo(9000, 6);
	expect([...new Set(slices.map(({gear}) => gear))]).toEqual([5, 4, 3, 2]);
	expect(sum(slices, 'timeS')).toBeCloseTo(cornerTimeS(corner({entryMps: 80, minimumMps: 30, exitMps: 40})), 12);
});

test('any corner: the times add up, none is negative', () => {
	const speed = within(5, 95);
	const gear = fc.integer({min: 1, max: 5});
	const anyCorner = fc.record({
		lengthM: within(0, 2000),
		entryMps: speed,
		minimumMps: fc.option(speed, {nil: undefined}),
		exitMps: speed,
		entryGear: gear,
		exitGear: gear,
		downshiftRpm: within(3000, 9000),
		steadySlip: within(0, 0.05),
	});
	fc.assert(
		fc.property(anyCorner, one => {
			const slices = cornerSlices(gears, one, 8000);
			const wanted = cornerTimeS(one);
			const isWhole = Math.abs(sum(slices, 'timeS') - wanted) <= 1e-9 * Math.max(1e-9, wanted);
			return isWhole && slices.every(({timeS, turns, energyJ}) => timeS >= -1e-12 && turns >= -1e-12 && energyJ >= 0);
		}),
		{numRuns: runs(500, 50_000)},
	);
});
