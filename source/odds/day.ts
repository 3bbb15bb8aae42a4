/** One draw made ready for every row: the situations with their vehicles and roads, tabulated. */
import {scaledTorque} from '../drivetrain/engine.ts';
import type {Course} from '../drivetrain/straight.ts';
import {type Condition, conditionFor, type Place} from '../planning/conditions.ts';
import type {Plan} from '../planning/plan.ts';
import {Roads} from '../planning/roads.ts';
import {type RoadTable, roadTable} from './quick/road-table.ts';
import {nodeMps} from './quick/speed-grid.ts';
import {VehicleTable} from './quick/vehicle-table.ts';
import type {World} from './world.ts';

export type DayCondition = {
	readonly condition: Condition;
	readonly table: VehicleTable;
	/** Of each place; undefined where it has no length. */
	readonly roads: readonly (RoadTable | undefined)[];
};

export type Day = {
	/** The track as it stands. */
	readonly base: Condition;
	/** In the order of the plan's. */
	readonly conditions: readonly DayCondition[];
};

/** The plan's situations in a world: as `planFor` would make them, without looking for faults again. */
export function dayOf(plan: Plan, {car, track}: World): Day {
	const engine = car.engines.find(({name}) => name === plan.engine.name)!;
	const factor = engine.power / plan.engine.power;
	const inUse = {
		engine,
		limitRpm: plan.limitRpm,
		rated: scaledTorque(plan.rated, factor),
		ratedPeak: {rpm: plan.ratedPeak.rpm, powerW: plan.ratedPeak.powerW * factor},
	};
	const roads = new Roads();
	const base = {...conditionFor(car, track, track.situations[0]!, inUse, roads, undefined), weight: 0};
	const tables = new Map<unknown, VehicleTable>();
	const conditions = plan.conditions.map(({name, weight}) => {
		const situation = track.situations.find(one => one.name === name)!;
		const own = situation === track.situations[0] ? base : conditionFor(car, track, situation, inUse, roads, base);
		const condition: Condition = {...own, weight};
		const table = tables.get(condition.vehicle) ?? new VehicleTable(condition.vehicle);
		tables.set(condition.vehicle, table);
		return {condition, table, roads: condition.places.map(place => tabulated(place, table))};
	});
	return {base, conditions};
}

function tabulated(place: Place, table: VehicleTable): RoadTable | undefined {
	const course = anyCourse(place);
	if (course === undefined || place.straight.lengthM === undefined) return undefined;
	// A car that slows below its exit is the exact solver's.
	const fromNode = Math.max(
		0,
		Math.floor(Math.min(course.exitMps, place.straight.exitMps) / nodeMps) - slower / nodeMps,
	);
	return roadTable(table.vehicle, course, table.perHeldKg, fromNode);
}

/** Shifts of a slow car may lose so much, m/s, before it gains again. */
const slower = 10;

/** All courses of a place have the same road. */
function anyCourse({courses}: Place): Course | undefined {
	for (const course of courses.values()) if (course !== undefined) return course;
	return undefined;
}
