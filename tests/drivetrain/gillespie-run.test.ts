import {describe, expect, test} from 'vitest';
import {inchM, mileM, mphMps} from '../../source/drivetrain/constants.ts';
import type {GearMotion} from '../../source/drivetrain/gear-motion.ts';
import {monotoneCubic} from '../../source/drivetrain/monotone-cubic.ts';
import {RoadGears} from '../../source/drivetrain/road-gears.ts';
import {runStraight, runStraightPlainly} from '../../source/drivetrain/run-straight.ts';
import {shiftSpeedMps} from '../../source/drivetrain/shift-point.ts';
import type {SequenceRun, Vehicle} from '../../source/drivetrain/straight.ts';
import {travel} from '../../source/drivetrain/travel.ts';
import {relativeError} from '../close.ts';
import {sampleCourse, sampleVehicle} from './sample-car.ts';

// Published: T. D. Gillespie, Fundamentals of Vehicle Dynamics (SAE, 1992), example problem 1, p. 32: inertias, gears,
// efficiencies, torque curve and 801 rev/mile. The weight of 2500 lb is from a university course file that cites the page.
const lb = 0.45359237;
const lbf = lb * 9.80665;
const lbfFt = lbf * 12 * inchM;
const inLbS2 = lbf * inchM;
const engineInertia = 0.8;
const gearboxInertia = [1.3, 0.9, 0.7, 0.5, 0.3];
const overall = [4.28, 2.79, 1.83, 1.36, 1].map(ratio => ratio * 2.92);
const efficiency = [0.966, 0.967, 0.972, 0.973, 0.97].map(value => value * 0.99);
const rpm = [800, 1200, 1600, 2000, 2400, 2800, 3200, 3600, 4000, 4400, 4800, 5200];
const torque = [120, 132, 145, 160, 175, 181, 190, 198, 200, 201, 198, 180];
const rolloutM = mileM / 801;
const unbounded = Number.POSITIVE_INFINITY;

/** As the course file extends it: straight from 96 lbf ft at rest to 120 at 800 rpm, and on beyond 5200. */
const extendedRpm = [0, ...rpm, 6500];
const extendedTorque = [96, ...torque, 121.5].map(value => value * lbfFt);

/** A curve that is straight between the points: a cubic through three points of a straight line is that line. */
function straightBetween(x: readonly number[], y: readonly number[]) {
	const curve = monotoneCubic(x, y);
	const coefficients = curve.coefficients.map((value, i) => {
		const cell = Math.floor(i / 4);
		if (i % 4 === 0) return value;
		return i % 4 === 1 ? (y[cell + 1]! - y[cell]!) / (x[cell + 1]! - x[cell]!) : 0;
	});
	return {...curve, coefficients};
}

/** Engine, gearbox, shaft and both driven wheels of one gear, as inertias of this program's two kinds. */
const vehicle = (gear: number, changes: Partial<Vehicle> = {}) =>
	sampleVehicle({
		massKg: 2500 * lb,
		dragAreaM2: 0,
		downforceAreaM2: 0,
		rolling: 0,
		grip: 100,
		wheelInertiaKgM2: (2 * 11 + 1.2 * 2.92 ** 2) * inLbS2,
		engineInertiaKgM2: (engineInertia + gearboxInertia[gear - 1]!) * inLbS2,
		rolloutM,
		growth: 0,
		slip: 0,
		torqueNm: straightBetween(extendedRpm, extendedTorque),
		limiterRpm: 6500,
		topRpm: 5200,
		shiftCapRpm: 5200,
		shiftTimeS: 0,
		...changes,
	});

const train = {overall, efficiency};
const gearsOf = (car: Vehicle) => new RoadGears(car, train, sampleCourse());

