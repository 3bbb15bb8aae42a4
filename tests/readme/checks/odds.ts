/** Draws and shares under the odds. */
import {normalQuantile} from '../../../source/odds/draws/normal-quantile.ts';
import {sobolInteger} from '../../../source/odds/draws/sobol.ts';
import {firstOrderSteps} from '../../../source/odds/first-order.ts';
import {finish} from '../../../source/planning/run-rack.ts';
import {ishigami} from '../../odds/ishigami.ts';
import {casesOf, type OutsideCheck} from '../outside-check.ts';

/** The generator's usual order: each point differs from the one before by one direction number. */
const gray = (index: number) => index ^ (index >>> 1);
const [shares] = finish(firstOrderSteps(3, point => [ishigami(point)], 65_536, 1));

export const odds: readonly OutsideCheck[] = [
	{
		what: 'Normal quantile at 0.25, 0.001 and 1e-20',
		source: 'Wichura, algorithm AS 241, Appl. Stat. 37 (1988)',
		mark: 'published',
		cases: casesOf(
			[
				['-0.6744897501960817', 0.25],
				['-3.090232306167813', 0.001],
				['-9.262340089798409', 1e-20],
			],
			normalQuantile,
		),
		tolerance: 1e-14,
	},
	{
		what: 'Sobol sequence, point 1000, five of 96 dimensions, times 2³²',
		source: 'Joe & Kuo, SIAM J. Sci. Comput. 30 (2008), as in scipy 1.17.1',
		mark: 'recomputed',
		cases: casesOf(
			[
				['2906652672', 3],
				['364904448', 10],
				['3569352704', 37],
				['557842432', 64],
				['3720347648', 95],
			],
			dimension => sobolInteger(gray(1000), dimension),
		),
		tolerance: 0,
	},
	{
		what: "First-order shares of the Ishigami function's first two inputs",
		source: 'Saltelli et al., Sensitivity Analysis in Practice (2004); 65,536 draws',
		mark: 'published',
		cases: [
			{outside: '0.3139', ours: shares![0]!.value},
			{outside: '0.4424', ours: shares![1]!.value},
		],
		tolerance: 0.01,
	},
];
