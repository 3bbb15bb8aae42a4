import {expect, test} from 'vitest';
import {decide, type Standing} from '../../source/odds/decide.ts';
import {chanceOf} from '../../source/odds/estimates.ts';
import {bestOf, firstPart, lossOf, RowTally} from '../../source/odds/tally.ts';
import {candidateOf} from '../../source/planning/candidates.ts';
import {car, rackPair} from '../planning/build.ts';

const draws = 64;

/** A row that takes so long in each draw and is over the limit in the first so many. */
function row(driving: number, timeS: (draw: number) => number, overIn = 0, barred: string | null = null): RowTally {
	const tally = new RowTally(candidateOf(car(), rackPair(driving, 38), car().gearboxes[0]!), barred, draws);
	for (let draw = 0; draw < draws && barred === null; draw++) {
		const isOver = draw % draws < overIn;
		tally.add({timeS: timeS(draw), highestRpm: 8000, isOver, isAllowed: !isOver});
	}
	return tally;
}

function standings(...rows: RowTally[]): Standing[] {
	const best = bestOf(rows, draws);
	return rows.map(one => ({
		row: one,
		over: chanceOf(one.draws, draw => one.isOver[draw]!),
		first: chanceOf(one.draws, draw => firstPart(one, best, draw)),
	}));
}

test('without a risk the row that is most often the fastest allowed is first', () => {
	const all = standings(
		row(31, () => 10, 16),
		row(32, () => 10.1),
	);
	expect(all.map(({first}) => first.value)).toEqual([0.75, 0.25]);
	expect(decide(all, null)).toEqual({row: '31/38 A', next: '32/38 A', isDecided: true, open: []});
});

test('with a risk it is the fastest on the mean whose chance is within it', () => {
	const all = standings(
		row(31, () => 10, 16),
		row(32, draw => 10.1 + 0.001 * (draw % 5)),
		row(33, () => 10.2),
	);
	expect(decide(all, 0.05)).toMatchObject({row: '32/38 A', next: '33/38 A', isDecided: true});
	expect(decide(all, 0.5)).toMatchObject({row: '31/38 A', isDecided: true});
});

test('a chance within two standard errors of the risk leaves it open', () => {
	const all = standings(
		row(31, () => 10, 3),
		row(32, () => 10.1),
	);
	const {row: first, isDecided, open} = decide(all, 0.045);
	expect({first, isDecided}).toEqual({first: '32/38 A', isDecided: false});
	expect(open).toEqual(['whether 31/38 A, which is faster, is within the risk']);
});

test('two rows that are first as often leave it open; two that never differ count as one', () => {
	const even = standings(
		row(31, draw => 10 + 0.1 * (draw % 16 < 8 ? 0 : 1)),
		row(32, draw => 10 + 0.1 * (draw % 16 < 8 ? 1 : 0)),
	);
	const {isDecided, open} = decide(even, null);
	expect(isDecided).toBe(false);
	expect(open[0]).toMatch(/^which of 3[12]\/38 A and 3[12]\/38 A is more often the fastest$/);
	const same = standings(
		row(31, () => 10),
		row(32, () => 10),
	);
	expect(same.map(({first}) => first.value)).toEqual([0.5, 0.5]);
	expect(decide(same, null)).toMatchObject({next: null, isDecided: true});
});

test('where none is within the risk none is first, and a row that cannot be mounted never is', () => {
	expect(decide(standings(row(31, () => 10, 32)), 0.05)).toMatchObject({row: null, next: null});
	expect(
		decide(
			standings(
				row(31, () => 9, 0, 'not on hand'),
				row(32, () => 10),
			),
			null,
		),
	).toMatchObject({row: '32/38 A'});
});

test('the loss is the mean of the draws in which another is faster', () => {
	const rows = [row(31, draw => (draw < 32 ? 10 : 10.3)), row(32, () => 10.1)];
	const best = bestOf(rows, draws);
	expect(lossOf(rows[0]!, best)).toBeCloseTo(0.2, 12);
	expect(lossOf(rows[1]!, best)).toBeCloseTo(0.1, 12);
	expect(
		lossOf(
			row(33, () => 1),
			bestOf([row(33, () => 1)], draws),
		),
	).toBeNull();
});
