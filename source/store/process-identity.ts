/** Which process something belongs to, as text for a file name, and whether that process has ended. */
import {createHash} from 'node:crypto';
import {readFileSync, readlinkSync} from 'node:fs';
import {hostname} from 'node:os';
import {codeOf} from './answer.ts';

type Identity = {
	pid: number;
	/** Clock ticks from boot to the start of the process; a number given out again is told apart by it. */
	start: string;
	boot: string;
	/** The space in which process numbers count: containers on one machine have their own. */
	space: string;
	machine: string;
};

const none = '0';
const pattern = /^(\d+)-(\d+)-([0-9a-f]+)-(\d+)-([0-9a-f]+)(?=\.|$)/;

/** What /proc says, or nothing on a system without it. */
const told = (read: () => string): string | undefined => {
	try {
		return read();
	} catch (error) {
		if (codeOf(error) === undefined) throw error;
		return undefined;
	}
};

type Status = {state: string; start: string};

/** State and start of a process. The name before them, in parentheses, may hold anything. */
const statusOf = (pid: number): Status | undefined => {
	const text = told(() => readFileSync(`/proc/${pid}/stat`, 'utf8'));
	const fields = text?.slice(text.lastIndexOf(')') + 2).split(' ');
	// Fields 3 and 22 of proc_pid_stat(5).
	return fields && {state: fields[0]!, start: fields[19]!};
};

const measure = (): Identity => ({
	pid: process.pid,
	start: statusOf(process.pid)?.start ?? none,
	boot: told(() => readFileSync('/proc/sys/kernel/random/boot_id', 'utf8'))?.slice(0, 8) ?? none,
	space: /\d+/.exec(told(() => readlinkSync('/proc/self/ns/pid')) ?? none)?.[0] ?? none,
	machine: createHash('sha256')
		.update(`${hostname()} ${told(() => readFileSync('/etc/machine-id', 'utf8')) ?? ''}`)
		.digest('hex')
		.slice(0, 8),
});

let own: Identity | undefined;
const ownIdentity = (): Identity => {
	own ??= measure();
	return own;
};

/** This process, such as `4711-8812345-6fe1a2b3-4026531836-90ab12cd`. */
export const processIdentity = (): string => {
	const {pid, start, boot, space, machine} = ownIdentity();
	return [pid, start, boot, space, machine].join('-');
};

const parse = (text: string): Identity | undefined => {
	const match = pattern.exec(text);
	if (!match) return undefined;
	const [, pid, start, boot, space, machine] = match as unknown as [string, string, string, string, string, string];
	return {pid: Number(pid), start, boot, space, machine};
};

/** The number of the process that a text names; undefined where it names none. */
export const pidIn = (text: string): number | undefined => parse(text)?.pid;

/**
 * Whether the process that a text names is known to have ended. False where that cannot be known: on another
 * machine, in another container, or where the text names no process. Asks no clock, so that none can mislead it.
 */
export const hasEnded = (text: string): boolean => {
	const other = parse(text);
	const self = ownIdentity();
	if (!other || other.machine !== self.machine) return false;
	if (other.boot !== self.boot) return true;
	if (other.space !== self.space) return false;
	if (!isRunning(other.pid)) return true;
	const status = statusOf(other.pid);
	if (!status) return false;
	// A zombie only waits for its parent to take note.
	return status.state === 'Z' || status.state === 'X' || status.start !== other.start;
};

const isRunning = (pid: number): boolean => {
	try {
		process.kill(pid, 0);
		return true;
	} catch (error) {
		if (codeOf(error) === undefined) throw error;
		return codeOf(error) !== 'ESRCH';
	}
};
