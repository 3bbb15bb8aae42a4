/**
 * Anchoring: the factors on drag and power with which the model's runs end at the speeds that practice saw. Each straight by
 * itself (bounded, Brent's method) on what it can tell, and all together by least squares.
 */
import {brentRoot} from '../../drivetrain/brent.ts';
import {mphMps} from '../../drivetrain/constants.ts';
import {finish} from '../../planning/run-rack.ts';
import {huberWeight} from '../fit/huber.ts';
import {leastSquares} from '../fit/least-squares.ts';
import {robustSd} from '../fit/robust.ts';
import type {AskModel} from './model.ts';
import {type Known, type Reading, together} from './reading.ts';
import type {Trim} from './trim.ts';

export type Factor = 'drag' | 'power';

/** What one straight says by itself. */
export type StraightAnchor = {
	readonly reading: Reading;
	/** Drag where 1 % of it takes 0.2 mph or more from the end speed, else power; undefined where neither does much, or does it by leaps. */
	readonly tells: Factor | undefined;
	/** m/s that 1 % more drag takes away, and that 1 % more power gives, at the end of the straight. */
	readonly perPercent: {readonly drag: number; readonly power: number};
	/** Standard deviation of the end speed with all that goes into it, m/s. */
	readonly seMps: number;
	/** The factor that this straight alone asks for; undefined where it tells none, or none within the bounds gives its speed. */
	readonly alone: Known | undefined;
	/** Speed seen less the model's, m/s: before, and after the fit of all. */
	readonly beforeMps: number;
	readonly afterMps: number;
};

export type Anchor = {
	/** On the drag area, on the power; undefined where no straight tells it. */
	readonly drag: Known | undefined;
	readonly power: Known | undefined;
	readonly straights: readonly StraightAnchor[];
	/** Root mean square of the residuals in their standard deviations; undefined without a reading to spare. */
	readonly misfit: number | undefined;
};

/** Least effect of 1 % of drag on the end speed for a straight to tell drag. */
export const tellingMps = 0.2 * mphMps;
/** Where 1 % of power moves the end by less, grip or the length decides, and the end says nothing about the engine. */
export const silentMps = 0.06 * mphMps;
/** A factor outside is no correction: something else is wrong. */
export const factorBounds: Record<Factor, readonly [number, number]> = {drag: [0.5, 2], power: [0.7, 1.4]};
const onePercent = 0.01;

/** The anchor of the readings that have an end speed and are not on the limiter; undefined where there is none. */
export function anchor(ask: AskModel, readings: readonly Reading[], trim: Trim): Anchor | undefined {
	return finish(anchorSteps(ask, readings, trim));
}

/** The same step by step: a straight, or a round of all of them. */
export function* anchorSteps(
	ask: AskModel,
	readings: readonly Reading[],
	trim: Trim,
): Generator<undefined, Anchor | undefined, void> {
	const told: StraightAnchor[] = [];
	for (const reading of readings) {
		yield;
		const one = reading.endMps === undefined || reading.limited ? undefined : straightAnchor(ask, reading, trim);
		if (one !== undefined) told.push(one);
	}
	const usable = told.filter(({alone}) => alone !== undefined);
	if (usable.length === 0)
		return told.length === 0 ? undefined : {drag: undefined, power: undefined, straights: told, misfit: undefined};
	const factors = (['drag', 'power'] as const).filter(factor => usable.some(({tells}) => tells === factor));
	const fit = yield* fitAll(ask, usable, trim, factors);
	const final = {...trim, ...valuesOf(fit.factors)};
	return {
		drag: fit.factors.drag,
		power: fit.factors.power,
		straights: told.map(one => ({...one, afterMps: missBy(ask, one.reading, final)})),
		misfit: fit.misfit,
	};
}

const valuesOf = (factors: Partial<Record<Factor, Known>>) =>
	Object.fromEntries(Object.entries(factors).map(([name, {value}]) => [name, value])) as Partial<
		Record<Factor, number>
	>;

/** Speed seen less the model's, m/s. */
const missBy = (ask: AskModel, reading: Reading, trim: Trim): number =>
	reading.endMps!.value - (ask(reading, trim)?.endMps ?? Number.NaN);

function straightAnchor(ask: AskModel, reading: Reading, trim: Trim): StraightAnchor | undefined {
	const run = ask(reading, trim);
	if (run === undefined) return undefined;
	const slopes = {drag: slopeOf(ask, reading, trim, 'drag'), power: slopeOf(ask, reading, trim, 'power')};
	const perPercent = {drag: slopes.drag * onePercent, power: slopes.power * onePercent};
	const isSmooth = (['drag', 'power'] as const).every(factor =>
		changesSmoothly(ask, reading, trim, factor, run.endMps),
	);
	const tells = isSmooth ? tellsOf(perPercent) : undefined;
	const seMps = together(reading.endMps!.se, exitEffect(ask, reading, trim));
	const beforeMps = reading.endMps!.value - run.endMps;
	const silent = {reading, tells, perPercent, seMps, alone: undefined, beforeMps, afterMps: beforeMps};
	if (tells === undefined) return silent;
	const [low, high] = factorBounds[tells];
	const factor = brentRoot(value => missBy(ask, reading, {...trim, [tells]: value}), low, high, rootTolerance);
	return {
		reading,
		tells,
		perPercent,
		seMps,
		alone: factor === undefined ? undefined : {value: factor, se: seMps / Math.abs(slopes[tells])},
		beforeMps,
		afterMps: beforeMps,
	};
}
function tellsOf({drag, power}: StraightAnchor['perPercent']): Factor | undefined {
	if (-drag >= tellingMps) return 'drag';
	return power >= silentMps ? 'power' : undefined;
}

