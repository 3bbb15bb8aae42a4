/** `droprack show`: a named document as it was written. */
import type {CommandRun} from './command.ts';
import {findDocument, isFileName} from './find-document.ts';
import {badInput, replyDone, replyRefused} from './reply.ts';
import {shelf, shippedShelf} from './shelf.ts';

const kinds = ['track', 'car'] as const;

export const show: CommandRun = async ({argument, shipped}, around) => {
	const shelves = kinds.map(kind =>
		shipped ? {entries: shippedShelf(kind, around.shipped), notes: []} : shelf(kind, around),
	);
	const shelved = shelves.flatMap(({entries}) => entries);
	const notes = shelves.flatMap(one => one.notes);
	if (argument === undefined) {
		const names = shelved.map(({name, kind}) => `  ${name} (${kind})`);
		return replyRefused(badInput(['droprack show: which NAME? There are:', ...names].join('\n')));
	}
	if (isFileName(argument) || argument === '-') {
		return replyRefused(badInput('droprack show: takes the name of a track or a car; a file is a document already.'));
	}
	const entry = findDocument(argument, shelved, 'track or car');
	if (!entry.ok) return replyRefused(entry);
	const {text} = entry.value;
	return replyDone(text.endsWith('\n') ? text : `${text}\n`, notes);
};
