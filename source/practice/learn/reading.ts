/** What practice says of one straight, whether it was seen by hand, stands in the track as measured, or comes from a log. */
import type {GearRange} from '../../drivetrain/track.ts';
import type {Candidate} from '../../planning/candidates.ts';

/** A number with how well it is known, as one standard deviation in the same unit. */
export type Known = {readonly value: number; readonly se: number};

export type Reading = {
	/** Index among the track's straights, and the name. */
	readonly index: number;
	readonly name: string;
	/** What the car ran with. */
	readonly candidate: Candidate;
	/** In use at the end, counted from 1; undefined: the gear that the model takes. */
	readonly gear: number | undefined;
	/** At the end of full throttle. */
	readonly endMps: Known | undefined;
	readonly endRpm: Known | undefined;
	/** The speed was seen, and is not only what the RPM says with the circumference held. */
	readonly speedSeen: boolean;
	/** The run that the numbers belong to, where practice says it; else the straight's own. */
	readonly exitMps: Known | undefined;
	readonly lengthM: number | undefined;
	readonly timeS: Known | undefined;
	readonly gears: GearRange | undefined;
	/** The run ends on the limiter: its end says nothing about drag and power. */
	readonly limited: boolean;
};

export const known = (value: number, se: number): Known => ({value, se});

/** Independent errors add up as squares. */
export const together = (...errors: readonly number[]): number => Math.hypot(...errors);
