/** Where in a file the table begins, and by what its cells are separated. */
import {type AskedColumns, channelNames} from './channels.ts';
import type {Head} from './head.ts';
import {type Header, headerOf, isUnit} from './headers.ts';
import {separators, splitRow} from './split-row.ts';

export type Table = {
	readonly separator: string;
	readonly headers: readonly Header[];
	/** Of the header, from 1. */
	readonly headerLine: number;
	/** Of a row of units under the header, a text for each column. */
	readonly units: readonly string[] | undefined;
	/** The first rows of numbers, as text. */
	readonly sample: readonly (readonly string[])[];
	/** Where the first row starts. */
	readonly start: number;
	/** Lines up to there. */
	readonly linesBefore: number;
};

/** Metadata of more lines than this is no header of a table. */
const mostPreambleLines = 500;
/** Rows of units, sources and the like between header and numbers. */
const mostRowsUnderHeader = 6;
const mostSampleRows = 200;
/** More is no log. */
export const mostColumns = 2000;

/** The line with the most known names is the header; undefined where no line names columns. */
export function findTable(head: Head, wanted: readonly string[]): Table | undefined {
	const lines = head.lines.slice(0, mostPreambleLines);
	let best: {score: number; index: number; separator: string} | undefined;
	for (const separator of separators) {
		for (const [index, {text}] of lines.entries()) {
			if (!text.includes(separator)) continue;
			const score = scoreOf(splitRow(text, separator), wanted);
			if (score > (best?.score ?? 1)) best = {score, index, separator};
		}
	}
	const place = best ?? firstNames(lines.map(({text}) => text));
	return place && tableAt(head, place.index, place.separator);
}

/** How many different channels the cells name. */
function scoreOf(cells: readonly string[], wanted: readonly string[]): number {
	if (cells.length > mostColumns || cells.some(isNumberText)) return 0;
	const headers = cells.map((cell, i) => headerOf(cell, i + 1));
	const known = new Set(headers.map(({channel}) => channel).filter(channel => channel !== undefined));
	const asked = headers.filter(({written, name}) => wanted.includes(written) || wanted.includes(name));
	return known.size + asked.filter(({channel}) => channel === undefined).length;
}

/** Where no name is known: the first line of names right above numbers. */
function firstNames(lines: readonly string[]): {index: number; separator: string} | undefined {
	for (const separator of separators) {
		const index = lines.findIndex((text, i) => {
			const [cells, next] = [splitRow(text, separator), splitRow(lines[i + 1] ?? '', separator)];
			if (cells.length < 2 || cells.length > mostColumns || cells.some(isNumberText)) return false;
			return cells.length === next.length && isDataRow(next);
		});
		if (index !== -1) return {index, separator};
	}
	return undefined;
}

function tableAt({lines}: Head, index: number, separator: string): Table {
	const cells = withoutEmptyEnd(splitRow(lines[index]!.text, separator));
	const headers = cells.map((cell, i) => headerOf(cell, i + 1));
	let first = index + 1;
	let units: readonly string[] | undefined;
	for (; first < lines.length && first <= index + mostRowsUnderHeader; first++) {
		const row = splitRow(lines[first]!.text, separator);
		if (isDataRow(row)) break;
		if (units === undefined && isUnitsRow(row)) units = row;
	}
	// Where no row of numbers follows, only what is surely no row is skipped.
	if (first === lines.length || first > index + mostRowsUnderHeader) first = index + (units ? 2 : 1);
	const sample = lines.slice(first, first + mostSampleRows).map(({text}) => splitRow(text, separator));
	return {
		separator,
		headers,
		headerLine: index + 1,
		units,
		sample,
		start: lines[first - 1]!.end,
		linesBefore: first,
	};
}

/** A separator at the end of every line makes a column without a name. */
function withoutEmptyEnd(cells: readonly string[]): readonly string[] {
	return cells.slice(0, cells.findLastIndex(cell => cell !== '') + 1);
}

/** As a log writes a number, a time of day, or a number with its unit. */
const numberText = /^[+-]?(?:\d+(?:[.,:]\d+)*|[.,]\d+)(?:e[+-]?\d+)?/i;
const wholeNumber = /^[+-]?(?:\d+(?:[.,]\d*)?|[.,]\d+)(?:e[+-]?\d+)?$/i;

const isNumberText = (cell: string): boolean => wholeNumber.test(cell);

function isDataRow(cells: readonly string[]): boolean {
	const filled = cells.filter(cell => cell !== '');
	return filled.length > 0 && filled.filter(cell => numberText.test(cell) && !isUnit(cell)).length * 2 >= filled.length;
}

/** Other columns may have any unit; ours are among those we know. */
const isUnitsRow = (cells: readonly string[]): boolean => cells.some(isUnit);

/** The headers that a person or an earlier log names, without brackets. */
export function wantedHeaders(asked: AskedColumns, remembered: readonly (string | null)[]): string[] {
	const names = channelNames.flatMap(channel => asked[channel] ?? []).map(text => headerOf(text, 0));
	return [...names.flatMap(({written, name}) => [written, name]), ...remembered.filter(header => header !== null)];
}
