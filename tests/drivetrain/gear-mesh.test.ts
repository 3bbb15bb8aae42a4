import fc from 'fast-check';
import {describe, expect, test} from 'vitest';
import {centerDistanceM, commonDivisor, isHunting, turnsUntilMeeting} from '../../source/drivetrain/gear-mesh.ts';
import {relativeError} from '../close.ts';
import {runs} from '../runs.ts';

// Divisors published (W. C. Foiles, Gear Frequencies Using the Euclidean Algorithm, Vibration Institute; Euclid VII);
// turns recomputed.
const pairs: readonly [teeth1: number, teeth2: number, divisor: number, turns: number][] = [
	[17, 43, 1, 43],
	[23, 67, 1, 67],
	[25, 36, 1, 36],
	[28, 100, 4, 25],
	[24, 36, 12, 3],
	[20, 60, 20, 3],
];

test.each(pairs)(
	'%i and %i teeth have the divisor %i and meet again after %i turns',
	(teeth1, teeth2, divisor, turns) => {
		expect(commonDivisor(teeth1, teeth2)).toBe(divisor);
		expect(commonDivisor(teeth2, teeth1)).toBe(divisor);
		expect(isHunting(teeth1, teeth2)).toBe(divisor === 1);
		expect(turnsUntilMeeting(teeth1, teeth2)).toBe(turns);
	},
);

// Recomputed: 23/67 at 1800 rpm meets at 690 Hz tooth by tooth, and the same two teeth at 690/1541 = 0.4478 Hz.
test('the hunting frequency is that of the shaft over the turns until teeth meet again', () => {
	expect(1800 / 60 / turnsUntilMeeting(23, 67)).toBeCloseTo(0.4478, 4);
});

test('counting tooth by tooth gives the same turns and the same hunting verdict', () => {
	const teeth = fc.integer({min: 1, max: 40});
	fc.assert(
		fc.property(teeth, teeth, (teeth1, teeth2) => {
			const counted = counts(teeth1, teeth2);
			expect(turnsUntilMeeting(teeth1, teeth2)).toBe(counted.meshes / teeth1);
			expect(isHunting(teeth1, teeth2)).toBe(counted.partners === teeth2);
		}),
		{numRuns: runs(50, 1600)},
	);
});

describe('center distance', () => {
	// From memory (Khurmi & Gupta, Ex. 13.3), recomputed: modules 3.125 and 2.5 mm, 28/100 and 36/124, both 200 mm.
	test('of a reverted train is the same for both of its pairs', () => {
		expect(relativeError(centerDistanceM(0.003125, 128), 0.2)).toBeLessThan(1e-15);
		expect(relativeError(centerDistanceM(0.0025, 160), 0.2)).toBeLessThan(1e-15);
	});

	// From memory (KHK gear handbook, table 4.1; Shigley, Ex. 13-1), recomputed: module 3, 12/24 is 54 mm; pitch 2, 16/40 is 14 in.
	test('of spur gears is half the module times the tooth sum', () => {
		expect(relativeError(centerDistanceM(0.003, 36), 0.054)).toBeLessThan(1e-15);
		expect(relativeError(centerDistanceM(0.0254 / 2, 56), 14 * 0.0254)).toBeLessThan(1e-15);
	});

	// Closed form: cos 60° is one half.
	test('of helical gears is larger by 1/cos β', () => {
		expect(relativeError(centerDistanceM(0.003, 36, Math.PI / 3), 0.108)).toBeLessThan(1e-15);
	});
});

/** Meshes until tooth 0 meets tooth 0 again, and how many partners tooth 0 had by then. */
function counts(teeth1: number, teeth2: number): {meshes: number; partners: number} {
	const partners = new Set<number>();
	let meshes = 0;
	do {
		if (meshes % teeth1 === 0) partners.add(meshes % teeth2);
		meshes++;
	} while (meshes % teeth1 !== 0 || meshes % teeth2 !== 0);
	return {meshes, partners: partners.size};
}
