/** The units that people read, in one place. Sizes are definitions: SI per unit. */
export type UnitSystem = 'us' | 'metric';
export type Quantity =
	| 'speed'
	| 'distance'
	| 'longDistance'
	| 'temperature'
	| 'pressure'
	| 'power'
	| 'density'
	| 'fuel'
	| 'lapFuel'
	| 'mass';

type Unit = {label: string; size: number; zero?: number; digits: number};

const footM = 0.3048;
/** The US gallon: 231 cubic inches. */
export const gallonM3 = 231 * 0.0254 ** 3;
export const poundKg = 0.45359237;
/** 1 hp = 550 ft lbf/s, 1 lbf = 4.4482216152605 N. */
export const horsepowerW = 550 * footM * 4.4482216152605;
/** Conventional inch of mercury (0 °C, standard gravity). */
const inchOfMercuryPa = 3386.388640341;

const systems: Record<UnitSystem, Record<Quantity, Unit>> = {
	us: {
		speed: {label: 'mph', size: 0.44704, digits: 1},
		distance: {label: 'ft', size: footM, digits: 0},
		longDistance: {label: 'mi', size: 1609.344, digits: 0},
		temperature: {label: '°F', size: 5 / 9, zero: 32, digits: 0},
		pressure: {label: 'inHg', size: inchOfMercuryPa, digits: 2},
		power: {label: 'hp', size: horsepowerW, digits: 0},
		fuel: {label: 'gal', size: gallonM3, digits: 1},
		lapFuel: {label: 'gal', size: gallonM3, digits: 4},
		mass: {label: 'lb', size: poundKg, digits: 0},
		density: {label: 'lb/ft³', size: poundKg / footM ** 3, digits: 4},
	},
	metric: {
		speed: {label: 'km/h', size: 1 / 3.6, digits: 1},
		distance: {label: 'm', size: 1, digits: 0},
		longDistance: {label: 'km', size: 1000, digits: 0},
		temperature: {label: '°C', size: 1, digits: 0},
		pressure: {label: 'hPa', size: 100, digits: 0},
		power: {label: 'kW', size: 1000, digits: 0},
		fuel: {label: 'L', size: 1e-3, digits: 1},
		lapFuel: {label: 'L', size: 1e-3, digits: 3},
		mass: {label: 'kg', size: 1, digits: 0},
		density: {label: 'kg/m³', size: 1, digits: 3},
	},
};

export type Units = {
	label: (quantity: Quantity) => string;
	/** The number alone, rounded; an absent one is a dash. Temperature is given in °C, everything else in SI. */
	number: (quantity: Quantity, value: number | null) => string;
	/** The number with its unit. */
	text: (quantity: Quantity, value: number | null) => string;
	/** What one SI unit of it is, not rounded; for pictures. */
	perSi: (quantity: Exclude<Quantity, 'temperature'>) => number;
};

export const absent = '-';

export const unitsOf = (system: UnitSystem): Units => {
	const units = systems[system];
	const number = (quantity: Quantity, value: number | null) => {
		if (value === null) return absent;
		const {size, zero = 0, digits} = units[quantity];
		return fixed(value / size + zero, digits);
	};
	const label = (quantity: Quantity) => units[quantity].label;
	const text = (quantity: Quantity, value: number | null) => {
		const gap = quantity === 'temperature' ? '' : ' ';
		return value === null ? absent : `${number(quantity, value)}${gap}${label(quantity)}`;
	};
	const perSi = (quantity: Quantity) => 1 / units[quantity].size;
	return {label, number, text, perSi};
};

/** A rounded number without a negative zero. */
export const fixed = (value: number, digits: number): string => value.toFixed(digits).replace(/^-(?=0(\.0*)?$)/, '');

/** The same with its sign, for differences. */
export const signed = (value: number | null, digits: number): string => {
	if (value === null) return absent;
	const text = fixed(value, digits);
	return text.startsWith('-') || Number(text) === 0 ? text : `+${text}`;
};

export const seconds = (value: number | null): string => (value === null ? absent : fixed(value, 3));

/** Floating-point noise of a speed turned into RPM and back; less than this is not a whole rev. */
const rpmNoise = 1e-6;

/** RPM to the nearest; up where a bound above must not look kept when it is not; down where one is to be driven by. */
export const rpm = (value: number | null): string => (value === null ? absent : fixed(value, 0));
export const rpmUp = (value: number | null): string =>
	value === null ? absent : fixed(Math.ceil(value - rpmNoise), 0);
export const rpmDown = (value: number | null): string =>
	value === null ? absent : fixed(Math.floor(value + rpmNoise), 0);
