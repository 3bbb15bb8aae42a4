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
		summary: 'the fewest pairs to carry: each track its best, and steps beside it',
		argument: tracks,
		many: true,
		options: ['car', 'shorter', 'taller', 'within', 'step', 'gearbox', 'each-set', ...everywhere],
		examples: [
			{line: 'droprack load friday.json saturday.json', gives: 'what goes on the truck, and why'},
			{line: 'droprack load friday.json saturday.json --shorter 2', gives: 'with two steps shorter and one taller'},
		],
		load: async () => (await import('./load.ts')).load,
	},
	{
		name: 'gearbox',
		summary: 'the best gears to build into the box: for each track, or one for all',
		argument: tracks,
		many: true,
		options: ['car', 'pair', 'together', 'top', ...everywhere],
		examples: [
			{line: 'droprack gearbox friday.json', gives: 'the best set and pair, the next best, every check'},
			{
				line: 'droprack gearbox friday.json saturday.json --together',
				gives: 'one set for both, and its cost',
			},
		],
		load: async () => (await import('./gearbox.ts')).gearbox,
	},
];
