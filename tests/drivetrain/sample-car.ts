/** A car, a train and a straight to start from; each test changes what it is about. */
import {monotoneCubic} from '../../source/drivetrain/monotone-cubic.ts';
import type {Course, GearTrain, Vehicle} from '../../source/drivetrain/straight.ts';

const curve = [
	[4000, 540],
	[5000, 610],
	[6000, 650],
	[7000, 660],
	[8000, 620],
	[9000, 540],
	[9500, 470],
] as const;

export const sampleVehicle = (changes: Partial<Vehicle> = {}): Vehicle => ({
	massKg: 1640,
	rearShare: 0.5,
	rearDownforceShare: 0.55,
	dragAreaM2: 0.95,
	downforceAreaM2: 1.6,
	rolling: 0.018,
	grip: 1.25,
	cgHeightRatio: 0,
	wheelInertiaKgM2: 4,
	undrivenInertiaKgM2: 2,
	engineInertiaKgM2: 0.14,
	airDensityKgM3: 1.16,
	rolloutM: 2.2,
	growth: 0.008,
	slip: 0.015,
	torqueNm: monotoneCubic(
		curve.map(([rpm]) => rpm),
		curve.map(([, torqueNm]) => torqueNm),
	),
	limiterRpm: 9200,
	topRpm: 9200,
	shiftCapRpm: 9100,
	shiftTimeS: 0.08,
	reactionTimeS: 0.25,
	sameTimeS: 0.02,
	...changes,
});

export const trainOf = (overall: readonly number[], efficiency = 0.92): GearTrain => ({
	overall,
	efficiency: overall.map(() => efficiency),
});

export const sampleTrain: GearTrain = trainOf([10.8, 7.6, 5.9, 4.65, 3.75]);

export const sampleCourse = (changes: Partial<Course> = {}): Course => ({
	lengthM: 400,
	exitMps: 40,
	entryMps: undefined,
	brakingMps2: undefined,
	grade: 0,
	headwindMps: 0,
	load: 1,
	extraDragN: 0,
	lowestGear: 1,
	highestGear: 5,
	startGear: undefined,
	...changes,
});
