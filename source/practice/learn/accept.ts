/** Accepting and taking back: edits of the documents, each with the record of where its value came from. */
import type {Edit} from '../../documents/edits.ts';
import {type Json, type JsonObject, type Path, valueAt} from '../../documents/json.ts';
import {type Learned, learnedIn} from '../../documents/learned.ts';
import {pathText} from '../../documents/problem.ts';
import type {DocumentName, Proposal, Write} from './proposals.ts';

export type Edits = Readonly<Record<DocumentName, readonly Edit[]>>;

export type Origin = {
	/** "practice, 41 laps". */
	readonly from: string;
	/** ISO 8601. */
	readonly date: string;
};

const names: readonly DocumentName[] = ['track', 'car'];

/** The edits that write the proposals, with a record of each field beside them. */
export function acceptEdits(proposals: readonly Proposal[], documents: Documents, origin: Origin): Edits {
	const writes = proposals.flatMap(({rows}) => rows);
	return Object.fromEntries(
		names.map(name => {
			const own = writes.filter(({document}) => document === name);
			const entries = [...learnedIn(documents[name]), ...own.map(write => recordOf(write, origin))];
			const values: Edit[] = own.map(({path, value}) => ({path, value}));
			return [name, own.length === 0 ? [] : [...values, recordEdit(entries)]];
		}),
	) as Record<DocumentName, Edit[]>;
}

type Documents = Readonly<Record<DocumentName, JsonObject>>;

const recordOf = ({path, value, before}: Write, {from, date}: Origin): Learned => ({
	field: pathText(path),
	value,
	...(before !== undefined && {before}),
	from,
	date,
});

const recordEdit = (entries: readonly Learned[]): Edit => ({
	path: ['learned'],
	value: entries.length === 0 ? undefined : (entries as unknown as Json),
});

/** What was learned and is still there to be taken back: the latest of each field, newest first. */
export type Takeable = {
	readonly document: DocumentName;
	readonly entry: Learned;
	/** The name that it was accepted by. */
	readonly name: string;
	/** Whether the field still holds what was learned; what was typed since is not taken away. */
	readonly untouched: boolean;
};

export function takeablesIn(documents: Documents): Takeable[] {
	return names.flatMap(document => {
		const latest = new Map(learnedIn(documents[document]).map(entry => [entry.field, entry]));
		return [...latest.values()].reverse().map(entry => ({
			document,
			entry,
			name: proposalName(document, entry.field, documents),
			untouched: JSON.stringify(valueAt(documents[document], pathOf(entry.field))) === JSON.stringify(entry.value),
		}));
	});
}

/** The edits that put back what stood there before, and drop the record. A field that was changed since keeps its value. */
export function takeBackEdits(taken: readonly Takeable[], documents: Documents): Edits {
	return Object.fromEntries(
		names.map(name => {
			const own = taken.filter(({document}) => document === name);
			const kept = learnedIn(documents[name]).filter(entry => !own.some(one => one.entry === entry));
			const values = own
				.filter(({untouched}) => untouched)
				.map(({entry}): Edit => ({path: pathOf(entry.field), value: entry.before}));
			return [name, own.length === 0 ? [] : [...values, recordEdit(kept)]];
		}),
	) as Record<DocumentName, Edit[]>;
}

/** `straights[1].measured.end` as the path that it is; the inverse of `pathText` for the names of our fields. */
export function pathOf(field: string): Path {
	return [...field.matchAll(/\[(\d+)\]|[^.[\]]+/g)].map(([part, index]) =>
		index === undefined ? part : Number(index),
	);
}

/** The name of the proposal that a field belongs to. */
export function proposalName(document: DocumentName, field: string, documents: Documents): string {
	const path = pathOf(field);
	const last = String(path.at(-1));
	if (path[0] === 'straights') {
		const straight = valueAt(documents[document], [...path.slice(0, 2), 'name']);
		return `${path[2] === 'measured' ? 'measured' : last}:${typeof straight === 'string' ? straight : path[1]}`;
	}
	if (last === 'left' || last === 'right') return 'rollout';
	return last === 'dragArea' ? 'drag' : last;
}
