import {expect, test} from 'vitest';
import {commands} from '../../source/commands/command-table.ts';
import {commandHelp, topHelp} from '../../source/commands/help.ts';

test.each(commands.map(command => [command.name, command] as const))(
	'the help of %s has its options and two examples in 80 columns',
	(name, command) => {
		const help = commandHelp(command);
		expect(help).toMatch(new RegExp(`^droprack ${name}`));
		expect(help.slice(help.indexOf('Examples')).match(/^ {2}droprack /gm)).toHaveLength(2);
		for (const option of command.options) expect(help).toContain(`--${option}`);
		expect(Math.max(...help.split('\n').map(line => line.length))).toBeLessThanOrEqual(80);
	},
);

test('the help of the program names every command in 80 columns', () => {
	const help = topHelp();
	for (const {name} of commands) expect(help).toMatch(new RegExp(`^ {2}${name}\\b`, 'm'));
	expect(Math.max(...help.split('\n').map(line => line.length))).toBeLessThanOrEqual(80);
});
