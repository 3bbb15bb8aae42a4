/** Entries of the lists in a document: straights, situations, gearbox sets, engines, pairs, curve points. */

import {
	isList,
	isObject,
	type Json,
	type JsonObject,
	type Path,
	valueAt,
	withEntry,
	without,
	withSwapped,
	withValue,
} from '../../documents/json.ts';
import type {Section} from './form.ts';

/** The list that a section belongs to, and the entry in it that the cursor is on. */
export type EntryPlace = {readonly list: Path; readonly index: number};

export function entryAt(section: Section | undefined, row: number): EntryPlace | undefined {
	if (section?.list === undefined) return undefined;
	return {list: section.list.path, index: section.list.entry === 'rows' ? row : section.list.entry};
}

/** A copy of the entry behind itself, under a name of its own; in an empty list an entry with nothing in it. */
export function withCopy(json: JsonObject, {list, index}: EntryPlace): JsonObject {
	const entries = valueAt(json, list);
	const original = isList(entries) ? entries[index] : undefined;
	if (original === undefined) return withEntry(json, list, 0, firstEntry(list));
	return withEntry(json, list, index + 1, renamed(original, entries as readonly Json[]));
}

export const withoutEntry = (json: JsonObject, {list, index}: EntryPlace): JsonObject =>
	without(json, [...list, index]);

export const withMoved = (json: JsonObject, {list, index}: EntryPlace, by: 1 | -1): JsonObject =>
	withSwapped(json, list, index, index + by);

function renamed(entry: Json, entries: readonly Json[]): Json {
	if (!isObject(entry) || typeof entry.name !== 'string') return entry;
	const names = entries.map(other => (isObject(other) ? other.name : undefined));
	const stem = entry.name.replace(/ \d+$/, '');
	let number = 2;
	while (names.includes(`${stem} ${number}`)) number++;
	return {...entry, name: `${stem} ${number}`};
}

function firstEntry(list: Path): Json {
	const names: Record<string, string> = {
		straights: 'Front',
		situations: 'In the tow',
		gearboxes: 'A',
		engines: 'Engine',
	};
	const name = names[String(list.at(-1))];
	return name === undefined ? {} : {name};
}

/** Two columns of numbers, as a dyno sheet gives them, to the points of a torque curve. */
export type CurvePaste =
	| {readonly ok: true; readonly points: readonly JsonObject[]; readonly unit: string}
	| {readonly ok: false; readonly words: string};

const fewestPoints = 3;
const metricTorque = /\bN\s*·?\s*m\b/i;

/**
 * RPM and torque a line, parted by blanks, tabs, commas or semicolons; a line that does not start with a number is a
 * heading. The unit is the one in the heading, else `unit`.
 */
export function curveFrom(text: string, unit: string): CurvePaste {
	const lines = text
		.split(/[\r\n]+/)
		.map(line => line.trim())
		.filter(line => line !== '');
	const headings = lines.filter(line => !/^[\d.]/.test(line));
	const found = headings.some(line => metricTorque.test(line))
		? 'N m'
		: headings.some(line => /ft|lb/i.test(line))
			? 'lbf ft'
			: unit;
	const points: JsonObject[] = [];
	for (const line of lines.filter(line => /^[\d.]/.test(line))) {
		const [rpm, torque] = line.split(/[\s,;]+/).map(Number);
		if (!Number.isFinite(rpm) || !Number.isFinite(torque))
			return {ok: false, words: `"${line.slice(0, 40)}" is not RPM and torque`};
		points.push({rpm: rpm!, torque: `${torque} ${found}`});
	}
	if (points.length < fewestPoints)
		return {ok: false, words: `${points.length} lines of RPM and torque; at least ${fewestPoints} are needed`};
	const rising = points.toSorted((a, b) => Number(a.rpm) - Number(b.rpm));
	return {ok: true, points: rising, unit: found};
}

/** Whether a list is a torque curve. */
export const isCurve = (list: Path): boolean => list.at(-1) === 'curve';

export const withCurve = (json: JsonObject, list: Path, points: readonly JsonObject[]): JsonObject =>
	withValue(json, list, points);
