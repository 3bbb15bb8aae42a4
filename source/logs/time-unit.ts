/** The unit of a column of times that does not state it, by the steps from row to row. */
import {type LogUnit, logUnit} from './log-units.ts';
import {type Decimals, readCell} from './read-cell.ts';

/**
 * From the shortest to the longest step that this unit, and no other, makes of a logger's 2 to 1000 samples a second.
 * Between 0.5 and 5, and between 500 and 2000, it may be one or the next: a slow logger or a fast one.
 */
const ranges: readonly {readonly unit: string; readonly from: number; readonly to: number}[] = [
	{unit: 's', from: 0, to: 0.5},
	{unit: 'ms', from: 5, to: 500},
	{unit: 'µs', from: 2000, to: 500_000},
];

/** A clock with a fraction counts in seconds, if its steps are no longer than this. */
const longestFractionStep = 2;

/** Undefined where the steps fit two units or none. */
export function timeUnitFromSteps(cells: readonly string[], decimals: Decimals): LogUnit | undefined {
	const read = cells.map(cell => readCell(cell, {channel: 'time', factor: 1}, {...decimals}));
	const times = read.flatMap(cell => (cell.kind === 'value' ? [cell.value] : []));
	const steps = times
		.slice(1)
		.map((time, i) => time - times[i]!)
		.filter(step => step > 0)
		.sort((a, b) => a - b);
	const step = steps[Math.floor(steps.length / 2)];
	if (step === undefined) return logUnit('s', 'time');
	const range = ranges.find(({from, to}) => step >= from && step <= to);
	const hasFraction = times.some(time => !Number.isInteger(time));
	const unit = range?.unit ?? (hasFraction && step <= longestFractionStep ? 's' : undefined);
	return unit === undefined ? undefined : logUnit(unit, 'time');
}
