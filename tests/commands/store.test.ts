import {mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync} from 'node:fs';
import {tmpdir} from 'node:os';
import {join} from 'node:path';
import {afterEach, beforeEach, expect, test} from 'vitest';
import {answer} from '../../source/commands/main.ts';
import type {Surroundings} from '../../source/commands/surroundings.ts';

const shipped = new URL('../../tracks/', import.meta.url);
let home = '';
let around: Surroundings;
beforeEach(() => {
	home = mkdtempSync(join(tmpdir(), 'droprack-'));
	around = {
		shipped,
		environment: {DROPRACK_HOME: join(home, 'store')},
		now: new Date('2026-05-31T18:00:00Z'),
		columns: 80,
		color: false,
		standardInput: async function* () {
			yield Buffer.from(readFileSync(new URL('quillmere.json', shipped)));
		},
	};
});
afterEach(() => rmSync(home, {recursive: true}));

const run = (...words: string[]) => answer(words, around);
const json = async (...words: string[]) => JSON.parse((await run(...words, '--json')).out);
const tracks = async () =>
	(await json('tracks')).tracks.map(({name, file, from}: Record<string, string>) => [name, file, from].join(', '));
/** A file with the shown document, changed. */
const edited = async (name: string, change: (text: string) => string): Promise<string> => {
	const file = join(home, 'mine.json');
	writeFileSync(file, change((await run('show', name)).out));
	return file;
};
const longer = (text: string) => text.replace('"name": "Quillmere"', '"name": "Quillmere", "lap": "0.9 mi"');
const withoutLap = (text: string) => text.replace(/"lap": *"[^"]*",/, '');

test('a saved copy stands before the shipped track, under all its names, until it is forgotten', async () => {
	const shippedText = (await run('show', 'quillmere')).out;
	const file = await edited('quillmere', text => longer(withoutLap(text)));
	const saved = await run('save', file, '--car', 'demo', '--pair', '33/38', '--notes', 'loose');
	expect(saved).toMatchObject({status: 0, out: '', err: expect.stringMatching(/^droprack: Quillmere is saved in /)});
	const listed: string[] = await tracks();
	expect(listed[0]).toBe('Quillmere, quillmere, saved');
	expect(listed).not.toContain('Quillmere, quillmere, shipped');
	expect((await run('show', 'QUILLMERE')).out).toContain('"lap": "0.9 mi"');
	expect((await run('show', 'quillmere', '--shipped')).out).toBe(shippedText);
	const forgotten = await run('forget', 'quillmere');
	expect(forgotten.err).toMatch(/is forgotten; it stays in .*\.bak\.\n.*the shipped Quillmere is used again/);
	expect((await run('show', 'quillmere')).out).toBe(shippedText);
	expect(await run('forget', 'quillmere')).toMatchObject({status: 2, err: expect.stringMatching(/is shipped/)});
});

test('what was saved does not give way unless it is asked to, and keeps what is not given', async () => {
	await run('save', 'quillmere', '--pair', '33/38', '--notes', 'loose');
	const [base] = readdirSync(join(home, 'store/tracks'));
	const kept = () => JSON.parse(readFileSync(join(home, 'store/tracks', base!), 'utf8'));
	expect((await run('save', 'quillmere')).err).toMatch(/saved already; nothing was changed/);
	const file = await edited('quillmere', text => longer(withoutLap(text)));
	const refused = await run('save', file);
	expect(refused).toMatchObject({
		status: 2,
		err: expect.stringMatching(/differs in: lap\.\n--replace takes the new one/),
	});
	expect(kept().track.lap).not.toBe('0.9 mi');
	expect((await run('save', file, '--replace', '--gearbox', 'A')).status).toBe(0);
	expect(kept()).toMatchObject({
		kind: 'preset',
		version: 1,
		track: {lap: '0.9 mi'},
		pair: '33/38',
		gearbox: 'A',
		notes: 'loose',
		basedOn: 'Quillmere',
		saved: '2026-05-31T18:00:00.000Z',
	});
});

