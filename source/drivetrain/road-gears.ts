/** The gears of a car on one kind of road: how it moves in each, and where it changes up. Made once, used by many runs. */
import {coast} from './coast.ts';
import type {Road, RoadForces} from './forces.ts';
import type {GearMotion} from './gear-motion.ts';
import {GearShelf} from './gear-shelf.ts';
import type {GearTable} from './gear-table.ts';
import {mostMps2} from './least-time.ts';
import type {PlannedShift} from './planned-shift.ts';
import {shiftSpeedMps} from './shift-point.ts';
import type {GearTrain, Vehicle} from './straight.ts';
import {speedAtRpmMps} from './tire.ts';
import type {Goal, Travel} from './travel.ts';

/** What the sequences of a run need to know of the gears, however it is worked out. Gears are counted from 1. */
export type Gears = {
	readonly vehicle: Vehicle;
	/** The speed in a gear above which no straight starts. */
	topMps(gear: number): number;
	/** The speed in a gear above which no shift is planned. */
	capMps(gear: number): number;
	/** The speed in a gear at which thrust ends. */
	limiterMps(gear: number): number;
	/** A bound above the acceleration in a gear from a speed up. */
	mostMps2(gear: number, fromMps: number): number;
	/** The shift from a gear to the next. */
	shift(gear: number): Pick<PlannedShift, 'speedMps' | 'coasted'>;
	/** The shift of a car that enters the gear at a speed: it shifts at once where the planned speed is already behind. */
	shiftFrom(gear: number, enteredMps: number): Pick<PlannedShift, 'speedMps' | 'coasted'>;
	/** The run in a gear from a speed until the goal is met. */
	carry(gear: number, fromMps: number, goal: Goal): Travel;
};

/** Everything is worked out when it is first asked for: most runs use few of the gears. */
export class RoadGears implements Gears {
	readonly vehicle: Vehicle;
	readonly train: GearTrain;
	readonly forces: RoadForces;
	readonly #shelf: GearShelf;
	readonly #motions: GearMotion[] = [];
	readonly #tables: GearTable[] = [];
	readonly #shifts: PlannedShift[] = [];
	readonly #lights: number[] = [];

	/** Trains on the same shelf, which is the vehicle's and the road's, share the gears that they have in common. */
	constructor(vehicle: Vehicle, train: GearTrain, road: Road, shelf = new GearShelf(vehicle, road)) {
		this.vehicle = vehicle;
		this.train = train;
		this.#shelf = shelf;
		this.forces = shelf.forces;
	}

	motion(gear: number): GearMotion {
		this.#motions[gear] ??= this.#shelf.motion(this.train.overall[gear - 1]!, this.train.efficiency[gear - 1]!);
		return this.#motions[gear];
	}

	/** The motion with its integrals kept. */
	table(gear: number): GearTable {
		this.#tables[gear] ??= this.#shelf.table(this.motion(gear));
		return this.#tables[gear];
	}

	topMps(gear: number): number {
		return this.#speedAt(gear, this.vehicle.topRpm);
	}

	capMps(gear: number): number {
		return this.#speedAt(gear, this.vehicle.shiftCapRpm);
	}

	limiterMps(gear: number): number {
		return this.motion(gear).limiterMps;
	}

	carry(gear: number, fromMps: number, goal: Goal): Travel {
		return this.table(gear).travel(fromMps, goal);
	}

	mostMps2(gear: number, fromMps: number): number {
		const wheelTorqueNm = this.#shelf.peakTorqueNm * this.train.efficiency[gear - 1]! * this.train.overall[gear - 1]!;
		return mostMps2(this.vehicle, this.forces, wheelTorqueNm, fromMps);
	}

	shift(gear: number): PlannedShift {
		this.#shifts[gear] ??= this.#shelf.shift(this.motion(gear), this.motion(gear + 1), () => this.#planShift(gear));
		return this.#shifts[gear];
	}

	/** The speed one reaction time before the planned shift: where the light must come on. */
	lightMps(gear: number): number {
		this.#lights[gear] ??= this.table(gear).speedBefore(this.shift(gear).speedMps, this.vehicle.reactionTimeS);
		return this.#lights[gear];
	}

	shiftFrom(gear: number, enteredMps: number): PlannedShift {
		const planned = this.shift(gear);
		return enteredMps <= planned.speedMps ? planned : this.#shiftAt(gear, enteredMps);
	}

	#speedAt(gear: number, rpm: number): number {
		const {rolloutM, growth, slip} = this.vehicle;
		return speedAtRpmMps(rpm, this.train.overall[gear - 1]!, rolloutM, growth, slip);
	}

	#planShift(gear: number): PlannedShift {
		const [here, next] = [this.motion(gear), this.motion(gear + 1)];
		return this.#shiftAt(gear, shiftSpeedMps(here, next, Math.min(this.capMps(gear), here.limiterMps)));
	}

	#shiftAt(gear: number, speedMps: number): PlannedShift {
		const coasted = coast(this.vehicle, this.forces, speedMps, this.vehicle.shiftTimeS);
		const [rpm, rpmAfter] = [this.motion(gear).rpmAt(speedMps), this.motion(gear + 1).rpmAt(coasted.speedMps)];
		return {speedMps, rpm, coasted, rpmAfter};
	}
}
