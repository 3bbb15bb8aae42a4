import fc from 'fast-check';
import * as mathjs from 'mathjs';
import {describe, expect, test} from 'vitest';
import {runStraightPlainly} from '../../source/drivetrain/run-straight.ts';
import type {SequenceRun} from '../../source/drivetrain/straight.ts';
import {relativeError} from '../close.ts';
import {runs} from '../runs.ts';
import {anyStraight} from './any-car.ts';
import {disagreement, type Straight} from './disagreement.ts';
import {accelerationIn} from './equations.ts';
import {sampleCourse, sampleTrain, sampleVehicle, trainOf} from './sample-car.ts';

const chosenRun = (straight: Straight) => {
	const run = runStraightPlainly(straight.vehicle, straight.train, straight.course);
	if (run.kind !== 'ran') throw new Error(`expected a run, got ${run.kind}`);
	return run.fastest;
};

const straights: [string, Straight, (run: SequenceRun) => boolean][] = (() => {
	const base = {vehicle: sampleVehicle(), train: sampleTrain, course: sampleCourse()};
	return [
		[
			'an oval straight with a shift',
			{...base, course: sampleCourse({exitMps: 42, lengthM: 500})},
			run => run.shifts.length > 0,
		],
		[
			'a long straight through all gears',
			{...base, course: sampleCourse({exitMps: 15, lengthM: 2500})},
			run => run.shifts.length >= 3,
		],
		[
			'a climb into a head wind',
			{...base, course: sampleCourse({grade: 0.07, headwindMps: 8, lengthM: 700})},
			() => true,
		],
		[
			'a descent with the wind',
			{...base, course: sampleCourse({grade: -0.06, headwindMps: -9, lengthM: 700})},
			() => true,
		],
		[
			'a tail wind faster than the car',
			{...base, course: sampleCourse({headwindMps: -52, exitMps: 35, lengthM: 800})},
			run => run.topMps > 52,
		],
		[
			'a start that grip holds',
			{
				...base,
				vehicle: sampleVehicle({grip: 0.9, cgHeightRatio: 0.15}),
				course: sampleCourse({exitMps: 8, lengthM: 1500}),
			},
			run => run.shifts.length > 0,
		],
		[
			'a tire that grows and slips much',
			{...base, vehicle: sampleVehicle({growth: 0.05, slip: 0.08}), course: sampleCourse({exitMps: 30, lengthM: 900})},
			() => true,
		],
		['the limiter holding', {...base, course: sampleCourse({highestGear: 3, lengthM: 900})}, run => run.limiterM > 100],
		[
			'the limiter, then the brakes',
			{...base, course: sampleCourse({highestGear: 3, lengthM: 900, entryMps: 35, brakingMps2: 9})},
			run => run.limiterM > 100,
		],
		[
			'the brakes',
			{...base, course: sampleCourse({exitMps: 33, lengthM: 620, entryMps: 41, brakingMps2: 11})},
			run => run.finalMps === 41 && run.limiterM === 0,
		],
		[
			'a car that slows',
			{...base, train: trainOf([3.2]), course: sampleCourse({highestGear: 1, grade: 0.2, exitMps: 75})},
			run => run.slows,
		],
		[
			'a banked piece with scrub',
			{...base, course: sampleCourse({load: 1.8, extraDragN: 900, exitMps: 55, lengthM: 800})},
			() => true,
		],
	];
})();

describe('an independent integrator (odex) agrees to 1e-8 on', () => {
	test.each(straights)('%s', (_, straight, isOne) => {
		const run = chosenRun(straight);
		expect(isOne(run)).toBe(true);
		expect(disagreement(straight, run)).toBeLessThan(1e-8);
	});

	test('any car on any straight, to 1e-7', () => {
		fc.assert(
			fc.property(anyStraight, straight => {
				const run = runStraightPlainly(straight.vehicle, straight.train, straight.course);
				if (run.kind !== 'ran' || run.fastest.timeS > 300) return;
				expect(disagreement(straight, run.fastest)).toBeLessThan(1e-7);
			}),
			{numRuns: runs(60, 1500)},
		);
	});
});

// mathjs 15.2.0, Dormand-Prince RK5(4)7M, a second general integrator.
describe('mathjs agrees to 1e-7 on', () => {
	// The types of mathjs 15 do not know it.
	const {solveODE} = mathjs as unknown as {
		solveODE(
			slope: (t: number, y: number[]) => number[],
			span: number[],
			y0: number[],
			options: {tol: number; maxIter: number},
		): {y: number[][]};
	};
	test.each([
		['level road', sampleCourse({exitMps: 50, lengthM: 400, lowestGear: 4, highestGear: 4})],
		['a climb', sampleCourse({exitMps: 45, lengthM: 400, lowestGear: 4, highestGear: 4, grade: 0.05, headwindMps: 6})],
		['a descent', sampleCourse({exitMps: 48, lengthM: 300, lowestGear: 5, highestGear: 5, grade: -0.1})],
	])('%s', (_, course) => {
		const [vehicle, train] = [sampleVehicle(), sampleTrain];
		const run = chosenRun({vehicle, train, course});
		const slope = (_t: number, [v]: number[]) => [accelerationIn(vehicle, train, course, run.lastGear, v!), v!];
		const {y} = solveODE(slope, [0, run.timeS], [course.exitMps, 0], {tol: 1e-10, maxIter: 1e6});
		const [speedMps, distanceM] = y.at(-1)! as [number, number];
		expect(relativeError(speedMps, run.finalMps)).toBeLessThan(1e-7);
		expect(relativeError(distanceM, course.lengthM)).toBeLessThan(1e-7);
	});
});
