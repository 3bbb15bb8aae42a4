/** The uncertainties that a document states: which fields may, and what they say. */
import type * as z from 'zod/mini';
import type {Uncertainties} from '../drivetrain/uncertainties.ts';
import {pathText} from './problem.ts';
import {type Dimension, quantityOf} from './quantity.ts';

/** What the fields measure whose text may state its uncertainty; a weak map, since zod's own notes end up in the JSON Schema. */
const measured = new WeakMap<object, readonly Dimension[]>();

/** The field, which from now on may state its uncertainty. */
export function uncertain<T extends z.core.$ZodType>(field: T, dimensions: readonly Dimension[]): T {
	measured.set(field, dimensions);
	return field;
}

/** The uncertainties in a document that its fields have accepted. */
export function uncertaintiesIn(fields: z.core.$ZodType, document: unknown): Uncertainties {
	const found = new Map<string, number>();
	collect(fields, document, [], found);
	return found;
}

function collect(field: z.core.$ZodType, value: unknown, path: readonly PropertyKey[], found: Map<string, number>) {
	if (value === undefined || value === null) return;
	const dimensions = measured.get(field);
	if (dimensions !== undefined) {
		const reading = typeof value === 'string' ? quantityOf(value, dimensions) : undefined;
		if (reading?.ok && reading.uncertainty !== undefined) found.set(pathText(path), reading.uncertainty);
		return;
	}
	const {def} = (field as z.core.$ZodTypes)._zod;
	if (def.type === 'object')
		for (const [name, inner] of Object.entries(value)) collect(def.shape[name]!, inner, [...path, name], found);
	else if (def.type === 'array')
		(value as unknown[]).forEach((entry, i) => {
			collect(def.element, entry, [...path, i], found);
		});
	else if (def.type === 'optional' || def.type === 'prefault') collect(def.innerType, value, path, found);
}
