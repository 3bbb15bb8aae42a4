/**
 * Rows of numbers from bytes, in pieces of any size. Most cells are plain decimals and are read from the bytes as they stand;
 * only another cell of a column that is used becomes text.
 */
import type {ChannelName} from './channels.ts';
import {GrowingColumn} from './growing-column.ts';
import {longestLineBytes} from './head.ts';
import {type Decimals, readCell} from './read-cell.ts';
import {type Dialect, splitRow} from './split-row.ts';

export type RowPlan = {
	readonly dialect: Dialect;
	/** Cells of a full row. */
	readonly width: number;
	readonly columns: readonly RowColumn[];
	readonly decimals: Decimals;
	readonly decode: (bytes: Uint8Array) => string;
	/** Number of the first line. */
	readonly firstLine: number;
	/** How many rows to expect, where that can be told. */
	readonly expectedRows: number;
};

export type RowColumn = {
	/** From 0. */
	readonly index: number;
	readonly channel: ChannelName;
	/** To SI; undefined where a number without a unit says nothing. */
	readonly factor: number | undefined;
};

export type Rows = {
	readonly samples: number;
	/** In the order of the plan's columns; time and distance with all their digits. */
	readonly values: readonly (Float32Array | Float64Array)[];
	readonly cells: readonly CellCounts[];
	readonly wrongCells: Seen;
	readonly longLines: Seen;
	/** Of a row that ends with the file, before its last cell. */
	readonly cutLine: number | undefined;
};

/** How often, and on which line first. */
export type Seen = {count: number; firstLine: number};

export type CellCounts = {
	empty: number;
	readonly text: Seen & {first: string};
	readonly units: Set<string>;
};

const [comma, point, minus, zero, quote, blank, tab, carriageReturn] = [44, 46, 45, 48, 34, 32, 9, 13];
const rowsPerBlock = 16_384;
/** Whole numbers of so many digits, and quotients by these powers, are exact in a double: the result is the nearest one. */
const exactDigits = 15;
const powersOfTen = Array.from({length: exactDigits + 1}, (_, i) => 10 ** i);
/** A larger piece is taken in parts, so that a line too long for the rest is too long in any piece. */
const largestPart = 1 << 16;

const never = (): Seen => ({count: 0, firstLine: 0});

export class RowReader {
	readonly #plan: RowPlan;
	readonly #separator: number;
	readonly #lineEnd: number;
	/** Of each cell of a row, its place among the columns; −1 where it is not used. */
	readonly #slots: Int32Array;
	/** NaN sends a cell to be read as text. */
	readonly #factors: Float64Array;
	readonly #stride: number;
	readonly #block: Float64Array;
	readonly #columns: GrowingColumn<Float32Array | Float64Array>[];
	readonly #cells: CellCounts[];
	readonly #wrongCells = never();
	readonly #longLines = never();
	/** A line that is not complete yet. */
	readonly #rest = new Uint8Array(longestLineBytes + 1);
	#restLength = 0;
	#skipsLine = false;
	#line: number;
	#rowsInBlock = 0;
	#samples = 0;

