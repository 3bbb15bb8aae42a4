/** From what a log shows of each straight to readings of the run. */
import {mphMps} from '../../drivetrain/constants.ts';
import type {Candidate} from '../../planning/candidates.ts';
import type {Findings, Spread, StraightFinding} from '../find/findings.ts';
import {type Known, known, type Reading} from './reading.ts';

/** Standard deviation of the median of a normal sample ÷ that of its mean: √(π/2). */
const medianLoss = Math.sqrt(Math.PI / 2);

/** A logged speed is not known better than this, however many laps there are: the receiver's own error. */
const leastSpeedSe = 0.05 * mphMps;
const leastTimeSe = 0.005;
/** With one or two laps their scatter says nothing: then a speed is taken to be known to this. */
const unknownSpeedSe = 0.5 * mphMps;
const unknownRpmSe = 20;
const unknownTimeS = 0.05;

/** One a straight that the log shows, in the track's order. */
export function readingsFrom({straights}: Findings, candidate: Candidate): Reading[] {
	return straights.filter(({passes}) => passes > 0).map(straight => readingFrom(straight, candidate));
}

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
		exitMps: medianOf(straight.exitMps, leastSpeedSe, unknownSpeedSe),
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
