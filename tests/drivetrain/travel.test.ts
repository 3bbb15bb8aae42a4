import {describe, expect, test} from 'vitest';
import {mileM, mphMps} from '../../source/drivetrain/constants.ts';
import {integrate, type Motion} from '../../source/drivetrain/quadrature.ts';
import {brakingDistanceM, type Goal, travel} from '../../source/drivetrain/travel.ts';
import {relativeError} from '../close.ts';

// Recomputed closed forms for a mass m, drag k·V² and one simple force; each is worked out here in full and the printed
// digits (also checked with scipy) stand beside it.
const m = 1500;
const k = 0.5 * 1.225 * 0.4 * 2.2;
const quarterMileM = mileM / 4;
const noBreaks: readonly number[] = [];
const motion = (acceleration: (speedMps: number) => number, breaks = noBreaks): Motion => ({acceleration, breaks});
const over = (distanceM: number, toMps = 1000): Goal => ({distanceM, toMps, braking: undefined});
const upTo = (toMps: number): Goal => over(1e9, toMps);

const expectClose = (actual: number, exact: number, printed = exact) => {
	expect(relativeError(actual, exact)).toBeLessThan(1e-9);
	expect(relativeError(actual, printed)).toBeLessThan(1e-9);
};

describe('constant thrust against drag', () => {
	const thrust = 4000;
	const car = motion(v => (thrust - k * v * v) / m);
	const vt = Math.sqrt(thrust / k);
	const tau = m / Math.sqrt(thrust * k);
	const L = m / (2 * k);
	const speedAt = (v0: number, x: number) => Math.sqrt(vt ** 2 - (vt ** 2 - v0 ** 2) * Math.exp(-x / L));
	const timeAt = (v0: number, v: number) => tau * (Math.atanh(v / vt) - Math.atanh(v0 / vt));

	test.each([
		[5, 13.227874611, 33.20109095],
		[10, 25.846341448, 131.25682673],
		[20, 47.423718501, 502.38493616],
		[40, 72.788571282, 1741.44163326],
	])('after %f s from rest it is at %f m/s and %f m', (t, v, x) => {
		const exactV = vt * Math.tanh(t / tau);
		const run = travel(car, 0, upTo(exactV));
		expect(run.why).toBe('speed');
		expectClose(run.timeS, t);
		expectClose(run.distanceM, 2 * L * Math.log(Math.cosh(t / tau)), x);
		expect(relativeError(exactV, v)).toBeLessThan(1e-9);
	});

	test.each([
		[0, 100, 22.685234241, 8.712211323],
		[0, 402.336, 43.167426304, 17.792441009],
		[0, 1000, 61.677135774, 29.051884048],
		[30, 200, 42.107721293, 5.525057528],
		[30, 500, 53.558043258, 11.770078274],
	])('from %f m/s over %f m it reaches %f m/s in %f s', (v0, x, v, t) => {
		const run = travel(car, v0, over(x));
		expect(run.why).toBe('end');
		expectClose(run.speedMps, speedAt(v0, x), v);
		expectClose(run.timeS, timeAt(v0, speedAt(v0, x)), t);
		expectClose(run.distanceM, x);
	});

	test('from above its top speed it falls towards it by the same law', () => {
		const run = travel(car, 120, over(800));
		const v = Math.sqrt(vt ** 2 + (120 ** 2 - vt ** 2) * Math.exp(-800 / L));
		expectClose(run.speedMps, v);
		expectClose(run.timeS, tau * (Math.atanh(vt / v) - Math.atanh(vt / 120)));
	});

	// 100 km are 72 of the lengths L, so the speed is vt in every digit; the time is then the distance over vt plus 2L·ln 2/vt.
	test('over 100 km it settles at its top speed and the time has all its digits', () => {
		const run = travel(car, 0, over(100_000));
		expectClose(run.speedMps, vt, 86.14609845);
		expectClose(run.distanceM, 100_000);
		expectClose(run.timeS, (100_000 + 2 * L * Math.LN2) / vt);
	});
});

