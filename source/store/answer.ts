/** How the store says that something could not be done: with the file, what was found there, and what to do. */
import {visible} from '../documents/visible.ts';

export type StoreProblem = {
	/**
	 * broken: the content is not what it should be; newer: written by a later Droprack; inTheWay: something else has the
	 * place; locked: another copy is saving; unreachable: disk or permission.
	 */
	reason: 'broken' | 'newer' | 'inTheWay' | 'locked' | 'unreachable';
	file: string;
	found: string;
	remedy: string;
};

export type Answer<T> = {ok: true; value: T} | {ok: false; problem: StoreProblem};

export const done = <T>(value: T): Answer<T> => ({ok: true, value});
export const failed = (problem: StoreProblem): {ok: false; problem: StoreProblem} => ({ok: false, problem});

/** The problem in one line, safe to show. */
export const problemText = ({file, found, remedy}: StoreProblem): string => visible(`${file}: ${found}. ${remedy}`);

/** What the codes mean that a person can do something about. */
const knownCodes: Readonly<Record<string, readonly [found: string, remedy: string]>> = {
	ENOSPC: ['the disk is full', 'Make room and save again.'],
	EDQUOT: ['the disk quota is used up', 'Make room and save again.'],
	EFBIG: ['the file is larger than this account may write', 'Raise the file size limit and save again.'],
	EROFS: ['the disk is read-only', 'Set DROPRACK_HOME to a directory that can be written.'],
	EACCES: ['no permission', 'Change the permissions, or set DROPRACK_HOME to another directory.'],
	EPERM: ['no permission', 'Change the permissions, or set DROPRACK_HOME to another directory.'],
	ENOTDIR: ['a part of its path is not a directory', 'Name a directory, or set DROPRACK_HOME to one.'],
	EEXIST: ['a part of its path is not a directory', 'Name a directory, or set DROPRACK_HOME to one.'],
	ENOENT: ['there is no such file or directory', 'Check the path.'],
	EIO: ['the disk reports an error', 'Save to another disk.'],
	EDIFFERS: ['what was read back is not what was written', 'Save to another disk.'],
};

const otherwise = 'Check the disk and save again.';

export const codeOf = (error: unknown): string | undefined => {
	const {code} = error as {code?: unknown};
	return typeof code === 'string' ? code : undefined;
};

/** An error of the file system as a problem; an error without a code is our bug and is thrown on. */
export const unreachable = (file: string, error: unknown): StoreProblem => {
	const code = codeOf(error);
	if (code === undefined) throw error;
	const [found, remedy] = knownCodes[code] ?? ['cannot be used', otherwise];
	return {reason: 'unreachable', file, found: `${found} (${code})`, remedy};
};
