/** Where to change up: at the speed from which the next gear accelerates the car more. */
import {brentRoot} from './brent.ts';
import type {GearMotion} from './gear-motion.ts';

/**
 * The planned shift speed from one gear to the next, m/s: the highest speed at which a_next − a_here goes from negative to
 * positive, where the limiter ends the thrust of the gear at the latest, but never above `capMps`. Stretches where both are
 * equal (grip holds both) do not count. 0 where the lower gear is nowhere better. Signs are looked for at the kinks of both
 * gears and halfway between them: two crossings closer together than that are not told apart.
 */
export function shiftSpeedMps(here: GearMotion, next: GearMotion, capMps: number): number {
	const advantage = (speedMps: number) => next.acceleration(speedMps) - here.acceleration(speedMps);
	if (advantage(capMps) <= 0 || worseAbove(advantage, here, capMps)) return capMps;
	let lowestBetter = capMps;
	let above = capMps;
	for (let kink = kinkBelow(here, next, above); kink !== undefined; kink = kinkBelow(here, next, above)) {
		for (const speed of [(above + kink) / 2, kink]) {
			const at = advantage(speed);
			if (at < 0) return brentRoot(advantage, speed, lowestBetter) ?? lowestBetter;
			if (at > 0) lowestBetter = speed;
		}
		above = kink;
	}
	return 0;
}

/** Whether the lower gear is the better one again anywhere between the cap and its limiter. */
function worseAbove(advantage: (speedMps: number) => number, here: GearMotion, capMps: number): boolean {
	if (here.limiterMps <= capMps) return false;
	if (advantage((capMps + here.limiterMps) / 2) < 0) return true;
	for (let edge = here.edgeBelow(capMps) + 1; here.edge(edge) < here.limiterMps; edge++) {
		if (advantage(here.edge(edge)) < 0) return true;
	}
	return advantage(here.limiterMps) < 0;
}

/** The next lower edge of either gear. */
function kinkBelow(here: GearMotion, next: GearMotion, speedMps: number): number | undefined {
	const [one, other] = [edgeUnder(here, speedMps), edgeUnder(next, speedMps)];
	return one === undefined || (other !== undefined && other > one) ? other : one;
}

function edgeUnder(motion: GearMotion, speedMps: number): number | undefined {
	if (speedMps <= 0) return undefined;
	const below = motion.edgeBelow(speedMps);
	return motion.edge(below) < speedMps ? motion.edge(below) : motion.edge(below - 1);
}