test('only sound documents are saved', async () => {
	const file = await edited('quillmere', text => text.replaceAll('mph', 'furlong'));
	expect(await run('save', file)).toMatchObject({status: 2, err: expect.stringMatching(/mine\.json:\d+:\d+: /)});
	expect(await run('save', 'nowhere')).toMatchObject({status: 2});
	expect(await run('save', 'demo', '--pair', '33/38')).toMatchObject({
		status: 2,
		err: expect.stringMatching(/this is a car/),
	});
	expect(readdirSync(home)).not.toContain('store');
});

test('a track is saved from standard input', async () => {
	expect((await run('save', '-')).status).toBe(0);
	expect(await tracks()).toContain('Quillmere, quillmere, saved');
});

test('a new track and a new car are begun as copies, with names of their own', async () => {
	expect((await run('new', 'track', '--name', 'Half Mile')).err).toMatch(/Half Mile is saved[\s\S]*to change it: /);
	expect((await run('new', 'car', '--name', 'Ours')).status).toBe(0);
	expect((await run('new', 'track', '--name', 'Half Mile')).status).toBe(2);
	expect((await run('new', 'track')).status).toBe(2);
	expect((await run('new', 'engine')).status).toBe(2);
	expect(await tracks()).toContain('Half Mile, half-mile, saved');
	expect((await run('rpm', 'half mile', '--car', 'ours')).out).toMatch(/^Ours /);
	await run('new', 'track', '--name', 'half-mile', '--from', 'half mile');
	expect((await tracks()).filter((track: string) => track.includes('saved'))).toEqual([
		'half-mile, half-mile, saved',
		expect.stringMatching(/^Half Mile, half-mile_[0-9a-f]{16}, saved$/),
	]);
});

test('the car that was saved with a track is used there', async () => {
	await run('new', 'car', '--name', 'Ours');
	await run('save', 'quillmere', '--car', 'ours');
	expect((await run('rpm', 'quillmere')).out).toMatch(/^Ours /);
	await run('forget', 'Ours');
	expect(await run('rpm', 'quillmere')).toMatchObject({
		status: 2,
		err: expect.stringMatching(/no car called Ours[\s\S]*saved with the track; --car names another/),
	});
	expect((await run('check')).out.replace(/\s+/g, ' ')).toMatch(/there is no car called Ours\. Save one/);
});

test('entries are added with the pair, set and air that were saved, and listed latest first', async () => {
	await run('save', 'quillmere', '--pair', '33/38', '--gearbox', 'A');
	expect((await run('history', 'quillmere')).out).toMatch(/nothing is kept of it yet/);
	await run(
		'history',
		'quillmere',
		'--add',
		'--rpm',
		'8840',
		'--session',
		'practice 1',
		'--remark',
		'loose off turn two',
	);
	await run(
		'history',
		'quillmere',
		'--add',
		'--date',
		'2026-06-01',
		'--rpm',
		'8900',
		'--pair',
		'34/38',
		'--at',
		'Front end',
	);
	const {track, entries} = await json('history', 'quillmere');
	expect(track).toBe('Quillmere');
	expect(entries).toMatchObject([
		{session: 'practice 1', pair: '33/38', gearbox: 'A', highestRpm: 8840, air: {temperature: expect.any(String)}},
		{date: '2026-06-01', pair: '34/38', gearbox: 'A', highestRpm: 8900, at: 'Front end'},
	]);
	const {out} = await run('history', 'quillmere');
	expect(out.indexOf('8900')).toBeLessThan(out.indexOf('8840'));
	expect(out).toContain('practice 1: loose off turn two');
	const shortened = (await run('history', 'quillmere', '--top', '1')).out;
	expect(shortened).toMatch(/8900[\s\S]*and 1 earlier; --top N shows more/);
	expect(shortened).not.toContain('8840');
});

test.each([
	[['--rpm', '8840'], /--rpm goes with --add/],
	[['--add'], /--add needs what was seen/],
	[['--add', '--rpm', 'fast'], /--rpm is a whole number/],
	[['--add', '--rpm', '88400'], /--rpm is RPM up to 30000, found 88400/],
	[['--add', '--date', '2026-02-30'], /--date is a day/],
])('history %j is refused', async (words, message) => {
	expect(await run('history', 'quillmere', ...words)).toMatchObject({status: 2, err: expect.stringMatching(message)});
});

