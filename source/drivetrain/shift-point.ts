/** Where to change up: at the speed from which the next gear accelerates the car more. */
import {brentRoot} from './brent.ts';
import type {GearMotion} from './gear-motion.ts';

/**
 * The planned shift speed from one gear to the next, m/s: the highest speed at which a_next − a_here goes from negative to
 * positive, where the limiter ends the thrust of the gear at the latest, but never above `capMps`. Stretches where both are
 * equal (grip holds both) do not count. 0 where the lower gear is nowhere better.
 */
export function shiftSpeedMps(here: GearMotion, next: GearMotion, capMps: number): number {
	const advantage = (speedMps: number) => next.acceleration(speedMps) - here.acceleration(speedMps);
	if (advantage(capMps) <= 0 || worseAbove(advantage, here, capMps)) return capMps;
	let better = capMps;
	for (const speed of downward(here, next, capMps)) {
		const at = advantage(speed);
		if (at > 0) better = speed;
		else if (at < 0) return brentRoot(advantage, speed, better) ?? better;
	}
	return 0;
}

/** Whether the lower gear is the better one again anywhere between the cap and its limiter. */
function worseAbove(advantage: (speedMps: number) => number, here: GearMotion, capMps: number): boolean {
	const places = [...here.images.filter(speed => speed > capMps), (capMps + here.limiterMps) / 2];
	return here.limiterMps > capMps && places.some(speed => advantage(speed) < 0);
}

/** The images of the curve's points in both gears below the cap and the middles between them, falling. */
function downward(here: GearMotion, next: GearMotion, capMps: number): number[] {
	const images = [...here.images, ...next.images].filter(speed => speed < capMps).sort((a, b) => b - a);
	return images.flatMap((speed, i) => [(speed + (images[i - 1] ?? capMps)) / 2, speed]);
}
