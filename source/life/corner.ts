/** The engine in a corner, of which only the length and the speeds at its ends and in it are known. */
import type {RoadGears} from '../drivetrain/road-gears.ts';
import {speedAtRpmMps} from '../drivetrain/tire.ts';
import {evenSlices} from './even-run.ts';
import type {Slice} from './slice.ts';
import {evenSpeed} from './speed-run.ts';

export type Corner = {
	readonly lengthM: number;
	readonly entryMps: number;
	/** Undefined: the speed changes evenly from entry to exit. */
	readonly minimumMps: number | undefined;
	readonly exitMps: number;
	/** In use at the end of the straight before, and at the exit. */
	readonly entryGear: number;
	readonly exitGear: number;
	/** The highest RPM at which a lower gear is taken. */
	readonly downshiftRpm: number;
	readonly steadySlip: number;
};

/** A level road without wind: the corner turns through it. */
export const cornerRoad = {grade: 0, headwindMps: 0, load: 1, extraDragN: 0};

type Leg = {readonly fromMps: number; readonly toMps: number; readonly lengthM: number};

/**
 * The corner by assumption: over the first half of its length the speed changes evenly (in time) to the minimum, over the
 * second to the exit. In the exit gear, while slowing in the lowest gear from it up whose RPM is not above `downshiftRpm`.
 * Power is what that takes against drag, rolling resistance and inertia, never less than none or more than full throttle.
 */
export function cornerSlices(gears: RoadGears, corner: Corner, askedRpm: number): Slice[] {
	return legsOf(corner).flatMap(leg =>
		inGears(gears, corner, leg).flatMap(run => evenSlices(evenSpeed(gears, run), askedRpm)),
	);
}

/** Length ÷ mean speed, leg by leg. */
export function cornerTimeS(corner: Corner): number {
	return legsOf(corner).reduce((sum, leg) => sum + legTimeS(leg), 0);
}

function legsOf({lengthM, entryMps, minimumMps, exitMps}: Corner): Leg[] {
	if (minimumMps === undefined) return [{fromMps: entryMps, toMps: exitMps, lengthM}];
	return [
		{fromMps: entryMps, toMps: minimumMps, lengthM: lengthM / 2},
		{fromMps: minimumMps, toMps: exitMps, lengthM: lengthM / 2},
	];
}

const legTimeS = ({fromMps, toMps, lengthM}: Leg) => (2 * lengthM) / (fromMps + toMps);

/** A leg cut where a slowing car takes a lower gear. */
function inGears(gears: RoadGears, corner: Corner, leg: Leg) {
	const {exitGear, steadySlip} = corner;
	const highest = Math.max(exitGear, corner.entryGear);
	const timeS = legTimeS(leg);
	const runs = [];
	let {fromMps} = leg;
	for (let gear = leg.fromMps > leg.toMps ? highest : exitGear; gear >= exitGear; gear--) {
		const downMps = gear > exitGear ? speedAt(gears, gear - 1, corner) : leg.toMps;
		const toMps = gear > exitGear ? Math.max(downMps, leg.toMps) : leg.toMps;
		const isPart = gear === exitGear || toMps < fromMps;
		if (!isPart) continue;
		const share = leg.fromMps === leg.toMps ? 1 : (toMps - fromMps) / (leg.toMps - leg.fromMps);
		runs.push({gear, fromMps, toMps, timeS: share * timeS, throttle: 'part' as const, steadySlip});
		fromMps = toMps;
	}
	return runs;
}

function speedAt({vehicle, train}: RoadGears, gear: number, {downshiftRpm, steadySlip}: Corner): number {
	return speedAtRpmMps(downshiftRpm, train.overall[gear - 1]!, vehicle.rolloutM, vehicle.growth, steadySlip);
}
