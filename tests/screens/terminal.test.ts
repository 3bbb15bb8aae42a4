/** The built program in a pseudo-terminal, its screen read back through a terminal emulator. */
import {existsSync, readdirSync, readFileSync, rmSync, writeFileSync} from 'node:fs';
import {join} from 'node:path';
import {afterAll, afterEach, expect, test, vi} from 'vitest';
import {demo} from '../../source/commands/shelf.ts';
import {makeProgram} from '../commands/program.ts';
import {expectGivenBack, type Opening, openProgram, ranked} from './opened.ts';
import type {Pty} from './pty.ts';

const program = makeProgram();
afterAll(program.remove);

let terminal: Pty | undefined;
afterEach(() => terminal?.close());

function open(opening: Opening = {}): Pty {
	terminal = openProgram(program, opening);
	return terminal;
}
const [down, right, esc] = ['\x1B[B', '\x1B[C', '\x1B'];

test('start, step, edit with an error, undo, and quit', async () => {
	const pty = open();
	await pty.waitFor(ranked);
	expect(pty.emulator.buffer.active.type).toBe('alternate');
	pty.press(down);
	await pty.waitFor(/▸ +2 /);
	pty.press(right);
	await pty.waitFor(/▸ +1 /);
	pty.press(`e\t${down}8000\r`);
	await pty.waitFor('Not taken found "8000 mph"');
	pty.press('\x7F\x7F\x7F\x7F61\r');
	await pty.waitFor(/exit +~61 mph/);
	pty.press('u');
	await pty.waitFor(/exit +76 mph/);
	pty.press('q');
	expect(await pty.ended()).toMatchObject({exitCode: 0});
	expectGivenBack(pty);
});

test('another track in three keys', async () => {
	const pty = open();
	await pty.waitFor(ranked);
	pty.press('t');
	await pty.waitFor('Choose a track');
	pty.press('f\r');
	await pty.waitFor(ranked);
});

test('the next start is at the track that was left', async () => {
	const oval = readFileSync(join(program.place, 'tracks', `${demo.track}.json`), 'utf8');
	const other = join(program.place, 'tracks', 'another.json');
	writeFileSync(other, oval.replace(/"name": "[^"]+"/, '"name": "Another oval"'));
	const environment = {DROPRACK_HOME: join(program.place, 'another home')};
	const first = open({environment});
	await first.waitFor(ranked);
	expect(first.screen()).not.toContain('Another oval');
	first.press('tanother\r');
	await first.waitFor(/Another oval[\s\S]*▸ +1 /);
	first.press('q');
	expect(await first.ended()).toMatchObject({exitCode: 0});
	const second = open({environment});
	await second.waitFor(/Another oval[\s\S]*▸ +1 /);
	rmSync(other);
});

test('the whole screen follows a resize, down to too small and up again, while something is typed', async () => {
	const pty = open({columns: 100, rows: 30});
	await pty.waitFor(ranked);
	pty.press(`e\t${down}123`);
	await pty.waitFor('Understood 123 mph');
	for (const [columns, rows] of [
		[60, 15],
		[140, 45],
		[20, 3],
		[80, 24],
		[200, 60],
	] as const) {
		pty.resize({columns, rows});
		await pty.waitFor(columns < 80 ? 'Droprack' : 'Understood 123 mph');
	}
	expect(pty.written).not.toContain('\x1B[3J');
});

test('keys, chords and sequences that are unknown do no harm', async () => {
	const pty = open();
	await pty.waitFor(ranked);
	pty.press('\x1B[1;5P\x1B[1;5R\x1B[25;5~\x1B[<0;5;5M\x1B]11;rgb:0/0/0\x07\x1B[200~q\x1B[31m\x1B[201~');
	pty.press(down);
	await pty.waitFor(/▸ +2 /);
	expect(pty.exit).toBeUndefined();
});

test.each([
	['SIGTERM', 143],
	['SIGHUP', 129],
	['SIGINT', 130],
] as const)('%s gives the terminal back', async (signal, exitCode) => {
	const pty = open();
	await pty.waitFor(ranked);
	pty.signal(signal);
	expect(await pty.ended()).toMatchObject({exitCode});
	expectGivenBack(pty);
});

test('Ctrl+C leaves at once, also while something is typed', async () => {
	const pty = open();
	await pty.waitFor(ranked);
	pty.press(`e\t${down}12\x03`);
	await pty.ended();
	expectGivenBack(pty);
});

test('killed in the middle of its work, the next start offers it, and takes it up', async () => {
	const home = join(program.place, 'killed');
	const pty = open({environment: {DROPRACK_HOME: home}});
	await pty.waitFor(ranked);
	pty.press(`e\t${down}61\r`);
	await pty.waitFor(/exit +~61 mph/);
	const kept = () =>
		existsSync(join(home, 'sessions')) && readdirSync(join(home, 'sessions')).some(name => name.endsWith('.json'));
	await vi.waitFor(() => expect(kept()).toBe(true), 5000);
	pty.signal('SIGKILL');
	await pty.ended();

	const next = open({environment: {DROPRACK_HOME: home}});
	await next.waitFor('An earlier session ended with unsaved changes');
	next.press('\r');
	await next.waitFor('Fixture Oval (changed)');
	next.press(`e\t${down}`);
	await next.waitFor(/exit +~61 mph/);
	next.press('\x13');
	await next.waitFor('Fixture Oval is saved.');
	next.press('q');
	expect(await next.ended()).toMatchObject({exitCode: 0});
	expect(kept()).toBe(false);
	const {out} = await program.run(['show', 'Fixture Oval'], {environment: {DROPRACK_HOME: home}});
	expect(JSON.parse(out)).toMatchObject({straights: [{exit: '61 mph'}, {}]});
});

test('a plan that was chosen and saved is there at the next start', async () => {
	const environment = {DROPRACK_HOME: join(program.place, 'planned')};
	const pty = open({environment});
	await pty.waitFor(ranked);
	pty.press(`${down}p`);
	await pty.waitFor('35/36 A is the plan.');
	pty.press('\x13');
	await pty.waitFor('Fixture Oval is saved.');
	pty.press('q');
	await pty.ended();
	const next = open({environment});
	await next.waitFor('plan 35/36 A');
	await next.waitFor(/P +2 +35\/36/);
});

test('a driver card is written to a file; a plan is pasted, and another read from a file and taken over', async () => {
	const environment = {DROPRACK_HOME: join(program.place, 'handing'), TMUX: ''};
	const card = join(program.place, 'card.txt');
	const plan = join(program.place, 'plan.txt');
	const share = ['share', demo.track, '--pair', '35/36', '--gearbox', 'A', '--notes', 'loose'];
	const {out} = await program.run(share, {environment});
	writeFileSync(plan, out);
	const pty = open({environment});
	await pty.waitFor(ranked);
	pty.press('x');
	await pty.waitFor('DROPRACK PLAN 1');
	pty.press('jjjj');
	await pty.waitFor('NEVER above');
	pty.press('c');
	await pty.waitFor("Sent to the terminal's clipboard");
	const [, copied] = /\]52;c;([A-Za-z0-9+/=]+)/.exec(pty.written)!;
	pty.press(`f\x15${card}\r`);
	await pty.waitFor('Written to');
	expect(readFileSync(card, 'utf8')).toMatch(/^DRIVER CARD\nFixture Car at Fixture Oval\n/);
	expect(Buffer.from(copied!, 'base64').toString()).toBe(readFileSync(card, 'utf8'));

	pty.press('a');
	await pty.waitFor('Paste the plan');
	pty.press(`\x1B[200~Hello,\r\n${out.replaceAll('\n', '\r\n')}Bye\x1B[201~`);
	await pty.waitFor(/Computed again: all \d+ numbers agree/);
	pty.press(esc);
	await pty.waitFor('Paste the plan');
	pty.press(`${plan}\r`);
	await pty.waitFor('Notes: loose');
	pty.press('\r');
	await pty.waitFor('Taken over: 35/36 A at Fixture Oval.');
	pty.press('\x13');
	await pty.waitFor('Fixture Oval is saved.');
	pty.press('q');
	expect(await pty.ended()).toMatchObject({exitCode: 0});
	expect(presetIn(environment.DROPRACK_HOME)).toMatchObject({
		pair: '35/36',
		gearbox: 'A',
		notes: 'loose',
	});
});

