import {expect} from 'vitest';
import type {Course, GearTrain, SequenceRun, Vehicle} from '../../source/drivetrain/straight.ts';
import {accelerationIn, accelerationOut, rpmOf, type State, stepped} from './equations.ts';

export type Straight = {vehicle: Vehicle; train: GearTrain; course: Course};

/**
 * Follows a run as told, stepping in time from each event to the next with the equations written a second time, and gives
 * the largest relative disagreement in speed, RPM, distance and time.
 */
export function disagreement({vehicle, train, course}: Straight, run: SequenceRun): number {
	const errors: number[] = [];
	const compare = (found: number, told: number) => errors.push(Math.abs(found - told) / Math.max(1, Math.abs(told)));
	let state: State = {speedMps: course.exitMps, distanceM: 0};
	let [gear, time] = [run.firstGear, 0];
	const inGear = (v: number) => accelerationIn(vehicle, train, course, gear, v);
	for (const shift of run.shifts) {
		state = stepped(inGear, state, shift.timeS - time);
		compare(state.speedMps, shift.speedMps);
		compare(state.distanceM, shift.distanceM);
		compare(rpmOf(vehicle, train.overall[gear - 1]!, state.speedMps), shift.rpm);
		state = stepped(v => accelerationOut(vehicle, course, v), state, vehicle.shiftTimeS);
		time = shift.timeS + vehicle.shiftTimeS;
		gear++;
		compare(rpmOf(vehicle, train.overall[gear - 1]!, state.speedMps), shift.rpmAfter);
	}
	expect(gear).toBe(run.lastGear);
	// From the end back: braking, then what the limiter held, gives when full throttle in the last gear ended.
	const {entryMps, brakingMps2, lengthM} = course;
	const brakes = entryMps !== undefined && brakingMps2 !== undefined && !run.entryMissed;
	const endMps = brakes && run.finalMps === entryMps && run.limiterM === 0 && !run.slows ? run.topMps : undefined;
	if (run.limiterM > 0) {
		const heldMps = run.topMps;
		const brakeS = brakes ? (heldMps - entryMps) / brakingMps2 : 0;
		const brakeM = brakes ? (heldMps ** 2 - entryMps ** 2) / (2 * brakingMps2) : 0;
		state = stepped(inGear, state, run.timeS - brakeS - run.limiterM / heldMps - time);
		compare(state.speedMps, heldMps);
		compare(state.distanceM, lengthM - brakeM - run.limiterM);
		compare(rpmOf(vehicle, train.overall[gear - 1]!, state.speedMps), vehicle.limiterRpm);
	} else if (brakes && endMps !== undefined) {
		state = stepped(inGear, state, run.timeS - (endMps - entryMps) / brakingMps2 - time);
		compare(state.speedMps, endMps);
		compare(state.distanceM, lengthM - (endMps ** 2 - entryMps ** 2) / (2 * brakingMps2));
	} else if (!brakes) {
		state = stepped(inGear, state, run.timeS - time);
		compare(state.speedMps, run.finalMps);
		compare(state.distanceM, lengthM);
	}
	return Math.max(0, ...errors);
}
