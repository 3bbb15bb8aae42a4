import fc from 'fast-check';
import {evaluate} from 'mathjs';
import {describe, expect, test} from 'vitest';
import {type Dimension, type QuantityReading, quantityOf, readQuantity} from '../../source/documents/quantity.ts';
import {runs} from '../runs.ts';

const value = (reading: QuantityReading) => {
	if (!reading.ok) throw new Error(`${reading.found}; allowed ${reading.allowed}`);
	return reading.value;
};
const inch = 0.0254;
const mph = 0.44704;

describe('arithmetic', () => {
	test.each<[string, Dimension, number]>([
		['86.5 in', 'length', 86.5 * inch],
		['86.5+0.25 in', 'length', 86.75 * inch],
		['86+1/2 in', 'length', 86.5 * inch],
		['118*1.02 mph', 'speed', 120.36 * mph],
		['88 mph + 3 km/h', 'speed', 88 * mph + 3 / 3.6],
		['88 mph-3 km/h', 'speed', 88 * mph - 3 / 3.6],
		['3 + 88 mph', 'speed', 91 * mph],
		['88 mph * 1.02', 'speed', 88 * 1.02 * mph],
		['2 * (40 + 4) mph', 'speed', 88 * mph],
		['(80 + 8) mph + 3 km/h', 'speed', 88 * mph + 3 / 3.6],
		['2*44 mph + 0 mph', 'speed', 88 * mph],
		['(1/2) mi + 100 ft', 'length', 835.152],
		['100 − 12 mph', 'speed', 88 * mph],
		['8 × 11 mph', 'speed', 88 * mph],
		['176 ÷ 2 mph', 'speed', 88 * mph],
		['.5 m', 'length', 0.5],
		['5. m', 'length', 5],
		['6.5e2 ft', 'length', 198.12],
		['1e-2 m', 'length', 0.01],
		['-5 degC', 'temperature', -5],
		['- -3 m', 'length', 3],
		['86.5"', 'length', 86.5 * inch],
		['20 gal - 2 L', 'volume', 0.07370823568],
		['3.6e6*(1+1) kg/(kW h)', 'consumption', 2],
		['(3.6e6) kg/(kW·h) * 2', 'consumption', 2],
		['1.2 + 0.05', 'number', 1.25],
	])('%s of %s is %d', (text, dimension, wanted) => {
		expect(value(quantityOf(text, dimension))).toBeCloseTo(wanted, 10);
	});

	test('agrees with mathjs on plain expressions', () => {
		const number = fc.integer({min: 1, max: 9999}).map(n => String(n / 100));
		const {expression} = fc.letrec<{expression: string}>(tie => ({
			expression: fc.oneof(
				{depthSize: 'small'},
				number,
				fc
					.tuple(tie('expression'), fc.constantFrom('+', '-', '*', '/'), tie('expression'))
					.map(parts => parts.join(' ')),
				tie('expression').map(inner => `(${inner})`),
				tie('expression').map(inner => `-(${inner})`),
			),
		}));
		fc.assert(
			fc.property(expression, text => {
				fc.pre(text.length < 190);
				const oracle = evaluate(text) as number;
				const reading = quantityOf(`${text} m`, 'length');
				if (!Number.isFinite(oracle)) {
					expect(reading.ok).toBe(false);
					return;
				}
				expect(Math.abs(value(reading) - oracle)).toBeLessThanOrEqual(1e-12 * Math.max(1, Math.abs(oracle)));
			}),
			{numRuns: runs(300, 10_000)},
		);
	});

	test('agrees with mathjs on terms with their own units', () => {
		const term = fc.tuple(fc.integer({min: 1, max: 999}), fc.constantFrom('ft', 'in', 'm', 'km', 'mi'));
		const sum = fc.array(term, {minLength: 2, maxLength: 6}).map(terms => terms.map(([n, unit]) => `${n} ${unit}`));
		fc.assert(
			fc.property(sum, fc.constantFrom(' + ', ' - '), (terms, sign) => {
				const text = terms.join(sign);
				const oracle = (evaluate(text) as {toNumber(unit: string): number}).toNumber('m');
				expect(value(quantityOf(text, 'length'))).toBeCloseTo(oracle, 6);
			}),
			{numRuns: runs(100, 5000)},
		);
	});
});

