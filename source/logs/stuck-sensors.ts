/** Stretches where speed or engine speed stands still although the other one moves: the sensor hangs. */
import type {RemarkData} from './reading.ts';
import type {Numbers} from './samples.ts';

/** A receiver that loses its fix holds a value for a moment; a car on the limiter holds both. */
const longestHeldS = 2;
const fewestSamples = 5;
/** How far the other one must have moved, as a share of its highest value there. */
const movedShare = 0.1;
/** Below these a car stands or idles, where the two have nothing to do with one another. */
const slowest = {speed: 5, rpm: 1000};

type Channel = 'speed' | 'rpm';

/** Makes the stretches unknown, in place, with a rest after each channel. The standing value of a speed of 0 is a car that stands. */
export function* forgetStuck(
	timeS: Float64Array,
	speedMps: Numbers,
	rpm: Numbers,
): Generator<undefined, RemarkData[], void> {
	const stuckSpeed = stretches(timeS, speedMps, rpm, 'speed');
	yield;
	const stuckRpm = stretches(timeS, rpm, speedMps, 'rpm');
	yield;
	for (const [values, list] of [
		[speedMps, stuckSpeed],
		[rpm, stuckRpm],
	] as const)
		for (const {from, to} of list) values.fill(Number.NaN, from, to);
	return [...remarkOf('speed', stuckSpeed, timeS), ...remarkOf('rpm', stuckRpm, timeS)];
}

type Stretch = {readonly from: number; readonly to: number};

function remarkOf(channel: Channel, list: readonly Stretch[], timeS: Float64Array): RemarkData[] {
	const [first] = list;
	if (first === undefined) return [];
	const totalS = list.reduce((sum, {from, to}) => sum + timeS[to - 1]! - timeS[from]!, 0);
	return [{kind: 'stuck', channel, times: list.length, totalS, atS: timeS[first.from]!}];
}

function stretches(timeS: Float64Array, values: Numbers, others: Numbers, channel: Channel): Stretch[] {
	const list: Stretch[] = [];
	let [from, last, known, held] = [0, 0, 0, Number.NaN];
	const close = () => {
		const isLong = known >= fewestSamples && timeS[last]! - timeS[from]! >= longestHeldS;
		const isStanding = channel === 'speed' && held === 0;
		if (isLong && !isStanding && moves(others, from, last + 1, channel)) list.push({from, to: last + 1});
	};
	for (let i = 0; i < values.length; i++) {
		const value = values[i]!;
		if (Number.isNaN(value)) continue;
		if (value !== held) {
			close();
			[from, known, held] = [i, 0, value];
		}
		known++;
		last = i;
	}
	close();
	return list;
}

function moves(others: Numbers, from: number, to: number, channel: Channel): boolean {
	let [lowest, highest] = [Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY];
	for (let i = from; i < to; i++) {
		const other = others[i]!;
		if (other < lowest) lowest = other;
		if (other > highest) highest = other;
	}
	const least = channel === 'speed' ? slowest.rpm : slowest.speed;
	return highest > least && highest - lowest > movedShare * highest;
}
