/** The model against practice, straight by straight. */
import type {AskModel, ModelRun} from './model.ts';
import type {Reading} from './reading.ts';
import {type Trim, untrimmed} from './trim.ts';

export type Compared = {
	readonly reading: Reading;
	/** By the documents as they stand, over the length that practice ran; undefined where the model does not run there. */
	readonly before: ModelRun | undefined;
	/** With all that was learned. */
	readonly after: ModelRun | undefined;
};

export function comparedRuns(ask: AskModel, readings: readonly Reading[], trim: Trim): Compared[] {
	return readings.map(reading => ({
		reading,
		before: ask({...reading, exitMps: undefined}, untrimmed),
		after: ask(reading, trim),
	}));
}
