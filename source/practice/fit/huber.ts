/**
 * Robust regression after P. J. Huber (Robust estimation of a location parameter, Ann. Math. Statist. 35, 1964; Robust
 * Statistics, 1981, ch. 7): squares near the middle, absolute values far out, by iteratively reweighted least squares.
 */
import {finish} from '../../planning/run-rack.ts';
import {type Columns, leastSquares, residualsOf} from './least-squares.ts';
import {robustSd} from './robust.ts';

/** The bend in standard deviations: 95 % as efficient as least squares where the errors are normal. */
export const huberBend = 1.345;

/** The weight of a reading u standard deviations off: 1 up to the bend k, then k/|u|. */
export function huberWeight(u: number, k = huberBend): number {
	return Math.abs(u) <= k ? 1 : k / Math.abs(u);
}

export type RobustFit = {
	/** One a column. */
	readonly coefficients: Float64Array;
	/** Covariance of the coefficients, row by row. */
	readonly covariance: Float64Array;
	/** Robust standard deviation of a reading: median distance from the fit ÷ 0.6745. */
	readonly scale: number;
	/** Of each reading, 0 to 1. */
	readonly weights: Float64Array;
};

const mostRounds = 60;
/** Rounds end when no fitted coefficient moves by more than this share of its own size, or of the scale. */
const settled = 1e-9;

/**
 * Huber's M-estimate of y on the columns. Without `groups` the readings count as independent (asymptotic covariance, Huber
 * 1981, eq. 7.6.6). `groups` names the group of each reading, such as one pass of a straight: readings of one group may err
 * together (sandwich over groups). Undefined where the columns do not determine the coefficients.
 */
export function huberFit(columns: Columns, y: Float64Array, groups?: ArrayLike<number>): RobustFit | undefined {
	return finish(huberSteps(columns, y, groups));
}

/** The same round by round, for a caller that has other things to do in between. */
export function* huberSteps(
	columns: Columns,
	y: Float64Array,
	groups?: ArrayLike<number>,
): Generator<undefined, RobustFit | undefined, void> {
	let fit = leastSquares(columns, y);
	if (fit === undefined) return undefined;
	let coefficients = fit.coefficients;
	let residuals = fit.residuals;
	let weights = new Float64Array(y.length).fill(1);
	for (let round = 0; round < mostRounds; round++) {
		yield;
		const scale = robustSd(residuals, 0);
		if (!(scale > 0)) break;
		weights = residuals.map(r => huberWeight(r / scale));
		fit = leastSquares(columns, y, weights);
		if (fit === undefined) return undefined;
		const before = coefficients;
		coefficients = fit.coefficients;
		residuals = residualsOf(columns, y, coefficients);
		if (coefficients.every((b, j) => Math.abs(b - before[j]!) <= settled * (Math.abs(b) + scale))) break;
	}
	yield;
	const scale = robustSd(residuals, 0);
	const covariance =
		groups === undefined
			? independentCovariance(columns, residuals, scale)
			: groupedCovariance(columns, residuals, scale, groups);
	return {coefficients, covariance, scale, weights};
}

/** Huber 1981, eq. 7.6.6: K²·[Σψ²/(n − p)]/[Σψ′/n]²·(XᵀX)⁻¹, with K = 1 + (p/n)·var(ψ′)/mean(ψ′)². */
function independentCovariance(columns: Columns, residuals: Float64Array, scale: number): Float64Array {
	const [n, p] = [residuals.length, columns.length];
	const {inverse} = leastSquares(columns, residuals)!;
	if (!(scale > 0)) return inverse.map(() => 0);
	const inner = residuals.filter(r => Math.abs(r) <= huberBend * scale).length / n;
	const psiSquared = residuals.reduce((sum, r) => sum + bent(r, scale) ** 2, 0) / (n - p);
	const k = 1 + ((p / n) * (1 - inner)) / inner;
	return inverse.map(entry => (k ** 2 * psiSquared * entry) / inner ** 2);
}

/**
 * The sandwich with one score a group (Liang & Zeger, Biometrika 73, 1986), with the small-sample factor G/(G − 1)·(n − 1)/(n − p)
 * (Cameron & Miller, J. Human Resources 50, 2015). With one group alone it says nothing: infinite.
 */
function groupedCovariance(
	columns: Columns,
	residuals: Float64Array,
	scale: number,
	groups: ArrayLike<number>,
): Float64Array {
	const [n, p] = [residuals.length, columns.length];
	const inner = Float64Array.from(residuals, r => (Math.abs(r) <= huberBend * scale || scale === 0 ? 1 : 0));
	const bread = leastSquares(columns, residuals, inner)?.inverse;
	const scores = new Map<number, Float64Array>();
	for (let i = 0; i < n; i++) {
		const score = scores.get(groups[i]!) ?? new Float64Array(p);
		for (let j = 0; j < p; j++) score[j]! += columns[j]![i]! * bent(residuals[i]!, scale);
		scores.set(groups[i]!, score);
	}
	const count = scores.size;
	if (bread === undefined || count < 2) return new Float64Array(p * p).fill(Number.POSITIVE_INFINITY);
	const factor = ((count / (count - 1)) * (n - 1)) / (n - p);
	const covariance = new Float64Array(p * p);
	for (const score of scores.values()) {
		const moved = times(bread, score);
		for (let j = 0; j < p; j++) for (let k = 0; k < p; k++) covariance[j * p + k]! += factor * moved[j]! * moved[k]!;
	}
	return covariance;
}

/** Huber's ψ in the units of the residual. */
const bent = (residual: number, scale: number) => Math.max(-huberBend * scale, Math.min(huberBend * scale, residual));

function times(matrix: Float64Array, vector: Float64Array): Float64Array {
	const p = vector.length;
	return vector.map((_, j) => vector.reduce((sum, value, k) => sum + matrix[j * p + k]! * value, 0));
}
