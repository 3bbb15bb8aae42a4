/** The commands about what is kept. */
import type {Command} from './command.ts';

const everywhere = ['json', 'units', 'strict', 'ascii', 'help', 'version'] as const;
const track = {
	name: 'TRACK',
	summary: 'a file (with a slash or .json), a saved or a shipped track, or - for standard input',
};
const directory = {name: 'DIR', summary: 'a directory, such as one in version control'};

export const storeCommands: readonly Command[] = [
	{
		name: 'new',
		summary: 'begin a track or a car of your own as a copy of another',
		argument: {name: 'track|car', summary: 'which kind of document'},
		options: ['name', 'from', ...everywhere],
		examples: [
			{line: 'droprack new track --name "Half mile"', gives: 'begun from the demo track'},
			{line: 'droprack new car --name Ours --from demo', gives: 'begun from the demo car'},
		],
		load: async () => (await import('./new.ts')).newDocument,
	},
	{
		name: 'save',
		summary: 'keep a track or a car, with the car, pair, set and notes for a track',
		argument: {name: 'DOCUMENT', summary: 'a file, a name, or - for standard input'},
		options: ['car', 'pair', 'gearbox', 'notes', 'replace', ...everywhere],
		examples: [
			{line: 'droprack save friday.json --car Ours --pair 33/38', gives: 'kept with what was chosen'},
			{line: 'droprack save ours.json --replace', gives: 'in place of the one that was saved'},
		],
		load: async () => (await import('./save.ts')).save,
	},
	{
		name: 'history',
		summary: 'what was run at a track and seen there; with --add an entry more',
		argument: track,
		options: ['add', 'date', 'session', 'pair', 'gearbox', 'rpm', 'at', 'situation', 'remark', 'top', ...everywhere],
		examples: [
			{line: 'droprack history "Half mile"', gives: 'the latest first'},
			{line: 'droprack history "Half mile" --add --session race --rpm 8840', gives: 'with pair, set and air as saved'},
		],
		load: async () => (await import('./history.ts')).history,
	},
	{
		name: 'forget',
		summary: 'take a saved track or car away; a shipped one of its name is used again',
		argument: {name: 'NAME', summary: 'a saved track or car'},
		options: everywhere,
		examples: [
			{line: 'droprack forget "Half mile"', gives: 'its file stays, ending in .bak'},
			{line: 'droprack forget "Half mile" --json', gives: 'the same for programs'},
		],
		load: async () => (await import('./forget.ts')).forget,
	},
	{
		name: 'check',
		summary: 'list what is wrong in what is kept, and what to do about it',
		options: everywhere,
		examples: [
			{line: 'droprack check', gives: 'broken files, doubled names, leftovers'},
			{line: 'droprack check --strict', gives: 'status 1 if there is anything'},
		],
		load: async () => (await import('./check.ts')).check,
	},
	{
		name: 'export',
		summary: 'write everything that is kept to a directory, one file each',
		argument: directory,
		options: everywhere,
		examples: [
			{line: 'droprack export team', gives: 'files to keep in version control'},
			{line: 'droprack export team --json', gives: 'which were written, for programs'},
		],
		load: async () => (await import('./export.ts')).exportAll,
	},
	{
		name: 'import',
		summary: 'take in what was exported, and track and car files; writes over nothing',
		argument: directory,
		options: ['replace', ...everywhere],
		examples: [
			{line: 'droprack import team', gives: 'what is new, and what differs'},
			{line: 'droprack import team --replace', gives: 'also what differs; yours stays as .bak'},
		],
		load: async () => (await import('./import.ts')).importAll,
	},
];
