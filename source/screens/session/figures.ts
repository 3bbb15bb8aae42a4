/** The numbers of a row that the ranking shows, sorts and filters by. */
import type {Check, CheckName, Row} from '../../planning/results.ts';

export const checkNamed = (row: Row, name: CheckName): Check | undefined =>
	row.checks.find(({check}) => check === name);

/** Highest RPM anywhere; null where nothing ran. */
export const highestRpm = (row: Row): number | null => checkNamed(row, 'limit')?.value ?? null;
export const limitMarginRpm = (row: Row): number | null => checkNamed(row, 'limit')?.margin ?? null;

/** The lowest RPM at which the throttle is picked up, over the situations; null where there is none. */
export function lowestExitRpm(row: Row): number | null {
	const exits = row.situations.flatMap(({straights}) => straights.map(({exitRpm}) => exitRpm));
	return exits.length > 0 ? Math.min(...exits) : null;
}

/** Shifts in a lap of the first situation. */
export const shiftsPerLap = (row: Row): number =>
	row.situations[0]?.straights.reduce((sum, {shifts}) => sum + shifts.length, 0) ?? 0;
