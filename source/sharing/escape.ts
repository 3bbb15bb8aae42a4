/**
 * Text inside a shared plan. Whatever a message may change (marks that become bold, quotes, dashes, fractions, links, emoji,
 * everything outside ASCII, blanks at an end or doubled) and whatever separates entries is written `{hex}`, its code point.
 */
const letterOrDigit = /[A-Za-z0-9]/;

/** Stands for no text at all, and for an object or list without entries. */
export const emptyText = '{}';
export const nothing = '{none}';
/** At the end of a word: the next word follows without a blank. */
const glue = '{-}';
const longestWord = 30;

/** `prose`: commas stay, as nothing is separated by them. */
export function escapeText(text: string, prose = false): string {
	if (text === '') return emptyText;
	const characters = [...text];
	const escaped = characters.map((character, i) =>
		isSafe(character, characters[i - 1], characters[i + 1], prose) ? character : hex(character),
	);
	return splitWords(escaped).join('');
}

/** As `escapeText`, and never to be taken for a number, true or false. */
export function escapeMarked(text: string): string {
	const escaped = escapeText(text);
	return isLiteral(escaped) ? hex(escaped[0]!) + escaped.slice(1) : escaped;
}

/** The text that was escaped; undefined where an escape is broken. */
export function unescapeText(escaped: string): string | undefined {
	if (escaped === emptyText) return '';
	let broken = false;
	const text = escaped.replace(/\{-\} ?/g, '').replace(/\{([^{}]*)(\}?)/g, (_, digits: string, end: string) => {
		const code = end !== '' && /^[0-9a-f]{1,6}$/.test(digits) ? Number.parseInt(digits, 16) : Number.NaN;
		if (code <= 0x10ffff) return String.fromCodePoint(code);
		broken = true;
		return '';
	});
	return broken ? undefined : text;
}

export function isLiteral(escaped: string): boolean {
	return escaped === 'true' || escaped === 'false' || /^-?\d+(\.\d+)?(e[+-]?\d+)?$/.test(escaped);
}

function hex(character: string): string {
	return `{${character.codePointAt(0)!.toString(16)}}`;
}

function isSafe(character: string, before: string | undefined, after: string | undefined, prose: boolean): boolean {
	if (letterOrDigit.test(character)) return true;
	const follows = isText(before);
	if (character === ' ') return before !== undefined && before !== ' ' && after !== undefined && after !== ' ';
	if (character === '.') return follows && (after === undefined || after === ' ' || isText(after));
	if (character === ':') return isDigit(before) && isDigit(after);
	if (character === ',') return prose && follows && after === ' ';
	if (character === '%') return (isDigit(before) || before === ' ') && (after === undefined || after === ' ');
	return '-+/^'.includes(character) && isText(after) && (before === undefined || before === ' ' || follows);
}

function isText(character: string | undefined): boolean {
	return character !== undefined && letterOrDigit.test(character);
}

function isDigit(character: string | undefined): boolean {
	return character !== undefined && /[0-9]/.test(character);
}

/** Breaks words that no line would hold, between characters. */
function splitWords(escaped: readonly string[]): string[] {
	let length = 0;
	return escaped.map(piece => {
		length = piece === ' ' ? 0 : length + piece.length;
		if (length <= longestWord) return piece;
		length = piece.length;
		return `${glue} ${piece}`;
	});
}
