import {readFileSync} from 'node:fs';
import {expect, test} from 'vitest';
import {readShared} from '../../source/sharing/read-shared.ts';

/** Written once by the program of that version and never changed. */
const file = (name: string) => readFileSync(new URL(`version-1/${name}`, import.meta.url), 'utf8');
const plan = JSON.parse(file('plan.json'));

test.each(['plan.txt', 'dense.txt', 'plan.json'])('%s of version 1 is read as it was meant', async name => {
	expect(await readShared(file(name))).toMatchObject({ok: true, form: 'plan', plan});
});

test('the short form of version 1 is read as it was meant', async () => {
	expect(await readShared(file('short.txt'))).toEqual({
		ok: true,
		form: 'short',
		fields: JSON.parse(file('short.json')),
	});
});
