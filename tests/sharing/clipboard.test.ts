import xterm from '@xterm/headless';
import {expect, test} from 'vitest';
import {toClipboard} from '../../source/sharing/clipboard.ts';
import {printPlan} from '../../source/sharing/print-plan.ts';
import {samplePlan} from './sample.ts';

test('the bytes for the clipboard reach a terminal whole and leave its screen alone', async () => {
	const text = `${printPlan(await samplePlan())}\nStraße 漢 😀`;
	const sent = toClipboard(text, {TERM: 'xterm-256color'});
	const terminal = new xterm.Terminal({allowProposedApi: true});
	const heard: string[] = [];
	terminal.parser.registerOscHandler(52, data => heard.push(data) > 0);
	await new Promise<void>(done => terminal.write(sent.kind === 'write' ? sent.bytes : '', done));
	expect(heard.length).toBe(1);
	const [target, base64] = heard[0]!.split(';');
	expect(target).toBe('c');
	expect(Buffer.from(base64!, 'base64').toString('utf8')).toBe(text);
	expect(terminal.buffer.active.getLine(0)!.translateToString(true)).toBe('');
	expect(terminal.buffer.active.cursorX).toBe(0);
});

test('inside tmux its buffer command takes the text', () => {
	expect(toClipboard('text', {TMUX: '/tmp/tmux-0/default,1,0'})).toEqual({
		kind: 'run',
		command: 'tmux',
		args: ['load-buffer', '-w', '-'],
		input: 'text',
	});
	expect(toClipboard('text', {TMUX: ''}).kind).toBe('write');
});
