/**
 * What Ink is given for its standard output. With `debug: true` Ink hands over each whole frame as one text and writes no
 * cursor codes of its own; this writes only the lines that changed, each at its own place. It never clears the scrollback.
 */
import {EventEmitter} from 'node:events';
import type {WriteStream} from 'node:tty';
import {scrollBetween, scrollCodes, scrolled} from './scroll.ts';

const home = '\x1B[H';
const clearScreen = '\x1B[2J';
const clearLineAfter = '\x1B[K';
const hideCursor = '\x1B[?25l';
/** Terminals that know it show what stands between the two at once. */
const together = (codes: string) => `\x1B[?2026h${codes}\x1B[?2026l`;
const toLine = (y: number) => `\x1B[${y + 1};1H`;

const usualColumns = 80;
const usualRows = 24;

export type Terminal = Pick<WriteStream, 'columns' | 'rows' | 'write' | 'writableNeedDrain' | 'on' | 'once'>;

export class Screen extends EventEmitter {
	/** Keeps Ink from writing cursor codes. */
	readonly isTTY = false;
	readonly writable = true;
	/** How many frames were written. */
	frames = 0;
	readonly #terminal: Terminal;
	#shown: string[] | undefined;
	#frame: string | undefined;
	/** The size when it was last written to. */
	#painted = {width: 0, height: 0};
	#open = true;
	#waiting = false;

	constructor(terminal: Terminal) {
		super();
		this.#terminal = terminal;
		terminal.on('resize', () => {
			this.#shown = undefined;
			this.emit('resize');
		});
	}

	/**
	 * For Ink, which makes every cell of its own width ready for each frame, blank or not. What is wider than that is drawn all
	 * the same, and our lines bring their width with them: with one column only what is there is made ready.
	 */
	readonly columns = 1;

	get rows(): number {
		return this.#terminal.rows || usualRows;
	}

	/** The terminal's size. */
	get size(): {readonly width: number; readonly height: number} {
		return {width: this.#terminal.columns || usualColumns, height: this.rows};
	}

	/** Draws everything anew: after a suspension, or when something else wrote on the screen. */
	redraw(): void {
		this.#shown = undefined;
		if (this.#open && this.#frame !== undefined) this.#paint(this.#frame);
	}

	/** For a window that was changed: one that has its size again may have lost what stood there, and no resize is told. */
	windowChanged(): void {
		const {width, height} = this.size;
		if (width === this.#painted.width && height === this.#painted.height) this.redraw();
	}

	/** Nothing is written any more: the terminal is given back. */
	close(): void {
		this.#open = false;
	}

	/** As a stream's `write`, for Ink. A slow line gets the latest frame only. */
	write(frame: string, ...rest: unknown[]): boolean {
		if (this.#open && frame !== '') {
			this.#frame = frame;
			if (this.#terminal.writableNeedDrain) this.#paintWhenDrained();
			else if (!this.#waiting) this.#paint(frame);
		}
		const done = rest.find(argument => typeof argument === 'function');
		if (done) setImmediate(done as () => void);
		return true;
	}

	#paintWhenDrained(): void {
		if (this.#waiting) return;
		this.#waiting = true;
		this.#terminal.once('drain', () => {
			this.#waiting = false;
			if (this.#open) this.#paint(this.#frame!);
		});
	}

	#paint(frame: string): void {
		const next = frame.split('\n').slice(0, this.rows);
		const codes = this.#shown === undefined ? home + clearScreen + linesFrom([], next) : changes(this.#shown, next);
		this.#shown = next;
		this.#painted = this.size;
		this.frames++;
		this.#terminal.write(together(codes + hideCursor));
	}
}

/** What moved as a block is moved by the terminal; then the lines that are still different. */
function changes(shown: readonly string[], next: readonly string[]): string {
	const scroll = scrollBetween(shown, next);
	return scroll === undefined ? linesFrom(shown, next) : scrollCodes(scroll) + linesFrom(scrolled(shown, scroll), next);
}

function linesFrom(shown: readonly string[], next: readonly string[]): string {
	let codes = '';
	for (let y = 0; y < Math.max(shown.length, next.length); y++) {
		const line = next[y] ?? '';
		// The line is written before the rest is cleared: nothing flickers where frames are not shown at once.
		if (line !== (shown[y] ?? '')) codes += toLine(y) + line + clearLineAfter;
	}
	return codes;
}
