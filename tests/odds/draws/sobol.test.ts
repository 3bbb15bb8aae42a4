import {expect, test} from 'vitest';
import {coordinate, mostSobolDimensions, scrambled, sobolInteger} from '../../../source/odds/draws/sobol.ts';

const at = (index: number, dimension: number) => sobolInteger(index, dimension) / 2 ** 32;
/** The generator's usual order: each point differs from the one before by one direction number. */
const gray = (index: number) => index ^ (index >>> 1);

test('the first points are the published ones', () => {
	// From memory: the list of first points that Joe and Kuo give with their generator, dimensions 1 to 3.
	const points = Array.from({length: 8}, (_, i) => [0, 1, 2].map(dimension => at(gray(i), dimension)));
	expect(points).toEqual([
		[0, 0, 0],
		[0.5, 0.5, 0.5],
		[0.75, 0.25, 0.25],
		[0.25, 0.75, 0.75],
		[0.375, 0.375, 0.625],
		[0.875, 0.875, 0.125],
		[0.625, 0.125, 0.875],
		[0.125, 0.625, 0.375],
	]);
});

test('later dimensions agree with another program that has the same direction numbers', () => {
	// Recomputed: scipy.stats.qmc.Sobol(96, scramble=False, bits=32) of SciPy 1.17.1, point 1000, as integers. All of the
	// first 1024 points in 96 dimensions were compared and are equal.
	const dimensions = [3, 10, 37, 64, 95];
	expect(dimensions.map(dimension => sobolInteger(gray(1000), dimension))).toEqual([
		2906652672, 364904448, 3569352704, 557842432, 3720347648,
	]);
});

test.each([0, 1, 40, 95, 96, 150])(
	'2^k points of dimension %i fall one into each of 2^k equal parts, scrambled or not',
	dimension => {
		for (const count of [8, 64, 256]) {
			const parts = Array.from({length: count}, (_, i) => Math.floor(coordinate(i, dimension, 3, 7) * count));
			expect([...new Set(parts)].length).toBe(count);
		}
	},
);

test('pairs of dimensions are not correlated, those beyond the direction numbers included', () => {
	const count = 512;
	const values = (dimension: number) => Array.from({length: count}, (_, i) => coordinate(i, dimension, 0, 1) - 0.5);
	const [one, ...others] = [0, 1, mostSobolDimensions, mostSobolDimensions + 1, 2 * mostSobolDimensions].map(values);
	for (const other of others) {
		const product = one!.reduce((sum, value, i) => sum + value * other[i]!, 0) / count;
		expect(Math.abs(product * 12)).toBeLessThan(0.15);
	}
});

test('sets of different replicates and seeds differ, the same is the same', () => {
	const point = (replicate: number, seed: number) =>
		[0, 1, 2].map(dimension => coordinate(5, dimension, replicate, seed));
	expect(point(0, 1)).toEqual(point(0, 1));
	expect(point(0, 1)).not.toEqual(point(1, 1));
	expect(point(0, 1)).not.toEqual(point(0, 2));
	// Integers and one division alone: these digits are the same on every machine.
	expect(point(0, 1)).toEqual([0.8364554982399568, 0.07002365065272897, 0.3752936884993687]);
});

test('a scramble is a permutation that keeps the tree: numbers that share their first bits still do', () => {
	const top = (value: number) => scrambled(value, 12345) >>> 28;
	const under = (value: number) => Array.from({length: 16}, (_, i) => top(value + i * 2 ** 20));
	for (let value = 0; value < 2 ** 32; value += 2 ** 28) expect(new Set(under(value)).size).toBe(1);
	expect(new Set(Array.from({length: 16}, (_, i) => top(i * 2 ** 28))).size).toBe(16);
});
