/** From a plan to the entries of its text, without their checks. The entries are the canonical content. */
import {emptyText, escapeMarked, escapeText, nothing} from './escape.ts';
import type {PlanDocument} from './plan-document.ts';
import {curveField, hasOwnEntry, heads, listFields, type Section, sections, textFields} from './plan-sections.ts';

type Json = Record<string, unknown>;

/** One text an entry: `Label subject: field value, field value`. The plan must be one that `checkPlan` accepts. */
export function entriesOf(plan: PlanDocument): string[] {
	return sections.flatMap(section => {
		const value = valueAt(plan, section.path);
		if (value === undefined) return [];
		if (section.prose === true) return [`${section.label}: ${escapeText(value as string, true)}`];
		if (section.many !== true) return [entryOf(section, value as Json)];
		const list = value as Json[];
		return list.length === 0 ? [`${section.label}: ${nothing}`] : list.map(one => entryOf(section, one));
	});
}

function entryOf({label, path, subject}: Section, value: Json): string {
	const own = path.join('.') in heads ? ['kind', 'version'] : [];
	const fields = Object.entries(value).filter(
		([key, field]) => field !== undefined && key !== subject && !own.includes(key) && !hasOwnEntry([...path, key]),
	);
	const head = subject === undefined ? label : `${label} ${valueText(subject, value[subject])}`;
	const body = fields.flatMap(([key, field]) => fieldTexts(key, key, field));
	return `${head}: ${body.length === 0 ? nothing : body.join(', ')}`;
}

/** The field as `name value`, an object inside as one of these a field, its name before theirs. */
function fieldTexts(path: string, key: string, value: unknown): string[] {
	if (typeof value !== 'object' || value === null) return [`${path} ${valueText(key, value)}`];
	if (Array.isArray(value)) return [`${path} ${listText(key, value)}`];
	const fields = Object.entries(value).filter(([, field]) => field !== undefined);
	if (fields.length === 0) return [`${path} ${nothing}`];
	return fields.flatMap(([name, field]) => fieldTexts(`${path}.${name}`, name, field));
}

function listText(key: string, list: readonly unknown[]): string {
	if (key === curveField) {
		const points = list as {rpm: number; torque: string}[];
		return points.map(({rpm, torque}) => `${numberText(rpm)} ${escapeText(torque)}`).join('; ');
	}
	if (!listFields.has(key)) throw new Error(`no list is known as ${key}`);
	return list.length === 0 ? nothing : list.map(entry => valueText(key, entry)).join('; ');
}

function valueText(key: string, value: unknown): string {
	if (typeof value === 'number') return numberText(value);
	if (typeof value === 'boolean') return String(value);
	const text = value as string;
	if (text === '') return emptyText;
	return textFields.has(key) ? escapeText(text) : escapeMarked(text);
}

function numberText(value: number): string {
	return Object.is(value, -0) ? '-0' : String(value);
}

function valueAt(value: unknown, path: readonly string[]): unknown {
	return path.reduce<unknown>((inner, key) => (inner as Json | undefined)?.[key], value);
}
