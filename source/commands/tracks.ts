/** `droprack tracks`: what there is to rank. Loads no reader, so that it answers at once. */

import {type ListedTrack, trackListView} from '../text/list-view.ts';
import type {CommandRun} from './command.ts';
import {printJson, printText} from './print.ts';
import {replyDone} from './reply.ts';
import {type Shelved, shelf} from './shelf.ts';

const countOf = (list: unknown): number => (Array.isArray(list) ? list.length : 0);

/** The track as it stands is a situation too, whether or not it has an entry of its own. */
const situationsOf = (list: unknown): number => {
	const names = Array.isArray(list) ? list.map(entry => (entry as {name?: unknown}).name) : [];
	return names.includes('Base') ? names.length : names.length + 1;
};

const listed = ({name, stem, from, document}: Shelved): ListedTrack => ({
	name,
	file: stem,
	type: String(document.type),
	straights: countOf(document.straights),
	situations: situationsOf(document.situations),
	from,
});

export const tracks: CommandRun = async (request, around) => {
	const {entries, notes} = shelf('track', around);
	const list = entries.map(listed);
	if (request.json) return replyDone(printJson({tracks: list}, request), notes);
	return replyDone(printText(trackListView(list), request, around), notes);
};
