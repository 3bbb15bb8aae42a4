/** Straights of one situation that are alike in grade, wind, load and drag share what the solver works out for a row. */
import type {Road} from '../drivetrain/forces.ts';
import {GearShelf} from '../drivetrain/gear-shelf.ts';
import {RoadGears} from '../drivetrain/road-gears.ts';
import type {GearTrain, Vehicle} from '../drivetrain/straight.ts';

/** The different roads of a plan, each with its vehicle, by number. */
export class Roads {
	readonly #known: {readonly vehicle: Vehicle; readonly road: Road}[] = [];

	/** The number of a road; a road that is alike to a known one for the same vehicle has that one's. */
	numberOf(vehicle: Vehicle, road: Road): number {
		const found = this.#known.findIndex(known => known.vehicle === vehicle && alike(known.road, road));
		return found >= 0 ? found : this.#known.push({vehicle, road}) - 1;
	}

	/**
	 * The gears of a train on each road, made when they are first asked for, and let go when a road of another vehicle is:
	 * what a whole row would hold is dear to collect.
	 */
	gearsFor(train: GearTrain): (roadNumber: number) => RoadGears {
		let made: RoadGears[] = [];
		let current: Vehicle | undefined;
		return number => {
			const {vehicle, road} = this.#known[number]!;
			if (vehicle !== current) made = [];
			current = vehicle;
			made[number] ??= new RoadGears(vehicle, train, road);
			return made[number];
		};
	}

	/** The gears of many trains that have gears in common: what one train has had worked out serves the others. */
	gearsInCommon(): (train: GearTrain, roadNumber: number) => RoadGears {
		const shelves: GearShelf[] = [];
		return (train, number) => {
			const {vehicle, road} = this.#known[number]!;
			shelves[number] ??= new GearShelf(vehicle, road);
			return new RoadGears(vehicle, train, road, shelves[number]);
		};
	}
}

function alike(one: Road, other: Road): boolean {
	return (
		one.grade === other.grade &&
		one.headwindMps === other.headwindMps &&
		one.load === other.load &&
		one.extraDragN === other.extraDragN
	);
}
