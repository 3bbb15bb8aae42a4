/**
 * The forces on the car as functions of road speed V: a quasi-steady longitudinal point mass (T. D. Gillespie,
 * Fundamentals of Vehicle Dynamics, SAE, ch. 2 and 4; W. F. and D. L. Milliken, Race Car Vehicle Dynamics, SAE).
 */
import {standardGravityMps2} from './constants.ts';
import type {Course, Vehicle} from './straight.ts';

/** What of a course bears on the forces. */
export type Road = Pick<Course, 'grade' | 'headwindMps' | 'load' | 'extraDragN'>;

/** The forces that no gear changes, as constants of polynomials in the air speed u = V + w. */
export type RoadForces = {
	readonly headwindMps: number;
	/** Grade, rolling resistance of the weight, and the extra drag of the piece, N. */
	readonly fixedN: number;
	/** ½·ρ·C_dA: aerodynamic drag is this times u·|u|. */
	readonly dragKgPerM: number;
	/** Rolling resistance of the downforce: this times u². */
	readonly rollingKgPerM: number;
	/** Grip of the driven axle: this plus `gripKgPerM` times u². */
	readonly gripN: number;
	readonly gripKgPerM: number;
	readonly massKg: number;
};

/**
 * The constants for a car on a piece of road. Normal load λ·m·g·cos θ, θ from rise over run; load transfer divides the
 * grip of the driven axle by 1 − μ·h/l (Gillespie, ch. 2), which must be above 0.
 */
export function roadForces(vehicle: Vehicle, road: Road): RoadForces {
	const cosine = 1 / Math.hypot(1, road.grade);
	const weightN = vehicle.massKg * standardGravityMps2;
	const normalN = road.load * weightN * cosine;
	const downforceKgPerM = (vehicle.airDensityKgM3 * vehicle.downforceAreaM2) / 2;
	const friction = vehicle.grip / (1 - vehicle.grip * vehicle.cgHeightRatio);
	return {
		headwindMps: road.headwindMps,
		fixedN: weightN * cosine * road.grade + vehicle.rolling * normalN + road.extraDragN,
		dragKgPerM: (vehicle.airDensityKgM3 * vehicle.dragAreaM2) / 2,
		rollingKgPerM: vehicle.rolling * downforceKgPerM,
		gripN: friction * vehicle.rearShare * normalN,
		gripKgPerM: friction * vehicle.rearDownforceShare * downforceKgPerM,
		massKg: vehicle.massKg,
	};
}

/** Air, rolling and grade resistance at road speed V, N; negative where wind or grade push more than the rest holds. */
export function resistanceN(forces: RoadForces, speedMps: number): number {
	const air = speedMps + forces.headwindMps;
	return forces.fixedN + forces.dragKgPerM * air * Math.abs(air) + forces.rollingKgPerM * air * air;
}

/** The most that the driven axle can push at road speed V: μ·(W_r + a_r·D), N. */
export function gripLimitN(forces: RoadForces, speedMps: number): number {
	const air = speedMps + forces.headwindMps;
	return forces.gripN + forces.gripKgPerM * air * air;
}
