/** The engine while the speed, or in a shift its own, changes evenly in time: shifts, braking, corners. */
import {gaussLegendre} from '../drivetrain/gauss-legendre.ts';
import {cutsBetween, type Slice, type Throttle} from './slice.ts';

export type EvenRun = {
	readonly gear: number;
	readonly throttle: Throttle;
	readonly timeS: number;
	/** RPM at a share of the time, 0 to 1; it rises or falls all along. */
	readonly rpmAt: (share: number) => number;
	/** The share of the time at which an RPM on the way is met. */
	readonly shareAt: (rpm: number) => number;
	readonly powerWAt: (share: number) => number;
};

/** A step of RPM is a small part of any corner: over it RPM and power bend little. */
const {nodes, weights} = gaussLegendre(6);

/** Cut at whole steps of RPM and at `askedRpm`; the times add up to `timeS`. */
export function evenSlices({gear, throttle, timeS, rpmAt, shareAt, powerWAt}: EvenRun, askedRpm: number): Slice[] {
	if (timeS <= 0) return [];
	const shares = [0, ...cutsBetween(rpmAt(0), rpmAt(1), askedRpm).map(shareAt), 1];
	return shares.slice(1).map((to, i) => {
		const from = shares[i]!;
		const mean = (value: (share: number) => number) =>
			nodes.reduce((sum, node, k) => sum + (weights[k]! / 2) * value(from + ((1 + node) / 2) * (to - from)), 0);
		const spanS = (to - from) * timeS;
		return {
			gear,
			throttle,
			fromRpm: rpmAt(from),
			toRpm: rpmAt(to),
			timeS: spanS,
			turns: (spanS * mean(rpmAt)) / 60,
			energyJ: spanS * mean(powerWAt),
		};
	});
}
