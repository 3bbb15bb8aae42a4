/** The commands about what is handed over. */
import type {Command} from './command.ts';

const everywhere = ['json', 'units', 'strict', 'ascii', 'help', 'version'] as const;
const track = {
	name: 'TRACK',
	summary: 'a file (with a slash or .json), a saved or a shipped track, or - for standard input',
};
const compared = 'a file, a saved or shipped track or car, or - for standard input';

export const sharingCommands: readonly Command[] = [
	{
		name: 'share',
		summary: 'the plan as text for a message, as one line, or as a QR code',
		argument: track,
		options: ['car', 'pair', 'gearbox', 'notes', 'short', 'qr', 'copy', ...everywhere],
		examples: [
			{line: 'droprack share friday.json --pair 33/38 > plan.txt', gives: 'the whole plan, for a message or a file'},
			{line: 'droprack share friday.json --short --qr', gives: 'one line, to be scanned from the screen'},
		],
		load: async () => (await import('./share.ts')).share,
	},
	{
		name: 'read',
		summary: 'read a plan that was sent, compute it again, and say what differs from yours',
		argument: {name: 'FILE', summary: 'a file that holds the message, or - for standard input'},
		options: ['take', 'replace', ...everywhere],
		examples: [
			{line: 'droprack read plan.txt', gives: 'which numbers agree; nothing is taken over'},
			{line: 'droprack read plan.txt --take', gives: 'the same, and the track is kept with its pair and set'},
		],
		load: async () => (await import('./read.ts')).read,
	},
	{
		name: 'card',
		summary: 'a card for the driver, the swap or the engine builder, to print or send',
		argument: {name: 'driver|swap|engine', summary: 'whom it is for'},
		second: track,
		options: ['car', 'pair', 'gearbox', 'copy', ...everywhere],
		examples: [
			{line: 'droprack card driver friday.json --pair 33/38', gives: 'shift, pit-road and restart RPM'},
			{line: 'droprack card swap friday.json | lp', gives: 'teeth, hand-turn check, two lines to sign'},
		],
		load: async () => (await import('./card.ts')).card,
	},
	{
		name: 'compare',
		summary: 'two plans, tracks or cars side by side, differences only',
		argument: {name: 'A', summary: compared},
		second: {name: 'B', summary: 'the same'},
		options: everywhere,
		examples: [
			{line: 'droprack compare friday.json saturday.json', gives: 'what was changed; units do not matter'},
			{line: 'droprack compare plan.txt friday.json', gives: 'the track of a plan beside yours'},
		],
		load: async () => (await import('./compare.ts')).compareDocuments,
	},
];
