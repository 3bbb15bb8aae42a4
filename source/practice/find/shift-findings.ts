/** The shifts of the good passes, and what went wrong: missed shifts, over-revs. */
import type {Channels} from './channels.ts';
import type {Lap, Pass, RevEvent, ShiftFinding} from './findings.ts';
import type {Stretch} from './full-throttle.ts';
import {highestIn} from './passes.ts';
import type {ShiftSeen} from './power.ts';
import type {Steps} from './steps.ts';
import {spreadOf} from './straight-findings.ts';

/** The engine is fastest within so much before the gear is left. */
const lastS = 0.06;

/** By the gear left. `shifts`: of each pass. */
export function* shiftFindings(
	{run, rateHz, middleRpm, pace}: Channels,
	passes: readonly Pass[],
	shifts: readonly (readonly ShiftSeen[])[],
): Steps<ShiftFinding[]> {
	const back = Math.floor(lastS * rateHz);
	const clean = passes.flatMap((pass, i) =>
		pass.good ? (shifts[i] ?? []).filter(shift => !shift.missed && shift.into === shift.from + 1) : [],
	);
	const gears = [...new Set(clean.map(({from}) => from))].sort((one, other) => one - other);
	const found: ShiftFinding[] = [];
	for (const from of gears) {
		const of = clean.filter(shift => shift.from === from);
		const rpm: number[] = [];
		for (const {leftAt} of of) rpm.push(yield* highestIn(middleRpm, Math.max(0, leftAt - back), leftAt, pace));
		const timeS = of.map(shift => run.timeS[shift.enteredAt]! - run.timeS[shift.leftAt]! - 1 / rateHz);
		found.push({from, rpm: spreadOf(rpm)!, timeS: spreadOf(timeS)!});
	}
	return found;
}

/** So much above the limit, in three samples running, is above it: less is the noise of a sensor. */
const overShare = 0.003;
/** Over-revs closer than this are one. */
const oneEventS = 0.5;

/** In the order of time. */
export function* revEvents(
	channels: Channels,
	gears: Uint8Array,
	laps: readonly Lap[],
	stretches: readonly Stretch[],
	shifts: readonly (readonly ShiftSeen[])[],
	limitRpm: number,
): Steps<RevEvent[]> {
	const {run, middleRpm, pace} = channels;
	const at = (from: number, to: number, rpm: number) => ({
		lap: Math.max(
			0,
			laps.findLastIndex(lap => lap.from <= from),
		),
		timeS: run.timeS[from]!,
		distanceM: run.distanceM[from]!,
		rpm,
		forS: run.timeS[to]! - run.timeS[from]!,
	});
	const missed = shifts.flat().filter(shift => shift.missed);
	const inMissed = (i: number) => missed.some(shift => i >= shift.leftAt && i <= shift.enteredAt);
	const over = (yield* overStretches(channels, limitRpm * (1 + overShare))).filter(
		({from, to}) => !inMissed(from) && !inMissed(to),
	);
	const events: RevEvent[] = [];
	for (const {from, into, leftAt, enteredAt} of missed) {
		const rpm = yield* highestIn(middleRpm, leftAt, enteredAt, pace);
		events.push({kind: 'missedShift', ...at(leftAt, enteredAt, rpm), from, into});
	}
	for (const {from, to} of over) {
		const powered = stretches.some(stretch => stretch.from <= to && stretch.to >= from);
		const rpm = yield* highestIn(middleRpm, from, to, pace);
		events.push({kind: powered ? 'overRev' : 'downshift', ...at(from, to, rpm), ...gearsAbout(gears, from)});
	}
	return events.sort((one, other) => one.timeS - other.timeS);
}

function* overStretches({run: {timeS}, middleRpm, pace}: Channels, aboveRpm: number): Steps<Stretch[]> {
	const found: {from: number; to: number}[] = [];
	for (let i = 0; i < middleRpm.length; i++) {
		if (pace.isDue()) yield;
		if (!(middleRpm[i]! > aboveRpm)) continue;
		const last = found.at(-1);
		if (last !== undefined && timeS[i]! - timeS[last.to]! <= oneEventS) last.to = i;
		else found.push({from: i, to: i});
	}
	return found;
}

/** The gear there, and the one in use before. */
function gearsAbout(gears: Uint8Array, at: number): {from: number | undefined; into: number | undefined} {
	const into = gears[at]! || undefined;
	for (let i = at; i >= 0 && i > at - farBack; i--) {
		if (gears[i]! > 0 && gears[i] !== into) return {from: gears[i]!, into};
	}
	return {from: into, into};
}

const farBack = 500;
