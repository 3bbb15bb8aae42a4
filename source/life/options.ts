/** What may be asked about engine life and fuel. */
import type {Comparison} from './compared-rows.ts';

export type LifeOptions = Comparison & {
	/** The only situation; the mean over all unless given. */
	readonly situation?: string | undefined;
	/** Laps of the race; the track's unless given. */
	readonly laps?: number | undefined;
	/** For the time above an RPM; 500 rpm under the limit unless given. */
	readonly aboveRpm?: number | undefined;
};
