/** An integral by a general-purpose integrator, for the tests: E. Hairer and G. Wanner's ODEX. */
import {createRequire} from 'node:module';

type Odex = {
	absoluteTolerance: number;
	relativeTolerance: number;
	maxSteps: number;
	solve(slopes: (x: number, y: number[]) => number[], x: number, y: readonly number[], xEnd: number): {y: number[]};
};
const {Solver} = createRequire(import.meta.url)('odex') as {Solver: new (dimension: number) => Odex};

/** ∫ f dx for each of the functions. */
export function byOdex(integrands: readonly ((x: number) => number)[], from: number, to: number): number[] {
	if (from === to) return integrands.map(() => 0);
	const solver = new Solver(integrands.length);
	solver.absoluteTolerance = 1e-13;
	solver.relativeTolerance = 1e-13;
	solver.maxSteps = 100_000;
	const start = integrands.map(() => 0);
	return solver.solve(x => integrands.map(integrand => integrand(x)), from, start, to).y;
}
