/** How far a pair races at the tracks that it is the best for. */
import type {RankedTrack, ServedNeed} from './load-needs.ts';

/** The tracks that a pair stands for the best at, each once. */
export function tracksOf(needs: readonly ServedNeed[], pair: string): RankedTrack[] {
	return [...new Set(needs.filter(({way}) => way.row.pair === pair).map(({track}) => track))];
}

/** Their races together, m, as far as the lengths are known; undefined where none is. */
export function raceM(needs: readonly ServedNeed[], pair: string): number | undefined {
	const known = tracksOf(needs, pair).flatMap(track => track.raceM ?? []);
	return known.length === 0 ? undefined : known.reduce((sum, lengthM) => sum + lengthM, 0);
}
