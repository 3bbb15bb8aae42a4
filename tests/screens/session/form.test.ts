import {expect, test} from 'vitest';
import {type JsonObject, valueAt} from '../../../source/documents/json.ts';
import type {Form} from '../../../source/screens/session/form.ts';
import {fieldAt, formFor, inside} from '../../../source/screens/session/forms.ts';
import {car, fixture, oval} from './documents.ts';

const titles = (form: Form) => form.map(({title}) => title);
const section = (form: Form, title: string) => form.find(one => one.title === title)!;
const labels = (form: Form, title: string) => section(form, title).rows.map(row => row[0]!.label);

const track = formFor('track', oval.json);
const whole = formFor('car', car.json);

test('a track has a section for itself, for each entry of its lists and for each group', () => {
	expect(titles(track)).toEqual([
		'track',
		'straight Front',
		'straight Back',
		'situation In the tow',
		'air',
		'wind',
		'pit road',
		'restart',
		'rules',
		'car',
	]);
});

test('lists of a few columns are tables', () => {
	expect(section(whole, 'pairs').heads).toEqual(['driving', 'driven', 'sets', 'miles', 'max miles']);
	expect(section(whole, 'pairs').rows.map(row => row.slice(0, 2).map(({value}) => value))).toEqual([
		[37, 34],
		[36, 35],
		[36, 36],
		[35, 36],
		[34, 37],
	]);
	expect(section(whole, 'engine Fixture Engine: curve').heads).toEqual(['rpm', 'torque']);
	expect(section(whole, 'gearboxes').rows[1]!.map(({value}) => value)).toEqual(['B', [2.7, 1.9, 1.48, 1.2, 1]]);
});

test('a group inside an entry is among its fields', () => {
	expect(labels(track, 'straight Front')).toContain('measured end');
	expect(labels(track, 'situation In the tow')).toContain('air temperature');
	expect(labels(track, 'car')).toContain('tires left');
});

test('every value of a document can be reached, but for what says what kind it is', () => {
	const reach = (form: Form) => new Set(form.flatMap(({rows}) => rows.flat().map(({path}) => JSON.stringify(path))));
	const leaves = (value: unknown, path: (string | number)[]): string[] => {
		const isGroup =
			typeof value === 'object' && value !== null && !(Array.isArray(value) && typeof value[0] !== 'object');
		if (!isGroup) return [JSON.stringify(path)];
		return Object.entries(value).flatMap(([key, inner]) =>
			leaves(inner, [...path, Array.isArray(value) ? Number(key) : key]),
		);
	};
	const missing = (form: Form, json: JsonObject) => leaves(json, []).filter(path => !reach(form).has(path));
	const heads = ['["kind"]', '["version"]'];
	expect(missing(track, oval.json)).toEqual(heads);
	expect(missing(whole, car.json)).toEqual(heads);
});

test('a field knows what it takes, whether it is needed, and what holds unless given', () => {
	const exit = section(track, 'straight Front').rows.find(([field]) => field!.label === 'exit')![0]!;
	expect(exit).toMatchObject({
		path: ['straights', 0, 'exit'],
		needed: true,
		value: '76 mph',
		kind: {is: 'quantity', dimensions: ['speed'], change: false},
	});
	const drag = section(track, 'situation In the tow').rows.find(([field]) => field!.label === 'drag')![0]!;
	expect(drag.kind).toEqual({is: 'quantity', dimensions: ['area', 'share'], change: true});
	const share = section(whole, 'car').rows.find(([field]) => field!.label === 'rear downforce share')![0]!;
	expect(share).toMatchObject({needed: false, unlessGiven: 0.5, value: undefined});
});

test('each kind of field is found', () => {
	const kind = (form: Form, path: string) =>
		form.flatMap(({rows}) => rows.flat()).find(field => field.path.join('.') === path)?.kind;
	expect(kind(track, 'type')).toEqual({is: 'choice', among: ['short', 'intermediate', 'superspeedway', 'road']});
	expect(kind(track, 'gears')).toEqual({is: 'list', of: {is: 'number'}});
	expect(kind(track, 'situations.0.grip')).toEqual({is: 'quantity', dimensions: ['number', 'share'], change: true});
	expect(kind(track, 'situations.0.power')).toEqual({is: 'quantity', dimensions: ['power', 'share'], change: true});
	expect(kind(track, 'straights.0.measured.pair')).toEqual({is: 'text'});
	expect(kind(whole, 'rack.eitherShaft')).toEqual({is: 'flag'});
	expect(kind(whole, 'engines.0.inertia')).toEqual({is: 'quantity', dimensions: ['inertia'], change: false});
});

test('a list with nothing in it has a section in which one can be added', () => {
	const form = formFor('track', {...fixture('oval'), situations: []});
	expect(section(form, 'situations')).toMatchObject({rows: [], list: {path: ['situations'], entry: 'rows'}});
});

test('a place that the form does not have becomes the nearest one', () => {
	expect(inside(track, {section: 99, row: 99, column: 9})).toEqual({section: 9, row: 11, column: 0});
	expect(inside(track, {section: 1, row: -4, column: -1})).toEqual({section: 1, row: 0, column: 0});
	expect(fieldAt(track, {section: 1, row: 1, column: 0})?.label).toBe('exit');
	expect(valueAt(oval.json, fieldAt(track, {section: 1, row: 1, column: 0})!.path)).toBe('76 mph');
});
