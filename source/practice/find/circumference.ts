/** Rolling circumference and growth from n/V. */

import type {Tires} from '../../drivetrain/car.ts';
import {growthReferenceMps} from '../../drivetrain/tire.ts';
import {groupLevelsEvened} from '../fit/group-levels.ts';
import {huberSteps} from '../fit/huber.ts';
import type {Columns} from '../fit/least-squares.ts';
import {median, sorted, trimmedMean} from '../fit/robust.ts';
import {fewGroupsFactor} from '../fit/student.ts';
import type {Channels} from './channels.ts';
import {type CircumferenceFit, type Estimate, type Pass, sampleState} from './findings.ts';
import {growthSd} from './fittings.ts';
import type {Steps} from './steps.ts';

/** One block of steady samples in one gear of one pass. */
type Readings = {
	/** Circumference in m, and (V/V_ref)². */
	readonly circumferenceM: Float64Array;
	readonly square: Float64Array;
	readonly pass: Int32Array;
};

/** Samples next to each other err together, and one sample is coarse: blocks of this length are one reading each. */
const blockS = 0.5;
/** A block with less of its samples than this is left out. */
const leastFilled = 0.5;
const fewestReadings = 4;
/** Of the samples of a block, at each end of their order: what is left out of its mean. */
const trimmed = 0.1;
/** Growth less sure than this, as a fraction at 100 mph, is held: the documents' is about as good. */
const leastSureGrowth = 0.002;

/**
 * Huber's fit of C = β0 + β1·(V/V_ref)² to blocks of steady full-throttle samples, C = 60·V·(1 + κ)·R/n: C0 = β0, γ = β1/β0.
 * Standard errors over passes of straights, since the samples of one pass err together, with Student's factor where passes
 * are few. `overall`: the ratios of the gears, gear 1 first. Undefined with too few readings.
 *
 * Both speeds are taken to be of the same moment: a road speed that is logged τ seconds late makes C too small by τ·a/V, with a
 * the acceleration, most where the car is slow and pulls hard.
 */
export function* fitCircumference(
	channels: Channels,
	gears: Uint8Array,
	state: Uint8Array,
	passes: readonly Pass[],
	overall: readonly number[],
	tires: Pick<Tires, 'growth' | 'slip'>,
): Steps<CircumferenceFit | undefined> {
	const readings = yield* readingsOf(channels, gears, state, passes, overall, tires.slip);
	if (readings.circumferenceM.length < fewestReadings) return undefined;
	const free = yield* fitted(readings, undefined);
	const sure = free !== undefined && free.growth.se <= leastSureGrowth;
	const fit = sure ? free : yield* fitted(readings, tires.growth);
	if (fit === undefined) return undefined;
	const speeds = sorted(readings.square.map(square => growthReferenceMps * Math.sqrt(square)));
	const seen = new Set(readings.pass);
	return {
		...fit,
		growthHeld: !sure,
		slipHeld: tires.slip,
		readings: readings.circumferenceM.length,
		passes: seen.size,
		laps: new Set([...seen].map(pass => passes[pass]!.lap)).size,
		lowestMps: speeds[0]!,
		highestMps: speeds.at(-1)!,
	};
}

type Fit = Pick<
	CircumferenceFit,
	'rolloutM' | 'growth' | 'atMps' | 'circumferenceM' | 'correlation' | 'scatterM' | 'downweighted'
>;

