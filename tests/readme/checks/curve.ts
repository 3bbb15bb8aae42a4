/** The curve through the dyno points. */
import {monotoneCubic, valueAt} from '../../../source/drivetrain/monotone-cubic.ts';
import {casesOf, type OutsideCheck} from '../outside-check.ts';

/** Fritsch & Carlson's data RPN14, in full digits and as NAG's example rounds it. */
const x = [7.99, 8.09, 8.19, 8.7, 9.2, 10, 12, 15, 20];
const rounded = [0, 0.27643e-4, 0.4375e-1, 0.16918, 0.46943, 0.94374, 0.99864, 0.99992, 0.99999];
const full = [0, 2.76429e-5, 4.37498e-2, 0.169183, 0.469428, 0.94374, 0.998636, 0.999919, 0.999994];

/** Gillespie's torque table, p. 32. */
const rpm = [800, 1200, 1600, 2000, 2400, 2800, 3200, 3600, 4000, 4400, 4800, 5200];
const poundFeet = [120, 132, 145, 160, 175, 181, 190, 198, 200, 201, 198, 180];

export const curve: readonly OutsideCheck[] = [
	{
		what: 'Monotone cubic through RPN14, seven places',
		source: 'NAG e01bec/e01bff, printed example',
		mark: 'published',
		cases: casesOf(
			[
				['0.4640', 9.191],
				['0.9645', 10.392],
				['0.9965', 11.593],
				['0.9992', 12.794],
				['0.9998', 13.995],
				['0.9999', 15.196],
				['1.0000', 16.397],
			],
			place => valueAt(monotoneCubic(x, rounded), place),
		),
		tolerance: 1e-4,
	},
	{
		what: 'The same in full digits',
		source: 'scipy 1.10.1, PchipInterpolator',
		mark: 'recomputed',
		cases: casesOf(
			[
				['0.46401431', 9.191],
				['0.96446961', 10.392],
				['0.99648809', 11.593],
				['0.99923975', 12.794],
				['0.99977114', 13.995],
				['0.99992502', 15.196],
			],
			place => valueAt(monotoneCubic(x, full), place),
		),
		tolerance: 2e-8,
	},
	{
		what: 'Torque between the points of a dyno table, six places',
		source: 'scipy 1.10.1, PchipInterpolator',
		mark: 'recomputed',
		unit: 'lbf ft',
		cases: casesOf(
			[
				['125.8775', 1000],
				['138.31892857', 1400],
				['168.30357143', 2200],
				['185.34117647', 3000],
				['200.14285714', 4600],
				['191.54464286', 5000],
			],
			place => valueAt(monotoneCubic(rpm, poundFeet), place),
		),
		tolerance: 1e-10,
	},
];
