/** The engine on a straight that has been run: full throttle from shift to shift, the interruptions, the braking. */
import {coast} from '../drivetrain/coast.ts';
import type {RoadGears} from '../drivetrain/road-gears.ts';
import {brakingOf} from '../drivetrain/sequence.ts';
import type {Course, GearShift, SequenceRun} from '../drivetrain/straight.ts';
import {evenSlices} from './even-run.ts';
import {fullThrottleSlices} from './full-throttle.ts';
import type {Slice} from './slice.ts';
import {evenSpeed} from './speed-run.ts';

type Here = {readonly speedMps: number; readonly distanceM: number; readonly timeS: number};

/**
 * Every moment from the exit to the end, braking included; the times add up to the run's. In an interruption the RPM falls
 * evenly to what the next gear turns, counted in the gear left. Braking is in the last gear, throttle closed.
 */
export function straightSlices(
	gears: RoadGears,
	course: Course,
	run: SequenceRun,
	steadySlip: number,
	askedRpm: number,
): Slice[] {
	const slices: Slice[] = [];
	let here: Here = {speedMps: course.exitMps, distanceM: 0, timeS: 0};
	for (const shift of run.shifts) {
		const toShift = {
			gear: shift.from,
			fromMps: here.speedMps,
			toMps: shift.speedMps,
			timeS: shift.timeS - here.timeS,
		};
		slices.push(...fullThrottleSlices(gears, toShift, askedRpm), ...interruption(gears, shift, askedRpm));
		here = afterShift(gears, shift);
	}
	slices.push(...lastGear(gears, course, run, here, steadySlip, askedRpm));
	return slices;
}

function interruption({vehicle}: RoadGears, {from, rpm, rpmAfter}: GearShift, askedRpm: number): Slice[] {
	const change = rpmAfter - rpm;
	const run = {
		gear: from,
		throttle: 'closed' as const,
		timeS: vehicle.shiftTimeS,
		rpmAt: (share: number) => rpm + share * change,
		shareAt: (at: number) => (at - rpm) / change,
		powerWAt: () => 0,
	};
	return evenSlices(run, askedRpm);
}

function afterShift({vehicle, forces}: RoadGears, shift: GearShift): Here {
	const coasted = coast(vehicle, forces, shift.speedMps, vehicle.shiftTimeS);
	return {
		speedMps: coasted.speedMps,
		distanceM: shift.distanceM + coasted.distanceM,
		timeS: shift.timeS + vehicle.shiftTimeS,
	};
}

function lastGear(
	gears: RoadGears,
	course: Course,
	run: SequenceRun,
	here: Here,
	steadySlip: number,
	askedRpm: number,
): Slice[] {
	const gear = run.lastGear;
	const braking = brakingOf(course);
	const goal = {distanceM: course.lengthM - here.distanceM, toMps: gears.motion(gear).limiterMps, braking};
	const {speedMps, timeS} = gears.table(gear).travel(here.speedMps, goal);
	const throttle = {gear, fromMps: here.speedMps, toMps: speedMps, timeS: timeS + run.limiterM / speedMps};
	const slices = fullThrottleSlices(gears, throttle, askedRpm);
	if (braking === undefined || speedMps <= braking.entryMps) return slices;
	const {entryMps, brakingMps2} = braking;
	const stopping = {
		gear,
		fromMps: speedMps,
		toMps: entryMps,
		timeS: (speedMps - entryMps) / brakingMps2,
		throttle: 'closed' as const,
		steadySlip,
	};
	return [...slices, ...evenSlices(evenSpeed(gears, stopping), askedRpm)];
}
