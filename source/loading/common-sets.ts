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
 * The first `count` sets by their least laps with the pairs that fail no check, added up over the tracks. Of sets with the same
 * sum, which differ in gears that nothing is gained or lost with, the one with the fewest gears to change is told. A set's sum
 * without looking at the checks is a bound below: sets are looked at in the order of their bounds, each gets its true sum,
 * until no bound is below the last one to be told. So the order is exact, though few sets are checked in full.
 */
export function commonSets(tracks: readonly TrackSets[], changesOf: (set: number) => number, count: number): Common[] {
	const [first] = tracks;
	if (first === undefined) return [];
	const open = first.sets
		.map((_, set) => ({set, boundS: tracks.reduce((sum, track) => sum + boundS(track, set), 0)}))
		.filter(({boundS}) => Number.isFinite(boundS))
		.sort((one, other) => one.boundS - other.boundS || changesOf(one.set) - changesOf(other.set));
	let best: readonly Common[] = [];
	for (const {boundS, set} of open) {
		const last = best[count - 1];
		if (last !== undefined && last.costS * (1 + sameSum) < boundS) break;
		best = withSet(best, commonOf(tracks, set), changesOf).slice(0, count);
	}
	return [...best];
}

/** Sums of the same laps differ only by the order of adding. */
const sameSum = 1e-9;
const isSame = (one: Common, other: Common): boolean => Math.abs(one.costS - other.costS) <= sameSum * one.costS;

function commonOf(tracks: readonly TrackSets[], set: number): Common {
	const built = tracks.flatMap(track => bestPair(track, set) ?? []);
	const laps = built.map(({row}) => row.fastestS ?? Number.POSITIVE_INFINITY);
	const totalS = laps.reduce((sum, lapS) => sum + lapS, 0);
	const fails = built.filter(({row}) => row.verdict === 'fail').length;
	return {set, totalS, costS: totalS + fails * failS, built};
}

/** The list in order, with a set where it belongs, and one set for each sum. */
function withSet(list: readonly Common[], one: Common, changesOf: (set: number) => number): Common[] {
	const same = list.find(other => isSame(one, other));
	if (same !== undefined && changesOf(same.set) <= changesOf(one.set)) return [...list];
	return [...list.filter(other => other !== same), one].sort((a, b) => a.costS - b.costS);
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
