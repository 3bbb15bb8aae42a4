/** JSON as it stands in a document, and changes of it by path. Nothing is changed in place: what stays is shared. */

export type Json = string | number | boolean | null | readonly Json[] | JsonObject;
export type JsonObject = {readonly [key: string]: Json};
/** `['straights', 0, 'exit']`. */
export type Path = readonly (string | number)[];

export const isObject = (value: Json | undefined): value is JsonObject =>
	typeof value === 'object' && value !== null && !Array.isArray(value);
export const isList = (value: Json | undefined): value is readonly Json[] => Array.isArray(value);

/** Whether two say the same, in whatever order their fields stand. What both share is not gone through. */
export function sameJson(one: Json | undefined, other: Json | undefined): boolean {
	if (one === other) return true;
	if (isList(one))
		return isList(other) && one.length === other.length && one.every((entry, i) => sameJson(entry, other[i]));
	if (!isObject(one) || !isObject(other)) return false;
	const names = Object.keys(one);
	return (
		names.length === Object.keys(other).length &&
		names.every(name => Object.hasOwn(other, name) && sameJson(one[name], other[name]))
	);
}

/** What stands at a path; undefined where nothing does. */
export function valueAt(document: Json | undefined, path: Path): Json | undefined {
	let value = document;
	for (const part of path) {
		if (typeof part === 'number') value = isList(value) ? value[part] : undefined;
		else value = isObject(value) && Object.hasOwn(value, part) ? value[part] : undefined;
	}
	return value;
}

/** The document with a value at a path; groups on the way are made where they are missing. */
export function withValue(document: JsonObject, path: Path, value: Json): JsonObject {
	return changed(document, path, () => value) as JsonObject;
}

/** The document without what stands at a path; a group that is empty then goes as well, an entry of a list closes up. */
export function without(document: JsonObject, path: Path): JsonObject {
	if (valueAt(document, path) === undefined) return document;
	const parent = path.slice(0, -1);
	const removed = changed(document, path, () => undefined) as JsonObject;
	const rest = valueAt(removed, parent);
	const isEmptied = parent.length > 0 && isObject(rest) && Object.keys(rest).length === 0;
	return isEmptied && typeof parent.at(-1) === 'string' ? without(removed, parent) : removed;
}

/** The document with an entry before the one of that number in a list; a missing list is made. */
export function withEntry(document: JsonObject, list: Path, index: number, entry: Json): JsonObject {
	return changed(document, list, before =>
		isList(before) ? before.toSpliced(index, 0, entry) : [entry],
	) as JsonObject;
}

/** The document with two entries of a list exchanged. */
export function withSwapped(document: JsonObject, list: Path, one: number, other: number): JsonObject {
	const entries = valueAt(document, list);
	if (!isList(entries) || entries[one] === undefined || entries[other] === undefined) return document;
	return withValue(document, list, entries.with(one, entries[other]).with(other, entries[one]));
}

/** Undefined takes the value out. */
function changed(
	value: Json | undefined,
	path: Path,
	change: (before: Json | undefined) => Json | undefined,
): Json | undefined {
	const [part, ...rest] = path;
	if (part === undefined) return change(value);
	if (typeof part === 'number') {
		const list = isList(value) ? value : [];
		const after = changed(list[part], rest, change);
		return after === undefined ? list.toSpliced(part, 1) : list.toSpliced(part, 1, after);
	}
	const group = isObject(value) ? value : {};
	const after = changed(group[part], rest, change);
	if (after !== undefined) return {...group, [part]: after};
	const {[part]: _, ...others} = group;
	return others;
}
