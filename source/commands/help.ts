/** Help, made from the table of commands. */
import type {Command} from './command.ts';
import {commands} from './command-table.ts';
import {type OptionName, option} from './options.ts';

const width = 80;

/** Two columns, the second wrapped. */
const twoColumns = (rows: readonly (readonly [string, string])[]): string[] => {
	const first = Math.max(...rows.map(([left]) => left.length)) + 4;
	return rows.flatMap(([left, right]) => {
		const lines = [''];
		for (const word of right.split(' ')) {
			const last = lines.at(-1) ?? '';
			if (last !== '' && first + last.length + 1 + word.length > width) lines.push(word);
			else lines[lines.length - 1] = last === '' ? word : `${last} ${word}`;
		}
		return lines.map((line, index) => `  ${(index === 0 ? left : '').padEnd(first - 2)}${line}`);
	});
};

const optionRow = (name: OptionName): readonly [string, string] => {
	const {value, short, summary} = option(name);
	return [`${short ? `-${short}, ` : ''}--${name}${value ? ` ${value}` : ''}`, summary];
};

/** The help of one command. */
export const commandHelp = (command: Command): string => {
	const described = [command.argument, command.second].filter(one => one !== undefined);
	const argument = described.map(({name}) => ` ${name}${command.many ? '…' : ''}`).join('');
	const parts = [
		`droprack ${command.name}${argument} [options]`,
		'',
		`  ${command.summary[0]?.toUpperCase()}${command.summary.slice(1)}.`,
		'',
		...(described.length > 0 ? [...twoColumns(described.map(({name, summary}) => [name, summary] as const)), ''] : []),
		'Options',
		...twoColumns(command.options.map(optionRow)),
		'',
		'Examples',
		...command.examples.flatMap(({line, gives}) => [`  ${line}`, `      ${gives}`]),
	];
	return `${parts.join('\n')}\n`;
};

/** The help of the whole program. */
export const topHelp = (): string => {
	const rows = commands.map(
		({name, argument, second, many, summary}) =>
			[
				[name, argument && `${argument.name}${many ? '…' : ''}`, second?.name].filter(Boolean).join(' '),
				summary,
			] as const,
	);
	const parts = [
		'droprack ranks the drop gears on the rack for a stock car at a track.',
		'',
		'  droprack             the screen; where there is no terminal, the ranking of',
		'                       the demo track',
		'  droprack COMMAND --help',
		'',
		'Commands',
		...twoColumns(rows),
		'',
		'Exit status: 0 done, 1 a check fails (with --strict), 2 bad input, 3 could not',
		'read or write, 70 a fault of droprack itself.',
	];
	return `${parts.join('\n')}\n`;
};
