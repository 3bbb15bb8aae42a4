/** Every check of a row, in the order in which they are shown. To add one, write it and put it in this list. */
import type {Check, Verdict} from '../results.ts';
import type {RowRun} from '../run-row.ts';
import {band} from './band.ts';
import {type Ground, isWorse, type RowCheck} from './check.ts';
import {downshift} from './downshift.ts';
import {housing, mileage, stock} from './hardware.ts';
import {limit} from './limit.ts';
import {limiter} from './limiter.ts';
import {permitted} from './permitted.ts';
import {pitRoad} from './pit-road.ts';
import {restart} from './restart.ts';
import {afterShift, settle} from './shifts.ts';

const checks: readonly RowCheck[] = [
	limit,
	limiter,
	band,
	afterShift,
	settle,
	pitRoad,
	restart,
	downshift,
	permitted,
	housing,
	stock,
	mileage,
];

/** One entry for each check that applies, its worst place and situation. */
export function judge(row: RowRun, ground: Ground): Check[] {
	return checks.flatMap(check => check(row, ground) ?? []);
}

/** The worst of the checks; pass where there is none. */
export function verdictOf(checks: readonly Check[]): Verdict {
	return checks.reduce<Verdict>((worst, {verdict}) => (isWorse(verdict, worst) ? verdict : worst), 'pass');
}
