import fc from 'fast-check';
import {expect, test} from 'vitest';
import {type EditLine, edited, editLine} from '../../../source/screens/parts/edit-line.ts';
import {keyEvent} from '../../../source/screens/terminal/key-event.ts';
import {runs} from '../../runs.ts';

const key = (name: string) => {
	const parts = name.split('+');
	return keyEvent(parts.at(-1)!, {
		ctrl: parts.includes('ctrl'),
		alt: parts.includes('alt'),
		shift: parts.includes('shift'),
	});
};
/** `|` stands where the caret is. */
const line = (marked: string): EditLine => ({text: marked.replace('|', ''), caret: marked.indexOf('|')});
const marked = ({text, caret}: EditLine) => `${text.slice(0, caret)}|${text.slice(caret)}`;
const after = (start: string, ...keys: string[]) =>
	marked(keys.reduce((now, name) => edited(now, key(name)) ?? now, line(start)));

test('a new line has its caret at the end', () => {
	expect(editLine('118 mph')).toEqual({text: '118 mph', caret: 7});
});

test('the caret moves by characters, words and to both ends', () => {
	expect(after('118 mph|', 'left')).toBe('118 mp|h');
	expect(after('|118 mph', 'left')).toBe('|118 mph');
	expect(after('118 mph|', 'right')).toBe('118 mph|');
	expect(after('118 mph|', 'home')).toBe('|118 mph');
	expect(after('|118 mph', 'ctrl+e')).toBe('118 mph|');
	expect(after('86.5+0.25 in|', 'ctrl+left', 'ctrl+left')).toBe('86.5+|0.25 in');
	expect(after('|118 mph', 'alt+f')).toBe('118| mph');
});

test('Backspace and Delete differ', () => {
	expect(after('11|8', 'backspace')).toBe('1|8');
	expect(after('11|8', 'delete')).toBe('11|');
	expect(after('|118', 'backspace')).toBe('|118');
	expect(after('118|', 'ctrl+d')).toBe('118|');
});

test('a word or the rest of the line goes at once', () => {
	expect(after('118 mph|', 'ctrl+w')).toBe('118 |');
	expect(after('118| mph', 'ctrl+u')).toBe('| mph');
	expect(after('118| mph', 'ctrl+k')).toBe('118|');
	expect(after('118 |mph', 'alt+d')).toBe('118 |');
});

test('what a person sees as one character is stepped over and removed as one', () => {
	expect(after('e\u0301|', 'backspace')).toBe('|');
	expect(after('👩‍👩‍👧|x', 'left')).toBe('|👩‍👩‍👧x');
	expect(after('|🇯🇵x', 'delete')).toBe('|x');
});

test('text goes in at the caret', () => {
	expect(marked(edited(line('1|8'), {kind: 'text', text: '1'})!)).toBe('11|8');
	expect(marked(edited(line('|'), {kind: 'text', text: '漢'})!)).toBe('漢|');
});

test('a paste gives its first line, without what a terminal would act on', () => {
	const pasted = (text: string) => marked(edited(line('a|b'), {kind: 'paste', text})!);
	expect(pasted('\r\n  118 mph  \r\nmore')).toBe('a118 mph|b');
	expect(pasted('1\x1B[31m18')).toBe('a118|b');
	expect(pasted('x\x1B]0;title\x07y\x9By\u202Ez')).toBe('axyyz|b');
	expect(pasted('one\ttwo')).toBe('aone two|b');
	expect(pasted('\n\n')).toBe('a|b');
});

test('a key that is not one of editing is left to others', () => {
	for (const name of ['enter', 'escape', 'tab', 'up', 'f5', 'ctrl+f1', 'ctrl+q'])
		expect(edited(line('x|'), key(name))).toBeUndefined();
});

test('no key or paste puts the caret outside or between the halves of a character', () => {
	const names = [
		'left',
		'right',
		'home',
		'end',
		'backspace',
		'delete',
		'ctrl+w',
		'ctrl+left',
		'ctrl+right',
		'alt+d',
		'ctrl+k',
		'ctrl+u',
	];
	const event = fc.oneof(
		fc.constantFrom(...names).map(key),
		fc.string({unit: 'grapheme', maxLength: 3}).map(text => ({kind: 'paste', text}) as const),
		fc.string({unit: 'binary', minLength: 1, maxLength: 1}).map(text => ({kind: 'text', text}) as const),
	);
	fc.assert(
		fc.property(fc.array(event, {maxLength: 30}), events => {
			const {text, caret} = events.reduce<EditLine>((now, one) => edited(now, one) ?? now, editLine('e\u0301 👍'));
			expect(caret).toBeGreaterThanOrEqual(0);
			expect(caret).toBeLessThanOrEqual(text.length);
			expect(text).not.toMatch(/\p{Cs}/u);
			expect(text.slice(0, caret)).not.toMatch(/\p{Cs}/u);
		}),
		{numRuns: runs(300, 20_000)},
	);
});
