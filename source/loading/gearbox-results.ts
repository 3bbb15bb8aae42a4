/** What choosing gears for a box says: the shape that `--json` prints. SI; rpm is rev/min. */
import type {Check, Setting, Verdict} from '../planning/results.ts';

/** From a gear to the next one, shifted at the highest RPM that a shift is planned at. */
export type GearStep = {
	/** The gear left, counted from 1. */
	from: number;
	/** Its ratio ÷ the next one's. */
	step: number;
	rpm: number;
	/** In the next gear at the same road speed. */
	rpmAfter: number;
	/** That above the low end of the power band: how far the two gears overlap in it. */
	overBandRpm: number;
	/** Whether some straight or the restart is driven through this shift. */
	used: boolean;
};

/** A set with a pair at a track, run and checked as in a ranking. */
export type BuiltRow = {
	pair: string;
	/** Name of a set that is built, or the ratios. */
	gearbox: string;
	ratios: number[];
	fastestS: number | null;
	/** A lap more than the best of the track. */
	behindS: number | null;
	verdict: Verdict;
	/** Gears used on the straights, over the situations. */
	used: {lowest: number; highest: number} | null;
	/** Gears to change in the installed set; null without one of so many gears. */
	changes: number | null;
	steps: GearStep[];
	checks: Check[];
};

export type TrackGears = {
	track: string;
	setting: Setting;
	/** Sets that may be used there, of those that can be built. */
	sets: number;
	/** Best first; sets that differ only in gears that gain and lose nothing are told once. Empty where nothing can be built. */
	rows: BuiltRow[];
	/** The best of the sets that are built. */
	own: {pair: string; gearbox: string; fastestS: number | null; verdict: Verdict} | null;
};

export type CommonSet = {
	gearbox: string;
	ratios: number[];
	changes: number | null;
	/** Lap times added up over the tracks. */
	totalS: number;
	/** More than the best common set. */
	behindS: number;
	/** In the order of the tracks: with the best pair there, against the best set there. */
	tracks: {track: string; row: BuiltRow; costS: number}[];
};

export type GearboxAnswer = {
	/** Sets that go together. */
	sets: number;
	tracks: TrackGears[];
	/** Best first; empty unless asked for. */
	common: CommonSet[];
	remarks: string[];
};
