/** One situation made ready to run: the vehicle, and the course of each straight. Each is made once and shared by all rows. */
import {type AirState, airState, mergedAir} from '../drivetrain/air.ts';
import type {Car, Engine} from '../drivetrain/car.ts';
import {type PowerPeak, scaledTorque} from '../drivetrain/engine.ts';
import type {MonotoneCubic} from '../drivetrain/monotone-cubic.ts';
import {correctionFactor} from '../drivetrain/power-correction.ts';
import type {Course, Vehicle} from '../drivetrain/straight.ts';
import {harmonicRolloutM} from '../drivetrain/tire.ts';
import type {GearRange, PowerChange, Restart, Situation, Straight, Track, Wind} from '../drivetrain/track.ts';
import {carIn, headwindMps, keepsVehicle, straightIn, windIn} from './situations.ts';

/** A straight in a situation, or the restart. */
export type Place = {
	readonly name: string;
	readonly isRestart: boolean;
	/** With the speeds of the situation. */
	readonly straight: Straight;
	readonly headwindMps: number;
	/** By the number of gears of the gearbox; undefined where it has none of the allowed gears. */
	readonly courses: ReadonlyMap<number, Course | undefined>;
};

export type Condition = {
	readonly name: string;
	/** The part in the mean time; all of them add up to 1. */
	readonly share: number;
	readonly weight: number;
	readonly vehicle: Vehicle;
	readonly steadySlip: number;
	readonly air: AirState;
	/** Rated torque ÷ today's. */
	readonly correction: number;
	readonly wind: Partial<Wind>;
	readonly places: readonly Place[];
	readonly restart: Place | undefined;
};

/** What the engine is, whatever the situation. */
export type EngineInUse = {
	readonly engine: Engine;
	readonly limitRpm: number;
	readonly rated: MonotoneCubic;
	readonly ratedPeak: PowerPeak;
};

/** The situation's condition. `base` is the one of the track as it stands, whose vehicle is shared where nothing of it changes. */
export function conditionFor(
	car: Car,
	track: Track,
	situation: Situation,
	inUse: EngineInUse,
	base: Condition | undefined,
): Omit<Condition, 'weight'> {
	const shared = keepsVehicle(situation) ? base : undefined;
	const air = shared?.air ?? airState(mergedAir(track.air, situation.air));
	const correction = shared?.correction ?? correctionFactor(inUse.engine.correctedTo, air);
	const wind = windIn(situation, track.wind);
	const added = situation.headwindMps ?? 0;
	const counts = [...new Set(car.gearboxes.map(gearbox => gearbox.ratios.length))];
	return {
		name: situation.name,
		share: situation.share,
		vehicle: shared?.vehicle ?? vehicleFor(carIn(situation, car), inUse, air, correction, situation.power),
		steadySlip: car.tires.steadySlip,
		air,
		correction,
		wind,
		places: track.straights.map(straight =>
			placeFor(
				straightIn(situation, straight),
				straight.gears ?? track.gears,
				headwindMps(wind, straight.headingRad) + added,
				counts,
			),
		),
		restart: track.restart && placeFor(restartStraight(track.restart), undefined, added, counts, track.restart),
	};
}

/** Torque of the situation ÷ today's torque of the base car: from a share, or from watts against today's peak power. */
export function powerFactor(change: PowerChange | undefined, peakW: number): number {
	if (change === undefined) return 1;
	if (change.kind === 'scale') return change.factor;
	return (change.kind === 'add' ? peakW + change.watts : change.watts) / peakW;
}

/** The allowed gears that a gearbox of so many gears has; undefined where it has none of them. */
export function gearsOf(allowed: GearRange | undefined, count: number): GearRange | undefined {
	const lowest = Math.max(allowed?.lowest ?? 1, 1);
	const highest = Math.min(allowed?.highest ?? count, count);
	return lowest <= highest ? {lowest, highest} : undefined;
}

function vehicleFor(
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

function placeFor(
	straight: Straight,
	allowed: GearRange | undefined,
	headwind: number,
	gearCounts: readonly number[],
	restart?: Restart,
): Place {
	const startGear = restart?.gear;
	const courseWith = (count: number): Course | undefined => {
		const gears = gearsOf(allowed, count);
		return (
			gears && {
				lengthM: straight.lengthM ?? 0,
				exitMps: straight.exitMps,
				entryMps: straight.entryMps,
				brakingMps2: straight.brakingMps2,
				grade: straight.grade,
				headwindMps: headwind,
				load: straight.load,
				extraDragN: straight.extraDragN,
				lowestGear: gears.lowest,
				highestGear: gears.highest,
				startGear: startGear !== undefined && startGear <= count ? startGear : undefined,
			}
		);
	};
	const courses = new Map(gearCounts.map(count => [count, courseWith(count)]));
	return {name: straight.name, isRestart: restart !== undefined, straight, headwindMps: headwind, courses};
}

/** The restart as a straight of its own: level, unloaded, all gears. */
function restartStraight(restart: Restart): Straight {
	return {
		name: 'restart',
		exitMps: restart.speedMps,
		minimumMps: undefined,
		lengthM: restart.distanceM,
		endMps: undefined,
		entryMps: undefined,
		brakingMps2: undefined,
		grade: 0,
		headingRad: undefined,
		load: 1,
		extraDragN: 0,
		gears: undefined,
		measured: undefined,
	};
}
