import fc from 'fast-check';
import {expect, test} from 'vitest';
import type {Car, SpareGear} from '../../source/drivetrain/car.ts';
import type {Track} from '../../source/drivetrain/track.ts';
import {chooseGearbox, type GearboxOptions} from '../../source/loading/choose-gearbox.ts';
import {buildableSets} from '../../source/loading/gear-sets.ts';
import type {GearboxAnswer} from '../../source/loading/gearbox-results.ts';
import {rankRack} from '../../source/planning/rank-rack.ts';
import type {Row} from '../../source/planning/results.ts';
import {car, mph, rackPair, straight, track} from '../planning/build.ts';
import {runs} from '../runs.ts';

const spare = (gear: number, ...ratios: number[]): SpareGear[] =>
	ratios.map(ratio => ({gear, ratio, pieces: 1, fits: undefined}));

const withGears = (gears: SpareGear[], change: Partial<Car> = {}): Car =>
	car({gearInventory: {gears, smallestStep: 1, largestStep: Number.POSITIVE_INFINITY}, ...change});

const gears = [
	...spare(1, 2.9, 2.7),
	...spare(2, 2.04, 1.95),
	...spare(3, 1.58, 1.5),
	...spare(4, 1.24, 1.2, 1.17),
	...spare(5, 1, 0.96),
];

const answerOf = (aCar: Car, tracks: Track[], change: Partial<GearboxOptions> = {}): GearboxAnswer => {
	const named = tracks.map((one, i) => ({name: `${one.name} ${i}`, track: one}));
	const answer = chooseGearbox(aCar, named, {pair: undefined, together: false, count: 3, ...change});
	if (!answer.ok) throw new Error(JSON.stringify(answer.faults));
	return answer.value;
};

/** Every set with every pair through a whole ranking. */
const rowsByTryingAll = (aCar: Car, aTrack: Track): Row[] => {
	const built = buildableSets(aCar.gearInventory!, aCar.gearboxes);
	const own = aCar.gearboxes.filter(({name}) => !built.some(set => set.name === name));
	const ranking = rankRack({...aCar, gearboxes: [...built, ...own]}, aTrack);
	if (!ranking.ok) throw new Error(JSON.stringify(ranking.faults));
	return ranking.value.rows.filter(({gearbox}) => built.some(({name}) => name === gearbox));
};

const oval = track({name: 'Oval'});
const road = track({
	name: 'Road',
	type: 'road',
	restart: undefined,
	straights: [
		straight('Long', {exitMps: 42 * mph, lengthM: 520}),
		straight('Hill', {exitMps: 60 * mph, lengthM: 330, grade: 0.03, entryMps: 70 * mph, brakingMps2: 8}),
		straight('Short', {exitMps: 75 * mph, lengthM: 180}),
	],
});

test.each([oval, road])('the best set and pair are those of the ranking of every set: $name', one => {
	const answer = answerOf(withGears(gears), [one]);
	const all = rowsByTryingAll(withGears(gears), one);
	expect(answer.sets).toBe(48);
	expect(all).toHaveLength(48 * 5);
	const [best] = answer.tracks[0]!.rows;
	expect(best!.fastestS).toBeCloseTo(all[0]!.fastestS!, 9);
	expect(best!.verdict === 'fail').toBe(all[0]!.verdict === 'fail');
});

test('the next best are the next laps of the ranking that are not the same', () => {
	const answer = answerOf(withGears(gears), [road]);
	const passing = rowsByTryingAll(withGears(gears), road).filter(({verdict}) => verdict !== 'fail');
	const laps = [...new Set(passing.map(({fastestS}) => fastestS!.toFixed(7)))].slice(0, 3);
	expect(answer.tracks[0]!.rows.map(({fastestS}) => fastestS!.toFixed(7))).toEqual(laps);
});

/** The least sum of laps over the sets, with the best pair at each track. */
function commonByTryingAll(aCar: Car, tracks: readonly Track[]): number {
	const rows = tracks.map(one => rowsByTryingAll(aCar, one).filter(({verdict}) => verdict !== 'fail'));
	const sums = buildableSets(aCar.gearInventory!, aCar.gearboxes).map(({name}) =>
		rows.reduce(
			(sum, own) => sum + Math.min(...own.filter(row => row.gearbox === name).map(({fastestS}) => fastestS!)),
			0,
		),
	);
	return Math.min(...sums);
}

test('one set for several tracks has the least laps added up of all sets, and says what it costs at each', () => {
	const [best, next] = answerOf(withGears(gears), [oval, road], {together: true}).common;
	expect(best!.totalS).toBeCloseTo(commonByTryingAll(withGears(gears), [oval, road]), 9);
	expect(best!.tracks.map(({costS}) => costS >= -1e-9)).toEqual([true, true]);
	expect(next!.behindS).toBeGreaterThanOrEqual(0);
});

