/** The arithmetic of a drop pair and of the reductions in a row. */
import type {Pair} from './car.ts';

/** Driven ÷ driving teeth; above 1 it turns the engine faster at a given road speed. */
export function pairRatio(pair: Pair): number {
	return pair.driven / pair.driving;
}

/** The two gears on the wrong shafts: the ratio is inverted. */
export function flipped(pair: Pair): Pair {
	return {driving: pair.driven, driven: pair.driving};
}

/** What a case of one center distance accepts, for one module and no profile shift. */
export function toothSum(pair: Pair): number {
	return pair.driving + pair.driven;
}

export function samePair(one: Pair, other: Pair): boolean {
	return one.driving === other.driving && one.driven === other.driven;
}

/** "33/38": driving/driven. */
export function pairName(pair: Pair): string {
	return `${pair.driving}/${pair.driven}`;
}

/** The pair that "33/38" names, each gear with at least one tooth; undefined for anything else. */
export function parsePair(text: string): Pair | undefined {
	const [, driving, driven] = /^\s*(\d{1,4})\s*\/\s*(\d{1,4})\s*$/.exec(text) ?? [];
	const pair = {driving: Number(driving), driven: Number(driven)};
	return pair.driving > 0 && pair.driven > 0 ? pair : undefined;
}

/** Overall ratio of each gear: gear × pair × final drive, in the order of `ratios`. */
export function overallRatios(ratios: readonly number[], pair: Pair, finalDrive: number): number[] {
	return ratios.map(ratio => (ratio * pair.driven * finalDrive) / pair.driving);
}

/**
 * Turns of the shaft ahead of gearbox and drop pair when the wheels are turned by hand in one gear: overall ratio × the mean
 * of the two wheels' turns, which is what a differential's case makes. One wheel still gives half.
 */
export function handTurns(overall: number, leftTurns: number, rightTurns: number): number {
	return (overall * (leftTurns + rightTurns)) / 2;
}
