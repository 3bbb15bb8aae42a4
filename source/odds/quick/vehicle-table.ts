/** A vehicle at the speeds of the grid, and the thrust of its gears there, each worked out when it is first asked for. */
import {fastestMps} from '../../drivetrain/gear-motion.ts';
import {peakTorqueNm} from '../../drivetrain/least-time.ts';
import {cellOf, type MonotoneCubic} from '../../drivetrain/monotone-cubic.ts';
import type {GearTrain, Vehicle} from '../../drivetrain/straight.ts';
import {growthReferenceMps, speedAtRpmMps} from '../../drivetrain/tire.ts';
import {lastCell, nodeSpeeds, nodes} from './speed-grid.ts';

/** (2π)²: what an inertia counts as mass, in turns per meter squared. */
export const inertiaFactor = 4 * Math.PI * Math.PI;

/** What of a vehicle no pair and set changes. */
export class VehicleTable {
	readonly vehicle: Vehicle;
	readonly growth: number;
	readonly turnsPerM = new Float64Array(nodes);
	/** (2π/C)² at each node: what an inertia counts as mass. */
	readonly perInertia = new Float64Array(nodes);
	/** 1/m_g, the mass that grip moves: the car and its undriven wheels. */
	readonly perHeldKg = new Float64Array(nodes);
	readonly peakTorqueNm: number;
	readonly rolloutM: number;
	readonly massKg: number;
	readonly undrivenKgM2: number;
	readonly torqueNm: MonotoneCubic;

	constructor(vehicle: Vehicle) {
		this.vehicle = vehicle;
		this.rolloutM = vehicle.rolloutM;
		this.massKg = vehicle.massKg;
		this.undrivenKgM2 = vehicle.undrivenInertiaKgM2;
		this.torqueNm = vehicle.torqueNm;
		this.growth = vehicle.growth / (growthReferenceMps * growthReferenceMps);
		this.peakTorqueNm = peakTorqueNm(vehicle);
		for (let node = 0; node < nodes; node++) {
			const turns = this.turnsAt(nodeSpeeds[node]!);
			const perInertia = inertiaFactor * turns * turns;
			this.turnsPerM[node] = turns;
			this.perInertia[node] = perInertia;
			this.perHeldKg[node] = 1 / (vehicle.massKg + perInertia * vehicle.undrivenInertiaKgM2);
		}
	}

	/** 1/C(V). */
	turnsAt(speedMps: number): number {
		return 1 / (this.vehicle.rolloutM * (1 + this.growth * speedMps * speedMps));
	}
}

/** Distance and time over the whole cells of a gear, each good for the road whose stamp it carries; a time of NaN is too steep. */
export type CellTable = {
	readonly stamp: Int32Array;
	readonly distanceM: Float64Array;
	readonly timeS: Float64Array;
	/** The way from a speed to the top of its cell that was gone last. */
	startStamp: number;
	startMps: number;
	startDistanceM: number;
	startTimeS: number;
};

/** One gear of a vehicle. The tables are kept from one gear train to the next. */
class GearTable implements CellTable {
	readonly stamp = new Int32Array(lastCell);
	readonly distanceM = new Float64Array(lastCell);
	readonly timeS = new Float64Array(lastCell);
	startStamp = 0;
	startMps = 0;
	startDistanceM = 0;
	startTimeS = 0;
	readonly thrustN = new Float64Array(nodes);
	readonly perKg = new Float64Array(nodes);
	rpmFactor = 0;
	thrustFactor = 0;
	drivenKgM2 = 0;
	topMps = 0;
	capMps = 0;
	limiterMps = 0;
	cell = 0;
}

/** The gears of a train on a vehicle: one object serves one row after the other. */
export class ThrustTables {
	#table: VehicleTable | undefined;
	#train: GearTrain | undefined;
	readonly #gears: GearTable[] = [];
	#stamp = 0;

	/** A number for the cells of one more road. */
	nextStamp(): number {
		this.#stamp = (this.#stamp + 1) | 0;
		return this.#stamp;
	}

	get table(): VehicleTable {
		return this.#table!;
	}

	get train(): GearTrain {
		return this.#train!;
	}

	/** From here on it is about these. */
	take(table: VehicleTable, train: GearTrain): void {
		this.#table = table;
		this.#train = train;
		const {rolloutM, growth, slip, limiterRpm, topRpm, shiftCapRpm, wheelInertiaKgM2, engineInertiaKgM2} =
			table.vehicle;
		train.overall.forEach((overall, i) => {
			this.#gears[i] ??= new GearTable();
			const gear = this.#gears[i];
			gear.thrustN.fill(Number.NaN);
			gear.rpmFactor = 60 * (1 + slip) * overall;
			gear.thrustFactor = 2 * Math.PI * train.efficiency[i]! * overall;
			gear.drivenKgM2 = wheelInertiaKgM2 + engineInertiaKgM2 * overall * overall;
			gear.topMps = speedAtRpmMps(topRpm, overall, rolloutM, growth, slip);
			gear.capMps = speedAtRpmMps(shiftCapRpm, overall, rolloutM, growth, slip);
			gear.limiterMps = Math.min(fastestMps, speedAtRpmMps(limiterRpm, overall, rolloutM, growth, slip));
		});
	}

	/** Counted from 1. */
	gear(gear: number): GearTable {
		return this.#gears[gear - 1]!;
	}

	/** What the engine gives at a node against a resistance, m/s². */
	poweredAtNode(gear: number, node: number, resistanceN: number): number {
		const gearTable = this.#gears[gear - 1]!;
		if (Number.isNaN(gearTable.thrustN[node]!)) this.#fill(gearTable, node);
		return (gearTable.thrustN[node]! - resistanceN) * gearTable.perKg[node]!;
	}

	#fill(gear: GearTable, node: number): void {
		const {vehicle, turnsPerM, perInertia} = this.table;
		const turns = turnsPerM[node]!;
		const torque = torqueAt(vehicle.torqueNm, gear.rpmFactor * nodeSpeeds[node]! * turns, gear);
		gear.thrustN[node] = gear.thrustFactor * torque * turns;
		gear.perKg[node] = 1 / (vehicle.massKg + perInertia[node]! * gear.drivenKgM2);
	}
}

/** As `valueAt` of the curve, remembering the cell in the gear: neighbors are asked for in a row. */
export function torqueAt({x, coefficients: c, last}: MonotoneCubic, rpm: number, gear: {cell: number}): number {
	if (rpm <= x[0]!) return c[0]!;
	if (rpm >= x[x.length - 1]!) return last;
	if (rpm < x[gear.cell]! || rpm >= x[gear.cell + 1]!) gear.cell = cellOf(x, rpm);
	const i = 4 * gear.cell;
	const u = rpm - x[gear.cell]!;
	return c[i]! + u * (c[i + 1]! + u * (c[i + 2]! + u * c[i + 3]!));
}
