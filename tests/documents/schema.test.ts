import {expect, test} from 'vitest';
import {carSchema, trackSchema} from '../../source/documents/schema.ts';
import {carDocument, trackDocument} from './examples.ts';

type Schema = {
	type?: string;
	properties?: Record<string, Schema>;
	items?: Schema;
	required?: string[];
	enum?: string[];
	default?: unknown;
	examples?: unknown[];
	description?: string;
	additionalProperties?: boolean;
	anyOf?: Schema[];
	$schema?: string;
};
const track = trackSchema() as Schema;
const car = carSchema() as Schema;

test('both are draft 2020-12', () => {
	expect([track.$schema, car.$schema]).toEqual(Array(2).fill('https://json-schema.org/draft/2020-12/schema'));
});

test('what a track needs is required, all else is optional', () => {
	expect(track.required).toEqual(['kind', 'version', 'name', 'type', 'straights']);
	expect(track.properties?.straights?.items?.required).toEqual(['name', 'exit']);
});

test('what a car needs is required, all else is optional', () => {
	expect(car.required?.toSorted()).toEqual(
		Object.keys(carDocument())
			.filter(field => field !== 'efficiency') // or efficiencies
			.toSorted(),
	);
});

test('a quantity is text with a description and an example', () => {
	expect(track.properties?.lap).toMatchObject({type: 'string', description: 'Length of a lap.', examples: ['650 ft']});
});

test('defaults are the ones that the reader takes', () => {
	const margins = car.properties?.margins?.properties ?? {};
	expect(Object.fromEntries(Object.entries(margins).map(([field, schema]) => [field, schema.default]))).toEqual({
		limitRpm: 100,
		shiftRpm: 100,
		downshiftRpm: 200,
		cleanRpm: 2500,
		settleStart: '0.6 s',
		settleEnd: '0.5 s',
		sameTime: '0.02 s',
		level: '0.02 s',
	});
	expect(car.properties?.reactionTime?.default).toBe('0.25 s');
});

test('words that are allowed are listed', () => {
	expect(track.properties?.type?.enum).toEqual(['short', 'intermediate', 'superspeedway', 'road']);
});

test('every object is closed, every field is described', () => {
	const walk = (schema: Schema, path: string) => {
		if (schema.type === 'object') expect(schema.additionalProperties, path).toBe(false);
		if (!/\.(\$schema|kind|version)$/.test(path)) expect(schema.description, path).toBeTruthy();
		for (const [field, child] of Object.entries(schema.properties ?? {})) walk(child, `${path}.${field}`);
		if (schema.items) walk(schema.items, `${path}[]`);
	};
	walk(track, 'track');
	walk(car, 'car');
});

test('the fields of the sample documents are all in the schemas', () => {
	expect(Object.keys(track.properties ?? {})).toEqual(expect.arrayContaining(Object.keys(trackDocument())));
	expect(Object.keys(car.properties ?? {})).toEqual(expect.arrayContaining(Object.keys(carDocument())));
});
