/** A row of the answer from its runs and its checks; its place and reason come later. */
import {pairRatio, samePair} from '../drivetrain/gear-pair.ts';
import type {Ground} from './checks/check.ts';
import {judge, verdictOf} from './checks/judge.ts';
import type {Plan} from './plan.ts';
import type {Row, SituationResult} from './results.ts';
import {eachRun, type RowRun, type SituationRun} from './run-row.ts';
import {listed} from './words.ts';

export function rowOf(run: RowRun, ground: Ground): Row {
	const {pair, pairName, gearbox, train} = run.candidate;
	const {plan} = ground;
	const situations = run.situations.map(situationOf);
	const checks = judge(run, ground);
	const installed = plan.car.installed;
	return {
		pair: pairName,
		gearbox: gearbox.name,
		pairRatio: pairRatio(pair),
		overall: [...train.overall],
		verdict: verdictOf(checks),
		reason: '',
		timeS: meanS(situations, plan, 'timeS'),
		fastestS: meanS(situations, plan, 'fastestS'),
		gainS: null,
		installed: installed !== undefined && samePair(installed.pair, pair) && installed.gearbox === gearbox.name,
		situations,
		pitRoad: run.pitRoad
			? {gear: run.pitRoad.gear, rpm: run.pitRoad.rpm, toleranceRpm: run.pitRoad.toleranceRpm}
			: null,
		checks,
		remarks: rowRemarks(run, plan),
	};
}

/** A situation's times are the sums over the straights with length; null without one, or where one does not run. */
function situationOf({condition, places, restart}: SituationRun): SituationResult {
	const timed = places.filter(({state}) => state !== 'held');
	const runs = timed.length > 0 && places.every(({state}) => state === 'ran' || state === 'held');
	let timeS = 0;
	let fastestS = 0;
	for (const {result} of runs ? timed : []) {
		timeS += result.timeS!;
		fastestS += result.fastestS!;
	}
	return {
		name: condition.name,
		share: condition.share,
		timeS: runs ? timeS : null,
		fastestS: runs ? fastestS : null,
		straights: places.map(({result}) => result),
		restart: restart?.result ?? null,
	};
}

/** The mean over the situations by weight; null where any situation has no time, whatever its weight. */
function meanS(situations: readonly SituationResult[], plan: Plan, field: 'timeS' | 'fastestS'): number | null {
	let sum = 0;
	for (const [i, situation] of situations.entries()) {
		const time = situation[field];
		if (time === null) return null;
		sum += plan.conditions[i]!.weight * time;
	}
	return sum;
}

function rowRemarks(run: RowRun, plan: Plan): string[] {
	const remarks = notRunRemarks(run);
	const count = run.candidate.train.overall.length;
	const {pitRoad, restart} = plan.track;
	if ((pitRoad?.gear ?? 0) > count)
		remarks.push(`no gear ${pitRoad?.gear} for pit road: gear ${run.pitRoad?.gear} taken`);
	if ((restart?.gear ?? 0) > count)
		remarks.push(`no gear ${restart?.gear} for the restart: the gear of least time taken`);
	return remarks;
}

/** "Front: exit speed above the limit in every allowed gear (Base and In the tow)." */
function notRunRemarks(run: RowRun): string[] {
	const situations = new Map<string, string[]>();
	eachRun(run, ({place, state, result}, {condition}) => {
		if (state === 'ran' || state === 'held') return;
		const remark = `${place.name}: ${result.remarks[0]}`;
		situations.set(remark, [...(situations.get(remark) ?? []), condition.name]);
	});
	return [...situations].map(([remark, names]) =>
		names.length === run.situations.length ? remark : `${remark} (${listed(names)})`,
	);
}
