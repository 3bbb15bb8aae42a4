/** How a command ends: what goes to standard output, what to standard error, and the exit status. */
import {visible} from '../documents/visible.ts';

export const status = {
	done: 0,
	/** Done, and the plan fails a check that was asked for with `--strict`. */
	checkFailed: 1,
	/** Bad input; nothing changed. */
	badInput: 2,
	/** Could not read or write: disk, permission, lock. */
	unreachable: 3,
	/** Our fault. */
	fault: 70,
} as const;
export type Status = (typeof status)[keyof typeof status];

export type Reply = {status: Status; out: string; err: string};

/** Something asked for that could not be had, with the words for the person. */
export type Refusal = {ok: false; status: Status; message: string};
export type Found<T> = {ok: true; value: T} | Refusal;

export const found = <T>(value: T): Found<T> => ({ok: true, value});
export const badInput = (message: string): Refusal => ({ok: false, status: status.badInput, message});
export const unreachable = (message: string): Refusal => ({ok: false, status: status.unreachable, message});

/** Words of the command line and of documents are in it: nothing in them moves the cursor. */
const shownLines = (message: string): string => message.split('\n').map(visible).join('\n');

export const replyRefused = (refusal: Refusal): Reply => ({
	status: refusal.status,
	out: '',
	err: `${shownLines(refusal.message)}\n`,
});

/** A result, with what is worth knowing beside it. */
export const replyDone = (out: string, notes: readonly string[] = [], failed = false): Reply => ({
	status: failed ? status.checkFailed : status.done,
	out,
	err: notes.map(note => `droprack: ${shownLines(note)}\n`).join(''),
});
