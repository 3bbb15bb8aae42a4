import {expect, test} from 'vitest';
import {cut, displayWidth, padTo, wrap} from '../../source/text/width.ts';

// East Asian wide characters take two columns (Unicode Standard Annex 11), combining marks none.
test('width is what the text takes on the screen', () => {
	expect(displayWidth('Front')).toBe(5);
	expect(displayWidth('直線')).toBe(4);
	expect(displayWidth('e\u0301')).toBe(1);
});

test('a wide text is cut with a mark and never passes the width', () => {
	expect(cut('Front straight', 8)).toBe('Front s…');
	expect(cut('直線直線', 6)).toBe('直線…');
	expect(cut('直線直線', 5)).toBe('直線…');
	expect(cut('Front', 5)).toBe('Front');
	expect(cut('Front', 0)).toBe('');
});

test('padding counts the width on the screen', () => {
	expect(padTo('直線', 6, 'left')).toBe('直線  ');
	expect(padTo('12', 4, 'right')).toBe('  12');
});

test('text is wrapped at blanks, with the following lines hanging', () => {
	expect(wrap('one two three four', 9)).toEqual(['one two', 'three', 'four']);
	expect(wrap('- one two three', 7, 2)).toEqual(['- one', '  two', '  three']);
	expect(wrap('', 10)).toEqual(['']);
});

test('a word wider than the line is broken', () => {
	expect(wrap('a abcdefghij', 4)).toEqual(['a', 'abcd', 'efgh', 'ij']);
	expect(wrap('直線直線', 5)).toEqual(['直線', '直線']);
});
