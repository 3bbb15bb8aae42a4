/** Gears of a car on one kind of road that several gear trains have in common: each is worked out once. */
import {type Road, type RoadForces, roadForces} from './forces.ts';
import {GearMotion} from './gear-motion.ts';
import {GearTable} from './gear-table.ts';
import {peakTorqueNm} from './least-time.ts';
import type {PlannedShift} from './planned-shift.ts';
import type {Vehicle} from './straight.ts';

export class GearShelf {
	readonly forces: RoadForces;
	readonly #vehicle: Vehicle;
	/** By overall ratio, then efficiency. */
	readonly #motions = new Map<number, Map<number, GearMotion>>();
	readonly #tables = new Map<GearMotion, GearTable>();
	readonly #shifts = new Map<GearMotion, Map<GearMotion, PlannedShift>>();
	#peakTorqueNm: number | undefined;

	constructor(vehicle: Vehicle, road: Road) {
		this.#vehicle = vehicle;
		this.forces = roadForces(vehicle, road);
	}

	get peakTorqueNm(): number {
		this.#peakTorqueNm ??= peakTorqueNm(this.#vehicle);
		return this.#peakTorqueNm;
	}

	motion(overall: number, efficiency: number): GearMotion {
		return among(
			among(this.#motions, overall, () => new Map<number, GearMotion>()),
			efficiency,
			() => new GearMotion(this.#vehicle, this.forces, overall, efficiency),
		);
	}

	table(motion: GearMotion): GearTable {
		return among(this.#tables, motion, () => new GearTable(motion));
	}

	/** The shift from one gear to another, worked out by `plan` where it is not known. */
	shift(here: GearMotion, next: GearMotion, plan: () => PlannedShift): PlannedShift {
		return among(
			among(this.#shifts, here, () => new Map<GearMotion, PlannedShift>()),
			next,
			plan,
		);
	}
}

function among<K, V>(map: Map<K, V>, key: K, make: () => V): V {
	const known = map.get(key);
	if (known !== undefined) return known;
	const made = make();
	map.set(key, made);
	return made;
}
