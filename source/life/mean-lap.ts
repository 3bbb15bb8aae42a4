/** The mean lap of a pair and set over the situations, by their share. */
import type {Plan} from '../planning/plan.ts';
import type {RowRun} from '../planning/run-row.ts';
import {lapOf} from './lap.ts';
import type {LapParts} from './lap-parts.ts';
import {addSlices, emptyTally, type Tally} from './tally.ts';

/** Of a row that runs. */
export function meanLap(row: RowRun, plan: Plan, parts: LapParts, aboveRpm: number): Tally {
	const tally = emptyTally();
	for (const [i, within] of row.situations.entries()) {
		const {weight} = plan.conditions[i]!;
		if (weight === 0) continue;
		const lap = lapOf(row, within, plan, parts, aboveRpm);
		addSlices(tally, lap.slices, weight, aboveRpm);
	}
	return tally;
}
