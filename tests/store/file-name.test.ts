import fc from 'fast-check';
import {expect, test} from 'vitest';
import {fileNameOf} from '../../source/store/file-name.ts';
import {runs} from '../runs.ts';

test.each([
	['short', 'short.json'],
	['mile-and-a-half', 'mile-and-a-half.json'],
	['Short', /^short_[0-9a-f]{16}\.json$/],
	['Straße am Ring', /^stra-e-am-ring_[0-9a-f]{16}\.json$/],
	['../../etc/passwd', /^etc-passwd_[0-9a-f]{16}\.json$/],
	['con', /^con_[0-9a-f]{16}\.json$/],
	['COM1', /^com1_[0-9a-f]{16}\.json$/],
	['a.json', /^a-json_[0-9a-f]{16}\.json$/],
	['', /^name_[0-9a-f]{16}\.json$/],
	['日本', /^name_[0-9a-f]{16}\.json$/],
	['__proto__', /^proto_[0-9a-f]{16}\.json$/],
])('the file of %j is %s', (name, file) => {
	if (typeof file === 'string') expect(fileNameOf(name)).toBe(file);
	else expect(fileNameOf(name)).toMatch(file);
});

test('two spellings of the same characters have one file', () => {
	expect(fileNameOf('Ca\u0301rdenas')).toBe(fileNameOf('C\u00e1rdenas'));
});

test('names that differ in case, blanks, marks or halves of characters have different files', () => {
	const names = ['Oval', 'oval', 'OVAL', ' oval', 'oval ', 'ova\u0301l', 'oval.', '\ud800', '\ud801', '\ufffd'];
	expect(new Set(names.map(fileNameOf)).size).toBe(names.length);
});

test('a name made to look like the file of another has its own', () => {
	const other = fileNameOf('Oval');
	expect(fileNameOf(other)).not.toBe(other);
	expect(fileNameOf(other.slice(0, -'.json'.length))).not.toBe(other);
});

const hostile = fc.oneof(
	fc.string({unit: 'binary', maxLength: 400}),
	fc.string({unit: fc.constantFrom('.', '/', '\\', '\0', ':', 'A', 'a', '-', '_', '\u202e', '\u0301', '\ud800')}),
	fc.constantFrom('..', 'CON', 'nul', 'lpt9', '__proto__', 'constructor', 'aux.json'),
);

test('any name has a file name that every system takes, and two names never share one', () => {
	fc.assert(
		fc.property(hostile, hostile, (one, other) => {
			const file = fileNameOf(one);
			expect(file).toMatch(/^[a-z0-9][a-z0-9-]*(_[0-9a-f]{16})?\.json$/);
			expect(file).not.toMatch(/^(con|prn|aux|nul|com\d|lpt\d)\./);
			expect(file.length).toBeLessThanOrEqual(70);
			expect(file === fileNameOf(other)).toBe(one.normalize('NFC') === other.normalize('NFC'));
		}),
		{numRuns: runs(1000, 100_000)},
	);
});
