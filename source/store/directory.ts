/** Directories of the store: made, flushed and listed. */
import {closeSync, fsyncSync, lstatSync, mkdirSync, openSync, readdirSync, statSync} from 'node:fs';
import {dirname, join} from 'node:path';
import {codeOf} from './answer.ts';

/** Systems that cannot flush a directory say so with one of these. */
const cannotFlush = new Set(['EINVAL', 'EPERM', 'EACCES', 'EISDIR', 'ENOTSUP', 'EBADF']);

/** Flushes the names in a directory, without which a rename may not survive a power cut. */
export const syncDirectory = (directory: string): void => {
	let handle: number | undefined;
	try {
		handle = openSync(directory, 'r');
		fsyncSync(handle);
	} catch (error) {
		if (!cannotFlush.has(codeOf(error) ?? '')) throw error;
	} finally {
		if (handle !== undefined) closeSync(handle);
	}
};

/** Makes a directory with its parents. Not by Node's `recursive`, which never ends below /proc. */
export const makeDirectory = (directory: string): void => {
	if (madeAlone(directory)) return;
	makeDirectory(dirname(directory));
	if (!madeAlone(directory)) throw Object.assign(new Error(`cannot make ${directory}`), {code: 'ENOENT'});
};

/** False where the parent is missing. */
const madeAlone = (directory: string): boolean => {
	try {
		mkdirSync(directory);
	} catch (error) {
		const code = codeOf(error);
		if (code === 'ENOENT' && dirname(directory) !== directory) return false;
		if (code === 'EEXIST' && statSync(directory).isDirectory()) return true;
		throw error;
	}
	syncDirectory(dirname(directory));
	return true;
};

export type Entry = {name: string; path: string};

/** What is in a directory, by name; nothing where there is no directory. */
export const entriesOf = (directory: string): Entry[] => {
	try {
		return readdirSync(directory)
			.sort()
			.map(name => ({name, path: join(directory, name)}));
	} catch (error) {
		if (codeOf(error) === 'ENOENT') return [];
		throw error;
	}
};

export const isLink = (path: string): boolean => lstatSync(path, {throwIfNoEntry: false})?.isSymbolicLink() === true;
