import {describe, expect, test} from 'vitest';
import {inchM, mileM} from '../../source/drivetrain/constants.ts';
import {gripLimitN, resistanceN, roadForces} from '../../source/drivetrain/forces.ts';
import {monotoneCubic} from '../../source/drivetrain/monotone-cubic.ts';
import {RoadGears} from '../../source/drivetrain/road-gears.ts';
import {speedAtRpmMps} from '../../source/drivetrain/tire.ts';
import {relativeError} from '../close.ts';
import {sampleCourse, sampleVehicle, trainOf} from './sample-car.ts';

const lb = 0.45359237;
const lbf = lb * 9.80665;
const foot = 12 * inchM;
const slug = lbf / foot;
const lbfFt = lbf * foot;
const mph = mileM / 3600;
const flat = (torqueNm: number) => monotoneCubic([0, 20_000], [torqueNm, torqueNm]);
const level = sampleCourse();

/** Mannering's slippage i, V = ω·r·(1 − i), as the slip ratio of SAE J670. */
const slipOf = (i: number) => i / (1 - i);

// Mannering & Washburn, Principles of Highway Engineering and Traffic Analysis, ch. 2: statements published, read in stored homework pages.
describe("Mannering & Washburn's problems", () => {
	const rolling = (feetPerS: number) => 0.01 * (1 + feetPerS / 147);

	test('2.7: 130 mph takes 4469.15 rpm (published answer) and, against the air alone, 134.33 N m (published answer)', () => {
		const rollout = 2 * Math.PI * 12.6 * inchM;
		const speed = 130 * mph;
		expect(relativeError(speedAtRpmMps(4469.15, 2.5, rollout, 0, slipOf(0.03)), speed)).toBeLessThan(2e-6);
		const car = sampleVehicle({
			massKg: 3400 * lb,
			airDensityKgM3: (0.00206 * slug) / foot ** 3,
			dragAreaM2: 0.28 * 19.8 * foot ** 2,
			downforceAreaM2: 0,
			rolling: 0,
			rolloutM: rollout,
			growth: 0,
			slip: slipOf(0.03),
			torqueNm: flat(134.33),
		});
		expect(relativeError(resistanceN(roadForces(car, level), speed) / lbf, 207.592)).toBeLessThan(3e-6);
		const gears = new RoadGears(car, trainOf([2.5], 0.88), level);
		expect(relativeError(gears.motion(1).thrustN(speed), resistanceN(gears.forces, speed))).toBeLessThan(5e-5);
		// Recomputed, with rolling resistance of 78.100 lb: 136.353 lbf ft.
		const rolled = {...car, rolling: rolling((130 * 5280) / 3600), torqueNm: flat(136.353 * lbfFt)};
		const rolledGears = new RoadGears(rolled, trainOf([2.5], 0.88), level);
		expect(relativeError(resistanceN(rolledGears.forces, speed) / lbf, 207.592 + 78.1)).toBeLessThan(3e-6);
		expect(relativeError(rolledGears.motion(1).thrustN(speed), resistanceN(rolledGears.forces, speed))).toBeLessThan(
			5e-6,
		);
	});

	// Recomputed: V 132.634 ft/s, thrust 535.680 lb, air 183.021 lb, rolling 60.873 lb, so 291.786 lb are left for the grade: 9.118 % of the weight.
	test('2.6: the steepest grade held at 3600 rpm', () => {
		const rollout = 2 * Math.PI * 14 * inchM;
		const speed = speedAtRpmMps(3600, 3.2, rollout, 0, slipOf(0.035));
		expect(relativeError(speed / foot, 132.634)).toBeLessThan(4e-6);
		const car = sampleVehicle({
			massKg: 3200 * lb,
			airDensityKgM3: (0.002378 * slug) / foot ** 3,
			dragAreaM2: 0.35 * 25 * foot ** 2,
			downforceAreaM2: 0,
			rolling: rolling(132.634),
			rolloutM: rollout,
			growth: 0,
			slip: slipOf(0.035),
			torqueNm: flat(210 * lbfFt),
		});
		const gears = new RoadGears(car, trainOf([3.2], 0.93), level);
		const thrust = gears.motion(1).thrustN(speed);
		expect(relativeError(thrust / lbf, 535.68)).toBeLessThan(2e-6);
		expect(relativeError(resistanceN(gears.forces, speed) / lbf, 183.021 + 60.873)).toBeLessThan(5e-6);
		// The problem takes the grade for its sine and rolling resistance without its cosine: 0.4 % apart at 9 %.
		const climb = (grade: number) => resistanceN(roadForces(car, sampleCourse({grade})), speed);
		expect(climb(0.09118 / Math.sqrt(1 - 0.09118 ** 2)) / thrust).toBeCloseTo(1, 3);
		expect(climb(0.0945)).toBeGreaterThan(thrust);
		expect(climb(0.088)).toBeLessThan(thrust);
	});

	// Recomputed from published inputs: V 192.423 ft/s, 378.00 lb of thrust, so C_d 0.3347 beside the rolling resistance of 2650 lb.
	test('a top speed gives the drag coefficient', () => {
		const rollout = 2 * Math.PI * 15 * inchM;
		const speed = speedAtRpmMps(4500, 3, rollout, 0, slipOf(0.02));
		expect(relativeError(speed / foot, 192.423)).toBeLessThan(3e-6);
		const car = sampleVehicle({
			massKg: 2650 * lb,
			airDensityKgM3: (0.002378 * slug) / foot ** 3,
			dragAreaM2: 0.3347 * 21.5 * foot ** 2,
			downforceAreaM2: 0,
			rolling: rolling(192.423),
			rolloutM: rollout,
			growth: 0,
			slip: slipOf(0.02),
			torqueNm: flat(175 * lbfFt),
		});
		const gears = new RoadGears(car, trainOf([3], 0.9), level);
		expect(relativeError(gears.motion(1).thrustN(speed) / lbf, 378)).toBeLessThan(1e-5);
		expect(relativeError(resistanceN(gears.forces, speed), gears.motion(1).thrustN(speed))).toBeLessThan(2e-4);
	});

	// Inputs published; recomputed: the most that rear tires hold on snow is 257.48 lb, with 120 in wheelbase, 20 in high, 50 in behind the front axle.
	test('example 2.5: grip with load transfer', () => {
		const car = sampleVehicle({
			massKg: 3000 * lb,
			rearShare: 50 / 120,
			rearDownforceShare: 0,
			downforceAreaM2: 0,
			grip: 0.2,
			cgHeightRatio: 20 / 120,
		});
		// The book lets the rolling resistance, 0.0110 of the weight at 10 mph, unload nothing but the front: −f·h/l of the weight.
		const held = gripLimitN(roadForces(car, level), 10 * mph) / lbf;
		expect(held).toBeCloseTo((0.2 * 3000 * (50 / 120)) / (1 - (0.2 * 20) / 120), 9);
		expect(relativeError(held, 257.48)).toBeLessThan(0.006);
	});
});

