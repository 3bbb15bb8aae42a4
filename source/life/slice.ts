/** What the engine does while it is in one gear, at one throttle and within one step of RPM. */

/** `part`: only as much as the speed needs; `closed`: shifting and braking. */
export type Throttle = 'full' | 'part' | 'closed';

export type Slice = {
	/** Counted from 1. */
	readonly gear: number;
	readonly throttle: Throttle;
	/** The span of RPM, rising or falling; both the same where it is held. */
	readonly fromRpm: number;
	readonly toRpm: number;
	readonly timeS: number;
	/** Turns of the crankshaft: ∫ n dt, n in rev/s. */
	readonly turns: number;
	/** Work at the crankshaft. */
	readonly energyJ: number;
};

/** The step of RPM by which dwell is told, rev/min. */
export const stepRpm = 250;

/** An RPM that was turned into a speed and back is the same to within this. */
const roundingRpm = 1e-6;

/** The step that a slice lies in, counted from 0 rpm; its upper end belongs to it, so that a limiter at 9000 rpm lies in 8750 to 9000. */
export function stepOf({fromRpm, toRpm}: Pick<Slice, 'fromRpm' | 'toRpm'>): number {
	return Math.max(0, Math.ceil(((fromRpm + toRpm) / 2 - roundingRpm) / stepRpm) - 1);
}

/** Whether a slice lies above an RPM at which slices are cut. */
export function isAbove({fromRpm, toRpm}: Pick<Slice, 'fromRpm' | 'toRpm'>, rpm: number): boolean {
	return (fromRpm + toRpm) / 2 - roundingRpm > rpm;
}

/** The RPM between two others at which a slice ends: whole steps, and the one that is asked about. In the order of travel. */
export function cutsBetween(fromRpm: number, toRpm: number, askedRpm: number): number[] {
	const [low, high] = fromRpm < toRpm ? [fromRpm, toRpm] : [toRpm, fromRpm];
	const isInside = (rpm: number) => rpm > low + roundingRpm && rpm < high - roundingRpm;
	const first = Math.floor(low / stepRpm) + 1;
	const last = Math.ceil(high / stepRpm) - 1;
	const steps = Array.from({length: Math.max(0, last - first + 1)}, (_, i) => (first + i) * stepRpm);
	const cuts = [...new Set([...steps, askedRpm])].filter(isInside).sort((a, b) => a - b);
	return fromRpm < toRpm ? cuts : cuts.reverse();
}
