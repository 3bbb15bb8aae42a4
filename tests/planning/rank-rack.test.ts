import fc from 'fast-check';
import {describe, expect, test} from 'vitest';
import type {Car} from '../../source/drivetrain/car.ts';
import {pairRatio} from '../../source/drivetrain/gear-pair.ts';
import type {Track} from '../../source/drivetrain/track.ts';
import {rankRack} from '../../source/planning/rank-rack.ts';
import type {Ranking, Row} from '../../source/planning/results.ts';
import {runPair} from '../../source/planning/run-pair.ts';
import {runs} from '../runs.ts';
import {add, car, engine, foot, mph, pair, rackPair, scale, situation, straight, track} from './build.ts';

function ranked(aCar: Car = car(), aTrack: Track = track(), only?: string): Ranking {
	const ranking = rankRack(aCar, aTrack, {situation: only});
	if (!ranking.ok) throw new Error(JSON.stringify(ranking.faults));
	return ranking.value;
}

const names = ({rows}: Ranking) => rows.map(row => `${row.pair} ${row.gearbox}`);
const rowOf = ({rows}: Ranking, pairName: string, gearbox = 'A'): Row =>
	rows.find(row => row.pair === pairName && row.gearbox === gearbox)!;

describe('a ranking', () => {
	const ranking = ranked();

	test('has a row for every pair and set, by verdict first and then by time', () => {
		expect(ranking.rows).toHaveLength(10);
		const failed = ranking.rows.map(({verdict}) => verdict === 'fail');
		expect(failed).toEqual([...failed].sort());
		const times = ranking.rows.filter(({verdict}) => verdict !== 'fail').map(({fastestS}) => fastestS!);
		expect(times).toEqual([...times].sort((a, b) => a - b));
	});

	test('gives each row the overall ratios of its pair: 2.9·(38/33)·3.25 = 10.8530', () => {
		const row = rowOf(ranking, '33/38');
		expect(row.overall[0]).toBeCloseTo(10.8530303, 6);
		expect(row.pairRatio).toBeCloseTo(1.1515152, 6);
	});

	test('turns at the minimum without slip, in the exit’s gear', () => {
		const {exitRpm, exitSpeedMps, minimumRpm, minimumSpeedMps} = rowOf(ranking, '33/38').situations[0]!.straights[0]!;
		const growth = (speedMps: number) => 1 + 0.008 * (speedMps / 44.704) ** 2;
		const perSpeed = (exitRpm * growth(exitSpeedMps)) / (1.015 * exitSpeedMps);
		expect(minimumRpm).toBeCloseTo((perSpeed * minimumSpeedMps!) / growth(minimumSpeedMps!), 6);
	});

	test('adds up: a situation is the sum of its straights, a row the mean of its situations', () => {
		for (const {situations, timeS, fastestS} of ranking.rows) {
			for (const {straights, fastestS: sum} of situations) {
				expect(sum).toBeCloseTo(
					straights.reduce((total, one) => total + one.fastestS!, 0),
					12,
				);
			}
			expect(timeS).toBeCloseTo(situations.reduce((total, one) => total + one.timeS!, 0) / 3, 12);
			expect(timeS! - fastestS!).toBeGreaterThanOrEqual(0);
		}
	});

	test('gains against the installed pair and set, which gains nothing on itself', () => {
		const installed = rowOf(ranking, '33/38');
		expect([installed.installed, installed.gainS]).toEqual([true, 0]);
		const first = ranking.rows[0]!;
		expect(first.gainS).toBe(installed.fastestS! - first.fastestS!);
		expect(ranked(car({installed: undefined})).rows.every(({gainS}) => gainS === null)).toBe(true);
	});

	test('says what holds for all: the build, its limit and band, the day', () => {
		expect(ranking.setting).toMatchObject({engine: 'Open', rpmLimit: 9200, limitFrom: 'engine', anchored: false});
		expect(ranking.setting.correction).toBeCloseTo(1, 12);
		// 990 hPa dry at 25 °C: 99000/(287.058·298.15)
		expect(ranking.setting.airDensityKgM3).toBeCloseTo(1.15673, 5);
		expect(ranked(car(), track({rules: {...track().rules, rpmLimit: 8900}})).setting).toMatchObject({
			rpmLimit: 8900,
			limitFrom: 'track',
		});
	});

	test('has the checks in their order, one entry each, and the worst of them as verdict', () => {
		const order =
			'limit limiter band afterShift settle pitRoad restart downshift permitted housing stock mileage'.split(' ');
		for (const {checks, verdict} of ranking.rows) {
			const places = checks.map(({check}) => order.indexOf(check));
			expect(places).toEqual([...new Set(places)].sort((a, b) => a - b));
			const worst = ['fail', 'near', 'pass'].find(one => checks.some(check => check.verdict === one));
			expect(verdict).toBe(worst);
		}
	});

	test('runs, times and checks one situation alone where it is named', () => {
		const tow = ranked(car(), track(), 'In the tow');
		const whole = rowOf(ranking, '33/38');
		const row = rowOf(tow, '33/38');
		expect(row.situations.map(({name}) => name)).toEqual(['In the tow']);
		expect(row.fastestS).toBe(whole.situations[1]!.fastestS);
		expect(tow.rows.every(({checks}) => checks.every(({situation}) => ['', 'In the tow'].includes(situation)))).toBe(
			true,
		);
	});

	test('ranks both directions of a pair where the gears may be put on either shaft, each once', () => {
		const rack = {...car().rack, eitherShaft: true, pairs: [rackPair(33, 38), rackPair(36, 36), rackPair(38, 33)]};
		const both = ranked(car({rack, gearboxes: [car().gearboxes[0]!]}));
		expect(both.rows.map(row => row.pair).sort()).toEqual(['33/38', '36/36', '38/33']);
		const one = {...rack, pairs: [rackPair(33, 38)]};
		expect(
			ranked(car({rack: one, gearboxes: [car().gearboxes[0]!]}))
				.rows.map(row => row.pair)
				.sort(),
		).toEqual(['33/38', '38/33']);
	});

	test('leaves straights without length out of its times, and has none where no straight has one', () => {
		const held = straight('Held', {lengthM: undefined, exitMps: 80 * mph, endMps: 100 * mph});
		const mixed = ranked(car(), track({straights: [...track().straights, held]}));
		const result = rowOf(mixed, '33/38').situations[0]!.straights[2]!;
		expect(result).toMatchObject({timeS: null, fastestS: null, reachRpm: null, shifts: [], endSpeedMps: 100 * mph});
		expect(rowOf(mixed, '33/38').fastestS).toBe(rowOf(ranking, '33/38').fastestS);
		const only = ranked(car(), track({straights: [held]}));
		expect(only.rows.every(({timeS, fastestS}) => timeS === null && fastestS === null)).toBe(true);
		expect(only.rows[0]!.reason).toMatch(/^Widest margin of \d+ that fail no check, without times: highest RPM /);
	});

	test('puts a row whose exit is above every gear’s limit last, with its times null', () => {
		const rack = {...car().rack, pairs: [rackPair(33, 38), rackPair(20, 50)]};
		const last = ranked(car({rack, gearboxes: [car().gearboxes[0]!]}), track({straights: fast})).rows.at(-1)!;
		expect(last).toMatchObject({pair: '20/50', verdict: 'fail', timeS: null, fastestS: null, gainS: null});
		expect(last.checks[0]).toMatchObject({check: 'limit', verdict: 'fail', at: 'Front exit'});
		expect(last.remarks).toContain('Front: exit speed above the limit in every allowed gear');
	});

	test('fails a row that stops before the end, while another does not', () => {
		const rack = {...car().rack, pairs: [rackPair(20, 50), rackPair(44, 20)]};
		const steep = straight('Hill', {exitMps: 20 * mph, grade: 0.42, lengthM: 400 * foot});
		const rows = ranked(
			car({rack, installed: undefined, grip: 3, gearboxes: [{name: 'A', ratios: [1.6, 1]}]}),
			track({straights: [steep], restart: undefined, situations: [situation('Base')]}),
		).rows;
		expect(rows.map(({verdict, pair}) => [pair, verdict])).toEqual([
			['20/50', expect.not.stringMatching('fail')],
			['44/20', 'fail'],
		]);
		expect(rows[1]).toMatchObject({timeS: null, reason: 'Hill exit: stops before the end.'});
	});

	test('fails the rows of a gearbox that has none of the allowed gears', () => {
		const gearboxes = [...car().gearboxes, {name: 'C', ratios: [2, 1.5, 1]}];
		const high = ranked(car({gearboxes}), track({gears: {lowest: 4, highest: 5}}));
		expect(rowOf(high, '33/38', 'C')).toMatchObject({
			verdict: 'fail',
			timeS: null,
			reason: 'Not permitted: gearbox C has none of the gears allowed on Front.',
		});
		expect(rowOf(high, '33/38', 'A').timeS).not.toBeNull();
	});
});

