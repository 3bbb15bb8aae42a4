/**
 * Time and distance between two speeds where the acceleration depends on speed alone: t = ∫ dV / a(V) and
 * s = ∫ V dV / a(V), by Gauss-Legendre quadrature over a piece in which a is smooth.
 */
import {gaussLegendre} from './gauss-legendre.ts';

export type Motion = {
	/** Acceleration at a road speed from 0 up, m/s². */
	acceleration(speedMps: number): number;
	/** Rising speeds between which the acceleration is smooth. */
	readonly breaks: readonly number[];
};

export type Stretch = {readonly distanceM: number; readonly timeS: number};

const piece = gaussLegendre(6);
/** For the last, short steps of a search, a small part of a piece. */
const sliver = gaussLegendre(3);

/**
 * The rule's error is about the square of its last Legendre coefficients over the mean, so where those are below this it is
 * below 1e-9, and in practice 1e-11: the coefficients fall on between the last and twice their number.
 */
const smooth = 1e-4;
/** Where it is not that smooth the piece is halved, so often at most: the rest of a kink is then below 1e-6 of the piece. */
const mostHalvings = 10;

/** A piece is halved until the acceleration at its end is within this factor of that at its start. */
const steepest = 0.4;

/** An acceleration that is nothing but rounding: in an hour it would change the speed by less than 1e-9 m/s. */
const stillMps2 = 1e-13;

/** What it takes to get past a speed at which the acceleration is 0. */
export const endless: Stretch = {distanceM: Number.POSITIVE_INFINITY, timeS: Number.POSITIVE_INFINITY};

/** Distance and time over which the acceleration, of one sign, takes the car from one speed to another inside a piece; `endless` where it is seen to change sign. */
export function integrate(motion: Motion, fromMps: number, toMps: number, halvings = mostHalvings): Stretch {
	const {nodes, weights, lastCoefficient, nextToLastCoefficient} = piece;
	const middle = (fromMps + toMps) / 2;
	const half = (toMps - fromMps) / 2;
	let distanceM = 0;
	let timeS = 0;
	let last = 0;
	let nextToLast = 0;
	for (let i = 0; i < nodes.length; i++) {
		const speed = middle + half * nodes[i]!;
		const slowness = 1 / motion.acceleration(speed);
		timeS += weights[i]! * slowness;
		distanceM += weights[i]! * slowness * speed;
		last += lastCoefficient[i]! * slowness;
		nextToLast += nextToLastCoefficient[i]! * slowness;
	}
	if (halvings > 0 && Math.abs(last) + Math.abs(nextToLast) > (smooth / 2) * Math.abs(timeS)) {
		if (changesSign(motion, middle, half)) return endless;
		const one = integrate(motion, fromMps, middle, halvings - 1);
		const other = integrate(motion, middle, toMps, halvings - 1);
		if (one === endless || other === endless) return endless;
		return {distanceM: one.distanceM + other.distanceM, timeS: one.timeS + other.timeS};
	}
	return {distanceM: distanceM * half, timeS: timeS * half};
}

/** Whether the acceleration differs in sign among the nodes of a piece. */
function changesSign(motion: Motion, middleMps: number, halfMps: number): boolean {
	const positive = motion.acceleration(middleMps) > 0;
	return piece.nodes.some(node => motion.acceleration(middleMps + halfMps * node) > 0 !== positive);
}

/** The same over a small part of a piece. */
export function integrateSliver(motion: Motion, fromMps: number, toMps: number): Stretch {
	const {nodes, weights} = sliver;
	const middle = (fromMps + toMps) / 2;
	const half = (toMps - fromMps) / 2;
	let distanceM = 0;
	let timeS = 0;
	for (let i = 0; i < nodes.length; i++) {
		const speed = middle + half * nodes[i]!;
		const weight = weights[i]! / motion.acceleration(speed);
		timeS += weight;
		distanceM += weight * speed;
	}
	return {distanceM: distanceM * half, timeS: timeS * half};
}

/**
 * Whether the accelerations at the start, the middle and the end of a piece are near enough for one quadrature: any pole of
 * 1/a then lies outside the piece by about its length. The middle tells a dip below 0 between two like ends.
 */
export function gentle(start: number, middle: number, end: number): boolean {
	const ratio = end / start;
	return Math.abs(start) > stillMps2 && middle / start > 0 && ratio >= steepest && ratio <= 1 / steepest;
}
