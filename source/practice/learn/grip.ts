/**
 * Grip from exits that it holds: where the model with the numbers fitted so far is on the grip side of the lesser of the two, the
 * speed some time after the exit says how much grip there was. Bounded, by Brent's method: each straight alone, and all together.
 */
import {brentRoot} from '../../drivetrain/brent.ts';
import type {GearMotion} from '../../drivetrain/gear-motion.ts';
import type {LoggedRun} from '../../logs/logged-run.ts';
import type {Findings} from '../find/findings.ts';
import {median, robustSd, sorted} from '../fit/robust.ts';
import {gripHeldS, speedAfter} from './launch-model.ts';
import {type Launch, launchesOn} from './launches.ts';
import type {AskMotion} from './model.ts';
import {type Known, known, type Reading} from './reading.ts';
import type {Trim} from './trim.ts';

/** The model's motion at so many times the documents' grip, and so many times the drag. */
type MotionWith = (grip: number, drag?: number) => GearMotion;

/** What one straight says. */
export type StraightGrip = {
	readonly name: string;
	readonly exits: number;
	/** How long after the exit grip held, s. */
	readonly heldS: number;
	/** The factor on the documents' grip. */
	readonly alone: Known;
};

export type GripLearned = {
	/** On the documents' grip; undefined where no exit tells it. */
	readonly factor: Known | undefined;
	/** Those that tell. */
	readonly straights: readonly StraightGrip[];
	/** Held by grip, but the samples are too few or too coarse to tell how much there was. */
	readonly untold: readonly string[];
};

/** A factor outside is no correction: something else is wrong. */
const bounds = [0.5, 1.6] as const;
/** An exit that grip would hold if there were a fifth less of it is looked at. */
const lessGrip = 0.8;
/** A gain that is this share below what the engine would give, and this many standard errors, is held by something. */
const heldShare = 0.02;
const surely = 3;
/** Known worse than this, a grip is not told. */
const leastSure = 0.1;
/** Shorter after the exit there is nothing to see of it. */
const shortestS = 0.5;
const firstS = 1;
const rounds = 3;
const fewestExits = 3;
/** A logged speed is not known better than this, however many laps there are. */
const leastSpeedSe = 0.02;
const rootTolerance = 1e-6;

/** `trim`: what was fitted so far; `dragSe`: to what the drag in it is known, as a fraction. A step is a straight. */
export function* gripSteps(
	ask: AskMotion,
	readings: readonly Reading[],
	{findings, run}: {readonly findings: Findings; readonly run: LoggedRun},
	trim: Trim,
	dragSe: number,
): Generator<undefined, GripLearned, void> {
	const told: Exit[] = [];
	const untold: string[] = [];
	for (const reading of readings) {
		yield;
		const gear = findings.straights[reading.index]?.exitGear;
		if (gear === undefined) continue;
		const motionWith = (grip: number, drag = 1) => ask(reading, {...trim, grip, drag: drag * trim.drag}, gear);
		const launches = launchesOn(reading.index, gear, findings, run);
		const exitMps = median(launches.map(launch => launch.exitMps));
		if (launches.length === 0 || !motionWith(lessGrip)?.mark(exitMps).gripHolds) continue;
		const exit = exitOn(reading.name, motionWith as MotionWith, launches, exitMps, 1 + dragSe);
		if (exit === 'unclear') untold.push(reading.name);
		else if (exit !== undefined) told.push(exit);
	}
	const factor = withDrag(told);
	const sure = factor !== undefined && factor.se <= leastSure * factor.value;
	return {
		factor: sure ? factor : undefined,
		straights: sure ? told.map(({name, exits, heldS, alone}) => ({name, exits, heldS, alone})) : [],
		untold: sure ? untold : [...told.map(({name}) => name), ...untold],
	};
}

/** One straight's exits as one: the speed seen so long after an exit at the median speed, and the model of it. */
type Exit = StraightGrip & {
	readonly seen: Known;
	readonly model: (grip: number) => number;
	/** With a standard error more of drag. */
	readonly dragged: (grip: number) => number;
	/** m/s for a whole 100 % of grip. */
	readonly slope: number;
};

