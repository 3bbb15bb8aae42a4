import fc from 'fast-check';
import {describe, expect, test} from 'vitest';
import {RoadGears} from '../../source/drivetrain/road-gears.ts';
import {runStraight, runStraightPlainly} from '../../source/drivetrain/run-straight.ts';
import type {Course, GearTrain, SequenceRun, StraightRun, Vehicle} from '../../source/drivetrain/straight.ts';
import {relativeError} from '../close.ts';
import {runs} from '../runs.ts';
import {anyStraight, anyVehicle, within} from './any-car.ts';
import {sampleCourse, sampleTrain, sampleVehicle, trainOf} from './sample-car.ts';

type Straight = {vehicle: Vehicle; train: GearTrain; course: Course};

const fastRun = ({vehicle, train, course}: Straight) => runStraight(new RoadGears(vehicle, train, course), course);
const plainRun = ({vehicle, train, course}: Straight) => runStraightPlainly(vehicle, train, course);

const sameSequence = (one: SequenceRun, other: SequenceRun) =>
	one.firstGear === other.firstGear && one.lastGear === other.lastGear;

/** The same sequence, or one that ties with it: gears that grip holds are exactly equal. */
function expectSame(fast: StraightRun, plain: StraightRun, within = 1e-9) {
	expect(fast.kind).toBe(plain.kind);
	if (fast.kind !== 'ran' || plain.kind !== 'ran') return;
	for (const which of ['fastest', 'chosen'] as const) {
		const [one, other] = [fast[which], plain[which]];
		expect(relativeError(one.timeS, other.timeS)).toBeLessThan(within);
		if (!sameSequence(one, other)) continue;
		expect(relativeError(one.topMps, other.topMps)).toBeLessThan(within);
		expect(relativeError(one.finalMps, other.finalMps)).toBeLessThan(within);
		expect(Math.abs(one.limiterM - other.limiterM)).toBeLessThan(1e-6 * (1 + other.limiterM));
		expect(relativeError(one.reachRpm, other.reachRpm)).toBeLessThan(within);
		// A car that neither gains nor loses may end a rounding above its exit speed or below it.
		const changes = relativeError(one.finalMps, one.topMps) > 1e-12;
		expect([one.topGear, one.entryMissed, one.pushed]).toEqual([other.topGear, other.entryMissed, other.pushed]);
		if (changes) expect(one.slows).toBe(other.slows);
		one.shifts.forEach((shift, i) => {
			expect(shift.rpm).toBe(other.shifts[i]!.rpm);
			expect(shift.lightRpm).toBe(other.shifts[i]!.lightRpm);
			expect(Math.abs(shift.distanceM - other.shifts[i]!.distanceM)).toBeLessThan(
				1e-8 * (1 + other.shifts[i]!.distanceM),
			);
		});
	}
}

test('the fast run is the plain run, for any car on any straight', () => {
	fc.assert(
		fc.property(anyStraight, straight => expectSame(fastRun(straight), plainRun(straight))),
		{numRuns: runs(300, 5000)},
	);
});

test('gears that have served other straights give the same answers', () => {
	const others = fc.array(fc.tuple(within(1, 90), within(1, 3000)), {minLength: 1, maxLength: 5});
	fc.assert(
		fc.property(anyStraight, others, (straight, before) => {
			const gears = new RoadGears(straight.vehicle, straight.train, straight.course);
			for (const [exitMps, lengthM] of before) runStraight(gears, {...straight.course, exitMps, lengthM});
			expectSame(runStraight(gears, straight.course), plainRun(straight));
		}),
		{numRuns: runs(100, 2000)},
	);
});

describe('fast and plain agree', () => {
	const base = {vehicle: sampleVehicle(), train: sampleTrain, course: sampleCourse()};
	const cases: [string, Partial<Straight>][] = [
		['on a meter', {course: sampleCourse({lengthM: 1})}],
		['over 20 km', {course: sampleCourse({lengthM: 20_000})}],
		['downhill, 20 %', {course: sampleCourse({grade: -0.2, lengthM: 3000})}],
		['uphill, 20 %', {course: sampleCourse({grade: 0.2, lengthM: 3000})}],
		['with a tail wind faster than the car', {course: sampleCourse({headwindMps: -55, lengthM: 900})}],
		['with a tail wind that the car passes', {course: sampleCourse({headwindMps: -50.5, lengthM: 900})}],
		['with grip that holds three gears', {vehicle: sampleVehicle({grip: 0.5}), course: sampleCourse({exitMps: 12})}],
		['with a tire that grows so that no speed reaches the limiter', {vehicle: sampleVehicle({growth: 0.3})}],
		['without growth', {vehicle: sampleVehicle({growth: 0})}],
		['with two gears alike', {train: trainOf([7.6, 5.9, 5.9, 4.65]), course: sampleCourse({highestGear: 4})}],
		['with one gear', {train: trainOf([4]), course: sampleCourse({highestGear: 1})}],
		['braking', {course: sampleCourse({entryMps: 45, brakingMps2: 9})}],
		['with an entry missed', {course: sampleCourse({entryMps: 95, brakingMps2: 9, lengthM: 200})}],
		['without shift time', {vehicle: sampleVehicle({shiftTimeS: 0}), course: sampleCourse({exitMps: 20})}],
		['held at the limiter', {course: sampleCourse({highestGear: 3, lengthM: 1500})}],
		['held, then braking', {course: sampleCourse({highestGear: 3, lengthM: 1500, entryMps: 40, brakingMps2: 8})}],
	];
	test.each(cases)('%s', (_, change) => {
		const straight = {...base, ...change};
		const run = plainRun(straight);
		expect(run.kind).toBe('ran');
		expectSame(fastRun(straight), run);
	});

	test('at the very limit, and a rounding above it', () => {
		const vehicle = sampleVehicle();
		const limitMps = new RoadGears(vehicle, sampleTrain, sampleCourse()).motion(5).speedAt(vehicle.topRpm);
		for (const factor of [1, 1 - Number.EPSILON, 1 + 2 * Number.EPSILON]) {
			const straight = {...base, course: sampleCourse({exitMps: limitMps * factor})};
			expectSame(fastRun(straight), plainRun(straight));
			expect(plainRun(straight).kind).toBe(factor > 1 ? 'overLimit' : 'ran');
		}
	});

	test('with thrust and resistance the same from the start on', () => {
		fc.assert(
			fc.property(anyVehicle, within(10, 60), (vehicle, exitMps) => {
				const train = trainOf([5]);
				const level = sampleCourse({exitMps, highestGear: 1, lengthM: 2000});
				const gears = new RoadGears(vehicle, train, level);
				const surplusN = vehicle.massKg * gears.motion(1).acceleration(exitMps);
				const straight = {vehicle, train, course: {...level, extraDragN: surplusN}};
				// What is left of the acceleration is rounding, and the time hangs on it: fewer digits are sure.
				expectSame(fastRun(straight), plainRun(straight), 1e-8);
			}),
			{numRuns: runs(100, 2000)},
		);
	});
});
