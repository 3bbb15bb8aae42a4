import {describe, expect, test} from 'vitest';
import {compare} from '../../source/sharing/compare.ts';
import {carDocument, trackDocument} from './sample.ts';

describe('compare', () => {
	test('finds nothing between a document and itself, in whatever order its fields are', () => {
		expect(compare(trackDocument, trackDocument)).toEqual([]);
		const reversed = Object.fromEntries(Object.entries(trackDocument).reverse());
		expect(compare(trackDocument, reversed)).toEqual([]);
	});

	test('counts a quantity by its value, whatever its unit', () => {
		// 118 mph = 118 · 1.609344 km/h = 189.902592 km/h: the mile's definition
		expect(compare({exit: '118 mph'}, {exit: '189.902592 km/h'})).toEqual([]);
		expect(compare({exit: '118 mph'}, {exit: '189.9 km/h'})).toEqual([{path: 'exit', a: '118 mph', b: '189.9 km/h'}]);
		expect(compare({air: {temperature: '32 degF'}}, {air: {temperature: '0 °C'}})).toEqual([]);
		expect(compare({length: '1 ft'}, {length: '12 in'})).toEqual([]);
		expect(compare({wind: {from: '180 deg'}}, {wind: {from: '180 °'}})).toEqual([]);
	});

	test('counts how well a number is known', () => {
		expect(compare({exit: '118 mph ± 1 mph'}, {exit: '118 ± 1 mph'})).toEqual([]);
		expect(compare({exit: '118 mph ± 1 mph'}, {exit: '118 mph'})).toHaveLength(1);
		expect(compare({exit: '118 mph ± 1 mph'}, {exit: '118 mph ± 2 mph'})).toHaveLength(1);
	});

	test('keeps a change and a value apart, and leaves names alone', () => {
		expect(compare({exit: '+2 mph'}, {exit: '2 mph'})).toHaveLength(1);
		expect(compare({name: '1 ft'}, {name: '12 in'})).toHaveLength(1);
	});

	test('matches entries by name and lists differences in the order of the document', () => {
		const [front, back, chute, leg] = trackDocument.straights;
		const other = {
			...trackDocument,
			name: 'Other',
			straights: [back, {...front, exit: '89 mph', measured: undefined}, leg],
		};
		expect(compare(trackDocument, other).map(({path}) => path)).toEqual([
			'name',
			'straights.Front.exit',
			'straights.Front.measured.end',
			'straights.Front.measured.rpm',
			'straights.Front.measured.pair',
			'straights.Front.measured.gearbox',
			'straights.Front.measured.gear',
			`straights.${chute!.name}.name`,
			`straights.${chute!.name}.exit`,
			`straights.${chute!.name}.length`,
			`straights.${chute!.name}.grade`,
		]);
	});

	test('shows what only one side has', () => {
		expect(compare({gears: [3, 4]}, {gears: [4, 5], lap: '1 mi'})).toEqual([
			{path: 'gears', a: '[3,4]', b: '[4,5]'},
			{path: 'lap', a: undefined, b: '1 mi'},
		]);
		expect(compare({a: {b: '1'}}, {a: 5})).toEqual([{path: 'a', a: '{"b":"1"}', b: '5'}]);
	});

	test('matches pairs by teeth and dyno points by RPM', () => {
		const car = structuredClone(carDocument);
		car.rack.pairs.shift();
		car.engines[0]!.curve[3]!.torque = '1 N m';
		expect(compare(carDocument, car).map(({path}) => path)).toEqual([
			'engines.Open.curve[4900].torque',
			...['driving', 'driven', 'sets', 'miles', 'maxMiles'].map(field => `rack.pairs.33/38.${field}`),
		]);
	});

	test('is not led astray by the names of what every object has', () => {
		const a = JSON.parse('{"__proto__": {"x": "1"}, "constructor": "c"}');
		expect(compare(a, {})).toEqual([
			{path: '__proto__.x', a: '1', b: undefined},
			{path: 'constructor', a: 'c', b: undefined},
		]);
	});
});
