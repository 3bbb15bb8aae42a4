import {readFileSync} from 'node:fs';
import {expect, test} from 'vitest';
import {withSections} from './sections.ts';

const file = '../../README.md';

test('the README shows what the program gives; else: npm run readme', async () => {
	const readme = readFileSync(new URL(file, import.meta.url), 'utf8');
	await expect(await withSections(readme)).toMatchFileSnapshot(file);
});
