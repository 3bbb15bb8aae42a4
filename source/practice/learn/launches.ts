/** How the car picked up speed after each exit, by the log. */
import type {LoggedRun} from '../../logs/logged-run.ts';
import type {Findings, Pass} from '../find/findings.ts';
import {medianLine} from '../fit/robust.ts';

/** One exit, from the first sample at full throttle on, in the gear of the exit. */
export type Launch = {
	readonly exitMps: number;
	/** The speed so long after the exit, by a robust line through the samples about it; undefined where there are too few. */
	readonly speedAfter: (timeS: number) => number | undefined;
	/** How long it was in that gear at full throttle. */
	readonly forS: number;
};

/** Longer than that no grip holds a car that has just left a corner. */
const longestS = 3;
/** The line goes through so much of the log on each side, and at least so many samples. */
const besideS = 0.25;
const fewestSamples = 3;

/** The good exits on a straight in its usual exit gear. */
export function launchesOn(straight: number, gear: number, {passes, samples}: Findings, run: LoggedRun): Launch[] {
	return passes
		.filter(pass => pass.good && pass.straight === straight && pass.exitGear === gear)
		.map(pass => launchOf(pass, gear, samples.gear, run));
}

function launchOf(pass: Pass, gear: number, gears: Uint8Array, {timeS, speedMps}: LoggedRun): Launch {
	const startS = timeS[pass.from]!;
	let last = pass.from;
	while (last < pass.to && timeS[last + 1]! - startS <= longestS) {
		const next = gears[last + 1]!;
		if (next !== 0 && next !== gear) break;
		last++;
	}
	const speedAfter = (afterS: number): number | undefined => {
		const [x, y]: [number[], number[]] = [[], []];
		for (let i = pass.from; i <= last; i++) {
			const off = timeS[i]! - startS - afterS;
			if (Math.abs(off) > besideS || Number.isNaN(speedMps[i]!)) continue;
			x.push(off);
			y.push(speedMps[i]!);
		}
		return x.length < fewestSamples ? undefined : medianLine(x, y).at(0);
	};
	return {exitMps: pass.exitMps, speedAfter, forS: timeS[last]! - startS};
}
