import fc from 'fast-check';
import {describe, expect, test} from 'vitest';
import {
	flipped,
	handTurns,
	overallRatios,
	pairName,
	pairRatio,
	parsePair,
	samePair,
	toothSum,
} from '../../source/drivetrain/gear-pair.ts';
import {relativeError} from '../close.ts';
import {runs} from '../runs.ts';

const teeth = fc.integer({min: 1, max: 200});
const anyPair = fc.record({driving: teeth, driven: teeth});

describe('a pair', () => {
	test('33/38 has 38 driven and 33 driving teeth, 71 in all, and turns the engine 38/33 times', () => {
		const pair = {driving: 33, driven: 38};
		expect(parsePair('33/38')).toEqual(pair);
		expect(parsePair(' 33 / 38 ')).toEqual(pair);
		expect(pairName(pair)).toBe('33/38');
		expect(toothSum(pair)).toBe(71);
		expect(pairRatio(pair)).toBe(38 / 33);
		expect(pairRatio(flipped(pair))).toBe(33 / 38);
	});

	test('what is not two tooth counts is undefined', () => {
		for (const text of ['', '33', '33/', '0/38', '33/0', '-33/38', '33.5/38', '33/38/2', '33:38', '1e2/38']) {
			expect(parsePair(text)).toBeUndefined();
		}
	});

	test('the name is read back as the pair', () => {
		fc.assert(
			fc.property(anyPair, pair => {
				expect(parsePair(pairName(pair))).toEqual(pair);
			}),
			{numRuns: runs(100, 5000)},
		);
	});

	test('flipped inverts the ratio exactly and keeps the tooth sum', () => {
		fc.assert(
			fc.property(anyPair, pair => {
				const other = flipped(pair);
				// In integers: (driven · driven') / (driving · driving') is 1.
				expect(pair.driven * other.driven).toBe(pair.driving * other.driving);
				expect(relativeError(pairRatio(pair) * pairRatio(other), 1)).toBeLessThan(3e-16);
				expect(toothSum(other)).toBe(toothSum(pair));
				expect(flipped(other)).toEqual(pair);
				expect(samePair(pair, other)).toBe(pair.driving === pair.driven);
			}),
			{numRuns: runs(100, 5000)},
		);
	});
});

describe('overall ratios', () => {
	// Published: Gillespie, Fundamentals of Vehicle Dynamics (SAE, 1992), p. 32: gears and a 2.92 final drive.
	test("are Gillespie's with an even pair", () => {
		const overall = overallRatios([4.28, 2.79, 1.83, 1.36, 1], {driving: 36, driven: 36}, 2.92);
		[12.4976, 8.1468, 5.3436, 3.9712, 2.92].forEach((expected, i) => {
			expect(relativeError(overall[i]!, expected)).toBeLessThan(1e-15);
		});
	});

	// Published: Khurmi & Gupta, Theory of Machines, Ex. 13.1: 975 rpm through 20/50, 25/75, 26/65 gives 52 rpm, ratio 18.75.
	test('multiply as a compound train does', () => {
		const [overall] = overallRatios([50 / 20], {driving: 25, driven: 75}, 65 / 26);
		expect(overall).toBe(18.75);
		expect(975 / overall!).toBe(52);
	});

	// Recomputed by hand: 2.9 · 38/33 · 3.25.
	test('grow by the pair ratio', () => {
		const overall = overallRatios([2.9, 1], {driving: 33, driven: 38}, 3.25);
		expect(relativeError(overall[0]!, 10.853030303030303)).toBeLessThan(1e-15);
		expect(relativeError(overall[1]!, 3.742424242424242)).toBeLessThan(1e-15);
	});
});

describe('turned by hand', () => {
	test('ten turns of both wheels give ten times the overall ratio, of one wheel half as many', () => {
		expect(handTurns(3.75, 10, 10)).toBe(37.5);
		expect(handTurns(3.75, 10, 0)).toBe(18.75);
		expect(handTurns(3.75, 10, -10)).toBe(0);
	});

	// Published: Khurmi & Gupta, Theory of Machines, Fig. 13.24 (12/60, 1000 rpm, one wheel 210, the other 190), and a
	// homework page (12/60, 1200 rpm, 250 and 230).
	test('the pinion turns as the mean of both wheels says', () => {
		expect(handTurns(60 / 12, 210, 190)).toBe(1000);
		expect(handTurns(60 / 12, 250, 230)).toBe(1200);
	});
});
