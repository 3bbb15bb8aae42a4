import {describe, expect, test} from 'vitest';
import {type QuantityReading, quantityOf} from '../../source/documents/quantity.ts';
import {describeProblems, readCar, readTrack} from '../../source/documents/read.ts';
import type {Dimension} from '../../source/documents/units.ts';
import {carDocument, engine, text, trackDocument} from './examples.ts';

const mph = 0.44704;
const inch = 0.0254;

const known = (written: string, dimension: Dimension): QuantityReading & {ok: true} => {
	const reading = quantityOf(written, dimension);
	if (!reading.ok) throw new Error(`${reading.found}; ${reading.allowed}`);
	return reading;
};

describe('a quantity may say how well it is known', () => {
	test.each<[string, Dimension, number, number]>([
		['88 mph ± 1.5 mph', 'speed', 88 * mph, 1.5 * mph],
		['88 mph +/- 1.5 mph', 'speed', 88 * mph, 1.5 * mph],
		['88mph±1.5mph', 'speed', 88 * mph, 1.5 * mph],
		['88 ± 1.5 mph', 'speed', 88 * mph, 1.5 * mph],
		['88 mph ± 2 km/h', 'speed', 88 * mph, 2 / 3.6],
		['86+1/4 in ± 1/16 in', 'length', 86.25 * inch, inch / 16],
		['98.2 % ± 0.5 %', 'share', 0.982, 0.005],
		['1.25 ± 0.05', 'number', 1.25, 0.05],
		['86.4 in ± 0 in', 'length', 86.4 * inch, 0],
		// A difference of 9 °F is one of 5 °C.
		['77 degF ± 9 degF', 'temperature', 25, 5],
		['25 degC ± 2 degC', 'temperature', 25, 2],
	])('%s', (written, dimension, value, uncertainty) => {
		const reading = known(written, dimension);
		expect(reading.value).toBeCloseTo(value, 10);
		expect(reading.uncertainty).toBeCloseTo(uncertainty, 10);
	});

	test('a change keeps its sign', () => {
		const reading = quantityOf('-15 % ± 3 %', ['area', 'share']);
		expect(reading).toMatchObject({ok: true, signed: true, value: -0.15, uncertainty: 0.03});
	});

	test('without one there is none', () => {
		expect(known('88 mph', 'speed').uncertainty).toBeUndefined();
	});

	test.each<[string, Dimension, RegExp]>([
		['88 mph ± 1.5 in', 'speed', /after ±: in is a length/],
		['88 mph ± 1.5', 'speed', /after ±: no unit/],
		['88 mph ± -1 mph', 'speed', /an uncertainty below 0/],
		['88 mph ±', 'speed', /after ±: no number/],
		['88 mph ± 1 mph ± 2 mph', 'speed', /a second ±/],
		['± 2 mph', 'speed', /no number/],
		['88 mph ± 1e999 mph', 'speed', /too long or too large/],
		['1.2 ± 3 %', 'number', /percentage/],
	])('%s is refused', (written, dimension, found) => {
		const reading = quantityOf(written, dimension);
		expect(reading.ok ? 'read' : reading.found).toMatch(found);
	});
});

const uncertaintiesOfTrack = async (changes: Record<string, unknown>) => {
	const reading = await readTrack(text(trackDocument(changes)));
	if (!reading.ok) throw new Error(describeProblems('track', reading.problems));
	return Object.fromEntries(reading.uncertainties);
};

