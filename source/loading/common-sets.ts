/** One set for several tracks: the least lap times added up, with the best pair at each. */
import type {Built} from './best-sets.ts';
import type {TrackSets} from './track-sets.ts';

export type Common = {
	readonly set: number;
	readonly totalS: number;
	/** The same, with a fine for every track where it fails a check. */
	readonly costS: number;
	/** One a track. */
	readonly built: readonly Built[];
};

/** A set that fails a check somewhere comes after every set that fails none: a lap takes less time than this. */
const failS = 1e6;

/**
 * The first `count` sets by their least laps with the pairs that fail no check, added up over the tracks. A set's sum without
 * looking at the checks is a bound below: sets are looked at in the order of their bounds, each gets its true sum, and the
 * first is settled when no bound is below it. So the order is exact, though few sets are checked in full.
 */
export function commonSets(tracks: readonly TrackSets[], changesOf: (set: number) => number, count: number): Common[] {
	const [first] = tracks;
	if (first === undefined) return [];
	const bounds = first.sets.map((_, set) => tracks.reduce((sum, track) => sum + boundS(track, set), 0));
	const open = bounds
		.map((boundS, set) => ({boundS, set}))
		.filter(({boundS}) => Number.isFinite(boundS))
		.sort((one, other) => one.boundS - other.boundS || changesOf(one.set) - changesOf(other.set));
	const checked: Common[] = [];
	for (const {boundS, set} of open) {
		if (settled(checked, boundS, changesOf, count)) break;
		const built = tracks.flatMap(track => bestPair(track, set) ?? []);
		const laps = built.map(({row}) => row.fastestS ?? Number.POSITIVE_INFINITY);
		const totalS = laps.reduce((sum, lapS) => sum + lapS, 0);
		const fails = built.filter(({row}) => row.verdict === 'fail').length;
		checked.push({set, totalS, costS: totalS + fails * failS, built});
	}
	return ordered(checked, changesOf).slice(0, count);
}

function ordered(checked: readonly Common[], changesOf: (set: number) => number): Common[] {
	return checked.toSorted((one, other) => one.costS - other.costS || changesOf(one.set) - changesOf(other.set));
}

/** Whether nothing from a bound on can come among the first. */
function settled(
	checked: readonly Common[],
	boundS: number,
	changesOf: (set: number) => number,
	count: number,
): boolean {
	const last = ordered(checked, changesOf)[count - 1];
	return last !== undefined && last.costS < boundS;
}

/** The least lap of a set that is not known to fail; with a fine where every pair is, and infinite where no pair comes round. */
function boundS(track: TrackSets, set: number): number {
	const least = (passing: boolean) =>
		track.pairs.reduce((best, _, pair) => Math.min(best, track.lapS({set, pair}, passing)), Number.POSITIVE_INFINITY);
	const passing = least(true);
	return Number.isFinite(passing) ? passing : failS + least(false);
}

/** The fastest pair that fails no check; else the fastest. */
function bestPair(track: TrackSets, set: number): Built | undefined {
	const inOrder = (passing: boolean) =>
		track.pairs
			.map((_, pair) => ({set, pair}))
			.filter(choice => Number.isFinite(track.lapS(choice, passing)))
			.sort((one, other) => track.lapS(one, false) - track.lapS(other, false));
	for (const choice of inOrder(true)) {
		const row = track.row(choice);
		if (row.verdict !== 'fail') return {...choice, row};
	}
	const [fastest] = inOrder(false);
	return fastest && {...fastest, row: track.row(fastest)};
}
