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

/** A step a straight. */
export function* comparedRuns(
	ask: AskModel,
	readings: readonly Reading[],
	trim: Trim,
): Generator<undefined, Compared[], void> {
	const compared: Compared[] = [];
	for (const reading of readings) {
		yield;
		const before = inItsGear(reading, ask({...reading, exitMps: undefined}, untrimmed));
		compared.push({reading, before, after: inItsGear(reading, ask(reading, trim))});
	}
	return compared;
}

/** The RPM that the model's speed is in the gear that practice ended in: a late shift is no difference of the car. */
function inItsGear({gear, candidate}: Reading, run: ModelRun | undefined): ModelRun | undefined {
	if (run === undefined || gear === undefined || gear === run.endGear) return run;
	const {overall} = candidate.train;
	return {...run, endGear: gear, endRpm: (run.endRpm * overall[gear - 1]!) / overall[run.endGear - 1]!};
}
