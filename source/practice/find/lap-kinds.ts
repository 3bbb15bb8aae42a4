/** Which laps count, and why the others do not. */
import type {Track} from '../../drivetrain/track.ts';
import {lengthText, speedText} from '../../planning/words.ts';
import {median} from '../fit/robust.ts';
import type {Channels} from './channels.ts';
import type {Lap, LapKind} from './findings.ts';
import type {LapCut} from './lap-cuts.ts';
import {highestIn} from './passes.ts';
import type {Steps} from './steps.ts';

/** A lap and how many full-throttle runs began in it. */
export type CutLap = LapCut & {readonly runs: number};

/** Of the usual lowest speed of a lap: no one drives so slowly but in the pits. */
const pitShare = 0.6;
/** Of the usual highest speed, time and length of a lap. */
const paceShare = 0.9;
const slowShare = 1.07;
const partShare = 0.95;
/** A hole in time longer than this breaks a lap. */
const longestHoleS = 1.5;

export function* lapsOf(channels: Channels, track: Track, cuts: readonly CutLap[]): Steps<Lap[]> {
	const seen: Look[] = [];
	for (const cut of cuts) seen.push(yield* look(channels, cut));
	const fast = seen.filter(lap => lap.highestMps >= median(seen.map(({highestMps}) => highestMps)));
	const inner = fast.filter(lap => lap.cut.from > 0 && lap.cut.to < channels.run.samples);
	const whole = inner.length > 0 ? inner : fast;
	const usual: Usual = {
		timeS: median(whole.map(({timeS}) => timeS)),
		lengthM: median(whole.map(({lengthM}) => lengthM)),
		lowestMps: median(whole.map(({lowestMps}) => lowestMps)),
		highestMps: median(whole.map(({highestMps}) => highestMps)),
		runs: median(whole.map(({cut}) => cut.runs)),
		pitMps: track.pitRoad === undefined ? undefined : track.pitRoad.limitMps + track.pitRoad.toleranceMps,
		alone: seen.length === 1,
		lapM: track.lapM,
	};
	return seen.map(lap => {
		const [kind, why] = kindOf(lap, usual, channels.run.samples);
		const {cut, timeS, lengthM, highestMps} = lap;
		return {number: cut.number, kind, why, from: cut.from, to: cut.to, timeS, lengthM, highestMps};
	});
}

type Look = {
	readonly cut: CutLap;
	readonly timeS: number;
	readonly lengthM: number;
	readonly lowestMps: number;
	/** Where it was slowest, as a share of the lap's time. */
	readonly lowestAt: number;
	readonly highestMps: number;
	readonly holeS: number;
};

type Usual = Pick<Look, 'timeS' | 'lengthM' | 'lowestMps' | 'highestMps'> & {
	readonly runs: number;
	readonly pitMps: number | undefined;
	readonly alone: boolean;
	readonly lapM: number | undefined;
};

function* look({run, smoothMps, pace}: Channels, cut: CutLap): Steps<Look> {
	const last = Math.min(cut.to, run.samples - 1);
	let [lowest, hole] = [cut.from, 0];
	for (let i = cut.from; i < cut.to; i++) {
		if (pace.isDue()) yield;
		if (smoothMps[i]! < smoothMps[lowest]!) lowest = i;
		if (i > cut.from) hole = Math.max(hole, run.timeS[i]! - run.timeS[i - 1]!);
	}
	const timeS = run.timeS[last]! - run.timeS[cut.from]!;
	return {
		cut,
		timeS,
		lengthM: run.distanceM[last]! - run.distanceM[cut.from]!,
		lowestMps: smoothMps[lowest]!,
		lowestAt: (run.timeS[lowest]! - run.timeS[cut.from]!) / timeS,
		highestMps: yield* highestIn(smoothMps, cut.from, cut.to - 1, pace),
		holeS: hole,
	};
}

function kindOf(lap: Look, usual: Usual, samples: number): [LapKind, string] {
	const pitMps = Math.min(usual.pitMps ?? Number.POSITIVE_INFINITY, pitShare * usual.lowestMps);
	const isEdge = lap.cut.from === 0 || lap.cut.to === samples;
	if (lap.holeS > longestHoleS) return ['part', `the log has a hole of ${lap.holeS.toFixed(1)} s`];
	if (usual.alone) return lap.cut.runs > 0 ? ['good', ''] : ['slow', 'never at full throttle'];
	if (lap.lowestMps <= pitMps && lap.lowestAt < 0.5) return ['out', `starts at ${speedText(lap.lowestMps)}`];
	if (lap.lowestMps <= pitMps) return ['in', `slows to ${speedText(lap.lowestMps)}`];
	if (isEdge && lap.lengthM < partShare * usual.lengthM) {
		return ['part', `the log has ${lengthText(lap.lengthM)} of it`];
	}
	if (lap.highestMps < paceShare * usual.highestMps) return ['pace', `never above ${speedText(lap.highestMps)}`];
	if (lap.timeS > slowShare * usual.timeS)
		return ['slow', `${(lap.timeS - usual.timeS).toFixed(1)} s slower than usual`];
	if (lap.cut.runs !== usual.runs) return ['slow', `${lap.cut.runs} full-throttle runs, not the usual ${usual.runs}`];
	return ['good', ''];
}