/** Far below what any speed is known to. */
const rootTolerance = 1e-7;

/** m/s at the end for a whole 100 % of the factor: the central difference over 1 %. */
function slopeOf(ask: AskModel, reading: Reading, trim: Trim, factor: Factor): number {
	const at = (by: number) => ask(reading, {...trim, [factor]: trim[factor] * (1 + by)})?.endMps ?? Number.NaN;
	return (at(onePercent / 2) - at(-onePercent / 2)) / (onePercent * trim[factor]);
}

/** Not where a little more or less of the factor has another gear or shift at the end: such a leap tells nothing of the factor. */
function changesSmoothly(ask: AskModel, reading: Reading, trim: Trim, factor: Factor, endMps: number): boolean {
	const change = (by: number) =>
		Math.abs((ask(reading, {...trim, [factor]: trim[factor] * (1 + by)})?.endMps ?? Number.NaN) - endMps);
	const [up, down] = [change(onePercent / 2), change(-onePercent / 2)];
	return Math.max(up, down) <= mostUneven * Math.min(up, down) + slightMps;
}
const mostUneven = 2;
const slightMps = 0.02 * mphMps;

/** What the uncertainty of the exit speed makes at the end, m/s. */
function exitEffect(ask: AskModel, reading: Reading, trim: Trim): number {
	const {exitMps} = reading;
	if (exitMps === undefined || !(exitMps.se > 0)) return 0;
	const at = (speedMps: number) => ask(reading, trim, {exitMps: speedMps})?.endMps ?? Number.NaN;
	const effect = (at(exitMps.value + exitMps.se) - at(exitMps.value - exitMps.se)) / 2;
	return Number.isFinite(effect) ? effect : 0;
}

type Fit = {readonly factors: Partial<Record<Factor, Known>>; readonly misfit: number | undefined};

const mostRounds = 20;
const settled = 1e-9;

/**
 * Weighted Gauss-Newton on all readings, of four or more with Huber's weights: one straight that is not as the track has it must
 * not carry the others away. Standard errors by the given deviations of the readings, widened where the readings scatter more
 * than these say (R. T. Birge, Phys. Rev. 40, 1932).
 */
function* fitAll(
	ask: AskModel,
	told: readonly StraightAnchor[],
	start: Trim,
	factors: readonly Factor[],
): Generator<undefined, Fit, void> {
	const given = told.map(({seMps}) => Math.max(seMps, leastSeMps));
	let weights: Float64Array = Float64Array.from(given, se => 1 / se ** 2);
	let trim = start;
	let inverse: Float64Array | undefined;
	for (let round = 0; round < mostRounds; round++) {
		yield;
		const misses = Float64Array.from(told, ({reading}) => missBy(ask, reading, trim));
		const columns = factors.map(factor => Float64Array.from(told, ({reading}) => slopeOf(ask, reading, trim, factor)));
		if (told.length >= fewestForRobust) weights = robustWeights(misses, given);
		const step = leastSquares(columns, misses, weights);
		// Readings that cannot tell the two apart: the one that more of them tell.
		if (step === undefined) return factors.length > 1 ? yield* fitAll(ask, told, start, [commonest(told)]) : noFit;
		inverse = step.inverse;
		const before = trim;
		trim = {...trim};
		factors.forEach((factor, i) => {
			const [low, high] = factorBounds[factor];
			trim = {...trim, [factor]: Math.min(high, Math.max(low, trim[factor] + step.coefficients[i]!))};
		});
		if (factors.every(factor => Math.abs(trim[factor] - before[factor]) < settled)) break;
	}
	const misses = told.map(({reading}) => missBy(ask, reading, trim));
	const spare = told.length - factors.length;
	const squares = misses.reduce((sum, miss, i) => sum + miss ** 2 * weights[i]!, 0);
	const misfit = spare > 0 ? Math.sqrt(squares / spare) : undefined;
	const widened = Math.max(1, misfit ?? 1);
	const p = factors.length;
	const seOf = (i: number) => widened * Math.sqrt(inverse![i * p + i]!);
	return {
		factors: Object.fromEntries(factors.map((factor, i) => [factor, {value: trim[factor], se: seOf(i)}])),
		misfit,
	};
}
const noFit: Fit = {factors: {}, misfit: undefined};
/** A speed that is said to be exact is taken to be known to this, so that it does not outweigh all others without end. */
const leastSeMps = 0.01 * mphMps;

const fewestForRobust = 4;

/** Each deviation squared, and Huber's weight by how many times the usual miss in such deviations the miss is. */
function robustWeights(misses: Float64Array, deviations: readonly number[]): Float64Array {
	const standard = misses.map((miss, i) => miss / deviations[i]!);
	const scale = Math.max(1, robustSd(standard, 0));
	return standard.map((miss, i) => huberWeight(miss / scale) / deviations[i]! ** 2);
}

function commonest(told: readonly StraightAnchor[]): Factor {
	const drag = told.filter(({tells}) => tells === 'drag').length;
	return 2 * drag >= told.length ? 'drag' : 'power';
}
