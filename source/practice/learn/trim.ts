/** What practice corrects of a car at a track, and the car and track so corrected. */
import type {Car} from '../../drivetrain/car.ts';
import type {Track} from '../../drivetrain/track.ts';
import {carAt} from '../../planning/situations.ts';

export type Trim = {
	/** Of the rolling circumference at standstill: both rollouts times it, so that the stagger stays in proportion. */
	readonly rollout: number;
	/** The growth itself; undefined: as it is. */
	readonly growth: number | undefined;
	readonly drag: number;
	/** Of the share of the dyno curve that the car has. */
	readonly power: number;
	/** Of the coefficient of friction. */
	readonly grip: number;
};

export const untrimmed: Trim = {rollout: 1, growth: undefined, drag: 1, power: 1, grip: 1};

/** The track with the corrected numbers as its own, which replace the car's. */
export function trimmed(car: Car, track: Track, trim: Trim): Track {
	const {tires, dragAreaM2, engines, grip} = carAt(track, car);
	const engine = engines.find(one => one.for.includes(track.type));
	return {
		...track,
		car: {
			...track.car,
			tires: {
				...track.car.tires,
				...(trim.rollout !== 1 && {leftM: tires.leftM * trim.rollout, rightM: tires.rightM * trim.rollout}),
				...(trim.growth !== undefined && {growth: trim.growth}),
			},
			...(trim.drag !== 1 && {dragAreaM2: dragAreaM2 * trim.drag}),
			...(trim.grip !== 1 && {grip: grip * trim.grip}),
			...(trim.power !== 1 && engine !== undefined && {power: engine.power * trim.power}),
		},
	};
}
