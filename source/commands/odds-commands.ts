/** The commands about chances. */
import type {Command} from './command.ts';

const everywhere = ['json', 'units', 'strict', 'ascii', 'help', 'version'] as const;
const track = {
	name: 'TRACK',
	summary: 'a file (with a slash or .json), a saved or a shipped track, or - for standard input',
};

export const oddsCommands: readonly Command[] = [
	{
		name: 'odds',
		summary: 'how sure the choice is: chances of every row, what to measure',
		argument: track,
		options: ['car', 'risk', 'seed', 'pair', 'gearbox', 'top', ...everywhere],
		examples: [
			{line: 'droprack odds friday.json', gives: 'how sure it is, and what would make it surer'},
			{line: 'droprack odds friday.json --risk 5% --pair 33/38', gives: 'within a risk; one tooth'},
		],
		load: async () => (await import('./odds.ts')).odds,
	},
];
