import {mkdirSync, readdirSync, readFileSync, symlinkSync, writeFileSync} from 'node:fs';
import {join} from 'node:path';
import {expect, test} from 'vitest';
import {exportStore} from '../../source/store/export-store.ts';
import {addToHistory} from '../../source/store/history.ts';
import {type ImportAnswer, importStore} from '../../source/store/import-store.ts';
import type {Preset} from '../../source/store/kept-documents.ts';
import {keptNamed, listKept} from '../../source/store/list-kept.ts';
import type {ImportChoice} from '../../source/store/read-for-import.ts';
import {saveKept} from '../../source/store/save-kept.ts';
import {preset, savedCar, track} from './documents.ts';
import {temporaryHome} from './temporary-home.ts';

const root = temporaryHome();
const [home, other, directory] = [() => join(root(), 'home'), () => join(root(), 'other'), () => join(root(), 'team')];

const save = (document: Preset, into = home()) => {
	const present = keptNamed(into, 'preset', document.track.name);
	expect(saveKept(into, document, present?.revision).kind).toBe('saved');
};
const fill = () => {
	save(preset('Oval', {notes: 'ours'}));
	save(preset('../Out', {pair: '33/38'}));
	expect(saveKept(home(), savedCar('Ours'), undefined).kind).toBe('saved');
	addToHistory(home(), 'Oval', [{date: '2026-03-01', remark: 'first'}]);
};
const exported = (from = home()) => {
	const answer = exportStore(from, directory());
	if (!answer.ok) throw new Error(JSON.stringify(answer));
	const {problems, ...files} = answer.value;
	expect(problems).toEqual([]);
	return Object.fromEntries(Object.entries(files).map(([key, value]) => [key, value.length]));
};
const imported = async (into: string, choice: Partial<ImportChoice> = {}): Promise<ImportAnswer> => {
	const full = {replace: false, now: '2026-05-05T00:00:00.000Z', judge: async () => undefined, ...choice};
	const answer = await importStore(into, directory(), full);
	if (!answer.ok) throw new Error(JSON.stringify(answer));
	return answer.value;
};
const states = async (into: string, choice: Partial<ImportChoice> = {}) => {
	const {imported: list, problems} = await imported(into, choice);
	expect(problems).toEqual([]);
	return list.map(({name, state}) => `${name}: ${state}`);
};
const files = (place: string) =>
	(readdirSync(place, {recursive: true}) as string[])
		.filter(name => name.endsWith('.json'))
		.sort()
		.map(name => [name, readFileSync(join(place, name), 'utf8')]);

test('a store that is exported and imported elsewhere is the same store, and exports the same bytes', async () => {
	fill();
	expect(exported()).toEqual({written: 4, same: 0, extra: 0});
	const bytes = files(directory());
	expect(await states(other())).toEqual(['../Out: new', 'Oval: new', 'Ours: new', 'Oval: new']);
	expect(files(other())).toEqual(files(home()));
	expect(exported(other())).toEqual({written: 0, same: 4, extra: 0});
	expect(files(directory())).toEqual(bytes);
});

test('a second import finds the same, however the files were formatted', async () => {
	fill();
	exported();
	const [file] = readdirSync(join(directory(), 'cars'));
	const {kind, version, car, saved} = savedCar('Ours');
	writeFileSync(join(directory(), 'cars', file!), JSON.stringify({saved, car, version, kind}));
	expect(await states(home())).toEqual(['../Out: same', 'Oval: same', 'Ours: same', 'Oval: same']);
});

test('what differs stays unless it is to be replaced, and what is replaced stays as .bak', async () => {
	fill();
	exported();
	save(preset('Oval', {notes: 'changed since'}));
	const before = files(home());
	expect(await states(home())).toContain('Oval: changed');
	expect(files(home())).toEqual(before);
	expect(await states(home(), {replace: true})).toContain('Oval: replaced');
	const kept = keptNamed(home(), 'preset', 'Oval')!;
	expect(kept.document.notes).toBe('ours');
	expect(readFileSync(`${kept.file}.bak`, 'utf8')).toContain('changed since');
});

test('histories are put together: no entry is lost and none doubled', async () => {
	fill();
	exported();
	addToHistory(other(), 'Oval', [{date: '2026-04-01', remark: 'theirs'}]);
	expect(await states(other(), {replace: true})).toContain('Oval: merged');
	expect(await states(other(), {replace: true})).toContain('Oval: same');
	expect(keptNamed(other(), 'history', 'Oval')?.document.entries.map(({remark}) => remark)).toEqual([
		'theirs',
		'first',
	]);
});