function* fitted({circumferenceM, square, pass}: Readings, held: number | undefined): Steps<Fit | undefined> {
	// About the middle of the squares, where level and slope err independently.
	const middle = median(square);
	const columns: Columns =
		held === undefined
			? [square.map(() => 1), square.map(x => x - middle)]
			: [square.map(x => (1 + held * x) / (1 + held * middle))];
	const groups = new Set(pass).size;
	const grouped = groups > fewestGroups;
	const first = yield* huberSteps(columns, circumferenceM, grouped ? pass : undefined);
	if (first === undefined) return undefined;
	// Slip differs a little from pass to pass: what growth is shows within each, whatever its level.
	const evened = grouped ? groupLevelsEvened(columns, circumferenceM, pass, first) : undefined;
	const fit = evened === undefined ? first : yield* huberSteps(evened.columns, evened.y, pass);
	if (fit === undefined) return undefined;
	const degrees = (grouped ? groups : circumferenceM.length) - columns.length;
	const wider = fewGroupsFactor(degrees) ** 2;
	const [vLevel, vBoth, vSlope] =
		held === undefined
			? [fit.covariance[0]! * wider, fit.covariance[1]! * wider, fit.covariance[3]! * wider]
			: [fit.covariance[0]! * wider, 0, 0];
	const level = fit.coefficients[0]!;
	const slope = held === undefined ? fit.coefficients[1]! : (held * level) / (1 + held * middle);
	const rollout = level - slope * middle;
	const growth = slope / rollout;
	// By the first derivatives (delta method): C0 = level − slope·m, γ = slope/C0; held: C0 = level/(1 + γ·m).
	const grows = 1 + growth * middle;
	const [c, g] =
		held === undefined
			? [
					{level: 1, other: -middle},
					{level: -growth / rollout, other: grows / rollout},
				]
			: [
					{level: 1 / grows, other: (-rollout * middle) / grows},
					{level: 0, other: 1},
				];
	const vOther = held === undefined ? vSlope : growthSd ** 2;
	const covary = (one: Slopes, two: Slopes) =>
		one.level * two.level * vLevel +
		(one.level * two.other + one.other * two.level) * vBoth +
		one.other * two.other * vOther;
	return {
		rolloutM: estimate(rollout, covary(c, c)),
		growth: estimate(growth, covary(g, g)),
		atMps: growthReferenceMps * Math.sqrt(middle),
		circumferenceM: estimate(level, vLevel),
		correlation: covary(c, g) / Math.sqrt(covary(c, c) * covary(g, g)),
		scatterM: fit.scale,
		downweighted: fit.weights.filter(weight => weight < 1).length / fit.weights.length,
	};
}

/** Derivatives by the level in the middle, and by the slope (by growth itself, where held). */
type Slopes = {readonly level: number; readonly other: number};

/** With fewer passes than this the sandwich over passes says too little: readings count as independent. */
const fewestGroups = 4;

const estimate = (value: number, variance: number): Estimate => ({value, se: Math.sqrt(variance)});

function* readingsOf(
	channels: Channels,
	gears: Uint8Array,
	state: Uint8Array,
	passes: readonly Pass[],
	overall: readonly number[],
	slip: number,
): Steps<Readings> {
	const {run, rateHz, pace} = channels;
	const size = Math.max(1, Math.round(blockS * rateHz));
	const [circumferenceM, square, of]: [number[], number[], number[]] = [[], [], []];
	const ratios = new Float64Array(size);
	for (const [number, pass] of passes.entries()) {
		if (!pass.good) continue;
		for (let from = pass.from; from <= pass.to; from += size) {
			const to = Math.min(from + size, pass.to + 1);
			const gear = gears[from + ((to - from) >> 1)]!;
			if (gear === 0) continue;
			let [count, squares] = [0, 0];
			for (let i = from; i < to; i++) {
				if (pace.isDue()) yield;
				if (state[i] !== sampleState.steady || gears[i] !== gear) continue;
				ratios[count++] = run.speedMps[i]! / run.rpm[i]!;
				squares += (run.speedMps[i]! / growthReferenceMps) ** 2;
			}
			if (count < leastFilled * size) continue;
			const middle = trimmedMean(ratios.subarray(0, count).sort(), trimmed);
			circumferenceM.push(60 * middle * (1 + slip) * overall[gear - 1]!);
			square.push(squares / count);
			of.push(number);
		}
	}
	return {
		circumferenceM: Float64Array.from(circumferenceM),
		square: Float64Array.from(square),
		pass: Int32Array.from(of),
	};
}
