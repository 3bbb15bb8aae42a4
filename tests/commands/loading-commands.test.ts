import {mkdtempSync, readFileSync, rmSync, writeFileSync} from 'node:fs';
import {tmpdir} from 'node:os';
import {join} from 'node:path';
import {Readable} from 'node:stream';
import {afterAll, describe, expect, test} from 'vitest';
import {answer} from '../../source/commands/main.ts';
import {fixture} from './program.ts';

const place = mkdtempSync(join(tmpdir(), 'droprack-loading-'));
afterAll(() => rmSync(place, {recursive: true}));

const ask = (words: string[], input = '') =>
	answer(words, {
		shipped: new URL('../../tracks/', import.meta.url),
		environment: {DROPRACK_HOME: join(place, 'home')},
		now: new Date('2026-03-14T12:00:00Z'),
		columns: 100,
		color: false,
		standardInput: () => Readable.from([Buffer.from(input)]),
	});

const json = async (words: string[]) => JSON.parse((await ask([...words, '--json'])).out);

describe('droprack load', () => {
	test('prints the pairs to carry, each with its reason, and every track', async () => {
		const {status, out} = await ask(['load', 'tarrowdale', 'cullamere']);
		expect(status).toBe(0);
		expect(out).toMatch(
			/^Redpoll 3 · 2026-03-14 · load list\n3 pairs for 2 tracks, with 1 step shorter and 1 taller\n/,
		);
		expect(out).toContain('34/35  Best at Tarrowdale and Cullamere.');
		expect(out).toMatch(/^Tarrowdale +34\/34 +34\/35 C +33\/35/m);
	});

	test('gives the same for programs, with the steps that are asked for', async () => {
		const list = await json(['load', 'tarrowdale', 'cullamere', '--shorter', '2', '--taller', '0', '--within', '0.01']);
		expect(list).toMatchObject({car: 'Redpoll 3', shorter: 2, taller: 0, withinS: 0.01, stepRatio: 0.005});
		expect(list.pairs.map(({pair}: {pair: string}) => pair)).toEqual(['34/35', '33/35', '33/36']);
		expect(list.tracks[0]).toMatchObject({track: 'Tarrowdale', taller: [], shorter: ['33/35', '33/36']});
	});

	test('refuses steps and margins that are none', async () => {
		expect((await ask(['load', 'tarrowdale', '--shorter', '6'])).err).toContain(
			'--shorter is a whole number from 0 to 5',
		);
		expect((await ask(['load', 'tarrowdale', '--within', 'x'])).err).toContain('--within is seconds from 0 to 10');
		expect((await ask(['load', 'tarrowdale', '--step', '-1'])).err).toContain('--step');
		expect((await ask(['load', 'tarrowdale', '--gearbox', 'Z'])).err).toContain('one of A, B, C');
	});

	test('without a track it says which there are, and one that is named twice counts once', async () => {
		expect((await ask(['load'])).err).toContain('which TRACK?');
		expect((await json(['load', 'tarrowdale', 'tarrowdale'])).tracks).toHaveLength(1);
	});

	test('tracks of the same name are told apart by the word that they were asked for by', async () => {
		const file = join(place, 'friday.json');
		writeFileSync(file, readFileSync(new URL('../../tracks/tarrowdale.json', import.meta.url)));
		const {tracks} = await json(['load', 'tarrowdale', file]);
		expect(tracks.map(({track}: {track: string}) => track)).toEqual([
			'Tarrowdale (tarrowdale)',
			`Tarrowdale (${file})`,
		]);
	});

	test('tracks that were saved with different cars need one to be named', async () => {
		const track = JSON.parse(readFileSync(new URL('../../tracks/tarrowdale.json', import.meta.url), 'utf8'));
		const saved = async (name: string, car: string) => {
			const file = join(place, `${name}.json`);
			writeFileSync(file, JSON.stringify({...track, name}));
			expect((await ask(['save', file, '--car', car])).status).toBe(0);
		};
		const other = join(place, 'other-car.json');
		const demo = readFileSync(new URL('../../tracks/cars/demo.json', import.meta.url), 'utf8');
		writeFileSync(other, JSON.stringify({...JSON.parse(demo), name: 'Other'}));
		await ask(['save', other]);
		await saved('Alpha', 'demo');
		await saved('Beta', 'Other');
		const {status, err} = await ask(['load', 'Alpha', 'Beta']);
		expect(status).toBe(2);
		expect(err).toMatch(/saved with different cars: .*Other.*--car says which/);
		expect((await ask(['load', 'Alpha', 'Beta', '--car', 'demo'])).status).toBe(0);
	});

	test('everything that is wrong with any track is told', async () => {
		const {status, err} = await ask(['load', 'nowhere', 'tarrowdal', '-'], '{"kind": "car"}');
		expect(status).toBe(2);
		expect(err).toMatch(/nowhere[\s\S]*tarrowdal[\s\S]*found "car"/);
	});

	test('with --strict it ends with 1 where something is short', async () => {
		expect((await ask(['load', 'tarrowdale', 'cullamere', '--strict'])).status).toBe(1);
	});
});

describe('droprack gearbox', () => {
	test('prints the best set and pair, the next best, the overlap and every check', async () => {
		const {status, out} = await ask(['gearbox', 'cullamere']);
		expect(status).toBe(0);
		expect(out).toMatch(/^Redpoll 3 · 2026-03-14 · gears to build\n\d+ sets of the inventory go together/);
		expect(out).toMatch(/^ +2\.620 1\.930 1\.520 1\.220 1\.000 +A +34\/35 +6\.327 +0\.000 +5 +0 +pass/m);
		expect(out).toMatch(/^ +4-5 +1\.220 +8750 +7172 +\+585 +no/m);
		expect(out).toMatch(/^RPM limit +pass/m);
	});

	test('with --together it has one set for all, and what it costs at each', async () => {
		const {common, tracks} = await json(['gearbox', 'cullamere', 'tarrowdale', '--together', '--top', '2']);
		expect(common).toHaveLength(2);
		expect(common[0].tracks.map(({track}: {track: string}) => track)).toEqual(['Cullamere', 'Tarrowdale']);
		const best = tracks.map(({rows}: {rows: {fastestS: number}[]}) => rows[0]!.fastestS);
		expect(common[0].totalS).toBeGreaterThanOrEqual(best[0] + best[1] - 1e-9);
		expect(common[1].behindS).toBeGreaterThan(0);
	});

	test('with a pair it takes only that one, and refuses one that is not on the rack', async () => {
		const {tracks} = await json(['gearbox', 'cullamere', '--pair', '34/34']);
		expect(tracks[0].rows[0].pair).toBe('34/34');
		expect((await ask(['gearbox', 'cullamere', '--pair', '1/2'])).err).toContain('a pair on the rack');
	});

	test('a car without single gears is told what is missing', async () => {
		const {status, err} = await ask(['gearbox', fixture('oval.json'), '--car', fixture('car.json')]);
		expect(status).toBe(2);
		expect(err).toContain('gearInventory: found no single gears');
	});
});
