import {Writable} from 'node:stream';
import {expect, test} from 'vitest';
import {replyFault} from '../../source/commands/main.ts';
import {writeReply} from '../../source/commands/write-reply.ts';

const collecting = () => {
	let text = '';
	const stream = new Writable({
		write(chunk, _, done) {
			text += String(chunk);
			done();
		},
	});
	return {stream, text: () => text};
};
const failing = (code: string) =>
	new Writable({
		write(_, __, done) {
			done(Object.assign(new Error(code), {code}));
		},
	});

test('both texts are written and the status is given', async () => {
	const [out, err] = [collecting(), collecting()];
	expect(await writeReply({status: 1, out: 'result\n', err: 'note\n'}, out.stream, err.stream)).toBe(1);
	expect([out.text(), err.text()]).toEqual(['result\n', 'note\n']);
});

test('a closed pipe ends quietly', async () => {
	const err = collecting();
	expect(await writeReply({status: 1, out: 'result\n', err: ''}, failing('EPIPE'), err.stream)).toBe(0);
	expect(err.text()).toBe('');
});

test('a full disk is said and has its status', async () => {
	const err = collecting();
	expect(await writeReply({status: 0, out: 'result\n', err: ''}, failing('ENOSPC'), err.stream)).toBe(3);
	expect(err.text()).toBe('droprack: the result could not be written (ENOSPC).\n');
});

test('a fault of ours is one line, with the stack only for who asks', () => {
	const fault = new TypeError('x is undefined\nsecond line');
	const quiet = replyFault(fault, {environment: {}});
	expect(quiet).toMatchObject({status: 70, out: ''});
	expect(quiet.err).toMatch(/^droprack: a fault of the program itself \(x is undefined\)\. Please report it[^\n]*\n$/);
	expect(replyFault(fault, {environment: {DROPRACK_DEBUG: '1'}}).err).toMatch(/\n {4}at /);
});
