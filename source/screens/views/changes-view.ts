/** What of the track or the car differs from what is saved of it and from what is shipped. */

import type {JsonObject} from '../../documents/json.ts';
import {compare} from '../../sharing/compare.ts';
import {type Block, gap, text} from '../../text/blocks.ts';
import {layOut} from '../../text/layout.ts';
import {differenceTable} from '../../text/plan-view.ts';
import type {Pieces} from '../parts/pieces.ts';
import {type OpenDocument, titleOf} from '../session/documents.ts';
import {scrolled} from './scrolled.ts';

export function changesView(document: OpenDocument, scroll: number, width: number, height: number): Pieces[] {
	return scrolled(layOut(changesBlocks(document), width), scroll, height);
}

function changesBlocks(document: OpenDocument): Block[] {
	const {kind, json, saved, shipped, notes, savedNotes} = document;
	return [
		text(`The ${kind} ${titleOf(document)}`, 'strong'),
		gap,
		...(saved === shipped ? [] : [...savedBlocks(document), gap]),
		...(shipped === undefined
			? [text('It is not shipped with the program.', 'muted')]
			: against('the shipped one', 'shipped', shipped, json)),
		...(notes === savedNotes ? [] : [gap, text(`Its notes were: ${savedNotes ?? 'none'}. Now: ${notes ?? 'none'}.`)]),
	];
}

/** What was never saved may have been read from elsewhere. */
function savedBlocks({from, json, saved}: OpenDocument): Block[] {
	if (saved === undefined) return [text('It is not saved.')];
	return from === 'saved'
		? against('the saved one', 'saved', saved, json)
		: against(`what was read (${from})`, 'read', saved, json);
}

function against(words: string, head: string, before: JsonObject, now: JsonObject): Block[] {
	const differences = compare(before, now);
	if (differences.length === 0) return [text(`It says the same as ${words}.`)];
	return [text(`It differs from ${words}:`), differenceTable(differences, head, 'now')];
}
