/** The full-throttle runs laid on laps and on the track's straights, and which of them count. */

import type {LoggedRun} from '../../logs/logged-run.ts';
import type {Plan} from '../../planning/plan.ts';
import {median} from '../fit/robust.ts';
import type {Channels} from './channels.ts';
import type {Findings, Lap, Matching, Pass} from './findings.ts';
import {type LapCut, lapsByColumn, lapsByLength, lapsByPasses, rhythmOf} from './lap-cuts.ts';
import {lapsOf} from './lap-kinds.ts';
import {type Match, matchStraights} from './match-straights.ts';
import type {Measured} from './passes.ts';
import {type Places, placesByLaps, placesByRhythm} from './places.ts';
import type {Steps} from './steps.ts';

export type LaidOut = {
	readonly laps: readonly Lap[];
	readonly lapsFrom: Findings['lapsFrom'];
	readonly matching: Matching;
	/** Of each run: its lap, its straight, whether it counts. */
	readonly runs: readonly Pick<Pass, 'lap' | 'straight' | 'good'>[];
};

export function* layOut(channels: Channels, plan: Plan, runs: readonly Measured[]): Steps<LaidOut> {
	const {cuts, lapsFrom, where, match} = yield* cutAndMatch(channels, plan, runs);
	const lapOf = runs.map(pass => cuts.findLastIndex(cut => cut.from <= pass.from));
	const counted = cuts.map((cut, i) => ({...cut, runs: lapOf.filter(lap => lap === i).length}));
	const laps = yield* lapsOf(channels, plan.track, counted);
	const straightOf = runs.map((_, i) => match?.straightAt[where?.of[i] ?? -1]);
	const matching = {
		matched: match?.matched ?? false,
		runsPerLap: where?.at.length,
		lapM: where?.lapM,
		why: match?.why ?? 'The full-throttle runs of the log do not repeat, so they are not laid on straights.',
	};
	return {laps, lapsFrom, matching, runs: judged(channels, runs, lapOf, straightOf, laps)};
}

type Cut = {
	readonly cuts: readonly LapCut[];
	readonly lapsFrom: Findings['lapsFrom'];
	readonly where: Places | undefined;
	readonly match: Match | undefined;
};

function* cutAndMatch(channels: Channels, {track}: Plan, runs: readonly Measured[]): Steps<Cut> {
	const {run, rateHz} = channels;
	const byColumn = yield* lapsByColumn(channels);
	const all: LapCut[] = run.samples === 0 ? [] : [{number: 1, from: 0, to: run.samples}];
	if (runs.length === 0) {
		return {cuts: byColumn ?? all, lapsFrom: byColumn ? 'column' : 'none', where: undefined, match: undefined};
	}
	const rhythm = byColumn === undefined ? rhythmOf(runs, track.lapM) : undefined;
	const repeating = byColumn ? placesByLaps(runs, byColumn, run.distanceM) : rhythm && placesByRhythm(runs, rhythm);
	const where = repeating ?? inOrder(run, runs);
	const match = matchStraights(track, where, runs, rateHz);
	if (byColumn !== undefined) return {cuts: byColumn, lapsFrom: 'column', where, match};
	if (repeating === undefined) return {cuts: all, lapsFrom: 'none', where, match};
	const first = firstPlace(match);
	const starts = runs.filter((_, i) => where.of[i] === first);
	if (starts.length > 1) return {cuts: lapsByPasses(starts, run.samples), lapsFrom: 'straights', where, match};
	const cuts = yield* lapsByLength(channels, runs[0]!.startM, where.lapM);
	return {cuts, lapsFrom: 'length', where, match};
}

/** A log of one lap or less: its runs as they come. */
function inOrder(run: LoggedRun, runs: readonly Measured[]): Places {
	const lapM = run.distanceM.at(-1)!;
	return {lapM, at: runs.map(pass => pass.startM / lapM), of: runs.map((_, i) => i), fromLine: false};
}

/** The place of the first straight that was found. */
function firstPlace({straightAt}: Match): number {
	const found = straightAt.filter(straight => straight !== undefined);
	return found.length === 0 ? 0 : straightAt.indexOf(Math.min(...found));
}

/**
 * A run whose length is off by more than this from the others on its straight, and by more than a sample at each end, was cut
 * short, or into.
 */
const lengthShare = 0.12;

function judged(
	{run: {samples}, rateHz}: Channels,
	runs: readonly Measured[],
	lapOf: readonly number[],
	straightOf: readonly (number | undefined)[],
	laps: readonly Lap[],
): LaidOut['runs'] {
	const onGood = runs.map((pass, i) => laps[lapOf[i]!]?.kind === 'good' && pass.from > 0 && pass.to < samples - 1);
	const usualM = new Map<number, number>();
	for (const straight of new Set(straightOf)) {
		if (straight === undefined) continue;
		usualM.set(
			straight,
			median(runs.filter((_, i) => onGood[i] && straightOf[i] === straight).map(pass => pass.lengthM)),
		);
	}
	return runs.map((pass, i) => {
		const straight = straightOf[i];
		const usual = straight === undefined ? Number.NaN : usualM.get(straight)!;
		const sampleM = pass.lengthM / pass.timeS / rateHz;
		const good = onGood[i]! && Math.abs(pass.lengthM - usual) <= lengthShare * usual + sampleM;
		return {lap: lapOf[i]!, straight, good};
	});
}
