/** The rack ranked: every pair and set with its checks, its place and the reason for it. */
import type {Car} from '../drivetrain/car.ts';
import type {Track} from '../drivetrain/track.ts';
import type {Ground} from './checks/check.ts';
import {done} from './faults.ts';
import {compareRows, type Judged} from './order.ts';
import {type PlanOptions, settingOf} from './plan.ts';
import {reasonsOf} from './reasons.ts';
import {remarksOn} from './remarks.ts';
import type {Outcome, Ranking, Row} from './results.ts';
import {rowOf} from './row.ts';
import type {RunMemory} from './run-memory.ts';
import {finish, type Progress, type RackRuns, rackSteps} from './run-rack.ts';
import type {RowRun} from './run-row.ts';

/** The answer, with the runs that it was made from. */
export type Ranked = {
	readonly ranking: Ranking;
	readonly ground: Ground;
	/** By `rowName`. */
	readonly runs: ReadonlyMap<string, RowRun>;
};

/**
 * Every pair on the rack × every gearbox set, best first. `options.situation` runs, checks and times that one alone.
 * Bad input comes back as faults: what only car and track together show, and what no row can run.
 */
export function rankRack(car: Car, track: Track, options: PlanOptions = {}): Outcome<Ranking> {
	const ranked = finish(rankSteps(car, track, options));
	return ranked.ok ? done(ranked.value.ranking) : ranked;
}

/** The same row by row, for a caller that has other things to do in between, and that may ask again with something changed. */
export function* rankSteps(
	car: Car,
	track: Track,
	options: PlanOptions = {},
	memory?: RunMemory,
): Generator<Progress, Outcome<Ranked>, void> {
	const rack = yield* rackSteps(car, track, options, memory);
	if (!rack.ok) return rack;
	const {ground, runs} = rack.value;
	const judged: Judged[] = [];
	for (const run of runs) {
		judged.push({run, row: rowOf(run, ground)});
		yield {done: runs.length, total: runs.length};
	}
	return done(rankedFrom(judged.sort(compareRows), rack.value));
}

function rankedFrom(judged: readonly Judged[], {ground, runs}: RackRuns): Ranked {
	const rows = judged.map(({row}) => row);
	const installedS = rows.find(({installed}) => installed)?.fastestS ?? null;
	const reasons = reasonsOf(judged, ground.plan);
	rows.forEach((row, i) => {
		row.reason = reasons[i]!;
		row.gainS = installedS === null || row.fastestS === null ? null : installedS - row.fastestS;
	});
	return {
		ranking: {setting: settingOf(ground.plan, ground.anchored), rows, remarks: remarksOn(ground, runs)},
		ground,
		runs: new Map(judged.map(({run, row}) => [rowName(row), run])),
	};
}

/** Names a row of an answer: "33/38 A". */
export const rowName = ({pair, gearbox}: Pick<Row, 'pair' | 'gearbox'>): string => `${pair} ${gearbox}`;
