/** Which pairs an answer is about: the one that is asked about, and the one that it is held against. */
import type {Pair} from '../drivetrain/car.ts';
import {pairName} from '../drivetrain/gear-pair.ts';
import {chosenFrom} from '../planning/choice.ts';
import {pairFaults} from '../planning/document-faults.ts';
import {done, failed} from '../planning/faults.ts';
import {type Ranked, rowName} from '../planning/rank-rack.ts';
import type {Outcome, Row} from '../planning/results.ts';

export type Comparison = {
	/** Unless given, the installed ones, else the first on the rack. */
	readonly pair?: Pair | undefined;
	readonly gearbox?: string | undefined;
	/** With the same set. Unless given: what is installed, or for that itself the first of the ranking. */
	readonly against?: Pair | undefined;
};

/** One row, or two where there is another; a pair or set that the car has not is a fault. */
export function comparedRows({ranking, ground}: Ranked, comparison: Comparison): Outcome<Row[]> {
	const {car} = ground.plan;
	const chosen = chosenFrom(car, comparison);
	const faults = [...(chosen.ok ? [] : chosen.faults), ...pairFaults('command', 'against', car, comparison.against)];
	if (!chosen.ok || faults.length > 0) return failed(faults);
	const {pair, gearbox} = chosen.value;
	const named = (wanted: Pair) => ranking.rows.find(row => rowName(row) === `${pairName(wanted)} ${gearbox}`)!;
	const subject = named(pair);
	const other = comparison.against === undefined ? heldAgainst(subject, ranking.rows) : named(comparison.against);
	return done(other === undefined || other === subject ? [subject] : [subject, other]);
}

/** What a row is held against unless a pair is named: the installed one, or for that itself the first other one of the ranking. */
export function heldAgainst(subject: Row, rows: readonly Row[]): Row | undefined {
	const installed = rows.find(row => row.installed);
	return installed !== undefined && installed !== subject ? installed : rows.find(row => row !== subject);
}
