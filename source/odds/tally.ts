/** What every row did in every draw, and what follows from it. */
import type {Candidate} from '../planning/candidates.ts';
import {replicates} from './estimates.ts';
import type {Drawn, RowDraw, Spot} from './row-draw.ts';

/** Two rows this close are as fast as each other: the same ratios in another set. */
export const levelS = 1e-9;

export class RowTally {
	readonly candidate: Candidate;
	readonly name: string;
	readonly barred: string | null;
	/** How many draws it has been through, from the first on. */
	draws = 0;
	/** In how many of them it was over the limit. */
	overCount = 0;
	readonly timeS: Float64Array;
	readonly highestRpm: Float64Array;
	readonly isOver: Uint8Array;
	readonly isAllowed: Uint8Array;
	readonly spot: Spot = {condition: 0, place: 0};
	worthwhile: Drawn['worthwhile'];

	constructor(candidate: Candidate, barred: string | null, most: number) {
		this.candidate = candidate;
		this.name = `${candidate.pairName} ${candidate.gearbox.name}`;
		this.barred = barred;
		this.timeS = new Float64Array(most);
		this.highestRpm = new Float64Array(most);
		this.isOver = new Uint8Array(most);
		this.isAllowed = new Uint8Array(most);
	}

	/** Once it has been over the limit in every one of its draws, the place where it was is looked at first. */
	get isBrief(): boolean {
		return this.draws >= replicates && this.overCount === this.draws;
	}

	add({timeS, highestRpm, isOver, isAllowed}: RowDraw): void {
		const draw = this.draws++;
		this.timeS[draw] = timeS;
		this.highestRpm[draw] = highestRpm;
		this.isOver[draw] = isOver ? 1 : 0;
		if (isOver) this.overCount++;
		this.isAllowed[draw] = isAllowed ? 1 : 0;
	}
}

/** The least time among the allowed rows of each draw, and how many rows share it. */
export type Best = {readonly timeS: Float64Array; readonly sharedBy: Uint16Array};

export function bestOf(rows: readonly RowTally[], draws: number): Best {
	const timeS = new Float64Array(draws).fill(Number.POSITIVE_INFINITY);
	const sharedBy = new Uint16Array(draws);
	for (const row of rows) {
		const count = Math.min(draws, row.draws);
		for (let draw = 0; draw < count; draw++) {
			if (row.isAllowed[draw] === 0 || Number.isNaN(row.timeS[draw]!)) continue;
			const lead = timeS[draw]! - row.timeS[draw]!;
			if (lead > levelS) {
				timeS[draw] = row.timeS[draw]!;
				sharedBy[draw] = 1;
			} else if (lead >= -levelS) sharedBy[draw]!++;
		}
	}
	return {timeS, sharedBy};
}

/** The row's part in being first: 1, or less where others are as fast. */
export function firstPart(row: RowTally, best: Best, draw: number): number {
	if (row.isAllowed[draw] === 0 || !(row.timeS[draw]! - best.timeS[draw]! <= levelS)) return 0;
	return 1 / best.sharedBy[draw]!;
}

/** The mean of how much slower it is than the best where it is not that; null where it always is, or no time can be had. */
export function lossOf(row: RowTally, best: Best): number | null {
	let sum = 0;
	let count = 0;
	for (let draw = 0; draw < row.draws; draw++) {
		const loss = row.timeS[draw]! - best.timeS[draw]!;
		if (!(loss > levelS) || !Number.isFinite(loss)) continue;
		sum += loss;
		count++;
	}
	return count === 0 ? null : sum / count;
}

/** How far behind the best it is on the mean, in standard deviations of that; 0 where it was no slower in a draw or has no time. */
export function deviationsBehind(row: RowTally, best: Best): number {
	let [count, sum, squares] = [0, 0, 0];
	for (let draw = 0; draw < best.timeS.length; draw++) {
		const behind = row.timeS[draw]! - best.timeS[draw]!;
		if (!Number.isFinite(behind)) continue;
		if (behind <= levelS) return 0;
		count++;
		sum += behind;
		squares += behind * behind;
	}
	if (count < 2) return 0;
	const mean = sum / count;
	return mean / Math.sqrt(Math.max(Number.MIN_VALUE, (squares - count * mean * mean) / (count - 1)));
}
