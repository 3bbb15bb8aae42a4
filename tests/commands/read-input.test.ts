import {mkdtempSync, rmSync, writeFileSync} from 'node:fs';
import {tmpdir} from 'node:os';
import {join} from 'node:path';
import {Readable} from 'node:stream';
import {afterAll, expect, test} from 'vitest';
import {readFileText, readStandardInput} from '../../source/commands/read-input.ts';

const directory = mkdtempSync(join(tmpdir(), 'droprack-'));
afterAll(() => rmSync(directory, {recursive: true}));
const file = (name: string, content: string | Uint8Array): string => {
	const path = join(directory, name);
	writeFileSync(path, content);
	return path;
};
const limit = 1_000_000;

test('a file is read as UTF-8, a byte order mark left out', async () => {
	expect(await readFileText(file('good.json', '\uFEFF{"name": "Ätna"}'), limit)).toMatchObject({
		ok: true,
		value: {text: '{"name": "Ätna"}'},
	});
});

test.each([
	['a missing file', () => join(directory, 'none.json'), /none\.json: there is no such file/],
	['a directory', () => directory, /is a directory; a document is one file/],
	['a path through a file', () => `${file('plain', 'x')}/x`, /is not a directory/],
	['an empty file', () => file('empty.json', ''), /is empty; expected a JSON document/],
	['a file of blanks', () => file('blank.json', ' \n\t'), /is empty/],
	['binary zeros', () => file('zeros.json', new Uint8Array(100)), /holds binary zeros/],
	['UTF-16 text', () => file('wide.json', Buffer.from('\uFEFF{}', 'utf16le')), /is UTF-16 text; save it as UTF-8/],
	['bytes that are not UTF-8', () => file('latin.json', Buffer.from('{"a": "é"}', 'latin1')), /is not UTF-8/],
	['too many bytes', () => file('large.json', new Uint8Array(limit + 1)), /is larger than 1 MB/],
	['a device without end', () => '/dev/zero', /is larger than 1 MB/],
])('%s is bad input with a reason', async (_, path, message) => {
	const result = await readFileText(path(), limit);
	expect(result).toMatchObject({ok: false, status: 2, message: expect.stringMatching(message)});
});

test('standard input is read to its end, and no further than the limit', async () => {
	let taken = 0;
	const endless = Readable.from(
		(function* () {
			for (;;) {
				taken += 1000;
				yield new Uint8Array(1000).fill(32);
			}
		})(),
	);
	expect(await readStandardInput(endless, limit)).toMatchObject({
		ok: false,
		status: 2,
		message: 'standard input: is larger than 1 MB; a document is a few kB.',
	});
	expect(taken).toBeLessThan(2 * limit);
	expect(await readStandardInput(Readable.from([Buffer.from('{}')]), limit)).toEqual({
		ok: true,
		value: {label: 'standard input', text: '{}'},
	});
});

test('what the disk refuses is not bad input', async () => {
	const broken = new Readable({
		read() {
			this.destroy(Object.assign(new Error('io'), {code: 'EIO'}));
		},
	});
	expect(await readStandardInput(broken, limit)).toMatchObject({
		ok: false,
		status: 3,
		message: 'standard input: cannot be read (EIO).',
	});
});
