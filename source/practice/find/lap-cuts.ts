/** Where laps begin and end: by the log's column, else by the repeating full-throttle runs. */
import {median} from '../fit/robust.ts';
import type {Channels} from './channels.ts';
import type {Measured} from './passes.ts';
import type {Steps} from './steps.ts';

/** Samples from `from` up to but not including `to`. */
export type LapCut = {readonly number: number; readonly from: number; readonly to: number};

/** A lap shorter than this is a stray entry of the column. */
const shortestLapS = 5;

/** By the lap column; undefined where there is none, or it never changes. */
export function* lapsByColumn({run: {lap, timeS, samples}, pace}: Channels): Steps<LapCut[] | undefined> {
	if (lap === null) return undefined;
	const cuts: LapCut[] = [];
	let from = 0;
	let number = Number.NaN;
	for (let i = 0; i <= samples; i++) {
		if (pace.isDue()) yield;
		const read = i < samples ? lap[i]! : Number.NaN;
		if (i < samples && (Number.isNaN(read) || read === number)) continue;
		if (!Number.isNaN(number)) cuts.push({number, from, to: i});
		if (!Number.isNaN(number)) from = i;
		number = read;
	}
	const whole = joinShort(cuts, timeS);
	return whole.length < 2 ? undefined : whole;
}

/** Strays of the column join the lap before them. */
function joinShort(cuts: readonly LapCut[], timeS: Float64Array): LapCut[] {
	const whole: LapCut[] = [];
	for (const cut of cuts) {
		const last = whole.at(-1);
		const short = timeS[cut.to - 1]! - timeS[cut.from]! < shortestLapS;
		if (last !== undefined && (short || last.number === cut.number)) whole[whole.length - 1] = {...last, to: cut.to};
		else whole.push(cut);
	}
	return whole;
}

/** Runs that repeat: how many a lap, and its length. */
export type Rhythm = {readonly runs: number; readonly lapM: number};

const mostRuns = 16;
/** Laps of one length are this alike, as a share. */
const alike = 0.02;
/** The known length and that of the log: speed that is off by some per cent makes distance so. */
export const lapTolerance = 0.06;

/**
 * How many full-throttle runs make a lap, where no column tells: the smallest number after which the distance from exit to
 * exit comes back, again and again. A known length of the lap decides where it is given.
 */
export function rhythmOf(passes: readonly Measured[], lapM: number | undefined): Rhythm | undefined {
	const found: (Rhythm & {readonly spread: number})[] = [];
	for (let runs = 1; runs <= Math.min(mostRuns, passes.length - 1); runs++) {
		const lengths = passes.slice(runs).map((pass, i) => pass.startM - passes[i]!.startM);
		const middle = median(lengths);
		const near = lengths.filter(length => Math.abs(length / middle - 1) <= alike).length / lengths.length;
		const known = lapM === undefined || Math.abs(middle / lapM - 1) <= lapTolerance;
		if (known && near >= 0.5) found.push({runs, lapM: middle, spread: 1 - near});
	}
	return found.reduce<(typeof found)[number] | undefined>(
		(best, one) => (best === undefined || one.spread < best.spread - 0.1 ? one : best),
		undefined,
	);
}

/** Laps that begin where these passes do; what lies before the first and after the last are laps of their own. */
export function lapsByPasses(starts: readonly Measured[], samples: number): LapCut[] {
	const from = starts.map(pass => pass.from);
	const edges = [...(from[0] === 0 ? [] : [0]), ...from, samples];
	return edges.slice(1).map((to, i) => ({number: i + 1, from: edges[i]!, to}));
}

/** Laps of the known length, from the first exit on. */
export function* lapsByLength(
	{run: {distanceM, samples}, pace}: Channels,
	startM: number,
	lapM: number,
): Steps<LapCut[]> {
	const edges = [0];
	let nextM = startM;
	for (let i = 1; i < samples; i++) {
		if (pace.isDue()) yield;
		if (distanceM[i]! < nextM) continue;
		if (distanceM[i]! > 0) edges.push(i);
		nextM += lapM;
	}
	return [...edges, samples].slice(1).map((to, i) => ({number: i + 1, from: edges[i]!, to}));
}
