/** A disk without room or rights under the screen and the preferences. The store itself: tests/store. */
import {execFileSync} from 'node:child_process';
import {chmodSync, mkdirSync, readFileSync, rmSync, writeFileSync} from 'node:fs';
import {join} from 'node:path';
import {afterAll, afterEach, describe, expect, test} from 'vitest';
import {readPreferences} from '../../source/store/preferences.ts';
import {makeProgram} from '../commands/program.ts';
import {openProgram, ranked} from '../screens/opened.ts';
import type {Pty} from '../screens/pty.ts';

const program = makeProgram();
afterAll(program.remove);

let terminal: Pty | undefined;
afterEach(() => terminal?.close());

const isRoot = process.getuid?.() === 0;
const mounted: string[] = [];
afterEach(() => {
	for (const place of mounted.splice(0)) execFileSync('umount', ['--lazy', place]);
});

let disks = 0;
/** A disk of that size; undefined where nobody may mount one. */
const disk = (size: string): string | undefined => {
	const place = join(program.place, `disk-${++disks}`);
	mkdirSync(place);
	try {
		execFileSync('mount', ['-t', 'tmpfs', '-o', `size=${size}`, 'tmpfs', place], {stdio: 'pipe'});
	} catch {
		return undefined;
	}
	mounted.push(place);
	return place;
};

/** Until nothing more goes in. */
const fill = (place: string): string => {
	const file = join(place, 'filling');
	for (let bytes = 1 << 20; bytes >= 1; bytes >>= 1) {
		try {
			for (;;) writeFileSync(file, 'x'.repeat(bytes), {flag: 'a'});
		} catch {}
	}
	return file;
};

describe.runIf(isRoot)('a full disk', () => {
	test('on the screen a save says so, the work goes on, and with room again it is saved', async context => {
		const home = disk('256k') ?? context.skip('this system lets nobody mount');
		const filling = fill(home);
		terminal = openProgram(program, {environment: {DROPRACK_HOME: home}});
		await terminal.waitFor(ranked);
		terminal.press('e\t\x1B[B61\r');
		await terminal.waitFor(/exit +~61 mph/);
		terminal.press('\x13');
		await terminal.waitFor('the disk is full (ENOSPC)');
		expect(terminal.screen()).toContain('Fixture Oval (changed)');
		rmSync(filling);
		terminal.press('\x13');
		await terminal.waitFor('Fixture Oval is saved.');
	});

	test('the preferred car stays the one it was, and that is said', async context => {
		const home = disk('64k') ?? context.skip('this system lets nobody mount');
		const prefer = (car: string) => program.run(['cars', '--prefer', car], {environment: {DROPRACK_HOME: home}});
		expect(await prefer('fixture car')).toMatchObject({status: 0});
		const before = readFileSync(join(home, 'preferences.json'), 'utf8');
		fill(home);
		expect(await prefer('none')).toMatchObject({status: 3, err: expect.stringContaining('cannot be written (ENOSPC)')});
		expect(readFileSync(join(home, 'preferences.json'), 'utf8')).toBe(before);
		expect(readPreferences(home)).toEqual({ok: true, value: {car: 'Fixture Car'}});
	});
});

test('on a read-only home the screen opens, ranks and says what cannot be saved', async () => {
	const home = join(program.place, 'read-only');
	mkdirSync(home);
	// Root may write where nobody else may: a file in the place of the folder stops root too.
	for (const folder of ['tracks', 'sessions', 'lock']) writeFileSync(join(home, folder), '');
	chmodSync(home, 0o555);
	terminal = openProgram(program, {environment: {DROPRACK_HOME: home}});
	await terminal.waitFor(ranked);
	terminal.press('e\t\x1B[B61\r');
	await terminal.waitFor(/exit +~61 mph/);
	terminal.press('\x13');
	await terminal.waitFor(/not a directory|no permission/);
	terminal.press('\x03');
	await terminal.ended();
});