test('an export writes over its own files alone and names what it has no document for', () => {
	fill();
	exported();
	save(preset('Oval', {notes: 'later'}));
	expect(exported()).toEqual({written: 1, same: 3, extra: 0});
	writeFileSync(join(directory(), 'tracks/stranger.json'), '{"a": 1}');
	const [car] = readdirSync(join(directory(), 'cars'));
	writeFileSync(join(directory(), 'cars', car!), '{"mine": true}');
	const answer = exportStore(home(), directory());
	expect(answer).toMatchObject({
		ok: true,
		value: {extra: [join(directory(), 'tracks/stranger.json')], problems: [{reason: 'broken'}]},
	});
	expect(readFileSync(join(directory(), 'cars', car!), 'utf8')).toBe('{"mine": true}');
	expect(readdirSync(join(directory(), 'tracks')).filter(name => !name.endsWith('.json'))).toEqual([]);
});

test('a broken file of the store is named, and the others are exported', () => {
	fill();
	writeFileSync(join(home(), 'tracks/broken.json'), '{');
	expect(exportStore(home(), directory())).toMatchObject({
		ok: true,
		value: {problems: [{file: join(home(), 'tracks/broken.json')}]},
	});
	expect(files(directory())).toHaveLength(4);
});

test('bare track and car documents are taken in, and leave what else is known of the track', async () => {
	save(preset('Oval', {notes: 'ours'}));
	mkdirSync(directory());
	writeFileSync(join(directory(), 'a.json'), JSON.stringify({...track('Oval'), lap: '0.5 mi'}));
	writeFileSync(join(directory(), 'b.json'), JSON.stringify(track('New')));
	writeFileSync(join(directory(), 'c.json'), JSON.stringify({kind: 'car', version: 1, name: 'Ours'}));
	expect(await states(home())).toEqual(['Oval: changed', 'New: new', 'Ours: new']);
	expect(await states(home(), {replace: true})).toEqual(['Oval: replaced', 'New: same', 'Ours: same']);
	expect(keptNamed(home(), 'preset', 'Oval')?.document).toMatchObject({
		notes: 'ours',
		track: {lap: '0.5 mi'},
		saved: '2026-05-05T00:00:00.000Z',
	});
});

test('broken, foreign, doubled and ill-judged files are named, and the rest is taken in', async () => {
	mkdirSync(join(directory(), 'tracks'), {recursive: true});
	const put = (file: string, content: unknown) =>
		writeFileSync(join(directory(), file), typeof content === 'string' ? content : JSON.stringify(content));
	put('a.json', '{');
	put('b.json', {kind: 'plan', version: 1});
	put('c.json', {kind: 'session', version: 1});
	put('d.json', '['.repeat(1_000_000));
	put('tracks/e.json', preset('Good'));
	put('tracks/f.json', preset('Good', {notes: 'twice'}));
	put('tracks/g.json', preset('Bad'));
	put('tracks/h.json', {...preset('Newer'), version: 2});
	put('notes.txt', 'not looked at');
	const judge = async (_: string, {name}: {name?: unknown}) => (name === 'Bad' ? 'exit: missing' : undefined);
	const {imported: list, problems} = await imported(home(), {judge});
	expect(list).toMatchObject([{kind: 'preset', name: 'Good', state: 'new'}]);
	expect(problems.map(({file, found}) => `${file.slice(directory().length + 1)}: ${found}`)).toEqual([
		'a.json: not valid JSON',
		'b.json: no track, car, preset or history',
		'c.json: no track, car, preset or history',
		'd.json: nested more than 64 deep',
		'tracks/f.json: "Good" is the name of another file of this directory too',
		'tracks/g.json: exit: missing',
		'tracks/h.json: version is 2, expected 1 to 1',
	]);
	expect(listKept(home(), 'preset').kept).toHaveLength(1);
});

test('links in the directory are not followed, in or out', async () => {
	const outside = join(root(), 'outside');
	mkdirSync(outside);
	writeFileSync(join(outside, 'secret.json'), JSON.stringify(preset('Secret')));
	mkdirSync(directory());
	symlinkSync(outside, join(directory(), 'tracks'));
	symlinkSync(join(outside, 'secret.json'), join(directory(), 'a.json'));
	expect(await imported(home())).toMatchObject({imported: [], problems: [{found: 'not a plain file'}]});
	fill();
	const answer = exportStore(home(), directory());
	expect(answer).toMatchObject({ok: true, value: {problems: [{file: join(directory(), 'tracks')}]}});
	expect(readdirSync(outside)).toEqual(['secret.json']);
});

test('the store itself and a directory that is none are refused', async () => {
	fill();
	const choice = {replace: true, now: '', judge: async () => undefined};
	expect(exportStore(home(), home())).toMatchObject({ok: false, problem: {reason: 'inTheWay'}});
	expect(await importStore(home(), home(), choice)).toMatchObject({ok: false, problem: {reason: 'inTheWay'}});
	expect(await importStore(home(), join(root(), 'none'), choice)).toMatchObject({
		ok: false,
		problem: {reason: 'unreachable'},
	});
	const file = join(root(), 'file');
	writeFileSync(file, '');
	expect(exportStore(home(), file)).toMatchObject({ok: false, problem: {reason: 'unreachable'}});
});
