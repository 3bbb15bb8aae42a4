import {afterAll, describe, expect, test} from 'vitest';
import {Campaign} from './campaign.ts';
import {Coverage} from './coverage.ts';
import {minimized} from './minimize.ts';
import type {Answer, Reader} from './reader.ts';
import {readDeep, readSlowly} from './source/deep.ts';

const coverage = new Coverage();
afterAll(() => coverage.stop());

const reader = (read: (text: string) => Answer, change: Partial<Reader> = {}): Reader => ({
	name: 'sample',
	examples: () => ['0'],
	words: [],
	longest: 100,
	read,
	...change,
});
const found = async (one: Reader, executions: number) => {
	const campaign = new Campaign(one, 1, coverage);
	await campaign.run(executions);
	return campaign.findings;
};

test('what lies behind one branch after the other is reached, and the text is made short', async () => {
	const findings = await found(reader(readDeep), 20_000);
	expect(findings).toMatchObject([{promise: expect.stringMatching(/^nothing is thrown/), input: 'DRP'}]);
});

test('the same seed finds the same', async () => {
	const once = () =>
		found(
			reader(text => ({accepted: true, said: text})),
			2000,
		);
	const [first] = await once();
	expect(first?.promise).toBe('no control character is said');
	expect(await once()).toEqual([first]);
});

test('work that grows faster than the text is found by counting, not by a clock', async () => {
	const findings = await found(reader(readSlowly, {work: {start: 500, perCharacter: 10}}), 2000);
	expect(findings).toMatchObject([{promise: 'the work is bounded'}]);
});

describe('a broken promise is named', () => {
	test.each<[string, Answer, string]>([
		['a control character', {accepted: true, said: 'a\u001b[2J'}, 'no control character is said'],
		['no problem at all', {accepted: false, problems: []}, 'what is rejected has a problem'],
		[
			'a problem without what is allowed',
			{accepted: false, problems: [{path: '', found: 'x', allowed: ''}]},
			'a problem says where, what was found and what is allowed',
		],
		['one of the reader itself', {accepted: true, broken: 'it is the same: 1, 2'}, 'it is the same'],
		['an example that is rejected', {accepted: false}, 'an example is accepted'],
	])('%s', async (_, answer, promise) => {
		expect(
			(
				await found(
					reader(() => answer),
					1,
				)
			).map(finding => finding.promise),
		).toContain(promise);
	});
});

test('a text is shortened for as long as it does the same', async () => {
	expect(await minimized('xxaxxbxx', async text => /a.*b/.test(text))).toBe('ab');
});
