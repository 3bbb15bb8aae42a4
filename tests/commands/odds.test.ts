import {readFileSync, writeFileSync} from 'node:fs';
import {join} from 'node:path';
import {afterAll, beforeAll, expect, test} from 'vitest';
import {readCommandLine} from '../../source/commands/arguments.ts';
import {fixture, makeProgram} from './program.ts';

let program: ReturnType<typeof makeProgram>;
beforeAll(() => {
	program = makeProgram();
});
afterAll(() => program.remove());

const ask = (...words: string[]) =>
	program.run([words[0]!, fixture('oval.json'), '--car', fixture('car.json'), ...words.slice(1)]);

test('odds says chances, what is decided, what to measure, one tooth and what is assumed', async () => {
	const {status, out, err} = await ask('odds');
	expect({status, err}).toEqual({status: 0, err: ''});
	expect(out).toMatch(/^Fixture Car · /);
	expect(out).toMatch(/# +pair +set +over limit +fastest/);
	expect(out).toMatch(/is most often the fastest that is allowed/);
	expect(out).toMatch(/One tooth: /);
	expect(out).toMatch(/- rollout ± 0\.15 % of it: /);
	expect(Math.max(...out.split('\n').map(line => line.length))).toBeLessThanOrEqual(80);
});

test('the same seed gives the same JSON, another seed other draws', async () => {
	const [one, again, other] = await Promise.all(['7', '7', '8'].map(seed => ask('odds', '--json', '--seed', seed)));
	expect(one!.out).toBe(again!.out);
	expect(one!.out).not.toBe(other!.out);
	const {odds, matters, tooth} = JSON.parse(one!.out);
	expect(odds).toMatchObject({seed: 7, risk: null, isComplete: true, draws: expect.any(Number)});
	expect(odds.rows[0]).toMatchObject({
		over: {value: expect.any(Number), error: expect.any(Number)},
		draws: expect.any(Number),
	});
	expect(matters.margin.length).toBe(odds.inputs.length);
	expect(tooth.of.row).toBe(odds.decision.row);
});

test('a pair asked for is the one whose tooth is told', async () => {
	const {out} = await ask('odds', '--json', '--pair', '36/36', '--gearbox', 'A');
	expect(JSON.parse(out).tooth.of.row).toBe('36/36 A');
});

test('rank puts first the fastest row whose chance of passing the limit is within the risk', async () => {
	const {status, out} = await ask('rank', '--risk', '5%', '--json');
	const {rows, odds} = JSON.parse(out);
	expect(status).toBe(0);
	expect(odds.risk).toBe(0.05);
	expect(`${rows[0].pair} ${rows[0].gearbox}`).toBe(odds.decision.row);
	expect(rows[0].reason).toMatch(/^Chance of passing the limit \d/);
	const text = (await ask('rank', '--risk', '5%')).out;
	expect(text).toMatch(/over limit/);
});

test('what a document states takes the place of the default', async () => {
	const oval = JSON.parse(readFileSync(fixture('oval.json'), 'utf8'));
	const file = join(program.place, 'stated.json');
	writeFileSync(
		file,
		JSON.stringify({...oval, straights: oval.straights.map((one: object) => ({...one, exit: '88 mph ± 3 mph'}))}),
	);
	const {out} = await program.run(['odds', file, '--car', fixture('car.json')]);
	expect(out).toMatch(/exit of .* ± 3\.0 mph: as stated/);
});

test.each([
	['5', /--risk is a percentage from 0% to below 100%, such as 5%, found 5\./],
	['100%', /found 100%/],
	['-1%', /found -1%/],
])('a risk of %s is refused', (risk, message) => {
	const line = readCommandLine(['rank', 'x', `--risk=${risk}`]);
	expect(line.kind === 'bad' ? line.message : line.kind).toMatch(message);
});

test('a seed is a whole number', () => {
	const line = readCommandLine(['odds', 'x', '--seed', '1.5']);
	expect(line.kind === 'bad' ? line.message : line.kind).toMatch(/--seed is a whole number/);
});
