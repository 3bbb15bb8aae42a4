/** Where a polynomial changes sign. */
import {brentRoot} from './brent.ts';

/**
 * The places strictly inside (low, high) at which the polynomial changes sign, rising. Coefficients lowest power first.
 * Between the sign changes of its derivative it is monotone, so each such piece holds at most one.
 */
export function signChanges(coefficients: readonly number[], low: number, high: number): number[] {
	if (coefficients.length < 2) return [];
	const derivative = coefficients.slice(1).map((coefficient, i) => coefficient * (i + 1));
	const ends = [low, ...signChanges(derivative, low, high), high];
	const value = (x: number) => coefficients.reduceRight((sum, coefficient) => sum * x + coefficient, 0);
	return ends.slice(1).flatMap((end, i) => {
		const opposite = Math.sign(value(ends[i]!)) * Math.sign(value(end)) < 0;
		const root = opposite ? brentRoot(value, ends[i]!, end) : undefined;
		return root === undefined ? [] : [root];
	});
}
