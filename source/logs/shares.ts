/** Throttle and brake as shares of 1. */
import type {UsedColumn} from './decide-units.ts';
import type {RemarkData} from './reading.ts';
import type {Numbers} from './samples.ts';

/** A little over full is a sensor's calibration. */
const overFull = 1.1;

/** Numbers without a unit that stay below are hardly percent: volts, or something else. */
const leastPercent = 50;

/** In place, from what the unit (if any) makes of the numbers; undefined where they are no share. */
export function throttleShare(values: Numbers, {header, unit}: UsedColumn): RemarkData[] | undefined {
	const highest = highestOf(values);
	const isPercent = unit?.name === '%';
	let scale = 1;
	let remarks: RemarkData[] = [];
	if (isPercent && highest <= overFull / 100) {
		// A column that says percent and never passes 1 of them holds shares.
		scale = 100;
		remarks = [{kind: 'unitFromNumbers', channel: 'throttle', header: header.written, unit: 'shares of 1'}];
	} else if (!isPercent) {
		if (highest > overFull && (highest < leastPercent || highest > 100 * overFull)) return undefined;
		scale = highest > overFull ? 1 / 100 : 1;
		remarks = [
			{kind: 'unitFromNumbers', channel: 'throttle', header: header.written, unit: scale === 1 ? 'shares of 1' : '%'},
		];
	}
	for (let i = 0; i < values.length; i++) values[i] = Math.min(1, Math.max(0, values[i]! * scale));
	return remarks;
}

/** In place; false where the brake is never used, or has no number above 0. */
export function brakeShare(values: Numbers): boolean {
	const highest = highestOf(values);
	if (!(highest > 0)) return false;
	for (let i = 0; i < values.length; i++) values[i] = Math.max(0, values[i]! / highest);
	return true;
}

export function highestOf(values: Numbers): number {
	let highest = Number.NEGATIVE_INFINITY;
	for (let i = 0; i < values.length; i++) if (values[i]! > highest) highest = values[i]!;
	return highest;
}
