import {chmodSync, existsSync, openSync, readFileSync, writeFileSync} from 'node:fs';
import {join} from 'node:path';
import {afterAll, beforeAll, expect, test} from 'vitest';
import {commands} from '../../source/commands/command-table.ts';
import {asNobody, fixture, makeProgram} from './program.ts';

let program: ReturnType<typeof makeProgram>;
beforeAll(() => {
	program = makeProgram();
}, 120_000);
afterAll(() => program.remove());

const oval = JSON.parse(readFileSync(fixture('oval.json'), 'utf8'));
const car = JSON.parse(readFileSync(fixture('car.json'), 'utf8'));
const esc = '\u001b';

test('the build says nothing', () => {
	expect(program.said).toBe('');
});

test('without a terminal the bare program ranks the demo, through a pipe without color', async () => {
	const {status, out, err} = await program.run([]);
	expect({status, err}).toEqual({status: 0, err: ''});
	expect(out).toMatch(
		/^Fixture Car · engine Fixture Engine · \d{4}-\d\d-\d\d · 68°F, 28\.94 inHg, 40 %\n {2}humidity\n/,
	);
	expect(out).toMatch(/10 choices ranked/);
	expect(out).not.toContain(esc);
});

test('FORCE_COLOR colors a pipe, NO_COLOR does not', async () => {
	expect((await program.run(['run', 'fixture oval'], {environment: {FORCE_COLOR: '1'}})).out).toContain(`${esc}[`);
	expect(
		(await program.run(['run', 'fixture oval'], {environment: {FORCE_COLOR: '1', NO_COLOR: '1'}})).out,
	).not.toContain(esc);
});

test('rank gives the rows in order, in the shape for programs', async () => {
	const {status, out} = await program.run([
		'rank',
		fixture('oval.json'),
		'--car',
		fixture('car.json'),
		'--json',
		'--top',
		'3',
	]);
	const answer = JSON.parse(out);
	expect(status).toBe(0);
	expect(answer).toMatchObject({track: 'Fixture Oval', car: 'Fixture Car', remarks: expect.any(Array)});
	expect(answer.rows).toHaveLength(3);
	expect(answer.rows[0]).toMatchObject({
		pair: expect.stringMatching(/^\d+\/\d+$/),
		timeS: expect.any(Number),
		gainS: expect.any(Number),
	});
	const times = answer.rows.map((row: {fastestS: number}) => row.fastestS);
	expect(times).toEqual([...times].sort((a, b) => a - b));
});

test('one situation asked for is the only one in the answer', async () => {
	const {out} = await program.run(['rank', 'fixture oval', '--situation', 'In the tow', '--json']);
	const rows: {situations: {name: string}[]}[] = JSON.parse(out).rows;
	expect(new Set(rows.flatMap(row => row.situations.map(({name}) => name)))).toEqual(new Set(['In the tow']));
	expect((await program.run(['rank', 'fixture oval', '--situation', 'In the tow'])).out).toContain(
		'in "In the tow" alone',
	);
});

test('rpm and run answer for the pair asked for', async () => {
	const rpm = JSON.parse(
		(await program.run(['rpm', 'fixture oval', '--pair', '34/37', '--gearbox', 'B', '--json'])).out,
	);
	expect(rpm).toMatchObject({track: 'Fixture Oval', car: 'Fixture Car', pair: '34/37', gearbox: 'B'});
	expect(rpm.points[0]).toMatchObject({at: expect.any(String), situation: 'Base', speedMps: expect.any(Number)});
	const run = JSON.parse((await program.run(['run', 'fixture oval', '--pair', '34/37', '--json'])).out);
	expect(run).toMatchObject({track: 'Fixture Oval', car: 'Fixture Car', row: {pair: '34/37', gearbox: 'A'}});
	expect((await program.run(['run', 'fixture oval', '--units', 'metric'])).out).toMatch(/exit km\/h/);
});

test('a document comes through standard input', async () => {
	const {status, out} = await program.run(['rank', '-'], {input: JSON.stringify({...oval, name: 'Piped Oval'})});
	expect(status).toBe(0);
	expect(out).toContain('Piped Oval');
});

test('ASCII output is ASCII', async () => {
	const {out} = await program.run(['rank', '-', '--ascii'], {input: JSON.stringify({...oval, name: 'Öval 直線'})});
	expect(out).toMatch(/^[\n\x20-\x7e]+$/);
	expect(out).toContain('Oval ????');
});

