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
	/** Of each hump, counted from 1. */
	readonly gears: readonly number[];
	/** Twice the logarithm of how much less likely than a perfect fit of what is installed: the lower the better. */
	readonly penalty: number;
};

/** Standard deviations of a rollout as the documents have it, and of growth at 100 mph; both as fractions. */
const rolloutSd = 0.01;
const growthSd = 0.003;
/** Standard deviation of a hump about its ratio: ratios are stated rounded, growth differs a little between gears. */
const humpSd = 0.003;
/** Humps that lie further off than this, root mean square, are not explained. */
export const farthestResidual = 2 * humpSd;

/** Twice the logarithm of the odds, before the log is seen, against what the documents call installed. */
const oddsAgainst = {otherPair: 6, otherSet: 4, notOnHand: 3, turned: 1, otherTurned: 6, gearNotAllowed: 2};

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
		const against = oddsOf(candidate, isFlipped, installed) + gearOdds(fit.gears, gears);
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
	const own = samePair(flipped(pair), installed.pair);
	const turned = own ? oddsAgainst.turned : isFlipped ? oddsAgainst.otherTurned : 0;
	return notOnHand + otherSet + oddsAgainst.otherPair * (own ? 0.5 : 1) + turned;
}

function gearOdds(used: readonly number[], allowed: GearRange | undefined): number {
	if (allowed === undefined) return 0;
	const outside = used.filter(gear => gear < allowed.lowest || gear > allowed.highest).length;
	return (oddsAgainst.gearNotAllowed * outside) / Math.max(1, used.length);
}

const costOf = ({residual, circumferenceFactor}: Lay, humps: number, span: number) =>
	humps * (residual / humpSd) ** 2 + (Math.log(circumferenceFactor) / (span / 2)) ** 2;

type Lay = Pick<Laid, 'gears' | 'circumferenceFactor' | 'residual'>;

/**
 * The gears that the humps belong to, the factor of the circumference that brings them nearest, and what is left. Every hump
 * is tried on every gear; among equally good ones the factor nearest to 1.
 */
function layOn(overall: readonly number[], humps: readonly Hump[], span: number): Lay {
	const logs = overall.map(Math.log);
	let best: Lay & {cost: number} = {gears: [], circumferenceFactor: 1, residual: 0, cost: Number.POSITIVE_INFINITY};
	for (const hump of humps.slice(0, 1)) {
		for (const gear of logs) {
			const lay = settledFrom(logs, humps, gear - Math.log(hump.overall));
			const cost = costOf(lay, humps.length, span);
			if (cost < best.cost) best = {...lay, cost};
		}
	}
	return best;
}

/** Humps count by the root of their samples: a gear used for a moment tells less, but tells. */
function settledFrom(logs: readonly number[], humps: readonly Hump[], shift: number): Lay {
	const weights = humps.map(({samples}) => Math.sqrt(samples));
	const total = weights.reduce((sum, weight) => sum + weight, 0);
	const at = humps.map(({overall}) => Math.log(overall));
	const gears = at.map(x => nearest(logs, x + shift));
	const off = at.map((x, i) => logs[gears[i]! - 1]! - x);
	const mean = off.reduce((sum, x, i) => sum + weights[i]! * x, 0) / total;
	const square = off.reduce((sum, x, i) => sum + weights[i]! * (x - mean) ** 2, 0) / total;
	return {gears, circumferenceFactor: Math.exp(mean), residual: Math.sqrt(square)};
}

function nearest(values: readonly number[], x: number): number {
	let best = 0;
	for (let i = 1; i < values.length; i++) if (Math.abs(values[i]! - x) < Math.abs(values[best]! - x)) best = i;
	return best + 1;
}
