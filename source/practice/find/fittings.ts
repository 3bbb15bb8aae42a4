/** How well each pair and set explains the humps of the overall ratio. */
import type {Car, Pair} from '../../drivetrain/car.ts';
import {flipped, samePair} from '../../drivetrain/gear-pair.ts';
import {growthReferenceMps} from '../../drivetrain/tire.ts';
import type {GearRange} from '../../drivetrain/track.ts';
import {type Candidate, candidateOf, mountable} from '../../planning/candidates.ts';
import type {Hump} from './clusters.ts';
import type {Fitting} from './findings.ts';

/** The pair and the set that the documents say are mounted. */
export type Installed = {readonly pair: Pair; readonly gearbox: string};

/** A candidate laid on the humps. */
export type Laid = Fitting & {
	/** Of each hump, counted from 1; undefined: none. */
	readonly gears: readonly (number | undefined)[];
	/** Twice the logarithm of how much less likely than a perfect fit of what is installed: the lower the better. */
	readonly penalty: number;
};

/** Standard deviations of a rollout as the documents have it, and of growth at 100 mph; both as fractions. */
const rolloutSd = 0.01;
export const growthSd = 0.003;
/** Standard deviation of a hump about its ratio: ratios are stated rounded, growth differs a little between gears. */
const humpSd = 0.003;
/** A hump further off than this belongs to no gear: wheelspin and shifts make small ones. It counts as this far off. */
const strayFrom = 4 * humpSd;
/** Humps that lie further off than this, root mean square by their samples, are not explained. */
export const farthestResidual = 2 * humpSd;

/** Twice the logarithm of the odds, before the log is seen, against what the documents call installed. */
const oddsAgainst = {
	otherPair: 6,
	otherSet: 4,
	notOnHand: 3,
	ownTurned: 3,
	otherTurned: 6,
	gearNotAllowed: 2,
	gearColumn: 8,
};

/** Every pair and set, both ways round, best first. `gears`: what the track allows; `span`: `plausibleSpan`. */
export function fittingsOf(
	car: Car,
	humps: readonly Hump[],
	installed: Installed | undefined,
	gears: GearRange | undefined,
	span: number,
): Laid[] {
	const laid = mountings(car).map(({candidate, isFlipped}) => {
		const fit = layOn(candidate.train.overall, humps, span);
		const against = oddsOf(candidate, isFlipped, installed) + gearOdds(fit.gears, gears) + columnOdds(fit.gears, humps);
		return {candidate, flipped: isFlipped, ...fit, penalty: costOf(fit, humps.length, span) + against};
	});
	return laid.sort((one, other) => one.penalty - other.penalty);
}

/** How far the documents' circumference may plausibly be off at a speed, as a fraction: two standard deviations. */
export function plausibleSpan(speedMps: number): number {
	return 2 * Math.hypot(rolloutSd, growthSd * (speedMps / growthReferenceMps) ** 2);
}

export const explains = (fit: Fitting, span: number) =>
	Math.abs(Math.log(fit.circumferenceFactor)) <= span && fit.residual <= farthestResidual;

export const isInstalled = ({candidate}: Fitting, installed: Installed | undefined) =>
	installed !== undefined && samePair(candidate.pair, installed.pair) && candidate.gearbox.name === installed.gearbox;

function mountings(car: Car): {candidate: Candidate; isFlipped: boolean}[] {
	const right = mountable(car);
	const turned = car.rack.pairs
		.map(pair => ({...pair, ...flipped(pair)}))
		.filter(pair => !right.some(other => samePair(other, pair)));
	return [...right.map(pair => ({pair, isFlipped: false})), ...turned.map(pair => ({pair, isFlipped: true}))].flatMap(
		({pair, isFlipped}) => car.gearboxes.map(gearbox => ({candidate: candidateOf(car, pair, gearbox), isFlipped})),
	);
}

