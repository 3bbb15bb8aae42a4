import {mkdirSync, readdirSync, writeFileSync} from 'node:fs';
import {join} from 'node:path';
import {afterAll, afterEach, beforeAll, expect, test, vi} from 'vitest';
import {lockHolder, withLock} from '../../source/store/lock.ts';
import {processIdentity} from '../../source/store/process-identity.ts';
import {bundleChild, type Children, ended, firstWords} from './children.ts';
import {temporaryHome} from './temporary-home.ts';

const home = temporaryHome();
let children: Children;
beforeAll(async () => {
	children = await bundleChild();
});
afterAll(() => children.remove());
afterEach(() => {
	vi.useRealTimers();
});

const shortMs = 40;

test('what is done under the lock is the answer, and nothing is left', () => {
	expect(withLock(home(), () => readdirSync(join(home(), 'lock')).length)).toEqual({ok: true, value: 1});
	expect(readdirSync(home())).toEqual([]);
});

test('a fault under the lock frees it', () => {
	const fault = () => {
		throw new Error('ours');
	};
	expect(() => withLock(home(), fault)).toThrow('ours');
	expect(withLock(home(), () => 1, shortMs)).toEqual({ok: true, value: 1});
});

test.each([
	['the clock is right', 0],
	['the clock jumps a day ahead', 86_400_000],
	['the clock jumps a day back', -86_400_000],
])('a live holder keeps the lock and is named, where %s; killed, it holds nobody up', async (_, jumpMs) => {
	const holder = children.start(['hold', home()]);
	await firstWords(holder);
	// Stopped, as by a sleeping laptop: still alive.
	holder.kill('SIGSTOP');
	vi.useFakeTimers({now: Date.now() + jumpMs, toFake: ['Date']});
	expect(lockHolder(home())).toBe(holder.pid);
	expect(withLock(home(), () => 1, shortMs)).toEqual({
		ok: false,
		problem: {
			reason: 'locked',
			file: join(home(), 'lock'),
			found: `another copy of Droprack (process ${holder.pid}) is saving`,
			remedy: 'Save again. If no other copy runs, remove this directory.',
		},
	});
	expect(readdirSync(home())).toEqual(['lock']);
	holder.kill('SIGKILL');
	await ended(holder);
	expect(lockHolder(home())).toBe(undefined);
	expect(withLock(home(), () => 1, shortMs)).toEqual({ok: true, value: 1});
});

test('a holder on another machine is never taken for ended', () => {
	const elsewhere = `${processIdentity().replace(/[^-]+$/, 'ffffffff')}.0a0b0c0d`;
	mkdirSync(join(home(), 'lock'));
	writeFileSync(join(home(), 'lock', elsewhere), '');
	expect(withLock(home(), () => 1, shortMs)).toMatchObject({ok: false, problem: {reason: 'locked'}});
	expect(readdirSync(join(home(), 'lock'))).toEqual([elsewhere]);
});
