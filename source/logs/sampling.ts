/** How a log was sampled: its rate, its gaps, and a clock too coarse for it. */
import type {RemarkData} from './reading.ts';

/** With fewer samples a second much of what one looks for happens between two of them. */
const slowestGood = 2.5;
const shortestGapS = 1;
const gapSteps = 20;
/** So many steps are enough for their median. */
const mostSteps = 20_000;

export function samplingRemarks(timeS: Float64Array): RemarkData[] {
	const stepS = medianStep(timeS);
	if (stepS === undefined) return [];
	const remarks: RemarkData[] = [];
	if (1 / stepS < slowestGood) remarks.push({kind: 'slowSampling', samplesPerS: 1 / stepS});
	const [shortest, counts] = [Math.max(shortestGapS, gapSteps * stepS), {gaps: 0, longestS: 0, atS: 0, still: 0}];
	for (let i = 1; i < timeS.length; i++) {
		const step = timeS[i]! - timeS[i - 1]!;
		if (step === 0) counts.still++;
		if (step <= shortest) continue;
		counts.gaps++;
		if (step > counts.longestS) [counts.longestS, counts.atS] = [step, timeS[i - 1]!];
	}
	const {gaps, longestS, atS, still} = counts;
	if (gaps > 0) remarks.push({kind: 'gap', gaps, longestS, atS});
	const share = still / (timeS.length - 1);
	if (share > 0.5) remarks.push({kind: 'coarseClock', share});
	return remarks;
}

/** Of the steps ahead, by an even choice of them; undefined where time stands. */
function medianStep(timeS: Float64Array): number | undefined {
	const stride = Math.max(1, Math.floor(timeS.length / mostSteps));
	const steps: number[] = [];
	for (let i = 1; i < timeS.length; i += stride) {
		const step = timeS[i]! - timeS[i - 1]!;
		if (step > 0) steps.push(step);
	}
	return steps.sort((a, b) => a - b)[Math.floor(steps.length / 2)];
}