const fast = [straight('Front', {exitMps: 115 * mph})];

describe('the order', () => {
	test('does not depend on the order of the rack, the gearboxes or the engines', () => {
		const whole = names(ranked());
		fc.assert(
			fc.property(
				fc.shuffledSubarray(car().rack.pairs as ReturnType<typeof rackPair>[], {minLength: 5}),
				fc.shuffledSubarray(car().gearboxes as {name: string; ratios: number[]}[], {minLength: 2}),
				(pairs, gearboxes) => {
					const shuffled = ranked(car({rack: {...car().rack, pairs}, gearboxes}));
					expect(names(shuffled)).toEqual(whole);
					expect(shuffled.rows).toEqual(ranked().rows);
				},
			),
			{numRuns: runs(10, 200)},
		);
	});

	test('breaks equal times and margins by set and then by teeth', () => {
		const rack = {...car().rack, pairs: [rackPair(20, 24), rackPair(40, 48), rackPair(30, 36)]};
		const gearboxes = ['b', 'B', 'a'].map(name => ({name, ratios: car().gearboxes[0]!.ratios}));
		expect(names(ranked(car({rack, gearboxes, installed: undefined})))).toEqual([
			...['20/24 B', '30/36 B', '40/48 B'],
			...['20/24 a', '30/36 a', '40/48 a'],
			...['20/24 b', '30/36 b', '40/48 b'],
		]);
	});
});