describe('constant power against drag', () => {
	const power = 300_000;
	const car = motion(v => (power / v - k * v * v) / m);
	const a = Math.cbrt(power / k);
	const primitive = (v: number) =>
		(-Math.log(a - v) +
			Math.log(v * v + a * v + a * a) / 2 -
			Math.sqrt(3) * Math.atan((2 * v + a) / (a * Math.sqrt(3)))) /
		(3 * a);
	const timeTo = (v0: number, v: number) => (m / k) * (primitive(v) - primitive(v0));
	const distanceTo = (v0: number, v: number) => (-m / (3 * k)) * Math.log((power - k * v ** 3) / (power - k * v0 ** 3));
	const speedAt = (v0: number, x: number) =>
		Math.cbrt((power - (power - k * v0 ** 3) * Math.exp((-3 * k * x) / m)) / k);

	// From rest the acceleration is infinite; the printed figures are from rest, so the way from 20 m/s is their difference.
	test.each([
		[40, 113.314070663, 4.198416691],
		[60, 455.615699414, 10.874735488],
		[80, 2341.74044441, 36.515425569],
	])('from 20 to %f m/s takes what the closed form says', (v, xFromRest, tFromRest) => {
		const run = travel(car, 20, upTo(v));
		expectClose(run.distanceM, distanceTo(20, v), xFromRest - 13.430083759);
		expectClose(run.timeS, timeTo(20, v), tFromRest - 1.005801528);
	});

	test.each([
		[400, 61.844451332, 7.623180375],
		[800, 70.381731128, 13.637341572],
	])('from 40 m/s over %f m it reaches %f m/s in %f s', (x, v, t) => {
		const run = travel(car, 40, over(x));
		expectClose(run.speedMps, speedAt(40, x), v);
		expectClose(run.timeS, timeTo(40, speedAt(40, x)), t);
	});

	test.each([
		[402.336, 58.074574194, 9.972480872],
		[1000, 71.608579186, 19.056575537],
		[2000, 78.951988351, 32.21730312],
	])('the rest of %f m from rest, from 20 m/s on, ends at %f m/s', (x, v, tFromRest) => {
		const run = travel(car, 20, over(x - distanceTo(0, 20)));
		expectClose(run.speedMps, speedAt(0, x), v);
		expectClose(run.timeS + timeTo(0, 20), timeTo(0, speedAt(0, x)), tFromRest);
	});

	// P = k·V³ + 250·V by a root finder: 80.378667577 m/s, 179.80196 mph.
	test('with rolling resistance its top speed is where power is used up', () => {
		const rolling = motion(v => (power / v - k * v * v - 250) / m);
		const {speedMps} = travel(rolling, 60, over(200_000));
		expectClose(speedMps, 80.378667577);
		expect(Math.abs(speedMps / mphMps - 179.80196)).toBeLessThan(5e-6);
		expect(relativeError(k * speedMps ** 3 + 250 * speedMps, power)).toBeLessThan(1e-12);
		expectClose(travel(rolling, 100, over(200_000)).speedMps, 80.378667577);
	});
});

describe('coasting down with rolling resistance and drag', () => {
	const rolling = 250;
	const car = motion(v => -(rolling + k * v * v) / m);
	const vr = Math.sqrt(rolling / k);
	const speedAfter = (t: number) => vr * Math.tan(Math.atan(60 / vr) - (t * Math.sqrt(rolling * k)) / m);

	test('comes to rest where and when the closed form says', () => {
		const run = travel(car, 60, over(5000));
		expect(run.why).toBe('stopped');
		expect(run.speedMps).toBe(0);
		expectClose(run.timeS, (m / Math.sqrt(rolling * k)) * Math.atan(60 / vr), 158.445625468);
		expectClose(run.distanceM, (m / (2 * k)) * Math.log(1 + (60 / vr) ** 2), 3020.00724027);
	});

	test.each([
		[5, 53.406188425],
		[10, 47.967508489],
		[20, 39.479137427],
	])('after %f s is at %f m/s', (t, v) => {
		const exact = speedAfter(t);
		expect(relativeError(exact, v)).toBeLessThan(1e-9);
		const {distanceM} = integrate(car, 60, exact);
		const run = travel(car, 60, over(distanceM));
		expectClose(run.speedMps, exact);
		expectClose(run.timeS, t);
	});
});

describe('a cap on thrust, then constant power, without drag', () => {
	const car = motion(v => Math.min(6000, 300_000 / v) / m, [50]);

	test('turns the corner at 50 m/s after 12.5 s and 312.5 m', () => {
		const run = travel(car, 0, upTo(50));
		expectClose(run.timeS, 12.5);
		expectClose(run.distanceM, 312.5);
	});

	test('does the quarter mile in 14.187483310 s at 56.347079109 m/s', () => {
		const run = travel(car, 0, over(quarterMileM));
		const v = Math.cbrt(50 ** 3 + (3 * 300_000 * (quarterMileM - 312.5)) / m);
		expectClose(run.speedMps, v, 56.347079109);
		expectClose(run.timeS, 12.5 + (m * (v * v - 2500)) / 600_000, 14.18748331);
	});

	test('a kink that no one told of is found, to 1e-6', () => {
		const untold = travel(motion(car.acceleration), 0, over(quarterMileM));
		expect(relativeError(untold.timeS, 14.18748331)).toBeLessThan(1e-6);
	});
});

