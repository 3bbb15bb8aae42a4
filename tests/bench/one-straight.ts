/** All sequences of gears on a straight: our solver, and general-purpose integrators that do the same at equal accuracy. */
import {RoadGears} from '../../source/drivetrain/road-gears.ts';
import {runStraight, runStraightPlainly} from '../../source/drivetrain/run-straight.ts';
import type {Finish} from '../../source/drivetrain/sequence.ts';
import type {Course, GearTrain} from '../../source/drivetrain/straight.ts';
import {sampleCourse, sampleTrain, sampleVehicle, trainOf} from '../drivetrain/sample-car.ts';
import {type Integrator, referenceTime, sequencesOf, timeBy} from './all-sequences.ts';
import type {Figures} from './budgets.ts';
import {assertClose, line, type Timing, timedInTurns, told} from './harness.ts';
import {byMathjs, byOdex, type Tuned, tuned} from './integrators.ts';

/** Nine digits are promised, and a tenth of the promise is asserted before anything is timed. */
const promised = 1e-10;

/** The solver is better than this; the others need not be, so that they are not held to its last digits. */
const leastError = 1e-12;

/** One pass of the solver is too short to time. */
const manyTimes = 250;

export function benchOneStraight(figures: Figures): void {
	const short = compared('a short pair', trainOf([13, 9.1, 7.1, 5.6, 4.5]), 38);
	figures.hold('odex', short.odexMs / short.keptMs);
	figures.hold('mathjs', short.mathjsMs / short.keptMs);
	line();
	compared('a long pair, on which fewer sequences come to the end', sampleTrain, 45);
}

/** A straight with its sequences, on one kind of road. */
type Straight = {readonly gears: RoadGears; readonly course: Course; readonly sequences: readonly Finish[]};

/** Straights that differ a little, run in turn, so that nothing but the gears is remembered from one to the next. */
function alikeStraights(train: GearTrain, exitMps: number): Straight[] {
	const courses = Array.from({length: 8}, (_, i) => sampleCourse({exitMps: exitMps + 0.1 * i, lengthM: 396 + i}));
	const gears = new RoadGears(sampleVehicle(), train, courses[0]!);
	return courses.map(course => ({gears, course, sequences: sequencesOf(gears, course)}));
}

function compared(name: string, train: GearTrain, exitMps: number) {
	const straights = alikeStraights(train, exitMps);
	const {odex, mathjs, solverError} = equallyAccurate(straights);
	line(`One straight of 400 m, exit in third, ${name}: ${sequencesTold(straights[0]!)}`);
	line(`  relative error in the fastest time: solver ${solverError.toExponential(1)}, ${odex.told}, ${mathjs.told}`);
	const all = (one: (straight: Straight) => number) => () =>
		straights.reduce((sum, straight) => sum + one(straight), 0);
	const timings = timedInTurns(
		{
			kept: often(all(solved)),
			anew: often(
				all(straight => solved({...straight, gears: new RoadGears(sampleVehicle(), train, straight.course)})),
			),
			odex: all(fastestBy(odex.integrate)),
			mathjs: all(fastestBy(mathjs.integrate)),
		},
		7,
	);
	const each = straights.length;
	line(`  solver, gears at hand as in a rack: ${told(timings.kept, each * manyTimes)}`);
	line(`  solver, gears made anew: ${told(timings.anew, each * manyTimes)}`);
	line(`  odex: ${told(timings.odex, each)}`);
	line(`  mathjs solveODE: ${told(timings.mathjs, each)}`);
	const [keptMs, anewMs] = [timings.kept.minMs / manyTimes, timings.anew.minMs / manyTimes];
	line(`  gears at hand: ${timesOver(timings, keptMs)}; gears made anew: ${timesOver(timings, anewMs)}`);
	return {keptMs, odexMs: timings.odex.minMs, mathjsMs: timings.mathjs.minMs};
}

/** Holds every solver against the reference, and tunes the general ones until they are as good, or good enough. */
function equallyAccurate(straights: readonly Straight[]): {odex: Tuned; mathjs: Tuned; solverError: number} {
	const truth = straights.map(({gears, course, sequences}) =>
		Math.min(...sequences.map(sequence => referenceTime(gears, course, sequence))),
	);
	straights.forEach((straight, i) => {
		assertClose('solver', solved(straight), truth[i]!, promised);
		assertClose('plain', solvedPlainly(straight), truth[i]!, promised);
	});
	const errorOf = (one: (straight: Straight) => number) =>
		Math.max(...straights.map((straight, i) => Math.abs(one(straight) / truth[i]! - 1)));
	const solverError = errorOf(solved);
	const allowed = Math.max(solverError, leastError);
	const errorWith = (integrate: Integrator) => errorOf(fastestBy(integrate));
	return {
		odex: tuned('odex', byOdex, errorWith, allowed),
		mathjs: tuned('mathjs', byMathjs, errorWith, allowed),
		solverError,
	};
}

const timesOver = ({odex, mathjs}: Record<'odex' | 'mathjs', Timing>, solverMs: number) =>
	`odex takes ${(odex.minMs / solverMs).toFixed(0)} ×, mathjs ${(mathjs.minMs / solverMs).toFixed(0)} ×`;

const often = (work: () => number) => () => {
	let sum = 0;
	for (let i = 0; i < manyTimes; i++) sum += work();
	return sum;
};

/** The least time over the sequences, each by itself. */
const fastestBy =
	(integrate: Integrator) =>
	({gears, course, sequences}: Straight) =>
		Math.min(...sequences.map(sequence => timeBy(integrate, gears, course, sequence)));

function solved({gears, course}: Straight): number {
	const run = runStraight(gears, course);
	if (run.kind !== 'ran') throw new Error(run.kind);
	return run.fastest.timeS;
}

function solvedPlainly({gears, course}: Straight): number {
	const run = runStraightPlainly(gears.vehicle, gears.train, course);
	if (run.kind !== 'ran') throw new Error(run.kind);
	return run.fastest.timeS;
}

/** The gears of each sequence, such as "3-4-5". */
function sequencesTold({sequences}: Straight): string {
	const gearsOf = ({firstGear, entered}: Finish) =>
		Array.from({length: entered.length + 1}, (_, i) => firstGear + i).join('-');
	return `sequences ${sequences.map(gearsOf).join(', ')}`;
}
