/** Which characters a log is written with. */
export type Dialect = {
	/** Between cells: comma, semicolon, tab or bar. */
	readonly separator: string;
	/** At the end of a line: line feed, or carriage return where the file has no line feed. */
	readonly lineEnd: '\n' | '\r';
};

export const separators = ['\t', ';', ',', '|'] as const;

/**
 * The cells of one line, blanks around them left out. A cell in quotes may hold separators, and two quotes stand for one. A line is a row:
 * a log has numbers, not paragraphs, and an open quote would swallow the rest of it.
 */
export function splitRow(line: string, separator: string): string[] {
	const cells: string[] = [];
	let at = 0;
	for (;;) {
		const start = skipBlanks(line, at, separator);
		if (line[start] !== '"') {
			const end = line.indexOf(separator, at);
			cells.push(line.slice(at, end === -1 ? undefined : end).trim());
			if (end === -1) return cells;
			at = end + 1;
		} else {
			const [cell, end] = quoted(line, start);
			const next = line.indexOf(separator, end);
			cells.push(cell + line.slice(end, next === -1 ? undefined : next).trimEnd());
			if (next === -1) return cells;
			at = next + 1;
		}
	}
}

function skipBlanks(line: string, from: number, separator: string): number {
	let at = from;
	while (line[at] === ' ' || (line[at] === '\t' && separator !== '\t')) at++;
	return at;
}

/** The text in the quotes that open at `start`, and where it goes on after them. */
function quoted(line: string, start: number): [cell: string, end: number] {
	let cell = '';
	let at = start + 1;
	for (;;) {
		const close = line.indexOf('"', at);
		if (close === -1) return [cell + line.slice(at), line.length];
		cell += line.slice(at, close);
		if (line[close + 1] !== '"') return [cell.trim(), close + 1];
		cell += '"';
		at = close + 2;
	}
}
