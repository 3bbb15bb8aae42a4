/** Changes to any text: bytes, pieces, words, numbers, and pieces of other texts. */
import {inJson} from './mutate-json.ts';
import type {Random} from './random.ts';
import type {Reader} from './reader.ts';

/** What has undone readers before. */
const harmful = [
	'\u001b[2J',
	'\u202e',
	'\u0000',
	'\u007f',
	'\u2028',
	'\ufeff',
	'\n',
	'\r\n',
	'\t',
	'\u00a0',
	'\u00ad',
	'\u0301',
	'\u{1f600}',
	'\ud800',
	'\udc00',
	'__proto__',
	'constructor',
	'toString',
	'{',
	'}',
	'[',
	']',
	'(',
	')',
	'"',
	"'",
	'\\',
	':',
	',',
	'.',
	'-',
	'+',
	'/',
	'%',
	'>',
];
const numbers = [
	'0',
	'-0',
	'1',
	'-1',
	'0.1',
	'1e9',
	'1e308',
	'1e-308',
	'1e999',
	'9007199254740993',
	'9'.repeat(40),
	'.5',
	'5.',
	'1,5',
	'٣',
];

type Change = (text: string, context: Context) => string | undefined;
type Context = {random: Random; words: readonly string[]; others: readonly string[]};

/** A place, and an end a little or much later. */
function span(text: string, random: Random): [start: number, end: number] {
	const start = random.below(text.length + 1);
	return [start, Math.min(text.length, start + random.below(random.of([3, 12, 200]) + 1))];
}

function replaced(text: string, [start, end]: readonly [number, number], piece: string): string {
	return text.slice(0, start) + piece + text.slice(end);
}

/** The places of all words, numbers and signs. */
const pieces = /[\p{L}_$]+|\d+(?:\.\d+)?|\s+|[^\p{L}\d\s]/gu;

function pieceIn(text: string, random: Random, pattern = pieces): [number, number] | undefined {
	const found = [...text.matchAll(pattern)];
	if (found.length === 0) return undefined;
	const {index, 0: piece} = random.of(found);
	return [index, index + piece.length];
}

const changes: readonly Change[] = [
	(text, {random}) => replaced(text, span(text, random), ''),
	(text, {random}) => {
		const [start, end] = span(text, random);
		return replaced(text, [start, start], text.slice(start, end).repeat(random.of([1, 1, 1, 2, 20])));
	},
	(text, {random}) => {
		const [start] = span(text, random);
		return replaced(text, [start, start + random.below(2)], random.of(harmful));
	},
	(text, {random}) => {
		const [start] = span(text, random);
		return replaced(
			text,
			[start, start + 1],
			String.fromCharCode(random.of([random.below(128), random.below(0x10000)])),
		);
	},
	(text, {random, words}) => {
		const place = pieceIn(text, random);
		return place && words.length > 0 ? replaced(text, place, random.of(words)) : undefined;
	},
	(text, {random, words}) => {
		const [start] = span(text, random);
		return words.length > 0 ? replaced(text, [start, start], random.of(words)) : undefined;
	},
	(text, {random}) => {
		const place = pieceIn(text, random, /\d+(?:\.\d+)?/g);
		return place && replaced(text, place, random.of([...numbers, String(random.below(1000))]));
	},
	(text, {random}) => nudged(text, random),
	(text, {random}) => {
		const [one, other] = [pieceIn(text, random), pieceIn(text, random)];
		return one && other && replaced(text, one, text.slice(...other));
	},
	(text, {random, others}) => {
		const other = random.of(others);
		return replaced(text, span(text, random), other.slice(...span(other, random)));
	},
	(text, {random, others}) => {
		const other = random.of(others);
		return text.slice(0, random.below(text.length + 1)) + other.slice(random.below(other.length + 1));
	},
];

/** A number a little or much larger or smaller: what was accepted is often accepted again. */
export function nudged(text: string, random: Random): string | undefined {
	const place = pieceIn(text, random, /\d+(?:\.\d+)?/g);
	if (place === undefined) return undefined;
	const number = text.slice(...place);
	const next = Number(number) * random.of([0.1, 0.5, 0.9, 0.99, 1.01, 1.1, 2, 10]);
	return replaced(text, place, String(number.includes('.') ? Number(next.toPrecision(6)) : Math.round(next)));
}

/** The text after one to four changes, cut to what the reader is given. */
export function mutated(text: string, reader: Reader, random: Random, others: readonly string[]): string {
	const own = reader.mutators ?? [];
	let result = text;
	for (let left = random.of([1, 1, 1, 2, 3, 4]); left > 0; left--) {
		const context = {random, words: reader.words, others};
		const isOwn = own.length > 0 && random.below(2) === 0;
		const change = isOwn ? random.of(own) : random.below(2) === 0 ? inJson : undefined;
		const next = change ? change(result, random) : random.of(changes)(result, context);
		if (next !== undefined) result = next;
	}
	return result.slice(0, reader.longest);
}
