/** A field of cells to draw on: braille dots (2 × 4 a cell), or one mark a cell where only ASCII can be shown. */
import type {Cell, Tone} from './cell.ts';

export type Pen = {
	readonly mark: string;
	readonly tone: Tone /** Draw every so many dots. */;
	readonly every?: number;
};

/** The bit of each dot of a braille cell (Unicode chapter 21.1), by column and row. */
const dotBits = [
	[0x01, 0x02, 0x04, 0x40],
	[0x08, 0x10, 0x20, 0x80],
] as const;
const brailleStart = 0x2800;
const bitOf = (x: number, y: number): number => dotBits[x % 2]![y % 4]!;

/** `text` stands in place of dots; `under` gives way to them. */
type CellState = {dots: number; tone: Tone; text: string | undefined; under: boolean};

export class Canvas {
	/** Size in dots. */
	readonly wide: number;
	readonly high: number;
	readonly #columns: number;
	readonly #rows: number;
	readonly #ascii: boolean;
	readonly #cells: (CellState | undefined)[];
	readonly #labeled = new Set<number>();

	/** Size in cells. */
	constructor(columns: number, rows: number, ascii: boolean) {
		this.#columns = columns;
		this.#rows = rows;
		this.#ascii = ascii;
		this.wide = ascii ? columns : columns * 2;
		this.high = ascii ? rows : rows * 4;
		this.#cells = new Array<CellState | undefined>(columns * rows);
	}

	/** A straight line between two dots, both ends included; (0, 0) is the upper left. What is outside is not drawn. */
	line(x0: number, y0: number, x1: number, y1: number, pen: Pen): void {
		const steps = Math.max(Math.abs(x1 - x0), Math.abs(y1 - y0), 1);
		for (let i = 0; i <= steps; i++) {
			const x = Math.round(x0 + ((x1 - x0) * i) / steps);
			const y = Math.round(y0 + ((y1 - y0) * i) / steps);
			if (pen.every === undefined || x % pen.every === 0) this.dot(x, y, pen);
		}
	}

	dot(x: number, y: number, {mark, tone}: Pen): void {
		if (!this.#isInside(x, y)) return;
		const index = this.#cellOf(x, y);
		if (this.#labeled.has(index)) return;
		const before = this.#cells[index];
		if (this.#ascii) this.#cells[index] = {dots: 0, tone, text: mark, under: false};
		else if (before === undefined || before.under)
			this.#cells[index] = {dots: bitOf(x, y), tone, text: undefined, under: false};
		else before.dots |= bitOf(x, y);
	}

	/** A line of signs from left to right, under everything else. */
	rule(y: number, sign: string, tone: Tone): void {
		if (!this.#isInside(0, y)) return;
		const start = this.#cellOf(0, y);
		for (let index = start; index < start + this.#columns; index++) {
			this.#cells[index] ??= {dots: 0, tone, text: sign, under: true};
		}
	}

	/** Text over what is drawn, from a dot's cell on. What does not fit is cut. */
	label(x: number, y: number, text: string, tone: Tone): void {
		if (!this.#isInside(x, y)) return;
		const start = this.#cellOf(x, y);
		const room = this.#columns - (start % this.#columns);
		[...text].slice(0, room).forEach((character, i) => {
			this.#labeled.add(start + i);
			this.#cells[start + i] = {dots: 0, tone, text: character, under: false};
		});
	}

	/** Whether a stretch of cells lies inside and holds no label. */
	isFree(x: number, y: number, length: number): boolean {
		if (!this.#isInside(x, y)) return false;
		const start = this.#cellOf(x, y);
		if ((start % this.#columns) + length > this.#columns) return false;
		return Array.from({length}, (_, i) => !this.#labeled.has(start + i)).every(Boolean);
	}

	/** How many dots a cell is wide and high. */
	get dotsPerCell(): {readonly wide: number; readonly high: number} {
		return {wide: this.#ascii ? 1 : 2, high: this.#ascii ? 1 : 4};
	}

	/** The lines from top to bottom; neighbors of one meaning are one piece. */
	lines(): Cell[][] {
		return Array.from({length: this.#rows}, (_, row) => this.#line(row));
	}

	/** False for what is not finite, too. */
	#isInside(x: number, y: number): boolean {
		return x >= 0 && y >= 0 && x < this.wide && y < this.high;
	}

	#cellOf(x: number, y: number): number {
		const {wide, high} = this.dotsPerCell;
		return Math.floor(y / high) * this.#columns + Math.floor(x / wide);
	}

	#line(row: number): Cell[] {
		const pieces: {text: string; tone: Tone}[] = [];
		for (let column = 0; column < this.#columns; column++) {
			const cell = this.#cells[row * this.#columns + column];
			const text = cell === undefined ? ' ' : (cell.text ?? String.fromCharCode(brailleStart | cell.dots));
			const last = pieces.at(-1);
			// A blank belongs to what stands before it: fewer changes of color.
			const tone = cell?.tone ?? last?.tone ?? 'plain';
			if (last?.tone === tone) last.text += text;
			else pieces.push({text, tone});
		}
		return pieces;
	}
}
