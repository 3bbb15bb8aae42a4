/** One comparison with a number that comes from outside the project. */
import {relativeError} from '../close.ts';

/** A value as it is printed outside, and ours. */
export type Case = {
	readonly outside: string;
	/** Where the text is a rounding of it. */
	readonly exact?: number;
	readonly ours: number;
	/** Where the cases of a check differ in it. */
	readonly unit?: string;
};

export type OutsideCheck = {
	readonly what: string;
	readonly source: string;
	/** Read in the source's text, worked out again with a closed form or another library, or the source known but not at hand. */
	readonly mark: 'published' | 'recomputed' | 'from memory';
	/** Of every case that has none of its own; left out for a plain number. */
	readonly unit?: string;
	/** One or more; the worst is shown. */
	readonly cases: readonly Case[];
	/** The relative error that no case may pass: what rounding of the outside value or a stated difference in method explains. */
	readonly tolerance: number;
};

export const errorOf = ({outside, exact = Number(outside), ours}: Case): number => relativeError(ours, exact);

/** Errors below this are not told apart: they would differ from machine to machine. */
export const finestError = 1e-9;

export const worstCase = (check: OutsideCheck): Case => {
	const shownError = (one: Case) => Math.max(errorOf(one), finestError);
	return check.cases.reduce((worst, next) => (shownError(next) > shownError(worst) ? next : worst));
};

/** Cases from rows whose first number is the outside one, with the function that gives ours from the others. */
export const casesOf = <Inputs extends readonly unknown[]>(
	rows: readonly (readonly [outside: string, ...inputs: Inputs])[],
	ours: (...inputs: Inputs) => number,
): Case[] => rows.map(([outside, ...inputs]) => ({outside, ours: ours(...(inputs as unknown as Inputs))}));
