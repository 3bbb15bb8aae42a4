import {spawn} from 'node:child_process';
import {readFileSync} from 'node:fs';
import {expect, test} from 'vitest';
import {hasEnded, pidIn, processIdentity} from '../../source/store/process-identity.ts';
import {ended, firstWords} from './children.ts';

const changed = (field: number, to: string) =>
	processIdentity()
		.split('-')
		.map((part, index) => (index === field ? to : part))
		.join('-');
const [pid, start, boot, space, machine] = [0, 1, 2, 3, 4];
/** Above the highest process number of Linux, 2^22. */
const noProcess = '4194305';

test('this process has not ended, and its number is in its text', () => {
	expect(hasEnded(processIdentity())).toBe(false);
	expect(hasEnded(`${processIdentity()}.1234abcd`)).toBe(false);
	expect(pidIn(processIdentity())).toBe(process.pid);
});

test('a process that is not there has ended', () => {
	expect(hasEnded(changed(pid!, noProcess))).toBe(true);
});

test('a number that was given out again does not keep the earlier process alive', () => {
	expect(hasEnded(changed(start!, '1'))).toBe(process.platform === 'linux');
});

test('a process from before the machine started again has ended', () => {
	expect(hasEnded(changed(boot!, 'abcdef01'))).toBe(true);
});

test('of another machine, another container or no process at all nothing is known', () => {
	expect(hasEnded(changed(machine!, 'abcdef01'))).toBe(false);
	expect(hasEnded(changed(space!, '1').replace(/^\d+/, noProcess))).toBe(false);
	for (const text of ['', 'lock', '12', '.DS_Store', '1-2-3']) expect(hasEnded(text)).toBe(false);
});

test.runIf(process.platform === 'linux')('a zombie has ended: its parent only has not taken note', async () => {
	// The sleep takes the shell's place and never asks after the child that the shell began.
	const parent = spawn('sh', ['-c', 'sleep 0.05 & echo $!; exec sleep 60'], {stdio: ['ignore', 'pipe', 'inherit']});
	const child = (await firstWords(parent)).trim();
	const stat = () => readFileSync(`/proc/${child}/stat`, 'utf8').split(' ');
	await expect.poll(() => stat()[2]).toBe('Z');
	const identity = changed(pid!, child).replace(/^(\d+)-\d+/, `$1-${stat()[21]}`);
	expect(hasEnded(identity)).toBe(true);
	parent.kill('SIGKILL');
	await ended(parent);
});
