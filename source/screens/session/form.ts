/** A document as a form: sections of fields, made from its JSON Schema. A field added to the documents is here at once. */

import {isList, isObject, type Json, type JsonObject, type Path, valueAt} from '../../documents/json.ts';
import {type FieldKind, fieldKind, type Schema} from './field-kind.ts';

export type Field = {
	readonly path: Path;
	readonly label: string;
	readonly kind: FieldKind;
	readonly needed: boolean;
	/** What holds where nothing is given, as the schema knows it. */
	readonly unlessGiven: Json | undefined;
	readonly help: string;
	/** As it stands in the document. */
	readonly value: Json | undefined;
};

export type Section = {
	readonly title: string;
	/** One field a line, or the columns of a table; every row has as many. */
	readonly rows: readonly (readonly Field[])[];
	/** Heads of the columns of a table; absent where there is one field a line. */
	readonly heads?: readonly string[];
	/** The list whose entry this section is, or whose entries its rows are; entries can be added and removed there. */
	readonly list?: {readonly path: Path; readonly entry: number | 'rows'};
};

export type Form = readonly Section[];

/** A list whose entries have no more fields than this is a table. */
const mostColumns = 5;
/** What is not typed: what the file is, and the record of what was learned. */
const hidden = new Set(['$schema', 'kind', 'version', 'learned']);

export function formOf(schema: Schema, document: JsonObject, title: string): Form {
	return sections(schema, document, [], title);
}

function sections(schema: Schema, document: JsonObject, path: Path, title: string): Section[] {
	const own = groupFields(schema, document, path, '');
	const lists = Object.entries(schema.properties ?? {}).flatMap(([name, property]) =>
		listSections(property, document, [...path, name], title, path.length === 0),
	);
	// At the top each group is a section of its own; inside an entry of a list its groups are fields among the others.
	const groups = path.length === 0 ? topGroups(schema, document) : [];
	return [{title, rows: own.map(field => [field])}, ...lists, ...groups];
}

function topGroups(schema: Schema, document: JsonObject): Section[] {
	return Object.entries(schema.properties ?? {}).flatMap(([name, property]) => {
		if (property.type !== 'object') return [];
		const rows = groupFields(property, document, [name], '', true).map(field => [field]);
		const lists = Object.entries(property.properties ?? {}).flatMap(([inner, innerProperty]) =>
			listSections(innerProperty, document, [name, inner], words(name), true),
		);
		return [...(rows.length > 0 ? [{title: words(name), rows}] : []), ...lists];
	});
}

/** The fields of a group; `deep` takes in those of groups inside, which at the top have sections of their own. */
function groupFields(schema: Schema, document: JsonObject, path: Path, label: string, deep = path.length > 0): Field[] {
	return Object.entries(schema.properties ?? {}).flatMap(([name, property]): Field[] => {
		if (hidden.has(name)) return [];
		const at = [...path, name];
		const full = label === '' ? words(name) : `${label} ${words(name)}`;
		if (property.type === 'object') return deep ? groupFields(property, document, at, full, true) : [];
		const kind = fieldKind(property);
		if (kind === undefined) return [];
		const needed = (schema.required ?? []).includes(name) && property.default === undefined;
		return [fieldOf(property, kind, document, at, full, needed)];
	});
}

function fieldOf(
	schema: Schema,
	kind: FieldKind,
	document: JsonObject,
	path: Path,
	label: string,
	needed: boolean,
): Field {
	const unlessGiven = schema.default as Json | undefined;
	return {path, label, kind, needed, unlessGiven, help: schema.description ?? '', value: valueAt(document, path)};
}

function listSections(schema: Schema, document: JsonObject, path: Path, within: string, top: boolean): Section[] {
	const entry = schema.type === 'array' && schema.items?.type === 'object' ? schema.items : undefined;
	if (entry === undefined || hidden.has(String(path.at(-1)))) return [];
	const value = valueAt(document, path);
	const entries = isList(value) ? value : [];
	const name = words(String(path.at(-1)));
	const columns = Object.entries(entry.properties ?? {});
	if (columns.length <= mostColumns) {
		const title = top ? name : `${within}: ${name}`;
		const rows = entries.map((_, i) => groupFields(entry, document, [...path, i], '', true));
		return [{title, rows, heads: columns.map(([head]) => words(head)), list: {path, entry: 'rows'}}];
	}
	if (entries.length === 0) return [{title: name, rows: [], list: {path, entry: 'rows'}}];
	return entries.flatMap((value, i) => {
		const [first, ...inner] = sections(entry, document, [...path, i], entryTitle(name, value, i));
		return [{...first!, list: {path, entry: i}}, ...inner];
	});
}

/** "straight Front": what it is and how it is called. */
function entryTitle(list: string, entry: Json, index: number): string {
	const name =
		isObject(entry) && typeof entry.name === 'string' && entry.name.trim() !== '' ? entry.name : `${index + 1}`;
	return `${singular(list)} ${name}`;
}

const singular = (list: string): string => list.replace(/xes$/, 'x').replace(/s$/, '');

/** "rearDownforceShare" as people write it. */
const words = (name: string): string => name.replace(/[A-Z]+/g, capital => ` ${capital.toLowerCase()}`);
