/** From the rankings of the tracks to what the truck needs: for each track the ways in which pairs can serve it. */
import type {Track} from '../drivetrain/track.ts';
import type {Ranking, Row} from '../planning/results.ts';
import type {LoadOptions} from './load-results.ts';
import {stepsFrom} from './steps.ts';
import {isUsable} from './usable.ts';

export type RankedTrack = {
	readonly name: string;
	readonly ranking: Ranking;
	/** The race's length; undefined where the track does not say lap and laps. */
	readonly raceM: number | undefined;
};

export function rankedTrack(name: string, {lapM, laps}: Track, ranking: Ranking): RankedTrack {
	return {name, ranking, raceM: lapM === undefined || laps === undefined ? undefined : lapM * laps};
}

/** A pair that stands for the best of a track, with its steps: of each step one pair must be there. */
export type PairWay = {
	readonly row: Row;
	/** A lap's time more than the best's; 0 without times. */
	readonly lossS: number;
	readonly shorter: readonly (readonly Row[])[];
	readonly taller: readonly (readonly Row[])[];
};

export type TrackNeed = {
	readonly track: RankedTrack;
	/** Rows that could be mounted, best first. */
	readonly usable: readonly Row[];
	readonly best: Row;
	/** The best's own way first. */
	readonly ways: readonly PairWay[];
};

/** A need with the way in which the list serves it. */
export type ServedNeed = TrackNeed & {readonly way: PairWay};

/** One need a track, or one a track and set; none for a track where no row can be mounted. */
export function needsOf(tracks: readonly RankedTrack[], options: LoadOptions, withinS: number): TrackNeed[] {
	return tracks.flatMap(track => {
		const usable = track.ranking.rows.filter(
			row => isUsable(row) && (options.gearbox === undefined || row.gearbox === options.gearbox),
		);
		const sets = options.eachSet ? [...new Set(usable.map(({gearbox}) => gearbox))] : [undefined];
		return sets.flatMap(set => {
			const rows = usable.filter(({gearbox}) => set === undefined || gearbox === set);
			return rows.length === 0 ? [] : [needOf(track, rows, options, withinS)];
		});
	});
}

/**
 * The best is the first usable row of the ranking. Whatever fails a check where the best fails none does not stand for it, nor
 * what has fewer steps beside it than the best has: a pair at the end of the rack would need the fewest.
 */
function needOf(track: RankedTrack, usable: readonly Row[], options: LoadOptions, withinS: number): TrackNeed {
	const best = usable[0]!;
	const standIns = usable.filter(row => row === best || standsFor(row, best, withinS));
	const ways = oneWayEach(standIns).map(row => wayOf(row, best, usable, options));
	const [first] = ways;
	const full = ways.filter(
		({shorter, taller}) => shorter.length >= first!.shorter.length && taller.length >= first!.taller.length,
	);
	return {track, usable, best, ways: full};
}

function standsFor(row: Row, best: Row, withinS: number): boolean {
	if ((row.verdict === 'fail') !== (best.verdict === 'fail')) return false;
	if (row.fastestS === null || best.fastestS === null) return row.pairRatio === best.pairRatio;
	return row.fastestS - best.fastestS <= withinS;
}

/** A pair that stands for the best with several sets does so with the one that comes first. */
function oneWayEach(rows: readonly Row[]): Row[] {
	return rows.filter((row, i) => rows.findIndex(({pair}) => pair === row.pair) === i);
}

function wayOf(row: Row, best: Row, usable: readonly Row[], {shorter, taller, stepRatio}: LoadOptions): PairWay {
	const sameSet = usable.filter(({gearbox}) => gearbox === row.gearbox);
	return {
		row,
		lossS: (row.fastestS ?? 0) - (best.fastestS ?? 0),
		shorter: stepsFrom(sameSet, row.pairRatio, 'shorter', stepRatio, shorter),
		taller: stepsFrom(sameSet, row.pairRatio, 'taller', stepRatio, taller),
	};
}
