import {mkdtempSync, readFileSync, rmSync, writeFileSync} from 'node:fs';
import {tmpdir} from 'node:os';
import {join} from 'node:path';
import {afterAll, afterEach, beforeAll, beforeEach, describe, expect, test} from 'vitest';
import {answer} from '../../source/commands/main.ts';
import type {Surroundings} from '../../source/commands/surroundings.ts';
import {planFor} from '../../source/planning/plan.ts';
import {candidateFor} from '../../source/practice/learn/learn.ts';
import {csvOf} from '../practice/csv.ts';
import {demoDocuments, subjectOf} from '../practice/learn/subject.ts';
import {generateLog} from '../practice/log-generator.ts';

const shipped = new URL('../../tracks/', import.meta.url);
let place = '';
let home = '';
let around: Surroundings;
const log = () => join(place, 'run.csv');

beforeAll(() => {
	place = mkdtempSync(join(tmpdir(), 'droprack-log-'));
	const subject = subjectOf(demoDocuments());
	const plan = planFor(subject.car, subject.track);
	const mounted = candidateFor(subject.car, {driving: 34, driven: 35}, 'C');
	if (!plan.ok || !mounted.ok) throw new Error('the demo has no plan');
	writeFileSync(log(), csvOf(generateLog({seed: 4, plan: plan.value, mounted: mounted.value, driving: {laps: 8}}).run));
});
afterAll(() => rmSync(place, {recursive: true}));

beforeEach(() => {
	home = mkdtempSync(join(tmpdir(), 'droprack-'));
	around = {
		shipped,
		environment: {DROPRACK_HOME: join(home, 'store')},
		now: new Date('2026-05-31T18:00:00Z'),
		columns: 80,
		color: false,
		standardInput: async function* () {
			yield readFileSync(new URL('tarrowdale.json', shipped));
		},
	};
});
afterEach(() => rmSync(home, {recursive: true}));

const learn = (...words: string[]) => answer(['learn', ...words], around);
const json = async (...words: string[]) => JSON.parse((await learn(...words, '--json')).out);
const with3435 = ['--pair', '34/35', '--gearbox', 'C'];
/** The demo documents as files of one's own. */
const files = () => {
	const [track, car] = [join(home, 'friday.json'), join(home, 'ours.json')];
	writeFileSync(track, readFileSync(new URL('tarrowdale.json', shipped)));
	writeFileSync(car, readFileSync(new URL('cars/demo.json', shipped)));
	return {track, car, ofTrack: readFileSync(track, 'utf8'), ofCar: readFileSync(car, 'utf8')};
};

