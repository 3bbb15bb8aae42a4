/** What odds answer: the shape that `--json` prints, that the text output and the screen lay out. SI; chances are shares of 1. */
import type {InputKind, InputUnit} from './input.ts';

/** A value and its standard error. */
export type Estimate = {readonly value: number; readonly error: number};

export type Spread = {readonly mean: number; readonly sd: number};

export type OddsRow = {
	readonly pair: string;
	readonly gearbox: string;
	/** Whether it is in the car. */
	readonly installed: boolean;
	/** Why it cannot be mounted whatever the draw; such a row is not drawn. */
	readonly barred: string | null;
	/** On how many draws this stands. */
	readonly draws: number;
	/** Chance of passing the RPM limit anywhere in any situation; null where it is not drawn. */
	readonly over: Estimate | null;
	/** Chance of being the fastest of those that are allowed in the same draw; rows just as fast share it; null where it is not drawn. */
	readonly first: Estimate | null;
	/** Share-weighted mean time; null where none can be had. */
	readonly timeS: Spread | null;
	readonly highestRpm: Spread | null;
	/** How much slower it is than the fastest allowed one, on the mean of the draws in which it is not that; null where it always is. */
	readonly lossS: number | null;
};

export type OddsInput = {
	readonly name: string;
	readonly kind: InputKind;
	readonly sd: number;
	readonly unit: InputUnit;
	readonly source: 'stated' | 'default';
	readonly why: string;
};

export type Decision = {
	/** "33/38 A"; null where nothing is within the risk, nothing is allowed in any draw, or no straight has a length. */
	readonly row: string | null;
	/** The one that would be next. */
	readonly next: string | null;
	/** Whether the standard errors leave no doubt, by the rule of `decide.ts`. */
	readonly isDecided: boolean;
	/** What is still open; empty where it is decided. */
	readonly open: readonly string[];
};

export type Odds = {
	readonly seed: number;
	/** The risk that is accepted, if one is: a chance of passing the RPM limit. */
	readonly risk: number | null;
	readonly rpmLimit: number;
	readonly anchored: boolean;
	/** Whether all draws have been made that the answer asked for. */
	readonly isComplete: boolean;
	/** Draws of the row with the most. */
	readonly draws: number;
	readonly inputs: readonly OddsInput[];
	/** Stated in a document, and not among what is drawn. */
	readonly notDrawn: readonly string[];
	/** The best first; barred rows last. */
	readonly rows: readonly OddsRow[];
	readonly decision: Decision;
};

/** How much of the variance of something comes from one input alone (the first-order share). */
export type Share = {readonly name: string; readonly kind: InputKind; readonly share: Estimate};

export type Matters = {
	/** The first two rows by time. */
	readonly rows: readonly [string, string] | readonly [string];
	/** Of the first row's margin to the limit; largest first. */
	readonly margin: readonly Share[];
	/** Of the difference in time between the two; empty with one row. */
	readonly difference: readonly Share[];
};
