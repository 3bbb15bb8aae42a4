/** The engine at full throttle in one gear, from one speed to another. */
import type {GearMotion} from '../drivetrain/gear-motion.ts';
import {gentle, integrate, type Motion} from '../drivetrain/quadrature.ts';
import type {RoadGears} from '../drivetrain/road-gears.ts';
import {settled} from '../drivetrain/travel.ts';
import {brakePowerW} from './brake-power.ts';
import {cutsBetween, type Slice} from './slice.ts';

export type FullThrottle = {
	readonly gear: number;
	readonly fromMps: number;
	readonly toMps: number;
	/** The whole of it. What is more than the way between the speeds takes is spent at the end speed: on the limiter, or where the resistances hold the car. */
	readonly timeS: number;
};

/** More time left over than the quadrature is wrong by, relatively: the end speed was held. */
const heldShare = 1e-9;

/** More pieces than a run toward the speed where the acceleration is 0 takes. */
const mostPieces = 400;

/** Cut at whole steps of RPM and at `askedRpm`: t = ∫ dV / a(V), turns = ∫ n/a dV, work = ∫ P/a dV between the cuts. */
export function fullThrottleSlices(gears: RoadGears, run: FullThrottle, askedRpm: number): Slice[] {
	const {gear, fromMps, toMps, timeS} = run;
	const motion = gears.motion(gear);
	const cuts = cutsBetween(motion.rpmAt(fromMps), motion.rpmAt(toMps), askedRpm).map(rpm => motion.speedAt(rpm));
	const speeds = [fromMps, ...cuts, toMps];
	const slices = speeds.slice(1).map((speed, i) => between(gears, gear, speeds[i]!, speed));
	const leftS = timeS - slices.reduce((sum, slice) => sum + slice.timeS, 0);
	if (leftS > heldShare * timeS) return [...slices, held(gears, gear, toMps, leftS)];
	const last = slices.at(-1)!;
	return [...slices.slice(0, -1), lasting(last, last.timeS + leftS)];
}

/** Near the speed that the resistances hold, neighboring doubles of speed lie far apart in time: the end is set by the time. */
function lasting(slice: Slice, timeS: number): Slice {
	if (slice.timeS <= 0) return {...slice, timeS: Math.max(0, timeS)};
	const share = timeS / slice.timeS;
	return {...slice, timeS, turns: share * slice.turns, energyJ: share * slice.energyJ};
}

function between(gears: RoadGears, gear: number, fromMps: number, toMps: number): Slice {
	const motion = gears.motion(gear);
	const {slip} = gears.vehicle;
	const perSecond = weighted(motion, speed => motion.rpmAt(speed) / 60);
	const power = weighted(motion, speed => brakePowerW(gears, gear, speed, motion.acceleration(speed), slip));
	let [timeS, turns, energyJ] = [0, 0, 0];
	for (const [from, to] of pieces(motion, fromMps, toMps)) {
		timeS += integrate(motion, from, to).timeS;
		turns += integrate(perSecond, from, to).timeS;
		energyJ += integrate(power, from, to).timeS;
	}
	return {
		gear,
		throttle: 'full',
		fromRpm: motion.rpmAt(fromMps),
		toRpm: motion.rpmAt(toMps),
		timeS,
		turns,
		energyJ,
	};
}

/** On the limiter the ignition leaves as much power as holds the speed. */
function held(gears: RoadGears, gear: number, speedMps: number, timeS: number): Slice {
	const rpm = gears.motion(gear).rpmAt(speedMps);
	const energyJ = timeS * brakePowerW(gears, gear, speedMps, 0, gears.vehicle.slip);
	return {gear, throttle: 'full', fromRpm: rpm, toRpm: rpm, timeS, turns: (timeS * rpm) / 60, energyJ};
}

/** A motion whose time is ∫ weight dV / a(V). */
function weighted(motion: Motion, weight: (speedMps: number) => number): Motion {
	return {acceleration: speed => motion.acceleration(speed) / weight(speed), breaks: motion.breaks};
}

/** The way from one speed to another in pieces that one quadrature serves: between kinks, and halved toward a speed where the acceleration is 0. */
function pieces(motion: GearMotion, fromMps: number, toMps: number): [number, number][] {
	const [low, high] = fromMps < toMps ? [fromMps, toMps] : [toMps, fromMps];
	const kinks = motion.breaks.filter(speed => speed > low && speed < high);
	const ends = [...(fromMps < toMps ? kinks : kinks.reverse()), toMps];
	const found: [number, number][] = [];
	let here = fromMps;
	for (const end of ends) {
		while (here !== end) {
			const next = found.length < mostPieces ? gentleEnd(motion, here, end) : end;
			found.push([here, next]);
			here = next;
		}
	}
	return found;
}

function gentleEnd(motion: Motion, fromMps: number, toMps: number): number {
	const at = (speedMps: number) => motion.acceleration(speedMps);
	let end = toMps;
	while (Math.abs(end - fromMps) > settled * fromMps && !gentle(at(fromMps), at((fromMps + end) / 2), at(end))) {
		end = (fromMps + end) / 2;
	}
	return end;
}
