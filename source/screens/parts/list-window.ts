/** Which part of a long list is seen. */

export type ListWindow = {
	/** The first entry that is seen, and the one after the last. */
	readonly start: number;
	readonly end: number;
};

/**
 * The window of `height` entries that moves no more than it must from where it stood, so that the cursor stays inside
 * with `margin` entries beyond it where there are any.
 */
export function listWindow(count: number, cursor: number, height: number, previousStart = 0, margin = 1): ListWindow {
	const size = Math.max(1, Math.min(height, count));
	const room = Math.min(margin, Math.floor((size - 1) / 2));
	const highest = Math.max(0, count - size);
	const earliest = cursor + room - size + 1;
	const latest = cursor - room;
	const start = Math.min(highest, Math.max(0, Math.min(latest, Math.max(earliest, previousStart))));
	return {start, end: Math.min(count, start + size)};
}
