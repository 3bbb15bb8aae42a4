/** `droprack forget`: a saved document taken away; a shipped one of the same name is then seen again. */
import {visible} from '../documents/visible.ts';
import {homeDirectory} from '../store/home.ts';
import {keptNamed} from '../store/list-kept.ts';
import {forgetKept} from '../store/save-kept.ts';
import type {CommandRun} from './command.ts';
import {findDocument} from './find-document.ts';
import {badInput, replyRefused} from './reply.ts';
import {shippedName} from './save.ts';
import {shelf} from './shelf.ts';
import {replyChanged, replyProblem, replyWritten} from './store-reply.ts';

export const forget: CommandRun = async (request, around) => {
	const shelves = [shelf('track', around), shelf('car', around)];
	const saved = shelves.flatMap(({entries}) => entries);
	if (request.argument === undefined)
		return replyRefused(badInput('droprack forget: which NAME? droprack tracks and droprack cars list them.'));
	const entry = findDocument(request.argument, saved, 'track or car');
	if (!entry.ok) return replyRefused(entry);
	const {kind, name, from} = entry.value;
	if (from === 'shipped')
		return replyRefused(badInput(`droprack forget: ${visible(name)} is shipped with the program and not saved.`));
	const home = homeDirectory(around.environment);
	const keptKind = kind === 'track' ? 'preset' : 'saved-car';
	const kept = keptNamed(home, keptKind, name);
	if (!kept) return replyChanged(visible(name));
	const answer = forgetKept(home, keptKind, kept);
	if (!answer.ok) return replyProblem(answer);
	if (answer.value === 'changed') return replyChanged(visible(name));
	const file = `${kept.file}.bak`;
	const shipped = shippedName(kind, name, around) === undefined ? [] : [`the shipped ${visible(name)} is used again.`];
	return replyWritten(
		{name, file},
		[`${visible(name)} is forgotten; it stays in ${visible(file)}.`, ...shipped],
		request,
	);
};