describe('gear by gear', () => {
	// Recomputed with 801 rev/mi exact. The book's 2290 and 537 lb are from memory; its inertias, 0.6 % lower, are not asserted.
	test.each([
		[1, 2289.88, 26.372, 877.5],
		[2, 1494.25, 40.456, 353.4],
		[3, 985.17, 61.679, 182.9],
		[4, 732.9, 82.995, 128.5],
		[5, 537.24, 112.873, 101.4],
	])('gear %i gives at most %f lb, at %f mph, and feels %f lb heavier', (gear, pounds, mph, effectivePounds) => {
		const motion = gearsOf(vehicle(gear)).motion(gear);
		const speed = motion.speedAt(4400);
		expect(relativeError(speed / mphMps, mph)).toBeLessThan(1e-4);
		expect(relativeError(motion.thrustN(speed) / lbf, pounds)).toBeLessThan(1e-4);
		for (const other of rpm) expect(motion.thrustN(motion.speedAt(other))).toBeLessThanOrEqual(motion.thrustN(speed));
		// Without resistance and grip the thrust over the acceleration is the equivalent mass; recomputed to four digits.
		const addedKg = motion.thrustN(speed) / motion.acceleration(speed) - 2500 * lb;
		expect(relativeError(addedKg / lb, effectivePounds)).toBeLessThan(5e-4);
	});

	test("agrees with the book's rounded thrusts", () => {
		const thrust = (gear: number) => {
			const motion = gearsOf(vehicle(gear)).motion(gear);
			return motion.thrustN(motion.speedAt(4400)) / lbf;
		};
		expect(relativeError(thrust(1), 2290)).toBeLessThan(1e-3);
		expect(relativeError(thrust(5), 537)).toBeLessThan(1e-3);
	});
});

/** Without inertias acceleration is in proportion to thrust, so equal acceleration is equal thrust. */
const weightless = {wheelInertiaKgM2: 0, engineInertiaKgM2: 0, undrivenInertiaKgM2: 0};

describe('shift points', () => {
	// Recomputed: thrust in each gear exceeds the next one's at every speed up to 5200 rpm.
	test.each([
		[1, 2050.6, 1440.7, 3389.7],
		[2, 1338.1, 951.9, 3410.8],
		[3, 882.2, 726.8, 3864.5],
		[4, 656.3, 532.2, 3823.5],
	])('from gear %i at the last point: %f lb before, %f lb and %f rpm after', (gear, before, after, rpmAfter) => {
		const gears = gearsOf(vehicle(gear, {...weightless, limiterRpm: 5200}));
		const shift = gears.shift(gear);
		expect(relativeError(shift.rpm, 5200)).toBeLessThan(1e-12);
		expect(Math.abs(gears.motion(gear).thrustN(shift.speedMps) / lbf - before)).toBeLessThan(0.051);
		expect(Math.abs(gears.motion(gear + 1).thrustN(shift.speedMps) / lbf - after)).toBeLessThan(0.051);
		expect(Math.abs(shift.rpmAfter - rpmAfter)).toBeLessThan(0.051);
	});

	// Recomputed: the curve extended in straight lines has crossings of equal thrust.
	test.each([
		[1, 6296.028, 4104.186, 37.73625, 6622.2996],
		[2, 6265.732, 4109.781, 57.61075, 4366.4233],
		[3, 5878.391, 4368.64, 82.40305, 3258.827],
		[4, 5927.504, 4358.459, 111.80696, 2388.5056],
	])('from gear %i with the curve extended: %f to %f rpm', (gear, from, to, mph, newtons) => {
		const [here, next] = [gear, gear + 1].map(k => gearsOf(vehicle(k, weightless)).motion(k)) as [
			GearMotion,
			GearMotion,
		];
		const speed = shiftSpeedMps(here, next, here.speedAt(6500));
		expect(Math.abs(here.rpmAt(speed) - from)).toBeLessThan(6e-4);
		expect(Math.abs(next.rpmAt(speed) - to)).toBeLessThan(6e-4);
		expect(Math.abs(speed / mphMps - mph)).toBeLessThan(6e-6);
		expect(Math.abs(here.thrustN(speed) - newtons)).toBeLessThan(6e-5);
		expect(relativeError(here.thrustN(speed), next.thrustN(speed))).toBeLessThan(1e-12);
	});
});

