/** General-purpose integrators under one roof. */
import {createRequire} from 'node:module';
import * as mathjs from 'mathjs';
import type {Integrator, Slopes} from './all-sequences.ts';

const {solveODE} = mathjs as unknown as {
	solveODE(slopes: Slopes, span: number[], start: number[], options: object): {y: number[][]};
};
type Odex = {
	absoluteTolerance: number;
	relativeTolerance: number;
	solve(slopes: Slopes, from: number, start: number[], to: number): {y: number[]};
};
const {Solver} = createRequire(import.meta.url)('odex') as {Solver: new (dimension: number) => Odex};

/** Extrapolation by Bulirsch and Stoer. */
export const byOdex =
	(tolerance: number): Integrator =>
	(slopes, from, start, to) => {
		const solver = new Solver(start.length);
		solver.absoluteTolerance = tolerance;
		solver.relativeTolerance = tolerance;
		return solver.solve(slopes, from, start, to).y;
	};

/** Runge-Kutta of orders 5 and 4. */
export const byMathjs =
	(tolerance: number): Integrator =>
	(slopes, from, start, to) =>
		solveODE(slopes, [from, to], start, {tol: tolerance, maxIter: 1e7}).y.at(-1)!;

/** Tolerances from loose to tight, so many a decade. */
const [stepsADecade, loosest, tightest] = [4, 9, 15];

export type Tuned = {readonly integrate: Integrator; readonly told: string};

/** An integrator at the loosest tolerance that reaches an error, so that it does no more than it must. */
export function tuned(
	name: string,
	by: (tolerance: number) => Integrator,
	errorWith: (integrate: Integrator) => number,
	allowed: number,
): Tuned {
	for (let step = stepsADecade * loosest; step <= stepsADecade * tightest; step++) {
		const tolerance = 10 ** (-step / stepsADecade);
		const error = errorWith(by(tolerance));
		if (error <= allowed)
			return {
				integrate: by(tolerance),
				told: `${name} ${error.toExponential(1)} at tolerance ${tolerance.toExponential(1)}`,
			};
	}
	throw new Error(`${name}: no tolerance reaches ${allowed}`);
}
