/** Bounds that need no integral. */
import {type RoadForces, resistanceN} from './forces.ts';
import type {Vehicle} from './straight.ts';
import {circumferenceM} from './tire.ts';

/**
 * A bound above the acceleration at every speed from `fromMps` up, m/s², at least 0: the most thrust, on the smallest
 * circumference there (the tire does not shrink), against the least resistance, moving the mass alone. `wheelTorqueNm` is
 * the peak torque times efficiency and overall ratio.
 */
export function mostMps2(vehicle: Vehicle, forces: RoadForces, wheelTorqueNm: number, fromMps: number): number {
	const thrustN = (2 * Math.PI * wheelTorqueNm) / circumferenceM(vehicle.rolloutM, vehicle.growth, fromMps);
	const air = fromMps + forces.headwindMps;
	const leastN = air >= 0 ? resistanceN(forces, fromMps) : forces.fixedN - forces.dragKgPerM * air * air;
	return Math.max(0, (thrustN - leastN) / vehicle.massKg);
}

/** The least time for a distance from a speed with no more than an acceleration, s. */
export function leastTimeS(distanceM: number, fromMps: number, mps2: number): number {
	return (2 * distanceM) / (fromMps + Math.sqrt(fromMps * fromMps + 2 * mps2 * distanceM));
}

/** The highest torque of the curve, N m: the monotone interpolant never leaves its points. */
export function peakTorqueNm({torqueNm: {coefficients, last}}: Vehicle): number {
	let peak = last;
	for (let i = 0; i < coefficients.length; i += 4) peak = Math.max(peak, coefficients[i]!);
	return peak;
}
