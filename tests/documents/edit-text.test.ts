import {expect, test} from 'vitest';
import {editText} from '../../source/documents/edit-text.ts';
import {withEdits} from '../../source/documents/edits.ts';

const text = `{
  "kind": "track",   "version": 1,
  "air": { "temperature": "75 degF" },
  "straights": [
    { "name": "Front", "exit": "88 mph" }
  ]
}
`;

test('a changed value changes nothing else', () => {
	expect(editText(text, [{path: ['straights', 0, 'exit'], value: '89 mph'}])).toBe(text.replace('88 mph', '89 mph'));
});

test('a new group comes in with the indents of the text, and goes without a trace', () => {
	const value = '86.42 in ± 0.06 in';
	const edited = editText(text, [{path: ['car', 'tires', 'left'], value}]);
	expect(edited).toContain(`  "car": {\n    "tires": {\n      "left": "${value}"\n    }\n  }`);
	expect(edited.startsWith(text.slice(0, text.indexOf('\n  ]')))).toBe(true);
	expect(editText(edited, [{path: ['car', 'tires', 'left'], value: undefined}])).toBe(text);
});

test('a group on one line stays on it', () => {
	const value = '29.1 inHg';
	const edited = editText(text, [{path: ['air', 'pressure'], value}]);
	expect(edited).toContain(`"air": { "temperature": "75 degF", "pressure": "${value}" },`);
	expect(editText(edited, [{path: ['air', 'pressure'], value: undefined}])).toBe(text);
});

test('a list is written and taken out again', () => {
	const edits = [{path: ['learned'], value: [{field: 'car.grip', value: 1.2}]}];
	const edited = editText(text, edits);
	expect(JSON.parse(edited)).toEqual(withEdits(JSON.parse(text), edits));
	expect(editText(edited, [{path: ['learned'], value: undefined}])).toBe(text);
});

test('taking out what is not there changes nothing', () => {
	expect(editText(text, [{path: ['car', 'grip'], value: undefined}])).toBe(text);
});

test('tabs, Windows line ends and a byte order mark stay', () => {
	const other = `\uFEFF${text.replaceAll('  ', '\t').replaceAll('\n', '\r\n')}`;
	const edited = editText(other, [{path: ['lap'], value: '1 mi'}]);
	expect(edited).toMatch(/^\uFEFF/);
	expect(edited).toContain('\r\n\t"lap": "1 mi"');
	expect(edited.replaceAll('\r\n', '')).not.toContain('\n');
});
