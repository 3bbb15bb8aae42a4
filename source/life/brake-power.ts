/** The power that the engine gives at its crankshaft for what the car does. */
import {resistanceN} from '../drivetrain/forces.ts';
import type {RoadGears} from '../drivetrain/road-gears.ts';
import {circumferenceM} from '../drivetrain/tire.ts';

/**
 * Brake power in a gear at a road speed, W, for an acceleration in m/s²: the thrust m_k·a + F_res, with the equivalent mass
 * m + (2π/C)²·(I_wheels + I_engine·R²) (Gillespie, ch. 2), from 0 up to that of full throttle, times V·(1 + κ)/η. Where grip
 * is what bounds the acceleration it is less than full power: the driver holds the throttle so that the tires bite.
 */
export function brakePowerW(
	gears: RoadGears,
	gear: number,
	speedMps: number,
	accelerationMps2: number,
	slip: number,
): number {
	const {vehicle, train, forces} = gears;
	const overall = train.overall[gear - 1]!;
	const perInertia = ((2 * Math.PI) / circumferenceM(vehicle.rolloutM, vehicle.growth, speedMps)) ** 2;
	const turningKgM2 = vehicle.wheelInertiaKgM2 + vehicle.engineInertiaKgM2 * overall * overall;
	const neededN = (vehicle.massKg + perInertia * turningKgM2) * accelerationMps2 + resistanceN(forces, speedMps);
	const thrustN = Math.max(0, Math.min(neededN, gears.motion(gear).thrustN(speedMps)));
	return (thrustN * speedMps * (1 + slip)) / train.efficiency[gear - 1]!;
}
