/** Numbers at the edge: each has a defined answer, found a second time by odex or by hand. */
import {describe, expect, test} from 'vitest';
import {monotoneCubic} from '../../source/drivetrain/monotone-cubic.ts';
import {runStraightPlainly} from '../../source/drivetrain/run-straight.ts';
import type {Course, GearTrain, SequenceRun, Vehicle} from '../../source/drivetrain/straight.ts';
import {relativeError} from '../close.ts';
import {disagreement} from './disagreement.ts';
import {accelerationIn, rpmOf} from './equations.ts';
import {sampleCourse, sampleTrain, sampleVehicle, trainOf} from './sample-car.ts';

const fastest = (course: Course, vehicle: Vehicle = sampleVehicle(), train: GearTrain = sampleTrain): SequenceRun => {
	const run = runStraightPlainly(vehicle, train, course);
	if (run.kind !== 'ran') throw new Error(`expected a run, got ${run.kind}`);
	return run.fastest;
};

/** The run, once odex agrees with it. */
function confirmed(course: Course, vehicle: Vehicle = sampleVehicle(), train: GearTrain = sampleTrain): SequenceRun {
	const run = fastest(course, vehicle, train);
	expect(disagreement({vehicle, train, course}, run)).toBeLessThan(1e-8);
	return run;
}

/** The speed at which a gear turns the engine so fast, by halving: without the quadratic. */
function speedAt(rpm: number, vehicle: Vehicle, overall: number): number {
	let [low, high] = [0, 300];
	for (let half = 0; half < 200; half++) {
		const middle = (low + high) / 2;
		if (rpmOf(vehicle, overall, middle) < rpm) low = middle;
		else high = middle;
	}
	return low;
}

describe('length', () => {
	test.each([1e-6, 1e-3, 0.1, 1])('%d m take the length over the exit speed, nearly, and no shift', lengthM => {
		const run = confirmed(sampleCourse({lengthM}));
		expect(run.shifts).toEqual([]);
		expect(Math.abs(run.timeS / (lengthM / 40) - 1)).toBeLessThan(0.01 * lengthM);
	});

	test.each([10_000, 100_000])('over %d m the car ends at its top speed, where nothing is left over', lengthM => {
		const run = confirmed(sampleCourse({lengthM}));
		const left = accelerationIn(sampleVehicle(), sampleTrain, sampleCourse(), run.lastGear, run.finalMps);
		expect(Math.abs(left)).toBeLessThan(1e-5);
		expect(run.finalMps).toBe(run.topMps);
	});

	test('ten times the length past the top speed takes the rest at that speed', () => {
		const [ten, hundred] = [10_000, 100_000].map(lengthM => fastest(sampleCourse({lengthM})));
		expect(relativeError(hundred!.timeS - ten!.timeS, 90_000 / hundred!.topMps)).toBeLessThan(1e-8);
	});
});

describe('exit', () => {
	test('at the very limit of the last gear is held there, on the limiter, for the whole length', () => {
		const vehicle = sampleVehicle({dragAreaM2: 0.2});
		const exitMps = speedAt(9200, vehicle, 3.75);
		const course = sampleCourse({exitMps: exitMps * (1 - 1e-12), lowestGear: 5});
		const run = fastest(course, vehicle);
		expect(relativeError(run.limiterM, 400)).toBeLessThan(1e-6);
		expect(relativeError(run.timeS, 400 / exitMps)).toBeLessThan(1e-9);
		expect(relativeError(run.topRpm, 9200)).toBeLessThan(1e-11);
	});

	test('a hair above it rules every gear out', () => {
		const exitMps = speedAt(9200, sampleVehicle(), 3.75) * (1 + 1e-9);
		expect(runStraightPlainly(sampleVehicle(), sampleTrain, sampleCourse({exitMps})).kind).toBe('overLimit');
	});

	test('a crawl of 0.1 m/s in a tall gear goes on with the torque of the first point', () => {
		const run = confirmed(sampleCourse({exitMps: 0.1, lowestGear: 5}));
		expect(run.timeS).toBeGreaterThan(5);
	});
});

describe('thrust equal to resistance', () => {
	const course = sampleCourse({lowestGear: 5, lengthM: 3000});
	const topMps = fastest({...course, lengthM: 200_000}).finalMps;

	test('at the exit: the speed does not change, and the time is length over speed', () => {
		const run = fastest({...course, exitMps: topMps});
		expect(relativeError(run.finalMps, topMps)).toBeLessThan(1e-9);
		expect(relativeError(run.timeS, 3000 / topMps)).toBeLessThan(1e-9);
	});

	test.each([1 - 1e-9, 1 - 1e-6, 1 + 1e-6, 1 + 1e-9])('a hair beside it, %d of that speed, comes closer', share => {
		const run = fastest({...course, exitMps: topMps * share});
		expect(Math.abs(run.finalMps - topMps)).toBeLessThan(Math.abs(topMps * share - topMps) + 1e-12 * topMps);
		expect(relativeError(run.timeS, 3000 / topMps)).toBeLessThan(2e-6);
	});
});

