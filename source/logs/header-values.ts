/** How a column is told from the others of its log: by its header where no other has the same, else by its number. */
import type {Header} from './headers.ts';

/** What one types to take this column. */
export function valueFor(header: Header, headers: readonly Header[]): string {
	return isClear(header.written, headers) ? header.written : `#${header.column}`;
}

/** The same without the unit in the header. */
export function nameFor(header: Header, headers: readonly Header[]): string {
	return isClear(header.name, headers) ? header.name : `#${header.column}`;
}

/** By which the column is found in another log; undefined where only its number tells it, which may be another column there. */
export function lastingName(header: Header, headers: readonly Header[]): string | undefined {
	return [header.name, header.written].find(text => isClear(text, headers));
}

const plainText = /^[\p{L}\p{N}\p{P}\p{S} ]{1,60}$/u;

function isClear(text: string, headers: readonly Header[]): boolean {
	if (!plainText.test(text) || /^#|^none$/i.test(text)) return false;
	return headers.filter(({written, name}) => written === text || name === text).length === 1;
}
