import {readdirSync, readFileSync} from 'node:fs';
import {join} from 'node:path';
import {afterAll, beforeAll, expect, test} from 'vitest';
import {keptNamed} from '../../source/store/list-kept.ts';
import {saveKept} from '../../source/store/save-kept.ts';
import {full, runs} from '../runs.ts';
import {bundleChild, type Children, ended, firstWords} from './children.ts';
import {preset} from './documents.ts';
import {temporaryHome} from './temporary-home.ts';

const home = temporaryHome();
let children: Children;
beforeAll(async () => {
	children = await bundleChild();
});
afterAll(() => children.remove());

/** The number of a long preset, checked to be whole. */
const wholeNumber = (text: string): number => {
	const {notes} = JSON.parse(text) as {notes: string};
	const [first, filling, last] = notes.split(' ');
	expect(filling).toHaveLength(200_000);
	expect(last).toBe(first);
	return Number(first);
};

const longestRunMs = 25;

test('after kill -9 at any moment the file is whole, no acknowledged save is lost, and the next save works', async () => {
	let next = 1;
	const moments = {withLock: 0, withTemporary: 0};
	for (let i = 0; i < runs(20, 300); i++) {
		const child = children.start(['saveOn', home(), String(next)]);
		let said = '';
		child.stdout?.on('data', data => {
			said += data;
		});
		await firstWords(child);
		await new Promise(resolve => setTimeout(resolve, Math.random() * longestRunMs));
		child.kill('SIGKILL');
		await ended(child);
		const acknowledged = Number(said.trim().split('\n').at(-1));
		const folder = join(home(), 'tracks');
		if (readdirSync(home()).includes('lock')) moments.withLock++;
		if (readdirSync(folder).some(name => name.endsWith('.tmp'))) moments.withTemporary++;
		const [file] = readdirSync(folder).filter(name => name.endsWith('.json'));
		const number = wholeNumber(readFileSync(join(folder, file!), 'utf8'));
		expect([acknowledged, acknowledged + 1]).toContain(number);
		if (number > 1) expect(wholeNumber(readFileSync(join(folder, `${file}.bak`), 'utf8'))).toBeLessThanOrEqual(number);
		next = number + 1;
	}
	// The kills did hit saves.
	expect(moments.withLock).toBeGreaterThan(0);
	if (full) expect(moments.withTemporary).toBeGreaterThan(0);
	const answer = saveKept(home(), preset('Long'), keptNamed(home(), 'preset', 'Long')?.revision);
	expect(answer.kind).toBe('saved');
	expect(readdirSync(home())).toEqual(['tracks']);
	expect(readdirSync(join(home(), 'tracks')).filter(name => name.endsWith('.tmp'))).toEqual([]);
}, 300_000);