test('a stranger name moves no cursor', async () => {
	const input = JSON.stringify({...oval, name: `Oval ${esc}[2J\u202e`});
	for (const words of [
		['rank', '-'],
		['rank', '-', '--json'],
		['run', '-'],
	]) {
		const {status, out} = await program.run(words, {input});
		expect(status).toBe(0);
		for (const sign of [esc, '\u202e']) expect(out).not.toContain(sign);
	}
});

test('strict makes a failed check the exit status, and only strict', async () => {
	const input = JSON.stringify({...car, rack: {...car.rack, toothSums: [80]}});
	expect((await program.run(['rank', 'fixture oval', '--car', '-'], {input})).status).toBe(0);
	const strict = await program.run(['rank', 'fixture oval', '--car', '-', '--strict'], {input});
	expect(strict.status).toBe(1);
	expect(strict.out).toMatch(/FAIL/);
	expect((await program.run(['run', 'fixture oval', '--car', '-', '--strict', '--json'], {input})).status).toBe(1);
	expect((await program.run(['run', 'fixture oval', '--strict'])).status).toBe(0);
});

test.each(commands.map(({name}) => name))('%s --help shows two examples', async name => {
	const {status, out, err} = await program.run([name, '--help']);
	expect({status, err}).toEqual({status: 0, err: ''});
	expect(out.slice(out.indexOf('Examples')).match(/^ {2}droprack /gm)).toHaveLength(2);
});

test('the version is that of the package', async () => {
	const {version} = JSON.parse(readFileSync(new URL('../../package.json', import.meta.url), 'utf8'));
	expect((await program.run(['--version'])).out).toBe(`droprack ${version}\n`);
});

test('tracks and cars are listed, and shown as they were written', async () => {
	expect((await program.run(['tracks'])).out).toMatch(
		/^Fixture Oval +tarrowdale +short +2 straights +2 situations +shipped$/m,
	);
	expect((await program.run(['cars'])).out).toMatch(/^Fixture Car +demo +short, road +2 sets +5 pairs +shipped$/m);
	expect(JSON.parse((await program.run(['tracks', '--json'])).out).tracks).toHaveLength(1);
	expect((await program.run(['show', 'fixture oval'])).out).toBe(readFileSync(fixture('oval.json'), 'utf8'));
	expect((await program.run(['show', 'Fixture Car'])).out).toBe(readFileSync(fixture('car.json'), 'utf8'));
});

test('the schemas are JSON', async () => {
	for (const kind of ['track', 'car']) {
		const schema = JSON.parse((await program.run(['schema', kind])).out);
		expect(schema.$schema).toMatch(/json-schema\.org/);
	}
});

test('a file without permission is status 3', async () => {
	const file = join(program.place, 'secret.json');
	writeFileSync(file, '{}');
	chmodSync(file, 0o000);
	const {status, out, err} = await program.run(['rank', file], {spawn: asNobody});
	expect({status, out}).toEqual({status: 3, out: ''});
	expect(err).toMatch(/secret\.json: no permission to read it/);
});

test('a reader who closes the pipe ends it quietly', async () => {
	const child = program.start(['rank', 'fixture oval', '--json']);
	let err = '';
	child.stderr?.on('data', text => {
		err += text;
	});
	child.stdout?.destroy();
	const status = await new Promise(resolve => child.on('close', resolve));
	expect({status, err}).toEqual({status: 0, err: ''});
});

test.skipIf(!existsSync('/dev/full'))('a full disk under the result is status 3', async () => {
	const {status, err} = await program.run(['tracks'], {spawn: {stdio: ['ignore', openSync('/dev/full', 'w'), 'pipe']}});
	expect(status).toBe(3);
	expect(err).toMatch(/could not be written \(ENOSPC\)/);
});

test('a fault of ours is status 70 and one line, with the stack for who asks', async () => {
	const file = join(program.place, 'tracks', 'torn.json');
	writeFileSync(file, '{');
	try {
		const {status, out, err} = await program.run(['tracks']);
		expect({status, out}).toEqual({status: 70, out: ''});
		expect(err).toMatch(/^droprack: a fault of the program itself \(.*\)\. Please report it.*\n$/);
		expect((await program.run(['tracks'], {environment: {DROPRACK_DEBUG: '1'}})).err).toMatch(/^ +at /m);
	} finally {
		writeFileSync(file, JSON.stringify({...oval, name: 'Mended Oval'}));
	}
});
