/** What a view gives: blocks of cells whose meaning is named. Layout takes the width, paint the color. */
import {visible} from '../documents/visible.ts';
import type {Cell, Line, Tone} from './cell.ts';

export type {Cell, Tone} from './cell.ts';
export {cell} from './cell.ts';

export type Column = {
	head: string;
	align: 'left' | 'right';
	/** 0 stays whatever the width; of the others the highest goes first. */
	keep: number;
	/** A column with this may be cut to so many characters before others are left out. */
	shortest?: number;
};
export type Table = {kind: 'table'; columns: readonly Column[]; rows: readonly (readonly Cell[])[]; indent: number};

export type Block =
	/** Wrapped to the width; lines after the first hang under `hang` characters. */
	| {kind: 'text'; text: string; tone: Tone; hang: number}
	/** One line, cut to the width. */
	| {kind: 'line'; cells: readonly Cell[]}
	| {kind: 'gap'}
	/** What draws itself for a width, such as a picture: a listing does not load what draws. */
	| {kind: 'drawn'; draw: (width: number, ascii: boolean) => Line[]}
	| Table;

export const gap: Block = {kind: 'gap'};
export const text = (content: string, tone: Tone = 'plain', hang = 0): Block => ({
	kind: 'text',
	text: visible(content),
	tone,
	hang,
});
export const line = (...cells: Cell[]): Block => ({kind: 'line', cells});
export const table = (columns: readonly Column[], rows: readonly (readonly Cell[])[], indent = 0): Block => ({
	kind: 'table',
	columns,
	rows,
	indent,
});

/** A column with how it makes its cell of a row. */
export type Making<T> = Column & {cell: (row: T) => Cell};

/** A table from what each column makes of a row. */
export const tableOf = <T>(makings: readonly Making<T>[], rows: readonly T[], indent = 0): Block =>
	table(
		makings.map(({cell: _, ...column}) => column),
		rows.map(row => makings.map(making => making.cell(row))),
		indent,
	);
