import {expect, test} from 'vitest';
import {cell} from '../../source/text/blocks.ts';
import {paint, toAscii} from '../../source/text/paint.ts';

test('without color the text is the text', () => {
	expect(paint([[cell('FAIL', 'fail'), cell('  '), cell('pass', 'pass')]], {color: false, ascii: false})).toBe(
		'FAIL  pass\n',
	);
});

test('with color a verdict is still a word', () => {
	expect(paint([[cell('near', 'near')]], {color: true, ascii: false})).toBe('\u001b[33mnear\u001b[39m\n');
});

test('ASCII text is as wide as it was', () => {
	expect(toAscii('75°F · 1.16 kg/m³ … Ätna')).toBe('75 F - 1.16 kg/m3 ~ Atna');
	expect(toAscii('直線 ß')).toBe('???? ?');
});
