import fc from 'fast-check';
import {expect, test} from 'vitest';
import {visible} from '../../source/documents/visible.ts';
import {runs} from '../runs.ts';

test.each([
	['\u001B[2J', '␛[2J'],
	['a\tb\r\nc', 'a␉b␍␊c'],
	['\u0000\u007F', '␀␡'],
	['\u009B31m', '\uFFFD31m'],
	['abc\u202Ecba', 'abc\uFFFDcba'],
	['\u2066x\u2069', '\uFFFDx\uFFFD'],
	['a\u200Bb\uFEFF', 'a\uFFFDb\uFFFD'],
	['\uD800x', '\uFFFDx'],
	['Kürzer 短い 🏁', 'Kürzer 短い 🏁'],
])('%j is shown as %s', (text, wanted) => {
	expect(visible(text)).toBe(wanted);
});

test('no control, bidirectional mark or half character is left, and the length stays', () => {
	fc.assert(
		fc.property(fc.string({unit: fc.integer({min: 0, max: 0xffff}).map(code => String.fromCharCode(code))}), text => {
			const shown = visible(text);
			expect(shown).not.toMatch(/[\p{Cc}\p{Cs}\u061C\u200E\u200F\u202A-\u202E\u2066-\u2069]/u);
			expect(shown).toHaveLength(text.length);
		}),
		{numRuns: runs(500, 20_000)},
	);
});
