/** Where things are in the text of a document. Loaded only when there is a problem to place. */
import {findNodeAtLocation, type Node, parseTree, printParseErrorCode, visit} from 'jsonc-parser';
import {excerptAt, type Place, placeOf, placesOf} from './place.ts';
import {type Problem, pathText, shortened, shown} from './problem.ts';

/** What a parser misses, in words; `printParseErrorCode` gives the names. */
const missing: Readonly<Record<string, string>> = {
	InvalidSymbol: 'a number, true, false, null or a text in double quotes',
	ValueExpected: 'a value',
	PropertyNameExpected: 'the name of a field in double quotes',
	ColonExpected: 'a ":" after the name of a field',
	CommaExpected: 'a "," or the end of the list or object',
	CloseBraceExpected: 'a "}"',
	CloseBracketExpected: 'a "]"',
	EndOfFileExpected: 'nothing after the end of the document',
	InvalidNumberFormat: 'a number like 1.5',
	UnexpectedEndOfString: 'the closing double quote of the text',
	UnexpectedEndOfNumber: 'a number like 1.5',
	InvalidUnicode: 'four hexadecimal digits after \\u',
	InvalidEscapeCharacter: 'one of " \\ / b f n r t u after a backslash',
	InvalidCharacter: 'no control character in a text',
	InvalidCommentToken: 'no comments',
};
const strict = {disallowComments: true, allowTrailingComma: false};

/** The first place where the text is not JSON. */
export function brokenJson(text: string): Problem {
	const first = firstError(text);
	const offset = Math.min(first?.offset ?? text.length, text.length);
	const excerpt = excerptAt(text, offset);
	const found = foundAt(text, offset, first?.length ?? 1);
	const allowed = (first && missing[first.code]) ?? 'JSON';
	return {path: '', ...placeOf(text, offset), found, allowed, ...(excerpt !== undefined && {excerpt})};
}

function foundAt(text: string, offset: number, length: number): string {
	const piece = text.slice(offset, offset + Math.max(1, length));
	if (text.slice(offset).trim() === '') return 'the end of the document';
	// JSON knows four blanks; others look like them.
	return piece.trim() === '' ? `a blank that is none in JSON (U+${codeOf(piece)})` : shortened(piece);
}

const codeOf = (piece: string): string => piece.charCodeAt(0).toString(16).toUpperCase().padStart(4, '0');

type FirstError = {offset: number; length: number; code: string};

/** Stops the visitor: a parser that recovers from a million errors takes its time. */
class Found {
	readonly error: FirstError;
	constructor(error: FirstError) {
		this.error = error;
	}
}

function firstError(text: string): FirstError | undefined {
	const onError = (code: number, offset: number, length: number) => {
		throw new Found({offset, length, code: printParseErrorCode(code)});
	};
	try {
		visit(text, {onError}, strict);
	} catch (error) {
		if (error instanceof Found) return error.error;
		throw error;
	}
	return undefined;
}

/** Every field that stands a second time in its object. The text is JSON. */
export function repeatedFields(text: string): Problem[] {
	const problems: Problem[] = [];
	const open: Set<string>[] = [];
	const placeAt = placesOf(text);
	visit(text, {
		onObjectBegin: () => {
			open.push(new Set());
		},
		onObjectEnd: () => {
			open.pop();
		},
		onObjectProperty: (name, offset, _length, _line, _column, pathTo) => {
			const names = open.at(-1)!;
			const path = pathText([...pathTo(), name]);
			if (names.has(name))
				problems.push({
					path,
					...placeAt(offset),
					found: `${shown(name)} a second time`,
					allowed: 'each field once',
				});
			names.add(name);
		},
	});
	return problems;
}

export type Placed = Place & {offset: number};

/** Finds the place of a path: the field's name for `key`, else its value, else the object that lacks it. */
export function placesIn(text: string): (path: readonly PropertyKey[], key?: string) => Placed {
	const root = parseTree(text);
	const placeAt = placesOf(text);
	return (path, key) => {
		const offset = offsetOf(root, path, key);
		return {offset, ...placeAt(offset)};
	};
}

function offsetOf(root: Node | undefined, path: readonly PropertyKey[], key: string | undefined): number {
	if (root === undefined) return 0;
	const names = path.map(part => (typeof part === 'number' ? part : String(part)));
	for (let length = names.length; length >= 0; length--) {
		const node = findNodeAtLocation(root, names.slice(0, length));
		if (node === undefined) continue;
		const property = key === undefined ? undefined : node.children?.find(child => child.children?.[0]?.value === key);
		return property?.offset ?? node.offset;
	}
	return root.offset;
}
