import fc from 'fast-check';
import {expect, test} from 'vitest';
import {standardAltitudeM, standardPressurePa, stationPressurePa} from '../../source/drivetrain/standard-atmosphere.ts';
import {relativeError} from '../close.ts';
import {runs} from '../runs.ts';

// Published: ASHRAE Fundamentals 2017, ch. 1, table 1, to the pascal, through psychrolib's test suite.
test.each([
	[-500, 107_478],
	[0, 101_325],
	[500, 95_461],
	[1000, 89_875],
	[4000, 61_640],
	[10_000, 26_436],
])("at %d m is ASHRAE's %d Pa", (altitudeM, pascals) => {
	expect(Math.round(standardPressurePa(altitudeM))).toBe(pascals);
});

// Recomputed from ISO 2533:1975.
test.each([
	[-500, 107_477.51],
	[500, 95_460.84],
	[1000, 89_874.57],
	[1609.344, 83_427.59],
	[2000, 79_495.22],
	[3000, 70_108.54],
	[5000, 54_019.91],
	[11_000, 22_632.06],
])('at %f m is %f Pa, and back', (altitudeM, pascals) => {
	expect(relativeError(standardPressurePa(altitudeM), pascals)).toBeLessThan(2e-6);
	expect(Math.abs(standardAltitudeM(pascals) - altitudeM)).toBeLessThan(0.01);
});

test('an altimeter set to standard shows the standard atmosphere, and at sea level the setting is the pressure', () => {
	expect(relativeError(stationPressurePa(101_325, 1000), 89_874.57)).toBeLessThan(2e-6);
	expect(stationPressurePa(98_765, 0)).toBeCloseTo(98_765, 8);
});

// From memory: the closed form of the Smithsonian tables that weather services use, in hPa and m:
// (A^0.190284 − 8.4228807e-5·H)^(1/0.190284). The constant 0.3 hPa that they add to it is no part of an altimeter's scale.
test('station pressure agrees with the weather service form', () => {
	for (const [settingHpa, elevationM] of [
		[1013.25, 300],
		[995, 300],
		[1030, 1600],
		[1005, -50],
	] as const) {
		const other = (settingHpa ** 0.190284 - 8.4228807e-5 * elevationM) ** (1 / 0.190284);
		expect(Math.abs(stationPressurePa(100 * settingHpa, elevationM) / 100 - other)).toBeLessThan(0.08);
	}
});

test('altitude is the inverse of pressure', () => {
	fc.assert(
		fc.property(fc.double({min: -1000, max: 11_000, noNaN: true}), altitudeM => {
			expect(Math.abs(standardAltitudeM(standardPressurePa(altitudeM)) - altitudeM)).toBeLessThan(1e-8);
		}),
		{numRuns: runs(100, 10_000)},
	);
});
