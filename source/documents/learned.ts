/** Where values of a document come from that were learned from practice, so that they can be taken back. */
import * as z from 'zod/mini';
import {group, list, name} from './fields.ts';
import {date} from './shared-fields.ts';

export type Learned = {
	/** Path of the field in the same document, like `car.tires.left`. */
	readonly field: string;
	readonly value: string | number;
	/** What stood there; absent where nothing did. */
	readonly before?: string | number;
	/** Like "practice, 41 laps". */
	readonly from: string;
	/** ISO 8601. */
	readonly date: string;
};

/** A season of accepted values, and then some. */
const mostLearned = 500;
const valueError = 'a value as it stands in a document, text or number';
const valueField = (description: string) =>
	z.union([z.number(), z.string()], {error: valueError}).check(z.meta({description}));

export function learned() {
	const entry = group(
		{
			field: name('Path of the field in this document.'),
			value: valueField('What was learned.'),
			before: z.optional(valueField('What stood there before; absent where nothing did.')),
			from: name('What it was learned from.'),
			date: date('When it was accepted.'),
		},
		'A value that was learned.',
	);
	return z.optional(
		list(entry, [0, mostLearned], 'Values learned from practice, kept so that they can be taken back.'),
	);
}

/** What a document that its reader has accepted has learned, oldest first. */
export function learnedIn(document: Record<string, unknown>): readonly Learned[] {
	return (document.learned as readonly Learned[] | undefined) ?? [];
}
