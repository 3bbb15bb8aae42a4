/** Regression on readings that come in groups, each of which errs as a whole by something of its own. */
import type {RobustFit} from './huber.ts';
import {type Columns, residualsOf} from './least-squares.ts';
import {median, robustSd} from './robust.ts';

/** Readings with a share of their group's mean taken off. */
export type Evened = {readonly columns: Columns; readonly y: Float64Array};

/**
 * The readings made such that least squares on them is the generalized least squares of the model with a random level for each
 * group (P. A. V. B. Swamy & S. S. Arora, Econometrica 40, 1972): from each its group's mean times
 * θ = 1 − √(σe²/(σe² + n·σu²)). What differs within a group then counts in full, what differs between groups by how well the
 * groups agree. Both deviations are robust ones of the residuals of a first fit, whose weights the means have.
 */
export function groupLevelsEvened(
	columns: Columns,
	y: Float64Array,
	groups: ArrayLike<number>,
	first: RobustFit,
): Evened {
	const members = membersOf(groups);
	const residuals = residualsOf(columns, y, first.coefficients);
	const shares = sharesOf(members, residuals, first.weights);
	const evened = (values: Float64Array) => {
		const less = values.slice();
		members.forEach((of, g) => {
			const mean = weightedMean(of, values, first.weights);
			for (const i of of) less[i]! -= shares[g]! * mean;
		});
		return less;
	};
	return {columns: columns.map(evened), y: evened(y)};
}

/** θ of each group. */
function sharesOf(members: readonly number[][], residuals: Float64Array, weights: Float64Array): number[] {
	const levels = members.map(of => weightedMean(of, residuals, weights));
	const within = new Float64Array(residuals.length);
	members.forEach((of, g) => {
		for (const i of of) within[i] = residuals[i]! - levels[g]!;
	});
	const spare = residuals.length - members.length;
	if (spare <= 0) return members.map(() => 0);
	const withinVariance = robustSd(within, 0) ** 2 * (residuals.length / spare);
	const ofMeans = median(members.map(of => withinVariance / of.length));
	const betweenVariance = Math.max(0, robustSd(levels) ** 2 - ofMeans);
	if (!(withinVariance > 0)) return members.map(() => 0);
	return members.map(of => 1 - Math.sqrt(withinVariance / (withinVariance + of.length * betweenVariance)));
}

/** Indices of the readings of each group. */
function membersOf(groups: ArrayLike<number>): number[][] {
	const members = new Map<number, number[]>();
	for (let i = 0; i < groups.length; i++) {
		const of = members.get(groups[i]!);
		if (of === undefined) members.set(groups[i]!, [i]);
		else of.push(i);
	}
	return [...members.values()];
}

function weightedMean(of: readonly number[], values: Float64Array, weights: Float64Array): number {
	let [sum, total] = [0, 0];
	for (const i of of) {
		sum += weights[i]! * values[i]!;
		total += weights[i]!;
	}
	return sum / total;
}
