/** The first line is the words of the command line, the rest standard input, in bytes. */
import {rmSync} from 'node:fs';
import {resolve} from 'node:path';
import {pathToFileURL} from 'node:url';
import {readCommandLine} from '../../../source/commands/arguments.ts';
import {commands} from '../../../source/commands/command-table.ts';
import {answer} from '../../../source/commands/main.ts';
import {options} from '../../../source/commands/options.ts';
import {status} from '../../../source/commands/reply.ts';
import type {Surroundings} from '../../../source/commands/surroundings.ts';
import {full} from '../../runs.ts';
import {newPlace} from '../place.ts';
import type {Answer, Reader} from '../reader.ts';
import {fixtureText, tracks} from './documents.ts';
import {plans} from './plans.ts';

const home = newPlace();

const around = (input: Buffer): Surroundings => ({
	shipped: pathToFileURL(`${resolve('tracks')}/`),
	environment: {DROPRACK_HOME: home},
	now: new Date(0),
	columns: 80,
	color: false,
	async *standardInput() {
		yield input;
	},
});

/** Commands whose argument is a path, whatever it looks like. */
const takesPath = new Set(['export', 'import', 'read']);
const looksLikePath = (word: string) => /[\\/]|\.[a-z]\w{0,4}$|\0/i.test(word) && !/^\d+\/\d+$/.test(word);

/** Nothing but the home may be touched, and nothing be copied to the clipboard of whoever looks on. */
function staysHere(words: readonly string[]): boolean {
	const line = readCommandLine(words);
	if (line.kind !== 'run') return true;
	const {command, request} = line;
	if (request.copy || words.some(looksLikePath)) return false;
	return !takesPath.has(command?.name ?? '') || (command?.name === 'read' && request.argument === '-');
}

async function read(text: string): Promise<Answer> {
	const [first = '', ...rest] = text.split('\n');
	const words = [...first.matchAll(/"([^"]*)"|\S+/g)].map(([word, quoted]) => quoted ?? word);
	if (!staysHere(words)) return {accepted: true};
	const reply = await answer(words, around(Buffer.from(rest.join('\n'), 'latin1')));
	rmSync(home, {recursive: true, force: true});
	const isKnown = Object.values(status).includes(reply.status) && reply.status !== status.fault;
	return {
		accepted: reply.status === status.done,
		// `show` prints a document as it was written; a QR code is black on white whatever the terminal.
		said: (reply.out + reply.err).replaceAll('\t', ' ').replace(words.includes('--qr') ? blackOnWhite : '', ''),
		broken: !isKnown
			? `the status is one of those that are told: ${reply.status} ${reply.err}`
			: reply.status >= status.badInput && (reply.out !== '' || reply.err.trim() === '')
				? `a refusal has its reason, and no result: ${reply.out.slice(0, 200)}`
				: undefined,
	};
}

// biome-ignore lint/suspicious/noControlCharactersInRegex: what colors text
const blackOnWhite = /\x1b\[[\d;]*m/g;

const inBytes = (text: string) => Buffer.from(text).toString('latin1');

/** The examples of every command's help, of a track that is there; without those that need more than one line. */
async function fromHelp(): Promise<string[]> {
	const lines = commands.flatMap(({examples}) => examples.map(({line}) => line));
	const asked = lines.map(line =>
		line
			.replace(/^droprack /, '')
			.replace(/ [>|].*/, '')
			.replaceAll(/\S+\.json/g, 'quillmere')
			.replaceAll(/--pair \S+/g, ''),
	);
	const accepted: string[] = [];
	for (const line of asked) {
		const answer = await read(line);
		if (answer.accepted && answer.said !== undefined) accepted.push(line);
	}
	return accepted;
}

export const commandLines: Reader = {
	name: 'commands',
	examples: async () => {
		const [planText, , line] = await plans.examples();
		return [
			...(full ? await fromHelp() : []),
			'rank quillmere --top 3',
			'rpm tarrowdale --gearbox A --units metric --json',
			'run Quillmere --ascii --strict --car demo',
			'tracks --json',
			'cars --prefer demo',
			'show tarrowdale',
			'schema track',
			'history quillmere --add --date 2026-05-31 --rpm 8840 --remark loose',
			'new track --name Mine --from quillmere',
			'save quillmere --gearbox A --notes fine',
			'help rank',
			`rank -\n${inBytes(fixtureText('oval'))}`,
			`compare - quillmere\n${inBytes(fixtureText('oval'))}`,
			`read -\n${inBytes(planText!)}`,
			`read - --units metric\n${inBytes(line!)}`,
			`card driver -\n${inBytes(fixtureText('oval'))}`,
			`share - --short\n${inBytes(fixtureText('oval'))}`,
		];
	},
	words: [
		...commands.map(({name}) => name),
		...Object.keys(options).map(name => `--${name}`),
		...[
			'-',
			'--',
			'-h',
			'--json=1',
			'--top=0',
			'demo',
			'quillmere',
			'Quillmere',
			'tarrowdale',
			'33/38',
			'0/0',
			'us',
			'metric',
			'driver',
			'swap',
			'engine',
			'2026-02-30',
		],
		...tracks.words,
	],
	longest: 6000,
	// A ranking takes some 30 million; odds draw every number over and over.
	work: {start: 600_000_000, perCharacter: 0},
	read,
};