describe('a reading tells the uncertainties by the path of the field', () => {
	test('of a track, in SI', async () => {
		const straights = [
			{name: 'Front', exit: '88 mph ± 1 mph', length: '650 ft', measured: {end: '116 mph', rpm: '8420 ± 15'}},
			{name: 'Back', exit: '86 mph', minimum: '80 mph ± 2 mph', load: '1.2 ± 0.1'},
		];
		const situations = [
			{name: 'Tow', drag: '-15 % ± 3 %', grip: '+0.05 ± 0.01', power: '98 % ± 1 %', exit: '+1 mph ± 0.5 mph'},
		];
		const car = {tires: {left: '86 in ± 0.05 in'}, grip: '1.2 ± 0.04', power: '97 % ± 0.5 %'};
		const found = await uncertaintiesOfTrack({straights, situations, car, air: {temperature: '70 degF ± 1.8 degF'}});
		const expected: Record<string, number> = {
			'straights[0].exit': mph,
			'straights[0].measured.rpm': 15,
			'straights[1].minimum': 2 * mph,
			'straights[1].load': 0.1,
			'situations[0].drag': 0.03,
			'situations[0].grip': 0.01,
			'situations[0].power': 0.01,
			'situations[0].exit': 0.5 * mph,
			'car.tires.left': 0.05 * inch,
			'car.grip': 0.04,
			'car.power': 0.005,
			'air.temperature': 1,
		};
		expect(Object.keys(found).toSorted()).toEqual(Object.keys(expected).toSorted());
		for (const [path, value] of Object.entries(expected)) expect(found[path], path).toBeCloseTo(value, 12);
	});

	test('of a car', async () => {
		const tires = {left: '86.4 in ± 0.1 in', right: '86.6 in', growth: '0.8 % ± 0.1 %'};
		const document = carDocument({tires, efficiency: '0.92 ± 0.01', engines: [engine({power: '98.2 % ± 0.5 %'})]});
		const reading = await readCar(text(document));
		if (!reading.ok) throw new Error(describeProblems('car', reading.problems));
		expect([...reading.uncertainties.keys()].toSorted()).toEqual([
			'efficiency',
			'engines[0].power',
			'tires.growth',
			'tires.left',
		]);
		expect(reading.value.efficiencies).toBe(0.92);
		expect(reading.value.engines[0]?.power).toBeCloseTo(0.982, 12);
		expect(reading.document).toEqual(document);
	});

	test('of a document that states none there are none', async () => {
		expect(await uncertaintiesOfTrack({})).toEqual({});
	});

	test.each<[string, Record<string, unknown>, RegExp]>([
		['a pit-road limit', {pitRoad: {limit: '45 mph ± 1 mph'}}, /pitRoad\.limit: found .*an uncertainty/],
		['teeth', {straights: [{name: 'A', exit: '88 mph', gears: ['3 ± 1']}]}, /gears\[0\]/],
		['a coefficient as text alone', {car: {grip: '1.2'}}, /car\.grip: found "1\.2"; allowed .*"1\.25 ± 0\.05"/],
		['a coefficient out of its range', {car: {grip: '9 ± 0.05'}}, /car\.grip: .*from 0 to 5/],
	])('%s takes none', async (_, changes, problem) => {
		const reading = await readTrack(text(trackDocument(changes)));
		expect(reading.ok ? '' : describeProblems('track', reading.problems)).toMatch(problem);
	});
});

describe('what was learned', () => {
	const entry = {
		field: 'car.tires.left',
		value: '86.42 in ± 0.06 in',
		before: '86.4 in',
		from: 'practice, 41 laps',
		date: '2026-05-02',
	};

	test('stands beside the fields and is kept as written', async () => {
		const document = trackDocument({learned: [entry, {...entry, field: 'car.grip', value: 1.2, before: undefined}]});
		const reading = await readTrack(text(document));
		expect(reading.ok && reading.document).toEqual(JSON.parse(text(document)));
		expect((await readCar(text(carDocument({learned: [entry]})))).ok).toBe(true);
	});

	test('needs what it was learned from, and when', async () => {
		const reading = await readTrack(text(trackDocument({learned: [{...entry, date: 'today', from: undefined}]})));
		expect(reading.ok ? [] : reading.problems.map(({path}) => path)).toEqual(['learned[0].from', 'learned[0].date']);
	});
});
