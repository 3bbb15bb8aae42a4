/** A text sent to the clipboard of the terminal that the person sits at. */
import {execFileSync} from 'node:child_process';
import {toClipboard} from '../sharing/clipboard.ts';
import type {Reply} from './reply.ts';
import type {Surroundings} from './surroundings.ts';

const waitMs = 5000;
const always = '> FILE keeps it in a file.';

/** The reply, with the text on its way to the clipboard. The bytes go to standard error, so that a pipe gets only the result. */
export const withCopy = (reply: Reply, text: string, around: Surroundings): Reply => {
	const way = toClipboard(text, around.environment);
	if (way.kind === 'write') {
		const note = `droprack: sent to the terminal's clipboard; not every terminal takes it. ${always}\n`;
		return {...reply, err: `${way.bytes}${reply.err}${note}`};
	}
	try {
		execFileSync(way.command, way.args, {input: way.input, timeout: waitMs, stdio: ['pipe', 'ignore', 'ignore']});
		return {
			...reply,
			err: `${reply.err}droprack: in the buffer of tmux and sent to the terminal's clipboard. ${always}\n`,
		};
	} catch {
		return {...reply, err: `${reply.err}droprack: tmux did not take it for the clipboard. ${always}\n`};
	}
};
