/** Changes of a document by path. */
import {type Json, type JsonObject, type Path, without, withValue} from './json.ts';

/** One change of a document; an undefined value takes the field out, and a group that is empty then as well. */
export type Edit = {readonly path: Path; readonly value: Json | undefined};

/** The JSON with the edits made. */
export function withEdits(document: JsonObject, edits: readonly Edit[]): JsonObject {
	return edits.reduce(
		(json, {path, value}) => (value === undefined ? without(json, path) : withValue(json, path, value)),
		document,
	);
}
