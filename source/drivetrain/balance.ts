/** Where on the way between two speeds the acceleration falls to 0. */
import {brentRoot} from './brent.ts';
import type {Motion} from './quadrature.ts';

/** In so many steps a piece is looked through for a speed at which the acceleration is 0. */
const looks = 16;

/** What the acceleration is at the very start does not count: the car may have settled there. Part of the piece. */
const justAfter = 1e-6;

/** The first speed on the way at which the acceleration is 0 or changes sign; undefined where it does neither. */
export function balancedBefore(motion: Motion, fromMps: number, toMps: number): number | undefined {
	const acceleration = (speedMps: number) => motion.acceleration(speedMps);
	const at = (share: number) => fromMps + share * (toMps - fromMps);
	const positive = acceleration(at(justAfter)) > 0;
	for (let i = 1; i <= looks; i++) {
		if (acceleration(at(i / looks)) > 0 === positive) continue;
		const before = i === 1 ? at(justAfter) : at((i - 1) / looks);
		return brentRoot(acceleration, before, at(i / looks)) ?? before;
	}
	return undefined;
}
