/** What a command is: its words for the table and the help, and what runs. */
import type {OptionName} from './options.ts';
import type {Reply} from './reply.ts';
import type {Request} from './request.ts';
import type {Surroundings} from './surroundings.ts';

export type CommandRun = (request: Request, around: Surroundings) => Promise<Reply>;

export type Command = {
	name: string;
	summary: string;
	/** The argument, where there is one. */
	argument?: {name: string; summary: string};
	/** The one after it, where there is one. */
	second?: {name: string; summary: string};
	/** Whether the argument may be given several times. */
	many?: boolean;
	options: readonly OptionName[];
	examples: readonly {line: string; gives: string}[];
	/** Loads what the command needs, and only that. */
	load: () => Promise<CommandRun>;
};