/** Undefined where the engine is the limit. The moment that is looked at moves to where grip lets go. */
function exitOn(
	name: string,
	motion: MotionWith,
	launches: readonly Launch[],
	exitMps: number,
	moreDrag: number,
): Exit | 'unclear' | undefined {
	const forS = sorted(launches.map(launch => launch.forS))[Math.floor(launches.length / 4)]!;
	let atS = Math.min(firstS, forS);
	let exit: Exit | undefined;
	for (let round = 0; round < rounds; round++) {
		if (atS < shortestS) return 'unclear';
		const afterS = atS;
		const model = (grip: number) => speedAfter(motion(grip), exitMps, afterS);
		const dragged = (grip: number) => speedAfter(motion(grip, moreDrag), exitMps, afterS);
		const seen = seenAfter(launches, motion(1), exitMps, atS);
		if (seen === undefined) return 'unclear';
		const free = model(bounds[1]);
		if (free - seen.value < Math.max(surely * seen.se, heldShare * (free - exitMps))) return undefined;
		const value = brentRoot(grip => model(grip) - seen.value, ...bounds, rootTolerance);
		if (value === undefined) return 'unclear';
		const slope = slopeOf(model, value);
		const heldS = gripHeldS(motion(value), exitMps, forS);
		exit = {name, exits: launches.length, heldS, alone: known(value, seen.se / slope), seen, model, dragged, slope};
		atS = Math.min(forS, Math.max(shortestS, heldS));
	}
	return exit!.heldS < shortestS ? 'unclear' : exit;
}

/** As if each exit had been at the median speed: most of what differs comes from there. */
function seenAfter(launches: readonly Launch[], motion: GearMotion, exitMps: number, atS: number): Known | undefined {
	const step = 0.5;
	const perExit = (speedAfter(motion, exitMps + step, atS) - speedAfter(motion, exitMps - step, atS)) / (2 * step);
	const speeds = launches.flatMap(launch => {
		const mps = launch.speedAfter(atS);
		return mps === undefined ? [] : [mps - perExit * (launch.exitMps - exitMps)];
	});
	if (speeds.length < fewestExits) return undefined;
	const middle = median(speeds);
	const se = (medianLoss * robustSd(speeds, middle)) / Math.sqrt(speeds.length);
	return known(middle, Math.max(leastSpeedSe, se));
}
/** Standard deviation of the median of a normal sample ÷ that of its mean: √(π/2). */
const medianLoss = Math.sqrt(Math.PI / 2);

const slopeOf = (model: (grip: number) => number, grip: number): number =>
	(model(grip + 0.01) - model(grip - 0.01)) / 0.02;

/** All together, with what the uncertainty of the drag makes of it. */
function withDrag(exits: readonly Exit[]): Known | undefined {
	const factor = together(exits);
	const dragged = together(exits.map(exit => ({...exit, model: exit.dragged})));
	if (factor === undefined || dragged === undefined) return factor;
	return known(factor.value, Math.hypot(factor.se, dragged.value - factor.value));
}

/** The root of the weighted sum of misses; its error widened where the straights disagree (R. T. Birge, Phys. Rev. 40, 1932). */
function together(exits: readonly Exit[]): Known | undefined {
	if (exits.length === 0) return undefined;
	const sumOfMisses = (grip: number) =>
		exits.reduce((sum, {seen, model, slope}) => sum + ((model(grip) - seen.value) * slope) / seen.se ** 2, 0);
	const value = brentRoot(sumOfMisses, ...bounds, rootTolerance);
	if (value === undefined) return undefined;
	const information = exits.reduce((sum, {seen, slope}) => sum + (slope / seen.se) ** 2, 0);
	const squares = exits.reduce((sum, {seen, model}) => sum + ((model(value) - seen.value) / seen.se) ** 2, 0);
	const widened = exits.length > 1 ? Math.max(1, Math.sqrt(squares / (exits.length - 1))) : 1;
	return known(value, widened / Math.sqrt(information));
}
