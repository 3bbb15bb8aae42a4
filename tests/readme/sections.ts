/** The parts of the README that are made from the program: each stands between `<!-- name -->` and `<!-- /name -->`. */
import {commands} from '../../source/commands/command-table.ts';
import {answer} from '../../source/commands/main.ts';
import {option, options} from '../../source/commands/options.ts';
import {demo, shelf} from '../../source/commands/shelf.ts';
import type {Surroundings} from '../../source/commands/surroundings.ts';
import type {JsonObject} from '../../source/documents/json.ts';
import {keyTableMarkdown} from '../../source/screens/keys/key-table-markdown.ts';
import type {OpenDocument} from '../../source/screens/session/documents.ts';
import {startSession} from '../../source/screens/session/session.ts';
import {linesOf, stateOf} from '../screens/views/states.ts';
import {errorOf, finestError, type OutsideCheck, worstCase} from './outside-check.ts';
import {outsideChecks} from './outside-checks.ts';

/** A fixed day, no saved preferences and no place for any, no color, the width of a plain terminal. */
const around: Surroundings = {
	shipped: new URL('../../tracks/', import.meta.url),
	environment: {DROPRACK_HOME: '/dev/null/none'},
	now: new Date(2026, 2, 14),
	columns: 80,
	color: false,
	standardInput: () => {
		throw new Error('Nothing in the README reads standard input.');
	},
};

const ranking = async (): Promise<string> => {
	const words = ['rank', demo.track, '--top', '5'];
	const {out} = await answer(words, around);
	return ['```', `$ droprack ${words.join(' ')}`, `${out}\`\`\``].join('\n');
};

/** The example log, without the pictures. */
const learning = async (): Promise<string> => {
	const words = ['learn', 'tracks/logs/quillmere.csv', 'quillmere'];
	const {out} = await answer(words, around);
	const told = out.slice(0, out.indexOf('Engine speed over road speed')).trimEnd();
	return ['```', `$ droprack ${words.join(' ')}`, told, '```'].join('\n');
};

const cell = (text: string): string => text.replaceAll('|', '\\|');

const tableOf = (heads: readonly string[], rows: readonly (readonly string[])[]): string => {
	const line = (cells: readonly string[]) => `| ${cells.map(cell).join(' | ')} |`;
	return [line(heads), line(heads.map(() => '---')), ...rows.map(line)].join('\n');
};

const code = (text: string): string => `\`${text}\``;

/** The options that every command takes stand in the table of options alone. */
const everywhere = Object.keys(options).filter(name => commands.every(one => one.options.some(own => own === name)));

const commandTable = (): string =>
	tableOf(
		['command', 'what it does', 'its own options'],
		commands.map(({name, argument, many, second, summary, options: taken}) => [
			code(
				['droprack', name, argument && `${argument.name}${many ? '…' : ''}`, second?.name].filter(Boolean).join(' '),
			),
			summary,
			taken
				.filter(own => !everywhere.includes(own))
				.map(own => code(`--${own}`))
				.join(' '),
		]),
	);

const optionTable = (): string =>
	tableOf(
		['option', 'meaning'],
		(Object.keys(options) as (keyof typeof options)[]).map(name => {
			const {value, short, summary} = option(name);
			const spelled = [short === undefined ? '' : `-${short}, `, `--${name}`, value === undefined ? '' : ` ${value}`];
			return [code(spelled.join('')), summary];
		}),
	);

/** One digit: a second one would differ from machine to machine. */
const errorText = (error: number): string => (error < finestError ? '< 1e-9' : error.toExponential(0));

const decimalsOf = (text: string): number => text.split('.')[1]?.length ?? 0;

const checkRow = (check: OutsideCheck): string[] => {
	const worst = worstCase(check);
	return [
		check.what,
		`${check.source}; ${check.mark}`,
		[worst.outside, worst.unit ?? check.unit].filter(Boolean).join(' '),
		worst.ours.toFixed(decimalsOf(worst.outside)),
		errorText(errorOf(worst)),
	];
};

const checkTable = (): string =>
	tableOf(['what', 'source', 'outside', 'ours', 'relative error'], outsideChecks.map(checkRow));

/** The ranking of the demo as the screen shows it at 80 × 24. */
const screen = (): string => {
	const read = (kind: 'track' | 'car', stem: string): OpenDocument => {
		const {document} = shelf(kind, around).entries.find(entry => entry.stem === stem)!;
		const json = document as JsonObject;
		return {id: `${kind}:${stem}`, kind, from: 'shipped', json, saved: json, shipped: json, plan: undefined};
	};
	const [track, car] = [read('track', demo.track), read('car', demo.car)];
	const documents = {open: {[track.id]: track, [car.id]: car}, track: track.id, car: car.id};
	return ['```', ...linesOf(stateOf(startSession(documents, 'us')), {width: 80, height: 24, ascii: false}), '```'].join(
		'\n',
	);
};

const sections: Record<string, () => string | Promise<string>> = {
	ranking,
	learning,
	commands: () => `${commandTable()}\n\n${optionTable()}`,
	'outside checks': checkTable,
	screen,
	keys: keyTableMarkdown,
};

/** The text with every section written anew. */
export const withSections = async (readme: string): Promise<string> => {
	let text = readme;
	for (const [name, write] of Object.entries(sections)) {
		const [open, close] = [`<!-- ${name} -->\n`, `\n<!-- /${name} -->`];
		const [from, to] = [text.indexOf(open), text.indexOf(close)];
		if (from < 0 || to < from) throw new Error(`The README lacks ${open.trim()} ... ${close.trim()}.`);
		text = `${text.slice(0, from + open.length)}${await write()}${text.slice(to)}`;
	}
	return text;
};
