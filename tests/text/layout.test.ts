import {expect, test} from 'vitest';
import {type Column, cell, line, table, text} from '../../source/text/blocks.ts';
import {fitColumns, layOut} from '../../source/text/layout.ts';

const columns: Column[] = [
	{head: 'name', align: 'left', keep: 0, shortest: 4},
	{head: 'rpm', align: 'right', keep: 1},
	{head: 'where', align: 'left', keep: 2, shortest: 5},
];
const plain = (blocks: Parameters<typeof layOut>[0], width: number) =>
	layOut(blocks, width).map(cells => cells.map(each => each.text).join(''));

test('columns that fit are as wide as their content', () => {
	expect(fitColumns(columns, [10, 4, 12], 30)).toEqual([10, 4, 12]);
});

test('where they do not fit, those that may be cut are cut, the least kept most', () => {
	expect(fitColumns(columns, [10, 4, 12], 29)).toEqual([10, 4, 11]);
	expect(fitColumns(columns, [10, 4, 12], 20)).toEqual([7, 4, 5]);
	expect(fitColumns(columns, [10, 4, 12], 17)).toEqual([4, 4, 5]);
});

test('then the least kept is left out, and the others take its room', () => {
	expect(fitColumns(columns, [10, 4, 12], 16)).toEqual([10, 4, 0]);
	expect(fitColumns(columns, [10, 4, 12], 9)).toEqual([9, 0, 0]);
});

test('a table is aligned, without blanks at the end of a line', () => {
	const rows = [
		[cell('Front'), cell('8860'), cell('end')],
		[cell('直線'), cell('900'), cell('')],
	];
	expect(plain([table(columns, rows)], 40)).toEqual(['name    rpm  where', 'Front  8860  end', '直線    900']);
});

test('a line is cut, a text is wrapped', () => {
	expect(plain([line(cell('one two '), cell('three four'))], 12)).toEqual(['one two thr…']);
	expect(plain([text('one two three four', 'plain', 2)], 9)).toEqual(['one two', '  three', '  four']);
});

test('control characters of a document become visible in a cell', () => {
	expect(cell('a\u001b[31mb\nc').text).toBe('a␛[31mb␊c');
});

test('what is known to within something is spelled out in ASCII, before it is measured', () => {
	const blocks = [text('88 mph ± 1 mph'), table(columns, [[cell('a ± b'), cell('1'), cell('x')]])];
	const told = (ascii: boolean) => layOut(blocks, 40, ascii).map(cells => cells.map(each => each.text).join(''));
	expect(told(false)).toEqual(['88 mph ± 1 mph', 'name   rpm  where', 'a ± b    1  x']);
	expect(told(true)).toEqual(['88 mph +/- 1 mph', 'name     rpm  where', 'a +/- b    1  x']);
});
