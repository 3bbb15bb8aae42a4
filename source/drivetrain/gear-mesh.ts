/** How the teeth of two gears lie and meet. */

/**
 * Reference center distance of an external pair without profile shift, m: m_n·(z1 + z2)/(2·cos β) (ISO 21771). `moduleM` is
 * the normal module in m, `helixRad` the helix angle β, 0 for spur gears.
 */
export function centerDistanceM(moduleM: number, toothSum: number, helixRad = 0): number {
	return (moduleM * toothSum) / (2 * Math.cos(helixRad));
}

/** Greatest common divisor of two whole numbers above 0 (Euclid). */
export function commonDivisor(one: number, other: number): number {
	let [a, b] = [one, other];
	while (b > 0) [a, b] = [b, a % b];
	return a;
}

/** Hunting tooth: every tooth of one gear meets every tooth of the other before the pattern repeats. */
export function isHunting(teeth1: number, teeth2: number): boolean {
	return commonDivisor(teeth1, teeth2) === 1;
}

/** Turns of gear 1 until a given pair of teeth meets again: z2/gcd(z1, z2). */
export function turnsUntilMeeting(teeth1: number, teeth2: number): number {
	return teeth2 / commonDivisor(teeth1, teeth2);
}
