/**
 * What a logged run shows, before any model is held against it. SI throughout, engine speeds in rev/min, shares as fractions
 * of 1. What the log cannot tell is undefined, and a note says so.
 */
import type {Candidate} from '../../planning/candidates.ts';

/** The middle of several readings: median, robust standard deviation (1.4826 × median distance from it), how many. */
export type Spread = {
	readonly median: number;
	/** Of one reading, not of the median; undefined with fewer than three readings. */
	readonly sd: number | undefined;
	readonly count: number;
};

export type LogFacts = {
	readonly samples: number;
	/** Samples a second, by the median step in time; 0 where time does not pass. */
	readonly rateHz: number;
	readonly timeS: number;
	readonly distanceM: number;
	/** Channels that the log has besides speed and RPM. */
	readonly throttle: boolean;
	readonly gear: boolean;
	readonly lap: boolean;
};

/**
 * `good` counts in every median and fit. The others are left out: `out` starts at pit speed or below, `in` ends there, `pace`
 * never comes near full speed, `slow` is a lap with a lift or traffic, `part` is cut off by the start or the end of the log.
 */
export type LapKind = 'good' | 'out' | 'in' | 'pace' | 'slow' | 'part';

export type Lap = {
	/** As the log counts it; where it does not, from 1. */
	readonly number: number;
	readonly kind: LapKind;
	/** Why it is left out, as a sentence; empty for a good lap. */
	readonly why: string;
	/** First sample, and the one after the last. */
	readonly from: number;
	readonly to: number;
	readonly timeS: number;
	readonly lengthM: number;
	readonly highestMps: number;
};

/** One full-throttle run from an exit to a lift, in the order of the log. */
export type Pass = {
	/** Index in `laps` of the lap that it started in. */
	readonly lap: number;
	/** Index among the track's straights; undefined where it matches none. */
	readonly straight: number | undefined;
	/** It counts: whole, on a good lap, matched. */
	readonly good: boolean;
	/** First and last sample at full throttle. */
	readonly from: number;
	readonly to: number;
	/** When and where in the log full throttle began. */
	readonly startS: number;
	readonly startM: number;
	/** At the first and at the last sample at full throttle, by a short robust line through the samples beside it. */
	readonly exitMps: number;
	readonly endMps: number;
	/** Lowest speed of the corner before. */
	readonly minimumMps: number | undefined;
	readonly highestMps: number;
	/** Undefined where no engine speed was read. */
	readonly highestRpm: number | undefined;
	/** At the last sample, by a line like the speeds, through samples in the gear there; undefined where none was read. */
	readonly endRpm: number | undefined;
	/** Counted from 1; undefined where no gear fits. */
	readonly exitGear: number | undefined;
	readonly endGear: number | undefined;
	/** Between those two samples. */
	readonly timeS: number;
	readonly lengthM: number;
	/** Time with the wheels spinning, and distance on the limiter. */
	readonly spinS: number;
	readonly limiterM: number;
};

/** A straight of the track over the good passes. Spreads are undefined where it has none. */
export type StraightFinding = {
	/** Index among the track's straights, and the name. */
	readonly index: number;
	readonly name: string;
	readonly passes: number;
	readonly exitMps: Spread | undefined;
	readonly minimumMps: Spread | undefined;
	readonly endMps: Spread | undefined;
	readonly endRpm: Spread | undefined;
	/** Highest over all good passes. */
	readonly highestMps: number | undefined;
	readonly highestRpm: number | undefined;
	/** The most frequent gears, counted from 1. */
	readonly exitGear: number | undefined;
	readonly endGear: number | undefined;
	readonly timeS: Spread | undefined;
	readonly lengthM: Spread | undefined;
	readonly limiterM: Spread | undefined;
	/** Share of the passes with wheelspin. */
	readonly spinShare: number | undefined;
};

/** A hump of n·C/(60·V·(1 + slip)), by the circumference, growth and slip of the documents. */
export type Cluster = {
	readonly overall: number;
	/** Robust standard deviation of the logarithm: a fraction. */
	readonly spread: number;
	readonly samples: number;
	/** The gear of the pair and set below that it belongs to, counted from 1; undefined: none. */
	readonly gear: number | undefined;
};

/** A pair and a set that explain the clusters. */
export type Fitting = {
	readonly candidate: Candidate;
	/** The pair is on the rack the other way round, and may not be mounted like this. */
	readonly flipped: boolean;
	/** The circumference at the speeds of the log that this one needs ÷ that of the documents. */
	readonly circumferenceFactor: number;
	/** How far the clusters then lie from its overall ratios: weighted root mean square, as a fraction. */
	readonly residual: number;
};

/**
 * `asInstalled`: what is installed explains the log. `otherFits`: it does not, another on the rack does. `flippedFits`: it
 * does not, a pair the wrong way round does. `nothingFits`: the wrong car, or wrong units. `noInstalled`: the documents do
 * not say what is installed. `unknown`: too few samples at full throttle to tell.
 */
export type MountedVerdict = 'asInstalled' | 'otherFits' | 'flippedFits' | 'nothingFits' | 'noInstalled' | 'unknown';

export type Mounted = {
	readonly verdict: MountedVerdict;
	/** What the gears below are counted by; undefined for `nothingFits` and `unknown`. */
	readonly best: Fitting | undefined;
	readonly installed: Fitting | undefined;
	/** What the fits may stand on: what is installed explains the log, or nothing but `best` does. */
	readonly certain: boolean;
	/** Others that the log cannot tell from `best`, the likeliest first. */
	readonly alsoFit: readonly Fitting[];
	/** The nearest, where nothing fits, and how far off its ratios are, as a fraction. */
	readonly nearest: Fitting | undefined;
	readonly clusters: readonly Cluster[];
	/** The gear column of the log: share of the samples in which it says the gear that the ratio says. */
	readonly gearColumnAgrees: number | undefined;
	/** The verdict and the rule behind it, as sentences. */
	readonly why: string;
};

