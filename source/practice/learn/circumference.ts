/** The rolling circumference at standstill, and growth, as practice has them. */
import type {Plan} from '../../planning/plan.ts';
import type {Findings} from '../find/findings.ts';
import {type Known, known} from './reading.ts';
import type {CircumferenceReading} from './seen.ts';

export type CircumferenceLearned = {
	/** At standstill, m: harmonic mean of the axle. */
	readonly rolloutM: Known;
	/** That ÷ the documents' one. */
	readonly factor: number;
	/** A fraction at 100 mph; undefined where it was held at the documents' figure. */
	readonly growth: Known | undefined;
	/** Slip under full throttle, held: n/V alone cannot tell it from the circumference. */
	readonly slipHeld: number;
	readonly growthHeld: number;
	/** Numbers that it was made from. */
	readonly readings: number;
	/** Numbers whose speed was the model's, taken for right. */
	readonly withHeldSpeed: number;
};

/**
 * The mean of what the numbers say, each by its own deviation; widened where they scatter more than these say (R. T. Birge,
 * Phys. Rev. 40, 1932). Undefined without any.
 */
export function circumferenceFromReadings(
	plan: Plan,
	words: readonly CircumferenceReading[],
): CircumferenceLearned | undefined {
	if (words.length === 0) return undefined;
	const {growth, slip} = plan.base.vehicle;
	const rolloutM = weightedMean(words.map(word => word.rolloutM));
	return {
		rolloutM,
		factor: rolloutM.value / plan.base.vehicle.rolloutM,
		growth: undefined,
		slipHeld: slip,
		growthHeld: growth,
		readings: words.length,
		withHeldSpeed: words.filter(({speed}) => speed === 'held').length,
	};
}

export function weightedMean(values: readonly Known[]): Known {
	const weights = values.map(({se}) => 1 / se ** 2);
	const total = weights.reduce((sum, weight) => sum + weight, 0);
	const mean = values.reduce((sum, {value}, i) => sum + value * weights[i]!, 0) / total;
	const squares = values.reduce((sum, {value}, i) => sum + (value - mean) ** 2 * weights[i]!, 0);
	const widened = values.length > 1 ? Math.max(1, Math.sqrt(squares / (values.length - 1))) : 1;
	return known(mean, widened / Math.sqrt(total));
}

/** As the log has it; undefined where it cannot tell. */
export function circumferenceFromFindings(plan: Plan, {circumference}: Findings): CircumferenceLearned | undefined {
	if (circumference === undefined) return undefined;
	const {rolloutM, growth, growthHeld, slipHeld, readings} = circumference;
	return {
		rolloutM: known(rolloutM.value, rolloutM.se),
		factor: rolloutM.value / plan.base.vehicle.rolloutM,
		growth: growthHeld ? undefined : known(growth.value, growth.se),
		slipHeld,
		growthHeld: plan.base.vehicle.growth,
		readings,
		withHeldSpeed: 0,
	};
}
