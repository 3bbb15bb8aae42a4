import type {Coast} from './coast.ts';

export type PlannedShift = {
	/** Where the interruption starts, and the RPM there. */
	readonly speedMps: number;
	readonly rpm: number;
	readonly coasted: Coast;
	/** In the next gear, after the interruption. */
	readonly rpmAfter: number;
};
