import {countFields, findLongList, scanJson} from './json-scan.ts';
import {placeOf} from './place.ts';
import {type Problem, pathText} from './problem.ts';
import {mostPairs} from './shared-fields.ts';

/** A document with more is refused before it is read: the longest real one has a hundredth of it. */
export const maxDocumentBytes = 10_000_000;
const maxDepth = 32;
/** Above this the place of a problem is not looked for: the tree would cost more memory than it is worth. */
const maxPlacedLength = 1_000_000;

export type Json =
	| {ok: true; text: string; document: Record<string, unknown>; problems: Problem[]}
	| {ok: false; problems: Problem[]};

/** The object that a text holds, whatever it may be. `problems` lists fields written twice: the rest can be checked all the same. */
export async function readJson(written: string): Promise<Json> {
	if (written.length > maxDocumentBytes)
		return refused(`${written.length} characters`, `at most ${maxDocumentBytes} bytes`);
	const text = written.startsWith('\uFEFF') ? written.slice(1) : written;
	if (text.trim() === '') return refused('an empty document', 'a JSON object');
	const scan = scanJson(text, maxDepth);
	if (scan.tooDeepAt !== undefined) {
		const allowed = `lists and objects at most ${maxDepth} deep`;
		return {ok: false, problems: [{path: '', ...placeOf(text, scan.tooDeepAt), found: 'deeper nesting', allowed}]};
	}
	const parsed = parse(text);
	if (parsed === undefined) {
		const {brokenJson} = await import('./json-problems.ts');
		return {ok: false, problems: [brokenJson(text)]};
	}
	const {value} = parsed;
	if (typeof value !== 'object' || value === null || Array.isArray(value))
		return refused('no object', 'a JSON object, in { }');
	const longList = findLongList(value, mostPairs);
	if (longList !== undefined) {
		return {
			ok: false,
			problems: [{path: pathText(longList), found: 'a list that is too long', allowed: `at most ${mostPairs} entries`}],
		};
	}
	return {
		ok: true,
		text,
		document: value as Record<string, unknown>,
		problems: await repeated(text, scan.fields, value),
	};
}

/** Whether places are looked for in a text of this length. */
export function isPlaceable(text: string): boolean {
	return text.length <= maxPlacedLength;
}

function refused(found: string, allowed: string): Json {
	return {ok: false, problems: [{path: '', found, allowed}]};
}

function parse(text: string): {value: unknown} | undefined {
	try {
		return {value: JSON.parse(text)};
	} catch (error) {
		if (error instanceof SyntaxError) return undefined;
		throw error;
	}
}

async function repeated(text: string, fields: number, value: unknown): Promise<Problem[]> {
	if (countFields(value) === fields) return [];
	const {repeatedFields} = await import('./json-problems.ts');
	return repeatedFields(text);
}
