/** Lines that moved as a block: the terminal can move them itself, and only what is new has to be written. */

/** `by` > 0: up. The block is from line `top` to line `bottom`, both included, of the screen. */
export type Scroll = {readonly top: number; readonly bottom: number; readonly by: number};

/** A list moves by a line, a page by ten; more than that is rare. */
const farthest = 10;
/** Fewer lines are as cheap to write as to move. */
const fewest = 6;

/** The move that spares the most lines; undefined where none spares enough. */
export function scrollBetween(shown: readonly string[], next: readonly string[]): Scroll | undefined {
	let best: {scroll: Scroll; spared: number} | undefined;
	for (let distance = 1; distance <= farthest; distance++) {
		for (const by of [distance, -distance]) {
			const found = longestMoved(shown, next, by);
			if (found.spared >= fewest && found.spared > (best?.spared ?? 0)) best = found;
		}
	}
	return best?.scroll;
}

/** The longest run of lines that stand `by` lines higher than before, counting those that did not stand there anyhow. */
function longestMoved(shown: readonly string[], next: readonly string[], by: number) {
	let best = {scroll: {top: 0, bottom: 0, by}, spared: 0};
	let start = -1;
	let spared = 0;
	for (let y = 0; y <= next.length; y++) {
		const from = y + by;
		const isMoved = y < next.length && from >= 0 && from < shown.length && next[y] === shown[from];
		if (isMoved) {
			if (start < 0) [start, spared] = [y, 0];
			if (next[y] !== shown[y]) spared++;
			if (spared > best.spared) best = {scroll: blockOf(start, y, by), spared};
		} else start = -1;
	}
	return best;
}

/** The lines that the block comes from and goes to. */
const blockOf = (start: number, end: number, by: number): Scroll => ({
	top: Math.min(start, start + by),
	bottom: Math.max(end, end + by),
	by,
});

/** What the screen shows after the move: blank lines come in. */
export function scrolled(shown: readonly string[], {top, bottom, by}: Scroll): string[] {
	return shown.map((line, y) => {
		if (y < top || y > bottom) return line;
		const from = y + by;
		return from < top || from > bottom ? '' : (shown[from] ?? '');
	});
}

/** Scrolling region, move, and the whole screen again (DECSTBM, SU, SD). */
export const scrollCodes = ({top, bottom, by}: Scroll): string =>
	`\x1B[${top + 1};${bottom + 1}r\x1B[${Math.abs(by)}${by > 0 ? 'S' : 'T'}\x1B[r`;
