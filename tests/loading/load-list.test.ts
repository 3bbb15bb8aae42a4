import fc from 'fast-check';
import {expect, test} from 'vitest';
import type {Car} from '../../source/drivetrain/car.ts';
import {pairName} from '../../source/drivetrain/gear-pair.ts';
import {loadList} from '../../source/loading/load-list.ts';
import type {RankedTrack} from '../../source/loading/load-needs.ts';
import type {LoadOptions} from '../../source/loading/load-results.ts';
import type {Check, Row} from '../../source/planning/results.ts';
import {row, setting} from '../commands/answers.ts';
import {car, rackPair} from '../planning/build.ts';
import {runs} from '../runs.ts';

const options: LoadOptions = {
	shorter: 1,
	taller: 1,
	withinS: 0.02,
	stepRatio: 0,
	gearbox: undefined,
	eachSet: false,
};

const check = (name: Check['check'], verdict: Check['verdict'], value: number | null = null): Check => ({
	check: name,
	verdict,
	value,
	bound: null,
	margin: null,
	at: '',
	situation: '',
});

const carWith = (teeth: readonly (readonly [number, number])[], change: Parameters<typeof rackPair>[2] = {}): Car =>
	car({rack: {toothSums: undefined, eitherShaft: false, pairs: teeth.map(pair => rackPair(...pair, change))}});

/** Seven pairs from tall to short, about 3 % apart. */
const teeth = [
	[37, 32],
	[36, 33],
	[35, 33],
	[35, 34],
	[34, 35],
	[33, 35],
	[33, 36],
] as const;
const rack = carWith(teeth);
const names = teeth.map(([driving, driven]) => pairName({driving, driven}));

/** A ranking in which the pairs have these laps in one set, in the order of the rack; a text is the check that fails. */
function ranked(name: string, laps: readonly (number | 'limit' | 'stock' | 'housing')[], gearbox = 'A'): RankedTrack {
	const rows = laps.map((lap, i): Row => {
		const [driving, driven] = teeth[i]!;
		const failing = typeof lap === 'string' ? [check(lap, 'fail')] : [];
		return row({
			pair: names[i]!,
			gearbox,
			pairRatio: driven / driving,
			fastestS: typeof lap === 'number' ? lap : 9.9,
			verdict: failing.length > 0 ? 'fail' : 'pass',
			checks: [check('limit', 'pass', 8000), ...failing],
		});
	});
	const order = ({verdict, fastestS}: Row) => (verdict === 'fail' ? 1000 : 0) + fastestS!;
	return {name, ranking: {setting, rows: rows.toSorted((a, b) => order(a) - order(b)), remarks: []}, raceM: undefined};
}

const pairsOf = (list: {pairs: readonly {pair: string}[]}) => list.pairs.map(({pair}) => pair);

test('one track has its best pair and a step each way', () => {
	const list = loadList(rack, [ranked('Oval', [10.3, 10.2, 10.1, 10, 10.1, 10.2, 10.3])], options);
	expect(pairsOf(list)).toEqual(['35/33', '35/34', '34/35']);
	expect(list.tracks[0]).toMatchObject({taller: ['35/33'], served: {pair: '35/34', lossS: 0}, shorter: ['34/35']});
	expect(list.pairs[1]!.reason).toBe('Best at Oval.');
	expect(list.pairs[0]!.reason).toBe('Taller step at Oval.');
});

test('steps can be set, none included', () => {
	const tracks = [ranked('Oval', [10.3, 10.2, 10.1, 10, 10.1, 10.2, 10.3])];
	expect(pairsOf(loadList(rack, tracks, {...options, shorter: 2, taller: 0}))).toEqual(['35/34', '34/35', '33/35']);
	expect(pairsOf(loadList(rack, tracks, {...options, shorter: 0, taller: 0}))).toEqual(['35/34']);
});

