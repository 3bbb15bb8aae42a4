import {existsSync} from 'node:fs';
import {join} from 'node:path';
import {expect, test} from 'vitest';
import {keptKinds} from '../../source/store/kept-documents.ts';
import {migrate, migrations} from '../../source/store/migrations.ts';
import {readContent, readKept, understood} from '../../source/store/read-kept.ts';

const fixture = (kind: string, version: number) => join(import.meta.dirname, 'fixtures', `${kind}-${version}.json`);
const versionsOf = (kind: keyof typeof migrations) =>
	Array.from({length: migrations[kind].length + 1}, (_, index) => index + 1);
const keptFixtures = keptKinds.flatMap(kind => versionsOf(kind).map(version => ({kind, version})));

/** What every version of the fixtures holds, as it is read today. */
const expected = {
	preset: {
		track: {name: 'Fixture oval', type: 'short', straights: [{name: 'Front', exit: '88 mph', length: '650 ft'}]},
		car: 'Fixture car',
		pair: '33/38',
		gearbox: 'A',
		basedOn: 'Short oval',
		saved: '2026-01-01T12:00:00.000Z',
	},
	'saved-car': {car: {name: 'Fixture car', mass: '3650 lb'}},
	history: {
		track: 'Fixture oval',
		entries: [{date: '2026-01-01', pair: '33/38', gearbox: 'A', highestRpm: 8840, situation: 'In the tow'}],
	},
};

test.each(keptFixtures)('a $kind file of version $version is read as one of today', ({kind, version}) => {
	const answer = readKept(fixture(kind, version), kind);
	expect(answer).toMatchObject({ok: true, value: {document: expected[kind]}});
	expect(answer.ok && answer.value.document.version).toBe(migrations[kind].length + 1);
});

test.each(versionsOf('session'))('a session file of version %i is read as one of today', version => {
	const content = readContent(fixture('session', version));
	expect(content.ok && understood('file', 'session', content.value.value)).toMatchObject({
		ok: true,
		value: {saved: '2026-01-01T12:00:00.000Z', document: {track: 'Fixture oval'}},
	});
});

test('every migration was given the fixture of the version it ends at', () => {
	for (const kind of ['session', ...keptKinds] as const) {
		for (const version of versionsOf(kind)) expect(existsSync(fixture(kind, version)), `${kind} ${version}`).toBe(true);
	}
});

test('steps are taken in order from the version of the file, and only those', () => {
	const steps = [
		({mph, ...rest}: {mph?: unknown}) => ({...rest, speed: `${mph} mph`}),
		({speed, ...rest}: {speed?: unknown}) => ({...rest, speeds: [speed]}),
	];
	const newest = {ok: true, content: {version: 3, speeds: ['88 mph']}};
	expect(migrate({version: 1, mph: 88}, steps)).toEqual(newest);
	expect(migrate({version: 2, speed: '88 mph'}, steps)).toEqual(newest);
	expect(migrate({version: 3, speeds: ['88 mph']}, steps)).toEqual(newest);
	expect(migrate({version: 4}, steps)).toEqual({ok: false, reason: 'newer', newest: 3});
});

test.each([undefined, null, 0, -1, 1.5, '1', Number.NaN, {}])('%j is no version', version => {
	expect(migrate({version}, [])).toEqual({ok: false, reason: 'broken', newest: 1});
});
