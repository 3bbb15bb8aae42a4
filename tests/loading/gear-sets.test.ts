import {expect, test} from 'vitest';
import type {GearInventory, SpareGear} from '../../source/drivetrain/car.ts';
import {buildableSets} from '../../source/loading/gear-sets.ts';

const gear = (place: number, ratio: number, change: Partial<SpareGear> = {}): SpareGear => ({
	gear: place,
	ratio,
	pieces: 1,
	fits: undefined,
	...change,
});
const inventory = (gears: SpareGear[], change: Partial<GearInventory> = {}): GearInventory => ({
	gears,
	smallestStep: 1,
	largestStep: Number.POSITIVE_INFINITY,
	...change,
});
const ratiosOf = (one: GearInventory) => buildableSets(one, []).map(({ratios}) => ratios);

test('each gear is taller than the one before it', () => {
	expect(ratiosOf(inventory([gear(1, 2), gear(1, 1.5), gear(2, 1.5), gear(2, 1)]))).toEqual([
		[2, 1.5],
		[2, 1],
		[1.5, 1],
	]);
});

test('what is not on hand is not built in', () => {
	expect(ratiosOf(inventory([gear(1, 2), gear(2, 1.5, {pieces: 0}), gear(2, 1)]))).toEqual([[2, 1]]);
	expect(ratiosOf(inventory([gear(1, 2), gear(2, 1, {pieces: 0})]))).toEqual([]);
});

test('the ratio of a gear to the next is within the steps, both bounds included', () => {
	const gears = [gear(1, 2.1), gear(2, 1.5), gear(2, 1.4), gear(2, 1.05)];
	// 2.1 / 1.5 = 1.4, 2.1 / 1.4 = 1.5 and 2.1 / 1.05 = 2.
	expect(ratiosOf(inventory(gears, {smallestStep: 1.4, largestStep: 1.5}))).toEqual([
		[2.1, 1.5],
		[2.1, 1.4],
	]);
});

test('gears go together where one group is among those of all that name groups', () => {
	const gears = [
		gear(1, 3, {fits: ['long']}),
		gear(1, 2.8, {fits: ['long', 'short']}),
		gear(2, 2),
		gear(3, 1, {fits: ['short']}),
	];
	expect(ratiosOf(inventory(gears))).toEqual([[2.8, 2, 1]]);
});

test('groups that agree two by two but not all together do not fit', () => {
	const gears = [gear(1, 3, {fits: ['a', 'b']}), gear(2, 2, {fits: ['b', 'c']}), gear(3, 1, {fits: ['a', 'c']})];
	expect(ratiosOf(inventory(gears))).toEqual([]);
});

test('a set that is built already has its name, the others are named by their ratios, and the same ratios are one set', () => {
	const gears = [gear(1, 2), gear(1, 2, {fits: ['long']}), gear(2, 1), gear(2, 0.9)];
	expect(buildableSets(inventory(gears), [{name: 'A', ratios: [2, 1]}]).map(({name}) => name)).toEqual(['A', '2 0.9']);
});
