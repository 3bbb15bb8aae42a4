/** What was learned written where the documents came from: into the file, or into the saved copy of a track or a car. */
import {editText} from '../documents/edit-text.ts';
import {type Edit, withEdits} from '../documents/edits.ts';
import type {JsonObject} from '../documents/json.ts';
import {visible} from '../documents/visible.ts';
import type {DocumentName} from '../practice/learn/proposals.ts';
import {writeDurably} from '../store/durable-write.ts';
import {addToHistory} from '../store/history.ts';
import {homeDirectory} from '../store/home.ts';
import type {HistoryEntry, Named} from '../store/kept-documents.ts';
import type {Loaded} from './load-documents.ts';
import {badInput, type Found, found, type Refusal, unreachable} from './reply.ts';
import type {Request} from './request.ts';
import {keepDocument} from './save.ts';
import {refusalOf} from './store-reply.ts';
import type {Surroundings} from './surroundings.ts';

export type LearnedEdits = Readonly<Record<DocumentName, readonly Edit[]>>;

/** Standard input cannot be written back. */
export const unwritable = ({origins}: Loaded): Refusal | undefined => {
	const names = (['track', 'car'] as const).filter(name => origins[name].from === 'input');
	if (names.length === 0) return undefined;
	return badInput(
		`droprack learn: the ${names.join(' and the ')} came from standard input and cannot be written back. Name a file, or save it first.`,
	);
};

/** Writes both documents and the history entry; gives the sentences that say what was written. */
export const keepLearned = (
	loaded: Loaded,
	edits: LearnedEdits,
	entry: HistoryEntry,
	request: Request,
	around: Surroundings,
): Found<string[]> => {
	const notes: string[] = [];
	for (const name of ['car', 'track'] as const) {
		if (edits[name].length === 0) continue;
		const kept = keepOne(name, loaded, edits[name], request, around);
		if (!kept.ok) return kept;
		notes.push(...kept.value);
	}
	const answer = addToHistory(homeDirectory(around.environment), loaded.track.name, [entry]);
	if (!answer.ok) return refusalOf(answer.problem);
	return found([...notes, `noted in the history of ${visible(loaded.track.name)}.`]);
};

const keepOne = (
	name: DocumentName,
	{documents, origins}: Loaded,
	edits: readonly Edit[],
	request: Request,
	around: Surroundings,
): Found<string[]> => {
	const {from, asked, text} = origins[name];
	if (from === 'file') {
		const problem = writeDurably(asked, editText(text, edits), {keepPrevious: false});
		if (problem) return unreachable(`${visible(asked)}: ${problem.found}.`);
		return found([`${visible(asked)} is changed.`]);
	}
	const document = withEdits(documents[name] as JsonObject, edits) as unknown as Named;
	const any = {kind: name, document, from: undefined, car: undefined, notes: []};
	const {json, units, strict, ascii} = request;
	const reply = keepDocument(any, {argument: undefined, replace: true, json, units, strict, ascii}, around);
	if (reply.status !== 0) return {ok: false, status: reply.status, message: reply.err.trimEnd()};
	const isOwn = from === 'shipped' ? ` The shipped ${name} stays as it is; yours is used from now on.` : '';
	return found([`${visible(document.name)} is saved.${isOwn}`]);
};
