/** One pass over the text of a document before anything is built from it. */

export type Scan = {
	/** How many names of fields stand in the text, repeated ones included. */
	fields: number;
	/** Where nesting first goes deeper than allowed; undefined where it does not. */
	tooDeepAt: number | undefined;
};

const [quote, backslash, colon] = ['"', '\\', ':'].map(character => character.charCodeAt(0));
const openers = new Set(['{', '['].map(character => character.charCodeAt(0)));
const closers = new Set(['}', ']'].map(character => character.charCodeAt(0)));

/**
 * Counts the fields and the depth of nesting; linear, without recursion. In JSON a colon outside of text follows a name, so
 * counting colons counts names. For text that is not JSON the depth still bounds what a parser would have to recurse.
 */
export function scanJson(text: string, maxDepth: number): Scan {
	let [fields, depth] = [0, 0];
	for (let at = 0; at < text.length; at++) {
		const code = text.charCodeAt(at);
		if (code === quote) at = endOfText(text, at);
		else if (code === colon) fields++;
		else if (closers.has(code)) depth--;
		else if (openers.has(code) && ++depth > maxDepth) return {fields, tooDeepAt: at};
	}
	return {fields, tooDeepAt: undefined};
}

/** Index of the quote that closes the text opened at `at`, or the end. */
function endOfText(text: string, at: number): number {
	for (let i = at + 1; i < text.length; i++) {
		const code = text.charCodeAt(i);
		if (code === backslash) i++;
		else if (code === quote) return i;
	}
	return text.length;
}

/** How many fields the parsed value has, on all levels: fewer than in the text where one was written twice. */
export function countFields(value: unknown): number {
	if (typeof value !== 'object' || value === null) return 0;
	const children = Object.values(value);
	const own = Array.isArray(value) ? 0 : children.length;
	return children.reduce((sum: number, child) => sum + countFields(child), own);
}

/** The path of a list with more entries than any document may have; undefined where there is none. */
export function findLongList(value: unknown, most: number, path: PropertyKey[] = []): PropertyKey[] | undefined {
	if (typeof value !== 'object' || value === null) return undefined;
	const entries = Object.entries(value);
	if (Array.isArray(value) && entries.length > most) return path;
	for (const [key, child] of entries) {
		const found = findLongList(child, most, [...path, Array.isArray(value) ? Number(key) : key]);
		if (found !== undefined) return found;
	}
	return undefined;
}
