/** The car in one situation, with the engine and the air of the day. */
import type {AirState} from '../drivetrain/air.ts';
import type {Car, Engine} from '../drivetrain/car.ts';
import {type PowerPeak, scaledTorque} from '../drivetrain/engine.ts';
import type {MonotoneCubic} from '../drivetrain/monotone-cubic.ts';
import type {Vehicle} from '../drivetrain/straight.ts';
import {harmonicRolloutM} from '../drivetrain/tire.ts';
import type {PowerChange} from '../drivetrain/track.ts';

/** What the engine is, whatever the situation. */
export type EngineInUse = {
	readonly engine: Engine;
	readonly limitRpm: number;
	readonly rated: MonotoneCubic;
	readonly ratedPeak: PowerPeak;
};

/** Torque of the situation ÷ today's torque of the base car: from a share, or from watts against today's peak power. */
export function powerFactor(change: PowerChange | undefined, peakW: number): number {
	if (change === undefined) return 1;
	if (change.kind === 'scale') return change.factor;
	return (change.kind === 'add' ? peakW + change.watts : change.watts) / peakW;
}

/** `car` is as it is in the situation; `correction` is rated torque ÷ today's. */
export function vehicleFor(
	car: Car,
	{engine, limitRpm, rated, ratedPeak}: EngineInUse,
	air: AirState,
	correction: number,
	power: PowerChange | undefined,
): Vehicle {
	const limiterRpm = engine.limiter ?? limitRpm;
	const topRpm = Math.min(limiterRpm, limitRpm);
	return {
		massKg: car.massKg,
		rearShare: car.rearShare,
		rearDownforceShare: car.rearDownforceShare,
		dragAreaM2: car.dragAreaM2,
		downforceAreaM2: car.downforceAreaM2,
		rolling: car.rolling,
		grip: car.grip,
		cgHeightRatio: car.cgHeightM === undefined || car.wheelbaseM === undefined ? 0 : car.cgHeightM / car.wheelbaseM,
		wheelInertiaKgM2: car.wheelInertiaKgM2,
		undrivenInertiaKgM2: car.undrivenInertiaKgM2,
		engineInertiaKgM2: engine.inertiaKgM2,
		airDensityKgM3: air.densityKgM3,
		rolloutM: harmonicRolloutM(car.tires.leftM, car.tires.rightM),
		growth: car.tires.growth,
		slip: car.tires.slip,
		torqueNm: scaledTorque(rated, powerFactor(power, ratedPeak.powerW / correction) / correction),
		limiterRpm,
		topRpm,
		shiftCapRpm: topRpm - car.margins.shiftRpm,
		shiftTimeS: car.shiftTimeS,
		reactionTimeS: car.reactionTimeS,
		sameTimeS: car.margins.sameTimeS,
	};
}
