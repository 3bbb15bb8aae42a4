/** The commands about what to take along and what to build. */
import type {Command} from './command.ts';

const everywhere = ['json', 'units', 'strict', 'ascii', 'help', 'version'] as const;
const tracks = {
	name: 'TRACK',
	summary: 'as many as lie ahead: files (with a slash or .json), saved or shipped tracks, or - for standard input',
};

export const loadingCommands: readonly Command[] = [
	{
		name: 'load',
		summary: 'the fewest pairs to carry: for every track its best, and steps shorter and taller',
		argument: tracks,
		many: true,
		options: ['car', 'shorter', 'taller', 'within', 'step', 'gearbox', 'each-set', ...everywhere],
		examples: [
			{line: 'droprack load friday.json saturday.json', gives: 'what goes on the truck, and why'},
			{line: 'droprack load friday.json saturday.json --shorter 2 --taller 0', gives: 'with other steps'},
		],
		load: async () => (await import('./load.ts')).load,
	},
];
