/** Slices added up: time by gear and step of RPM, turns, work, and what is above an RPM. */
import type {Lap} from './lap.ts';
import {isAbove, type Slice, stepOf, stepRpm, type Throttle} from './slice.ts';

export type DwellCell = {readonly gear: number; readonly fromRpm: number; readonly toRpm: number; timeS: number};

export type Tally = {
	timeS: number;
	turns: number;
	energyJ: number;
	aboveS: number;
	highestRpm: number;
	readonly throttleS: Record<Throttle, number>;
	/** By gear and step. */
	readonly cells: Map<string, DwellCell>;
};

export function emptyTally(): Tally {
	return {
		timeS: 0,
		turns: 0,
		energyJ: 0,
		aboveS: 0,
		highestRpm: 0,
		throttleS: {full: 0, part: 0, closed: 0},
		cells: new Map(),
	};
}

/** Adds `weight` laps' worth; the slices of a lap are its whole time. */
export function addLap(tally: Tally, {slices, timeS: lapS}: Lap, weight: number, aboveRpm: number): void {
	tally.timeS += weight * lapS;
	for (const slice of slices) {
		const timeS = weight * slice.timeS;
		tally.turns += weight * slice.turns;
		tally.energyJ += weight * slice.energyJ;
		tally.throttleS[slice.throttle] += timeS;
		if (isAbove(slice, aboveRpm)) tally.aboveS += timeS;
		tally.highestRpm = Math.max(tally.highestRpm, slice.fromRpm, slice.toRpm);
		cellOf(tally, slice).timeS += timeS;
	}
}

/** By rising RPM, then gear. */
export function cellsOf({cells}: Tally): DwellCell[] {
	return [...cells.values()].sort((a, b) => a.fromRpm - b.fromRpm || a.gear - b.gear);
}

function cellOf({cells}: Tally, slice: Slice): DwellCell {
	const step = stepOf(slice);
	const key = `${slice.gear} ${step}`;
	const known = cells.get(key) ?? {gear: slice.gear, fromRpm: step * stepRpm, toRpm: (step + 1) * stepRpm, timeS: 0};
	cells.set(key, known);
	return known;
}
