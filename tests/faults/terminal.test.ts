/** What may happen to the terminal while the screen is open, with the built program in a pseudo-terminal. */
import {existsSync, readdirSync, readFileSync} from 'node:fs';
import {join} from 'node:path';
import {afterAll, afterEach, describe, expect, test, vi} from 'vitest';
import {makeProgram} from '../commands/program.ts';
import {runs} from '../runs.ts';
import {expectGivenBack, type Opening, openProgram, ranked} from '../screens/opened.ts';
import type {Pty} from '../screens/pty.ts';

const program = makeProgram();
afterAll(program.remove);

let terminal: Pty | undefined;
afterEach(() => terminal?.close());

let homes = 0;
/** Nothing is kept there yet. */
const newHome = () => ({DROPRACK_HOME: join(program.place, `home-${++homes}`)});
const open = (opening: Opening = {}): Pty => {
	terminal = openProgram(program, {...opening, environment: {...newHome(), ...opening.environment}});
	return terminal;
};
/** To the last line of the frame. */
const whole = /10 rows[\s\S]*▸ +1 [\s\S]*stock pass[\s\S]*q quit/;
const down = '\x1B[B';
/** Another exit speed on the first straight. */
const changed = `e\t${down}61\r`;
const isChanged = /exit +~61 mph/;

/** The sessions that are kept in a home. */
const sessionsIn = ({DROPRACK_HOME}: {DROPRACK_HOME: string}): unknown[] => {
	const folder = join(DROPRACK_HOME, 'sessions');
	if (!existsSync(folder)) return [];
	const names = readdirSync(folder).filter(name => name.endsWith('.json'));
	return names.map(name => JSON.parse(readFileSync(join(folder, name), 'utf8')));
};

describe('a fault of the program itself', () => {
	/** Runs before the program: when the signal comes, something that the screen calls throws. */
	const saboteur = (what: string) => [
		'--import',
		`data:text/javascript,process.on('SIGUSR2',()=>{${what}=()=>{throw new Error('struck by the test')}})`,
	];
	test.each([
		['while a key is handled', 'performance.now'],
		['while a frame is drawn', 'String.prototype.repeat'],
	])('%s gives the terminal back, says what happened and where the session is, and ends with 70', async (_, what) => {
		const home = newHome();
		const pty = open({environment: home, node: saboteur(what), columns: 200});
		await pty.waitFor(ranked);
		pty.press(changed);
		await pty.waitFor(isChanged);
		pty.press('\x1B');
		await pty.waitFor(ranked);
		pty.signal('SIGUSR2');
		// Until the signal has arrived a key does what it always does.
		await vi.waitFor(() => {
			pty.press('m');
			expect(pty.exit).toBeDefined();
		}, 5000);
		expect(await pty.ended()).toMatchObject({exitCode: 70});
		expectGivenBack(pty);
		expect(pty.screen()).toContain('droprack: a fault of the program itself. Please report it.');
		expect(pty.screen()).toContain('struck by the test');
		expect(pty.screen()).toContain(`The unsaved session is in ${join(home.DROPRACK_HOME, 'sessions')}`);
		expect(sessionsIn(home)).toHaveLength(1);
	});
});

describe('signals at any moment', () => {
	const ends = {SIGINT: 130, SIGTERM: 143, SIGHUP: 129} as const;
	/** By the signal itself before the terminal is taken, with its number afterwards. */
	const isEndBy = (pty: Pty, signal: keyof typeof ends) =>
		pty.exit!.exitCode === ends[signal] || pty.exit!.signal === ends[signal] - 128;

	test.each(Object.keys(ends) as (keyof typeof ends)[])('%s while it starts leaves nothing behind', async signal => {
		for (let i = 0; i < runs(3, 40); i++) {
			const pty = open({environment: newHome()});
			// So much of it is there already; the last time the whole first frame.
			const written = [0, 1, 40, 400, 2000][i % 5]!;
			await pty.waitFor(() => pty.written.length >= written);
			pty.signal(signal);
			await pty.ended();
			expect(isEndBy(pty, signal)).toBe(true);
			expectGivenBack(pty);
			pty.close();
		}
	});

	test('a second signal, and one while it leaves, change nothing', async () => {
		const home = newHome();
		const pty = open({environment: home});
		await pty.waitFor(ranked);
		pty.press(changed);
		await pty.waitFor(isChanged);
		for (const signal of ['SIGWINCH', 'SIGTERM', 'SIGINT', 'SIGHUP']) if (pty.exit === undefined) pty.signal(signal);
		await pty.ended();
		expect([129, 130, 143]).toContain(pty.exit?.exitCode);
		expectGivenBack(pty);
		expect(sessionsIn(home)).toHaveLength(1);
	});

	test('SIGTSTP gives the terminal back and SIGCONT takes it again, with the same on it', async () => {
		const pty = open();
		const before = await pty.waitFor(whole);
		const givenBack = () => pty.written.endsWith('\x1B[?2004l\x1B[?1049l\x1B[?25h');
		for (const stop of [() => pty.signal('SIGTSTP'), () => pty.press('\x1A')]) {
			stop();
			await pty.waitFor(givenBack);
			expect(pty.emulator.buffer.active.type).toBe('normal');
			pty.signal('SIGCONT');
			await pty.waitFor(whole);
			expect(pty.emulator.buffer.active.type).toBe('alternate');
			expect(pty.screen()).toBe(before);
		}
		pty.press(down);
		await pty.waitFor(/▸ +2 /);
	});

	test('stopped by SIGSTOP while others write on the terminal, it draws anew when it goes on', async () => {
		const pty = open();
		const before = await pty.waitFor(whole);
		pty.signal('SIGSTOP');
		await new Promise<void>(resolve => pty.emulator.write('\x1B[?1049l\x1B[2Jsomething else', resolve));
		pty.signal('SIGCONT');
		await pty.waitFor(whole);
		expect(pty.screen()).toBe(before);
		pty.press('q');
		expect(await pty.ended()).toMatchObject({exitCode: 0});
		expectGivenBack(pty);
	});
});

