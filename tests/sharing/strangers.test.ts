import {describe, expect, test} from 'vitest';
import {describeProblems} from '../../source/documents/read.ts';
import {checkCode, entryCheck} from '../../source/sharing/check-code.ts';
import {densePlan} from '../../source/sharing/dense.ts';
import {printPlan} from '../../source/sharing/print-plan.ts';
import {readShared} from '../../source/sharing/read-shared.ts';
import {shortForm} from '../../source/sharing/short-form.ts';
import {mutated} from '../fuzz/mutate.ts';
import {Random} from '../fuzz/random.ts';
import {plans} from '../fuzz/readers/plans.ts';
import {runs} from '../runs.ts';
import {samplePlan} from './sample.ts';

const plan = await samplePlan();
const text = printPlan(plan);

/** Entries as a stranger could make them, with checks that agree. */
const forged = (entries: readonly string[]) =>
	`${entries.map(entry => `${entry} [${entryCheck(entry)}]`).join('\n')}\nCheck: ${entries.length} entries, code ${checkCode(entries.join('\n'))}\n`;
const genuine = text
	.replace(/\s+/g, ' ')
	.split(/ \[...\] /)
	.slice(0, -1);
const withEntries = (change: (entries: string[]) => string[]) => forged(change([...genuine]));

const told = async (message: string) => {
	const reading = await readShared(message);
	return reading.ok ? '' : describeProblems('message', reading.problems);
};

const straights = (count: number) =>
	Array.from({length: count}, (_, i) => `Straight s${i}: exit 88 mph, length 650 ft`);
const hostile: Record<string, string> = {
	'10 MB of letters': 'a'.repeat(10_000_000),
	'10 MB of a plan': `DROPRACK PLAN 1: ${'a '.repeat(5_000_000)}`,
	'4 MB of brackets': `DROPRACK PLAN 1: ${'[x] '.repeat(990_000)}`,
	'4 MB of one word': `DROPRACK PLAN 1: ${'-'.repeat(3_990_000)}`,
	'4 MB of words cut at hyphens': `DROPRACK PLAN 1: ${'a-\n'.repeat(1_300_000)}`,
	'4 MB of wide letters': `DROPRACK PLAN 1: ${'\ufdfa'.repeat(1_000_000)}`,
	'100,000 straights in JSON': JSON.stringify({
		...plan,
		track: {...plan.track, straights: Array(100_000).fill({name: 'a', exit: '1 mph'})},
	}),
	'100,000 straights in text': withEntries(list => [...list.slice(0, 12), ...straights(100_000), ...list.slice(12)]),
	'2,900 straights in text': withEntries(list => [...list.slice(0, 12), ...straights(2900), ...list.slice(12)]),
	'a 400-digit number': withEntries(list =>
		list.map(entry => entry.replace('finalDrive 3.25', `finalDrive ${'9'.repeat(400)}`)),
	),
	'a 400-digit quantity': withEntries(list => list.map(entry => entry.replace('650 ft', `${'9'.repeat(400)} ft`))),
	'deep nesting in JSON': `${'{"a":'.repeat(100_000)}1${'}'.repeat(100_000)}`,
	'deep nesting in text': withEntries(list => [...list, `Margins: ${'a.'.repeat(50_000)}b 1`]),
	'a prototype in text': withEntries(list => [...list, 'Margins: __proto__.polluted 1']),
	'a constructor in text': withEntries(list => [...list, 'Margins: constructor.prototype.polluted 1']),
	'a prototype in JSON': JSON.stringify(plan).replace('"name":', '"__proto__":{"polluted":1},"name":'),
	'a packed bomb': densePlan({...plan, notes: 'x'.repeat(4_100_000)}),
	'4 MB of a short form': `DR1 ${'a: '.repeat(1_300_000)}`,
	'a second entry of one kind': withEntries(list => [...list, 'Tires: left 1 in, right 1 in']),
	'an unknown entry': withEntries(list => [...list, 'Payload: run rm -rf']),
	'controls in an entry': withEntries(list => [...list, 'Payload\u001b[2J\u202e: x']),
};

describe("strangers' text", () => {
	test.each(Object.keys(hostile))('%s ends in a short message within a second', async name => {
		const message = hostile[name]!;
		const {answer, tookMs} = await timed(message);
		expect(tookMs).toBeLessThan(1000);
		expect(answer).not.toBe('');
		expect(answer.length).toBeLessThan(40_000);
		expect(answer).not.toMatch(/[^\P{Cc}\n]|[\u202a-\u202e\u2066-\u2069]/u);
		expect(Object.hasOwn(Object.prototype, 'polluted')).toBe(false);
	});

	test('a forged entry with a right check still has to be a valid plan, and its line is named', async () => {
		const line = genuine.findIndex(entry => entry.startsWith('Wind')) + 1;
		const answer = await told(withEntries(list => list.map(entry => entry.replace('speed 8 mph', 'speed 8 lb'))));
		expect(answer).toContain(`message:${line}: track.wind.speed: found "8 lb"`);
	});

	test('200,000 mutations: no crash, none over 100 ms, no control character in what is said', {
		timeout: 1_800_000,
	}, async () => {
		const json = JSON.stringify(plan, null, 1);
		const originals = [text, text, json, densePlan(plan), shortForm(plan).line];
		const random = new Random(20_250_614);
		// Loads the library of rare units, once: that is not reading.
		await told(withEntries(list => list.map(entry => entry.replace('8 mph', '8 blots'))));
		let slowestMs = 0;
		for (let i = 0; i < runs(2000, 200_000); i++) {
			const message = mutated(originals[i % originals.length]!, plans, random, originals);
			const {answer, tookMs} = await timed(message);
			// A machine that was busy elsewhere is not the message's doing: what is slow is slow again.
			const againMs = tookMs < 100 ? tookMs : Math.min((await timed(message)).tookMs, (await timed(message)).tookMs);
			slowestMs = Math.max(slowestMs, againMs);
			if (/[^\P{Cc}\n]|[\u202a-\u202e\u2066-\u2069]/u.test(answer)) expect.fail(JSON.stringify({message, answer}));
		}
		expect(slowestMs).toBeLessThan(100);
	});
});

async function timed(message: string): Promise<{answer: string; tookMs: number}> {
	const started = performance.now();
	const answer = await told(message);
	return {answer, tookMs: performance.now() - started};
}
