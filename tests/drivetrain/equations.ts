/**
 * The equations of motion written a second time, for the tests: forces straight from their definitions, stepped in time by
 * a general integrator. Slow, and without any of the solver's own parts but the torque curve and the shapes of its data.
 */
import {createRequire} from 'node:module';
import {valueAt} from '../../source/drivetrain/monotone-cubic.ts';
import type {Course, GearTrain, Vehicle} from '../../source/drivetrain/straight.ts';

/** What is used of odex (E. Hairer and G. Wanner's ODEX): its sources do not hold to our compiler's rules. */
type Odex = {
	absoluteTolerance: number;
	relativeTolerance: number;
	maxSteps: number;
	solve(
		slopes: (x: number, y: number[]) => number[],
		x: number,
		y: readonly number[],
		xEnd: number,
	): {y: number[]; nEval: number};
};
const {Solver} = createRequire(import.meta.url)('odex') as {Solver: new (dimension: number) => Odex};

export type State = {readonly speedMps: number; readonly distanceM: number};

const referenceMps = 44.704;
const gravity = 9.80665;

export const circumference = (vehicle: Vehicle, v: number) =>
	vehicle.rolloutM * (1 + vehicle.growth * (v / referenceMps) ** 2);

export const rpmOf = (vehicle: Vehicle, overall: number, v: number) =>
	(60 * v * (1 + vehicle.slip) * overall) / circumference(vehicle, v);

function resistance(vehicle: Vehicle, course: Course, v: number): number {
	const theta = Math.atan(course.grade);
	const air = v + course.headwindMps;
	const rho = vehicle.airDensityKgM3;
	const downforce = 0.5 * rho * vehicle.downforceAreaM2 * air ** 2;
	const drag = 0.5 * rho * vehicle.dragAreaM2 * air * Math.abs(air) + course.extraDragN;
	const roll = vehicle.rolling * (course.load * vehicle.massKg * gravity * Math.cos(theta) + downforce);
	return drag + roll + vehicle.massKg * gravity * Math.sin(theta);
}

function gripLimit(vehicle: Vehicle, course: Course, v: number): number {
	const theta = Math.atan(course.grade);
	const downforce = 0.5 * vehicle.airDensityKgM3 * vehicle.downforceAreaM2 * (v + course.headwindMps) ** 2;
	const rear = vehicle.rearShare * course.load * vehicle.massKg * gravity * Math.cos(theta);
	const share = 1 - vehicle.grip * vehicle.cgHeightRatio;
	return (vehicle.grip * (rear + vehicle.rearDownforceShare * downforce)) / share;
}

const spun = (vehicle: Vehicle, inertia: number, v: number) =>
	vehicle.massKg + ((2 * Math.PI) / circumference(vehicle, v)) ** 2 * inertia;

/** Acceleration in a gear (from 1) at full throttle. */
export function accelerationIn(vehicle: Vehicle, train: GearTrain, course: Course, gear: number, v: number): number {
	const overall = train.overall[gear - 1]!;
	const torque = valueAt(vehicle.torqueNm, rpmOf(vehicle, overall, v));
	const thrust = (2 * Math.PI * torque * train.efficiency[gear - 1]! * overall) / circumference(vehicle, v);
	const against = resistance(vehicle, course, v);
	const inertia = vehicle.wheelInertiaKgM2 + vehicle.engineInertiaKgM2 * overall ** 2;
	return Math.min(
		(thrust - against) / spun(vehicle, inertia, v),
		(gripLimit(vehicle, course, v) - against) / spun(vehicle, vehicle.undrivenInertiaKgM2, v),
	);
}

/** Acceleration out of gear, in the interruption of a shift. */
export const accelerationOut = (vehicle: Vehicle, course: Course, v: number) =>
	-resistance(vehicle, course, v) / spun(vehicle, vehicle.wheelInertiaKgM2, v);

/** Steps dV/dt = a(V), ds/dt = V for a time, to about 1e-11. */
export function stepped(acceleration: (v: number) => number, from: State, timeS: number): State {
	if (timeS === 0) return from;
	const solver = new Solver(2);
	solver.absoluteTolerance = 1e-11;
	solver.relativeTolerance = 1e-11;
	solver.maxSteps = 100_000;
	const {y} = solver.solve((_, [v]) => [acceleration(v!), v!], 0, [from.speedMps, from.distanceM], timeS);
	return {speedMps: y[0]!, distanceM: y[1]!};
}
