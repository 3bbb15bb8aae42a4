/** A plan that was sent, held against what computing it again gives, and against what the reader has. */
import {parsePair} from '../drivetrain/gear-pair.ts';
import type {Outcome} from '../planning/results.ts';
import {rpmTable} from '../planning/rpm-table.ts';
import {runPair} from '../planning/run-pair.ts';
import {type Agreement, agreements} from './agreement.ts';
import {compare, type Difference} from './compare.ts';
import {restartOf} from './make-plan.ts';
import type {SharedReading} from './read-shared.ts';
import {reduceCar} from './reduce-car.ts';
import {statedResults} from './stated-results.ts';

export type ReadPlan = Extract<SharedReading, {form: 'plan'}>;

/** Each stated number beside the computed one, and why the row fails a check, where it does. */
export type Recomputed = {readonly compared: readonly Agreement[]; readonly failure: string | undefined};

/** The plan's pair and set run at its track; faults where its car and track do not go together. */
export function computeAgain({plan, car, track}: ReadPlan): Outcome<Recomputed> {
	const choice = {pair: parsePair(plan.pair), gearbox: plan.gearbox};
	const run = runPair(car, track, choice);
	if (!run.ok) return run;
	const table = rpmTable(car, track, choice);
	if (!table.ok) return table;
	const {row, setting} = run.value;
	const computed = statedResults(row, setting, restartOf(table.value));
	return {
		ok: true,
		value: {compared: agreements(plan.results, computed), failure: row.verdict === 'fail' ? row.reason : undefined},
	};
}

/** How the reader's own documents of the same name differ; undefined where there is none. */
export type Own = {track: Difference[] | undefined; car: Difference[] | undefined};
type Json = Record<string, unknown>;

/** Of the car, what the plan would hold of it. Both own documents are ones that their readers have accepted. */
export function differencesFrom({plan}: Pick<ReadPlan, 'plan'>, track: Json | undefined, car: Json | undefined): Own {
	return {
		track: track && compare(track, plan.track),
		car: car && compare(reduceCar(car, plan.track, plan), plan.car),
	};
}
