/**
 * One writer at a time in a store. The lock is the directory `lock` with one file in it that names its holder. It is
 * taken by renaming a prepared directory to that name, which succeeds only where there is none or an empty one, and
 * released by removing the file. Of a holder that has ended anybody may remove the file; because the file bears the
 * holder's own name, one who comes late cannot remove a new holder's.
 *
 * Not proper-lockfile 4, which goes by the clock: measured, a process whose clock is an hour ahead takes the lock from
 * a live holder, and after a kill and a clock set back nobody gets it until the clock has caught up.
 */
import {randomBytes} from 'node:crypto';
import {mkdirSync, readdirSync, renameSync, rmdirSync, rmSync, unlinkSync, writeFileSync} from 'node:fs';
import {join} from 'node:path';
import {type Answer, codeOf, done, failed, type StoreProblem, unreachable} from './answer.ts';
import {makeDirectory} from './directory.ts';
import {hasEnded, pidIn, processIdentity} from './process-identity.ts';

/** A save takes some milliseconds; after this long a person wants to know. */
const patienceMs = 3000;
const shortestWaitMs = 1;
const longestWaitMs = 15;

export const lockName = 'lock';
export const isPreparedLock = (name: string): boolean => name.startsWith(`${lockName}.`);

/** Does something while no other process does anything under this store's lock. */
export const withLock = <T>(home: string, act: () => T, waitMs = patienceMs): Answer<T> => {
	const lock = join(home, lockName);
	const token = `${processIdentity()}.${randomBytes(4).toString('hex')}`;
	const problem = take(home, lock, token, waitMs);
	if (problem) return failed(problem);
	try {
		sweepPrepared(home);
		return done(act());
	} finally {
		quietly(() => unlinkSync(join(lock, token)));
		quietly(() => rmdirSync(lock));
	}
};

/** The number of the live process that holds the lock; undefined where none does. */
export const lockHolder = (home: string): number | undefined => {
	const holder = namesIn(join(home, lockName)).find(name => !hasEnded(name));
	return holder === undefined ? undefined : pidIn(holder);
};

const take = (home: string, lock: string, token: string, waitMs: number): StoreProblem | undefined => {
	const prepared = `${lock}.${token}`;
	try {
		makeDirectory(home);
		mkdirSync(prepared);
		writeFileSync(join(prepared, token), '', {flag: 'wx'});
		const until = performance.now() + waitMs;
		while (!renamed(prepared, lock)) {
			freeFromEnded(lock);
			// However long this step took: of a holder that has ended it is free now.
			if (renamed(prepared, lock)) return undefined;
			if (performance.now() > until) {
				remove(prepared);
				return locked(lock);
			}
			sleep(shortestWaitMs + Math.random() * (longestWaitMs - shortestWaitMs));
		}
		return undefined;
	} catch (error) {
		remove(prepared);
		return unreachable(home, error);
	}
};

/** On Windows a directory in the way is a matter of permission. */
const heldCodes = new Set(['EEXIST', 'ENOTEMPTY', ...(process.platform === 'win32' ? ['EPERM', 'EACCES'] : [])]);

const renamed = (from: string, to: string): boolean => {
	try {
		renameSync(from, to);
		return true;
	} catch (error) {
		if (heldCodes.has(codeOf(error) ?? '')) return false;
		throw error;
	}
};

const freeFromEnded = (lock: string): void => {
	for (const name of namesIn(lock)) if (hasEnded(name)) quietly(() => unlinkSync(join(lock, name)));
	// Fails, as it should, while there is a holder.
	quietly(() => rmdirSync(lock));
};

/** What was prepared by processes that were killed while they waited. */
const sweepPrepared = (home: string): void => {
	for (const name of namesIn(home)) {
		if (isPreparedLock(name) && hasEnded(name.slice(lockName.length + 1))) remove(join(home, name));
	}
};

const locked = (lock: string): StoreProblem => {
	const pid = namesIn(lock).map(pidIn)[0];
	const who = pid === undefined ? 'another copy of Droprack' : `another copy of Droprack (process ${pid})`;
	const remedy = 'Save again. If no other copy runs, remove this directory.';
	return {reason: 'locked', file: lock, found: `${who} is saving`, remedy};
};

const namesIn = (directory: string): string[] => {
	try {
		return readdirSync(directory);
	} catch (error) {
		if (codeOf(error) === undefined) throw error;
		return [];
	}
};

const remove = (directory: string): void => quietly(() => rmSync(directory, {recursive: true, force: true}));

/** For steps that others may have done already, or that the next one who comes does again. */
const quietly = (step: () => void): void => {
	try {
		step();
	} catch (error) {
		if (codeOf(error) === undefined) throw error;
	}
};

const sleep = (milliseconds: number): void => {
	Atomics.wait(new Int32Array(new SharedArrayBuffer(4)), 0, 0, milliseconds);
};