// From memory (J. Y. Wong, Theory of Ground Vehicles, 3rd ed., 2001, ch. 3), recomputed: γ_m 1.08937, 3582.88 N, 27.4119 m/s, a 1.285 m/s².
test("Wong's car accelerates at 1.285 m/s²", () => {
	const rollout = 2 * Math.PI * 0.33;
	const wheelKgM2 = 4 * (244.6 / 9.80665) * 0.254 ** 2;
	const car = sampleVehicle({
		massKg: 20_020 / 9.80665,
		dragAreaM2: 0.38 * 1.86,
		downforceAreaM2: 0,
		airDensityKgM3: 1.225,
		rolling: 0.02,
		grip: 10,
		wheelInertiaKgM2: wheelKgM2,
		engineInertiaKgM2: 0.733,
		rolloutM: rollout,
		growth: 0,
		slip: slipOf(0.03),
		torqueNm: flat(325),
	});
	const motion = new RoadGears(car, trainOf([4.28], 0.85), level).motion(1);
	const speed = motion.speedAt(3500);
	expect(relativeError(speed, 27.4119)).toBeLessThan(2e-6);
	expect(relativeError(motion.thrustN(speed), 3582.88)).toBeLessThan(2e-6);
	const netN = motion.thrustN(speed) - resistanceN(roadForces(car, level), speed);
	expect(relativeError(netN / motion.acceleration(speed) / car.massKg, 1.08937)).toBeLessThan(1e-4);
	expect(Math.abs(motion.acceleration(speed) - 1.285)).toBeLessThan(1e-3);
});

describe('forces by hand', () => {
	const car = sampleVehicle({
		massKg: 1000,
		rearShare: 0.6,
		rearDownforceShare: 0.5,
		dragAreaM2: 1,
		downforceAreaM2: 2,
		airDensityKgM3: 1.2,
		rolling: 0.02,
		grip: 1.5,
	});

	test('at 40 m/s on the level: 0.6·1600 air, 0.02·(9806.65 + 1920) rolling', () => {
		const forces = roadForces(car, level);
		expect(resistanceN(forces, 40)).toBeCloseTo(960 + 0.02 * 11_726.65, 9);
		expect(gripLimitN(forces, 40)).toBeCloseTo(1.5 * (0.6 * 9806.65 + 0.5 * 1920), 9);
	});

	test('a 3-4-5 grade puts 0.6 of the weight along the road and 0.8 on it; the load factor acts on that', () => {
		const forces = roadForces(car, sampleCourse({grade: 0.75, load: 2}));
		expect(resistanceN(forces, 0)).toBeCloseTo(0.6 * 9806.65 + 0.02 * 2 * 0.8 * 9806.65, 9);
		expect(gripLimitN(forces, 0)).toBeCloseTo(1.5 * 0.6 * 2 * 0.8 * 9806.65, 9);
	});

	test('wind from behind faster than the car pushes it, and presses it down all the same', () => {
		const forces = roadForces(car, sampleCourse({headwindMps: -50, extraDragN: 100}));
		expect(resistanceN(forces, 40)).toBeCloseTo(100 - 0.6 * 100 + 0.02 * (9806.65 + 1.2 * 100), 9);
		expect(gripLimitN(forces, 40)).toBeCloseTo(1.5 * (0.6 * 9806.65 + 0.5 * 1.2 * 100), 9);
	});
});
