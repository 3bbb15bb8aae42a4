/** One run of the program: the words of the command line to a reply. */

import {version} from '../../package.json';
import {visible} from '../documents/visible.ts';
import {readCommandLine} from './arguments.ts';
import {commandNamed} from './command-table.ts';
import {commandHelp, topHelp} from './help.ts';
import {badInput, type Reply, replyDone, replyRefused, status} from './reply.ts';
import {shelf} from './shelf.ts';
import type {Surroundings} from './surroundings.ts';

/** Answers the words of the command line. Whatever is thrown on the way is our fault, and becomes status 70. */
export const answer = async (words: readonly string[], around: Surroundings): Promise<Reply> => {
	try {
		return await reply(words, around);
	} catch (error) {
		return replyFault(error, around);
	}
};

const reply = async (words: readonly string[], around: Surroundings): Promise<Reply> => {
	const line = readCommandLine(words);
	if (line.kind === 'bad') return replyRefused(badInput(`droprack: ${line.message}`));
	if (line.kind === 'version') return replyDone(`droprack ${version}\n`);
	if (line.kind === 'help') return replyDone(line.command ? commandHelp(line.command) : topHelp());
	// The bare command ranks the demo track.
	const command = line.command ?? commandNamed('rank')!;
	if (line.command?.argument?.name === 'TRACK' && line.request.argument === undefined) {
		return replyRefused(badInput(whichTrack(command.name, around)));
	}
	const run = await command.load();
	return run(line.request, around);
};

const whichTrack = (command: string, around: Surroundings): string => {
	const names = shelf('track', around).entries.map(({name, stem}) => `  ${visible(name)} (also called ${stem})`);
	return [`droprack ${command}: which TRACK? A file, - for standard input, or one of:`, ...names].join('\n');
};

/** One line for a person; the stack only for someone who asks for it. */
export const replyFault = (error: unknown, around: Pick<Surroundings, 'environment'>): Reply => {
	const cause = error instanceof Error ? error.message : String(error);
	const short = visible(cause.split('\n')[0] ?? '').slice(0, 200);
	const stack = around.environment.DROPRACK_DEBUG === '1' && error instanceof Error ? `${error.stack}\n` : '';
	const err = `droprack: a fault of the program itself (${short}). Please report it with the command and the documents.\n${stack}`;
	return {status: status.fault, out: '', err};
};
