import fc from 'fast-check';
import {describe, expect, test} from 'vitest';
import {valueAt} from '../../source/drivetrain/monotone-cubic.ts';
import {RoadGears} from '../../source/drivetrain/road-gears.ts';
import {runStraight} from '../../source/drivetrain/run-straight.ts';
import type {Course, GearTrain, SequenceRun, Vehicle} from '../../source/drivetrain/straight.ts';
import {fullThrottleSlices} from '../../source/life/full-throttle.ts';
import type {Slice} from '../../source/life/slice.ts';
import {straightSlices} from '../../source/life/straight-slices.ts';
import {anyStraight} from '../drivetrain/any-car.ts';
import {accelerationIn, rpmOf} from '../drivetrain/equations.ts';
import {sampleCourse, sampleTrain, sampleVehicle} from '../drivetrain/sample-car.ts';
import {runs} from '../runs.ts';
import {byOdex} from './by-odex.ts';

type Straight = {vehicle: Vehicle; train: GearTrain; course: Course};
const sum = (slices: readonly Slice[], field: 'timeS' | 'turns' | 'energyJ') =>
	slices.reduce((total, slice) => total + slice[field], 0);
const relative = (found: number, wanted: number) => Math.abs(found - wanted) / Math.max(1e-9, Math.abs(wanted));

function told({vehicle, train, course}: Straight): {slices: Slice[]; run: SequenceRun; gears: RoadGears} | undefined {
	const gears = new RoadGears(vehicle, train, course);
	const run = runStraight(gears, course);
	if (run.kind !== 'ran') return undefined;
	return {slices: straightSlices(gears, course, run.chosen, 0, 8100), run: run.chosen, gears};
}

describe('full throttle, against the equations written a second time and integrated over speed by odex', () => {
	const [vehicle, train, course] = [sampleVehicle(), sampleTrain, sampleCourse()];
	const gears = new RoadGears(vehicle, train, course);
	const [gear, fromMps, toMps] = [4, 44, 62];
	const {timeS: wholeS} = gears.table(gear).travel(fromMps, {distanceM: 5000, toMps, braking: undefined});
	const slices = fullThrottleSlices(gears, {gear, fromMps, toMps, timeS: wholeS}, 7600);
	const overall = train.overall[gear - 1]!;
	const slowness = (v: number) => 1 / accelerationIn(vehicle, train, course, gear, v);
	const rpm = (v: number) => rpmOf(vehicle, overall, v);
	const power = (v: number) => (2 * Math.PI * rpm(v) * valueAt(vehicle.torqueNm, rpm(v))) / 60;
	/** The speed at an RPM, by halving. */
	const speedAt = (wanted: number) => {
		let [low, high] = [1, 200];
		for (let i = 0; i < 80; i++) {
			const middle = (low + high) / 2;
			if (rpm(middle) < wanted) low = middle;
			else high = middle;
		}
		return low;
	};

	test('the slices end at whole steps and at the RPM asked about', () => {
		const ends = slices.slice(0, -1).map(({toRpm}) => Math.round(toRpm * 1e6) / 1e6);
		expect(ends).toEqual([5750, 6000, 6250, 6500, 6750, 7000, 7250, 7500, 7600, 7750]);
	});

	test('time, turns and work of each slice', () => {
		for (const slice of slices) {
			const ends = [speedAt(slice.fromRpm), speedAt(slice.toRpm)] as const;
			const [timeS, turns, energyJ] = byOdex(
				[slowness, v => (rpm(v) / 60) * slowness(v), v => power(v) * slowness(v)],
				...ends,
			);
			expect(relative(slice.timeS, timeS!)).toBeLessThan(1e-9);
			expect(relative(slice.turns, turns!)).toBeLessThan(1e-9);
			expect(relative(slice.energyJ, energyJ!)).toBeLessThan(1e-9);
		}
	});
});

