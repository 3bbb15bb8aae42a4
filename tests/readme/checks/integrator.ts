/** Runs in one gear against a general integrator that steps the equations of motion, written a second time, in time. */
import {RoadGears} from '../../../source/drivetrain/road-gears.ts';
import {runStraight} from '../../../source/drivetrain/run-straight.ts';
import type {Course, Vehicle} from '../../../source/drivetrain/straight.ts';
import {accelerationIn, stepped} from '../../drivetrain/equations.ts';
import {sampleCourse, sampleTrain, sampleVehicle} from '../../drivetrain/sample-car.ts';
import type {Case, OutsideCheck} from '../outside-check.ts';

/** Speed and distance that the integrator reaches in the time that our run takes. */
const cases = (gear: number, course: Partial<Course>, vehicle: Partial<Vehicle> = {}): Case[] => {
	const [car, road] = [sampleVehicle(vehicle), sampleCourse({lowestGear: gear, highestGear: gear, ...course})];
	const run = runStraight(new RoadGears(car, sampleTrain, road), road);
	if (run.kind !== 'ran' || run.fastest.limiterM > 0) throw new Error('Expected a run below the limiter.');
	const acceleration = (speedMps: number) => accelerationIn(car, sampleTrain, road, gear, speedMps);
	const end = stepped(acceleration, {speedMps: road.exitMps, distanceM: 0}, run.fastest.timeS);
	return [
		{outside: end.speedMps.toFixed(6), exact: end.speedMps, ours: run.fastest.finalMps, unit: 'm/s'},
		{outside: end.distanceM.toFixed(6), exact: end.distanceM, ours: road.lengthM, unit: 'm'},
	];
};

export const integrator: readonly OutsideCheck[] = [
	{
		what: 'Dyno curve, grip, growth, slip, grade, wind: speed and distance, six runs',
		source: 'odex 2.0.4 (Hairer & Wanner) on the equations written anew',
		mark: 'recomputed',
		cases: [
			...cases(3, {exitMps: 36, lengthM: 150}),
			...cases(4, {exitMps: 45, lengthM: 300, grade: 0.06, headwindMps: 7}),
			...cases(5, {exitMps: 52, lengthM: 600, grade: -0.04, headwindMps: -9}),
			...cases(2, {exitMps: 15, lengthM: 120}, {grip: 0.9, cgHeightRatio: 0.15}),
			...cases(4, {exitMps: 40, lengthM: 400}, {growth: 0.05, slip: 0.08}),
			...cases(5, {exitMps: 55, lengthM: 800, load: 1.8, extraDragN: 900}),
		],
		tolerance: 1e-9,
	},
];
