/** From entries back to the JSON of the plan. */
import {type Problem, shortened} from '../documents/problem.ts';
import {isLiteral, nothing, unescapeText} from './escape.ts';
import type {Entry} from './find-entries.ts';
import {curveField, heads, listFields, type Section, sectionOf, textFields} from './plan-sections.ts';

type Json = Record<string, unknown>;
/** Where the value of an entry stands in the plan. */
export type Origin = {path: readonly PropertyKey[]; line: number};
export type Built = {document: Json; origins: Origin[]; problems: Problem[]};

/** The plan as far as the entries can be read, and what cannot. */
export function buildPlan(entries: readonly Entry[]): Built {
	const built: Built = {document: {...heads['']}, origins: [], problems: []};
	for (const entry of entries) {
		const stop = addEntry(built, entry);
		if (stop !== undefined) built.problems.push({line: entry.line, ...stop});
	}
	return built;
}

type Stop = {path: string; found: string; allowed: string};

function addEntry({document, origins}: Built, {text, line}: Entry): Stop | undefined {
	const colon = text.indexOf(': ');
	const head = text.slice(0, Math.max(0, colon));
	const known = sectionOf(head);
	if (known === undefined) return {path: '', found: `"${shortened(text)}"`, allowed: 'an entry that plans have'};
	const {section, subject} = known;
	const body = text.slice(colon + 2);
	const where = {path: shortened(head), found: `"${shortened(body)}"`};
	if (section.prose === true) {
		const notes = unescapeText(body);
		if (notes === undefined) return {...where, allowed: 'text whose escapes are {hex}'};
		if (!put(document, section.path, notes)) return {...where, found: 'a second one', allowed: 'one such entry'};
		origins.push({path: section.path, line});
		return undefined;
	}
	const target = targetOf(document, section, subject === undefined && body === nothing);
	if (target === undefined) return {...where, found: 'a second one', allowed: 'one such entry'};
	origins.push({path: target.path, line});
	if (subject !== undefined) target.value[section.subject!] = plainValue(section.subject!, subject);
	for (const field of body === nothing ? [] : body.split(', ')) {
		const blank = field.indexOf(' ');
		const [name, value] = [field.slice(0, blank), valueOrList(field.slice(0, blank), field.slice(blank + 1))];
		const isField = /^\$?[A-Za-z0-9]+(\.[A-Za-z0-9]+)*$/.test(name);
		if (!isField || value === undefined || !put(target.value, name.split('.'), value))
			return {...where, found: `"${shortened(field)}"`, allowed: 'each field once, as "name value"'};
	}
	return undefined;
}

/** A new object at the place of the section; undefined where there is one already. */
function targetOf(
	document: Json,
	{path, many}: Section,
	isEmpty: boolean,
): {path: PropertyKey[]; value: Json} | undefined {
	if (path.length === 0) return {path: [], value: document};
	const last = path.at(-1)!;
	const parent = path.slice(0, -1).reduce<unknown>((inner, key) => childOf(inner, key), document);
	if (!isObject(parent)) return undefined;
	if (many !== true) {
		if (Object.hasOwn(parent, last)) return undefined;
		const value = {...heads[path.join('.')]};
		parent[last] = value;
		return {path: [...path], value};
	}
	if (!Object.hasOwn(parent, last)) parent[last] = [];
	const list = parent[last];
	if (!Array.isArray(list)) return undefined;
	if (isEmpty) return list.length === 0 ? {path: [...path], value: {}} : undefined;
	const value: Json = {};
	list.push(value);
	return {path: [...path, list.length - 1], value};
}

function isObject(value: unknown): value is Json {
	return typeof value === 'object' && value !== null && !Array.isArray(value);
}

/** The object in a field, made where there is none. */
function childOf(parent: unknown, key: string): unknown {
	if (!isObject(parent)) return undefined;
	if (!Object.hasOwn(parent, key)) parent[key] = {};
	return parent[key];
}

/** Sets a field at a path; false where it is there already. */
function put(object: Json, path: readonly string[], value: unknown): boolean {
	const parent = path.slice(0, -1).reduce<unknown>((inner, key) => childOf(inner, key), object);
	const last = path.at(-1)!;
	if (!isObject(parent) || Object.hasOwn(parent, last)) return false;
	parent[last] = value;
	return true;
}

function valueOrList(path: string, text: string): unknown {
	const key = path.slice(path.lastIndexOf('.') + 1);
	if (key === curveField) return text.split('; ').map(pointOf);
	if (!listFields.has(key)) return text === nothing ? {} : plainValue(key, text);
	if (text === nothing) return [];
	const list = text.split('; ').map(entry => plainValue(key, entry));
	return list.includes(undefined) ? undefined : list;
}

function plainValue(key: string, text: string): unknown {
	if (textFields.has(key) || !isLiteral(text)) return unescapeText(text);
	return text === 'true' || text === 'false' ? text === 'true' : Number(text);
}

function pointOf(text: string): Json {
	const blank = text.indexOf(' ');
	return {rpm: Number(text.slice(0, blank)), torque: unescapeText(text.slice(blank + 1))};
}
