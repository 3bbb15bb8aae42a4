/** The units that people type, as definitions. SI inside; angles in radians, temperatures in °C, shares as fractions of 1. */
import {
	celsiusZeroK,
	inchM as inch,
	inchOfMercuryPa,
	mileM,
	standardGravityMps2 as standardGravity,
} from '../drivetrain/constants.ts';

/** What a quantity measures; `number` is what has no unit. */
export const dimensions = [
	'length',
	'speed',
	'mass',
	'area',
	'acceleration',
	'angle',
	'temperature',
	'pressure',
	'time',
	'torque',
	'force',
	'inertia',
	'power',
	'volume',
	'density',
	'consumption',
	'share',
	'number',
] as const;
export type Dimension = (typeof dimensions)[number];

/** SI value = (number − zero) · factor. */
export type Unit = {
	readonly name: string;
	readonly dimension: Dimension;
	readonly factor: number;
	readonly zero: number;
};

// Exact: international yard and pound (1959), nautical mile (1929).
const foot = 0.3048;
const yard = 0.9144;

const nauticalMile = 1852;
const pound = 0.45359237;
const hour = 3600;
const poundForce = pound * standardGravity;
const slug = poundForce / foot;
/** The US gallon: 231 cubic inches. Exact. */
const gallon = 231 * inch ** 3;
const liter = 1e-3;
const kilowattHour = 1000 * hour;
const horsepower = 550 * foot * poundForce;
const metricHorsepower = 75 * standardGravity;
// Conventional column of mercury at 0 °C: 13595.1 kg/m³ at standard gravity (NIST SP 811, B.8).
const millimeterOfMercuryPa = 13595.1 * standardGravity * 1e-3;

/** Spellings separated by commas, the first one is shown to people; then factor, then the zero point where it is not 0. */
type Row = readonly [spellings: string, factor: number, zero?: number];

const rows: Record<Dimension, readonly Row[]> = {
	length: [
		['in, inch, inches, ", ″', inch],
		["ft, foot, feet, ', ′", foot],
		['yd, yard, yards', yard],
		['mi, mile, miles', mileM],
		['mm', 1e-3],
		['cm', 1e-2],
		['m, meter, meters, metre, metres', 1],
		['km', 1000],
	],
	speed: [
		['mph, MPH, mi/h', mileM / hour],
		['km/h, kph, kmh, KPH', 1000 / hour],
		['m/s', 1],
		['ft/s, fps', foot],
		['kn, kt, knot, knots', nauticalMile / hour],
	],
	mass: [
		['lb, lbs, LB, pound, pounds', pound],
		['kg, KG', 1],
		['slug, slugs', slug],
		['t', 1000],
	],
	area: [
		['m^2, sq m', 1],
		['ft^2, sq ft, sqft', foot * foot],
		['in^2, sq in', inch * inch],
		['cm^2', 1e-4],
	],
	acceleration: [
		['g, G', standardGravity],
		['m/s^2', 1],
		['ft/s^2', foot],
		['mph/s', mileM / hour],
	],
	angle: [
		['deg, °, degree, degrees', Math.PI / 180],
		['rad', 1],
	],
	temperature: [
		['degF, °F, F, ℉', 5 / 9, 32],
		['degC, °C, C, ℃', 1],
		['K', 1, celsiusZeroK],
	],
	pressure: [
		['inHg, in Hg, inhg', inchOfMercuryPa],
		['hPa', 100],
		['mbar, mb', 100],
		['kPa', 1000],
		['Pa', 1],
		['bar', 1e5],
		['psi, lbf/in^2', poundForce / (inch * inch)],
		['mmHg, mm Hg', millimeterOfMercuryPa],
		['atm', 101325],
	],
	time: [
		['s, sec, second, seconds', 1],
		['ms', 1e-3],
		['min', 60],
		['h, hr', hour],
	],
	torque: [
		['lbf ft, ft lbf, lb ft, ft lb', poundForce * foot],
		['N m, Nm', 1],
		['lbf in, in lbf, lb in, in lb', poundForce * inch],
		['kgf m, m kgf', standardGravity],
	],
	force: [
		['N', 1],
		['kN', 1000],
		['lbf', poundForce],
		['kgf', standardGravity],
	],
	inertia: [
		['kg m^2', 1],
		['lb ft^2', pound * foot * foot],
		['lb in^2', pound * inch * inch],
		['in lbf s^2, lbf in s^2, in lb s^2, lb in s^2', poundForce * inch],
		['ft lbf s^2, lbf ft s^2, slug ft^2', poundForce * foot],
		['kg cm^2', 1e-4],
		['g m^2', 1e-3],
	],
	power: [
		['hp, HP, bhp', horsepower],
		['kW, kw', 1000],
		['W', 1],
		['PS', metricHorsepower],
	],
	volume: [
		['gal, gallon, gallons', gallon],
		['qt, quart, quarts', gallon / 4],
		['L, l, liter, liters, litre, litres', liter],
		['m^3', 1],
	],
	density: [
		['lb/gal', pound / gallon],
		['kg/L, kg/l', 1000],
		['kg/m^3', 1],
	],
	consumption: [
		['lb/(hp h), lb/hp h, lb/hp/h, lb/hph', pound / (horsepower * hour)],
		['kg/kWh, kg/(kW h), kg/kW h', 1 / kilowattHour],
		['g/kWh, g/(kW h), g/kW h', 1e-3 / kilowattHour],
	],
	share: [['%, percent', 0.01]],
	number: [],
};

const byDimension = new Map<Dimension, Map<string, Unit>>();
for (const [dimension, list] of Object.entries(rows) as [Dimension, readonly Row[]][]) {
	const units = new Map<string, Unit>();
	for (const [spellings, factor, zero = 0] of list) {
		const names = spellings.split(', ');
		for (const spelling of names) units.set(spelling, {name: names[0]!, dimension, factor, zero});
	}
	byDimension.set(dimension, units);
}

/** The unit that `spelling` (as `unitName` leaves it) means in a dimension; undefined where the table has none. */
export function findUnit(spelling: string, dimension: Dimension): Unit | undefined {
	return byDimension.get(dimension)?.get(spelling);
}

/** Dimensions in which the table knows this spelling. */
export function dimensionsOf(spelling: string): Dimension[] {
	return [...byDimension].filter(([, units]) => units.has(spelling)).map(([dimension]) => dimension);
}

/** Every spelling of a dimension. */
export function spellingsOf(dimension: Dimension): string[] {
	return [...byDimension.get(dimension)!.keys()];
}

/** The spellings shown to people, one a unit. */
export function unitNames(dimension: Dimension): string[] {
	return rows[dimension].map(([spellings]) => spellings.split(', ')[0]!);
}

/** One spelling for all ways to write a product, quotient or power: `lb·ft`, `lbf-ft`, `m²`, `m2`, `km / h`, `lb/(hp·h)`. */
export function unitName(written: string): string {
	return written
		.replaceAll('²', '^2')
		.replaceAll('³', '^3')
		.replace(/(\p{L})([23])/gu, '$1^$2')
		.replace(/\s*\/\s*/g, '/')
		.replace(/\s*\^\s*/g, '^')
		.replace(/\s*([()])\s*/g, '$1')
		.replace(/[\s·⋅*-]+(?=\p{L})/gu, ' ');
}
