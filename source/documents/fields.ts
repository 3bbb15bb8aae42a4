/** The kinds of fields that documents are made of. Each one reads, says what it allows, and becomes JSON Schema. */
import * as z from 'zod/mini';
import {shown} from './problem.ts';
import {
	allowedText,
	type Dimension,
	exampleOf,
	type QuantityProblem,
	type QuantityReading,
	quantityOf,
} from './quantity.ts';
import {uncertain} from './uncertainties.ts';
import type {Unit} from './units.ts';

/** Bounds in SI; `above` is left out of the range, `from` and `to` belong to it. */
export type Range = {readonly above?: number; readonly from?: number; readonly to: number};

/** What an issue of ours carries beside its message, which is what is allowed there. */
export type IssueParams = {found?: string; hint?: string; unknownUnits?: readonly string[]};

/** What a transform's context and a check's payload have in common: the list of issues. */
export function report(context: z.core.ParsePayload, input: unknown, allowed: string, params: IssueParams = {}): void {
	context.issues.push({code: 'custom', input, message: allowed, params});
}

export function reportQuantity(
	context: z.core.ParsePayload,
	input: unknown,
	{found, allowed, hint, unknownUnits}: QuantityProblem,
): void {
	report(context, input, allowed, {found, ...(hint !== undefined && {hint}), ...(unknownUnits && {unknownUnits})});
}

/** A text with a unit, read to SI and held to a range; it may state its uncertainty. */
export function quantity(dimension: Dimension, range: Range, description: string) {
	return uncertain(quantityField(dimension, range, description, true), [dimension]);
}

/** As `quantity`, of what somebody decides: there is nothing uncertain about it. */
export function decided(dimension: Dimension, range: Range, description: string) {
	return quantityField(dimension, range, description, false);
}

function quantityField(dimension: Dimension, range: Range, description: string, mayBeUncertain: boolean) {
	return z.pipe(
		quantityText([dimension], description),
		z.transform((text: string, context): number => {
			const reading = quantityOf(text, dimension);
			const problem = reading.ok ? problemOf(text, reading, range, mayBeUncertain) : reading;
			if (problem !== undefined) reportQuantity(context, text, problem);
			return reading.ok ? reading.value : z.NEVER;
		}),
	);
}

function quantityText(dimensions: readonly Dimension[], description: string, examples = dimensions.map(exampleOf)) {
	return z.string({error: allowedText(dimensions)}).check(z.meta({description, examples}));
}

/** What is wrong with a value outside the range, in the reader's own unit; undefined inside. */
function problemOf(
	text: string,
	{value, unit, dimension, uncertainty}: QuantityReading & {ok: true},
	range: Range,
	mayBeUncertain: boolean,
): QuantityProblem | undefined {
	if (!isWithin(value, range)) return {found: shown(text), allowed: rangeText(range, unit)};
	if (mayBeUncertain || uncertainty === undefined) return undefined;
	return {found: `${shown(text)} (an uncertainty)`, allowed: allowedText([dimension])};
}

export function isWithin(value: number, {above = -Infinity, from = -Infinity, to}: Range): boolean {
	return value > above && value >= from && value <= to;
}

/** "more than 0 mph and at most 447.4 mph". */
export function rangeText({above, from, to}: Range, unit?: Unit): string {
	const bound = (si: number) => {
		const number = unit === undefined ? si : si / unit.factor + unit.zero;
		return `${Number(number.toPrecision(4))}${unit === undefined ? '' : ` ${unit.name}`}`;
	};
	if (above !== undefined) return `more than ${bound(above)} and at most ${bound(to)}`;
	return from === undefined ? `at most ${bound(to)}` : `from ${bound(from)} to ${bound(to)}`;
}

/** A plain number: a coefficient, a ratio, RPM. */
export function number(range: Range, description: string) {
	const error = `a number, ${rangeText(range)}`;
	return z.number({error}).check(...rangeChecks(range, error), z.meta({description}));
}

