import {describe, expect, test} from 'vitest';
import {describeProblems, maxDocumentBytes, readTrack} from '../../source/documents/read.ts';

const message = async (text: string) => {
	const reading = await readTrack(text);
	return reading.ok ? 'read' : describeProblems('x.json', reading.problems);
};

describe('text that is not JSON is answered with line, column and what is missing', () => {
	test.each<[string, string, string]>([
		[
			'a missing comma',
			'{\n  "a": 1\n  "b": 2\n}',
			'x.json:3:3: found "b"; allowed a "," or the end of the list or object.\n  "b": 2\n  ^',
		],
		[
			'a trailing comma',
			'{"a": 1,}',
			'x.json:1:9: found }; allowed the name of a field in double quotes.\n{"a": 1,}\n        ^',
		],
		[
			'an open list',
			'{"a": [1, 2',
			'x.json:1:12: found the end of the document; allowed a "]".\n{"a": [1, 2\n           ^',
		],
		[
			'NaN',
			'{"a": NaN}',
			'x.json:1:7: found NaN; allowed a number, true, false, null or a text in double quotes.\n{"a": NaN}\n      ^',
		],
		[
			'an end after blanks',
			'{"a": 1,\n  ',
			'x.json:2:3: found the end of the document; allowed the name of a field in double quotes.',
		],
		[
			'a blank of a word processor',
			'{\u00a0"a": 1}',
			'x.json:1:2: found a blank that is none in JSON (U+00A0); allowed a number, true, false, null or a text in double quotes.\n{\u00a0"a": 1}\n ^',
		],
		['a comment', '{} // a', 'x.json:1:4: found // a; allowed no comments.\n{} // a\n   ^'],
	])('%s', async (_, text, wanted) => {
		expect(await message(text)).toBe(wanted);
	});
});

test.each([
	['nothing', '', /empty document/],
	['blanks', ' \n ', /empty document/],
	['a list', '[1]', /no object/],
	['a number', '1', /no object/],
	['null', 'null', /no object/],
	['zeros', '\0'.repeat(1000), /x\.json:1:1: found ␀/],
	['an escape sequence in a text', '{"a": "\u001B[31m"}', /␛\[31m/],
])('%s is refused', async (_, text, wanted) => {
	expect(await message(text)).toMatch(wanted);
});

test('more than 10 MB is refused before it is read', async () => {
	const started = performance.now();
	expect(await message('0'.repeat(maxDocumentBytes + 1))).toMatch(/at most 10000000 bytes/);
	expect(performance.now() - started).toBeLessThan(1000);
});

test('a field written twice is a problem, wherever it stands', async () => {
	const text =
		'{"kind": "track", "version": 1, "name": "a", "type": "road",\n "straights": [{"name": "F", "exit": "80 mph", "\\u0065xit": "90 mph"}]}';
	expect(await message(text)).toMatch(
		/^x\.json:2:48: straights\[0\]\.exit: found "exit" a second time; allowed each field once\.$/,
	);
});

test.each(['[', '{"a":'])('a million %s end in a clear error', async opener => {
	const started = performance.now();
	expect(await message(opener.repeat(1_000_000))).toMatch(/deeper nesting; allowed lists and objects at most 32 deep/);
	expect(performance.now() - started).toBeLessThan(1000);
});

test('deep nesting inside a field is refused too', async () => {
	const deep = `${'['.repeat(5000)}${']'.repeat(5000)}`;
	expect(await message(`{"kind": "track", "version": 1, "x": ${deep}}`)).toMatch(/deeper nesting/);
});
