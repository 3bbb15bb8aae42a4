import type {Row, RpmTable, Setting} from '../planning/results.ts';
import type {PlanDocument} from './plan-document.ts';
import {reduceCar} from './reduce-car.ts';
import {statedResults} from './stated-results.ts';

export type PlanSource = {
	/** The documents as written, accepted by their readers. */
	track: Record<string, unknown>;
	car: Record<string, unknown>;
	/** The row chosen, run in every situation, with its setting and its RPM table. */
	row: Row;
	setting: Setting;
	table: Pick<RpmTable, 'points'>;
	/** ISO 8601. */
	date: string;
	notes?: string | undefined;
};

/** The plan for a row. */
export function makePlan({track, car, row, setting, table, date, notes}: PlanSource): PlanDocument {
	// Where a value was learned from is not needed to compute with it.
	const {learned: _learned, ...rest} = track;
	const chosen = {pair: row.pair, gearbox: row.gearbox, engine: setting.engine};
	return {
		kind: 'plan',
		version: 1,
		date,
		...chosen,
		results: statedResults(row, setting, restartOf(table)),
		...(notes !== undefined && {notes}),
		track: rest,
		car: reduceCar(car, track, chosen),
	};
}

/** Gear and RPM at pace speed as the track stands, at a steady throttle; undefined without a restart. */
export function restartOf({points}: Pick<RpmTable, 'points'>): {gear: number; rpm: number} | undefined {
	const point = points.find(({at, situation}) => at === 'restart' && situation === 'Base');
	if (point === undefined || point.gear === null) return undefined;
	return {gear: point.gear, rpm: point.rpm[point.gear - 1]!};
}
