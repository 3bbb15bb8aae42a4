/**
 * Rows of numbers from complete lines of bytes. Most cells are plain decimals and are read from the bytes as they stand; only another
 * cell of a column that is used becomes text.
 */
import type {ChannelName} from './channels.ts';
import {GrowingColumn} from './growing-column.ts';
import {type Decimals, readCell} from './read-cell.ts';
import type {Numbers} from './samples.ts';
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

/** How often, and on which line first. */
export type Seen = {count: number; firstLine: number};
export const never = (): Seen => ({count: 0, firstLine: 0});

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

export class RowTable {
	readonly wrongCells = never();
	readonly cells: CellCounts[];
	/** Number of the next line. */
	line: number;
	readonly #plan: RowPlan;
	readonly #separator: number;
	readonly #lineEnd: number;
	/** Of each cell of a row, its place among the columns; −1 where it is not used. */
	readonly #slots: Int32Array;
	/** 0 sends a cell to be read as text. */
	readonly #factors: Float64Array;
	/** Rows that have not gone into their columns yet, one after another. */
	readonly #block: Float64Array;
	readonly #columns: GrowingColumn<Numbers>[];
	#rowsInBlock = 0;
	/** Before decimals; −1 until one was seen: the first one is read as text, which settles it. */
	#mark: number;

	constructor(plan: RowPlan) {
		this.#plan = plan;
		this.line = plan.firstLine;
		this.#separator = plan.dialect.separator.charCodeAt(0);
		this.#lineEnd = plan.dialect.lineEnd.charCodeAt(0);
		this.#mark = markByte(plan.decimals);
		this.#slots = new Int32Array(plan.width).fill(-1);
		for (const [slot, {index}] of plan.columns.entries()) this.#slots[index] = slot;
		this.#factors = Float64Array.from(plan.columns, ({factor}) => factor ?? 0);
		this.#block = new Float64Array(plan.columns.length * rowsPerBlock);
		this.#columns = plan.columns.map(({channel}) => new GrowingColumn(makerFor(channel), plan.expectedRows));
		this.cells = plan.columns.map(() => ({empty: 0, text: {...never(), first: ''}, units: new Set()}));
	}

	/** Reads lines, each with its end. */
	read(bytes: Uint8Array, from: number, to: number): void {
		const lineEnd = this.#lineEnd;
		let at = from;
		while (at < to) {
			if (bytes[at] === carriageReturn && bytes[at + 1] === lineEnd) at++;
			at = bytes[at] === lineEnd ? at + 1 : this.#readRow(bytes, at);
			this.line++;
		}
	}

	/** Gives where the next line starts. */
	#readRow(bytes: Uint8Array, start: number): number {
		const lineEnd = this.#lineEnd;
		const slots = this.#slots;
		const width = slots.length;
		const base = this.#rowsInBlock * this.#columns.length;
		let at = start;
		let column = 0;
		let isSurplus = false;
		for (;;) {
			const slot = column < width ? slots[column]! : -1;
			const from = at;
			at = slot < 0 ? this.#cellEnd(bytes, from) : this.#readNumber(bytes, from, slot, base + slot);
			if (column >= width && !isBlank(bytes, from, at)) isSurplus = true;
			if (bytes[at] === lineEnd) break;
			at++;
			column++;
		}
		if (column < width - 1 || isSurplus) this.seen(this.wrongCells);
		else if (++this.#rowsInBlock === rowsPerBlock) this.#flush();
		return at + 1;
	}

	/** Puts the number of a cell into its place of the block, and gives the end of the cell. */
	#readNumber(bytes: Uint8Array, start: number, slot: number, place: number): number {
		let at = start;
		let byte = bytes[at]!;
		const isNegative = byte === minus;
		if (isNegative) byte = bytes[++at]!;
		let mantissa = 0;
		let digits = 0;
		let decimals = 0;
		for (let digit = byte - zero; digit >= 0 && digit <= 9; digit = byte - zero) {
			mantissa = 10 * mantissa + digit;
			digits++;
			byte = bytes[++at]!;
		}
		if (byte === this.#mark) {
			byte = bytes[++at]!;
			for (let digit = byte - zero; digit >= 0 && digit <= 9; digit = byte - zero) {
				mantissa = 10 * mantissa + digit;
				decimals++;
				byte = bytes[++at]!;
			}
			digits += decimals;
		}
		if (byte === carriageReturn && bytes[at + 1] === this.#lineEnd) byte = bytes[++at]!;
		const factor = this.#factors[slot]!;
		const isPlain = (byte === this.#separator || byte === this.#lineEnd) && digits > 0 && digits <= exactDigits;
		if (!isPlain || factor === 0) return this.#readText(bytes, start, slot, place);
		const value = (mantissa / powersOfTen[decimals]!) * factor;
		this.#block[place] = isNegative ? -value : value;
		return at;
	}

	#readText(bytes: Uint8Array, start: number, slot: number, place: number): number {
		const {columns, dialect, decimals, decode} = this.#plan;
		const counts = this.cells[slot]!;
		const end = this.#cellEnd(bytes, start);
		const [text = ''] = splitRow(decode(bytes.subarray(start, end)), dialect.separator);
		const cell = readCell(text, columns[slot]!, decimals);
		this.#mark = markByte(decimals);
		this.#block[place] = cell.kind === 'value' ? cell.value : Number.NaN;
		if (cell.kind === 'value' && cell.unit !== undefined) counts.units.add(cell.unit);
		if (cell.kind === 'empty') counts.empty++;
		if (cell.kind === 'text') {
			if (counts.text.count === 0) counts.text.first = text;
			this.seen(counts.text);
		}
		return end;
	}

	/** Where the cell that starts here ends: at the next separator that is not in quotes, or with the line. */
	#cellEnd(bytes: Uint8Array, start: number): number {
		const separator = this.#separator;
		const lineEnd = this.#lineEnd;
		let at = start;
		let byte = bytes[at]!;
		while (byte !== separator && (byte === blank || byte === tab)) byte = bytes[++at]!;
		if (byte === quote) {
			at++;
			while (bytes[at] !== lineEnd && (bytes[at] !== quote || bytes[at + 1] === quote))
				at += bytes[at] === quote ? 2 : 1;
			byte = bytes[at]!;
		}
		while (byte !== separator && byte !== lineEnd) byte = bytes[++at]!;
		return at;
	}

	/** Counts something on this line. */
	seen(counted: Seen): void {
		if (counted.count === 0) counted.firstLine = this.line;
		counted.count++;
	}

	#flush(): void {
		for (const [slot, column] of this.#columns.entries())
			column.append(this.#block, slot, this.#columns.length, this.#rowsInBlock);
		this.#rowsInBlock = 0;
	}

	/** Rows so far. */
	get samples(): number {
		return this.#columns[0]!.length + this.#rowsInBlock;
	}

	/** In the order of the plan's columns; time and distance with all their digits. */
	get values(): Numbers[] {
		this.#flush();
		return this.#columns.map(({numbers}) => numbers);
	}
}

const markByte = ({mark}: Decimals): number => (mark === undefined ? -1 : mark === ',' ? comma : point);

const makerFor = (channel: ChannelName) => (length: number) =>
	channel === 'time' || channel === 'distance' ? new Float64Array(length) : new Float32Array(length);

function isBlank(bytes: Uint8Array, from: number, to: number): boolean {
	for (let at = from; at < to; at++) {
		const byte = bytes[at]!;
		if (byte !== blank && byte !== tab && byte !== carriageReturn) return false;
	}
	return true;
}
