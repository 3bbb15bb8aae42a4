/** From what a log shows of each straight to readings of the run. */
import {mphMps} from '../../drivetrain/constants.ts';
import type {Candidate} from '../../planning/candidates.ts';
import type {Findings, Pass, Spread, StraightFinding} from '../find/findings.ts';
import {median, robustSd} from '../fit/robust.ts';
import type {AskModel} from './model.ts';
import {type Known, known, type Reading} from './reading.ts';
import {untrimmed} from './trim.ts';

/** Standard deviation of the median of a normal sample ÷ that of its mean: √(π/2). */
const medianLoss = Math.sqrt(Math.PI / 2);

/** A logged speed is not known better than this, however many laps there are: the receiver's own error. */
const leastSpeedSe = 0.05 * mphMps;
const leastTimeSe = 0.005;
/** With one or two laps their scatter says nothing: then a speed is taken to be known to this. */
const unknownSpeedSe = 0.5 * mphMps;
const unknownRpmSe = 20;
const unknownTimeS = 0.05;

/** One a straight that the log shows, in the track's order; a step each. */
export function* readingsFrom(
	{straights, passes}: Findings,
	candidate: Candidate,
	ask: AskModel,
): Generator<undefined, Reading[], void> {
	const readings: Reading[] = [];
	for (const straight of straights.filter(straight => straight.passes > 0)) {
		yield;
		const reading = readingFrom(straight, candidate);
		const own = passes.filter(pass => pass.good && pass.straight === straight.index);
		readings.push({...reading, endMps: likeForLike(reading, own, ask) ?? reading.endMps});
	}
	return readings;
}

/**
 * The end speed of the passes as if each had left with the median exit speed over the median length: most of what differs at
 * the end comes from there, and is no uncertainty of the end. Undefined where the scatter cannot be told.
 */
function likeForLike(reading: Reading, passes: readonly Pass[], ask: AskModel): Known | undefined {
	const {exitMps, lengthM} = reading;
	const whole = passes.filter(pass => [pass.exitMps, pass.endMps, pass.lengthM].every(Number.isFinite));
	if (exitMps === undefined || lengthM === undefined || whole.length < fewestForScatter) return undefined;
	const slope = (change: 'exitMps' | 'lengthM', from: number, step: number) => {
		const [low, high] = [-step, step].map(by => ask(reading, untrimmed, {[change]: from + by})?.endMps ?? Number.NaN);
		return (high! - low!) / (2 * step);
	};
	const perExit = slope('exitMps', exitMps.value, exitStepMps);
	const perLength = slope('lengthM', lengthM, lengthStepM);
	const ends = whole.map(
		pass => pass.endMps - perExit * (pass.exitMps - exitMps.value) - perLength * (pass.lengthM - lengthM),
	);
	if (!ends.every(Number.isFinite)) return undefined;
	const middle = median(ends);
	const se = (medianLoss * robustSd(ends, middle)) / Math.sqrt(ends.length);
	return known(middle, Math.max(leastSpeedSe, se));
}
const fewestForScatter = 3;
/** About what laps differ by. */
const exitStepMps = 0.5;
const lengthStepM = 5;

function readingFrom(straight: StraightFinding, candidate: Candidate): Reading {
	const {index, name, exitGear, endGear, limiterM, lengthM} = straight;
	const gears =
		exitGear !== undefined && endGear !== undefined && exitGear <= endGear
			? {lowest: exitGear, highest: endGear}
			: undefined;
	return {
		index,
		name,
		candidate,
		gear: endGear,
		endMps: medianOf(straight.endMps, leastSpeedSe, unknownSpeedSe),
		endRpm: medianOf(straight.endRpm, 1, unknownRpmSe),
		speedSeen: true,
		// The uncertainty of the exit is part of the end's.
		exitMps: straight.exitMps && known(straight.exitMps.median, 0),
		lengthM: lengthM?.median,
		timeS: medianOf(straight.timeS, leastTimeSe, unknownTimeS),
		gears,
		limited: (limiterM?.median ?? 0) > 0,
	};
}

/** The median with its standard error. */
function medianOf(spread: Spread | undefined, least: number, unknown: number): Known | undefined {
	if (spread === undefined) return undefined;
	const {median, sd, count} = spread;
	const se = sd === undefined ? unknown : (medianLoss * sd) / Math.sqrt(count);
	return known(median, Math.max(least, se));
}
