/** Standard errors of few groups. */

/** The normal distribution's 97.5 % point. */
const z = 1.959963984540054;

/**
 * Student's 97.5 % point for so many degrees of freedom ÷ the normal distribution's, by the expansion in 1/ν (Fisher &
 * Cornish, 1960; Abramowitz & Stegun 26.7.5): a standard error times this covers with two of itself what it should, where it
 * rests on few groups. Within 1 % from 3 degrees on; infinite below 1.
 */
export function fewGroupsFactor(degrees: number): number {
	if (degrees < 1) return Number.POSITIVE_INFINITY;
	if (degrees < exactPoints.length + 1) return exactPoints[degrees - 1]! / z;
	const terms = [
		(z ** 3 + z) / 4,
		(5 * z ** 5 + 16 * z ** 3 + 3 * z) / 96,
		(3 * z ** 7 + 19 * z ** 5 + 17 * z ** 3 - 15 * z) / 384,
	];
	return terms.reduce((sum, term, i) => sum + term / degrees ** (i + 1), z) / z;
}

/** Student's 97.5 % points for 1 and 2 degrees of freedom: tan(0.475 π), and 0.95·√(2/(1 − 0.95²)). */
const exactPoints = [Math.tan(0.475 * Math.PI), 0.95 * Math.sqrt(2 / (1 - 0.95 ** 2))];
