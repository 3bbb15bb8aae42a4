/** A lap of one pair and set in one situation, moment by moment. */
import {RoadGears} from '../drivetrain/road-gears.ts';
import type {Plan} from '../planning/plan.ts';
import type {PlaceRun} from '../planning/run-place.ts';
import type {RowRun, SituationRun} from '../planning/run-row.ts';
import {type Corner, cornerRoad, cornerSlices, cornerTimeS} from './corner.ts';
import type {LapParts} from './lap-parts.ts';
import type {Slice} from './slice.ts';
import {straightSlices} from './straight-slices.ts';

export type Lap = {
	readonly slices: readonly Slice[];
	/** The straights' times, with those of the corners where they are known. */
	readonly timeS: number;
};

/** The lap of a row that runs. Slices are cut at `askedRpm`; their times add up to the lap's. */
export function lapOf(row: RowRun, within: SituationRun, plan: Plan, parts: LapParts, askedRpm: number): Lap {
	const {condition, places} = within;
	const {train} = row.candidate;
	const gearsOn = plan.roads.gearsFor(train);
	const ran = places.filter(({state}) => state === 'ran');
	const straights = ran.flatMap(({place, course, sequence}) =>
		straightSlices(gearsOn(place.road), course!, sequence!, condition.steadySlip, askedRpm),
	);
	const straightsS = ran.reduce((sum, {sequence}) => sum + sequence!.timeS, 0);
	if (parts.cornerM === undefined) return {slices: straights, timeS: straightsS};
	const gears = new RoadGears(condition.vehicle, train, cornerRoad);
	const corners = places.map((before, i) =>
		cornerBetween(before, places[(i + 1) % places.length]!, within, plan, parts.cornerM!),
	);
	return {
		slices: [...straights, ...corners.flatMap(corner => cornerSlices(gears, corner, askedRpm))],
		timeS: corners.reduce((sum, corner) => sum + cornerTimeS(corner), straightsS),
	};
}

function cornerBetween(
	before: PlaceRun,
	after: PlaceRun,
	{condition}: SituationRun,
	plan: Plan,
	lengthM: number,
): Corner {
	return {
		lengthM,
		entryMps: before.result.finalSpeedMps,
		minimumMps: after.place.straight.minimumMps,
		exitMps: after.place.straight.exitMps,
		entryGear: before.lastGear,
		exitGear: after.result.exitGear,
		downshiftRpm: plan.limit.rpm - plan.car.margins.downshiftRpm,
		steadySlip: condition.steadySlip,
	};
}
