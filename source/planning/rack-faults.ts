/** What no row of the rack can run: bad input, where for a single row it would be a result. */
import type {Course} from '../drivetrain/straight.ts';
import {speedAtRpmMps} from '../drivetrain/tire.ts';
import {fault} from './faults.ts';
import type {Plan} from './plan.ts';
import type {Fault} from './results.ts';
import type {PlaceRun} from './run-place.ts';
import type {RowRun, SituationRun} from './run-row.ts';
import {baseName, grouped, lengthText, speedText} from './words.ts';

/** An exit above every gear's limit or a stop in every row, and braking that the length does not allow; one a straight. */
export function rackFaults(plan: Plan, rows: readonly RowRun[]): Fault[] {
	const faults = plan.conditions.flatMap((_, k) => {
		const situations = rows.map(row => row.situations[k]!);
		const straights = plan.track.straights.flatMap((_, i) =>
			placeFault(plan, rows, situations, ({places}) => places[i]!),
		);
		return plan.track.restart === undefined
			? straights
			: [...straights, ...placeFault(plan, rows, situations, ({restart}) => restart!)];
	});
	return faults.filter((one, i) => faults.findIndex(({path}) => path === one.path) === i);
}

function placeFault(
	plan: Plan,
	rows: readonly RowRun[],
	situations: readonly SituationRun[],
	runIn: (situation: SituationRun) => PlaceRun,
): Fault[] {
	const runs = situations.map(runIn);
	const {name} = situations[0]!.condition;
	const braking = runs.find(({state}) => state === 'cannotBrake');
	if (braking !== undefined) return [brakingFault(braking, name)];
	const able = runs.filter(({state}) => state !== 'noGear');
	if (able.length === 0) return [];
	if (able.every(({state}) => state === 'overLimit')) return [limitFault(plan, rows, runs, situations)];
	return able.every(({state}) => state === 'stops') ? [stopFault(able[0]!, name)] : [];
}

function limitFault(
	plan: Plan,
	rows: readonly RowRun[],
	runs: readonly PlaceRun[],
	situations: readonly SituationRun[],
): Fault {
	const {condition} = situations[0]!;
	const {rolloutM, growth, slip, topRpm} = condition.vehicle;
	const fastest = Math.max(
		...runs.map(({course, result}, i) =>
			course === undefined
				? 0
				: speedAtRpmMps(topRpm, rows[i]!.candidate.train.overall[result.exitGear - 1]!, rolloutM, growth, slip),
		),
	);
	const {place} = runs[0]!;
	const least = Math.min(...runs.map(({result}) => result.exitRpm));
	return fault(
		'track',
		pathOf(place),
		`${speedText(place.straight.exitMps)}${during(condition.name)}: ${grouped(least)} rpm or more in every allowed gear of every row`,
		`at most ${speedText(fastest)}, which is ${grouped(plan.engine.limiter === undefined ? plan.limit.rpm : topRpm)} rpm in the tallest row`,
	);
}

function stopFault({place}: PlaceRun, situation: string): Fault {
	const {grade, lengthM = 0, exitMps} = place.straight;
	return fault(
		'track',
		place.isRestart ? 'restart.distance' : `straights.${place.name}.grade`,
		`from ${speedText(exitMps)}${during(situation)} the car stops within ${lengthText(lengthM)} at a grade of ${(100 * grade).toFixed(1)} % in every row`,
		'a grade, wind and length that one pair and set at least can drive through',
	);
}

function brakingFault({place, course}: PlaceRun, situation: string): Fault {
	const {exitMps, lengthM, entryMps, brakingMps2} = course as Required<Course>;
	const fastest = Math.sqrt(entryMps! ** 2 + 2 * brakingMps2! * lengthM);
	return fault(
		'track',
		pathOf(place),
		`${speedText(exitMps)}${during(situation)}, from which the car cannot brake to ${speedText(entryMps!)} in ${lengthText(lengthM)}`,
		`at most ${speedText(fastest)}`,
	);
}

function pathOf({name, isRestart}: PlaceRun['place']): string {
	return isRestart ? 'restart.speed' : `straights.${name}.exit`;
}

function during(situation: string): string {
	return situation === baseName ? '' : ` in the situation "${situation}"`;
}
