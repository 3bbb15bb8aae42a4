/** RPM at every point of the track, in every gear of one pair and set. */
import type {Car} from '../drivetrain/car.ts';
import {pairName} from '../drivetrain/gear-pair.ts';
import type {Track} from '../drivetrain/track.ts';
import type {Ground} from './checks/check.ts';
import {chosenFrom} from './choice.ts';
import {done} from './faults.ts';
import {settingOf} from './plan.ts';
import {remarksOn} from './remarks.ts';
import type {Choice, Outcome, RpmPoint, RpmTable} from './results.ts';
import {type PlaceRun, rpmAt} from './run-place.ts';
import {runRack} from './run-rack.ts';
import {pitRoadRpms, type RowRun, type SituationRun} from './run-row.ts';

/**
 * For each situation the points of each straight (minimum, exit, top, end, entry, and in the base what was measured), then
 * pit road, then the restart of each situation. Full-throttle points with `slip`, the others with `steadySlip`.
 */
export function rpmTable(car: Car, track: Track, choice: Choice = {}): Outcome<RpmTable> {
	const chosen = chosenFrom(car, choice);
	if (!chosen.ok) return chosen;
	const rack = runRack(car, track, {});
	if (!rack.ok) return rack;
	const {ground, runs} = rack.value;
	const name = pairName(chosen.value.pair);
	const row = runs.find(
		({candidate}) => candidate.pairName === name && candidate.gearbox.name === chosen.value.gearbox,
	);
	if (row === undefined) throw new Error(`no row for ${name} ${chosen.value.gearbox}`);
	return done({
		setting: settingOf(ground.plan, ground.anchored),
		pair: name,
		gearbox: row.candidate.gearbox.name,
		overall: [...row.candidate.train.overall],
		points: pointsOf(row, ground),
		remarks: remarksOn(ground, runs),
	});
}

/** The points of one row of a rack that has been run. */
export function pointsOf(row: RowRun, ground: Ground): RpmPoint[] {
	return [
		...row.situations.flatMap(situation =>
			situation.places.flatMap((run, i) => [
				...straightPoints(run, situation, row),
				...(situation.condition.name === ground.plan.base.name ? measuredPoint(run, i, situation, row, ground) : []),
			]),
		),
		...pitRoadPoints(row, ground),
		...row.situations.flatMap(situation => restartPoint(situation, row)),
	];
}

type Point = {part: string; speedMps: number | undefined; gear: number; steady?: boolean};

function straightPoints(run: PlaceRun, situation: SituationRun, row: RowRun): RpmPoint[] {
	const {place, state, result, lastGear} = run;
	const {exitMps, minimumMps, endMps, entryMps} = place.straight;
	const points: Point[] = [
		{part: 'minimum', speedMps: minimumMps, gear: result.exitGear, steady: true},
		{part: 'exit', speedMps: exitMps, gear: result.exitGear},
		{part: 'top', speedMps: state === 'ran' ? result.endSpeedMps : undefined, gear: result.endGear},
		{part: 'end', speedMps: endMps, gear: lastGear},
		{part: 'entry', speedMps: entryMps, gear: lastGear, steady: true},
	];
	return points
		.filter(({speedMps}) => speedMps !== undefined)
		.map(point => pointAt(`${place.name} ${point.part}`, point, situation, row, isInUse(run)));
}

function pointAt(at: string, {speedMps, gear, steady}: Point, {condition}: SituationRun, row: RowRun, used: boolean) {
	const slip = steady === true ? condition.steadySlip : condition.vehicle.slip;
	const rpm = row.candidate.train.overall.map(overall => rpmAt(condition.vehicle, overall, speedMps!, slip));
	return {at, situation: condition.name, speedMps: speedMps!, rpm, gear: used ? gear : null};
}

function measuredPoint(
	run: PlaceRun,
	index: number,
	situation: SituationRun,
	row: RowRun,
	{measured}: Ground,
): RpmPoint[] {
	const point = measured.find(other => other.index === index);
	if (point?.speedMps === undefined) return [];
	const at = {part: 'measured', speedMps: point.speedMps, gear: run.result.endGear};
	return [pointAt(`${run.place.name} measured`, at, situation, row, isInUse(run))];
}

/** Pit road has no situation: its RPM are those of the largest rollout. */
function pitRoadPoints(row: RowRun, {plan}: Ground): RpmPoint[] {
	const {pitRoad} = plan.track;
	if (pitRoad === undefined) return [];
	const point = (at: string, speedMps: number): RpmPoint => ({
		at,
		situation: '',
		speedMps,
		rpm: pitRoadRpms(plan, row.candidate.train.overall, speedMps),
		gear: row.pitRoad?.gear ?? null,
	});
	return [point('pit road', pitRoad.limitMps), point('pit road + tolerance', pitRoad.limitMps + pitRoad.toleranceMps)];
}

function restartPoint(situation: SituationRun, row: RowRun): RpmPoint[] {
	const run = situation.restart;
	if (run === undefined) return [];
	const point = {part: '', speedMps: run.place.straight.exitMps, gear: run.result.exitGear, steady: true};
	return [pointAt('restart', point, situation, row, isInUse(run))];
}

function isInUse({state}: PlaceRun): boolean {
	return state === 'ran' || state === 'held';
}
