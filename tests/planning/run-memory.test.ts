import fc from 'fast-check';
import {expect, test} from 'vitest';
import type {Car} from '../../source/drivetrain/car.ts';
import type {Track} from '../../source/drivetrain/track.ts';
import {rankRack, rankSteps} from '../../source/planning/rank-rack.ts';
import {RunMemory} from '../../source/planning/run-memory.ts';
import {finish} from '../../source/planning/run-rack.ts';
import {runs} from '../runs.ts';
import {car, mph, straight, track} from './build.ts';

const two = track({
	straights: [straight('Front', {exitMps: 70 * mph}), straight('Back', {exitMps: 66 * mph})],
});
const faster = (one: Track, by: number): Track => ({
	...one,
	straights: one.straights.map((straight, i) => (i === 0 ? {...straight, exitMps: straight.exitMps + by} : straight)),
});

test('with a memory an answer is what it is without one, whatever was asked before', () => {
	const change = fc.record({
		by: fc.integer({min: -8, max: 8}),
		massKg: fc.constantFrom(1600, 1650),
		grip: fc.constantFrom(1.2, 1.25),
	});
	fc.assert(
		fc.property(fc.array(change, {minLength: 1, maxLength: 4}), changes => {
			const memory = new RunMemory();
			for (const {by, massKg, grip} of changes) {
				const [thisCar, thisTrack]: [Car, Track] = [car({massKg, grip}), faster(two, by / 4)];
				const ranked = finish(rankSteps(thisCar, thisTrack, {}, memory));
				const expected = rankRack(thisCar, thisTrack);
				expect(ranked.ok && ranked.value.ranking).toEqual(expected.ok && expected.value);
			}
		}),
		{numRuns: runs(15, 500)},
	);
});

test('a change of one straight leaves the runs of the other as they were', () => {
	const memory = new RunMemory();
	const runOf = (one: Track) => {
		const ranked = finish(rankSteps(car(), one, {}, memory));
		if (!ranked.ok) throw new Error('not ranked');
		return ranked.value.runs.get('33/38 A')!.situations[0]!.places;
	};
	const [before, after] = [runOf(two), runOf(faster(two, 1))];
	expect(after[1]).toBe(before[1]);
	expect(after[0]).not.toBe(before[0]);
});
