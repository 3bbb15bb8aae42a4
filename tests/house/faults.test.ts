import {existsSync, readFileSync} from 'node:fs';
import {fileURLToPath} from 'node:url';
import {describe, expect, test} from 'vitest';

const root = fileURLToPath(new URL('../..', import.meta.url));
const [, section = ''] = readFileSync(`${root}DEVELOPERS.md`, 'utf8').split(/^## Faults.*$/m);
const rows = section
	.split(/^## /m)[0]!
	.split('\n')
	.filter(line => line.startsWith('| '))
	.map(line => line.split('|').map(cell => cell.trim()))
	.slice(2);

/** `tests/store/crash.test.ts`: "after kill -9 at any moment", "…" */
const testsIn = (cell: string) =>
	[...cell.matchAll(/`(tests\/[\w./-]+)`: ((?:"[^"]+"(?:, )?)+)/g)].map(([, file, titles]) => ({
		file: file!,
		titles: [...titles!.matchAll(/"([^"]+)"/g)].map(([, title]) => title!),
	}));

test('the table of faults has a promise in every row', () => {
	expect(rows.length).toBeGreaterThan(15);
	expect(rows.filter(([, fault, promise]) => !fault || !promise)).toEqual([]);
});

describe('every row of the table of faults names tests that there are', () => {
	test.each(rows.map(([, fault, , held]) => [fault!, held!] as const))('%s', (_, held) => {
		const named = testsIn(held);
		expect(named.length).toBeGreaterThan(0);
		for (const {file, titles} of named) {
			expect(existsSync(root + file), file).toBe(true);
			const text = readFileSync(root + file, 'utf8');
			for (const title of titles) expect(text, `${file} has no test "${title}"`).toContain(title);
		}
	});
});
