import fc from 'fast-check';
import {expect, test} from 'vitest';
import {listWindow} from '../../../source/screens/parts/list-window.ts';
import {runs} from '../../runs.ts';

test('a list that fits is seen whole', () => {
	expect(listWindow(5, 4, 10)).toEqual({start: 0, end: 5});
});

test('the window stays where it was while the cursor is inside', () => {
	expect(listWindow(100, 20, 10, 15)).toEqual({start: 15, end: 25});
});

test('it moves no more than it must, with one entry beyond the cursor', () => {
	expect(listWindow(100, 24, 10, 15)).toEqual({start: 16, end: 26});
	expect(listWindow(100, 15, 10, 15)).toEqual({start: 14, end: 24});
});

test('at the ends there is nothing beyond the cursor', () => {
	expect(listWindow(100, 99, 10, 0)).toEqual({start: 90, end: 100});
	expect(listWindow(100, 0, 10, 50)).toEqual({start: 0, end: 10});
});

test('the cursor is always inside, and the window full where there is enough', () => {
	fc.assert(
		fc.property(fc.nat(300), fc.nat(300), fc.integer({min: 1, max: 60}), fc.nat(400), (count, at, height, before) => {
			fc.pre(count > 0);
			const cursor = Math.min(at, count - 1);
			const {start, end} = listWindow(count, cursor, height, before);
			expect(start).toBeLessThanOrEqual(cursor);
			expect(end).toBeGreaterThan(cursor);
			expect(end - start).toBe(Math.min(height, count));
		}),
		{numRuns: runs(300, 20_000)},
	);
});
