/** Racks, limits and tires at the edge: each ranking has a defined answer. */
import {describe, expect, test} from 'vitest';
import type {Car} from '../../source/drivetrain/car.ts';
import type {Track} from '../../source/drivetrain/track.ts';
import {rankRack} from '../../source/planning/rank-rack.ts';
import type {Ranking} from '../../source/planning/results.ts';
import {relativeError} from '../close.ts';
import {car, engine, inch, pair, rackPair, track} from './build.ts';

function ranked(theCar: Car, theTrack: Track = track()): Ranking {
	const answer = rankRack(theCar, theTrack, {});
	if (!answer.ok) throw new Error(JSON.stringify(answer));
	return answer.value;
}

const rackOf = (...pairs: [number, number][]) => ({
	toothSums: undefined,
	eitherShaft: false,
	pairs: pairs.map(([driving, driven]) => rackPair(driving, driven)),
});

describe('a pair 1:1', () => {
	const alone = car({rack: rackOf([36, 36]), installed: {pair: pair(36, 36), gearbox: 'A'}});

	test('leaves gear and final drive alone', () => {
		const row = ranked(alone).rows.find(({gearbox}) => gearbox === 'A')!;
		expect(row.pair).toBe('36/36');
		for (const [gear, ratio] of [2.9, 2.04, 1.58, 1.24, 1].entries()) {
			expect(relativeError(row.overall[gear]!, ratio * 3.25)).toBeLessThan(1e-15);
		}
	});

	test('on either shaft it is one row a set, not two', () => {
		const either = ranked({...alone, rack: {...alone.rack, eitherShaft: true}});
		expect(either.rows.map(row => `${row.pair} ${row.gearbox}`).sort()).toEqual(['36/36 A', '36/36 B']);
	});
});

test('a rack of one pair and one set has one row, which gains nothing on itself', () => {
	const {rows} = ranked(car({rack: rackOf([33, 38]), gearboxes: car().gearboxes.slice(0, 1)}));
	expect(rows).toHaveLength(1);
	expect(rows[0]!.gainS).toBe(0);
});

test('a thousand pairs have a thousand rows a set, in order, each once', () => {
	const many = Array.from({length: 1000}, (_, index): [number, number] => [
		20 + (index % 40),
		25 + Math.floor(index / 40),
	]);
	const {rows} = ranked(car({rack: rackOf(...many), installed: undefined}));
	expect(rows).toHaveLength(2000);
	expect(new Set(rows.map(row => `${row.pair} ${row.gearbox}`)).size).toBe(2000);
	const times = rows.filter(row => row.verdict !== 'fail').map(row => row.fastestS!);
	expect(times).toEqual(times.toSorted((one, other) => one - other));
});

test('two pairs of one ratio are level to the last digit, and stand by their teeth', () => {
	const {rows} = ranked(car({rack: rackOf([22, 24], [33, 36]), installed: undefined}));
	const ofA = rows.filter(row => row.gearbox === 'A');
	expect(ofA.map(row => row.pair)).toEqual(['22/24', '33/36']);
	expect(relativeError(ofA[0]!.fastestS!, ofA[1]!.fastestS!)).toBeLessThan(1e-14);
});

describe('tires', () => {
	test('of equal rollout roll as each does', () => {
		const even = car({tires: {...car().tires, leftM: 86.5 * inch, rightM: 86.5 * inch}});
		// The harmonic mean of 86 and 87.005814 in is 86.5 in: 2/(1/86 + 1/x).
		const apart = car({tires: {...car().tires, leftM: 86 * inch, rightM: (1 / (2 / 86.5 - 1 / 86)) * inch}});
		const base = track({situations: [track().situations[0]!]});
		const [one, other] = [ranked(even, base), ranked(apart, base)];
		expect(one.rows.map(row => row.pair)).toEqual(other.rows.map(row => row.pair));
		expect(relativeError(one.rows[0]!.fastestS!, other.rows[0]!.fastestS!)).toBeLessThan(1e-12);
	});

	test('without growth and slip turn as the ratio and the rollout say', () => {
		const plain = car({
			tires: {...car().tires, leftM: 86.4 * inch, rightM: 86.4 * inch, growth: 0, slip: 0},
		});
		const base = ranked(plain).rows[0]!;
		const front = base.situations[0]!.straights[0]!;
		const turns = front.endSpeedMps / (86.4 * inch);
		expect(relativeError(front.endRpm, 60 * turns * base.overall[front.endGear - 1]!)).toBeLessThan(1e-12);
	});
});

describe('limits', () => {
	test('below the power band: the band ends at the limit, and every row says what it can', () => {
		const low = ranked(car({engines: [engine({rpmLimit: 5200, pullRpm: 2000})]}));
		expect(low.setting.bandHighRpm).toBeLessThanOrEqual(5200);
		expect(low.setting.bandLowRpm).toBeLessThan(low.setting.bandHighRpm);
		for (const row of low.rows) expect(row.checks.find(({check}) => check === 'limit')).toBeDefined();
	});

	test('below the first point of the curve: the band is the limit alone, and the ranking stands', () => {
		const {rows, setting} = ranked(car({engines: [engine({rpmLimit: 3900, pullRpm: 2000})]}));
		expect(rows).toHaveLength(10);
		expect([setting.bandLowRpm, setting.bandHighRpm]).toEqual([3900, 3900]);
	});
});

test('a gearbox of one gear and one of two identical gears rank, the second no faster', () => {
	const {rows} = ranked(
		car({
			gearboxes: [
				{name: 'A', ratios: [1.24]},
				{name: 'B', ratios: [1.24, 1.24]},
			],
		}),
		track({pitRoad: undefined, restart: undefined}),
	);
	const timeOf = (name: string) => rows.find(row => row.pair === '33/38' && row.gearbox === name)!.fastestS!;
	expect(timeOf('B')).toBe(timeOf('A'));
});

describe('a straight', () => {
	test('of an inch is ranked, and every time is above nothing', () => {
		const one = track().straights[1]!;
		for (const row of ranked(car(), track({straights: [{...one, lengthM: inch}]})).rows) {
			expect(row.fastestS).toBeGreaterThan(0);
		}
	});

	test('of 100 km is ranked, and the pair with the most speed at its top wins', () => {
		const one = track().straights[1]!;
		const {rows} = ranked(
			car(),
			track({straights: [{...one, lengthM: 100_000}], situations: [track().situations[0]!]}),
		);
		const passing = rows.filter(row => row.verdict !== 'fail');
		const tops = passing.map(row => row.situations[0]!.straights[0]!.finalSpeedMps);
		expect(tops[0]).toBe(Math.max(...tops));
	});
});
