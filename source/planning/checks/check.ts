/** What a check is: from the runs of one row to the worst reading, or to nothing where it does not apply. */
import type {MeasuredPoint} from '../measured.ts';
import type {Plan} from '../plan.ts';
import type {Check, CheckName, Verdict} from '../results.ts';
import type {RowRun} from '../run-row.ts';

/** What holds for every row that is judged. */
export type Ground = {
	readonly plan: Plan;
	readonly measured: readonly MeasuredPoint[];
	readonly anchored: boolean;
};

export type RowCheck = (row: RowRun, ground: Ground) => Check | undefined;

/** One number against its bound, at one place. */
export type Reading = {
	readonly verdict: Verdict;
	readonly value: number | null;
	readonly bound: number | null;
	/** Positive on the good side. */
	readonly margin: number | null;
	readonly place?: string;
	/** Of the place: "exit", "shift 3-4". */
	readonly part?: string;
	readonly situation?: string;
	readonly remark?: string | undefined;
};

const severity: Record<Verdict, number> = {pass: 0, near: 1, fail: 2};

/** Whether the first verdict is worse than the second. */
export function isWorse(one: Verdict, other: Verdict): boolean {
	return severity[one] > severity[other];
}

/** The worse reading: by verdict first, then by margin; the first of two equals. A missing margin counts as the least. */
export function worseOf(worst: Reading | undefined, next: Reading): Reading {
	if (worst === undefined || isWorse(next.verdict, worst.verdict)) return next;
	if (next.verdict !== worst.verdict) return worst;
	return (next.margin ?? Number.NEGATIVE_INFINITY) < (worst.margin ?? Number.NEGATIVE_INFINITY) ? next : worst;
}

/** The entry of the answer; nothing where there was no reading. */
export function checkOf(check: CheckName, worst: Reading | undefined): Check | undefined {
	if (worst === undefined) return undefined;
	const {verdict, value, bound, margin, place = '', part = '', situation = '', remark} = worst;
	const entry: Check = {check, verdict, value, bound, margin, at: `${place} ${part}`.trim(), situation};
	return remark === undefined ? entry : {...entry, remark};
}

const shiftParts: string[] = [];

/** "shift 3-4", the same text for every row. */
export function shiftPart(from: number): string {
	shiftParts[from] ??= `shift ${from}-${from + 1}`;
	return shiftParts[from];
}
