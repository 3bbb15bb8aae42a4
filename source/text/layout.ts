/** From blocks to lines no wider than the width. A pure function of both. */
import {type Block, type Cell, type Column, cell, type Table} from './blocks.ts';
import type {Line} from './cell.ts';
import {cut, displayWidth, padTo, wrap} from './width.ts';

export type {Line} from './cell.ts';

const between = '  ';

/**
 * Widths of a table's columns in `available` characters, 0 for one that is left out. Where all fit, they are as
 * wide as their content; else those that may be cut are cut, and then the least kept is left out, one by one.
 */
export const fitColumns = (columns: readonly Column[], natural: readonly number[], available: number): number[] => {
	const least = columns.map((column, index) => Math.min(column.shortest ?? Number.POSITIVE_INFINITY, natural[index]!));
	const kept = new Set(columns.keys());
	const needed = () => [...kept].reduce((sum, index) => sum + least[index]! + between.length, -between.length);
	const leavingOrder = [...columns.keys()].filter(index => columns[index]!.keep > 0);
	leavingOrder.sort((a, b) => columns[b]!.keep - columns[a]!.keep || b - a);
	for (const index of leavingOrder) {
		if (needed() <= available) break;
		kept.delete(index);
	}
	let spare = Math.max(0, available - needed());
	const widths = columns.map((_, index) => (kept.has(index) ? least[index]! : 0));
	for (const index of [...kept].sort((a, b) => columns[a]!.keep - columns[b]!.keep)) {
		const more = Math.min(spare, natural[index]! - least[index]!);
		widths[index]! += more;
		spare -= more;
	}
	return widths;
};

const tableLines = ({columns, rows, indent}: Table, width: number): Line[] => {
	const natural = columns.map((column, index) =>
		Math.max(displayWidth(column.head), ...rows.map(row => displayWidth(row[index]?.text ?? ''))),
	);
	const widths = fitColumns(columns, natural, width - indent);
	const heads = columns.map(column => cell(column.head, 'muted'));
	return [heads, ...rows].map(row => {
		const cells = columns.flatMap((column, index): Cell[] => {
			const columnWidth = widths[index]!;
			const {text, tone} = row[index] ?? cell('');
			return columnWidth === 0 ? [] : [{text: padTo(text, columnWidth, column.align), tone}];
		});
		return [{text: ' '.repeat(indent), tone: 'plain' as const}, ...join(cells)];
	});
};

const join = (cells: readonly Cell[]): Cell[] =>
	cells.flatMap((each, index) => (index === 0 ? [each] : [{text: between, tone: 'plain'}, each]));

/** A line without blanks at its end, and never wider than the width. */
const clip = (cells: Line, width: number): Line => {
	const clipped: Cell[] = [];
	let left = width;
	for (const each of cells) {
		const text = cut(each.text, left);
		clipped.push({...each, text});
		left -= displayWidth(text);
	}
	while (clipped.length > 0) {
		const last = clipped.pop()!;
		const text = last.text.trimEnd();
		if (text !== '') return [...clipped, {...last, text}];
	}
	return clipped;
};

/** Longer in ASCII, so before anything is measured; all other signs have a stand-in of their own width. */
const spelled = (text: string): string => text.replaceAll('±', '+/-');
const spelledCells = (cells: readonly Cell[]): Cell[] => cells.map(each => ({...each, text: spelled(each.text)}));

const inAscii = (block: Block): Block => {
	if (block.kind === 'text') return {...block, text: spelled(block.text)};
	if (block.kind === 'line') return {...block, cells: spelledCells(block.cells)};
	return block.kind === 'table' ? {...block, rows: block.rows.map(spelledCells)} : block;
};

export const layOut = (blocks: readonly Block[], width: number, ascii = false): Line[] =>
	(ascii ? blocks.map(inAscii) : blocks)
		.flatMap((block): Line[] => {
			if (block.kind === 'gap') return [[]];
			if (block.kind === 'line') return [block.cells];
			if (block.kind === 'drawn') return block.draw(width, ascii);
			if (block.kind === 'table') return tableLines(block, width);
			return wrap(block.text, width, block.hang).map(text => [{text, tone: block.tone}]);
		})
		.map(each => clip(each, width));
