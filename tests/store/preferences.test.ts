import {existsSync, mkdtempSync, readFileSync, rmSync, writeFileSync} from 'node:fs';
import {tmpdir} from 'node:os';
import {join} from 'node:path';
import {afterEach, beforeEach, expect, test} from 'vitest';
import {
	preferCar,
	preferencesFile,
	readPreferences,
	rememberColumns,
	rememberTrack,
} from '../../source/store/preferences.ts';

let home = '';
beforeEach(() => {
	home = mkdtempSync(join(tmpdir(), 'droprack-'));
});
afterEach(() => rmSync(home, {recursive: true}));

test('without a file there is no preference', () => {
	expect(readPreferences(join(home, 'none'))).toEqual({ok: true, value: {}});
});

test('a preferred car is kept, replaced and forgotten', async () => {
	expect(await preferCar(home, 'First')).toEqual({ok: true});
	expect(readPreferences(home)).toEqual({ok: true, value: {car: 'First'}});
	await preferCar(home, 'Second.with.dots');
	expect(readPreferences(home)).toEqual({ok: true, value: {car: 'Second.with.dots'}});
	await preferCar(home, undefined);
	expect(readPreferences(home)).toEqual({ok: true, value: {}});
});

test('how the logs of a car are read is remembered beside it', async () => {
	const columns = {speed: {header: 'GPS Speed', unit: 'mph'}, brake: {header: null}};
	await preferCar(home, 'First');
	expect(await rememberColumns(home, 'First', columns)).toEqual({ok: true});
	await preferCar(home, undefined);
	expect(readPreferences(home)).toEqual({ok: true, value: {logColumns: {First: columns}}});
	await rememberColumns(home, 'Second', {rpm: {header: 'n'}});
	const {value} = readPreferences(home) as {value: {logColumns: object}};
	expect(Object.keys(value.logColumns)).toEqual(['First', 'Second']);
});

test('the track that the screen was left at is remembered beside it, and passed over where it is no name', async () => {
	await preferCar(home, 'First');
	expect(await rememberTrack(home, 'oval')).toEqual({ok: true});
	expect(readPreferences(home)).toEqual({ok: true, value: {car: 'First', track: 'oval'}});
	writeFileSync(preferencesFile(home), '{"version": 1, "track": 3}');
	expect(readPreferences(home)).toEqual({ok: true, value: {}});
});

test('a log that needed nothing to be asked leaves no file', async () => {
	expect(await rememberColumns(home, 'First', {})).toEqual({ok: true});
	expect(existsSync(preferencesFile(home))).toBe(false);
});

test('columns that somebody has spoiled by hand are passed over', () => {
	const logColumns = {First: {speed: 3}, Second: {rpm: {header: 'n'}}};
	writeFileSync(preferencesFile(home), JSON.stringify({version: 1, car: 'First', logColumns}));
	expect(readPreferences(home)).toEqual({ok: true, value: {car: 'First', logColumns: {Second: {rpm: {header: 'n'}}}}});
});

test('the first version of the file is read for ever', () => {
	writeFileSync(preferencesFile(home), '{"version": 1, "car": "First"}');
	expect(readPreferences(home)).toEqual({ok: true, value: {car: 'First'}});
});

test.each([
	['broken JSON', '{"car": ', /not valid JSON/],
	['an empty file', '', /not valid JSON/],
	['null', 'null', /not an object/],
	['a list', '["First"]', /not an object/],
	['a later version', '{"version": 2}', /version 2, expected 1/],
	['a number for the car', '{"version": 1, "car": 3}', /preferred car is not a name/],
])('%s is named and left as it is, by reading and by writing', async (_, content, message) => {
	writeFileSync(preferencesFile(home), content);
	const broken = {ok: false, reason: 'broken', message: expect.stringMatching(message)};
	expect(readPreferences(home)).toEqual(broken);
	expect(await preferCar(home, 'First')).toEqual(broken);
	expect(readFileSync(preferencesFile(home), 'utf8')).toBe(content);
});

test('a home that cannot be made is a failure with a code', async () => {
	writeFileSync(join(home, 'file'), '');
	expect(await preferCar(join(home, 'file', 'home'), 'First')).toMatchObject({
		ok: false,
		reason: 'unreachable',
		message: expect.stringMatching(/ENOTDIR|EEXIST/),
	});
});