test('the history of a track that was forgotten can still be had', async () => {
	await run('new', 'track', '--name', 'Old Mile');
	await run('history', 'Old Mile', '--add', '--rpm', '8840');
	await run('forget', 'old mile');
	expect((await run('history', 'old mile')).out).toMatch(/^Old Mile\n/);
});

test('a broken file is named beside every listing and by check, and the rest works', async () => {
	await run('new', 'track', '--name', 'Half Mile');
	const file = join(home, 'store/tracks/bad.json');
	writeFileSync(file, '{');
	const note = `droprack: ${file}: not valid JSON. Left as it is: mend it or move it away.\n`;
	expect(await run('tracks')).toMatchObject({status: 0, out: expect.stringMatching(/Half Mile/), err: note});
	expect(await run('show', 'half mile')).toMatchObject({status: 0, err: note});
	expect(await run('rpm', 'half mile')).toMatchObject({status: 0, err: note});
	expect((await json('check')).findings).toEqual([{file, message: expect.stringMatching(/not valid JSON/)}]);
	expect((await run('check')).status).toBe(0);
	expect((await run('check', '--strict')).status).toBe(1);
});

test('check reads the saved documents too', async () => {
	await run('new', 'track', '--name', 'half-mile');
	const file = join(home, 'store/tracks/half-mile.json');
	expect((await run('check')).out).toMatch(/^Nothing is wrong in /);
	writeFileSync(file, readFileSync(file, 'utf8').replaceAll('mph', 'furlong'));
	expect((await json('check')).findings[0]).toMatchObject({
		file,
		message: expect.stringMatching(/straights\[0\]\.exit/),
	});
});

test('a store travels through a directory: exported, imported elsewhere, nothing written over unasked', async () => {
	await run('save', 'quillmere', '--notes', 'ours');
	await run('history', 'quillmere', '--add', '--rpm', '8840');
	const team = join(home, 'team');
	expect((await run('export', team)).out).toMatch(/2 written, 0 as they were/);
	expect((await json('export', team)).same).toHaveLength(2);
	around = {...around, environment: {DROPRACK_HOME: join(home, 'other')}};
	await run('save', 'quillmere', '--notes', 'theirs');
	const states = async (...words: string[]) =>
		(await json('import', team, ...words)).imported.map(({kind, state}: Record<string, string>) => `${kind} ${state}`);
	expect(await states()).toEqual(['track changed', 'history new']);
	expect((await run('import', team)).err).toMatch(/1 differ from what is saved, which stays; --replace/);
	expect(await states('--replace')).toEqual(['track replaced', 'history same']);
	expect(await states()).toEqual(['track same', 'history same']);
	writeFileSync(join(team, 'unsound.json'), '{"kind": "track", "version": 1, "name": "x", "type": "short"}');
	expect((await run('import', team)).err).toMatch(/unsound\.json: the track is not sound: straights: found nothing/);
});

test('a store that cannot be written is status 3, with what to do', async () => {
	writeFileSync(join(home, 'file'), '');
	around = {...around, environment: {DROPRACK_HOME: join(home, 'file')}};
	for (const words of [
		['save', 'quillmere'],
		['new', 'car', '--name', 'Ours'],
		['history', 'quillmere', '--add', '--rpm', '8840'],
	]) {
		expect(await run(...words)).toMatchObject({status: 3, out: '', err: expect.stringMatching(/set DROPRACK_HOME/)});
	}
	around = {...around, environment: {DROPRACK_HOME: join(home, 'store')}};
	expect(await run('export', join(home, 'file'))).toMatchObject({status: 3});
	expect(await run('import', join(home, 'nowhere'))).toMatchObject({status: 3});
	expect((await run('export')).status).toBe(2);
	expect((await run('import')).status).toBe(2);
});

test('hostile names neither leave the store nor reach the terminal', async () => {
	const name = '../../\u001b[2J\u202eout';
	const {status, err} = await run('new', 'track', '--name', name);
	expect(status).toBe(0);
	const shownAll = err + (await run('tracks')).out + (await run('forget', name)).err;
	expect(shownAll.replaceAll('\n', '')).not.toMatch(/[\p{Cc}\u202e]/u);
	expect(readdirSync(home)).toEqual(['store']);
	expect(readdirSync(join(home, 'store'))).toEqual(['tracks']);
});
