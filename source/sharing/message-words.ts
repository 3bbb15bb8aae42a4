/** A message as words, with what mail and phones do to text undone. */

export type Word = {text: string /** Counted from 1 in the message as it came. */; line: number};

/** A longer text is no plan: the longest valid one has a part of it. */
export const longestMessage = 4_000_000;
export const mostWords = 300_000;

/**
 * Compatibility forms, dashes and fraction bars become ASCII, invisible characters go, quote marks of a reply are blanks.
 * Brackets end a word, so that entries that were joined come apart; a word ends in `-` or `/` only where a line was broken
 * there. Undefined where there are more words than in any plan.
 */
export function wordsOf(message: string): Word[] | undefined {
	const words: Word[] = [];
	let line = 1;
	for (const [piece] of message.matchAll(pieces)) {
		if (lineEnd.test(piece)) line++;
		const text = lineEnd.test(piece) ? '' : plain(piece);
		if (text === '') continue;
		const last = words.at(-1);
		if (last !== undefined && last.line < line && wasBroken(last.text)) last.text += text;
		else if (words.push({text, line}) > mostWords) return undefined;
	}
	return words;
}

/** A line end, a check in brackets, or what stands between blanks and quote marks; a byte order mark is no blank here. */
const pieces = /\r\n|[\n\r\u2028\u2029]|\[(?:[^\s>[\]]|\ufeff)*\]?|(?:[^\s>[\]]|\ufeff)+|\]/g;
const lineEnd = /^[\r\n\u2028\u2029]/;

/** A plan has no longer word, and joining without end would take its time. */
const longestWord = 200;

function wasBroken(word: string): boolean {
	return word.length <= longestWord && /[A-Za-z0-9][-/]$/.test(word);
}

function plain(piece: string): string {
	return isAscii(piece) ? piece : fromForeign(piece);
}

function isAscii(piece: string): boolean {
	// biome-ignore lint/suspicious/noControlCharactersInRegex: every ASCII character, controls included
	return /^[\x00-\x7f]*$/.test(piece);
}

function fromForeign(piece: string): string {
	// biome-ignore lint/suspicious/noControlCharactersInRegex: everything outside ASCII
	return piece.replace(/[^\x00-\x7f]/gu, foreign);
}

const known = new Map<string, string>();

/** Each character once: a message of a million of them is no reason to wait. */
function foreign(character: string): string {
	const ready = known.get(character);
	if (ready !== undefined) return ready;
	const plainForm = character
		.normalize('NFKC')
		.replace(/[\u00ad\u061c\u200b-\u200f\u202a-\u202e\u2060-\u206f\ufeff]/g, '')
		.replace(/[\u2010-\u2015\u2212]/g, '-')
		.replaceAll('\u2044', '/');
	const form = plainForm.length > longestForm ? character : plainForm;
	if (known.size < mostKnown) known.set(character, form);
	return form;
}

/** An ellipsis and a fraction have three characters; what has more is no part of a plan. */
const longestForm = 3;
const mostKnown = 1000;
