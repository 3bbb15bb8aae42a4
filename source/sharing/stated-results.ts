/** What a plan says comes out, taken from the row of its pair and set. Whole RPM. */
import type {Row, Setting, Shift, StraightResult} from '../planning/results.ts';
import type {Stated} from './plan-document.ts';

/** Floating-point noise of a speed turned into RPM and back; less than this is not a whole rev. */
const noiseRpm = 1e-6;

/** Up where a bound above must not look kept when it is not; down where one is to be driven by. */
export const wholeUp = (rpm: number): number => Math.ceil(rpm - noiseRpm);
export const wholeDown = (rpm: number): number => Math.floor(rpm + noiseRpm);

export type Highest = {rpm: number; at: string};
export type ShiftRpm = {from: number; rpm: number; light: number};

/** `restartRpm` is at pace speed and a steady throttle, in the gear of the restart. */
export function statedResults(row: Row, setting: Setting, restart: {gear: number; rpm: number} | undefined): Stated {
	const {pitRoad} = row;
	return {
		limit: {rpm: setting.rpmLimit, from: setting.limitFrom},
		highest: highestBySituation(row).map(({situation, rpm, at}) => ({situation, rpm: wholeUp(rpm), at})),
		shifts: shiftsByGear(row).map(({from, rpm, light}) => ({from, rpm: wholeDown(rpm), light: wholeDown(light)})),
		...(pitRoad && {
			pitRoad: {
				gear: pitRoad.gear,
				rpm: wholeDown(pitRoad.rpm),
				tolerance: wholeDown(pitRoad.toleranceRpm),
			},
		}),
		...(restart && {restart: {gear: restart.gear, rpm: wholeDown(restart.rpm)}}),
	};
}

/** As the limit check looks for it: exits, minimum, shifts, ends, what would be reached without a limiter, and what was measured. */
export function highestBySituation(row: Row): (Highest & {situation: string})[] {
	const limit = row.checks.find(({check}) => check === 'limit');
	return row.situations.map(({name, straights, restart}) => {
		const runs = restart === null ? straights : [...straights, {...restart, reachRpm: null}];
		const points = runs.flatMap(pointsOf);
		if (limit?.value != null && limit.situation === name) points.push({rpm: limit.value, at: limit.at});
		return {situation: name, ...points.reduce((highest, point) => (point.rpm > highest.rpm ? point : highest))};
	});
}

function pointsOf({name, exitRpm, endRpm, minimumRpm, reachRpm, shifts}: StraightResult): Highest[] {
	return [
		{rpm: exitRpm, at: `${name} exit`},
		{rpm: endRpm, at: `${name} end`},
		...shifts.map(({from, rpm}) => ({rpm, at: `${name} shift ${from}-${from + 1}`})),
		...(minimumRpm === null ? [] : [{rpm: minimumRpm, at: `${name} minimum`}]),
		...(reachRpm === null ? [] : [{rpm: reachRpm, at: `${name} end`}]),
	];
}

/**
 * Of each gear shifted from, the lowest shift and the lowest light over straights and situations. A shift that only a restart
 * makes stands as it is there.
 */
export function shiftsByGear({situations}: Row): ShiftRpm[] {
	const lowest = lowestShifts(situations.flatMap(({restart}) => restart?.shifts ?? []));
	for (const [from, shift] of lowestShifts(
		situations.flatMap(({straights}) => straights.flatMap(({shifts}) => shifts)),
	)) {
		lowest.set(from, shift);
	}
	return [...lowest.values()].sort((one, other) => one.from - other.from);
}

function lowestShifts(shifts: readonly Shift[]): Map<number, ShiftRpm> {
	const byGear = new Map<number, ShiftRpm>();
	for (const {from, rpm, lightRpm} of shifts) {
		const known = byGear.get(from) ?? {from, rpm, light: lightRpm};
		byGear.set(from, {from, rpm: Math.min(known.rpm, rpm), light: Math.min(known.light, lightRpm)});
	}
	return byGear;
}
