/** The commands about learning from practice. */
import type {Command} from './command.ts';

const everywhere = ['json', 'units', 'strict', 'ascii', 'help', 'version'] as const;

export const learnCommands: readonly Command[] = [
	{
		name: 'learn',
		summary: 'circumference, growth and drag from a logged run, or from RPM that was seen',
		argument: {
			name: '[LOG]',
			summary: 'a logged run: comma, semicolon or tab between columns, or - for standard input; left out, by hand',
		},
		second: {
			name: 'TRACK',
			summary: 'a file (with a slash or .json), or a saved or shipped track',
		},
		options: ['car', 'pair', 'gearbox', 'seen', 'hold', 'column', 'grip', 'accept', 'take-back', ...everywhere],
		examples: [
			{line: 'droprack learn friday.json --seen "Back 8420 rpm gear 4"', gives: 'what one number changes'},
			{
				line: 'droprack learn run.csv friday.json --accept all',
				gives: 'what the log shows, written into track and car',
			},
		],
		load: async () => (await import('./learn.ts')).learn,
	},
];
