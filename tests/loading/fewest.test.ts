import fc from 'fast-check';
import {expect, test} from 'vitest';
import {type CoverProblem, lossOf, type Need} from '../../source/loading/cover.ts';
import {fewest} from '../../source/loading/fewest.ts';
import {runs} from '../runs.ts';
import {hitting, triples} from './steiner.ts';

// Fulkerson, Nemhauser and Trotter, Math. Prog. Study 2 (1974), from memory; recomputed: the elements less the largest
// cap, 4 in AG(2, 3) and 9 in AG(3, 3) (Bose 1947). The larger one takes a quarter of a minute.
const steiner = [
	{name: 'A9', directions: 2, triplesThere: 12, least: 5},
	{name: 'A27', directions: 3, triplesThere: 117, least: 18},
].slice(0, runs(1, 2));
test.each(steiner)('the Steiner triple covering problem $name takes $least', ({directions, triplesThere, least}) => {
	const lines = triples(directions);
	expect(lines).toHaveLength(triplesThere);
	expect(fewest(hitting(3 ** directions, lines))?.things).toHaveLength(least);
});

test('where taking the thing that serves the most takes too many, the fewest are found', () => {
	// The classic case against the greedy way: 4 and 5 serve three demands each, 3 serves four of the six.
	const demands = [
		[3, 4],
		[3, 4],
		[0, 4],
		[3, 5],
		[3, 5],
		[1, 5],
	];
	expect(fewest(hitting(6, demands))?.things).toEqual([4, 5]);
});

test('without a need nothing is taken, and a need without a way has no answer', () => {
	expect(fewest({needs: [], unease: [0, 0]})?.things).toEqual([]);
	expect(fewest({needs: [[]], unease: [0, 0]})).toBeUndefined();
});

test('a way that loses time is taken only where it saves a thing', () => {
	const needs: Need[] = [
		[
			{loss: 0, demands: [[0]]},
			{loss: 0.01, demands: [[1]]},
		],
		[{loss: 0, demands: [[1]]}],
	];
	expect(fewest({needs, unease: [0, 0]})).toEqual({things: [1], loss: 0.01, unease: 0});
	expect(fewest({needs: [needs[0]!], unease: [0, 0]})).toEqual({things: [0], loss: 0, unease: 0});
});

test('of equals the one with less unease is taken', () => {
	expect(fewest({needs: [[{loss: 0, demands: [[0, 1, 2]]}]], unease: [1, 0.2, 0.5]})?.things).toEqual([1]);
});

const mostThings = 8;

const problem: fc.Arbitrary<CoverProblem> = fc.integer({min: 1, max: mostThings}).chain(things => {
	const thing = fc.integer({min: 0, max: things - 1});
	// Some different things, parted into demands.
	const demands = fc
		.tuple(fc.uniqueArray(thing, {minLength: 1, maxLength: 5}), fc.array(fc.integer({min: 1, max: 3}), {minLength: 5}))
		.map(([members, sizes]) => {
			const parted: number[][] = [];
			for (let from = 0; from < members.length; from += sizes[parted.length - 1]!)
				parted.push(members.slice(from, from + sizes[parted.length]!));
			return parted;
		});
	const way = fc.record({loss: fc.integer({min: 0, max: 4}), demands});
	return fc.record({
		unease: fc.array(fc.integer({min: 0, max: 3}), {minLength: things, maxLength: things}),
		needs: fc.array(fc.array(way, {minLength: 1, maxLength: 3}), {maxLength: 5}),
	});
});

/** Size, loss and unease of the best of all subsets. */
function byTryingAll({needs, unease}: CoverProblem): number[] {
	let best = [Number.POSITIVE_INFINITY, 0, 0];
	for (let bits = 0; bits < 2 ** unease.length; bits++) {
		const has = (thing: number) => ((bits >> thing) & 1) === 1;
		const things = unease.map((_, thing) => thing).filter(has);
		const losses = needs.map(need => lossOf(need, has));
		if (losses.includes(Number.POSITIVE_INFINITY)) continue;
		const sum = (values: number[]) => values.reduce((total, value) => total + value, 0);
		const cost = [things.length, sum(losses), sum(things.map(thing => unease[thing]!))];
		const first = cost.findIndex((value, i) => value !== best[i]);
		if (first >= 0 && cost[first]! < best[first]!) best = cost;
	}
	return best;
}

test('size, loss and unease are those of the best subset of all', () => {
	fc.assert(
		fc.property(problem, one => {
			const cover = fewest(one)!;
			expect([cover.things.length, cover.loss, cover.unease]).toEqual(byTryingAll(one));
		}),
		{numRuns: runs(500, 20_000)},
	);
});
