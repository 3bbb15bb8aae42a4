/** From the columns as they were read to a run: in order, with time and distance, without what cannot be true. */
import type {ChannelName} from './channels.ts';
import type {UsedColumn} from './decide-units.ts';
import type {LoggedRun} from './logged-run.ts';
import {putInOrder} from './put-in-order.ts';
import type {RemarkData} from './reading.ts';
import type {Rows} from './row-reader.ts';
import {type Numbers, Samples} from './samples.ts';
import {samplingRemarks} from './sampling.ts';
import {brakeShare, highestOf, throttleShare} from './shares.ts';
import {forgetStuck} from './stuck-sensors.ts';
import {distanceFromSpeed, everywhere, joinDistance, lengthFromSpeed, timeFromSpeed} from './travelled.ts';

export type RunFromRows = {readonly run: LoggedRun; readonly remarks: readonly RemarkData[]};

/** More than any car has: the unit must be wrong. 320 mph, and less than an engine turns under load. */
const highestSpeedMps = 143;
const highestRpm = 25_000;
const lowestPeakRpm = 1000;
/** By how much the distance of a log may differ from what its speed makes. */
const agreement = 0.05;

/** Steps of one pass over the samples at most. */
export type Steps<T> = Generator<undefined, T, void>;

/** A sensor hung all the time: speed or engine speed is known nowhere. */
type Dead = {readonly dead: 'speed' | 'rpm'};
/** More rows go back than ahead. */
type Backward = {readonly backward: 'time' | 'distance'; readonly rows: number};

/** Rests after each pass over the samples, for a caller that has other things to do in between. */
export function* runFromRows(rows: Rows, columns: readonly UsedColumn[]): Steps<RunFromRows | Dead | Backward> {
	const byChannel = new Map<ChannelName, Numbers>(columns.map(({channel}, slot) => [channel, rows.values[slot]!]));
	const samples = new Samples(byChannel, rows.samples);
	const axis = byChannel.has('time') ? 'time' : 'distance';
	const inOrder = ordered(samples, axis);
	yield;
	if ('backward' in inOrder) return inOrder;
	const [speedMps, rpm] = [samples.get('speed') as Float32Array, samples.get('rpm') as Float32Array];
	const along = samples.get(axis) as Float64Array;
	const timeS = axis === 'time' ? along : timeFromSpeed(along, everywhere(speedMps, along));
	const stuck = yield* forgetStuck(timeS, speedMps, rpm);
	for (const dead of ['speed', 'rpm'] as const) if (samples.get(dead)!.every(Number.isNaN)) return {dead};
	const place = axis === 'time' ? yield* distanceBeside(timeS, samples, speedMps) : timeWorkedOut(along);
	const sampling = samplingRemarks(timeS);
	yield;
	const wild = implausible(speedMps, rpm);
	yield;
	const sound = [...sampling, ...stuck, ...wild, ...shares(samples, columns)];
	yield;
	const channel = (name: ChannelName) => (samples.get(name) as Float32Array | undefined) ?? null;
	const gear = channel('gear');
	// Reverse, and what a logger writes where it does not know.
	gear?.forEach((value, i) => {
		if (value < 0) gear[i] = Number.NaN;
	});
	const {distanceM} = place;
	const needed = {samples: samples.length, timeS, distanceM, speedMps, rpm};
	const more = {throttle: channel('throttle'), gear, lap: channel('lap'), brake: channel('brake')};
	const run = {...needed, ...more, steering: channel('steering')};
	return {run, remarks: [...inOrder.remarks, ...place.remarks, ...sound]};
}

function ordered(samples: Samples, axis: 'time' | 'distance'): {readonly remarks: RemarkData[]} | Backward {
	const all = samples.length;
	const {unplaced, outOfOrder, restarts} = putInOrder(samples, axis);
	const back = outOfOrder + restarts.length;
	if (2 * back > all) return {backward: axis, rows: back};
	const remarks: RemarkData[] = [];
	if (unplaced > 0) remarks.push({kind: 'unplaced', rows: unplaced});
	if (outOfOrder > 0) remarks.push({kind: 'outOfOrder', channel: axis, rows: outOfOrder});
	// Where the axis is a distance, there is no time yet to say where.
	if (restarts.length > 0) remarks.push({kind: 'restart', channel: axis, atS: axis === 'time' ? restarts : []});
	return {remarks};
}

type Placed = Pick<LoggedRun, 'distanceM'> & {readonly remarks: readonly RemarkData[]};

const timeWorkedOut = (distanceM: Float64Array): Placed => ({
	distanceM,
	remarks: [{kind: 'workedOut', channel: 'time'}],
});

function* distanceBeside(timeS: Float64Array, samples: Samples, speedMps: Float32Array): Steps<Placed> {
	const known = everywhere(speedMps, timeS);
	yield;
	const logged = samples.get('distance') as Float64Array | undefined;
	if (logged === undefined || logged.every(Number.isNaN))
		return {distanceM: distanceFromSpeed(timeS, known), remarks: [{kind: 'workedOut', channel: 'distance'}]};
	const restartsS = joinDistance(logged, timeS, known);
	yield;
	const remarks: RemarkData[] = [];
	if (restartsS.length > 0) remarks.push({kind: 'restart', channel: 'distance', atS: restartsS});
	const [loggedM, bySpeedM] = [logged.at(-1) ?? 0, lengthFromSpeed(timeS, known)];
	if (bySpeedM > 0 && Math.abs(loggedM / bySpeedM - 1) > agreement) remarks.push({kind: 'disagree', loggedM, bySpeedM});
	return {distanceM: logged, remarks};
}

function implausible(speedMps: Numbers, rpm: Numbers): RemarkData[] {
	const [speed, engine] = [highestOf(speedMps), highestOf(rpm)];
	const remarks: RemarkData[] = [];
	if (speed > highestSpeedMps) remarks.push({kind: 'implausible', channel: 'speed', highest: speed});
	if (engine > highestRpm || engine < lowestPeakRpm)
		remarks.push({kind: 'implausible', channel: 'rpm', highest: engine});
	return remarks;
}

function shares(samples: Samples, columns: readonly UsedColumn[]): RemarkData[] {
	const remarks: RemarkData[] = [];
	const named = (channel: ChannelName) => columns.find(column => column.channel === channel)!;
	const [throttle, brake] = [samples.get('throttle'), samples.get('brake')];
	const leaveOut = (channel: ChannelName) => {
		samples.drop(channel);
		remarks.push({kind: 'leftOut', channel, headers: [named(channel).header.written], why: 'numbers'});
	};
	if (throttle) {
		const told = throttleShare(throttle, named('throttle'));
		if (told === undefined) leaveOut('throttle');
		else remarks.push(...told);
	}
	if (brake && !brakeShare(brake)) leaveOut('brake');
	return remarks;
}
