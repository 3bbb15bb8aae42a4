/** Torque and power over engine speed. */
import {brentRoot} from './brent.ts';
import type {Engine} from './car.ts';
import {type MonotoneCubic, monotoneCubic, valueAt} from './monotone-cubic.ts';
import {signChanges} from './polynomial.ts';

export type PowerPeak = {readonly rpm: number; readonly powerW: number};
export type PowerBand = {readonly lowRpm: number; readonly highRpm: number};

/**
 * Full-throttle torque at the day that the curve is corrected to, N m over rev/min: the dyno points times the engine's
 * `power`; held outside the points.
 */
export function ratedTorque(engine: Engine): MonotoneCubic {
	return monotoneCubic(
		engine.curve.map(point => point.rpm),
		engine.curve.map(point => point.torqueNm * engine.power),
	);
}

/** The curve with every torque times `factor`. */
export function scaledTorque(curve: MonotoneCubic, factor: number): MonotoneCubic {
	return {x: curve.x, coefficients: curve.coefficients.map(value => value * factor), last: curve.last * factor};
}

/** Power at an engine speed, W: 2π·n·T/60. */
export function powerW(curve: MonotoneCubic, rpm: number): number {
	return (2 * Math.PI * rpm * valueAt(curve, rpm)) / 60;
}

/**
 * The highest power on the interpolated curve between its first point and the lower of its last point and `limitRpm`, and
 * the lowest RPM that gives it. With a limit below the first point it is the power at the limit, at the torque held there.
 */
export function peakPower(curve: MonotoneCubic, limitRpm: number): PowerPeak {
	return peakAmong(curve, turns(curve, limitRpm));
}

/**
 * The span of RPM around the peak in which the power is at least `share` (0 to 1) of the peak's, on the interpolated curve
 * between the same ends. A second such span beyond a dip is not part of it. Power at an end inside the curve is the share to 1e-9.
 */
export function powerBand(curve: MonotoneCubic, share: number, limitRpm: number): PowerBand {
	const places = turns(curve, limitRpm);
	const peak = peakAmong(curve, places);
	const excess = (rpm: number) => powerW(curve, rpm) - share * peak.powerW;
	const at = places.indexOf(peak.rpm);
	return {
		lowRpm: lastInside(excess, places.slice(0, at + 1).reverse()),
		highRpm: lastInside(excess, places.slice(at)),
	};
}

/** Both ends of the usable curve and, between them, every node and every extremum of power: it is monotone from one to the next. */
function turns(curve: MonotoneCubic, limitRpm: number): number[] {
	const nodes = [...curve.x];
	const high = Math.min(nodes.at(-1)!, limitRpm);
	const low = Math.min(nodes[0]!, high);
	const inner = nodes.slice(0, -1).flatMap((node, i) => [node, ...extrema(curve, i)]);
	return [low, ...inner.filter(rpm => rpm > low && rpm < high), high];
}

/** Where in cell i the slope of n·T, a cubic in u = n − n_i, changes sign. */
function extrema(curve: MonotoneCubic, i: number): number[] {
	const [node, next] = [curve.x[i]!, curve.x[i + 1]!];
	const [c0, c1, c2, c3] = [0, 1, 2, 3].map(power => curve.coefficients[4 * i + power]!) as [
		number,
		number,
		number,
		number,
	];
	const slope = [c0 + node * c1, 2 * (c1 + node * c2), 3 * (c2 + node * c3), 4 * c3];
	return signChanges(slope, 0, next - node).map(u => node + u);
}

function peakAmong(curve: MonotoneCubic, places: readonly number[]): PowerPeak {
	const peaks = places.map(rpm => ({rpm, powerW: powerW(curve, rpm)}));
	return peaks.reduce((best, place) => (place.powerW > best.powerW ? place : best));
}

/** Walking away from the peak: where the excess first falls below 0, or the last place if it never does. */
function lastInside(excess: (rpm: number) => number, places: readonly number[]): number {
	const outside = places.findIndex((rpm, i) => i > 0 && excess(rpm) < 0);
	if (outside < 0) return places.at(-1)!;
	return brentRoot(excess, places[outside - 1]!, places[outside]!) ?? places[outside - 1]!;
}
