import {expect, test} from 'vitest';
import {findDocument, isFileName} from '../../source/commands/find-document.ts';

const shipped = (name: string, stem: string) => ({name, stem, kind: 'track', from: 'shipped'});
const shelf = [shipped('Demo Short', 'short'), shipped('Demo Road', 'road'), shipped('DEMO ROAD', 'road-2')];
const find = (asked: string, among = shelf) => findDocument(asked, among, 'track');
const message = (asked: string, among = shelf) => {
	const result = find(asked, among);
	return result.ok ? 'found' : result.message;
};

test('a document is found by its own name and by its file stem, whatever the case', () => {
	for (const asked of ['Demo Short', 'short', 'demo short', 'SHORT'])
		expect(find(asked)).toEqual({ok: true, value: shelf[0]});
});

test('an exact name comes before a case-folded one', () => {
	expect(find('Demo Road')).toEqual({ok: true, value: shelf[1]});
	expect(find('DEMO ROAD')).toEqual({ok: true, value: shelf[2]});
});

test('a name that folds to several is ambiguous, and all are listed', () => {
	expect(message('demo road')).toMatch(
		/may mean:\n {2}Demo Road \(track, also called road\)\n {2}DEMO ROAD \(track, also called road-2\)/,
	);
});

test('a saved document comes before a shipped one of the same name', () => {
	const saved = {name: 'Demo Short', stem: 'demo-short', kind: 'track', from: 'saved'};
	expect(find('demo short', [...shelf, saved])).toEqual({ok: true, value: saved});
});

test('an unknown name is answered with the nearest ones, and with all where none is near', () => {
	expect(message('shrt')).toMatch(/no track called shrt\.\nNearest:\n {2}Demo Short/);
	expect(message('shrt')).not.toMatch(/Road/);
	expect(message('zzz')).toMatch(/There are:\n {2}Demo Short .*\n {2}Demo Road .*\n {2}DEMO ROAD/);
	expect(find('zzz')).toMatchObject({ok: false, status: 2});
});

test('control characters of a name are shown, not sent', () => {
	expect(message('a\u001b[2J')).toContain('a␛[2J');
});

test('a slash or the ending makes a word a file', () => {
	for (const file of ['./short', 'a/b', 'short.json', 'SHORT.JSON']) expect(isFileName(file)).toBe(true);
	for (const name of ['short', 'Demo Short', '-']) expect(isFileName(name)).toBe(false);
	expect(isFileName('a\\b', '\\')).toBe(true);
});
