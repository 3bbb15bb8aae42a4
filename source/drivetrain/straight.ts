/** What a run on a straight starts from and what it gives. The equations are in `forces.ts`, the integrals in `run-straight.ts`. */
import type {MonotoneCubic} from './monotone-cubic.ts';

/** The car in one situation: everything about it and the day's air that no gear changes. */
export type Vehicle = {
	readonly massKg: number;
	/** Share of the weight on the driven axle at rest, and of the downforce. */
	readonly rearShare: number;
	readonly rearDownforceShare: number;
	readonly dragAreaM2: number;
	readonly downforceAreaM2: number;
	readonly rolling: number;
	readonly grip: number;
	/** Height of the center of gravity ÷ wheelbase; 0: no load transfer. */
	readonly cgHeightRatio: number;
	readonly wheelInertiaKgM2: number;
	readonly undrivenInertiaKgM2: number;
	readonly engineInertiaKgM2: number;
	readonly airDensityKgM3: number;
	/** Rolling circumference at standstill (harmonic mean of the axle). */
	readonly rolloutM: number;
	readonly growth: number;
	readonly slip: number;
	/** Today's full-throttle torque in N m over rev/min. */
	readonly torqueNm: MonotoneCubic;
	/** Where thrust ends. */
	readonly limiterRpm: number;
	/** The lower of limiter and limit in force: no straight starts above it. */
	readonly topRpm: number;
	/** No shift is planned above it: `topRpm` less the margin `shiftRpm`. */
	readonly shiftCapRpm: number;
	readonly shiftTimeS: number;
	readonly reactionTimeS: number;
	readonly sameTimeS: number;
};

/** The gears as mounted: overall ratio and efficiency, gear 1 first. */
export type GearTrain = {readonly overall: readonly number[]; readonly efficiency: readonly number[]};

/** One full-throttle piece. */
export type Course = {
	readonly lengthM: number;
	readonly exitMps: number;
	/** Both or neither. */
	readonly entryMps: number | undefined;
	readonly brakingMps2: number | undefined;
	/** Rise over run. */
	readonly grade: number;
	readonly headwindMps: number;
	readonly load: number;
	readonly extraDragN: number;
	/** Allowed gears, counted from 1, both ends included. */
	readonly lowestGear: number;
	readonly highestGear: number;
	/** Where given, the only gear that the run may start in. */
	readonly startGear: number | undefined;
};

export type GearShift = {
	/** The gear left, counted from 1; the next one follows. */
	readonly from: number;
	readonly rpm: number;
	readonly lightRpm: number;
	readonly rpmAfter: number;
	/** Where the interruption starts. */
	readonly speedMps: number;
	readonly distanceM: number;
	readonly timeS: number;
	/** From the end of the interruption to the end of full throttle (the braking point, or the end). */
	readonly leftS: number;
};

/** One rising sequence of gears from the exit to the end. */
export type SequenceRun = {
	/** Counted from 1. */
	readonly firstGear: number;
	readonly lastGear: number;
	/** From the exit to the end of the length, braking included. */
	readonly timeS: number;
	/** The highest speed on the straight, the gear then in use, and the RPM there. */
	readonly topMps: number;
	readonly topGear: number;
	readonly topRpm: number;
	/** Speed at the end of the length. */
	readonly finalMps: number;
	readonly limiterM: number;
	/** The RPM at the end of full throttle in the last gear if there were no limiter. */
	readonly reachRpm: number;
	readonly shifts: readonly GearShift[];
	/** The car is slower at the end of full throttle than at the exit. */
	readonly slows: boolean;
	/** `entry` was given and never reached: no braking. */
	readonly entryMissed: boolean;
	/** The grade pushes the car past the limiter; the speed is held there. */
	readonly pushed: boolean;
};

export type StraightRun =
	/** `chosen` by the tie-break (within `sameTimeS`: no limiter, then fewest shifts, then time), `fastest` by time alone. */
	| {readonly kind: 'ran'; readonly chosen: SequenceRun; readonly fastest: SequenceRun}
	/** The exit speed is above every allowed gear's limit. */
	| {readonly kind: 'overLimit'}
	/** The car stops before the end in every sequence. */
	| {readonly kind: 'stops'}
	/** Even braking from the exit on, the entry speed cannot be met in the length. */
	| {readonly kind: 'cannotBrake'};
