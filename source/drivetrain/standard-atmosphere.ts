/** The standard atmosphere below 11 km (ISO 2533:1975), and station pressure from an altimeter setting. */
import {standardGravityMps2} from './constants.ts';

/** ISO 2533: pressure and temperature at sea level, lapse rate in K a geopotential meter, gas constant in J/(kg K). */
const seaLevelPa = 101_325;
const seaLevelK = 288.15;
const lapseKPerM = 0.0065;
const gasConstant = 287.05287;

const exponent = standardGravityMps2 / (gasConstant * lapseKPerM);

/** Standard pressure at a geopotential altitude, Pa, from −5000 to 11 000 m. */
export function standardPressurePa(geopotentialM: number): number {
	return seaLevelPa * (1 - (lapseKPerM * geopotentialM) / seaLevelK) ** exponent;
}

/** The geopotential altitude at which the standard pressure is `pressurePa`, m: the inverse of `standardPressurePa`. */
export function standardAltitudeM(pressurePa: number): number {
	return (seaLevelK / lapseKPerM) * (1 - (pressurePa / seaLevelPa) ** (1 / exponent));
}

/**
 * Station pressure, Pa, from an altimeter setting and the elevation of the station: p_std(H + H_std(setting)), which is how
 * an altimeter is made. Elevation is taken as geopotential; at 1500 m that is 4 Pa off.
 */
export function stationPressurePa(altimeterPa: number, elevationM: number): number {
	return standardPressurePa(elevationM + standardAltitudeM(altimeterPa));
}