// Recomputed (the closed form of G. T. Fox, Am. J. Phys. 41, 1973): constant power from rest, no losses: t = (9mX²/8P)^(1/3),
// V = (3PX/m)^(1/3), so t·V = 1.5·X: 1350 mph s over a quarter mile, whatever the car.
describe('constant power without losses', () => {
	const hp = 550 * 0.3048 * 0.45359237 * 9.80665;
	const lb = 0.45359237;
	const car = (pounds: number, horsepower: number) => {
		const perMass = (horsepower * hp) / (pounds * lb);
		// A hundredth of a second from rest in closed form: at rest the acceleration is infinite.
		const v0 = Math.sqrt(2 * perMass * 0.01);
		const x0 = v0 ** 3 / (3 * perMass);
		const rest = (goal: (metersLess: number) => Goal) => {
			const run = travel(
				motion(v => perMass / v),
				v0,
				goal(x0),
			);
			return {...run, timeS: run.timeS + 0.01};
		};
		return {over: (x: number) => rest(less => over(x - less)), upTo: (v: number) => rest(() => upTo(v))};
	};

	test('3400 lb and 350 hp do the quarter mile in 10.24741 s at 131.7406 mph, and 60 mph in 2.12558 s', () => {
		const run = car(3400, 350).over(quarterMileM);
		expect(Math.abs(run.timeS - 10.24741)).toBeLessThan(5e-6);
		expect(Math.abs(run.speedMps / mphMps - 131.7406)).toBeLessThan(5e-5);
		expect(Math.abs(car(3400, 350).upTo(60 * mphMps).timeS - 2.12558)).toBeLessThan(5e-6);
	});

	test.each([
		[3400, 350],
		[2000, 600],
		[4500, 90],
	])('time × speed over the quarter mile is 1350 mph s (%f lb, %f hp)', (pounds, horsepower) => {
		const run = car(pounds, horsepower).over(quarterMileM);
		expectClose((run.timeS * run.speedMps) / mphMps, 1350);
	});

	test.each([
		['the quarter mile', 4, 281.0971, 4.80261],
		['the eighth mile', 8, 223.10696, 3.0254548],
		['1000 ft', 5.28, 256.25074, 3.9911193],
	])('the coefficients of %s are the printed ones', (_, part, trap, time) => {
		const run = car(3400, 350).over(mileM / part);
		expect(relativeError(run.speedMps / mphMps / Math.cbrt(350 / 3400), trap)).toBeLessThan(3e-7);
		expect(relativeError(run.timeS / Math.cbrt(3400 / 350), time)).toBeLessThan(3e-7);
	});
});

describe('where speeds and goals meet', () => {
	const even = motion(() => 2);

	test('braking starts where both parabolas cross', () => {
		// V² = 20² + 2·2·s and V² = 25² + 2·8·(300 − s): s = 251.25 m, V² = 1405.
		const braking = {entryMps: 25, brakingMps2: 8};
		const run = travel(even, 20, {distanceM: 300, toMps: 1000, braking});
		expectClose(run.distanceM, 251.25);
		expectClose(run.speedMps, Math.sqrt(1405));
		expectClose(brakingDistanceM(run.speedMps, braking), 48.75);
		expect(brakingDistanceM(25, braking)).toBe(0);
		expect(brakingDistanceM(24, braking)).toBe(0);
		expect(brakingDistanceM(60, undefined)).toBe(0);
	});

	test('an entry speed that is not reached changes nothing', () => {
		const goal = over(300);
		expect(travel(even, 20, {...goal, braking: {entryMps: 60, brakingMps2: 8}})).toEqual(travel(even, 20, goal));
	});

	test("at the goal's speed already, or with no way left, it goes nowhere", () => {
		expect(travel(even, 30, over(100, 30))).toEqual({speedMps: 30, distanceM: 0, timeS: 0, why: 'speed'});
		expect(travel(even, 30, over(0))).toEqual({speedMps: 30, distanceM: 0, timeS: 0, why: 'end'});
	});

	test('with no acceleration at all it keeps its speed; at no speed it stands', () => {
		const none = motion(() => 0, [0, 10]);
		expect(travel(none, 20, over(100))).toEqual({speedMps: 20, distanceM: 100, timeS: 5, why: 'end'});
		expect(travel(none, 0, over(100)).why).toBe('stopped');
	});

	// A kink or a goal the last digit above the start is no speed at which the car stays.
	test.each([1, 2, 100])('a kink or a goal %i roundings above the start is passed', roundings => {
		const near = 20 * (1 + roundings * Number.EPSILON);
		expectClose(
			travel(
				motion(() => 2, [0, near, 50]),
				20,
				over(300),
			).speedMps,
			40,
		);
		expect(travel(even, 20, over(300, near)).why).toBe('speed');
	});

	// The lower of the two zeros of a = 0.01 − 0.3·x + x², x = V − 30.
	test('a narrow dip below zero on the way stops the gain in speed', () => {
		const dip = motion(v => 0.01 - 0.3 * (v - 30) + (v - 30) ** 2, [0, 30, 40]);
		const run = travel(dip, 30, over(5000));
		expectClose(run.speedMps, 30 + (0.3 - Math.sqrt(0.09 - 0.04)) / 2);
	});
});
