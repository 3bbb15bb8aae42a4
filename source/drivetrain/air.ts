/** The day's air: vapor, dry pressure, density. */
import {celsiusZeroK} from './constants.ts';
import type {Air} from './track.ts';

export type AirState = {
	readonly temperatureC: number;
	/** Station pressure, vapor included. */
	readonly pressurePa: number;
	readonly vaporPressurePa: number;
	readonly dryPressurePa: number;
	readonly densityKgM3: number;
};

/** SAE J1349's reference day, dry: what a missing field of the air is taken as. */
export const referenceDay = {temperatureC: 25, pressurePa: 99_000, humidity: 0};

/** Specific gas constants of dry air and of water vapor, J/(kg K). */
const dryAirGasConstant = 287.058;
const vaporGasConstant = 461.495;

/**
 * Saturation vapor pressure over water, Pa: 6.1121·exp(17.502·t/(240.97 + t)) hPa, A. L. Buck, J. Appl. Meteorol. 20 (1981).
 * Within 0.2 % from −20 to 50 °C.
 */
export function vaporPressurePa(temperatureC: number): number {
	return 611.21 * Math.exp((17.502 * temperatureC) / (240.97 + temperatureC));
}

/**
 * The state of the air; missing fields are SAE J1349's dry reference (25 °C, 990 hPa, 0 %). The dew point gives the vapor
 * pressure directly; where a cooler situation falls below it, the air is saturated and the rest is dew. Density is the gas
 * law's for dry air and vapor, up to 0.05 % below the CIPM-2007 formula's, which knows compressibility.
 */
export function airState(air: Air | undefined): AirState {
	const temperatureC = air?.temperatureC ?? referenceDay.temperatureC;
	const pressurePa = air?.pressurePa ?? referenceDay.pressurePa;
	const vapor = vaporOf(air, temperatureC);
	const dryPressurePa = pressurePa - vapor;
	const temperatureK = temperatureC + celsiusZeroK;
	const densityKgM3 = dryPressurePa / (dryAirGasConstant * temperatureK) + vapor / (vaporGasConstant * temperatureK);
	return {temperatureC, pressurePa, vaporPressurePa: vapor, dryPressurePa, densityKgM3};
}

function vaporOf(air: Air | undefined, temperatureC: number): number {
	const saturated = vaporPressurePa(temperatureC);
	if (air?.dewPointC !== undefined) return Math.min(vaporPressurePa(air.dewPointC), saturated);
	return (air?.humidity ?? referenceDay.humidity) * saturated;
}

/** The air with a situation's change: fields given replace; humidity and dew point say the same, so one replaces the other. */
export function mergedAir(base: Air | undefined, change: Air | undefined): Air | undefined {
	if (base === undefined || change === undefined) return change ?? base;
	const moisture = change.humidity === undefined && change.dewPointC === undefined ? base : change;
	return {
		temperatureC: change.temperatureC ?? base.temperatureC,
		pressurePa: change.pressurePa ?? base.pressurePa,
		humidity: moisture.humidity,
		dewPointC: moisture.dewPointC,
	};
}
