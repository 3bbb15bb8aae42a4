/** What of a lap is known: its straights, and how long its corners are. */
import type {Track} from '../drivetrain/track.ts';
import {listed} from '../planning/words.ts';

export type LapParts = {
	/** Of each corner, 0 where the straights make the whole lap; undefined where the corners are left out. */
	readonly cornerM: number | undefined;
	/** Of all that is told of; undefined where parts of the lap are left out. */
	readonly lapM: number | undefined;
	/** What is left out, and why; empty where nothing is. */
	readonly leftOut: readonly string[];
};

/**
 * The lap less its straights, in equal parts over the corners: one before each straight, of which a flat-out track has all
 * but nothing left. Straights that are together longer than the lap leave no corners. Without the lap's length, or a
 * straight's, the corners are left out.
 */
export function lapParts({lapM, straights}: Track): LapParts {
	const without = straights.filter(({lengthM}) => lengthM === undefined).map(({name}) => name);
	if (without.length > 0) {
		const what = `${listed(without)} ${without.length === 1 ? 'has' : 'have'} no length`;
		return {cornerM: undefined, lapM: undefined, leftOut: [`${what}: left out, and the corners too.`]};
	}
	if (lapM === undefined) {
		return {cornerM: undefined, lapM: undefined, leftOut: ['The track has no "lap": its corners are left out.']};
	}
	const straightsM = straights.reduce((sum, {lengthM}) => sum + lengthM!, 0);
	const leftM = Math.max(0, lapM - straightsM);
	return {cornerM: leftM / straights.length, lapM: straightsM + leftM, leftOut: []};
}