describe('the full run from rest', () => {
	const quarterMileM = mileM / 4;

	/** Gear after gear, each with the inertia of its own gear, shifting in no time at 5200 rpm. */
	function fullRun(changes: Partial<Vehicle>) {
		const shifts: {timeS: number; distanceM: number}[] = [];
		let [speed, distance, time] = [0, 0, 0];
		let hundredS = 0;
		for (let gear = 1; ; gear++) {
			const motion = gearsOf(vehicle(gear, changes)).motion(gear);
			const toMps = gear < 5 ? motion.speedAt(5200) : unbounded;
			const upTo = (mps: number, distanceM: number) =>
				travel(motion, speed, {distanceM, toMps: mps, braking: undefined});
			if (speed < 100 / 3.6 && toMps >= 100 / 3.6) hundredS = time + upTo(100 / 3.6, 1e6).timeS;
			const run = upTo(toMps, quarterMileM - distance);
			[speed, distance, time] = [run.speedMps, distance + run.distanceM, time + run.timeS];
			if (run.why === 'end') return {speed, time, hundredS, shifts};
			shifts.push({timeS: time, distanceM: distance});
		}
	}

	// Recomputed: scipy DOP853, rtol 1e-11, 2500 lb, straight between the points, shifts at 5200 rpm in no time, no grip limit.
	const references = [
		{
			name: 'without resistance',
			car: {},
			hundredS: 5.958025,
			time: 13.987035,
			speed: 48.746359,
			times: [2.682366, 4.162674, 7.34328, 11.556181],
			distances: [16.318905, 42.496868, 128.463731, 289.801944],
		},
		{
			name: 'with drag and rolling resistance',
			car: {airDensityKgM3: 1.225, dragAreaM2: 0.6, rolling: 0.015},
			hundredS: 6.269625,
			time: 14.472369,
			speed: 45.334909,
			times: [2.749208, 4.297165, 7.843185, 13.281432],
			distances: [16.689756, 44.081886, 140.146759, 349.226487],
		},
	];

	test.each(references)('$name is the reference run', ({car, hundredS, time, speed, times, distances}) => {
		const run = fullRun(car);
		expect(Math.abs(run.hundredS - hundredS)).toBeLessThan(1e-4);
		expect(Math.abs(run.time - time)).toBeLessThan(1e-4);
		expect(Math.abs(run.speed - speed)).toBeLessThan(1e-3);
		expect(run.shifts.length).toBe(4);
		run.shifts.forEach((shift, i) => {
			expect(Math.abs(shift.timeS - times[i]!)).toBeLessThan(1e-4);
			expect(Math.abs(shift.distanceM - distances[i]!)).toBeLessThan(1e-3);
		});
	});

	test.each([0, 1])('the whole solver shifts where the reference does (%i)', i => {
		// One inertia for every gear here, so times are near the reference and not on it: the masses differ by up to 2 %.
		const {car, time} = references[i]!;
		const course = sampleCourse({exitMps: 0, lengthM: quarterMileM});
		const run = runStraightPlainly(vehicle(2, {...car, limiterRpm: 5200}), train, course);
		expect(run.kind).toBe('ran');
		const {fastest} = run as {fastest: SequenceRun};
		expect([fastest.firstGear, fastest.lastGear]).toEqual([1, 5]);
		for (const shift of fastest.shifts) expect(relativeError(shift.rpm, 5200)).toBeLessThan(1e-12);
		expect(relativeError(fastest.timeS, time)).toBeLessThan(0.02);
		const fast = runStraight(new RoadGears(vehicle(2, {...car, limiterRpm: 5200}), train, course), course);
		expect(relativeError((fast as {fastest: SequenceRun}).fastest.timeS, fastest.timeS)).toBeLessThan(1e-9);
	});
});
