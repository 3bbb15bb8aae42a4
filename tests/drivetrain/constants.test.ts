import {expect, test} from 'vitest';
import {
	celsiusZeroK,
	inchM,
	inchOfMercuryPa,
	mileM,
	mphMps,
	standardGravityMps2,
} from '../../source/drivetrain/constants.ts';
import {growthReferenceMps} from '../../source/drivetrain/tire.ts';
import {relativeError} from '../close.ts';

// Recomputed with GNU units 2.22; exact by definition unless said otherwise.
test('lengths and speeds are their definitions', () => {
	expect(mileM).toBe(1609.344);
	expect(63360 * inchM).toBeCloseTo(mileM, 11);
	expect(relativeError(60 * mphMps, 26.8224)).toBeLessThan(1e-15);
	expect(relativeError(growthReferenceMps, 44.704)).toBeLessThan(1e-15);
});

test('gravity, the ice point and the conventional inch of mercury are their definitions', () => {
	expect(standardGravityMps2).toBe(9.80665);
	expect(celsiusZeroK).toBe(273.15);
	// GNU units prints 3386.38864 Pa, from 760 mmHg = 101325 Pa; js-quantities 1.8.0 gives 29.92 inHg = 101320.733 Pa.
	expect(relativeError(inchOfMercuryPa, 3386.38864)).toBeLessThan(2e-7);
	expect(relativeError(29.92 * inchOfMercuryPa, 101_320.733)).toBeLessThan(5e-7);
});