describe('wind', () => {
	test('none and -0 are the same', () => {
		expect(fastest(sampleCourse({headwindMps: -0}))).toEqual(fastest(sampleCourse({headwindMps: 0})));
	});

	test.each([-40, -45, -70])(
		'from behind, %d m/s: odex agrees, also where air and car are equally fast',
		headwindMps => {
			const run = confirmed(sampleCourse({headwindMps, lengthM: 700}));
			expect(run.timeS).toBeLessThan(fastest(sampleCourse({lengthM: 700})).timeS);
		},
	);
});

describe('grade', () => {
	test.each([-0.2, 0.2])('%d is run as odex does', grade => {
		confirmed(sampleCourse({grade, lengthM: 300}));
	});

	test('up 20 % the car is slower than on the level, and down it is faster', () => {
		const [up, level, down] = [0.2, 0, -0.2].map(grade => fastest(sampleCourse({grade, lengthM: 300})).timeS);
		expect(up).toBeGreaterThan(level!);
		expect(down).toBeLessThan(level!);
	});
});

describe('tires', () => {
	test('without growth the RPM is in proportion to the speed, and odex agrees', () => {
		const run = confirmed(sampleCourse(), sampleVehicle({growth: 0}));
		expect(
			relativeError(run.topRpm / run.topMps, (60 * 1.015 * sampleTrain.overall[run.topGear - 1]!) / 2.2),
		).toBeLessThan(1e-12);
	});

	test('the least growth there is changes nothing that can be seen', () => {
		const [none, least] = [0, Number.MIN_VALUE].map(growth => fastest(sampleCourse(), sampleVehicle({growth})));
		expect(relativeError(least!.timeS, none!.timeS)).toBeLessThan(1e-12);
	});

	test('a growth with which the limit is never reached has no limiter', () => {
		// n = 60·V·R / (C0·(1 + γ·(V/Vref)²)) has its highest value at V = Vref/√γ: 30·R·Vref / (C0·√γ).
		const vehicle = sampleVehicle({growth: 0.5, slip: 0});
		const highest = (30 * 5.9 * 44.704) / (2.2 * Math.sqrt(0.5));
		expect(highest).toBeLessThan(9200);
		const run = confirmed(sampleCourse({lowestGear: 3, highestGear: 3, lengthM: 4000}), vehicle);
		expect(run.limiterM).toBe(0);
		expect(run.topRpm).toBeLessThanOrEqual(highest);
	});
});

describe('gearbox', () => {
	test('of one gear: never a shift', () => {
		const run = confirmed(sampleCourse({highestGear: 1}), sampleVehicle(), trainOf([4.65]));
		expect([run.firstGear, run.lastGear, run.shifts]).toEqual([1, 1, []]);
	});

	test('two identical gears: the time of one, without the shift', () => {
		const one = fastest(sampleCourse({highestGear: 1}), sampleVehicle(), trainOf([4.65]));
		const two = fastest(sampleCourse({highestGear: 2}), sampleVehicle(), trainOf([4.65, 4.65]));
		expect(two.timeS).toBe(one.timeS);
		expect(two.shifts).toEqual([]);
	});

	test('twenty gears a hair apart end, with what one gear can do', () => {
		const train = trainOf(Array.from({length: 20}, (_, step) => 4.65 * (1 - 1e-9 * step)));
		const run = fastest(sampleCourse({highestGear: 20}), sampleVehicle(), train);
		const one = fastest(sampleCourse({highestGear: 1}), sampleVehicle(), trainOf([4.65]));
		expect(relativeError(run.timeS, one.timeS)).toBeLessThan(1e-6);
	});
});

describe('torque curve', () => {
	test('a plateau from end to end is run as odex does', () => {
		confirmed(sampleCourse({lengthM: 900}), sampleVehicle({torqueNm: monotoneCubic([3000, 9500], [600, 600])}));
	});

	test('a plateau between two slopes is run as odex does', () => {
		const torqueNm = monotoneCubic([4000, 5000, 6000, 7000, 8000, 9500], [500, 620, 620, 620, 560, 450]);
		confirmed(sampleCourse({exitMps: 20, lengthM: 900}), sampleVehicle({torqueNm}));
	});

	test('a limit below the first point: the torque of that point is held', () => {
		const vehicle = sampleVehicle({limiterRpm: 3500, topRpm: 3500, shiftCapRpm: 3400});
		const run = confirmed(sampleCourse({exitMps: 10, lengthM: 600}), vehicle);
		expect(run.topRpm).toBeLessThanOrEqual(3500 * (1 + 1e-12));
	});
});
