import {mkdirSync, readdirSync, writeFileSync} from 'node:fs';
import {join} from 'node:path';
import {afterAll, beforeAll, expect, test} from 'vitest';
import {keptNamed, listKept} from '../../source/store/list-kept.ts';
import {runs} from '../runs.ts';
import {bundleChild, type Children, ended, firstWords} from './children.ts';
import {temporaryHome} from './temporary-home.ts';

const home = temporaryHome();
let children: Children;
beforeAll(async () => {
	children = await bundleChild();
});
afterAll(() => children.remove());

const times = runs(25, 100);
const four = (verb: string) =>
	Promise.all([1, 2, 3, 4].map(() => children.run([verb, join(home(), 'made', 'by', 'all'), String(times)])));

test('four processes that save at once lose no update', async () => {
	await four('countUp');
	const {kept, problems} = listKept(join(home(), 'made/by/all'), 'preset');
	expect(problems).toEqual([]);
	expect(kept.map(({document}) => document.notes)).toEqual([String(4 * times)]);
}, 120_000);

test('four processes that add to a history at once lose no entry', async () => {
	await four('addEntries');
	const history = keptNamed(join(home(), 'made/by/all'), 'history', 'Track');
	expect(new Set(history?.document.entries.map(({remark}) => remark)).size).toBe(4 * times);
}, 120_000);

test('four processes that meet the lock of a killed one take it over one at a time', async () => {
	for (let round = 0; round < runs(3, 20); round++) {
		const holder = children.start(['hold', home()]);
		await firstWords(holder);
		const counting = [1, 2, 3, 4].map(() => children.run(['countUp', home(), '3']));
		holder.kill('SIGKILL');
		await Promise.all([ended(holder), ...counting]);
		expect(keptNamed(home(), 'preset', 'Counter')?.document.notes).toBe(String(12 * (round + 1)));
	}
	expect(readdirSync(home())).toEqual(['tracks']);
}, 120_000);

test('an empty lock directory holds nobody up', async () => {
	mkdirSync(join(home(), 'lock'));
	await children.run(['countUp', home(), '1']);
	expect(readdirSync(home())).toEqual(['tracks']);
});

test('what prepared locks of killed processes are left is swept, and those of others stay', async () => {
	const holder = children.start(['hold', home()]);
	await firstWords(holder);
	const [token] = readdirSync(join(home(), 'lock'));
	holder.kill('SIGKILL');
	await ended(holder);
	mkdirSync(join(home(), `lock.${token}`));
	writeFileSync(join(home(), 'lock.txt'), 'mine');
	await children.run(['countUp', home(), '1']);
	expect(readdirSync(home())).toEqual(['lock.txt', 'tracks']);
});
