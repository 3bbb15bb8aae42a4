/**
 * A logged run: one entry a sample, in the order of the log, in SI. What the log did not say at a sample is NaN.
 *
 * Time and distance are both there always: where the log has only one of them, the other is worked out from the speed.
 */
export type LoggedRun = {
	readonly samples: number;
	/** From the first sample on; never falls. */
	readonly timeS: Float64Array;
	/** Along the road from the first sample on; never falls. */
	readonly distanceM: Float64Array;
	readonly speedMps: Float32Array;
	/** Engine speed in rev/min. */
	readonly rpm: Float32Array;
	/** Share of full throttle, 0 to 1. */
	readonly throttle: Float32Array | null;
	/** Gear in use as the log says it, 1 and up; 0 is neutral. */
	readonly gear: Float32Array | null;
	/** Number of the lap as the log counts it. */
	readonly lap: Float32Array | null;
	/** Share of the hardest braking in the log, 0 to 1. */
	readonly brake: Float32Array | null;
	/** As logged: only its changes are used. */
	readonly steering: Float32Array | null;
};