test('for one track the common set is the best set there', () => {
	const {tracks, common} = answerOf(withGears(gears), [road], {together: true});
	expect(common[0]!.totalS).toBeCloseTo(tracks[0]!.rows[0]!.fastestS!, 9);
	expect(common[0]!.tracks[0]!.costS).toBeCloseTo(0, 9);
});

const ratio = (low: number, high: number) =>
	fc.integer({min: Math.round(low * 100), max: Math.round(high * 100)}).map(value => value / 100);
const options = (low: number, high: number) => fc.uniqueArray(ratio(low, high), {minLength: 1, maxLength: 2});

const anyGears = fc
	.tuple(options(2.5, 3), options(1.9, 2.2), options(1.45, 1.7), options(1.15, 1.3), options(0.92, 1.05))
	.map(places => places.flatMap((ratios, i) => spare(i + 1, ...ratios)));

const anyTrack = fc
	.record({exitMph: fc.integer({min: 35, max: 95}), lengthM: fc.integer({min: 120, max: 600}), limit: fc.boolean()})
	.map(({exitMph, lengthM, limit}) =>
		track({
			straights: [
				straight('Front', {exitMps: exitMph * mph, lengthM}),
				straight('Back', {exitMps: (exitMph + 4) * mph, lengthM: 0.8 * lengthM}),
			],
			rules: {rpmLimit: limit ? 8600 : undefined, gearboxes: undefined, pairs: undefined},
		}),
	);

test('whatever the gears and the straights, nothing of the ranking comes before the best, alone and together', () => {
	const rack = {toothSums: undefined, eitherShaft: false, pairs: [rackPair(33, 38), rackPair(36, 35)]};
	const small = {rack, installed: undefined};
	fc.assert(
		fc.property(anyGears, anyTrack, anyTrack, (some, one, other) => {
			const aCar = withGears(some, small);
			const answer = answerOf(aCar, [one, other], {together: true});
			const best = [one, other].map(each => rowsByTryingAll(aCar, each)[0]!);
			answer.tracks.forEach(({rows}, i) => {
				expect(rows[0]?.verdict === 'fail').toBe(best[i]!.verdict === 'fail');
				expect(rows[0]!.fastestS).toBeCloseTo(best[i]!.fastestS!, 8);
			});
			const commonS = commonByTryingAll(aCar, [one, other]);
			if (Number.isFinite(commonS)) expect(answer.common[0]!.totalS).toBeCloseTo(commonS, 8);
		}),
		{numRuns: runs(15, 300)},
	);
});

test('of sets that use the same gears the one with the fewest gears to change is told', () => {
	const held = track({restart: undefined, pitRoad: undefined, gears: {lowest: 4, highest: 5}});
	const {rows} = answerOf(withGears(gears), [held]).tracks[0]!;
	// Installed is set A: 2.9, 2.04, 1.58, 1.24, 1. Only the fourth and the fifth gear count here.
	expect(rows[0]!.ratios.slice(0, 3)).toEqual([2.9, 2.04, 1.58]);
	expect(rows[0]!.changes).toBeLessThanOrEqual(2);
});

test('where the rules name sets only these are taken', () => {
	const rules = {rpmLimit: undefined, gearboxes: ['B'], pairs: undefined};
	const {tracks, remarks} = answerOf(withGears(gears), [track({rules})]);
	expect(tracks[0]!.sets).toBe(1);
	expect(new Set(tracks[0]!.rows.map(({gearbox}) => gearbox))).toEqual(new Set(['B']));
	expect(remarks).toEqual(['Test oval 0: the rules name the sets that may be used; 1 of them can be built.']);
});

test('with a pair given only that pair is run', () => {
	const {rows} = answerOf(withGears(gears), [oval], {pair: {driving: 34, driven: 37}}).tracks[0]!;
	expect(new Set(rows.map(({pair}) => pair))).toEqual(new Set(['34/37']));
});

test('a car without single gears, or none that go together, is a fault that says so', () => {
	const bare = chooseGearbox(car(), [{name: 'x', track: oval}], {pair: undefined, together: false, count: 1});
	expect(bare).toMatchObject({ok: false, faults: [{document: 'car', path: 'gearInventory', found: 'no single gears'}]});
	const unfit = withGears([...spare(1, 1), ...spare(2, 1.2)]);
	const none = chooseGearbox(unfit, [{name: 'x', track: oval}], {pair: undefined, together: false, count: 1});
	expect(none).toMatchObject({ok: false, faults: [{path: 'gearInventory', found: 'no set that goes together'}]});
});
