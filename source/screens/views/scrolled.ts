import {line, type Pieces} from '../parts/pieces.ts';

/** From a line on, and no further than to the last page. */
export function scrolled(lines: readonly Pieces[], from: number, height: number): Pieces[] {
	const start = Math.min(from, Math.max(0, lines.length - height));
	const rest = lines.slice(start);
	if (rest.length <= height) return [...rest];
	return [...rest.slice(0, height - 1), line(`… ${rest.length - height + 1} more lines, PgDn`, 'muted')];
}
