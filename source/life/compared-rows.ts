/** Which pairs an answer is about: the one that is asked about, and the one that it is held against. */
import type {Pair} from '../drivetrain/car.ts';
import {pairName} from '../drivetrain/gear-pair.ts';
import {chosenFrom} from '../planning/choice.ts';
import {pairFaults} from '../planning/document-faults.ts';
import {done, failed, fault} from '../planning/faults.ts';
import {type Ranked, rowName} from '../planning/rank-rack.ts';
import type {Outcome, Row} from '../planning/results.ts';

export type Comparison = {
	/** Unless given, the installed ones, else the first on the rack. */
	readonly pair?: Pair | undefined;
	readonly gearbox?: string | undefined;
	/** With the same set. Unless given: what is installed, or for that itself the first of the ranking. */
	readonly against?: Pair | undefined;
};

export type Compared = {
	/** The one that is asked about, then the other where there is one. All of them run. */
	readonly rows: readonly Row[];
	readonly remarks: readonly string[];
};

/**
 * The rows of a comparison. A pair or set that the car has not, or one asked for that does not run, is a fault; in place of
 * an installed one that does not run the first of the ranking is taken.
 */
export function comparedRows({ranking, ground}: Ranked, comparison: Comparison): Outcome<Compared> {
	const {car} = ground.plan;
	const chosen = chosenFrom(car, comparison);
	const faults = [...(chosen.ok ? [] : chosen.faults), ...pairFaults('command', 'against', car, comparison.against)];
	if (!chosen.ok || faults.length > 0) return failed(faults);
	const {pair, gearbox} = chosen.value;
	const named = (wanted: Pair) => ranking.rows.find(row => rowName(row) === `${pairName(wanted)} ${gearbox}`)!;
	const asked = named(pair);
	const isGiven = comparison.pair !== undefined || comparison.gearbox !== undefined;
	const subject = isGiven || runs(asked) ? asked : ranking.rows.find(runs);
	const against = comparison.against && named(comparison.against);
	if (subject === undefined || !runs(subject)) return failed([notRunning(asked, 'pair')]);
	if (against !== undefined && !runs(against)) return failed([notRunning(against, 'against')]);
	const other = against ?? heldAgainst(subject, ranking.rows);
	const remarks =
		subject === asked
			? []
			: [`${rowName(asked)} ${notRunningWords(asked)}: ${rowName(subject)}, the first that does, is shown.`];
	return done({rows: other === undefined || other === subject ? [subject] : [subject, other], remarks});
}

/** What a row is held against unless a pair is named: the installed one, or for that itself the first other one of the ranking. Undefined where no other runs. */
export function heldAgainst(subject: Row, rows: readonly Row[]): Row | undefined {
	const others = rows.filter(row => row !== subject && runs(row));
	return others.find(row => row.installed) ?? others[0];
}

/** Whether the car gets to the end of every straight, in every situation. */
export function runs({timeS}: Row): boolean {
	return timeS !== null;
}

const notRunningWords = ({remarks: [why]}: Row) => `does not run here${why === undefined ? '' : ` (${why})`}`;

function notRunning(row: Row, option: string) {
	return fault('command', option, `${rowName(row)}, which ${notRunningWords(row)}`, 'a pair and set that runs');
}
