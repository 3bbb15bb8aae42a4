/** The shift interruption: no thrust for a time, while the resistances act on the mass with its four wheels. */
import {type RoadForces, resistanceN} from './forces.ts';
import type {Vehicle} from './straight.ts';
import {circumferenceM} from './tire.ts';

export type Coast = {readonly speedMps: number; readonly distanceM: number};

/** In a tenth of a second the speed changes by a few tenths of a percent, and the error of one step is below 1e-13 of it. */
const longestStepS = 0.1;

/**
 * Speed and distance after `timeS` seconds out of gear, from −F_res(V) / (m + (2π/C)²·I_wheels); the energy that the engine
 * gives back at a shift is left out. The time is given here, not the speed, so the two equations are stepped by the
 * classical fourth-order Runge-Kutta method. A car that comes to rest stays there.
 */
export function coast(vehicle: Vehicle, forces: RoadForces, fromMps: number, timeS: number): Coast {
	const acceleration = (speedMps: number) => {
		const perInertia = ((2 * Math.PI) / circumferenceM(vehicle.rolloutM, vehicle.growth, speedMps)) ** 2;
		return -resistanceN(forces, speedMps) / (vehicle.massKg + perInertia * vehicle.wheelInertiaKgM2);
	};
	const steps = Math.ceil(timeS / longestStepS);
	let [speedMps, distanceM] = [fromMps, 0];
	for (let i = 0; i < steps && speedMps > 0; i++) {
		const step = timeS / steps;
		const a1 = acceleration(speedMps);
		const a2 = acceleration(speedMps + (step / 2) * a1);
		const a3 = acceleration(speedMps + (step / 2) * a2);
		const a4 = acceleration(speedMps + step * a3);
		distanceM += step * (speedMps + (step / 6) * (a1 + a2 + a3));
		speedMps = Math.max(0, speedMps + (step / 6) * (a1 + 2 * a2 + 2 * a3 + a4));
	}
	return {speedMps, distanceM};
}