describe('share', () => {
	const withShares = (base: number, tow: number) =>
		track({situations: [situation('Base', {share: base}), situation('Tow', {drag: scale(0.8), share: tow})]});

	test('weighs the mean, from one situation to the other', () => {
		const [all, mean, none] = [withShares(1, 0), withShares(3, 1), withShares(0, 1)].map(t =>
			rowOf(ranked(car(), t), '33/38'),
		);
		const [base, tow] = mean!.situations;
		expect(all!.timeS).toBeCloseTo(base!.timeS!, 12);
		expect(none!.timeS).toBeCloseTo(tow!.timeS!, 12);
		expect(mean!.timeS).toBeCloseTo((3 * base!.timeS! + tow!.timeS!) / 4, 12);
	});

	test('of 0 takes a situation out of the mean, never out of the checks', () => {
		const changed = [situation('Base'), situation('Slow', {share: 0, exit: add(-25 * mph)})];
		const row = rowOf(ranked(car(), track({straights: [straight('Front')], situations: changed})), '31/40');
		expect(row.timeS).toBeCloseTo(row.situations[0]!.timeS!, 12);
		expect(row.checks.some(({situation}) => situation === 'Slow')).toBe(true);
	});

	test('of 0 everywhere leaves the base', () => {
		const row = rowOf(ranked(car(), withShares(0, 0)), '33/38');
		expect(row.timeS).toBeCloseTo(row.situations[0]!.timeS!, 12);
	});
});

describe('properties', () => {
	const teeth = fc.integer({min: 28, max: 42});

	test('a shorter pair turns the engine faster at every held speed in the same gear', () => {
		fc.assert(
			fc.property(teeth, teeth, teeth, teeth, (a, b, c, d) => {
				const [one, other] = [rackPair(a, b), rackPair(c, d)];
				fc.pre(pairRatio(one) > pairRatio(other));
				const gears = {lowest: 5, highest: 5};
				const held = straight('Held', {
					lengthM: undefined,
					exitMps: 80 * mph,
					endMps: 90 * mph,
					minimumMps: 70 * mph,
					gears,
				});
				const both = ranked(
					car({rack: {...car().rack, pairs: [one, other]}, installed: undefined}),
					track({straights: [held]}),
				);
				const [short, tall] = [one, other].map(({driving, driven}) => rowOf(both, `${driving}/${driven}`));
				short!.situations.forEach((situation, i) => {
					const [mine, its] = [situation.straights[0]!, tall!.situations[i]!.straights[0]!];
					expect(mine.exitRpm).toBeGreaterThan(its.exitRpm);
					expect(mine.endRpm).toBeGreaterThan(its.endRpm);
					expect(mine.minimumRpm).toBeGreaterThan(its.minimumRpm!);
				});
			}),
			{numRuns: runs(15, 500)},
		);
	});

	test('less drag never makes the fastest run slower', () => {
		fc.assert(
			fc.property(fc.double({min: 0.7, max: 0.99, noNaN: true}), factor => {
				const tow = ranked(car(), track({situations: [situation('Base'), situation('Tow', {drag: scale(factor)})]}));
				for (const {situations} of tow.rows)
					expect(situations[1]!.fastestS).toBeLessThan(situations[0]!.fastestS! + 1e-9);
			}),
			{numRuns: runs(5, 100)},
		);
	});
});

describe('runPair', () => {
	test('is the row of the ranking, the installed one unless another is chosen', () => {
		const ranking = ranked();
		const [installed, chosen] = [runPair(car(), track()), runPair(car(), track(), {pair: pair(31, 40), gearbox: 'B'})];
		expect(installed).toMatchObject({ok: true, value: {row: rowOf(ranking, '33/38', 'A')}});
		expect(chosen).toMatchObject({ok: true, value: {row: rowOf(ranking, '31/40', 'B')}});
	});

	test('is the first on the rack where nothing is installed', () => {
		const run = runPair(car({installed: undefined}), track());
		expect(run).toMatchObject({ok: true, value: {row: {pair: '33/38', gearbox: 'A'}}});
	});

	test('does not know a pair that is not on the rack, nor another gearbox', () => {
		expect(runPair(car(), track(), {pair: pair(10, 11), gearbox: 'Z'})).toEqual({
			ok: false,
			faults: [
				{
					document: 'command',
					path: 'pair',
					found: '"10/11"',
					allowed: 'a pair on the rack: 34/37, 33/38, 35/36, 32/39, 31/40',
				},
				{document: 'command', path: 'gearbox', found: '"Z"', allowed: 'one of A, B'},
			],
		});
	});
});

test('another engine is taken at another type of track', () => {
	const engines = [engine(), engine({name: 'Restricted', for: ['superspeedway'], rpmLimit: 8600})];
	expect(ranked(car({engines}), track({type: 'superspeedway'})).setting).toMatchObject({
		engine: 'Restricted',
		rpmLimit: 8600,
	});
});
