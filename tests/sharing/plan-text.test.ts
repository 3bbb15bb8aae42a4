import fc from 'fast-check';
import {describe, expect, test} from 'vitest';
import {checkPlan} from '../../source/sharing/check-plan.ts';
import {printPlan} from '../../source/sharing/print-plan.ts';
import {readPlan} from '../../source/sharing/read-plan.ts';
import {runs} from '../runs.ts';
import {arbitraryPlan} from './arbitrary-plan.ts';
import {manglings, rewrap} from './mangle.ts';
import {samplePlan} from './sample.ts';

const long = {timeout: 900_000};
const plan = await samplePlan();
const text = printPlan(plan);
const planIn = async (message: string) => {
	const reading = await readPlan(message);
	return reading.ok ? reading.plan : reading.problems;
};
const problemsOf = async (message: string) => {
	const reading = await readPlan(message);
	return reading.ok ? [] : reading.problems;
};

describe('a plan as text', () => {
	test('starts with the choice, has at most 60 columns and ends in its check code', () => {
		const lines = text.trimEnd().split('\n');
		expect(lines[0]).toBe('DROPRACK PLAN 1: date 2025-06-14T18:05:00-04:00, pair 34/37,');
		expect(Math.max(...lines.map(line => line.length))).toBeLessThanOrEqual(60);
		expect(lines.at(-1)).toMatch(/^Check: 32 entries, code [0-9a-f]{8}$/);
		expect(text).toMatch(/^[\x20-\x7e\n]+$/);
	});

	test('reads back as the plan, with car and track ready to run', async () => {
		const reading = await readPlan(text);
		expect(reading).toMatchObject({ok: true, plan, track: {name: 'Pine Hollow'}, car: {name: 'Test car 7'}});
	});

	test.each(Object.keys(manglings))('survives %s', async name => {
		expect(await planIn(manglings[name]!(text))).toStrictEqual(plan);
	});

	test('survives breaking at every width from 40 to 80', async () => {
		for (let width = 40; width <= 80; width++) expect(await planIn(rewrap(text, width))).toStrictEqual(plan);
	});

	test('read(print(plan)) is the plan, whatever it holds and whatever a message does to it', long, async () => {
		await fc.assert(
			fc.asyncProperty(arbitraryPlan, fc.constantFrom('', ...Object.keys(manglings)), async (any, name) => {
				expect(await checkPlan(any as unknown as Record<string, unknown>)).toMatchObject({ok: true});
				const printed = printPlan(any);
				expect(printed).toMatch(/^[\x20-\x7e\n]+$/);
				expect(Math.max(...printed.split('\n').map(line => line.length))).toBeLessThanOrEqual(60);
				expect(await planIn((manglings[name] ?? String)(printed))).toStrictEqual(any);
			}),
			{numRuns: runs(300, 20_000)},
		);
	});
});

describe('a damaged plan', () => {
	test('names the line and the entry of a changed digit', async () => {
		const line = text.split('\n').findIndex(one => one.startsWith('Straight Dogleg')) + 1;
		const problems = await problemsOf(text.replace('exit 97 mph', 'exit 79 mph'));
		expect(problems).toMatchObject([{path: 'Straight Dogleg', line, allowed: 'the entry as it was sent'}]);
	});

	test('names every damaged entry', async () => {
		const problems = await problemsOf(text.replace('8 mph', '3 mph').replace('2.9; 2.04', '2.8; 2.04'));
		expect(problems.map(({path}) => path)).toEqual(['Wind', 'Gearbox A']);
	});

	test('tells that an entry is missing, and that the end is', async () => {
		const without = text.replace(/Straight Dogleg[^\]]*\]\n/, '');
		expect(await problemsOf(without)).toMatchObject([{path: 'Check', found: '31 entries'}]);
		expect(await problemsOf(text.slice(0, text.indexOf('Check')))).toMatchObject([
			{allowed: expect.stringContaining('Check:')},
		]);
		expect(await problemsOf('Hi Sam, nothing here')).toMatchObject([{found: 'no plan'}]);
	});

	test('is refused when two entries are exchanged', async () => {
		const [tow] = /Situation In the tow.*\n/.exec(text)!;
		const [run] = /Situation Long run.*\n/.exec(text)!;
		expect(await problemsOf(text.replace(tow + run, run + tow))).toMatchObject([{path: 'Check'}]);
	});

	test('of a newer version says so', async () => {
		expect(await problemsOf(text.replace('PLAN 1', 'PLAN 2'))).toMatchObject([{found: 'plan version 2', line: 1}]);
	});

	test('with one changed character is refused, or is the same plan', long, async () => {
		const printed = fc.constantFrom(...'0123456789abcXYZ-+./, ;:{}[]%^>\n\t\u00e9\u2013\u00bd\u200b\u0000\ud83d');
		await fc.assert(
			fc.asyncProperty(fc.nat(text.length - 1), printed, fc.boolean(), async (at, character, insert) => {
				const changed = text.slice(0, at) + character + text.slice(insert ? at : at + 1);
				const reading = await readPlan(changed);
				if (reading.ok) expect(reading.plan).toStrictEqual(plan);
			}),
			{numRuns: runs(1000, 100_000), seed: 4},
		);
	});

	test('never stands in a field: a changed letter or digit of a value is refused', long, async () => {
		const places = [...text].flatMap((character, at) => (/[A-Za-z0-9]/.test(character) ? [at] : []));
		const others = [...'0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz'];
		const last = text.indexOf('Check');
		await fc.assert(
			fc.asyncProperty(
				fc.constantFrom(...places.filter(at => at < last)),
				fc.constantFrom(...others),
				async (at, character) => {
					fc.pre(text[at] !== character);
					expect((await readPlan(text.slice(0, at) + character + text.slice(at + 1))).ok).toBe(false);
				},
			),
			{numRuns: runs(1000, 100_000), seed: 5},
		);
	});
});