describe('what is refused', () => {
	test.each<[string, Dimension, RegExp]>([
		['118', 'speed', /no unit/],
		['3 in', 'speed', /in is a length/],
		['118 mhp', 'speed', /unknown unit mhp/],
		['1.2 mph', 'number', /mph is a speed/],
		['88 mph + 3', 'speed', /without a unit/],
		['3 m * 2 m', 'length', /product/],
		['10 m / 2 m', 'length', /division by a value with a unit/],
		['1/0 ft', 'length', /division by zero/],
		['75+1 degF', 'temperature', /arithmetic on temperatures/],
		['2*30 degC', 'temperature', /arithmetic on temperatures/],
		['86,5 in', 'length', /comma/],
		['86 1/2 in', 'length', /86 1/],
		['(1 ft', 'length', /not closed/],
		['1) ft', 'length', /"\)" where none can stand/],
		['1.2.3 m', 'length', /1\.2\./],
		['NaN mph', 'speed', /NaN/],
		['Infinity mph', 'speed', /Infinity/],
		['1e999 mph', 'speed', /too large/],
		[`${'9'.repeat(150)} mph`, 'speed', /too long or too large/],
		[`${'9'.repeat(400)} mph`, 'speed', /characters/],
		['1e300*1e300 mph', 'speed', /too large/],
		['0x10 mph', 'speed', /unknown unit x/],
		['sqrt(4) mph', 'speed', /sqrt/],
		['a=3 mph', 'speed', /"="/],
		['f(x)=x; 3 mph', 'speed', /"="/],
		['import("fs")', 'speed', /import/],
		['3 mph; 4 mph', 'speed', /";"/],
		['3 mph km/h', 'speed', /unknown unit/],
		['', 'speed', /no number/],
		['+', 'speed', /no number/],
		['mph', 'speed', /no number/],
		['１８ mph', 'speed', /character/],
	])('%s as %s', (text, dimension, found) => {
		const reading = quantityOf(text, dimension);
		expect(reading).toMatchObject({ok: false, found: expect.stringMatching(found)});
	});

	test('a decimal comma is answered with the point', () => {
		expect(quantityOf('86,5 in', 'length')).toMatchObject({hint: 'Write 86.5.'});
		expect(quantityOf('1,200 ft', 'length')).toMatchObject({hint: expect.stringContaining('Write 1200 or 1.200')});
	});

	test('a slip in a unit is answered with the nearest one', () => {
		expect(quantityOf('118 mhp', 'speed')).toMatchObject({hint: 'Did you mean "mph"?'});
		expect(quantityOf('28.9 inHG', 'pressure')).toMatchObject({hint: 'Did you mean "inHg"?'});
	});

	test('the units that are allowed are named', () => {
		expect(quantityOf('118', 'speed')).toMatchObject({allowed: expect.stringContaining('mph, km/h, m/s, ft/s, kn')});
	});
});

describe('a sign', () => {
	test.each([
		['+1.5 mph', true],
		['-3 mph', true],
		['−3 mph', true],
		['1.5 mph', false],
		['(-3) mph', false],
	])('%s: signed is %s', (text, signed) => {
		expect(quantityOf(text, 'speed')).toMatchObject({ok: true, signed});
	});

	test('among several dimensions the one of the unit is taken', () => {
		expect(quantityOf('-3 %', ['speed', 'share'])).toMatchObject({ok: true, dimension: 'share', value: -0.03});
		expect(quantityOf('+2 mph', ['speed', 'share'])).toMatchObject({ok: true, dimension: 'speed'});
		expect(quantityOf('10 % + 3 hp', ['share', 'power']).ok).toBe(false);
	});
});

test('a quantity means the same in every unit', () => {
	const units = {mph: 0.44704, 'km/h': 1 / 3.6, 'm/s': 1, 'ft/s': 0.3048, kn: 1852 / 3600};
	const entries = Object.entries(units);
	fc.assert(
		fc.property(fc.double({min: 1, max: 150, noNaN: true}), fc.constantFrom(...entries), (speed, [name, factor]) => {
			const text = `${(speed / factor).toPrecision(17)} ${name}`;
			expect(Math.abs(value(quantityOf(text, 'speed')) / speed - 1)).toBeLessThan(1e-14);
		}),
		{numRuns: runs(200, 5000)},
	);
});

test('no text makes the reader throw', () => {
	const pieces = fc.constantFrom(
		'1',
		'.5',
		'+',
		'-',
		'*',
		'/',
		'(',
		')',
		' ',
		'mph',
		'ft',
		'%',
		'^2',
		'²',
		',',
		'e',
		'°',
		'\u202e',
		'\0',
		'"',
	);
	const noise = fc.oneof(
		fc.string({unit: 'binary', maxLength: 40}),
		fc.array(pieces, {maxLength: 60}).map(parts => parts.join('')),
	);
	fc.assert(
		fc.property(noise, text => {
			const reading = quantityOf(text, ['speed', 'length', 'share']);
			if (reading.ok) expect(Number.isFinite(reading.value)).toBe(true);
			else expect(reading.found).not.toMatch(/\p{Cc}/u);
		}),
		{numRuns: runs(2000, 100_000)},
	);
});

describe('units beyond the table', () => {
	test('are read through mathjs', async () => {
		// 1 stone = 14 lb, 1 rod = 16.5 ft (international definitions).
		expect(value(await readQuantity('200 stone', 'mass'))).toBeCloseTo(2800 * 0.45359237, 9);
		expect(value(await readQuantity('10 rod + 1 ft', 'length'))).toBeCloseTo(166 * 0.3048, 9);
		expect(value(await readQuantity('3 rod/h', 'speed'))).toBeCloseTo((3 * 16.5 * 0.3048) / 3600, 12);
	});

	test('must be of the dimension', async () => {
		expect(await readQuantity('3 rod', 'speed')).toMatchObject({
			ok: false,
			found: expect.stringContaining('rod is a length'),
		});
		expect(await readQuantity('3 kelvin', 'temperature')).toMatchObject({ok: false});
	});

	test('must exist', async () => {
		expect(await readQuantity('3 blarg', 'speed')).toMatchObject({ok: false, found: expect.stringContaining('blarg')});
		expect(await readQuantity('3 constructor', 'speed')).toMatchObject({ok: false});
		expect(await readQuantity('3 __proto__', 'speed')).toMatchObject({ok: false});
	});
});
