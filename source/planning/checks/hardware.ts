/** The gears themselves: whether they fit the case, are on hand, and have miles left. */
import {toothSum} from '../../drivetrain/gear-pair.ts';
import {checkOf, type RowCheck} from './check.ts';

/** Tooth sum against the nearest one that the housing accepts. */
export const housing: RowCheck = ({candidate}, {plan}) => {
	const {toothSums} = plan.car.rack;
	if (toothSums === undefined) return undefined;
	const sum = toothSum(candidate.pair);
	const nearest = toothSums.reduce<number | null>(
		(best, accepted) => (best === null || Math.abs(accepted - sum) < Math.abs(best - sum) ? accepted : best),
		null,
	);
	return checkOf('housing', {
		verdict: sum === nearest ? 'pass' : 'fail',
		value: sum,
		bound: nearest,
		margin: nearest === null ? null : 0 - Math.abs(nearest - sum),
	});
};

/** Sets on hand. */
export const stock: RowCheck = ({candidate}) => {
	const {sets} = candidate.pair;
	return checkOf('stock', {verdict: sets < 1 ? 'fail' : 'pass', value: sets, bound: 1, margin: sets - 1});
};

/** From this share of its allowed miles on a pair is worth a look. */
const worn = 0.9;

/** Distance run, in m, against the most that the pair may run. */
export const mileage: RowCheck = ({candidate}) => {
	const {milesM, maxMilesM} = candidate.pair;
	if (maxMilesM === undefined) return undefined;
	const verdict = milesM > maxMilesM ? 'fail' : milesM > worn * maxMilesM ? 'near' : 'pass';
	return checkOf('mileage', {verdict, value: milesM, bound: maxMilesM, margin: maxMilesM - milesM});
};
