import {unit as mathUnit} from 'mathjs';
import {describe, expect, test} from 'vitest';
import {type Dimension, findUnit, unitName, unitNames} from '../../source/documents/units.ts';

const si = (number: number, spelling: string, dimension: Dimension) => {
	const unit = findUnit(unitName(spelling), dimension);
	if (unit === undefined) throw new Error(`${spelling} is no ${dimension} here`);
	return (number - unit.zero) * unit.factor;
};
const expectRelative = (value: number, wanted: number, tolerance: number) =>
	expect(Math.abs(value / wanted - 1), `${value} against ${wanted}`).toBeLessThanOrEqual(tolerance);

// Recomputed (GNU units 2.22 and the definitions), exact unless a digit string is longer than the tolerance.
test.each<[number, string, Dimension, number]>([
	[1, 'mi', 'length', 1609.344],
	[5280, 'ft', 'length', 1609.344],
	[63360, 'in', 'length', 1609.344],
	[1760, 'yd', 'length', 1609.344],
	[60, 'mph', 'speed', 26.8224],
	[88, 'ft/s', 'speed', 26.8224],
	[1, 'kn', 'speed', 1852 / 3600],
	[36, 'km/h', 'speed', 10],
	[1, 'lb', 'mass', 0.45359237],
	[1, 'g', 'acceleration', 9.80665],
	[1, 'lbf', 'force', 4.4482216152605],
	[1, 'lbf ft', 'torque', 1.3558179483314003],
	[1, 'hp', 'power', 745.6998715822702],
	[1, 'PS', 'power', 735.49875],
	[1, 'in lbf s^2', 'inertia', 0.11298482902761668],
	[1, 'psi', 'pressure', 6894.757293168362],
	[760, 'mmHg', 'pressure', 101325.0144354],
	[1013.25, 'hPa', 'pressure', 101325],
	[180, 'deg', 'angle', Math.PI],
	[1, 'gal', 'volume', 3.785411784e-3],
	[4, 'qt', 'volume', 3.785411784e-3],
	[0.745, 'kg/L', 'density', 745],
	[3600, 'kg/kWh', 'consumption', 1e-3],
	[270, 'g/kWh', 'consumption', 75e-9],
	[1.5, '%', 'share', 0.015],
])('%d %s of %s is %d in SI', (number, spelling, dimension, wanted) => {
	expectRelative(si(number, spelling, dimension), wanted, 1e-14);
});

test('a fuel of 0.745 kg/L weighs 6.2173 lb/gal, and 270 g/kWh are 0.4439 lb/(hp h)', () => {
	// Recomputed.
	expectRelative(si(6.2173, 'lb/gal', 'density'), 745, 1e-5);
	expectRelative(si(0.4439, 'lb/(hp h)', 'consumption'), si(270, 'g/kWh', 'consumption'), 1e-4);
});

test('an inch of mercury is the conventional 3386.389 Pa', () => {
	// Recomputed; GNU units prints 3386.38864.
	expectRelative(si(1, 'inHg', 'pressure'), 3386.38864, 2e-7);
});

test.each([
	[32, 'degF', 0],
	[212, '°F', 100],
	[-40, 'degF', -40],
	[25, 'degC', 25],
	[25, '°C', 25],
	[273.15, 'K', 0],
] as const)('%d %s is %d °C', (number, spelling, wanted) => {
	expect(si(number, spelling, 'temperature')).toBeCloseTo(wanted, 12);
});

describe('the table agrees with mathjs', () => {
	/** What mathjs calls a unit, where it does not read our own spelling; null: it has no such unit (its g is the gram). */
	const mathNames: Record<string, string | null> = {
		mph: 'mi/h',
		kn: null,
		slug: null,
		t: 'tonne',
		g: null,
		'mph/s': 'mi/h/s',
		inHg: null,
		kgf: null,
		'kgf m': null,
		'ft lbf s^2': 'lbf ft s^2',
		PS: null,
	};
	const siNames: Partial<Record<Dimension, string>> = {
		length: 'm',
		speed: 'm/s',
		mass: 'kg',
		area: 'm^2',
		acceleration: 'm/s^2',
		angle: 'rad',
		pressure: 'Pa',
		time: 's',
		torque: 'N m',
		force: 'N',
		inertia: 'kg m^2',
		power: 'W',
		volume: 'm^3',
		density: 'kg/m^3',
		consumption: 'kg/J',
	};
	const cases = (Object.entries(siNames) as [Dimension, string][]).flatMap(([dimension, siName]) =>
		unitNames(dimension).map(name => [name, dimension, siName] as const),
	);
	const comparable = cases.filter(([name]) => mathNames[name] !== null);

	test.each(comparable)('%s of %s', (name, dimension, siName) => {
		// mathjs carries rounded constants of its own: hp to 1e-10, mmHg as 133.322 Pa.
		const tolerance = name === 'mmHg' ? 3e-6 : 1e-9;
		expectRelative(si(1, name, dimension), mathUnit(1, mathNames[name] ?? name).toNumber(siName), tolerance);
	});

	test('wherever it has the unit', () => {
		expect(comparable.length).toBe(cases.length - 7);
	});
});

test.each([
	['lbf-ft', 'torque'],
	['lbf·ft', 'torque'],
	['lb ft', 'torque'],
	['ft lbf', 'torque'],
	['N·m', 'torque'],
	['Nm', 'torque'],
	['m²', 'area'],
	['m2', 'area'],
	['kg·m²', 'inertia'],
	['km / h', 'speed'],
	['m / s²', 'acceleration'],
	['lbf in s^2', 'inertia'],
	['lb ft^2', 'inertia'],
	['kph', 'speed'],
	['lb / (hp·h)', 'consumption'],
	['lb/hp-h', 'consumption'],
	['g/(kW h)', 'consumption'],
	['gallons', 'volume'],
	['°', 'angle'],
	['mbar', 'pressure'],
] as const)('%s is read as a unit of %s', (spelling, dimension) => {
	expect(findUnit(unitName(spelling), dimension)).toBeDefined();
});