/** How the passes were laid on the track's straights. */
export type Matching = {
	readonly matched: boolean;
	/** Full-throttle runs a lap in the log, where they repeat. */
	readonly runsPerLap: number | undefined;
	/** Of the lap, by the log; undefined where it does not show. */
	readonly lapM: number | undefined;
	readonly why: string;
};

/** Engine speed at which a gear was left for the next one, under power on good laps. */
export type ShiftFinding = {
	/** The gear left, counted from 1. */
	readonly from: number;
	readonly rpm: Spread;
	/** From the last sample in one gear to the first in the next. */
	readonly timeS: Spread;
};

/**
 * `missedShift`: between two gears the engine ran free, or the next gear came late. `overRev`: above the limit in force.
 * `downshift`: above it with the throttle closed, driven by the wheels.
 */
export type RevEvent = {
	readonly kind: 'missedShift' | 'overRev' | 'downshift';
	/** Index in `laps`. */
	readonly lap: number;
	readonly timeS: number;
	readonly distanceM: number;
	/** Highest engine speed of the event. */
	readonly rpm: number;
	/** How long it lasted. */
	readonly forS: number;
	/** The gear before and after, counted from 1; undefined where not known. */
	readonly from: number | undefined;
	readonly into: number | undefined;
};

export type Wheelspin = {
	readonly samples: number;
	/** Share of the samples under power. */
	readonly share: number;
	/** Exits on good laps, and those with wheelspin. */
	readonly exits: number;
	readonly spinning: number;
};

export type LimiterFinding = {
	readonly rpm: number;
	/** On all laps. */
	readonly distanceM: number;
	readonly timeS: number;
	readonly passes: number;
};

/** A highest value, and where it was seen. */
export type Peak = {readonly value: number; readonly lap: number; readonly timeS: number; readonly distanceM: number};

/** A fitted number with its standard error. */
export type Estimate = {readonly value: number; readonly se: number};

/**
 * C(V) = C0·(1 + γ·(V/100 mph)²) from n/V at full throttle in a known gear. Slip is held at the documents' figure: n/V alone
 * cannot tell it from the circumference.
 */
export type CircumferenceFit = {
	/** C0, at standstill, in m. Where growth is held, its error counts the 0.3 points that growth may be off. */
	readonly rolloutM: Estimate;
	/** γ, a fraction. */
	readonly growth: Estimate;
	/** The speeds are too close together to tell growth: γ is held at the documents' figure. */
	readonly growthHeld: boolean;
	readonly slipHeld: number;
	/** The circumference in the middle of the speeds that it was seen at: what the log knows best. */
	readonly atMps: number;
	readonly circumferenceM: Estimate;
	/** Of the errors of C0 and γ. */
	readonly correlation: number;
	/** Robust standard deviation of one reading (a block of samples), in m. */
	readonly scatterM: number;
	/** Readings, the passes that they come from, and the laps. */
	readonly readings: number;
	readonly passes: number;
	readonly laps: number;
	/** Share of the readings that the robust fit gave less than full weight. */
	readonly downweighted: number;
	/** Speeds between which it was seen. */
	readonly lowestMps: number;
	readonly highestMps: number;
};

export type NoteCode =
	| 'slowSampling'
	| 'noThrottle'
	| 'noLaps'
	| 'noGoodLap'
	| 'oneLap'
	| 'lapsLeftOut'
	| 'straightsDiffer'
	| 'pair'
	| 'wrongCar'
	| 'gearColumn'
	| 'growthHeld'
	| 'slipHeld'
	| 'noCircumference'
	| 'farCircumference'
	| 'wheelspin';

/** Something to know beside the numbers, as a sentence. */
export type Note = {readonly code: NoteCode; readonly text: string};

/** What each sample is. */
export const sampleState = {
	/** None of the below: no gear, between gears, or nothing read. */
	other: 0,
	/** In gear, at full throttle, past the first moments after exit or shift: what the fits use. */
	steady: 1,
	/** In gear, not at full throttle or only just. */
	inGear: 2,
	/** At full throttle with the wheels spinning. */
	spin: 3,
	/** At full throttle on the limiter. */
	limiter: 4,
} as const;

export type SampleFindings = {
	/** Gear by the ratio, counted from 1; 0: none. */
	readonly gear: Uint8Array;
	/** One of `sampleState`. */
	readonly state: Uint8Array;
	/** n·C/(60·V·(1 + slip)) by the documents; NaN where speed or RPM are missing or near nothing. */
	readonly overall: Float32Array;
};

export type Findings = {
	readonly log: LogFacts;
	readonly laps: readonly Lap[];
	/** Where the laps come from: the log's own column, the repeating straights, the known length of the lap; else it is all one. */
	readonly lapsFrom: 'column' | 'straights' | 'length' | 'none';
	readonly mounted: Mounted;
	readonly matching: Matching;
	/** One for each straight of the track, in its order. */
	readonly straights: readonly StraightFinding[];
	readonly passes: readonly Pass[];
	readonly shifts: readonly ShiftFinding[];
	/** In the order of time. */
	readonly events: readonly RevEvent[];
	readonly wheelspin: Wheelspin;
	readonly limiter: LimiterFinding;
	/** Highest in three samples running, so that a single stray reading does not count. */
	readonly highestRpm: Peak | undefined;
	readonly highestMps: Peak | undefined;
	readonly circumference: CircumferenceFit | undefined;
	readonly notes: readonly Note[];
	readonly samples: SampleFindings;
};
