/**
 * One file written so that it is the old one or the new one, whole, whatever happens. Our own, because the libraries
 * did not survive the tests: atomically 2 (under conf) and write-file-atomic 7 take a short write for a whole one and,
 * on a full disk, put a cut file in the place of the good one without an error (4096 of 40008 bytes).
 */
import {randomBytes} from 'node:crypto';
import {closeSync, fsyncSync, linkSync, openSync, readFileSync, renameSync, rmSync, writeSync} from 'node:fs';
import {dirname} from 'node:path';
import {codeOf, type StoreProblem, unreachable} from './answer.ts';
import {entriesOf, syncDirectory} from './directory.ts';

export const backupOf = (file: string): string => `${file}.bak`;

const temporaryOf = (file: string): string => `${file}.${randomBytes(6).toString('hex')}.tmp`;
const temporaryName = /\.[0-9a-f]{12}\.tmp$/;
export const isTemporary = (name: string): boolean => temporaryName.test(name);

/** Writes the text to the file, and keeps what was there as `.bak` where that is asked for. */
export const writeDurably = (file: string, text: string, {keepPrevious = true} = {}): StoreProblem | undefined => {
	const temporary = temporaryOf(file);
	try {
		writeAll(temporary, Buffer.from(text));
		if (keepPrevious) keepAsBackup(file);
		renameSync(temporary, file);
		syncDirectory(dirname(file));
		return undefined;
	} catch (error) {
		removeIfPossible(temporary);
		return unreachable(file, error);
	}
};

/** Takes the file away, to its `.bak`. */
export const retire = (file: string): StoreProblem | undefined => {
	try {
		renameSync(file, backupOf(file));
		syncDirectory(dirname(file));
		return undefined;
	} catch (error) {
		return unreachable(file, error);
	}
};

/** Removes what killed writers left in a directory. Only for one who knows that nobody writes there now. */
export const sweepTemporaries = (directory: string): void => {
	for (const {name, path} of entriesOf(directory)) if (isTemporary(name)) removeIfPossible(path);
};

export const removeIfPossible = (file: string): void => {
	try {
		rmSync(file, {force: true});
	} catch (error) {
		if (codeOf(error) === undefined) throw error;
	}
};

/** All the bytes to a new file, on the disk, and proven by reading them back. */
const writeAll = (file: string, bytes: Buffer): void => {
	const handle = openSync(file, 'wx');
	try {
		for (let at = 0; at < bytes.length; ) at += writeSync(handle, bytes, at);
		fsyncSync(handle);
	} finally {
		closeSync(handle);
	}
	if (!readFileSync(file).equals(bytes)) throw Object.assign(new Error('read back differently'), {code: 'EDIFFERS'});
};

/** The file as it is now also as `.bak`: by a second name for it, or by a copy where the disk knows no second names. */
const keepAsBackup = (file: string): void => {
	const temporary = temporaryOf(backupOf(file));
	try {
		linkSync(file, temporary);
	} catch (error) {
		if (codeOf(error) === 'ENOENT') return;
		copy(file, temporary);
	}
	try {
		renameSync(temporary, backupOf(file));
	} finally {
		// Where both names stand for one file already, the rename does nothing and leaves the first.
		removeIfPossible(temporary);
	}
};

const copy = (file: string, to: string): void => {
	try {
		writeAll(to, readFileSync(file));
	} catch (error) {
		removeIfPossible(to);
		throw error;
	}
};
