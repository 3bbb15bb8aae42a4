/** The mean lap of a pair and set over the situations, by their share. */
import type {Plan} from '../planning/plan.ts';
import {type Ranked, rowName} from '../planning/rank-rack.ts';
import type {Row} from '../planning/results.ts';
import type {RowRun} from '../planning/run-row.ts';
import {lapOf} from './lap.ts';
import {lapParts} from './lap-parts.ts';
import type {LifeOptions} from './options.ts';
import {addLap, emptyTally, type Tally} from './tally.ts';

/** Time above an RPM unless one is given: this far under the limit. */
const belowLimitRpm = 500;

type Known = {readonly aboveRpm: number; readonly tally: Tally};
/** Life and fuel of a row, and each look at it on the screen, stand on the same lap. */
const known = new WeakMap<RowRun, Known>();

/** Of a row of the ranking that runs. */
export function meanLapOf({ground, runs}: Ranked, row: Row, options: LifeOptions): Tally {
	const run = runs.get(rowName(row))!;
	const aboveRpm = aboveIn(ground.plan, options);
	const before = known.get(run);
	if (before?.aboveRpm === aboveRpm) return before.tally;
	const tally = meanLap(run, ground.plan, aboveRpm);
	known.set(run, {aboveRpm, tally});
	return tally;
}

/** The RPM above which time is told. */
export function aboveIn({limit}: Plan, {aboveRpm}: LifeOptions): number {
	return aboveRpm ?? limit.rpm - belowLimitRpm;
}

function meanLap(row: RowRun, plan: Plan, aboveRpm: number): Tally {
	const parts = lapParts(plan.track);
	const tally = emptyTally();
	for (const [i, within] of row.situations.entries()) {
		const {weight} = plan.conditions[i]!;
		if (weight === 0) continue;
		addLap(tally, lapOf(row, within, plan, parts, aboveRpm), weight, aboveRpm);
	}
	return tally;
}
