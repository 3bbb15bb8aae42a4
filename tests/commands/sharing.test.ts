import {mkdtempSync, readFileSync, rmSync, writeFileSync} from 'node:fs';
import {tmpdir} from 'node:os';
import {join} from 'node:path';
import {Readable} from 'node:stream';
import {afterAll, beforeAll, describe, expect, test} from 'vitest';
import {answer} from '../../source/commands/main.ts';
import type {Surroundings} from '../../source/commands/surroundings.ts';
import {fixture} from './program.ts';

const place = mkdtempSync(join(tmpdir(), 'droprack-sharing-'));
afterAll(() => rmSync(place, {recursive: true}));

const around = (input = '', change: Partial<Surroundings> = {}): Surroundings => ({
	shipped: new URL('../../tracks/', import.meta.url),
	environment: {DROPRACK_HOME: join(place, 'home')},
	now: new Date('2026-03-14T12:00:00Z'),
	columns: 100,
	color: false,
	standardInput: () => Readable.from([Buffer.from(input)]),
	...change,
});
const oval = ['--car', fixture('car.json')];
const ask = (words: string[], input?: string, change?: Partial<Surroundings>) => answer(words, around(input, change));

let plan = '';
let planFile = '';
beforeAll(async () => {
	plan = (await ask(['share', fixture('oval.json'), ...oval, '--notes', 'Oil, twice'])).out;
	planFile = join(place, 'plan.txt');
	writeFileSync(planFile, plan);
});

describe('droprack share', () => {
	test('prints the plan as text for a message', () => {
		expect(plan).toMatch(/^DROPRACK PLAN 1: date 2026-03-14T12:00:00Z, pair /);
		expect(plan).toContain('Notes: Oil, twice [');
		expect(plan).toMatch(/\nCheck: \d+ entries, code [0-9a-f]{8}\n$/);
	});

	test('says of a plan that fails a check that it does, and why, beside the plan; so does reading it', async () => {
		expect((await ask(['share', fixture('oval.json'), ...oval])).err).not.toContain('FAILS');
		const {out, err} = await ask(['share', 'tarrowdale']);
		expect(err).toMatch(/^droprack: 33\/35 A FAILS a check\. Over the limit: /);
		const read = await ask(['read', '-'], out);
		expect(read.out).toContain('The plan FAILS a check. Over the limit: ');
		expect((await ask(['read', '-'], plan)).out).not.toContain('FAILS');
	});

	test('and a card say where another pair is saved for the track than the installed one that they are of', async () => {
		const told = /This is 33\/35 A, as installed; --pair 34\/35 --gearbox C, as saved for Tarrowdale, is another\./;
		const own = {environment: {DROPRACK_HOME: join(place, 'planned')}};
		const shown = (await ask(['show', 'tarrowdale'], '', own)).out;
		await ask(['save', '-', '--pair', '34/35', '--gearbox', 'C'], shown, own);
		expect((await ask(['share', 'tarrowdale'], '', own)).err).toMatch(told);
		expect((await ask(['card', 'driver', 'tarrowdale'], '', own)).err).toMatch(told);
		const given = ['card', 'driver', 'tarrowdale', '--pair', '34/35', '--gearbox', 'C'];
		expect((await ask(given, '', own)).err).toBe('');
	});

	test('prints one line, the JSON, or a QR code', async () => {
		const short = await ask(['share', fixture('oval.json'), ...oval, '--short']);
		expect(short.out).toMatch(/^DR1 Fixture Oval short: .*: [0-9a-f]{8}\n$/);
		const json = await ask(['share', fixture('oval.json'), ...oval, '--json']);
		expect(JSON.parse(json.out)).toMatchObject({kind: 'plan', version: 1, track: {name: 'Fixture Oval'}});
		const qr = await ask(['share', fixture('oval.json'), ...oval, '--qr']);
		expect(qr.out.split('\n').length).toBeLessThanOrEqual(51);
		expect(qr.out.startsWith('\u001b[38;5;16;48;5;231m')).toBe(true);
	});

	test('says what window a QR code needs and offers the short form, which fits', async () => {
		const window = {columns: 80, rows: 24};
		const long = await ask(['share', fixture('oval.json'), ...oval, '--qr'], '', window);
		expect(long).toMatchObject({status: 2, out: ''});
		expect(long.err).toMatch(/needs a window of \d+ x \d+ characters; this one has 80 x 24\. --short --qr/);
		const short = await ask(['share', fixture('oval.json'), ...oval, '--qr', '--short'], '', window);
		expect(short.status).toBe(0);
		expect(short.out.trimEnd().split('\n').length).toBeLessThanOrEqual(24);
	});

	test('sends the text to the clipboard beside printing it', async () => {
		const {out, err} = await ask(['share', fixture('oval.json'), ...oval, '--notes', 'Oil, twice', '--copy']);
		expect(out).toBe(plan);
		// biome-ignore lint/suspicious/noControlCharactersInRegex: the bytes are the claim
		const [, base64] = /^\u001b\]52;c;([^\u0007]*)\u0007/.exec(err) ?? [];
		expect(Buffer.from(base64 ?? '', 'base64').toString()).toBe(plan);
		expect(err).toContain("sent to the terminal's clipboard");
	});
});

