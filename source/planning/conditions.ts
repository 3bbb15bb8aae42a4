/** One situation made ready to run: the vehicle, and the course of each straight. Each is made once and shared by all rows. */
import {type AirState, airState, mergedAir} from '../drivetrain/air.ts';
import type {Car} from '../drivetrain/car.ts';
import {correctionFactor} from '../drivetrain/power-correction.ts';
import type {Course, Vehicle} from '../drivetrain/straight.ts';
import type {GearRange, Restart, Situation, Straight, Track, Wind} from '../drivetrain/track.ts';
import type {Roads} from './roads.ts';
import {carIn, headwindMps, keepsVehicle, straightIn, windIn} from './situations.ts';
import {type EngineInUse, vehicleFor} from './vehicle.ts';

/** A straight in a situation, or the restart. */
export type Place = {
	readonly name: string;
	readonly isRestart: boolean;
	/** With the speeds of the situation. */
	readonly straight: Straight;
	/** In the plan's `roads`. */
	readonly road: number;
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

/** The situation's condition. `base` is the one of the track as it stands, whose vehicle is shared where nothing of it changes. */
export function conditionFor(
	car: Car,
	track: Track,
	situation: Situation,
	inUse: EngineInUse,
	roads: Roads,
	base: Condition | undefined,
): Omit<Condition, 'weight'> {
	const shared = keepsVehicle(situation) ? base : undefined;
	const air = shared?.air ?? airState(mergedAir(track.air, situation.air));
	const correction = shared?.correction ?? correctionFactor(inUse.engine.correctedTo, air);
	const wind = windIn(situation, track.wind);
	const added = situation.headwindMps ?? 0;
	const vehicle = shared?.vehicle ?? vehicleFor(carIn(situation, car), inUse, air, correction, situation.power);
	const counts = [...new Set(car.gearboxes.map(gearbox => gearbox.ratios.length))];
	const placeOf = (straight: Straight, allowed: GearRange | undefined, headwind: number, restart?: Restart): Place => ({
		name: straight.name,
		isRestart: restart !== undefined,
		straight,
		road: roads.numberOf(vehicle, {...straight, headwindMps: headwind}),
		courses: new Map(
			counts.map(count => [count, courseFor(straight, gearsOf(allowed, count), headwind, count, restart)]),
		),
	});
	return {
		name: situation.name,
		share: situation.share,
		vehicle,
		steadySlip: car.tires.steadySlip,
		air,
		correction,
		wind,
		places: track.straights.map(straight =>
			placeOf(
				straightIn(situation, straight),
				straight.gears ?? track.gears,
				headwindMps(wind, straight.headingRad) + added,
			),
		),
		restart: track.restart && placeOf(restartStraight(track.restart), undefined, added, track.restart),
	};
}

/** The allowed gears that a gearbox of so many gears has; undefined where it has none of them. */
export function gearsOf(allowed: GearRange | undefined, count: number): GearRange | undefined {
	const lowest = Math.max(allowed?.lowest ?? 1, 1);
	const highest = Math.min(allowed?.highest ?? count, count);
	return lowest <= highest ? {lowest, highest} : undefined;
}

function courseFor(
	straight: Straight,
	gears: GearRange | undefined,
	headwind: number,
	gearCount: number,
	restart: Restart | undefined,
): Course | undefined {
	if (gears === undefined) return undefined;
	return {
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
		startGear: restart?.gear !== undefined && restart.gear <= gearCount ? restart.gear : undefined,
	};
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
