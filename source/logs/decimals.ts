/** Whether a log has decimal points or decimal commas. Neither is guessed where a comma may part thousands. */
import type {Table} from './find-table.ts';
import type {Decimals} from './read-cell.ts';

const withPoint = /^[+-]?\d*\.\d+/;
const withComma = /^[+-]?\d*,\d+/;
const withBoth = /^[+-]?\d[\d.,]*(?:,\d+\.|\.\d+,)/;
const maybeThousands = /^[+-]?[1-9]\d{0,2}(?:,\d{3})+$/;

export type DecimalsSeen =
	| ({readonly ok: true} & Decimals)
	| {readonly ok: false; readonly examples: readonly string[]};

/** By the first rows, in the columns that are used. Undefined where they are whole numbers; then the first mark counts. */
export function decimalsIn({sample, separator}: Table, columns: readonly number[]): DecimalsSeen {
	const cells = sample.flatMap(row => columns.map(column => row[column - 1] ?? ''));
	const both = cells.find(cell => withBoth.test(cell));
	if (both !== undefined) return {ok: false, examples: [both]};
	const point = cells.find(cell => withPoint.test(cell));
	const commas = cells.filter(cell => withComma.test(cell));
	if (commas.length === 0) return {ok: true, mark: point === undefined ? undefined : '.'};
	if (point !== undefined) return {ok: false, examples: [point, commas[0]!]};
	// Semicolons part cells where the comma is taken by the decimals.
	const isSure = separator === ';' || commas.some(cell => !maybeThousands.test(cell));
	return isSure ? {ok: true, mark: ','} : {ok: false, examples: [commas[0]!]};
}
