/** What is wrong with a file as a whole. */
import {shortened} from '../documents/problem.ts';
import type {UsedColumn} from './decide-units.ts';
import type {Table} from './find-table.ts';
import {headBytes} from './head.ts';
import type {LogProblem} from './reading.ts';
import type {Rows} from './row-reader.ts';

const table =
	'a table as text: a line of headers, then a line of numbers for each sample, parted by commas, semicolons or tabs';
const exportAgain = 'Export the run from the logger as CSV text.';

/** Beginnings of files that people take for logs. */
const packed: readonly {readonly what: string; readonly bytes: readonly number[]}[] = [
	{what: 'a ZIP archive or a workbook', bytes: [0x50, 0x4b, 0x03, 0x04]},
	{what: 'a gzip file', bytes: [0x1f, 0x8b]},
];

/** In so many bytes zeros are looked for, unless the line ends before. */
const longestFirstLine = 4096;

/** For an empty file, and for one that is no text. */
export function notText(bytes: Uint8Array): LogProblem | undefined {
	const isEmpty = !bytes.some(byte => byte > 32 && byte !== 0xef && byte !== 0xbb && byte !== 0xbf);
	if (isEmpty && !bytes.includes(0))
		return {kind: 'empty', where: 'the file', found: 'nothing', allowed: table, do: exportAgain};
	const known = packed.find(one => one.bytes.every((byte, i) => bytes[i] === byte));
	if (known)
		return {kind: 'binary', where: 'the file', found: known.what, allowed: table, do: `Unpack it, or: ${exportAgain}`};
	// What a loss of power leaves ends in zeros; it does not begin with them.
	const end = bytes.findIndex((byte, i) => byte === 10 || i === longestFirstLine);
	const first = bytes.subarray(0, end === -1 ? undefined : end);
	if (!first.includes(0)) return undefined;
	const isWide = first.filter(byte => byte === 0).length * 3 > first.length && bytes[0] !== 0;
	return {
		kind: 'binary',
		where: 'the file',
		found: isWide
			? "binary zeros: the logger's own format, or UTF-16 text without its mark"
			: 'binary zeros, so it is no text',
		allowed: table,
		do: isWide ? `${exportAgain} Save it as UTF-8.` : exportAgain,
	};
}

export const tooLongLine = (): LogProblem => ({
	kind: 'longLine',
	where: 'line 1',
	found: `no end within ${headBytes / 1024} kB`,
	allowed: table,
	do: exportAgain,
});

export const tooLarge = (most: string): LogProblem => ({
	kind: 'tooLarge',
	where: 'the file',
	found: `more than ${most}`,
	allowed: 'a log of a few hours',
	do: 'Export a part of the run.',
});

export const noHeader = (first: string): LogProblem => ({
	kind: 'noHeader',
	where: 'the file',
	found: `no line of headers; it begins with "${shortened(first)}"`,
	allowed: table,
	do: 'Export it with a line that names the columns: Time, Speed, RPM.',
});

export const mixedDecimals = (examples: readonly string[]): LogProblem => ({
	kind: 'decimals',
	where: 'the numbers',
	found: examples.map(text => `"${shortened(text)}"`).join(' and '),
	allowed: 'one mark before decimals, a point or a comma, and none between thousands',
	do: 'Export it without marks between thousands.',
});

/** Where fewer rows are sound than not, or none is there. */
export function noRows({samples, wrongCells}: Rows, {headers, headerLine}: Table): LogProblem {
	if (samples === 0 && wrongCells.count === 0)
		return {
			kind: 'noRows',
			where: `the lines after the header (line ${headerLine})`,
			found: 'no row of numbers',
			allowed: table,
			do: 'Export the run itself with its header.',
		};
	return {
		kind: 'misshapen',
		where: `line ${wrongCells.firstLine} and ${wrongCells.count - 1} others`,
		found: `another number of cells than the ${headers.length} headers, in ${wrongCells.count} of ${samples + wrongCells.count} rows`,
		allowed: 'a cell for each header in every row',
		do: 'Export it again; numbers with decimal commas need semicolons or tabs between cells.',
	};
}

/** A required column in which no cell is a number. */
export function noNumbers({samples, cells}: Rows, columns: readonly UsedColumn[]): LogProblem | undefined {
	const axis = columns.some(({channel}) => channel === 'time') ? 'time' : 'distance';
	for (const [slot, {channel, header}] of columns.entries()) {
		if (channel !== axis && channel !== 'speed' && channel !== 'rpm') continue;
		const {empty, text} = cells[slot]!;
		if (empty + text.count < samples) continue;
		return {
			kind: 'noNumbers',
			where: `the column of ${channel}, "${shortened(header.written)}" (#${header.column})`,
			found: text.count > 0 ? `no number; on line ${text.firstLine}: "${shortened(text.first)}"` : 'only empty cells',
			allowed: channel === 'time' ? 'numbers, or times as hh:mm:ss.fff' : 'numbers',
			do: `Take another column: --column ${channel}=HEADER.`,
		};
	}
	return undefined;
}

export const runsBackward = (axis: 'time' | 'distance', back: number, all: number): LogProblem => ({
	kind: 'backward',
	where: `the column of ${axis}`,
	found: `a ${axis} that goes back in ${back} of ${all} rows`,
	allowed: 'rows in the order in which they were recorded; a few may be out of it',
	do: `Sort the rows, or take another column: --column ${axis}=HEADER.`,
});

export function deadSensor(channel: 'speed' | 'rpm', columns: readonly UsedColumn[]): LogProblem {
	const {header} = columns.find(column => column.channel === channel)!;
	return {
		kind: 'noNumbers',
		where: `the column of ${channel}, "${shortened(header.written)}" (#${header.column})`,
		found: 'the same value throughout, while the other of speed and rpm moves',
		allowed: 'what a working sensor gives',
		do: `Take another column: --column ${channel}=HEADER.`,
	};
}
