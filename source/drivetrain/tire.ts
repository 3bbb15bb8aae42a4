/** Rolling circumference, and engine speed from road speed and back. */
import {mphMps} from './constants.ts';

/** The speed at which `growth` is stated: 100 mph. */
export const growthReferenceMps = 100 * mphMps;

/**
 * The circumference that an axle rolls on in a straight line, m. A differential turns at the mean speed of its two wheels,
 * and a locked axle finds the same mean, so it is the harmonic mean of the two rollouts, between them. Both in m, above 0.
 */
export function harmonicRolloutM(leftM: number, rightM: number): number {
	return 2 / (1 / leftM + 1 / rightM);
}

/**
 * Rolling circumference at a road speed, m: C0·(1 + γ·(V/V_ref)²), V_ref = 100 mph. The growth is a centripetal effect,
 * hence the square. `rolloutM` is C0 at standstill, `growth` the fraction γ at V_ref (0: none).
 */
export function circumferenceM(rolloutM: number, growth: number, speedMps: number): number {
	return rolloutM * (1 + growth * (speedMps / growthReferenceMps) ** 2);
}

/**
 * Engine speed, rev/min: 60·V·(1 + κ)·R/C(V). `overall` is R, gear × pair × final drive; `slip` the slip ratio κ (SAE J670)
 * of the driven wheels, from 0 up: tread speed over road speed less 1.
 */
export function engineRpm(speedMps: number, overall: number, rolloutM: number, growth: number, slip: number): number {
	return (60 * speedMps * (1 + slip) * overall) / circumferenceM(rolloutM, growth, speedMps);
}

/**
 * Road speed at an engine speed, m/s: the exact inverse of `engineRpm` on its rising side, the smaller root of
 * n·C0·γ/V_ref²·V² − 60·(1 + κ)·R·V + n·C0 = 0 in the form that cancels nothing. Infinity where the tire grows so much
 * that no speed gives this RPM. Without growth it is linear.
 */
export function speedAtRpmMps(rpm: number, overall: number, rolloutM: number, growth: number, slip: number): number {
	const a = (rpm * rolloutM * growth) / growthReferenceMps ** 2;
	const b = 60 * (1 + slip) * overall;
	const c = rpm * rolloutM;
	const discriminant = b * b - 4 * a * c;
	return discriminant < 0 ? Number.POSITIVE_INFINITY : (2 * c) / (b + Math.sqrt(discriminant));
}