	constructor(plan: RowPlan) {
		this.#plan = plan;
		this.#separator = plan.dialect.separator.charCodeAt(0);
		this.#lineEnd = plan.dialect.lineEnd.charCodeAt(0);
		this.#slots = new Int32Array(plan.width).fill(-1);
		for (const [slot, {index}] of plan.columns.entries()) this.#slots[index] = slot;
		this.#factors = Float64Array.from(plan.columns, ({factor}) => factor ?? Number.NaN);
		this.#stride = plan.columns.length;
		this.#block = new Float64Array(this.#stride * rowsPerBlock);
		this.#columns = plan.columns.map(
			({channel}) =>
				new GrowingColumn<Float32Array | Float64Array>(
					length =>
						channel === 'time' || channel === 'distance' ? new Float64Array(length) : new Float32Array(length),
					plan.expectedRows,
				),
		);
		this.#cells = plan.columns.map(() => ({empty: 0, text: {...never(), first: ''}, units: new Set()}));
		this.#line = plan.firstLine;
	}

	push(bytes: Uint8Array): void {
		for (let at = 0; at < bytes.length; at += largestPart) this.#pushPart(bytes.subarray(at, at + largestPart));
	}

	#pushPart(bytes: Uint8Array): void {
		const first = bytes.indexOf(this.#lineEnd);
		if (first === -1) {
			this.#keep(bytes);
			return;
		}
		let from = 0;
		if (this.#skipsLine || this.#restLength > 0) {
			from = first + 1;
			this.#keep(bytes.subarray(0, from));
			this.#readRest();
		}
		const end = bytes.lastIndexOf(this.#lineEnd) + 1;
		this.#readLines(bytes, from, end);
		this.#keep(bytes.subarray(end));
	}

	/** Puts the start of a line aside, as far as it may still be a row. */
	#keep(bytes: Uint8Array): void {
		if (this.#skipsLine) return;
		if (this.#restLength + bytes.length > this.#rest.length) {
			this.#skipsLine = true;
			return;
		}
		this.#rest.set(bytes, this.#restLength);
		this.#restLength += bytes.length;
	}

	/** Reads the line put aside, which is complete now. */
	#readRest(): void {
		if (this.#skipsLine) this.#seen(this.#longLines);
		if (this.#skipsLine) this.#line++;
		else this.#readLines(this.#rest, 0, this.#restLength);
		this.#skipsLine = false;
		this.#restLength = 0;
	}

	#seen(counted: Seen): void {
		if (counted.count === 0) counted.firstLine = this.#line;
		counted.count++;
	}

	/** Reads complete lines. */
	#readLines(bytes: Uint8Array, from: number, to: number): void {
		const [separator, lineEnd, slots, factors, block] = [
			this.#separator,
			this.#lineEnd,
			this.#slots,
			this.#factors,
			this.#block,
		];
		const width = slots.length;
		const stride = this.#stride;
		let base = this.#rowsInBlock * stride;
		// No mark until one was seen: the first one is read as text, which settles it.
		let mark = this.#markByte();
		let at = from;
		while (at < to) {
			let byte = bytes[at]!;
			if (byte === lineEnd || (byte === carriageReturn && bytes[at + 1] === lineEnd)) {
				at += byte === lineEnd ? 1 : 2;
				this.#line++;
				continue;
			}
			let column = 0;
			let isSurplus = false;
			for (;;) {
				const start = at;
				const slot = column < width ? slots[column]! : -1;
				if (slot < 0) {
					byte = bytes[at]!;
					if (byte === quote || byte === blank || byte === tab) at = this.#cellEnd(bytes, at);
					else while (byte !== separator && byte !== lineEnd) byte = bytes[++at]!;
					if (column >= width && !isBlank(bytes, start, at)) isSurplus = true;
				} else {
					byte = bytes[at]!;
					const isNegative = byte === minus;
					if (isNegative) byte = bytes[++at]!;
					let [mantissa, digits, decimals] = [0, 0, 0];
					for (let digit = byte - zero; digit >= 0 && digit <= 9; digit = byte - zero) {
						mantissa = 10 * mantissa + digit;
						digits++;
						byte = bytes[++at]!;
					}
					if (byte === mark) {
						byte = bytes[++at]!;
						for (let digit = byte - zero; digit >= 0 && digit <= 9; digit = byte - zero) {
							mantissa = 10 * mantissa + digit;
							decimals++;
							byte = bytes[++at]!;
						}
						digits += decimals;
					}
					if (byte === carriageReturn && bytes[at + 1] === lineEnd) byte = bytes[++at]!;
					const factor = factors[slot]!;
					const isPlain = (byte === separator || byte === lineEnd) && digits > 0 && digits <= exactDigits;
					if (isPlain && factor > 0) {
						const value = (mantissa / powersOfTen[decimals]!) * factor;
						block[base + slot] = isNegative ? -value : value;
					} else {
						at = this.#cellEnd(bytes, start);
						block[base + slot] = this.#readText(bytes.subarray(start, at), slot);
						mark = this.#markByte();
					}
				}
				if (bytes[at] === lineEnd) break;
				at++;
				column++;
			}
			at++;
			if (column < width - 1 || isSurplus) {
				this.#seen(this.#wrongCells);
			} else {
				base += stride;
				this.#rowsInBlock++;
				if (this.#rowsInBlock === rowsPerBlock) {
					this.#flush();
					base = 0;
				}
			}
			this.#line++;
		}
	}

	#markByte(): number {
		const {mark} = this.#plan.decimals;
		return mark === undefined ? -1 : mark === ',' ? comma : point;
	}

	/** Where the cell that starts here ends: at the next separator that is not in quotes, or with the line. */
	#cellEnd(bytes: Uint8Array, start: number): number {
		let at = start;
		while (bytes[at] === blank || (bytes[at] === tab && this.#separator !== tab)) at++;
		if (bytes[at] === quote) {
			at++;
			while (bytes[at] !== this.#lineEnd && (bytes[at] !== quote || bytes[at + 1] === quote))
				at += bytes[at] === quote ? 2 : 1;
		}
		while (bytes[at] !== this.#separator && bytes[at] !== this.#lineEnd) at++;
		return at;
	}

	#readText(bytes: Uint8Array, slot: number): number {
		const {columns, dialect, decimals, decode} = this.#plan;
		const counts = this.#cells[slot]!;
		const [text = ''] = splitRow(decode(bytes), dialect.separator);
		const cell = readCell(text, columns[slot]!, decimals);
		if (cell.kind === 'value') {
			if (cell.unit !== undefined) counts.units.add(cell.unit);
			return cell.value;
		}
		if (cell.kind === 'empty') counts.empty++;
		else {
			if (counts.text.count === 0) counts.text.first = text;
			this.#seen(counts.text);
		}
		return Number.NaN;
	}

	#flush(): void {
		for (const [slot, column] of this.#columns.entries())
			column.append(this.#block, slot, this.#stride, this.#rowsInBlock);
		this.#samples += this.#rowsInBlock;
		this.#rowsInBlock = 0;
	}

	/** What was read. A last line without its end counts as a row if it has all cells. */
	end(): Rows {
		let cutLine: number | undefined;
		if (this.#skipsLine || this.#restLength > 0) {
			const {count} = this.#wrongCells;
			this.#keep(Uint8Array.of(this.#lineEnd));
			this.#readRest();
			if (this.#wrongCells.count > count) {
				cutLine = this.#line - 1;
				this.#wrongCells.count = count;
			}
		}
		this.#flush();
		return {
			samples: this.#samples,
			values: this.#columns.map(({numbers}) => numbers),
			cells: this.#cells,
			wrongCells: this.#wrongCells,
			longLines: this.#longLines,
			cutLine,
		};
	}
}

function isBlank(bytes: Uint8Array, from: number, to: number): boolean {
	for (let at = from; at < to; at++) {
		const byte = bytes[at]!;
		if (byte !== blank && byte !== tab && byte !== carriageReturn) return false;
	}
	return true;
}
