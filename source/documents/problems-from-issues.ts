import type * as z from 'zod/mini';
import type {IssueParams} from './fields.ts';
import {didYouMean} from './nearest.ts';
import {type Problem, pathText, shown} from './problem.ts';
import {visible} from './visible.ts';

type Issue = z.core.$ZodIssue;
/** A problem and where in the document to look for its place. */
export type Unplaced = {problem: Problem; path: readonly PropertyKey[]; key?: string};

// Beyond this many unknown fields in one object it is not our kind of document.
const mostUnknownFields = 20;

/** What the schema found, as problems. The message of an issue is what is allowed there; see `fields.ts`. */
export function problemsFrom(issues: readonly Issue[], document: unknown): Unplaced[] {
	return issues.flatMap(issue =>
		issue.code === 'unrecognized_keys' ? unknownFields(issue) : [problemFrom(issue, document)],
	);
}

function problemFrom(issue: Issue, document: unknown): Unplaced {
	const {path} = issue;
	const params: IssueParams = issue.code === 'custom' ? (issue.params ?? {}) : {};
	const value = valueAt(document, path);
	// Names from the document stand in what the rules say.
	const found = visible(params.found ?? shown(value));
	const allowed = visible(issue.message);
	const hint = params.hint ?? hintFor(issue, value);
	return {problem: {path: pathText(path), found, allowed, ...(hint !== undefined && {hint: visible(hint)})}, path};
}

function hintFor(issue: Issue, value: unknown): string | undefined {
	if (issue.code === 'invalid_value' && typeof value === 'string') return didYouMean(value, issue.values.map(String));
	const isBareNumber = issue.code === 'invalid_type' && issue.expected === 'string' && typeof value === 'number';
	return isBareNumber ? 'A number alone does not say its unit.' : undefined;
}

function unknownFields({keys, path, message}: Issue & {code: 'unrecognized_keys'}): Unplaced[] {
	const known = message.split(' ');
	return keys.slice(0, mostUnknownFields).map(key => {
		const hint = didYouMean(key, known);
		const allowed = `one of ${known.filter(name => name !== '$schema').join(', ')}`;
		const problem = {
			path: pathText([...path, key]),
			found: 'an unknown field',
			allowed,
			...(hint !== undefined && {hint}),
		};
		return {problem, path, key};
	});
}

function valueAt(document: unknown, path: readonly PropertyKey[]): unknown {
	let value = document;
	for (const part of path) {
		if (typeof value !== 'object' || value === null || !Object.hasOwn(value, part)) return undefined;
		value = (value as Record<PropertyKey, unknown>)[part];
	}
	return value;
}

/** Units in the issues that the table lacks. */
export function unknownUnitsIn(issues: readonly Issue[]): string[] {
	return issues.flatMap(issue =>
		issue.code === 'custom' ? ((issue.params as IssueParams | undefined)?.unknownUnits ?? []) : [],
	);
}
