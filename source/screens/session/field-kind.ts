/** What a field of a document takes, from the JSON Schema that the documents themselves are read by. */
import {quantityOf} from '../../documents/quantity.ts';
import {type Dimension, dimensions} from '../../documents/units.ts';

export type FieldKind =
	/** Text with a unit. `change`: with a sign it changes what the track has. */
	| {readonly is: 'quantity'; readonly dimensions: readonly Dimension[]; readonly change: boolean}
	| {readonly is: 'number'}
	| {readonly is: 'text'}
	| {readonly is: 'choice'; readonly among: readonly string[]}
	| {readonly is: 'flag'}
	| {readonly is: 'list'; readonly of: FieldKind};

/** The parts of JSON Schema that our documents use. */
export type Schema = {
	readonly type?: string | readonly string[];
	readonly properties?: Readonly<Record<string, Schema>>;
	readonly required?: readonly string[];
	readonly items?: Schema;
	readonly enum?: readonly string[];
	readonly const?: unknown;
	readonly default?: unknown;
	readonly description?: string;
	readonly examples?: readonly unknown[];
	readonly pattern?: string;
};

/** What the field takes; undefined for a group or a list of groups. */
export function fieldKind(schema: Schema): FieldKind | undefined {
	if (schema.enum) return {is: 'choice', among: schema.enum};
	if (Array.isArray(schema.type)) return quantity(schema.examples ?? []);
	if (schema.type === 'number' || schema.type === 'integer') return {is: 'number'};
	if (schema.type === 'boolean') return {is: 'flag'};
	if (schema.type === 'array') {
		const of = schema.items && fieldKind(schema.items);
		return of && {is: 'list', of};
	}
	if (schema.type !== 'string') return undefined;
	// What has a pattern is no quantity, though it may look like one: 33/38 is a pair.
	if (schema.pattern !== undefined) return {is: 'text'};
	return quantity(schema.examples ?? []) ?? {is: 'text'};
}

/** The examples of a quantity say what it is: "118 mph" is a speed, and "-3 %" beside it that a change is meant too. */
function quantity(examples: readonly unknown[]): FieldKind | undefined {
	const readings = examples.map(example => quantityOf(String(example), dimensions));
	const known = readings.filter(reading => reading.ok);
	if (known.length === 0 || known.length < readings.length) return undefined;
	const change = known.length > 1 && known.some(({signed}) => signed);
	return {is: 'quantity', dimensions: [...new Set(known.map(({dimension}) => dimension))], change};
}