describe('droprack read', () => {
	test('computes a plan again, says what agrees, and takes nothing over', async () => {
		const {status, out} = await ask(['read', planFile]);
		expect(status).toBe(0);
		expect(out).toMatch(/Computed again: all \d+ numbers agree\./);
		expect(out).toContain('You have no track called Fixture Oval.');
		expect(out).toContain('Nothing was taken over.');
	});

	test('shows what differs from the track and the car that the reader has', async () => {
		const shared = (await ask(['share', 'tarrowdale'])).out;
		expect((await ask(['read', '-'], shared)).out).toMatch(
			/Your track Tarrowdale says the same[\s\S]*Your car .* says the same/,
		);
		const track = JSON.parse(readFileSync(new URL('../../tracks/tarrowdale.json', import.meta.url), 'utf8'));
		track.straights[0].exit = '161 mph';
		const file = join(place, 'tarrowdale.json');
		writeFileSync(file, JSON.stringify(track));
		const changed = (await ask(['share', file])).out;
		const {out} = await ask(['read', '-'], changed);
		expect(out).toContain('Your track Tarrowdale differs:');
		expect(out).toMatch(/straights\.Front\.exit +160 mph +161 mph/);
	});

	test('shows a stated number that the computation does not give', async () => {
		const {out} = await ask(['share', fixture('oval.json'), ...oval, '--json']);
		const lying = JSON.parse(out);
		lying.results.highest[0].rpm += 100;
		const {out: told} = await ask(['read', '-'], JSON.stringify(lying));
		expect(told).toMatch(/1 of \d+ numbers DIFFER/);
		expect(told).toMatch(/highest RPM, Base +\d+ +\d+ +DIFFERS/);
	});

	test('names the line of a damaged plan', async () => {
		const damaged = plan.replace('type short', 'type shirt');
		const {status, err} = await ask(['read', '-'], damaged);
		expect(status).toBe(2);
		expect(err).toMatch(/^standard input:\d+: Track Fixture Oval: found ".*which does not match its check/);
	});

	test('takes over nothing unless asked; then the track with pair, set and notes, and what differs only with --replace', async () => {
		const environment = {DROPRACK_HOME: join(place, 'taking')};
		const taking = (words: string[], input = '') => ask(['read', '-', ...words], input, {environment});
		const shown = () => ask(['show', 'Fixture Oval'], '', {environment});
		expect((await ask(['read', planFile], '', {environment})).out).toContain('Nothing was taken over.');
		expect((await shown()).status).toBe(2);

		const taken = await taking(['--take'], plan);
		expect(taken.out).toContain('The track is kept with this pair and set.');
		expect(taken.err).toContain('Fixture Oval is saved in ');
		const kept = JSON.parse((await shown()).out);
		expect(kept).toEqual(JSON.parse(readFileSync(fixture('oval.json'), 'utf8')));

		const faster = {...kept, straights: [{...kept.straights[0], exit: '70 mph'}, ...kept.straights.slice(1)]};
		const other = await ask(['share', '-', ...oval], JSON.stringify(faster));
		const refused = await taking(['--take'], other.out);
		expect(refused).toMatchObject({status: 2, out: ''});
		expect(refused.err).toContain('Fixture Oval is saved already and differs in: straights.');
		expect(JSON.parse((await shown()).out)).toEqual(kept);
		expect((await taking(['--take', '--replace'], other.out)).status).toBe(0);
		expect(JSON.parse((await shown()).out)).toEqual(faster);
	});

	test('takes over no short form', async () => {
		const {out: short} = await ask(['share', fixture('oval.json'), ...oval, '--short']);
		expect(await ask(['read', '-', '--take'], short)).toMatchObject({status: 2, out: ''});
	});

	test('reads the short form, and JSON for programs', async () => {
		const short = (await ask(['share', fixture('oval.json'), ...oval, '--short'])).out;
		expect((await ask(['read', '-'], short)).out).toContain('Fixture Oval · short');
		const {plan: read, numbers, differences} = JSON.parse((await ask(['read', planFile, '--json'])).out);
		expect(read).toMatchObject({kind: 'plan', notes: 'Oil, twice'});
		expect(numbers.every(({agrees}: {agrees: boolean}) => agrees)).toBe(true);
		expect(differences).toEqual({});
	});
});

describe('droprack card', () => {
	test.each([
		['driver', 'DRIVER CARD', 'NEVER above'],
		['swap', 'SWAP SHEET', 'Swapped by'],
		['engine', "ENGINE BUILDER'S SHEET", 'Highest RPM, and where'],
	])('%s prints the card', async (whom, title, content) => {
		const {status, out} = await ask(['card', whom, fixture('oval.json'), ...oval]);
		expect({status, title: out.split('\n')[0]}).toEqual({status: 0, title});
		expect(out).toContain(content);
		expect(out).toContain('Day 2026-03-14');
	});

	test('without a person or a track says what is needed', async () => {
		expect((await ask(['card', 'driver'])).err).toContain('driver, swap or engine, then a track');
		expect((await ask(['card', 'boss', 'tarrowdale'])).err).toContain('Found boss.');
		expect((await ask(['card', 'driver', 'tarrowdale', 'more'])).err).toContain('found also: more');
	});
});

describe('droprack compare', () => {
	test('lists differences only, units aside, and sets a plan beside a track', async () => {
		const track = JSON.parse(readFileSync(fixture('oval.json'), 'utf8'));
		track.name = 'Other Oval';
		const other = join(place, 'other.json');
		writeFileSync(other, JSON.stringify(track));
		const {out} = await ask(['compare', fixture('oval.json'), other]);
		expect(out.trim().split('\n').at(-1)).toMatch(/^ *name +Fixture Oval +Other Oval$/);
		const beside = await ask(['compare', planFile, other, '--json']);
		expect(JSON.parse(beside.out).differences).toEqual([{path: 'name', a: 'Fixture Oval', b: 'Other Oval'}]);
		expect((await ask(['compare', planFile, planFile])).out).toContain('They say the same.');
	});

	test('refuses what cannot be compared', async () => {
		expect(await ask(['compare', 'tarrowdale', fixture('car.json')])).toMatchObject({status: 2, out: ''});
		expect((await ask(['compare', 'tarrowdale'])).err).toContain('which A and which B?');
		expect((await ask(['compare', '-', '-'])).err).toContain('only one document can be standard input');
	});
});