describe('by hand', () => {
	test('one number says what is held, how the model then agrees, and what becomes of the ranking', async () => {
		const {status, out, err} = await learn(
			'tarrowdale',
			'--seen',
			'Back 8650 rpm gear 5',
			'--hold',
			'speed',
			...with3435,
		);
		expect({status, err}).toEqual({status: 0, err: ''});
		expect(out).toMatch(/^Redpoll 3 · engine Sedge open · 2026-05-31 · /);
		expect(out).toMatch(/learned from 1 number seen by hand, with\s+34\/35\s+C/);
		expect(out).toMatch(/Held: the model's speed/);
		expect(out).toMatch(/Back .*8650 +-113 +0\n/);
		expect(out).toMatch(/First was 34\/35 C, now 35\/33 \w: 2\d\d rpm less at the end of Front/);
		expect(out).toMatch(/rollout +rollout left +87\.3 in +86\.\d\d in ± 0\.\d\d? in/);
		expect(out).toMatch(/Nothing is written yet/);
	});

	test('each further number narrows it', async () => {
		const numbers = ['Back 8420', 'Front 8700', 'Back 8430'].map(text => ['--seen', text]);
		const errors = [];
		for (const count of [1, 2, 3]) {
			errors.push((await json('tarrowdale', ...numbers.slice(0, count).flat(), ...with3435)).drag.se);
		}
		expect(errors.toSorted((a, b) => b - a)).toEqual(errors);
	});

	test('nothing is written before it is accepted', async () => {
		const {track, ofTrack} = files();
		await learn(track, '--seen', 'Back 8420', ...with3435);
		expect(readFileSync(track, 'utf8')).toBe(ofTrack);
	});

	test('without a number the measured speeds of the track are learned from', async () => {
		expect(await json('tarrowdale')).toMatchObject({source: 'measured', from: '2 measured straights of the track'});
		const {status, err} = await learn('ostrand-flats', '--seen', 'Bakc 8000');
		expect(status).toBe(2);
		expect(err).toMatch(/--seen "Bakc 8000": found "Bakc"; allowed a straight of this track.*Did you mean "Back"/);
	});
});

describe('from a log', () => {
	test('shows what was found, fitted, compared and what would change, with two pictures', async () => {
		const {status, out} = await learn(log(), 'tarrowdale', ...with3435);
		expect(status).toBe(0);
		expect(out).toMatch(/learned from practice, 8 laps, with 34\/35 C/);
		expect(out).toMatch(/8 good laps; not used: 1 out/);
		expect(out).toMatch(/The log fits 34\/35 set C, as installed/);
		expect(out).toMatch(/Growth at 100 mph 1\.\d\d %, known to 0\.\d\d %/);
		expect(out).toMatch(/Drag area \+[56]\.\d %, known to 0\.\d %; power was held/);
		expect(out).toMatch(/Front .* 0\.0 +\d{4} +\+2\d\d +[+-]?\d/);
		expect(out).toMatch(/samples at full throttle[\s\S]*Speed along lap \d/);
		expect(out.split('\n').every(line => line.length <= 80)).toBe(true);
		expect((await learn(log(), 'tarrowdale', '--ascii', ...with3435)).out).toMatch(/^[\x20-\x7e\n]+$/);
	});

	test('for programs is SI, with standard errors', async () => {
		const told = await json(log(), 'tarrowdale', ...with3435);
		expect(told).toMatchObject({
			track: 'Tarrowdale',
			car: 'Redpoll 3',
			source: 'log',
			pair: '34/35',
			gearbox: 'C',
			accepted: [],
			log: {mounted: {verdict: 'asInstalled'}, lapsFrom: 'column'},
		});
		expect(told.drag.value).toBeCloseTo(1.06, 1);
		expect(told.circumference.rolloutM.se).toBeLessThan(0.005);
		expect(told.straights.map(({name}: {name: string}) => name)).toEqual(['Front', 'Back']);
		expect(told.effect.words).toMatch(/first/i);
	});

	test('nothing is accepted while the log contradicts what is installed, until somebody says what was mounted', async () => {
		const {status, err} = await learn(log(), 'tarrowdale', '--accept', 'all');
		expect(status).toBe(2);
		expect(err).toMatch(/nothing is accepted before it is clear what was in the car/);
		expect((await learn(log(), 'tarrowdale', '--accept', 'all', ...with3435)).status).toBe(0);
	});

	test('remembers the columns by the car', async () => {
		const other = join(home, 'other.csv');
		writeFileSync(other, readFileSync(log(), 'utf8').replace('Speed', 'Wheel A').replace('Engine RPM', 'Crank'));
		const refused = await learn(other, 'tarrowdale', ...with3435);
		expect(refused.status).toBe(2);
		expect(refused.err).toMatch(/--column/);
		const columns = ['--column', 'speed=Wheel A', '--column', 'rpm=Crank'];
		expect((await learn(other, 'tarrowdale', ...columns, ...with3435)).status).toBe(0);
		expect((await learn(other, 'tarrowdale', ...with3435)).status).toBe(0);
	});

	test('that is no log is refused', async () => {
		const {status, err} = await learn(new URL('tarrowdale.json', shipped).pathname, 'tarrowdale');
		expect(status).toBe(2);
		expect(err).toMatch(/tarrowdale\.json/);
		expect((await learn(join(home, 'none.csv'), 'tarrowdale')).err).toMatch(/there is no such file/);
	});
});

describe('accepting and taking back', () => {
	test('in files leaves the rest as written, and goes back to it', async () => {
		const {track, car, ofTrack, ofCar} = files();
		const all = await learn(log(), track, '--car', car, '--accept', 'all', ...with3435);
		expect(all.status).toBe(0);
		expect(all.err).toMatch(/ours\.json is changed\.\n.*friday\.json is changed\.\n.*history of Tarrowdale/);
		const written = readFileSync(track, 'utf8');
		expect(written.startsWith(ofTrack.slice(0, ofTrack.indexOf('\t"straights"')))).toBe(true);
		expect(JSON.parse(written).learned[0]).toMatchObject({field: 'car.tires.left', from: 'practice, 8 laps'});
		expect(readFileSync(car, 'utf8')).toMatch(/"growth": "1\.\d+ % ± 0\.\d+ %"/);
		const back = await learn(track, '--car', car, '--take-back', 'all');
		expect(back.status).toBe(0);
		expect(back.out).toMatch(/tires\.growth: .* is 0\.9 % again/);
		expect(readFileSync(track, 'utf8')).toBe(ofTrack);
		expect(readFileSync(car, 'utf8')).toBe(ofCar);
	});

	test('of a shipped track makes a copy of one’s own, whose ranking follows', async () => {
		const {status, out, err} = await learn('tarrowdale', '--seen', 'Back 8420', '--accept', 'drag', ...with3435);
		expect(status).toBe(0);
		expect(err).toMatch(/Tarrowdale is saved\. The shipped track stays as it is; yours is used from now on\./);
		expect(out).toMatch(/Accepted\n[\s\S]*drag area[\s\S]*Not accepted\n[\s\S]*measured:Back/);
		const show = async () => JSON.parse((await answer(['show', 'tarrowdale'], around)).out);
		expect((await show()).car).toEqual({dragArea: expect.stringMatching(/^1\.00\d m\^2 ± /)});
		const {entries} = JSON.parse((await answer(['history', 'tarrowdale', '--json'], around)).out);
		expect(entries[0]).toMatchObject({session: 'practice', pair: '34/35', highestRpm: 8420, at: 'Back end'});
		expect(entries[0].remark).toMatch(/^learned from 1 number seen by hand: drag area .* \(was 0\.9 m\^2\)$/);
		expect((await learn('tarrowdale', '--take-back', 'drag')).status).toBe(0);
		expect((await show()).car).toBeUndefined();
	});

	test.each([
		[
			'a name that is none',
			['tarrowdale', '--seen', 'Back 8420', '--accept', 'grip'],
			/--accept knows no grip\. There is: all, drag/,
		],
		['taking back what was not learned', ['tarrowdale', '--take-back', 'all'], /nothing learned is in Tarrowdale/],
		['standard input, written back', ['-', '--seen', 'Back 8420', '--accept', 'all'], /came from standard input/],
		['a log and a number at once', ['x.csv', 'tarrowdale', '--seen', 'Back 8420'], /one at a time/],
		['holding without a number', ['tarrowdale', '--hold', 'speed'], /--hold goes with --seen/],
		[
			'holding something else',
			['tarrowdale', '--seen', 'Back 8420', '--hold', 'drag'],
			/--hold is speed or circumference/,
		],
		['no track', [], /which TRACK\?/],
		['a pair that is not on the rack', ['tarrowdale', '--seen', 'Back 8420', '--pair', '12/13'], /12\/13/],
	])('%s is refused', async (_, words, message) => {
		const {status, out, err} = await learn(...words);
		expect({status, out}).toEqual({status: 2, out: ''});
		expect(err).toMatch(message);
	});
});

describe('grip', () => {
	test('is learned where it is asked for', async () => {
		const [without, asked] = [
			await json(log(), 'tarrowdale', ...with3435),
			await json(log(), 'tarrowdale', ...with3435, '--grip'),
		];
		expect(without.grip).toBeNull();
		expect(asked.grip).toBeNull();
		const {out} = await learn(log(), 'tarrowdale', ...with3435, '--grip');
		expect(out).toContain('No exit is held by grip: the log says nothing about how much there is.');
	});

	test('goes with a log', async () => {
		const {status, err} = await learn('tarrowdale', '--grip');
		expect([status, err]).toEqual([2, expect.stringContaining('--grip goes with a log.')]);
	});
});