test('tracks share what they can: a pair level with the best stands for it where that saves one', () => {
	const one = ranked('One', [10.3, 10.2, 10.01, 10, 10.1, 10.2, 10.3]);
	const other = ranked('Other', [10.2, 10.1, 10, 10.1, 10.2, 10.3, 10.4]);
	const list = loadList(rack, [one, other], options);
	expect(pairsOf(list)).toEqual(['36/33', '35/33', '35/34']);
	expect(list.tracks.map(({served}) => served.lossS)).toEqual([expect.closeTo(0.01, 9), 0]);
	// Without the tolerance each has its very best.
	expect(pairsOf(loadList(rack, [one, other], {...options, withinS: 0}))).toEqual(['36/33', '35/33', '35/34', '34/35']);
});

test('the reason names the tracks, and what is missed first says where and how much', () => {
	const one = ranked('One', [10.3, 10.2, 10.1, 10, 10.1, 10.2, 10.3]);
	const other = ranked('Other', [10.4, 10.3, 10.2, 10.1, 10, 10.1, 10.2]);
	const {pairs} = loadList(rack, [one, other], options);
	expect(pairs.map(({reason}) => reason)).toEqual([
		'Taller step at One.',
		'Best at One; taller step at Other.',
		'Best at Other; shorter step at One.',
		'Shorter step at Other.',
	]);
	expect(pairs[1]!.without).toEqual({
		kind: 'slower',
		track: 'One',
		pair: '35/33',
		gearbox: 'A',
		lossS: expect.closeTo(0.1, 9),
	});
	expect(pairs[0]!.without).toEqual({kind: 'noStep', track: 'One', role: 'taller', than: '35/34'});
});

test('a step may fail a check of the engine, but not the housing, and what is out of stock is passed over and told', () => {
	const list = loadList(rack, [ranked('Oval', [10.3, 10.2, 'housing', 10, 'limit', 10.2, 10.3])], options);
	expect(list.tracks[0]).toMatchObject({taller: ['36/33'], shorter: ['34/35']});
	const short = loadList(rack, [ranked('Oval', [10.3, 10.2, 10.1, 10, 'stock', 10.2, 10.3])], options);
	expect(short.tracks[0]!.shorter).toEqual(['33/35']);
	expect(short.short).toContain('Oval: 34/35 would be the nearest step shorter than 35/34, but no set is on hand.');
});

test('a best that is out of stock is told with what it would gain', () => {
	const track = ranked('Oval', [10.3, 10.2, 10.1, 10, 10.1, 10.2, 10.3]);
	const rows = track.ranking.rows.map(one =>
		one.pair === '35/34' ? {...one, verdict: 'fail' as const, checks: [check('stock', 'fail')]} : one,
	);
	const {short, tracks} = loadList(rack, [{...track, ranking: {...track.ranking, rows}}], options);
	expect(tracks[0]!.best.fastestS).toBe(10.1);
	expect(short[0]).toMatch(/^Oval: 35\/34 A would be 0\.100 s a lap faster than 3\d\/3\d A, but no set is on hand\.$/);
});

test('where the rack ends the missing step is told, and no pair at its end is preferred for needing fewer', () => {
	const atEnd = loadList(rack, [ranked('Oval', [10, 10.1, 10.2, 10.3, 10.4, 10.5, 10.6])], options);
	expect(atEnd.tracks[0]).toMatchObject({served: {pair: '37/32'}, taller: [], shorter: ['36/33']});
	expect(atEnd.short).toContain('Oval: no step taller than 37/32 A on the rack.');
	const nearEnd = loadList(rack, [ranked('Oval', [10.01, 10, 10.2, 10.3, 10.4, 10.5, 10.6])], options);
	expect(nearEnd.tracks[0]!.served.pair).toBe('36/33');
});

test('a pair with few miles left and one set for several tracks is told', () => {
	const worn = carWith(teeth, {milesM: 1450 * 1609.344, maxMilesM: 1500 * 1609.344});
	const laps = [10.3, 10.2, 10.1, 10, 10.1, 10.2, 10.3];
	const {short} = loadList(worn, [ranked('One', laps), ranked('Two', laps)], options);
	expect(short).toContain('35/34: 50 miles (80 km) left, and it is the best at One and Two.');
	expect(short).toContain('35/34: one set for One and Two, no spare.');
});

