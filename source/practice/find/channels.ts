/** What every finding looks at: the channels made ready once, in passes over the log of one sample each. */
import type {Vehicle} from '../../drivetrain/straight.ts';
import {circumferenceM} from '../../drivetrain/tire.ts';
import type {LoggedRun} from '../../logs/logged-run.ts';
import type {Plan} from '../../planning/plan.ts';
import {median} from '../fit/robust.ts';
import {bridged, everyOf, middleOfThree, movingMean} from './smooth.ts';
import {Pace, type Steps} from './steps.ts';

export type Channels = {
	readonly run: LoggedRun;
	/** Samples a second, by the median step in time; 0 where time does not pass. */
	readonly rateHz: number;
	/** Speed without gaps, strays and noise. */
	readonly smoothMps: Float32Array;
	/** Engine speed, the middle one of three; NaN beside a gap. */
	readonly middleRpm: Float32Array;
	/** n·C/(60·V·(1 + slip)) by the documents; NaN where speed or RPM are missing or near nothing. */
	readonly overall: Float32Array;
	/** For whoever goes through the samples. */
	readonly pace: Pace;
};

/** Below these, n/V tells nothing of a gear: the clutch slips and sensors are coarse. */
const slowestMps = 5;
const slowestRpm = 1000;
const smoothS = 0.25;

export function* channelsOf(run: LoggedRun, plan: Plan): Steps<Channels> {
	const pace = new Pace();
	const rateHz = sampleRateHz(run.timeS);
	const whole = yield* bridged(yield* middleOfThree(run.speedMps, pace), pace);
	const smoothMps = yield* movingMean(whole, Math.round(smoothS * rateHz), pace);
	const middleRpm = yield* middleOfThree(run.rpm, pace);
	return {run, rateHz, smoothMps, middleRpm, overall: yield* overallBy(run, plan.base.vehicle, pace), pace};
}

/** 0 where time does not pass. */
function sampleRateHz(timeS: Float64Array): number {
	const steps: number[] = [];
	for (let i = 0; i + 1 < timeS.length; i += everyOf(timeS.length - 1)) steps.push(timeS[i + 1]! - timeS[i]!);
	const stepS = median(steps);
	return stepS > 0 ? 1 / stepS : 0;
}

/** n·C/(60·V·(1 + slip)) at each sample; NaN where speed or RPM are missing or near nothing. */
export function* overallBy(
	{samples, speedMps, rpm}: LoggedRun,
	{rolloutM, growth, slip}: Pick<Vehicle, 'rolloutM' | 'growth' | 'slip'>,
	pace: Pace,
): Steps<Float32Array> {
	const overall = new Float32Array(samples);
	for (let i = 0; i < samples; i++) {
		if (pace.isDue()) yield;
		const [v, n] = [speedMps[i]!, rpm[i]!];
		const turns = (n * circumferenceM(rolloutM, growth, v)) / (60 * v * (1 + slip));
		overall[i] = v > slowestMps && n > slowestRpm ? turns : Number.NaN;
	}
	return overall;
}

/** Samples that cover a time, at least one. */
export function samplesIn(timeS: number, rateHz: number): number {
	return Math.max(1, Math.round(timeS * rateHz));
}
