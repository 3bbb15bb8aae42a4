/** Points that fill the unit cube evenly: Sobol's sequence, scrambled so that several sets of them are independent. */
import {directions} from './direction-numbers.ts';

const bits = 32;

/** How many dimensions there are direction numbers for. */
export const mostSobolDimensions = directions.length + 1;

/**
 * The 32 direction integers v_i = m_i·2^(32−i) of a dimension, counted from 0: van der Corput's for the first, Joe and Kuo's
 * recurrence for the others (SIAM J. Sci. Comput. 30 (2008), eq. 2).
 */
function directionIntegers(dimension: number): Uint32Array {
	const v = new Uint32Array(bits);
	if (dimension === 0) return v.map((_, i) => 2 ** (bits - 1 - i));
	const {a, m} = directions[dimension - 1]!;
	const s = m.length;
	for (let i = 0; i < bits; i++) {
		if (i < s) {
			v[i] = m[i]! * 2 ** (bits - 1 - i);
			continue;
		}
		let value = v[i - s]! ^ (v[i - s]! >>> s);
		for (let k = 1; k < s; k++) if ((a >> (s - 1 - k)) & 1) value ^= v[i - k]!;
		v[i] = value;
	}
	return v;
}

const known: Uint32Array[] = [];

/** Coordinate of the point of that index (from 0, the origin) as a 32-bit integer, in the order of the index's own bits. */
export function sobolInteger(index: number, dimension: number): number {
	known[dimension] ??= directionIntegers(dimension);
	const v = known[dimension];
	let value = 0;
	for (let i = 0, rest = index; rest > 0; i++, rest >>>= 1) if (rest & 1) value ^= v[i]!;
	return value >>> 0;
}

/**
 * Owen's nested uniform scramble (A. B. Owen, "Randomly permuted (t,m,s)-nets and (t,s)-sequences", 1995), by the hash of
 * S. Laine and T. Karras with the constants of B. Burley, "Practical hash-based Owen scrambling", J. Comput. Graph. Tech. 9
 * (2020): integers alone, so the same on every machine.
 */
export function scrambled(value: number, seed: number): number {
	let x = reversed(value);
	x = (x + seed) | 0;
	x ^= Math.imul(x, 0x6c50b47c);
	x ^= Math.imul(x, 0xb82f1e52);
	x ^= Math.imul(x, 0xc7afe638);
	x ^= Math.imul(x, 0x8d22f6e6);
	return reversed(x);
}

function reversed(value: number): number {
	let x = value >>> 0;
	x = ((x >>> 1) & 0x55555555) | ((x & 0x55555555) << 1);
	x = ((x >>> 2) & 0x33333333) | ((x & 0x33333333) << 2);
	x = ((x >>> 4) & 0x0f0f0f0f) | ((x & 0x0f0f0f0f) << 4);
	x = ((x >>> 8) & 0x00ff00ff) | ((x & 0x00ff00ff) << 8);
	return ((x >>> 16) | (x << 16)) >>> 0;
}

/** A well mixed 32-bit number from several: the finalizer of MurmurHash3 (A. Appleby, public domain) after each. */
export function mixed(...numbers: number[]): number {
	let x = 0x9e3779b9;
	for (const number of numbers) {
		x = (x ^ number) | 0;
		x = Math.imul(x ^ (x >>> 16), 0x85ebca6b);
		x = Math.imul(x ^ (x >>> 13), 0xc2b2ae35);
		x = (x ^ (x >>> 16)) + 0x9e3779b9;
	}
	return x >>> 0;
}

/**
 * One coordinate in (0, 1) of a point of a scrambled set. Sets of other `replicate`s are independent; so are dimensions beyond
 * the direction numbers, which repeat the earlier ones in another order of the points (a padded sequence: each such
 * coordinate is as evenly spread by itself).
 */
export function coordinate(index: number, dimension: number, replicate: number, seed: number): number {
	const [cycle, within] = [Math.floor(dimension / mostSobolDimensions), dimension % mostSobolDimensions];
	// Every first 2^k points are then 2^k others that fill the cube as evenly.
	const shuffled = cycle === 0 ? index : scrambled(index, mixed(seed, replicate, cycle, 1));
	return (scrambled(sobolInteger(shuffled, within), mixed(seed, replicate, dimension)) + 0.5) / 2 ** bits;
}
