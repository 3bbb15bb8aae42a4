/** A session that was kept as JSON, read back. The file may have been changed by hand, or be of another program. */

import {isObject, type Json, type JsonObject} from '../../documents/json.ts';
import {type Documents, describesKind, type Kind, type OpenDocument} from './documents.ts';

/** The documents of a kept session; undefined where what is there are none. */
export function restored(kept: unknown): Documents | undefined {
	if (!isObject(kept as Json)) return undefined;
	const {open, track, car} = kept as JsonObject;
	if (!isObject(open) || typeof track !== 'string' || typeof car !== 'string') return undefined;
	const documents = Object.values(open).map(openDocument);
	if (documents.some(document => document === undefined)) return undefined;
	const byId = Object.fromEntries(documents.map(document => [document!.id, document!]));
	if (byId[track]?.kind !== 'track' || byId[car]?.kind !== 'car') return undefined;
	return {open: byId, track, car};
}

const textOrNone = (value: Json | undefined): string | undefined => (typeof value === 'string' ? value : undefined);

/** What is the same content becomes the same object again: that is how changes are seen. */
function openDocument(kept: Json): OpenDocument | undefined {
	if (!isObject(kept)) return undefined;
	const {id, kind, from, json, saved, shipped, plan, notes, savedNotes} = kept;
	if (typeof id !== 'string' || (kind !== 'track' && kind !== 'car') || typeof from !== 'string') return undefined;
	if (!isObject(json) || !describesKind(json, kind as Kind)) return undefined;
	const same = (other: Json | undefined) =>
		isObject(other) ? (JSON.stringify(other) === JSON.stringify(json) ? json : other) : undefined;
	return {
		id,
		kind,
		from,
		json,
		saved: same(saved),
		shipped: same(shipped),
		plan: textOrNone(plan),
		notes: textOrNone(notes),
		savedNotes: textOrNone(savedNotes),
	};
}