test('a storm of resizes, while it starts, runs and leaves, ends in one whole frame of the last size', async () => {
	const pty = open();
	const storm = () => {
		for (let i = 0; i < 300; i++) pty.resize({columns: 20 + ((i * 37) % 180), rows: 3 + ((i * 11) % 50)});
		pty.resize({columns: 100, rows: 30});
	};
	storm();
	await pty.waitFor(ranked);
	storm();
	await pty.waitFor(ranked);
	pty.press(down);
	await pty.waitFor(/▸ +2 /);
	expect(pty.lines().filter(line => line.includes('10 rows'))).toHaveLength(1);
	pty.press('q');
	storm();
	expect(await pty.ended()).toMatchObject({exitCode: 0});
	expectGivenBack(pty);
});

const line = '1234567890 abcdefghi\n';
const megabyte = line.repeat(50_000);

test.each([
	['marked as a paste', `\x1B[200~${megabyte}\x1B[201~`],
	['that comes as keys', line.replace('\n', '.').repeat(runs(5000, 50_000))],
])('a megabyte pasted into a field, %s: the beginning stands there, and the next key works', async (_, paste) => {
	const pty = open();
	await pty.waitFor(ranked);
	pty.press(`e\t${down}9`);
	await pty.waitFor('Understood 9 mph');
	pty.press(paste);
	await pty.waitFor('1234567890 abc');
	pty.press('\x15');
	pty.press('61\r');
	await pty.waitFor(isChanged, 25_000);
	pty.press('\x03');
	await pty.ended();
	expectGivenBack(pty);
});

test('a terminal that takes nothing for a while gets the last frame, not all of them', async () => {
	const pty = open();
	await pty.waitFor(ranked);
	const before = pty.written.length;
	pty.pause();
	for (let i = 0; i < 400; i++) pty.press('m');
	pty.press('j');
	pty.resume();
	await pty.waitFor(/▸ +2 /);
	// 400 whole frames would be more than a megabyte.
	expect(pty.written.length - before).toBeLessThan(600_000);
	pty.press('q');
	expect(await pty.ended()).toMatchObject({exitCode: 0});
});

test('a terminal that goes away ends it, and the changes are offered at the next start', async () => {
	const home = newHome();
	const pty = open({environment: home});
	await pty.waitFor(ranked);
	pty.press(changed);
	await pty.waitFor(isChanged);
	const {pid} = pty;
	pty.hangUp();
	await vi.waitFor(() => expect(() => process.kill(pid, 0)).toThrow(), 5000);
	expect(sessionsIn(home)).toHaveLength(1);
	const next = open({environment: home});
	await next.waitFor('An earlier session ended with unsaved changes');
});

test('with TERM=dumb no terminal sequence is written: the ranking is printed, and why is said', async () => {
	const pty = open({environment: {TERM: 'dumb'}});
	expect(await pty.ended()).toMatchObject({exitCode: 0});
	expect(pty.written).not.toContain('\x1B');
	expect(pty.written).toContain('droprack: TERM is dumb, so the ranking is printed');
	expect(pty.written).toContain('10 choices ranked');
});

test('in a window of 20 × 5 it says what it needs, and grows with the window', async () => {
	const pty = open({columns: 20, rows: 5});
	await pty.waitFor('Droprack');
	expect(pty.screen()).toMatch(/80|24/);
	expect(Math.max(...pty.lines().map(line => line.length))).toBeLessThanOrEqual(20);
	pty.resize({columns: 80, rows: 24});
	await pty.waitFor(ranked);
	pty.resize({columns: 20, rows: 5});
	await pty.waitFor('Droprack');
	pty.press('q');
	expect(await pty.ended()).toMatchObject({exitCode: 0});
	expectGivenBack(pty);
});
