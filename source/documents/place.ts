import {visible} from './visible.ts';

export type Place = {line: number; column: number};

// A longer line would wrap, and the mark would stand under nothing.
const longestExcerpt = 100;

/** Line and column, from 1, of offsets into a text: linear once, then logarithmic. */
export function placesOf(text: string): (offset: number) => Place {
	const starts = [0];
	for (let at = text.indexOf('\n'); at !== -1; at = text.indexOf('\n', at + 1)) starts.push(at + 1);
	return offset => {
		let [low, high] = [0, starts.length];
		while (high - low > 1) {
			const middle = (low + high) >> 1;
			if (starts[middle]! <= offset) low = middle;
			else high = middle;
		}
		return {line: low + 1, column: offset - starts[low]! + 1};
	};
}

/** Line and column, from 1, of one offset. */
export function placeOf(text: string, offset: number): Place {
	return placesOf(text)(offset);
}

/** The line around an offset with a caret under it; undefined where the line is long. */
export function excerptAt(text: string, offset: number): string | undefined {
	const start = lineStart(text, offset);
	const end = text.indexOf('\n', offset);
	const line = text.slice(start, end === -1 ? text.length : end).trimEnd();
	if (line.length > longestExcerpt || line.trim() === '') return undefined;
	return `${visible(line.replaceAll('\t', ' '))}\n${' '.repeat(offset - start)}^`;
}

function lineStart(text: string, offset: number): number {
	return offset === 0 ? 0 : text.lastIndexOf('\n', offset - 1) + 1;
}
