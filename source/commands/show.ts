/** `droprack show`: a named document as it was written. */
import type {CommandRun} from './command.ts';
import {findDocument, isFileName} from './find-document.ts';
import {badInput, replyDone, replyRefused} from './reply.ts';
import {shelf} from './shelf.ts';

export const show: CommandRun = async ({argument}, around) => {
	const shelved = [...shelf('track', around.shipped), ...shelf('car', around.shipped)];
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
	return replyDone(text.endsWith('\n') ? text : `${text}\n`);
};
