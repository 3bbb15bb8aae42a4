/** A log in pieces of any size, as the complete lines that a table of rows is made of. */
import {longestLineBytes} from './head.ts';
import {type CellCounts, never, type RowPlan, RowTable, type Seen} from './row-table.ts';
import type {Numbers} from './samples.ts';

export type Rows = {
	readonly samples: number;
	readonly values: readonly Numbers[];
	readonly cells: readonly CellCounts[];
	readonly wrongCells: Seen;
	readonly longLines: Seen;
	/** Of a row that ends with the file, before its last cell. */
	readonly cutLine: number | undefined;
};

/** A larger piece is taken in parts, so that a line too long to be put aside is too long in any piece. */
const largestPart = 1 << 16;

export class RowReader {
	readonly #table: RowTable;
	readonly #lineEnd: number;
	readonly #longLines = never();
	/** A line that is not complete yet. */
	readonly #rest = new Uint8Array(longestLineBytes + 1);
	#restLength = 0;
	#isTooLong = false;

	constructor(plan: RowPlan) {
		this.#table = new RowTable(plan);
		this.#lineEnd = plan.dialect.lineEnd.charCodeAt(0);
	}

	push(bytes: Uint8Array): void {
		for (let at = 0; at < bytes.length; at += largestPart) this.#pushPart(bytes.subarray(at, at + largestPart));
	}

	#pushPart(bytes: Uint8Array): void {
		const first = bytes.indexOf(this.#lineEnd) + 1;
		if (first === 0) {
			this.#putAside(bytes);
			return;
		}
		const start = this.#hasRest ? first : 0;
		if (this.#hasRest) {
			this.#putAside(bytes.subarray(0, first));
			this.#readRest();
		}
		const end = bytes.lastIndexOf(this.#lineEnd) + 1;
		this.#table.read(bytes, start, end);
		this.#putAside(bytes.subarray(end));
	}

	get #hasRest(): boolean {
		return this.#isTooLong || this.#restLength > 0;
	}

	/** Keeps the start of a line, as far as it may still be a row. */
	#putAside(bytes: Uint8Array): void {
		if (this.#restLength + bytes.length > this.#rest.length) this.#isTooLong = true;
		if (this.#isTooLong) return;
		this.#rest.set(bytes, this.#restLength);
		this.#restLength += bytes.length;
	}

	/** Reads the line put aside, which is complete now. */
	#readRest(): void {
		if (this.#isTooLong) {
			this.#table.seen(this.#longLines);
			this.#table.line++;
		} else {
			this.#table.read(this.#rest, 0, this.#restLength);
		}
		this.#isTooLong = false;
		this.#restLength = 0;
	}

	/** Rows so far. */
	get samples(): number {
		return this.#table.samples;
	}

	/** What was read. A last line without its end counts as a row if it has all cells. */
	end(): Rows {
		const {wrongCells} = this.#table;
		const {count} = wrongCells;
		if (this.#hasRest) {
			this.#putAside(Uint8Array.of(this.#lineEnd));
			this.#readRest();
		}
		const isCut = wrongCells.count > count;
		wrongCells.count = count;
		const {values, cells, line} = this.#table;
		return {
			samples: this.#table.samples,
			values,
			cells,
			wrongCells,
			longLines: this.#longLines,
			cutLine: isCut ? line - 1 : undefined,
		};
	}
}
