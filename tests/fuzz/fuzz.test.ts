/** A short run of the fuzzer with the same texts on every machine; `npm run fuzz` makes long ones. */
import {readdirSync} from 'node:fs';
import {afterAll, expect, test} from 'vitest';
import {runs} from '../runs.ts';
import {Campaign} from './campaign.ts';
import {Coverage} from './coverage.ts';
import {removePlaces} from './place.ts';
import {readers} from './readers.ts';

const coverage = new Coverage();
afterAll(() => {
	coverage.stop();
	removePlaces();
});

/** Of those that take longer for a text, fewer. */
const slow = new Set(['rankings', 'plans', 'commands', 'screen', 'opened', 'practice']);

test.each(readers.map(reader => [reader.name, reader] as const))('%s keep their promises', async (name, reader) => {
	const campaign = new Campaign(reader, 1, coverage);
	await campaign.run(slow.has(name) ? runs(8, 500) : runs(72, 5000));
	expect(campaign.findings).toEqual([]);
	expect(campaign.accepted).toBeGreaterThan(0);
});

test('every file of readers is in the list', () => {
	const files = readdirSync(new URL('readers', import.meta.url));
	expect(files.length).toBeLessThanOrEqual(readers.length);
	expect(new Set(readers.map(({name}) => name)).size).toBe(readers.length);
});
