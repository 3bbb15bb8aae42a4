/** The commands about what a race asks of engine and tank. */
import type {Command} from './command.ts';

const everywhere = ['json', 'units', 'strict', 'ascii', 'help', 'version'] as const;
const track = {
	name: 'TRACK',
	summary: 'a file (with a slash or .json), a saved or a shipped track, or - for standard input',
};

export const lifeCommands: readonly Command[] = [
	{
		name: 'life',
		summary: 'what the engine goes through: turns, time by RPM and gear, time above an RPM',
		argument: track,
		options: ['car', 'pair', 'gearbox', 'against', 'situation', 'above', 'laps', ...everywhere],
		examples: [
			{line: 'droprack life friday.json --pair 31/40', gives: 'this pair beside the installed one'},
			{line: 'droprack life friday.json --above 8700 --laps 300', gives: 'the time above 8700 rpm in 300 laps'},
		],
		load: async () => (await import('./life.ts')).life,
	},
	{
		name: 'fuel',
		summary: 'how far the fuel goes: mileage, laps to a tank, fuel for the race and stops',
		argument: track,
		options: ['car', 'pair', 'gearbox', 'against', 'situation', 'laps', ...everywhere],
		examples: [
			{line: 'droprack fuel friday.json', gives: 'the installed pair beside the best'},
			{line: 'droprack fuel friday.json --situation "In the tow" --units metric', gives: 'in the tow, in liters'},
		],
		load: async () => (await import('./fuel.ts')).fuel,
	},
];
