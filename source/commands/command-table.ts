/** Every command once: parsing, help and the messages about unknown ones are made from this table. */
import type {Command} from './command.ts';
import {learnCommands} from './learn-commands.ts';
import {lifeCommands} from './life-commands.ts';
import {loadingCommands} from './loading-commands.ts';
import {oddsCommands} from './odds-commands.ts';
import {sharingCommands} from './sharing-commands.ts';
import {storeCommands} from './store-commands.ts';

const everywhere = ['json', 'units', 'strict', 'ascii', 'help', 'version'] as const;
const track = {
	name: 'TRACK',
	summary: 'a file (with a slash or .json), a saved or a shipped track, or - for standard input',
};

export const commands: readonly Command[] = [
	{
		name: 'rank',
		summary: 'rank every pair and gearbox set, best first, with checks and reasons',
		argument: track,
		options: ['car', 'situation', 'top', 'risk', 'seed', ...everywhere],
		examples: [
			{line: 'droprack rank friday.json --car ours.json', gives: 'your car at your track'},
			{line: 'droprack rank friday.json --situation "In the tow" --top 5', gives: 'the five best in the tow'},
		],
		load: async () => (await import('./rank.ts')).rank,
	},
	{
		name: 'rpm',
		summary: 'RPM at every point of the track in every gear',
		argument: track,
		options: ['car', 'pair', 'gearbox', ...everywhere],
		examples: [
			{line: 'droprack rpm friday.json', gives: 'with the installed pair and set'},
			{line: 'droprack rpm friday.json --pair 33/38 --gearbox A --units metric', gives: 'with others, in km/h'},
		],
		load: async () => (await import('./rpm.ts')).rpm,
	},
	{
		name: 'run',
		summary: 'one pair on each straight: gears, shifts, speeds, times; all checks',
		argument: track,
		options: ['car', 'pair', 'gearbox', ...everywhere],
		examples: [
			{line: 'droprack run friday.json --pair 33/38', gives: 'what this pair would do'},
			{line: 'droprack run friday.json --strict', gives: 'status 1 if the installed pair fails a check'},
		],
		load: async () => (await import('./run.ts')).run,
	},
	{
		name: 'tracks',
		summary: 'list the tracks, shipped and saved',
		options: everywhere,
		examples: [
			{line: 'droprack tracks', gives: 'one line each'},
			{line: 'droprack tracks --json', gives: 'the same for programs'},
		],
		load: async () => (await import('./tracks.ts')).tracks,
	},
	{
		name: 'cars',
		summary: 'list the cars, shipped and saved; choose the preferred one',
		options: ['prefer', ...everywhere],
		examples: [
			{line: 'droprack cars', gives: 'one line each'},
			{line: 'droprack cars --prefer none', gives: 'back to the demo car'},
		],
		load: async () => (await import('./cars.ts')).cars,
	},
	{
		name: 'show',
		summary: 'print a track or a car as a document, to start your own from',
		argument: {name: 'NAME', summary: 'a saved or shipped track or car'},
		options: ['shipped', ...everywhere],
		examples: [
			{line: 'droprack show NAME', gives: 'the document as it was written'},
			{line: 'droprack show NAME > friday.json', gives: 'a file of your own to change'},
		],
		load: async () => (await import('./show.ts')).show,
	},
	{
		name: 'schema',
		summary: 'print the JSON Schema of track or car documents, for editors',
		argument: {name: 'track|car', summary: 'which kind of document'},
		options: everywhere,
		examples: [
			{line: 'droprack schema track > track.schema.json', gives: 'for an editor to check tracks with'},
			{line: 'droprack schema car', gives: 'what a car document may hold'},
		],
		load: async () => (await import('./schema.ts')).schema,
	},
	...learnCommands,
	...lifeCommands,
	...oddsCommands,
	...storeCommands,
	...sharingCommands,
	...loadingCommands,
];

/** The command of that name. */
export const commandNamed = (name: string): Command | undefined => commands.find(command => command.name === name);