/** A plain number, or text with its uncertainty: `"1.25 ± 0.05"`. */
export function coefficient(range: Range, description: string, example: number) {
	const stated = `${example} ± ${Number((example * exampleSpread).toPrecision(1))}`;
	const allowed = `a number, ${rangeText(range)}; or one with its uncertainty, like "${stated}"`;
	const field = z.pipe(
		z.union([z.number(), z.string()], {error: allowed}).check(z.meta({description, examples: [example, stated]})),
		z.transform((given: number | string, context): number => {
			const reading = typeof given === 'number' ? undefined : quantityOf(given, 'number');
			const value = typeof given === 'number' ? given : reading?.ok ? reading.value : Number.NaN;
			const isStated = reading === undefined || (reading.ok && reading.uncertainty !== undefined);
			if (reading?.ok === false) reportQuantity(context, given, {...reading, allowed});
			else if (!isStated || !isWithin(value, range)) report(context, given, allowed);
			return value;
		}),
	);
	return uncertain(field, ['number']);
}
/** Of the example: a few per cent, as coefficients are known. */
const exampleSpread = 0.04;

export function wholeNumber(range: Range, description: string) {
	const error = `a whole number, ${rangeText(range)}`;
	// Not z.int(): its issues would stop the rules about several fields, and every problem is to be listed.
	return z
		.number({error})
		.check(z.multipleOf(1, {error}), ...rangeChecks(range, error), z.meta({description, type: 'integer'}));
}

function rangeChecks({above, from, to}: Range, error: string) {
	const lower = above !== undefined ? [z.gt(above, {error})] : from !== undefined ? [z.gte(from, {error})] : [];
	return [...lower, z.lte(to, {error})];
}

const longestName = 200;

export function name(description: string) {
	const error = `a text of 1 to ${longestName} characters`;
	const checks = [z.maxLength(longestName, {error}), z.regex(/\S/, {error})];
	return z.string({error}).check(...checks, z.meta({description}));
}

export function flag(description: string) {
	return z.boolean({error: 'true or false'}).check(z.meta({description}));
}

export function choice<const T extends readonly string[]>(values: T, description: string) {
	return z.enum(values, {error: `one of ${values.map(value => `"${value}"`).join(', ')}`}).check(z.meta({description}));
}

export function list<T extends z.core.SomeType>(
	entry: T,
	[least, most]: readonly [number, number],
	description: string,
) {
	const error = least === most ? `a list of ${least}` : `a list of ${least} to ${most}`;
	return z.array(entry, {error}).check(z.minLength(least, {error}), z.maxLength(most, {error}), z.meta({description}));
}

/** A group of fields; any other field in it is an error, whose message lists the known names (see `problems-from-issues.ts`). */
export function group<T extends z.core.$ZodLooseShape>(fields: T, description: string) {
	const names = Object.keys(fields).join(' ');
	const error = (issue: {code?: string}) =>
		issue.code === 'unrecognized_keys' ? names : 'an object with named fields, in { }';
	return z.strictObject(fields, {error}).check(z.meta({description}));
}

/** Reports a problem of the value at a path below it. */
export type Report = (path: readonly PropertyKey[], allowed: string, params?: IssueParams) => void;

/**
 * A rule about several fields at once. It runs also where single fields are wrong, so that every problem is listed; a
 * field may then hold anything, and the rule looks only at what it can read.
 */
export function rule<T extends object>(check: (value: T, report: Report) => void) {
	return ruleWhen(check, value => typeof value === 'object' && value !== null && !Array.isArray(value));
}

/** As `rule`, about the entries of a list. */
export function listRule<E>(check: (value: readonly E[], report: Report) => void) {
	return ruleWhen(check, Array.isArray);
}

function ruleWhen<T>(check: (value: T, report: Report) => void, isReadable: (value: unknown) => boolean) {
	return z.check<T>(
		payload =>
			check(payload.value, (path, message, params = {}) =>
				payload.issues.push({code: 'custom', input: payload.value, path: [...path], message, params}),
			),
		{when: ({value}: {value: unknown}) => isReadable(value)},
	);
}

/** Each name once. `names[i]` belongs to the entry at path `[i, field]`; anything but text is passed over. */
export function reportRepeated(
	entries: readonly unknown[],
	nameOf: (entry: never) => unknown,
	path: (index: number) => PropertyKey[],
	report: Report,
): void {
	const seen = new Set<string>();
	entries.forEach((entry, index) => {
		const name = typeof entry === 'object' && entry !== null ? nameOf(entry as never) : undefined;
		if (typeof name !== 'string') return;
		if (seen.has(name)) report(path(index), 'each name once', {found: `a second "${name}"`});
		seen.add(name);
	});
}
