/** Which row is first, and whether the standard errors leave a doubt about it. */
import {meanOf} from './estimates.ts';
import type {Decision, Estimate} from './results.ts';
import type {RowTally} from './tally.ts';

/** A difference counts from this many standard errors on: less than one chance in twenty that it is none. */
const sureErrors = 2;

export type Standing = {readonly row: RowTally; readonly over: Estimate; readonly first: Estimate};

/**
 * With a risk: the least mean time among the rows whose chance of passing the limit is within it. Decided when no row that
 * is faster, nor the chosen one, has a chance within two standard errors of the risk, and the next row's mean time is more
 * than two standard errors of the difference behind. Without one: the greatest chance of being the fastest allowed, decided
 * when the next one's is smaller by more than two standard errors of the difference. Rows that never differ count as one.
 */
export function decide(standings: readonly Standing[], risk: number | null): Decision {
	const open = standings.filter(({row}) => row.barred === null && row.draws > 0);
	// Without a length there is no time to choose by.
	if (open.every(({row}) => Number.isNaN(meanTime(row)))) return {row: null, next: null, isDecided: true, open: []};
	return risk === null ? byChance(open) : withinRisk(open, risk);
}

/** The order that `decide` goes by. */
export function ordered(standings: readonly Standing[], risk: number | null): Standing[] {
	const keyed = standings.map(standing => ({standing, timeS: meanTime(standing.row)}));
	const within = ({over}: Standing) => risk === null || over.value <= risk;
	return keyed
		.sort(
			(one, other) =>
				Number(one.standing.row.barred !== null) - Number(other.standing.row.barred !== null) ||
				Number(within(other.standing)) - Number(within(one.standing)) ||
				(risk === null ? other.standing.first.value - one.standing.first.value : 0) ||
				Number(one.standing.over.value > 1 / 2) - Number(other.standing.over.value > 1 / 2) ||
				compareTimes(one.timeS, other.timeS),
		)
		.map(({standing}) => standing);
}

function compareTimes(one: number, other: number): number {
	if (Number.isNaN(one) || Number.isNaN(other)) return Number(Number.isNaN(one)) - Number(Number.isNaN(other));
	return one - other;
}

/** Over the draws in which it has a time. */
function meanTime(row: RowTally): number {
	let sum = 0;
	let count = 0;
	for (let draw = 0; draw < row.draws; draw++) {
		if (Number.isNaN(row.timeS[draw]!)) continue;
		sum += row.timeS[draw]!;
		count++;
	}
	return count === 0 ? Number.NaN : sum / count;
}

function byChance(standings: readonly Standing[]): Decision {
	const [first, ...others] = ordered(standings, null).filter(({first}) => first.value > 0);
	if (first === undefined) return {row: null, next: null, isDecided: standings.length > 0, open: []};
	const next = others.find(({row}) => differ(first.row, row));
	if (next === undefined) return {row: first.row.name, next: null, isDecided: true, open: []};
	const error = Math.hypot(first.first.error, next.first.error);
	const isDecided = first.first.value - next.first.value > sureErrors * error;
	const open = isDecided ? [] : [`which of ${first.row.name} and ${next.row.name} is more often the fastest`];
	return {row: first.row.name, next: next.row.name, isDecided, open};
}

function withinRisk(standings: readonly Standing[], risk: number): Decision {
	const rows = ordered(standings, risk);
	const [first, ...rest] = rows.filter(({over}) => over.value <= risk);
	const open: string[] = [];
	const isClose = ({over}: Standing) => Math.abs(over.value - risk) <= sureErrors * over.error;
	if (first !== undefined && isClose(first)) open.push(`whether ${first.row.name} is within the risk`);
	const firstS = first === undefined ? Number.POSITIVE_INFINITY : meanTime(first.row);
	for (const standing of rows) {
		const isFaster = standing !== first && standing.over.value > risk && meanTime(standing.row) < firstS;
		if (isFaster && isClose(standing)) open.push(`whether ${standing.row.name}, which is faster, is within the risk`);
	}
	const next = first && rest.find(({row}) => differ(first.row, row));
	if (first !== undefined && next !== undefined) {
		const {value, error} = timeBetween(first.row, next.row);
		if (!(value > sureErrors * error)) open.push(`which of ${first.row.name} and ${next.row.name} is faster`);
	}
	return {row: first?.row.name ?? null, next: next?.row.name ?? null, isDecided: open.length === 0, open};
}

/** By how much the other is slower, on the draws of both. */
function timeBetween(one: RowTally, other: RowTally): Estimate {
	const count = Math.min(one.draws, other.draws);
	return meanOf(count, draw => {
		const difference = other.timeS[draw]! - one.timeS[draw]!;
		return Number.isNaN(difference) ? 0 : difference;
	});
}

function differ(one: RowTally, other: RowTally): boolean {
	const count = Math.min(one.draws, other.draws);
	for (let draw = 0; draw < count; draw++) {
		if (one.isOver[draw] !== other.isOver[draw] || Math.abs(one.timeS[draw]! - other.timeS[draw]!) > same) return true;
	}
	return false;
}

/** Rows with the same ratios may differ in the last digits. */
const same = 1e-9;
