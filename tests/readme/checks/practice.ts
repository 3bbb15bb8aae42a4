/** The statistics under what is learned from practice. */
import {huberFit} from '../../../source/practice/fit/huber.ts';
import {leastSquares, residualSd, standardErrors} from '../../../source/practice/fit/least-squares.ts';
import {longley, norris, type ReferenceSet} from '../../practice/fit/reference-sets.ts';
import {stackLoss} from '../../practice/fit/stack-loss.ts';
import type {Case, OutsideCheck} from '../outside-check.ts';

const paired = (outside: readonly number[], ours: ArrayLike<number>): Case[] =>
	outside.map((value, i) => ({outside: String(value), ours: ours[i]!}));

function casesFor({columns, y, ...certified}: ReferenceSet): Case[] {
	const fit = leastSquares(columns, y)!;
	return [
		...paired(certified.coefficients, fit.coefficients),
		...paired(certified.standardErrors, standardErrors(fit)),
		...paired([certified.residualSd], [residualSd(fit.residuals, columns.length)]),
	];
}

const huber = huberFit(stackLoss.columns, stackLoss.y)!;

export const practice: readonly OutsideCheck[] = [
	{
		what: 'Least squares: Norris, coefficients, standard errors and residuals',
		source: 'NIST, Statistical Reference Datasets',
		mark: 'from memory',
		cases: casesFor(norris),
		tolerance: 1e-11,
	},
	{
		what: 'The same of Longley, seven nearly dependent columns',
		source: 'NIST, Statistical Reference Datasets',
		mark: 'from memory',
		cases: casesFor(longley),
		tolerance: 1e-8,
	},
	{
		what: "Huber's robust fit of the stack loss data: coefficients",
		source: 'statsmodels, RLM with HuberT (data: Brownlee, 1965)',
		mark: 'from memory',
		cases: paired(stackLoss.coefficients, huber.coefficients),
		tolerance: 5e-4,
	},
];
