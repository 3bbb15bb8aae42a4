/** Time and distance from one another by the speed, where a log has only one of them, or only a part of it. */
import {nextKnown} from './put-in-order.ts';
import type {Numbers} from './samples.ts';

/** A car that moves at less is not told from one that stands; it bounds the time that a distance takes. */
const slowestMps = 0.1;

/** The speed at every sample: between known ones in proportion to the axis, before the first and after the last as they are. 0 where none is known. */
export function everywhere(speedMps: Float32Array, axis: Numbers): Float32Array {
	if (!speedMps.some(Number.isNaN)) return speedMps;
	const filled = Float32Array.from(speedMps);
	let known = -1;
	for (let i = 0; i < filled.length; i++) {
		const value = filled[i]!;
		if (Number.isNaN(value)) continue;
		const from = known === -1 ? value : filled[known]!;
		const start = known === -1 ? 0 : axis[known]!;
		const span = axis[i]! - start;
		for (let k = known + 1; k < i; k++)
			filled[k] = span > 0 ? from + ((value - from) * (axis[k]! - start)) / span : from;
		known = i;
	}
	return filled.fill(known === -1 ? 0 : filled[known]!, known + 1);
}

/** Distance over time, by the trapezoidal rule. */
export function distanceFromSpeed(timeS: Float64Array, speedMps: Float32Array): Float64Array {
	const distanceM = new Float64Array(timeS.length);
	for (let i = 1; i < timeS.length; i++) distanceM[i] = distanceM[i - 1]! + stepM(timeS, speedMps, i);
	return distanceM;
}

/** Time over distance: each step at the mean of the speeds at its ends. */
export function timeFromSpeed(distanceM: Float64Array, speedMps: Float32Array): Float64Array {
	const timeS = new Float64Array(distanceM.length);
	for (let i = 1; i < distanceM.length; i++) {
		const meanMps = Math.max(slowestMps, (speedMps[i - 1]! + speedMps[i]!) / 2);
		timeS[i] = timeS[i - 1]! + (distanceM[i]! - distanceM[i - 1]!) / meanMps;
	}
	return timeS;
}

const stepM = (timeS: Float64Array, speedMps: Float32Array, i: number): number =>
	Math.max(0, ((speedMps[i - 1]! + speedMps[i]!) / 2) * (timeS[i]! - timeS[i - 1]!));

/** What the speed makes of the whole. */
export function lengthFromSpeed(timeS: Float64Array, speedMps: Float32Array): number {
	let lengthM = 0;
	for (let i = 1; i < timeS.length; i++) lengthM += stepM(timeS, speedMps, i);
	return lengthM;
}

/**
 * The distance of the log beside its clock, rewritten from 0 on, in place. Where it is not known or leaps for one sample, the
 * speed carries it on; where it falls, as a distance counted anew each lap does, it goes on from where it was. Gives the times
 * at which it fell.
 */
export function joinDistance(distanceM: Float64Array, timeS: Float64Array, speedMps: Float32Array): number[] {
	const restartsS: number[] = [];
	// As the log has it, and what is added since it last fell.
	let [last, added] = [Number.NaN, Number.NaN];
	for (let i = 0; i < distanceM.length; i++) {
		const carried = i === 0 ? 0 : distanceM[i - 1]! + stepM(timeS, speedMps, i);
		const raw = distanceM[i]!;
		if (Number.isNaN(raw) || leaps(raw, last, nextKnown(distanceM, i))) {
			distanceM[i] = carried;
			continue;
		}
		if (Number.isNaN(last)) added = carried - raw;
		if (raw < last) {
			added = carried - raw;
			restartsS.push(timeS[i]!);
		}
		last = raw;
		distanceM[i] = i === 0 ? 0 : Math.max(distanceM[i - 1]!, raw + added);
	}
	return restartsS;
}

/** For one sample below both neighbors or above both, which are in order themselves. */
const leaps = (raw: number, last: number, next: number): boolean => last <= next && (raw < last || raw > next);