function oddsOf({pair, gearbox}: Candidate, isFlipped: boolean, installed: Installed | undefined): number {
	const notOnHand = pair.sets === 0 ? oddsAgainst.notOnHand : 0;
	if (installed === undefined) return notOnHand + (isFlipped ? oddsAgainst.otherTurned : 0);
	const otherSet = gearbox.name === installed.gearbox ? 0 : oddsAgainst.otherSet;
	if (samePair(pair, installed.pair)) return otherSet;
	if (samePair(flipped(pair), installed.pair)) return oddsAgainst.ownTurned + otherSet;
	return oddsAgainst.otherPair + otherSet + notOnHand + (isFlipped ? oddsAgainst.otherTurned : 0);
}

function gearOdds(gears: Laid['gears'], allowed: GearRange | undefined): number {
	const used = gears.filter(gear => gear !== undefined);
	if (allowed === undefined) return 0;
	const outside = used.filter(gear => gear < allowed.lowest || gear > allowed.highest).length;
	return (oddsAgainst.gearNotAllowed * outside) / Math.max(1, used.length);
}

const costOf = ({residual, circumferenceFactor}: Lay, humps: number, span: number) =>
	humps * (residual / humpSd) ** 2 + (Math.log(circumferenceFactor) / (span / 2)) ** 2;

/** The gear column counts by the samples in which it says another gear. */
function columnOdds(gears: Laid['gears'], humps: readonly Hump[]): number {
	let [against, all] = [0, 0];
	for (const [i, {samples, logged}] of humps.entries()) {
		if (gears[i] === undefined || logged === undefined) continue;
		all += samples;
		if (logged !== gears[i]) against += samples;
	}
	return all === 0 ? 0 : (oddsAgainst.gearColumn * against) / all;
}

type Lay = Pick<Laid, 'gears' | 'circumferenceFactor' | 'residual'>;

/**
 * The gears that the humps belong to, the factor of the circumference that brings them nearest, and what is left. The
 * largest hump is tried on every gear; among equally good ones the factor nearest to 1.
 */
function layOn(overall: readonly number[], humps: readonly Hump[], span: number): Lay {
	const logs = overall.map(Math.log);
	let best: Lay & {cost: number} = {gears: [], circumferenceFactor: 1, residual: 0, cost: Number.POSITIVE_INFINITY};
	for (const gear of logs) {
		const lay = settledFrom(logs, humps, gear - Math.log(humps[0]!.overall));
		const cost = costOf(lay, humps.length, span);
		if (cost < best.cost) best = {...lay, cost};
	}
	return best;
}

/** Whether the ratios explain the humps once the circumference is so many times the documents', to within the span. */
export function fitsAt(overall: readonly number[], humps: readonly Hump[], times: number, span: number): boolean {
	const lay = settledFrom(overall.map(Math.log), humps, Math.log(times));
	return lay.residual <= farthestResidual && Math.abs(Math.log(lay.circumferenceFactor / times)) <= span;
}

/** The largest hump decides to begin with; humps that then lie far off are strays, and do not move the rest. */
function settledFrom(logs: readonly number[], humps: readonly Hump[], start: number): Lay {
	const total = humps.reduce((sum, {samples}) => sum + samples, 0);
	const at = humps.map(({overall}) => Math.log(overall));
	const gears = at.map(x => nearest(logs, x + start));
	const off = at.map((x, i) => logs[gears[i]! - 1]! - x);
	const near = (shift: number) => off.map(x => Math.abs(x - shift) <= strayFrom);
	const shiftOf = (kept: readonly boolean[]) => {
		const all = off.map((x, i) => ({x, weight: kept[i] ? humps[i]!.samples : 0}));
		return all.reduce((sum, {x, weight}) => sum + weight * x, 0) / all.reduce((sum, {weight}) => sum + weight, 0);
	};
	// From the largest hump's own place, so that a start that is off by the rollout does not make strays.
	const shift = shiftOf(near(off[0]!));
	const kept = near(shift);
	const square = off.reduce((sum, x, i) => sum + humps[i]!.samples * Math.min(strayFrom, Math.abs(x - shift)) ** 2, 0);
	return {
		gears: gears.map((gear, i) => (kept[i] ? gear : undefined)),
		circumferenceFactor: Math.exp(shift),
		residual: Math.sqrt(square / total),
	};
}

function nearest(values: readonly number[], x: number): number {
	let best = 0;
	for (let i = 1; i < values.length; i++) if (Math.abs(values[i]! - x) < Math.abs(values[best]! - x)) best = i;
	return best + 1;
}
