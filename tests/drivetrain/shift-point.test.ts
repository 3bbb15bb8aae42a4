import fc from 'fast-check';
import {describe, expect, test} from 'vitest';
import {monotoneCubic} from '../../source/drivetrain/monotone-cubic.ts';
import {RoadGears} from '../../source/drivetrain/road-gears.ts';
import {shiftSpeedMps} from '../../source/drivetrain/shift-point.ts';
import {travel} from '../../source/drivetrain/travel.ts';
import {relativeError} from '../close.ts';
import {runs} from '../runs.ts';
import {anyStraight, anyVehicle, within} from './any-car.ts';
import {sampleCourse, sampleVehicle, trainOf} from './sample-car.ts';

const level = sampleCourse();

/** No inertia that a gear changes and nothing against the car: equal acceleration is equal thrust. */
const bare = sampleVehicle({
	dragAreaM2: 0,
	downforceAreaM2: 0,
	rolling: 0,
	grip: 100,
	wheelInertiaKgM2: 0,
	undrivenInertiaKgM2: 0,
	engineInertiaKgM2: 0,
	growth: 0,
	slip: 0,
	limiterRpm: 9000,
});

describe('the shift point', () => {
	// By hand: torque 100 − n/100 N m at n and R 4 against R 2: 4·(100 − n/100) = 2·(100 − n/200), so n = 20000/3.
	test('of straight falling torque is where both thrusts are the same', () => {
		const falling = monotoneCubic([1000, 5000, 9000], [90, 50, 10]);
		const gears = new RoadGears({...bare, torqueNm: falling, shiftCapRpm: 9000}, trainOf([4, 2]), level);
		expect(relativeError(gears.shift(1).rpm, 20_000 / 3)).toBeLessThan(1e-12);
	});

	test('is the cap where the lower gear is the better one up to it', () => {
		const flat = monotoneCubic([1000, 9000], [500, 500]);
		const gears = new RoadGears({...bare, torqueNm: flat, shiftCapRpm: 8321}, trainOf([4, 3.9]), level);
		expect(relativeError(gears.shift(1).rpm, 8321)).toBeLessThan(1e-12);
	});

	test('is the cap for two like gears', () => {
		const gears = new RoadGears({...bare, shiftCapRpm: 8321}, trainOf([4, 4]), level);
		expect(relativeError(gears.shift(1).rpm, 8321)).toBeLessThan(1e-12);
	});

	test('is 0 where the lower gear is nowhere better: its engine weighs more than it pushes', () => {
		const heavy = {...bare, massKg: 100, engineInertiaKgM2: 40};
		expect(new RoadGears(heavy, trainOf([8, 4]), level).shift(1).speedMps).toBe(0);
	});

	test('is 0 where grip holds both gears below the speed from which the upper is better', () => {
		// Torque falls to nothing soon after a peak that both gears have more than grip for.
		const peaky = monotoneCubic([0, 8000, 8400, 9000], [900, 900, 5, 1]);
		const held = {...bare, torqueNm: peaky, grip: 0.3, shiftCapRpm: 9000};
		expect(new RoadGears(held, trainOf([6, 5.5]), level).shift(1).speedMps).toBe(0);
	});

	test('is the highest of several: beyond a dip of torque the lower gear is the better one again', () => {
		const dip = monotoneCubic([2000, 4000, 4500, 5000, 7000, 9000], [500, 500, 200, 500, 500, 100]);
		const gears = new RoadGears({...bare, torqueNm: dip, shiftCapRpm: 9000}, trainOf([4, 2.9]), level);
		const [here, next] = [gears.motion(1), gears.motion(2)];
		const inDip = here.speedAt(4500);
		expect(next.acceleration(inDip)).toBeGreaterThan(here.acceleration(inDip));
		expect(gears.shift(1).rpm).toBeGreaterThan(7000);
		// The cap in the dip is the highest that is left, although the crossing lies above it.
		expect(shiftSpeedMps(here, next, inDip)).toBe(inDip);
	});
});

const pairs = fc
	.tuple(anyVehicle, within(2, 12), within(0.5, 1), anyStraight)
	.map(([vehicle, overall, step, {course}]) => new RoadGears(vehicle, trainOf([overall, overall * step]), course));

test('for any two gears it is an equal acceleration with the better gear on either side, the cap, or 0', () => {
	fc.assert(
		fc.property(pairs, gears => {
			const [here, next] = [gears.motion(1), gears.motion(2)];
			const capMps = Math.min(here.speedAt(gears.vehicle.shiftCapRpm), here.limiterMps);
			const {speedMps} = gears.shift(1);
			const advantage = (v: number) => next.acceleration(v) - here.acceleration(v);
			const noise = 1e-9 * (1 + Math.abs(here.acceleration(capMps)));
			const scan = Array.from({length: 400}, (_, i) => (capMps * (i + 0.5)) / 400);
			// No speed between the shift and the cap at which the lower gear is better by anything that a driver could feel: signs are
			// looked for at the kinks and halfway between them, so a dip that is narrower than that may be missed.
			if (speedMps < capMps)
				for (const v of scan) if (v > speedMps * (1 + 1e-9)) expect(advantage(v)).toBeGreaterThanOrEqual(-0.05);
			if (speedMps === 0 || speedMps === capMps) return;
			expect(Math.abs(advantage(speedMps))).toBeLessThan(noise);
		}),
		{numRuns: runs(200, 5000)},
	);
});

// With no time lost a shift is best where both gears accelerate the same. Where the sign changes again nearby another shift
// may be as good: the highest is planned, and those are left out.
test('with no shift time, a shift 1 % earlier or later is not faster', () => {
	fc.assert(
		fc.property(pairs, within(0.02, 0.9), within(0.99, 1.01), (gears, startShare, moved) => {
			const [here, next] = [gears.motion(1), gears.motion(2)];
			const capMps = Math.min(here.speedAt(gears.vehicle.shiftCapRpm), here.limiterMps);
			const planned = gears.shift(1).speedMps;
			const fromMps = startShare * planned;
			const movedMps = Math.max(fromMps, Math.min(capMps, moved * planned));
			const between = Array.from({length: 20}, (_, i) => planned + ((i + 0.5) / 20) * (movedMps - planned));
			const lowerBetter = (v: number) => here.acceleration(v) >= next.acceleration(v);
			if (!between.every(v => lowerBetter(v) === movedMps < planned)) return;
			const toMps = Math.min(next.limiterMps, 1.2 * capMps);
			const way = {distanceM: 5000, braking: undefined};
			const timeTo = (shiftMps: number) => {
				const first = travel(here, fromMps, {...way, toMps: shiftMps});
				if (first.why !== 'speed') return undefined;
				const second = travel(next, shiftMps, {...way, distanceM: way.distanceM - first.distanceM, toMps});
				return second.why === 'stopped'
					? undefined
					: first.timeS + second.timeS + (way.distanceM - first.distanceM - second.distanceM) / second.speedMps;
			};
			const [best, other] = [timeTo(planned), timeTo(movedMps)];
			if (best === undefined || other === undefined) return;
			expect(best).toBeLessThanOrEqual(other * (1 + 1e-9));
		}),
		{numRuns: runs(200, 5000)},
	);
});