describe('a whole straight', () => {
	const straights: [string, Straight, (run: SequenceRun) => boolean][] = [
		[
			'with shifts',
			{vehicle: sampleVehicle(), train: sampleTrain, course: sampleCourse({exitMps: 20, lengthM: 900})},
			run => run.shifts.length > 1,
		],
		[
			'with braking',
			{
				vehicle: sampleVehicle(),
				train: sampleTrain,
				course: sampleCourse({entryMps: 38, brakingMps2: 8}),
			},
			run => run.finalMps === 38,
		],
		[
			'on the limiter',
			{vehicle: sampleVehicle(), train: sampleTrain, course: sampleCourse({highestGear: 3, lengthM: 900})},
			run => run.limiterM > 100,
		],
		[
			'up to the speed that the air allows',
			{vehicle: sampleVehicle({dragAreaM2: 1.6}), train: sampleTrain, course: sampleCourse({lengthM: 15_000})},
			run => run.limiterM === 0,
		],
		[
			'slowing in a scrubbing corner',
			{vehicle: sampleVehicle(), train: sampleTrain, course: sampleCourse({exitMps: 75, extraDragN: 5000})},
			run => run.slows,
		],
		[
			'held by grip at first',
			{vehicle: sampleVehicle({grip: 0.5}), train: sampleTrain, course: sampleCourse({exitMps: 15})},
			run => run.firstGear < 3,
		],
	];

	test.each(straights)('%s: the times add up to the run', (_, straight, isSuch) => {
		const {slices, run} = told(straight)!;
		expect(isSuch(run)).toBe(true);
		expect(relative(sum(slices, 'timeS'), run.timeS)).toBeLessThan(1e-9);
		expect(slices.every(({timeS, turns, energyJ}) => timeS >= 0 && turns >= 0 && energyJ >= 0)).toBe(true);
	});

	test('the turns are the distance over the circumference, times ratio and slip, where there is no growth', () => {
		const {slices, run} = told({
			vehicle: sampleVehicle({growth: 0}),
			train: sampleTrain,
			course: sampleCourse({lowestGear: 4, highestGear: 4, lengthM: 600}),
		})!;
		expect(run.shifts).toEqual([]);
		// 600 m / 2.2 m a turn · 4.65 · 1.015 (recomputed).
		expect(sum(slices, 'turns')).toBeCloseTo((600 / 2.2) * 4.65 * 1.015, 6);
	});

	test('on the limiter the work is only what holds the speed', () => {
		const {slices, run} = told(straights[2]![1])!;
		const held = slices.at(-1)!;
		expect(held.fromRpm).toBe(held.toRpm);
		expect(held.timeS).toBeCloseTo(run.limiterM / run.topMps, 9);
		const before = slices.at(-2)!;
		expect(held.energyJ / held.timeS).toBeLessThan(before.energyJ / before.timeS);
	});

	test('a shift and braking burn nothing, and a shift counts in the gear left', () => {
		const closed = told(straights[0]![1])!.slices.filter(({throttle}) => throttle === 'closed');
		expect(closed.every(({energyJ}) => energyJ === 0)).toBe(true);
		expect(Math.max(...closed.map(({gear}) => gear))).toBe(told(straights[0]![1])!.run.lastGear - 1);
	});

	test('in one gear without growth the turns are the way times the ratio, with any car on any straight', () => {
		fc.assert(
			fc.property(anyStraight, ({vehicle, train, course}) => {
				const gear = course.lowestGear;
				const only = {...course, highestGear: gear, startGear: undefined, entryMps: undefined, brakingMps2: undefined};
				const found = told({vehicle: {...vehicle, growth: 0}, train, course: only});
				if (found === undefined) return true;
				const turns = (course.lengthM / vehicle.rolloutM) * train.overall[gear - 1]! * (1 + vehicle.slip);
				// Near the speed that the resistances hold, neighboring doubles of speed are meters apart.
				return relative(sum(found.slices, 'turns'), turns) < 1e-7;
			}),
			{numRuns: runs(300, 20_000)},
		);
	});

	test('with any car on any straight the times add up to the run', () => {
		fc.assert(
			fc.property(anyStraight, straight => {
				const found = told(straight);
				if (found === undefined) return true;
				return relative(sum(found.slices, 'timeS'), found.run.timeS) < 1e-9;
			}),
			{numRuns: runs(300, 20_000)},
		);
	});
});
