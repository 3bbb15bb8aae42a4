/** One line on a terminal that says how far a long reading is. ASCII without color, so that every terminal can show it. */

export type ProgressTerminal = {readonly write: (text: string) => void; readonly columns: number};

export type ProgressLine = {
	readonly update: (bytes: number) => void;
	/** Leaves the line as empty as it was. */
	readonly clear: () => void;
};

/** A reading that is over sooner needs no line, and no eye follows more than ten changes a second. */
const firstMs = 200;
const betweenMs = 100;

const barWidth = 24;
const bytesPerMegabyte = 1_000_000;
const toLineStart = '\r\x1B[K';

export const progressLine = (
	terminal: ProgressTerminal | undefined,
	label: string,
	totalBytes: number | undefined,
	nowMs: () => number = () => performance.now(),
): ProgressLine => {
	if (terminal === undefined) return {update: () => {}, clear: () => {}};
	let nextMs = nowMs() + firstMs;
	let isShown = false;
	return {
		update: bytes => {
			const now = nowMs();
			if (now < nextMs) return;
			nextMs = now + betweenMs;
			isShown = true;
			terminal.write(toLineStart + fitted(label, amount(bytes, totalBytes), terminal.columns));
		},
		clear: () => {
			if (isShown) terminal.write(toLineStart);
			isShown = false;
		},
	};
};

const amount = (bytes: number, totalBytes: number | undefined): string => {
	const megabytes = (count: number) => (count / bytesPerMegabyte).toFixed(0);
	if (totalBytes === undefined) return `${megabytes(bytes)} MB`;
	const share = Math.min(1, bytes / totalBytes);
	const full = Math.round(share * barWidth);
	const bar = `[${'#'.repeat(full)}${'.'.repeat(barWidth - full)}]`;
	const percent = `${Math.floor(100 * share)}`.padStart(3);
	return `${bar} ${percent} %  ${megabytes(bytes)} of ${megabytes(totalBytes)} MB`;
};

/** One column is left free: a terminal may wrap a full line. The amount says more than the name. */
const fitted = (label: string, told: string, columns: number): string => {
	const name = label.replace(/[^\x20-\x7E]/g, '?');
	return [`Reading ${name} ${told}`, `Reading ${told}`, told].find(text => text.length < columns) ?? '';
};