/** The one track that is kept there. */
const presetIn = (home: string): unknown => {
	const [name] = readdirSync(join(home, 'tracks')).filter(name => name.endsWith('.json'));
	return JSON.parse(readFileSync(join(home, 'tracks', name!), 'utf8'));
};

test('CI in the environment does not keep it from drawing', async () => {
	const pty = open({environment: {CI: 'true'}});
	await pty.waitFor(ranked);
});

test('with NO_COLOR there is no color, and what is chosen is still marked', async () => {
	const pty = open({environment: {NO_COLOR: '1'}});
	await pty.waitFor(ranked);
	expect(pty.written).not.toMatch(new RegExp(`${esc}\\[[0-9;]*(3[0-7]|4[0-7]|9[0-7])m`));
	expect(pty.screen()).toContain('▸');
});

test('with --ascii there are ASCII characters only', async () => {
	const pty = open({words: ['--ascii']});
	await pty.waitFor(/10 rows[\s\S]*> +1 /);
	expect(pty.screen()).toMatch(/^[\x20-\x7e\n]*$/);
	pty.press('g');
	await pty.waitFor('RPM over speed');
	expect(pty.screen()).toMatch(/^[\x20-\x7e\n]*$/);
});

test('for a screen reader it is text in reading order, on the normal screen', async () => {
	const pty = open({rows: 60, environment: {INK_SCREEN_READER: 'true'}});
	await pty.waitFor('selected, 1, pair 34/37');
	expect(pty.emulator.buffer.active.type).toBe('normal');
	pty.press(down);
	await pty.waitFor('selected, 2, pair 35/36');
	expect(pty.screen()).not.toMatch(/[─│▸]/);
	pty.press('q');
	expect(await pty.ended()).toMatchObject({exitCode: 0});
});

test('without a terminal on standard output the ranking is printed', async () => {
	const {status, out} = await program.run([]);
	expect(status).toBe(0);
	expect(out).toContain('10 choices ranked');
});
