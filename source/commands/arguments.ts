/** From the words of the command line to a request, or to what is wrong with them. */
import {parseArgs} from 'node:util';
import {didYouMean} from '../documents/nearest.ts';
import type {Command} from './command.ts';
import {commandNamed, commands} from './command-table.ts';
import {type OptionName, option, options} from './options.ts';
import {type Given, type Request, toRequest} from './request.ts';

export type CommandLine =
	/** Without a command the request is for the demo. */
	| {kind: 'run'; command: Command | undefined; request: Request}
	| {kind: 'help'; command: Command | undefined}
	| {kind: 'version'}
	| {kind: 'bad'; message: string};

type Token = {
	kind: string;
	name?: string;
	rawName?: string;
	value?: string | undefined;
	inlineValue?: boolean | undefined;
};

const bad = (message: string): CommandLine => ({kind: 'bad', message});
const isOption = (name: string): name is OptionName => Object.hasOwn(options, name);
/** The options that stand without a command: they ask for the ranking of the demo. */
const bareOptions: readonly OptionName[] = commandNamed('rank')?.options ?? [];

const parserOptions = Object.fromEntries(
	Object.keys(options).map(name => {
		const {value, short} = option(name as OptionName);
		return [name, {type: value === undefined ? 'boolean' : 'string', ...(short && {short})}] as const;
	}),
);

/** What is wrong with one option as given, or undefined. */
const optionProblem = (
	token: Token,
	allowed: readonly OptionName[],
	command: Command | undefined,
): string | undefined => {
	const name = token.name ?? '';
	const written = token.rawName ?? `--${name}`;
	const where = command ? `droprack ${command.name}` : 'droprack';
	if (!isOption(name)) {
		const meant = didYouMean(
			written,
			allowed.map(known => `--${known}`),
		);
		return [`unknown option ${written}.`, meant, `${where} --help lists the options.`].filter(Boolean).join(' ');
	}
	if (!allowed.includes(name)) return `${where} takes no ${written}. ${where} --help lists its options.`;
	const {value} = option(name);
	if (value === undefined) return token.inlineValue ? `${written} takes no value, found ${token.value}.` : undefined;
	const missing = token.value === undefined || (!token.inlineValue && /^-./.test(token.value));
	return missing || token.value === '' ? `${written} needs a value: ${written} ${value}.` : undefined;
};

const unknownCommand = (name: string): string => {
	const looksLikeFile = name.includes('/') || name.endsWith('.json');
	const names = commands.map(command => command.name);
	const meant = looksLikeFile ? `To rank a track: droprack rank ${name}` : didYouMean(name, names);
	const first = [`unknown command ${name}.`, meant].filter(Boolean).join(' ');
	return `${first}\nCommands: ${names.join(', ')}. droprack --help says more.`;
};

/**
 * Reads the words after the program's name. Options may stand anywhere.
 * `--help` and `--version` come before everything that is wrong with the rest.
 */
export const readCommandLine = (words: readonly string[]): CommandLine => {
	const {tokens, positionals} = parseArgs({
		args: [...words],
		options: parserOptions,
		strict: false,
		allowPositionals: true,
		tokens: true,
	});
	const asksHelp = positionals[0] === 'help';
	const [name, argument, ...more] = asksHelp ? positionals.slice(1) : positionals;
	const command = name === undefined ? undefined : commandNamed(name);
	if (name !== undefined && !command) return bad(unknownCommand(name));
	const optionTokens = tokens.filter(token => token.kind === 'option') as Token[];
	const has = (option: OptionName) => optionTokens.some(token => token.name === option);
	if (asksHelp || has('help')) return {kind: 'help', command};
	if (has('version')) return {kind: 'version'};

	const allowed = command?.options ?? bareOptions;
	const given: Given = {};
	for (const token of optionTokens) {
		const problem = optionProblem(token, allowed, command);
		if (problem !== undefined) return bad(problem);
		add(given, token.name as OptionName, token.value);
	}
	const following = [argument, ...more].filter(word => word !== undefined);
	const surplus = command?.many ? [] : following.slice(command?.second ? 2 : command?.argument ? 1 : 0);
	if (command && surplus.length > 0) return bad(surplusWords(command, surplus));
	const request = toRequest(argument, given, command?.second ? more[0] : undefined, command?.many ? more : []);
	return typeof request === 'string' ? bad(request) : {kind: 'run', command, request};
};

/** The last of a repeated option counts, unless it may be repeated. */
const add = (given: Given, name: OptionName, value: string | undefined): void => {
	const before = given[name];
	if (option(name).many !== true || value === undefined) given[name] = value ?? true;
	else given[name] = [...(Array.isArray(before) ? before : []), value];
};

const surplusWords = (command: Command, surplus: readonly string[]): string => {
	const {argument, second} = command;
	const takes = second
		? `takes ${argument?.name} and ${second.name}`
		: argument
			? `takes one ${argument.name}`
			: 'takes no argument';
	const quote = argument ? ' A name with blanks needs quotes.' : '';
	return `droprack ${command.name} ${takes}, found also: ${surplus.join(' ')}.${quote}`;
};
