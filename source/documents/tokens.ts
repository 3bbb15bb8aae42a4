/** The words of an expression: numbers, operators, units. */
import {unitName} from './units.ts';

export type Operator = '+' | '-' | '*' | '/' | '(' | ')';
export type Token =
	| {readonly kind: 'number'; readonly value: number; readonly text: string}
	| {readonly kind: 'operator'; readonly operator: Operator}
	| {readonly kind: 'unit'; readonly name: string};

/** What stopped the reading, as text for a message, and what to do about it where we can guess. */
export type Stop = {found: string; hint?: string};
export type Tokens = {ok: true; tokens: Token[]} | {ok: false; stop: Stop};

const space = /\s+/y;
const number = /(?:\d+(?:\.\d*)?|\.\d+)(?:[eE][+-]?\d+)?/y;
const commaNumber = /\d*,\d+/y;
// Parts like `lbf`, `m²`, `s^-2`, `°F`; joined by blanks, dots, `*`, `-` or `/` where a letter follows: `lbf-ft`, `km / h`;
// at the end a divisor of several: `lb/(hp h)`.
const unit =
	/(?:["'″′]|[%°\p{L}][\p{L}°%]*(?:\^\s*-?\d|[23](?!\d)|[²³])?(?:\s*[\s·⋅*/-]\s*\p{L}+(?:\^\s*-?\d|[23](?!\d)|[²³])?)*(?:\s*\/\s*\(\s*\p{L}+(?:[\s·⋅*-]+\p{L}+)*\s*\))?)/uy;
const operators: Readonly<Record<string, Operator>> = {
	'+': '+',
	'-': '-',
	'−': '-',
	'*': '*',
	'×': '*',
	'/': '/',
	'÷': '/',
	'(': '(',
	')': ')',
};
// More digits than a double can hold, and then some.
const longestNumber = 40;

/** The tokens of a text, or what stands in the way. Linear in the length of the text. */
export function tokensOf(text: string): Tokens {
	const tokens: Token[] = [];
	let at = skip(space, text, 0);
	while (at < text.length) {
		const operator = operators[text[at]!];
		if (operator !== undefined) {
			tokens.push({kind: 'operator', operator});
			at++;
		} else {
			const end = skip(number, text, at);
			if (end > at) {
				const read = numberFrom(text, at, end);
				if ('found' in read) return {ok: false, stop: read};
				tokens.push(read);
				at = end;
			} else {
				const unitEnd = skip(unit, text, at);
				if (unitEnd === at) return {ok: false, stop: {found: `the character "${characterAt(text, at)}"`}};
				tokens.push({kind: 'unit', name: unitName(text.slice(at, unitEnd))});
				at = unitEnd;
			}
		}
		at = skip(space, text, at);
	}
	return {ok: true, tokens};
}

function skip(pattern: RegExp, text: string, at: number): number {
	pattern.lastIndex = at;
	return pattern.test(text) ? pattern.lastIndex : at;
}

function numberFrom(text: string, at: number, end: number): Token | Stop {
	const digits = text.slice(at, end);
	if (text[end] === ',') return commaStop(text, at, skip(commaNumber, text, end));
	if (/[.\d]/.test(text[end] ?? '')) return {found: `"${digits}${text[end]}"`};
	const value = Number(digits);
	if (digits.length > longestNumber || !Number.isFinite(value))
		return {found: 'a number that is too long or too large'};
	return {kind: 'number', value, text: digits};
}

/** `86,5` is a decimal somewhere and a slip elsewhere; `1,200` is twelve hundred or one and a fifth: neither is guessed. */
function commaStop(text: string, at: number, end: number): Stop {
	const written = text.slice(at, end);
	const point = written.replace(',', '.');
	const whole = written.replace(',', '');
	const hint = /,\d{3}$/.test(written) ? `Write ${whole} or ${point}; a comma is not read.` : `Write ${point}.`;
	return {found: `"${written}", a number with a comma`, hint};
}

function characterAt(text: string, at: number): string {
	return String.fromCodePoint(text.codePointAt(at)!);
}
