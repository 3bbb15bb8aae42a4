import {expect, test} from 'vitest';
import {printJson} from '../../source/commands/print.ts';

const value = {name: 'Ätna \u001b[31m\u009b\u202e', timeS: 12.345678901234567};

test('JSON holds the same content, numbers not rounded, and nothing that moves a terminal', () => {
	const text = printJson(value, {ascii: false});
	expect(JSON.parse(text)).toEqual(value);
	expect(text).toContain('Ätna');
	for (const sign of ['\u001b', '\u009b', '\u202e']) expect(text).not.toContain(sign);
});

test('with ascii, JSON is ASCII and still the same', () => {
	const text = printJson(value, {ascii: true});
	expect(JSON.parse(text)).toEqual(value);
	expect(text).toMatch(/^[\n\x20-\x7e]*$/);
});
