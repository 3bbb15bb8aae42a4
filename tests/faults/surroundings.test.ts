/** What the program finds around it when it starts: no locale, no home, no place for temporary files, another clock. */
import {chmodSync, existsSync, mkdirSync, readdirSync, readFileSync, rmSync} from 'node:fs';
import {join} from 'node:path';
import {afterAll, beforeEach, describe, expect, test} from 'vitest';
import {asNobody, makeProgram, type Run} from '../commands/program.ts';

const program = makeProgram();
afterAll(program.remove);
beforeEach(() => rmSync(program.home, {recursive: true, force: true}));

/** Runs it, and wants it done. */
const done = async (words: string[], how: Run = {}): Promise<string> => {
	const {status, out, err} = await program.run(words, how);
	expect({status, err}).toEqual({status: 0, err: ''});
	return out;
};
const inEnvironment = (env: Record<string, string>): Run => ({spawn: {env: {DROPRACK_HOME: program.home, ...env}}});

describe('without a locale, or in any', () => {
	const asked = [
		['rank', 'fixture oval'],
		['run', 'FIXTURE OVAL', '--units', 'metric'],
	];
	const answers = (how: Run) => Promise.all(asked.map(words => done(words, how)));

	test.each([
		['nothing in the environment at all', {}],
		['C', {LC_ALL: 'C', LANG: 'C'}],
		['one with a decimal comma', {LC_ALL: 'de_DE.UTF-8'}],
		['one with an i without a dot', {LC_ALL: 'tr_TR.UTF-8'}],
	])('%s: every answer has the same bytes', async (_, env) => {
		expect(await answers(inEnvironment(env))).toEqual(await answers({}));
	});

	test('--ascii is for terminals that show nothing else', async () => {
		expect(await done(['rank', 'fixture oval', '--ascii'], inEnvironment({LC_ALL: 'C'}))).toMatch(/^[\x20-\x7e\n]*$/);
	});
});

describe('without a place for temporary files', () => {
	test.each(['/nonexistent', '/dev/null'])('TMPDIR=%s: it answers and saves as ever', async TMPDIR => {
		const how = {environment: {TMPDIR, TMP: TMPDIR, TEMP: TMPDIR}};
		expect(await done(['rank', 'fixture oval'], how)).toContain('10 choices ranked');
		const saved = await program.run(['save', 'fixture oval', '--notes', 'kept'], how);
		expect(saved).toMatchObject({status: 0});
		expect(readdirSync(join(program.home, 'tracks'))).toEqual([expect.stringMatching(/^fixture-oval_\w+\.json$/)]);
	});
});

test('a home directory that cannot be written: rankings go on, and a save says so with status 3', async () => {
	mkdirSync(program.home);
	chmodSync(program.home, 0o555);
	const how = {spawn: asNobody};
	expect(await done(['rank', 'fixture oval'], how)).toContain('10 choices ranked');
	const saved = await program.run(['save', 'fixture oval'], how);
	expect(saved).toMatchObject({
		status: 3,
		out: '',
		err: expect.stringMatching(/no permission \(EACCES\).*DROPRACK_HOME/),
	});
});

describe('a clock that jumps back', () => {
	/** Node with a clock that shows so many milliseconds, whatever the time. */
	const at = (time: string): Run => ({
		node: [
			'--import',
			`data:text/javascript,${encodeURIComponent(`const real = Date, offset = real.parse('${time}') - real.now();
globalThis.Date = class extends real { constructor(...of) { super(...(of.length ? of : [real.now() + offset])); } static now() { return real.now() + offset; } };`)}`,
		],
	});
	const [today, before] = ['2026-06-01T12:00:00Z', '2019-01-01T12:00:00Z'];
	const only = (folder: string) => {
		const [name] = readdirSync(join(program.home, folder)).filter(file => file.endsWith('.json'));
		return JSON.parse(readFileSync(join(program.home, folder, name!), 'utf8'));
	};

	test('what is saved later stands, though its clock shows an earlier time', async () => {
		await program.run(['save', 'fixture oval', '--notes', 'first'], at(today));
		expect(only('tracks')).toMatchObject({saved: expect.stringMatching(/^2026-06-01/)});
		const second = await program.run(['save', 'fixture oval', '--notes', 'second'], at(before));
		expect(second.status).toBe(0);
		expect(only('tracks')).toMatchObject({notes: 'second', saved: expect.stringMatching(/^2019-01-01/)});
	});

	test('no entry of a history is lost, and each has the day that its clock showed', async () => {
		for (const [time, remark] of [
			[today, 'first'],
			[before, 'second'],
		] as const)
			await program.run(['history', 'fixture oval', '--add', '--remark', remark], at(time));
		expect(only('history').entries).toMatchObject([
			{date: '2026-06-01', remark: 'first'},
			{date: '2019-01-01', remark: 'second'},
		]);
	});

	test('nothing is left that a later save would have to wait for', async () => {
		await program.run(['save', 'fixture oval'], at(today));
		expect(existsSync(join(program.home, 'lock'))).toBe(false);
	});
});
