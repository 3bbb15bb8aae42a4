import {createRequire} from 'node:module';
import * as mathjs from 'mathjs';
import {gaussLegendre} from '../../source/drivetrain/gauss-legendre.ts';
import {RoadGears} from '../../source/drivetrain/road-gears.ts';
import {runStraight} from '../../source/drivetrain/run-straight.ts';
import {sampleCourse, sampleTrain, sampleVehicle} from '../drivetrain/sample-car.ts';
import {assertClose, budget, line, timed, told} from './harness.ts';

type Slopes = (s: number, state: number[]) => number[];

const {solveODE} = mathjs as unknown as {
	solveODE(slopes: Slopes, span: number[], start: number[], options: object): {y: number[][]};
};
type Odex = {
	absoluteTolerance: number;
	relativeTolerance: number;
	solve(slopes: Slopes, s: number, start: number[], end: number): {y: number[]};
};
const {Solver} = createRequire(import.meta.url)('odex') as {Solver: new (dimension: number) => Odex};

/** One gear from 45 m/s over 400 m: no shift, so that general integrators can do it in one call, over the distance. */
const course = sampleCourse({exitMps: 45, lengthM: 400, lowestGear: 4, highestGear: 4});
const gears = new RoadGears(sampleVehicle(), sampleTrain, course);
const motion = gears.motion(4);
const slopes: Slopes = (_, [v]) => [motion.acceleration(v!) / v!, 1 / v!];
const start = [course.exitMps, 0];

const byOdex = (tolerance: number) => {
	const solver = new Solver(2);
	solver.absoluteTolerance = tolerance;
	solver.relativeTolerance = tolerance;
	return solver.solve(slopes, 0, start, course.lengthM).y[1]!;
};
const byMathjs = (tolerance: number) =>
	solveODE(slopes, [0, course.lengthM], start, {tol: tolerance, maxIter: 1e7}).y.at(-1)![1]!;
const bySolver = (at: RoadGears) => {
	const run = runStraight(at, course);
	if (run.kind !== 'ran') throw new Error(run.kind);
	return run.fastest;
};

/** Time over the distance by quadrature on pieces so small that only rounding is left. */
function reference(): number {
	const {nodes, weights} = gaussLegendre(20);
	const endMps = bySolver(gears).finalMps;
	const edges = [course.exitMps, ...motion.breaks.filter(v => v > course.exitMps && v < endMps), endMps];
	let [timeS, distanceM] = [0, 0];
	for (let i = 1; i < edges.length; i++) {
		for (let part = 0; part < 8; part++) {
			const half = (edges[i]! - edges[i - 1]!) / 16;
			const middle = edges[i - 1]! + (2 * part + 1) * half;
			nodes.forEach((node, k) => {
				const speed = middle + half * node;
				timeS += (weights[k]! * half) / motion.acceleration(speed);
				distanceM += (weights[k]! * half * speed) / motion.acceleration(speed);
			});
		}
	}
	// The end speed is the solver's own; what it misses of the length is made up at that speed.
	return timeS + (course.lengthM - distanceM) / endMps;
}

/** The loosest power of ten that reaches an error. */
function tuned(by: (tolerance: number) => number, truth: number, error: number) {
	for (let power = 3; power <= 14; power++) {
		const reached = Math.abs(by(10 ** -power) / truth - 1);
		if (reached <= error) return {tolerance: 10 ** -power, reached};
	}
	throw new Error(`no tolerance reaches ${error}`);
}

export function benchOneStraight(): void {
	const truth = reference();
	const solverError = Math.abs(bySolver(gears).timeS / truth - 1);
	assertClose('solver', bySolver(gears).timeS, truth, 1e-10);
	// Rounding aside the solver is exact; the others are given a thousandth of what is promised.
	const error = Math.max(solverError, 1e-12);
	const odex = tuned(byOdex, truth, error);
	const general = tuned(byMathjs, truth, error);
	line('One straight of 400 m in one gear, and the same equations in general integrators');
	line(
		`  relative error in time: solver ${solverError.toExponential(1)}, odex ${odex.reached.toExponential(1)} at tolerance ${odex.tolerance}, mathjs solveODE ${general.reached.toExponential(1)} at ${general.tolerance}`,
	);
	const many = 2000;
	const repeated = (work: () => number, times: number) => () => {
		let sum = 0;
		for (let i = 0; i < times; i++) sum += work();
		return sum;
	};
	const per = (timing: ReturnType<typeof timed>, times: number) => ({
		minMs: timing.minMs / times,
		meanMs: timing.meanMs / times,
		sdMs: timing.sdMs / times,
	});
	const kept = per(
		timed(
			repeated(() => bySolver(gears).timeS, many),
			10,
		),
		many,
	);
	const fresh = () => bySolver(new RoadGears(gears.vehicle, gears.train, course)).timeS;
	const made = per(timed(repeated(fresh, many), 10), many);
	const odexTiming = per(
		timed(
			repeated(() => byOdex(odex.tolerance), 50),
			10,
		),
		50,
	);
	const generalTiming = timed(() => byMathjs(general.tolerance), 3, 1);
	line(`  solver, gears at hand: ${told(kept)}`);
	line(
		`  solver, gears made anew: ${told(made)}: odex takes ${(odexTiming.minMs / made.minMs).toFixed(0)} ×, mathjs ${(generalTiming.minMs / made.minMs).toFixed(0)} ×`,
	);
	line(`  odex: ${told(odexTiming)}`);
	line(`  mathjs solveODE: ${told(generalTiming)}`);
	budget('odex ÷ solver with gears at hand', odexTiming.minMs / kept.minMs, 200, '×', 'least');
	budget('mathjs ÷ solver with gears at hand', generalTiming.minMs / kept.minMs, 5000, '×', 'least');
}
