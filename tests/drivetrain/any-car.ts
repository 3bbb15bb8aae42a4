/** Cars, trains and straights of every kind that can be built, and some that no one would build. */
import fc from 'fast-check';
import {monotoneCubic} from '../../source/drivetrain/monotone-cubic.ts';
import type {Course, GearTrain, Vehicle} from '../../source/drivetrain/straight.ts';
import {sampleCourse, sampleVehicle, trainOf} from './sample-car.ts';

export const within = (min: number, max: number) => fc.double({min, max, noNaN: true});
/** A special value one time in three. */
const often = <T>(special: T, arbitrary: fc.Arbitrary<T>) =>
	fc.oneof({weight: 1, arbitrary: fc.constant(special)}, {weight: 2, arbitrary});

/** Three to nine points; a step of 0 N m makes a plateau. */
const anyCurve = fc
	.tuple(
		fc.integer({min: 1500, max: 5000}),
		fc.integer({min: 150, max: 700}),
		fc.array(fc.tuple(fc.integer({min: 200, max: 1500}), often(0, fc.integer({min: -120, max: 120}))), {
			minLength: 2,
			maxLength: 8,
		}),
	)
	.map(([rpm, torqueNm, steps]) => {
		const x = [rpm];
		const y = [torqueNm];
		for (const [rpmStep, torqueStep] of steps) {
			x.push(x.at(-1)! + rpmStep);
			y.push(Math.max(50, y.at(-1)! + torqueStep));
		}
		return monotoneCubic(x, y);
	});

export const anyVehicle: fc.Arbitrary<Vehicle> = fc
	.record({
		massKg: within(600, 2200),
		rearShare: within(0.35, 0.7),
		rearDownforceShare: within(0.3, 0.7),
		dragAreaM2: within(0.3, 2),
		downforceAreaM2: often(0, within(0, 4)),
		rolling: within(0.005, 0.04),
		grip: within(0.25, 1.8),
		cgHeightRatio: often(0, within(0, 0.25)),
		wheelInertiaKgM2: within(0, 8),
		undrivenShare: within(0, 1),
		engineInertiaKgM2: within(0, 0.4),
		airDensityKgM3: within(0.8, 1.4),
		rolloutM: within(1.6, 2.4),
		growth: often(0, within(0, 0.05)),
		slip: often(0, within(0, 0.1)),
		torqueNm: anyCurve,
		limiterShare: within(0.8, 1.1),
		limitShare: often(1, within(0.9, 1)),
		shiftRpm: fc.constantFrom(0, 100, 300),
		shiftTimeS: often(0, within(0, 0.4)),
		reactionTimeS: within(0, 0.6),
		sameTimeS: often(0, within(0, 0.1)),
	})
	.map(({undrivenShare, limiterShare, limitShare, shiftRpm, ...vehicle}) => {
		const limiterRpm = Math.round(limiterShare * vehicle.torqueNm.x.at(-1)!);
		const topRpm = Math.round(limitShare * limiterRpm);
		return sampleVehicle({
			...vehicle,
			undrivenInertiaKgM2: undrivenShare * vehicle.wheelInertiaKgM2,
			limiterRpm,
			topRpm,
			shiftCapRpm: topRpm - shiftRpm,
		});
	});

/** One to six gears, none above the one before it; two may be the same. */
export const anyTrain: fc.Arbitrary<GearTrain> = fc
	.tuple(within(4, 14), fc.array(often(1, within(0.6, 0.98)), {maxLength: 5}), within(0.8, 1))
	.map(([first, steps, efficiency]) => {
		const overall = [first];
		for (const step of steps) overall.push(overall.at(-1)! * step);
		return trainOf(overall, efficiency);
	});

/** From a crawl to over the limit, from 1 m to 20 km; may ask for an entry speed, narrow the gears and name the first. */
export const anyCourse = (train: GearTrain): fc.Arbitrary<Course> => {
	const last = train.overall.length;
	return fc
		.record({
			lengthM: fc.oneof(within(1, 50), within(50, 1500), within(1500, 20_000)),
			exitMps: fc.oneof(
				{weight: 2, arbitrary: within(1, 15)},
				{weight: 4, arbitrary: within(15, 60)},
				{weight: 1, arbitrary: within(60, 110)},
			),
			braking: often(undefined, fc.tuple(within(5, 80), within(2, 15))),
			grade: often(0, within(-0.2, 0.2)),
			headwindMps: often(0, within(-60, 30)),
			load: often(1, within(0.9, 2)),
			extraDragN: often(0, within(0, 1500)),
			gears: fc.tuple(fc.integer({min: 1, max: last}), fc.integer({min: 1, max: last})),
			allGears: fc.boolean(),
			startShare: often(undefined, within(0, 0.999)),
		})
		.map(({braking, gears, allGears, startShare, ...course}) => {
			const [lowestGear, highestGear] = allGears ? [1, last] : [Math.min(...gears), Math.max(...gears)];
			const startGear =
				startShare === undefined ? undefined : lowestGear + Math.floor(startShare * (highestGear - lowestGear + 1));
			const [entryMps, brakingMps2] = braking ?? [undefined, undefined];
			return sampleCourse({...course, entryMps, brakingMps2, lowestGear, highestGear, startGear});
		});
};

export const anyStraight = fc
	.tuple(anyVehicle, anyTrain)
	.chain(([vehicle, train]) => anyCourse(train).map(course => ({vehicle, train, course})));
