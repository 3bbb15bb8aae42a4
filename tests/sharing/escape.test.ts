import fc from 'fast-check';
import {expect, test} from 'vitest';
import {escapeMarked, escapeText, unescapeText} from '../../source/sharing/escape.ts';

test.each([
	['Pine Hollow', 'Pine Hollow'],
	['St. Louis', 'St. Louis'],
	['0.95 m^2', '0.95 m^2'],
	['-15 %', '-15 %'],
	["Joe's", 'Joe{27}s'],
	['a -- b', 'a {2d}{2d} b'],
	['a  b ', 'a{20}{20}b{20}'],
	['*bold* _it_', '{2a}bold{2a} {5f}it{5f}'],
	['wait...', 'wait{2e}{2e}{2e}'],
	['8)', '8{29}'],
	['75 °F', '75 {b0}F'],
	['A\u00a0B', 'A{a0}B'],
	['', '{}'],
	['\ud800', '{d800}'],
	['😀', '{1f600}'],
])('%j is written %s', (text, written) => {
	expect(escapeText(text)).toBe(written);
	expect(unescapeText(written)).toBe(text);
});

test('text that looks like a number or a yes is marked where numbers may stand', () => {
	expect(escapeMarked('1.2')).toBe('{31}.2');
	expect(escapeMarked('true')).toBe('{74}rue');
	expect(escapeMarked('1.2 m')).toBe('1.2 m');
});

test('a word too long for a line is broken with a mark that joins it', () => {
	const written = escapeText('x'.repeat(65));
	expect(written.split(' ').map(word => word.length)).toEqual([33, 33, 5]);
	expect(unescapeText(written)).toBe('x'.repeat(65));
});

test('unescaping undoes escaping for any text', () => {
	fc.assert(
		fc.property(fc.string({unit: 'binary', maxLength: 120}), text => unescapeText(escapeText(text)) === text),
		{numRuns: 500},
	);
});

test('a broken escape is refused', () => {
	for (const broken of ['{', '{zz}', '{110000}', 'a{27', '{none}']) expect(unescapeText(broken)).toBeUndefined();
});
