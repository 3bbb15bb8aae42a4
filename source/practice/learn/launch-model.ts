/** The model of the first moments after an exit, in one gear: dV/dt = a(V) by the classic Runge-Kutta steps. */
import type {GearMotion} from '../../drivetrain/gear-motion.ts';

/** A tenth of a millionth of the speed is what is lost by a step. */
const stepS = 0.02;

/** The speed so long after an exit at a speed, m/s; the limiter is not looked at. */
export function speedAfter(motion: GearMotion, exitMps: number, timeS: number): number {
	const steps = Math.max(1, Math.ceil(timeS / stepS));
	let speedMps = exitMps;
	for (let i = 0; i < steps; i++) speedMps = stepped(motion, speedMps, timeS / steps);
	return speedMps;
}

/** How long after the exit grip holds the car, up to `longestS`. */
export function gripHeldS(motion: GearMotion, exitMps: number, longestS: number): number {
	let [timeS, speedMps] = [0, exitMps];
	while (timeS < longestS && motion.mark(speedMps).gripHolds) {
		speedMps = stepped(motion, speedMps, stepS);
		timeS += stepS;
	}
	return Math.min(timeS, longestS);
}

function stepped(motion: GearMotion, v: number, h: number): number {
	const a1 = motion.acceleration(v);
	const a2 = motion.acceleration(v + (h / 2) * a1);
	const a3 = motion.acceleration(v + (h / 2) * a2);
	const a4 = motion.acceleration(v + h * a3);
	return v + (h / 6) * (a1 + 2 * a2 + 2 * a3 + a4);
}
