/** Air and wind, of a track and of a situation. SI, °C. */
import * as z from 'zod/mini';
import {quantity, type Range, rule} from './fields.ts';

const bounds = {
	temperatureC: {from: -60, to: 70},
	/** From 5500 m up in a low to below sea level in a high. */
	stationPa: {from: 50_000, to: 110_000},
	altimeterPa: {from: 85_000, to: 110_000},
	elevationM: {from: -500, to: 5000},
	humidity: {from: 0, to: 1},
	windMps: {from: 0, to: 60},
	fromRad: {from: -2 * Math.PI, to: 2 * Math.PI},
} satisfies Record<string, Range>;

export function airFields() {
	return {
		temperature: z.optional(quantity('temperature', bounds.temperatureC, 'Air temperature.')),
		pressure: z.optional(quantity('pressure', bounds.stationPa, 'Station pressure, not reduced to sea level.')),
		altimeter: z.optional(
			quantity('pressure', bounds.altimeterPa, 'Altimeter setting, in place of the pressure; with "elevation".'),
		),
		elevation: z.optional(
			quantity('length', bounds.elevationM, 'Elevation of the station that gives the altimeter setting.'),
		),
		humidity: z.optional(quantity('share', bounds.humidity, 'Relative humidity.')),
		dewPoint: z.optional(quantity('temperature', bounds.temperatureC, 'Dew point, in place of the humidity.')),
	};
}

export function windFields() {
	return {
		speed: z.optional(
			quantity('speed', bounds.windMps, 'Wind speed at car height: a reading at 10 m times about 0.6.'),
		),
		from: z.optional(quantity('angle', bounds.fromRad, 'Where it blows from, clockwise from north.')),
	};
}

type AirValues = {[field in keyof ReturnType<typeof airFields>]?: unknown};

/** One way to say the pressure, one to say the moisture. Whether an elevation is missing only the track can tell. */
export const airRules = () =>
	rule<AirValues>(({temperature, pressure, altimeter, elevation, humidity, dewPoint}, report) => {
		if (pressure !== undefined && altimeter !== undefined) report(['altimeter'], 'either "pressure" or "altimeter"');
		if (elevation !== undefined && altimeter === undefined) report(['elevation'], 'an elevation only with "altimeter"');
		if (humidity !== undefined && dewPoint !== undefined) report(['dewPoint'], 'either "humidity" or "dewPoint"');
		if (typeof temperature === 'number' && typeof dewPoint === 'number' && dewPoint > temperature) {
			report(['dewPoint'], 'a dew point no higher than the temperature');
		}
	});
