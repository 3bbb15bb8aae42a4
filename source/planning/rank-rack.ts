/** The rack ranked: every pair and set with its checks, its place and the reason for it. */
import type {Car} from '../drivetrain/car.ts';
import type {Track} from '../drivetrain/track.ts';
import {done} from './faults.ts';
import {compareRows} from './order.ts';
import {type PlanOptions, settingOf} from './plan.ts';
import {reasonsOf} from './reasons.ts';
import {remarksOn} from './remarks.ts';
import type {Outcome, Ranking} from './results.ts';
import {rowOf} from './row.ts';
import {runRack} from './run-rack.ts';

/**
 * Every pair on the rack × every gearbox set, best first. `options.situation` runs, checks and times that one alone.
 * Bad input comes back as faults: what only car and track together show, and what no row can run.
 */
export function rankRack(car: Car, track: Track, options: PlanOptions = {}): Outcome<Ranking> {
	const rack = runRack(car, track, options);
	if (!rack.ok) return rack;
	const {ground, runs} = rack.value;
	const judged = runs.map(run => ({run, row: rowOf(run, ground)})).sort(compareRows);
	const rows = judged.map(({row}) => row);
	const installedS = rows.find(({installed}) => installed)?.fastestS ?? null;
	const reasons = reasonsOf(judged, ground.plan);
	rows.forEach((row, i) => {
		row.reason = reasons[i]!;
		row.gainS = installedS === null || row.fastestS === null ? null : installedS - row.fastestS;
	});
	return done({setting: settingOf(ground.plan, ground.anchored), rows, remarks: remarksOn(ground, runs)});
}
