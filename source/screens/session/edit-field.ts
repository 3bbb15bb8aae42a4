/** Changes of one field: each gives the new content, or says why there is none. */

import {type JsonObject, valueAt, without, withValue} from '../../documents/json.ts';
import {pathText} from '../../documents/problem.ts';
import type {UnitSystem} from '../../text/units.ts';
import type {Kind} from './documents.ts';
import type {Field} from './form.ts';
import {problemsOf} from './forms.ts';
import {understand} from './understand.ts';

export type Change = {readonly ok: true; readonly json: JsonObject} | {readonly ok: false; readonly words: string};

const refused = (words: string): Change => ({ok: false, words});

/** The content with what was typed in the field; an optional field is emptied by typing nothing. */
export function withTyped(kind: Kind, json: JsonObject, field: Field, text: string, units: UnitSystem): Change {
	if (text.trim() === '') return cleared(json, field);
	const understood = understand(text, field.kind, field.value ?? field.unlessGiven, units);
	if (!understood.ok) return refused(understood.words);
	if (JSON.stringify(understood.value) === JSON.stringify(field.value)) return {ok: true, json};
	const next = withValue(json, field.path, understood.value);
	const wrong = wrongAt(kind, next, field);
	return wrong === undefined ? {ok: true, json: next} : refused(wrong);
}

export function cleared(json: JsonObject, field: Field): Change {
	if (field.value === undefined) return {ok: true, json};
	return field.needed ? refused(`${field.label} is needed`) : {ok: true, json: without(json, field.path)};
}

/** The field as the program ships it. */
export function asShipped(json: JsonObject, shipped: JsonObject | undefined, field: Field): Change {
	if (shipped === undefined) return refused('this document is not a shipped one: there is no other value');
	const value = valueAt(shipped, field.path);
	if (value === undefined && field.needed) return refused('the shipped document has no such entry');
	return {ok: true, json: value === undefined ? without(json, field.path) : withValue(json, field.path, value)};
}

/** What the document's reader says against the field itself; problems elsewhere are shown, and hinder no edit. */
export function wrongAt(kind: Kind, json: JsonObject, field: Pick<Field, 'path'>): string | undefined {
	const problems = problemsOf(kind, json);
	if (problems.length === 0) return undefined;
	const path = pathText(field.path);
	const problem = problems.find(one => one.path === path || one.path.startsWith(`${path}[`));
	return (
		problem &&
		`found ${problem.found}; allowed ${problem.allowed}${problem.hint === undefined ? '' : `. ${problem.hint}`}`
	);
}
