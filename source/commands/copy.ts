/** A text sent to the clipboard of the terminal that the person sits at. */
import {execFileSync} from 'node:child_process';
import {toClipboard} from '../sharing/clipboard.ts';
import type {Reply} from './reply.ts';
import type {Surroundings} from './surroundings.ts';

const waitMs = 5000;
const always = '> FILE keeps it in a file.';

/** Sends the text on its way and says so; `write` gets the bytes that are for the terminal itself. */
export const copyText = (text: string, environment: Surroundings['environment'], write: (bytes: string) => void) => {
	const way = toClipboard(text, environment);
	if (way.kind === 'write') {
		write(way.bytes);
		return "sent to the terminal's clipboard; not every terminal takes it.";
	}
	try {
		execFileSync(way.command, way.args, {input: way.input, timeout: waitMs, stdio: ['pipe', 'ignore', 'ignore']});
		return "in the buffer of tmux and sent to the terminal's clipboard.";
	} catch {
		return 'tmux did not take it for the clipboard.';
	}
};

/** The reply, with the text copied. The bytes go to standard error, so that a pipe gets only the result. */
export const withCopy = (reply: Reply, text: string, around: Surroundings): Reply => {
	let bytes = '';
	const words = copyText(text, around.environment, codes => {
		bytes = codes;
	});
	return {...reply, err: `${bytes}${reply.err}droprack: ${words} ${always}\n`};
};
