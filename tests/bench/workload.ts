/** A rack of pairs, two gearbox sets, straights on three grades and situations, drawn from a seed. */
import {overallRatios, pairRatio} from '../../source/drivetrain/gear-pair.ts';
import {RoadGears} from '../../source/drivetrain/road-gears.ts';
import {runStraight, runStraightPlainly} from '../../source/drivetrain/run-straight.ts';
import type {Course, GearTrain, StraightRun, Vehicle} from '../../source/drivetrain/straight.ts';
import {sampleCourse, sampleVehicle, trainOf} from '../drivetrain/sample-car.ts';
import {seeded} from './harness.ts';

export type Workload = {
	readonly trains: readonly GearTrain[];
	readonly vehicles: readonly Vehicle[];
	/** Straights of one grade together. */
	readonly grades: readonly (readonly Course[])[];
};

export type Size = {readonly pairs: number; readonly straights: number; readonly situations: number};

const sets = [
	[2.9, 2.04, 1.58, 1.24, 1],
	[2.6, 1.9, 1.47, 1.19, 1],
];
const finalDrive = 3.25;

export function workload({pairs, straights, situations}: Size, seed: number): Workload {
	const random = seeded(seed);
	const between = (low: number, high: number) => low + (high - low) * random();
	const driven = Array.from({length: pairs}, (_, i) => ({driving: 1000, driven: Math.round(1020 + (330 * i) / pairs)}));
	const trains = driven.flatMap(pair => sets.map(ratios => trainOf(overallRatios(ratios, pair, finalDrive))));
	const slowest = Math.max(...driven.map(pairRatio));
	const vehicles = Array.from({length: situations}, () =>
		sampleVehicle({
			dragAreaM2: between(0.8, 1),
			airDensityKgM3: between(1.1, 1.25),
			rolloutM: between(2.18, 2.22),
			grip: between(1.1, 1.3),
		}),
	);
	const courses = Array.from({length: straights}, (_, i) => {
		const braking = i % 2 === 0 ? {entryMps: between(28, 36), brakingMps2: 9} : {};
		const exitMps = between(22, 52) / slowest;
		return sampleCourse({exitMps, lengthM: between(150, 700), grade: [-0.02, 0, 0.03][i % 3]!, ...braking});
	});
	return {trains, vehicles, grades: [0, 1, 2].map(g => courses.filter((_, i) => i % 3 === g))};
}

export const countOf = ({trains, vehicles, grades}: Workload) => trains.length * vehicles.length * grades.flat().length;

/** Every answer, with the gears of each train, situation and grade made once. */
export function* together({trains, vehicles, grades}: Workload): Generator<StraightRun> {
	for (const train of trains) {
		for (const vehicle of vehicles) {
			for (const courses of grades) {
				const [first] = courses;
				if (first === undefined) continue;
				const gears = new RoadGears(vehicle, train, first);
				for (const course of courses) yield runStraight(gears, course);
			}
		}
	}
}

/** The same answers, each straight and each sequence by itself. */
export function* plainly({trains, vehicles, grades}: Workload): Generator<StraightRun> {
	for (const train of trains) {
		for (const vehicle of vehicles) {
			for (const courses of grades) for (const course of courses) yield runStraightPlainly(vehicle, train, course);
		}
	}
}

export function total(runs: Iterable<StraightRun>): number {
	let sum = 0;
	for (const run of runs) if (run.kind === 'ran') sum += run.chosen.timeS;
	return sum;
}
