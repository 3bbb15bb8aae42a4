/** Where along the lap the full-throttle runs lie: one place a straight as driven, and the place of each run. */
import {median} from '../fit/robust.ts';
import type {LapCut, Rhythm} from './lap-cuts.ts';
import type {Measured} from './passes.ts';

export type Places = {
	/** Of the lap, by the log. */
	readonly lapM: number;
	/** Where each place begins, as a share of the lap from wherever it is counted; rising. */
	readonly at: readonly number[];
	/** Index of the place of each run; -1: none. */
	readonly of: readonly number[];
	/** The share is counted from the line where the lap column counts up. */
	readonly fromLine: boolean;
};

/** How far a run may begin from its place, as a share of the lap, and of the distance to the next place. */
const farthest = 0.08;
const gapShare = 0.4;

export function placesByLaps(
	passes: readonly Measured[],
	laps: readonly LapCut[],
	distanceM: Float64Array,
): Places | undefined {
	const lengths = laps.map(({from, to}) => distanceM[to - 1]! - distanceM[from]!);
	const inner = laps.length > 2 ? lengths.slice(1, -1) : lengths;
	const lapM = median(inner);
	const lapOf = passes.map(pass => laps.findLastIndex(({from}) => from <= pass.from));
	const share = passes.map((pass, i) => {
		const lap = laps[lapOf[i]!]!;
		// The log may begin within the first lap: it is counted back from its end.
		const fromEnd = lapOf[i] === 0 && laps.length > 1;
		return fromEnd
			? 1 - (distanceM[lap.to - 1]! - pass.startM) / lapM
			: (pass.startM - distanceM[lap.from]!) / Math.max(lengths[lapOf[i]!]!, 0.9 * lapM);
	});
	const counts = laps.map((_, lap) => lapOf.filter(of => of === lap).length);
	const runs = mostFrequent(counts.filter(count => count > 0));
	if (runs === undefined) return undefined;
	const typical = laps.flatMap((_, lap) => (counts[lap] === runs ? [lapOf.indexOf(lap)] : []));
	const at = Array.from({length: runs}, (_, j) => median(typical.map(first => share[first + j]!)));
	return {lapM, at, of: share.map(x => placeOf(at, x)), fromLine: true};
}

/** Without laps: from run to run, by the distance between their exits, so that an error in distance does not add up. */
export function placesByRhythm(passes: readonly Measured[], {runs, lapM}: Rhythm): Places | undefined {
	const start = passes.findIndex((pass, i) => {
		const next = passes[i + runs];
		return next !== undefined && Math.abs((next.startM - pass.startM) / lapM - 1) < 0.02;
	});
	if (start < 0) return undefined;
	const at = passes.slice(start, start + runs).map(pass => (pass.startM - passes[start]!.startM) / lapM);
	const of = new Array<number>(passes.length).fill(-1);
	for (const way of [1, -1]) {
		const onward = way === 1 ? passes.slice(start) : passes.slice(0, start + 1).reverse();
		const shares = onward.map(pass => (pass.startM - passes[start]!.startM) / lapM);
		for (const [i, place] of follow(at, shares, runs).entries()) of[start + way * i] = place;
	}
	return {lapM, at, of, fromLine: false};
}

/**
 * The place of each run in turn. What the distance has gone wrong by is taken up at each place, so that it does not add up.
 * A run that finds no place, as after laps in the pits, starts afresh from the nearest from which the next ones find theirs.
 */
function follow(at: readonly number[], shares: readonly number[], runs: number): number[] {
	let wrong = 0;
	const offBy = (i: number, place: number) => shares[i]! - at[place]! - Math.round(shares[i]! - at[place]! - wrong);
	const fits = (i: number, shift: number) => placeOf(at, shares[i]! - shift) >= 0;
	return shares.map((share, i) => {
		const place = placeOf(at, share - wrong);
		if (place >= 0) {
			wrong = offBy(i, place);
			return place;
		}
		const next = shares.slice(i, i + runs + 1).map((_, j) => i + j);
		const fresh = at
			.map((_, j) => ({place: j, off: offBy(i, j)}))
			.filter(({off}) => next.length > runs && next.every(j => fits(j, off)))
			.sort((one, other) => Math.abs(one.off - wrong) - Math.abs(other.off - wrong))[0];
		if (fresh === undefined) return -1;
		wrong = fresh.off;
		return fresh.place;
	});
}

function placeOf(at: readonly number[], share: number): number {
	const off = at.map(place => Math.abs(share - place - Math.round(share - place)));
	const best = off.indexOf(Math.min(...off));
	return off[best]! <= Math.min(farthest, gapShare * gapBeside(at)) ? best : -1;
}

/** The least distance between two places around the lap. */
function gapBeside(at: readonly number[]): number {
	if (at.length === 1) return 1;
	return Math.min(...at.map((place, i) => (i === 0 ? place + 1 - at.at(-1)! : place - at[i - 1]!)));
}

function mostFrequent(values: readonly number[]): number | undefined {
	const counts = new Map<number, number>();
	for (const value of values) counts.set(value, (counts.get(value) ?? 0) + 1);
	const order = [...counts].sort(([one, many], [other, few]) => few - many || other - one);
	return order[0]?.[0];
}