test('a pair whose miles do not last for the races of its tracks is told', () => {
	const mileM = 1609.344;
	const used = carWith(teeth, {milesM: 1000 * mileM, maxMilesM: 1500 * mileM});
	const laps = [10.3, 10.2, 10.1, 10, 10.1, 10.2, 10.3];
	const races = (name: string, miles: number) => ({...ranked(name, laps), raceM: miles * mileM});
	const {short, pairs} = loadList(used, [races('One', 300), races('Two', 225)], options);
	expect(short).toContain('35/34: 525 miles (845 km) of racing at One and Two, and 500 miles (805 km) are left.');
	expect(pairs.find(({pair}) => pair === '35/34')!.raceM).toBeCloseTo(525 * mileM, 6);
	expect(loadList(used, [races('One', 300), races('Two', 200)], options).short.join()).not.toContain('racing');
});

test('every set needs its pairs where that is asked for', () => {
	const laps = [10.3, 10.2, 10.1, 10, 10.1, 10.2, 10.3];
	const inA = ranked('Oval', laps, 'A').ranking;
	const inB = ranked(
		'Oval',
		laps.toReversed().map((lap, i) => lap - (i === 5 ? 0.5 : 0)),
		'B',
	).ranking;
	const both = {
		name: 'Oval',
		raceM: undefined,
		ranking: {...inA, rows: [...inA.rows, ...inB.rows].sort((a, b) => a.fastestS! - b.fastestS!)},
	};
	expect(loadList(rack, [both], options).tracks.map(({served}) => served.gearbox)).toEqual(['B']);
	const each = loadList(rack, [both], {...options, eachSet: true});
	expect(each.tracks.map(({served}) => `${served.pair} ${served.gearbox}`)).toEqual(['33/35 B', '35/34 A']);
});

test('a track where nothing can be mounted is told, and the others are served', () => {
	const none = ranked('None', ['housing', 'housing', 'housing', 'housing', 'housing', 'housing', 'housing']);
	const {tracks, short} = loadList(rack, [none, ranked('Oval', [10.3, 10.2, 10.1, 10, 10.1, 10.2, 10.3])], options);
	expect(tracks.map(({track}) => track)).toEqual(['Oval']);
	expect(short[0]).toBe('None: no pair and set that fits the housing, is permitted, on hand and has miles left.');
});

/** Whether a choice of pairs serves a track, written anew from the definition; laps in hundredths of a second. */
function serves(carried: ReadonlySet<number>, laps: readonly number[]): boolean {
	const best = laps.indexOf(Math.min(...laps));
	const steps = (at: number) => [at + 1 < laps.length, at > 0];
	const [needsShorter, needsTaller] = steps(best);
	return laps.some((lap, at) => {
		if (lap - laps[best]! > 2 || !carried.has(at)) return false;
		const [hasShorter, hasTaller] = steps(at);
		if ((needsShorter && !hasShorter) || (needsTaller && !hasTaller)) return false;
		return (!hasShorter || carried.has(at + 1)) && (!hasTaller || carried.has(at - 1));
	});
}

/** All choices of pairs of the rack, by their places on it. */
const choices = Array.from(
	{length: 2 ** teeth.length},
	(_, bits) => new Set(teeth.map((__, i) => i).filter(i => (bits >> i) & 1)),
);

test('no smaller choice of all serves the tracks', () => {
	const laps = fc.array(fc.integer({min: 1000, max: 1012}), {minLength: teeth.length, maxLength: teeth.length});
	fc.assert(
		fc.property(fc.array(laps, {minLength: 1, maxLength: 4}), all => {
			const tracks = all.map((one, i) =>
				ranked(
					`Track ${i}`,
					one.map(lap => lap / 100),
				),
			);
			const list = loadList(rack, tracks, {...options, withinS: 0.025});
			const sizes = choices.filter(carried => all.every(one => serves(carried, one))).map(({size}) => size);
			const chosen = new Set(pairsOf(list).map(pair => names.indexOf(pair)));
			expect(chosen.size).toBe(Math.min(...sizes));
			expect(all.every(one => serves(chosen, one))).toBe(true);
		}),
		{numRuns: runs(200, 5000)},
	);
});
