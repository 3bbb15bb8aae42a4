import {
	existsSync,
	mkdirSync,
	readdirSync,
	readFileSync,
	renameSync,
	rmSync,
	symlinkSync,
	writeFileSync,
} from 'node:fs';
import {join} from 'node:path';
import fc from 'fast-check';
import {expect, test} from 'vitest';
import type {Preset} from '../../source/store/kept-documents.ts';
import {keptNamed, listKept} from '../../source/store/list-kept.ts';
import type {Kept} from '../../source/store/read-kept.ts';
import {forgetKept, saveKept} from '../../source/store/save-kept.ts';
import {runs} from '../runs.ts';
import {preset, savedCar, track} from './documents.ts';
import {temporaryHome} from './temporary-home.ts';

const home = temporaryHome();

const save = (document: Preset, base?: string): Kept<Preset> => {
	const answer = saveKept(home(), document, base);
	if (answer.kind !== 'saved') throw new Error(JSON.stringify(answer));
	return answer.kept;
};

test('an empty or missing home holds nothing and is no problem', () => {
	expect(listKept(home(), 'preset')).toEqual({kept: [], problems: []});
	expect(listKept(join(home(), 'none'), 'preset')).toEqual({kept: [], problems: []});
});

test('what was saved is read back as it was, a file each', () => {
	const document = preset('Half mile', {car: 'Ours', pair: '33/38', notes: 'ünï "x"\n', basedOn: 'Short oval'});
	const kept = save(document);
	save(preset('other'));
	expect(saveKept(home(), savedCar('Ours'), undefined).kind).toBe('saved');
	expect(keptNamed(home(), 'preset', 'Half mile')).toEqual(kept);
	expect(keptNamed(home(), 'preset', 'Half mile')?.document).toEqual(document);
	expect(keptNamed(home(), 'saved-car', 'Ours')?.document).toEqual(savedCar('Ours'));
	expect(readdirSync(join(home(), 'tracks'))).toHaveLength(2);
	expect(readFileSync(join(home(), 'tracks/other.json'), 'utf8')).toMatch(
		/^\{\n {2}"kind": "preset",\n {2}"version": 1,\n/,
	);
});

test('a save on an earlier revision answers with what the other saved, and writes nothing', () => {
	const first = save(preset('Oval', {notes: 'first'}));
	const theirs = save(preset('Oval', {notes: 'theirs'}), first.revision);
	const mine = preset('Oval', {notes: 'mine'});
	expect(saveKept(home(), mine, first.revision)).toEqual({kind: 'changed', theirs});
	expect(saveKept(home(), mine, undefined)).toEqual({kind: 'changed', theirs});
	expect(keptNamed(home(), 'preset', 'Oval')).toEqual(theirs);
	// Asked, the person prefers their own.
	save(mine, theirs.revision);
	expect(keptNamed(home(), 'preset', 'Oval')?.document).toEqual(mine);
	expect(readFileSync(`${theirs.file}.bak`, 'utf8')).toContain('theirs');
});

test('a change by an editor counts like one by another copy', () => {
	const {file, revision} = save(preset('Oval'));
	writeFileSync(file, readFileSync(file, 'utf8').replace('88 mph', '89 mph'));
	expect(saveKept(home(), preset('Oval'), revision)).toMatchObject({
		kind: 'changed',
		theirs: {document: {track: {straights: [{exit: '89 mph'}]}}},
	});
});

test('a save on a document that was forgotten meanwhile asks too', () => {
	const kept = save(preset('Oval'));
	expect(forgetKept(home(), 'preset', kept)).toEqual({ok: true, value: 'forgotten'});
	expect(saveKept(home(), preset('Oval'), kept.revision)).toEqual({kind: 'changed', theirs: undefined});
	expect(existsSync(kept.file)).toBe(false);
});

test('what is forgotten stays as .bak, and what was changed meanwhile is not forgotten', () => {
	const first = save(preset('Oval', {notes: 'first'}));
	const second = save(preset('Oval', {notes: 'second'}), first.revision);
	expect(forgetKept(home(), 'preset', first)).toEqual({ok: true, value: 'changed'});
	expect(keptNamed(home(), 'preset', 'Oval')).toEqual(second);
	expect(forgetKept(home(), 'preset', second)).toEqual({ok: true, value: 'forgotten'});
	expect(keptNamed(home(), 'preset', 'Oval')).toBe(undefined);
	expect(JSON.parse(readFileSync(`${second.file}.bak`, 'utf8'))).toEqual(second.document);
});

test.each([
	['cut JSON', '{"kind": "preset", "ver', 'broken', 'not valid JSON'],
	['nothing', '', 'broken', 'empty'],
	['a list', '[]', 'broken', 'not an object'],
	['null', 'null', 'broken', 'not an object'],
	['another kind', '{"kind": "plan", "version": 1}', 'broken', 'kind is "plan", expected "preset"'],
	['no kind', '{}', 'broken', 'kind is missing, expected "preset"'],
	['no version', '{"kind": "preset"}', 'broken', 'version is missing, expected 1 to 1'],
	['a later version', '{"kind": "preset", "version": 2}', 'newer', 'version is 2, expected 1 to 1'],
	['no track', '{"kind": "preset", "version": 1}', 'broken', 'track is not a document with a name'],
	['no name', '{"kind": "preset", "version": 1, "track": {}}', 'broken', 'track is not a document with a name'],
	[
		'notes that are no text',
		'{"kind":"preset","version":1,"track":{"name":"a"},"notes":3}',
		'broken',
		'notes is not text',
	],
	['deep nesting', `{"kind": ${'['.repeat(100_000)}`, 'broken', 'nested more than 64 deep'],
	['more than 10 MB', `"${'x'.repeat(10_000_000)}"`, 'broken', 'larger than 10 MB'],
])('a file with %s is named and left as it is, and the others work', (_, content, reason, found) => {
	mkdirSync(join(home(), 'tracks'));
	const file = join(home(), 'tracks/oval.json');
	writeFileSync(file, content);
	const other = save(preset('other'));
	expect(listKept(home(), 'preset')).toMatchObject({kept: [other], problems: [{reason, file, found}]});
	expect(saveKept(home(), preset('oval'), undefined)).toMatchObject({kind: 'failed', problem: {reason, file, found}});
	expect(readFileSync(file, 'utf8')).toBe(content);
});

test('of a file that broke the version before it is pointed at', () => {
	const {file, revision} = save(preset('Oval'));
	save(preset('Oval', {notes: 'second'}), revision);
	writeFileSync(file, '{');
	expect(listKept(home(), 'preset').problems[0]?.remedy).toBe(
		'Left as it is: mend it or move it away. The version before it is beside it, ending in .bak.',
	);
});

test('a link in the place of a file is neither followed nor replaced', () => {
	mkdirSync(join(home(), 'tracks'));
	const outside = join(home(), 'outside.json');
	writeFileSync(outside, JSON.stringify(preset('oval')));
	symlinkSync(outside, join(home(), 'tracks/oval.json'));
	expect(listKept(home(), 'preset')).toMatchObject({kept: [], problems: [{found: 'not a plain file'}]});
	expect(saveKept(home(), preset('oval', {notes: 'mine'}), undefined).kind).toBe('failed');
	expect(readFileSync(outside, 'utf8')).toBe(JSON.stringify(preset('oval')));
	expect(readdirSync(join(home(), 'tracks'))).toEqual(['oval.json']);
});

test('a file with a name of its own is found by what it holds, and saved to the same file', () => {
	const kept = save(preset('Oval'));
	const own = join(home(), 'tracks/by hand.json');
	renameSync(kept.file, own);
	expect(keptNamed(home(), 'preset', 'Oval')).toEqual({...kept, file: own});
	expect(save(preset('Oval', {notes: 'second'}), kept.revision).file).toBe(own);
	expect(readdirSync(join(home(), 'tracks'))).toEqual(['by hand.json', 'by hand.json.bak']);
});

test('a file that holds another name than its place is for is not written over', () => {
	const {file} = save(preset('oval'));
	writeFileSync(file, JSON.stringify(preset('circle')));
	expect(saveKept(home(), preset('oval'), undefined)).toMatchObject({
		kind: 'failed',
		problem: {reason: 'inTheWay', file, found: 'holds "circle", so it cannot take another name'},
	});
});

test('two spellings of the same characters are one name', () => {
	const {revision} = save(preset('C\u00e1rdenas'));
	expect(saveKept(home(), preset('Ca\u0301rdenas'), undefined).kind).toBe('changed');
	save(preset('Ca\u0301rdenas'), revision);
	expect(listKept(home(), 'preset').kept).toHaveLength(1);
});

test('__proto__ is only a name and only a field', () => {
	const document = JSON.parse(
		JSON.stringify(preset('__proto__')).replace('"type"', '"__proto__": {"polluted": true}, "type"'),
	) as Preset;
	const {revision} = save(document);
	const text = JSON.stringify(keptNamed(home(), 'preset', '__proto__')?.document.track);
	expect(text).toBe(JSON.stringify(document.track));
	expect(text).toContain('"__proto__":{"polluted":true}');
	save(document, revision);
	expect(({} as {polluted?: boolean}).polluted).toBe(undefined);
});

test('whatever the name, what is saved is read back and nothing is written outside of the folder', () => {
	const name = fc.oneof(
		fc.string({unit: 'binary', minLength: 1, maxLength: 300}),
		fc.constantFrom('..', '../x', '/etc/x', 'con', '__proto__', 'a\0b', '\ud800', '.', '~', 'C:\\x'),
	);
	fc.assert(
		fc.property(fc.uniqueArray(name, {minLength: 1, maxLength: 4, selector: text => text.normalize('NFC')}), names => {
			for (const each of names) save(preset(each));
			for (const each of names) {
				expect(keptNamed(home(), 'preset', each)?.document).toEqual(preset(each));
			}
			expect(readdirSync(home())).toEqual(['tracks']);
			expect(readdirSync(join(home(), 'tracks')).every(file => file.endsWith('.json'))).toBe(true);
			rmSync(join(home(), 'tracks'), {recursive: true});
		}),
		{numRuns: runs(50, 1000), examples: [[['a', 'A', 'ä']]]},
	);
}, 180_000);

test('200 presets are listed within a tenth of a second', () => {
	mkdirSync(join(home(), 'tracks'));
	const straights = Array.from({length: 20}, (_, index) => ({...track('x').straights[0], name: `Straight ${index}`}));
	for (let index = 0; index < 200; index++) {
		const document = preset(`Track ${index}`, {track: {...track(`Track ${index}`), straights}});
		writeFileSync(join(home(), `tracks/${index}.json`), JSON.stringify(document, null, 2));
	}
	const durations = [1, 2, 3].map(() => {
		const begun = performance.now();
		expect(listKept(home(), 'preset').kept).toHaveLength(200);
		return performance.now() - begun;
	});
	expect(Math.min(...durations)).toBeLessThan(100);
});
