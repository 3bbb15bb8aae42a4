/**
 * The gears of a car on a road for a great many runs. The same equations, shifts and sequences as the exact solver, but the
 * integrals t = ∫ dV/a and s = ∫ V dV/a go by Simpson's rule over the cells of a fixed grid of speeds, cut where grip takes
 * over from the engine. A straight comes out within 0.1 ms and a few hundredths of a mph of the exact solver
 * (`tests/odds/quick/quick-gears.test.ts`); where the acceleration is steep for the grid, as near the highest speed, the
 * exact solver takes over.
 */
import {brentRoot} from '../../drivetrain/brent.ts';
import {coast} from '../../drivetrain/coast.ts';
import type {RoadForces} from '../../drivetrain/forces.ts';
import {mostMps2} from '../../drivetrain/least-time.ts';
import {type Gears, RoadGears} from '../../drivetrain/road-gears.ts';
import type {Vehicle} from '../../drivetrain/straight.ts';
import {brakingDistanceM, type Goal, type Travel} from '../../drivetrain/travel.ts';
import type {RoadTable} from './road-table.ts';
import {cellMps, lastCell, nodeMps} from './speed-grid.ts';
import {type CellTable, inertiaFactor, type ThrustTables, torqueAt} from './vehicle-table.ts';

/** Over a cell the acceleration may change by this share of itself; more is the exact solver's. */
const steepest = 0.2;
/** Where a shift is planned, within a millimeter a second. */
const shiftMps = 1e-6;

type Shift = {readonly speedMps: number; readonly coasted: {readonly speedMps: number; readonly distanceM: number}};

export class QuickGears implements Gears {
	readonly vehicle: Vehicle;
	readonly #tables: ThrustTables;
	readonly #road: RoadTable;
	readonly #forces: RoadForces;
	readonly #shifts: Shift[] = [];
	#exact: RoadGears | undefined;
	/** What the cells in the tables must carry to be of this road. */
	readonly #stamp: number;
	/** At the node asked for last: by how much what the engine gives is above what grip holds, m/s². */
	#surplus = 0;
	readonly #travel = {speedMps: 0, distanceM: 0, timeS: 0, why: 'end' as Travel['why']};
	/** Of the stretch integrated last. */
	#distanceM = 0;
	#timeS = 0;

	constructor(tables: ThrustTables, road: RoadTable) {
		this.vehicle = tables.table.vehicle;
		this.#tables = tables;
		this.#road = road;
		this.#forces = road.forces;
		this.#stamp = tables.nextStamp();
	}

	topMps(gear: number): number {
		return this.#tables.gear(gear).topMps;
	}

	capMps(gear: number): number {
		return this.#tables.gear(gear).capMps;
	}

	limiterMps(gear: number): number {
		return this.#tables.gear(gear).limiterMps;
	}

	/** R of a gear. */
	overallOf(gear: number): number {
		return this.#tables.train.overall[gear - 1]!;
	}

	mostMps2(gear: number, fromMps: number): number {
		const {overall, efficiency} = this.#tables.train;
		const wheelTorqueNm = this.#tables.table.peakTorqueNm * efficiency[gear - 1]! * overall[gear - 1]!;
		return mostMps2(this.vehicle, this.#road.forces, wheelTorqueNm, fromMps);
	}

	shift(gear: number): Shift {
		this.#shifts[gear] ??= this.#shiftAt(this.#shiftMps(gear));
		return this.#shifts[gear];
	}

	shiftFrom(gear: number, enteredMps: number): Shift {
		const planned = this.shift(gear);
		return enteredMps <= planned.speedMps ? planned : this.#shiftAt(enteredMps);
	}

	/** What it returns is good until the next call. */
	carry(gear: number, fromMps: number, goal: Goal): Travel {
		const {braking, toMps} = goal;
		const entryMps = braking === undefined ? Number.POSITIVE_INFINITY : braking.entryMps;
		const cells = this.#tables.gear(gear);
		let speedMps = fromMps;
		let distanceM = 0;
		let timeS = 0;
		if (speedMps >= toMps && this.#mps2(gear, speedMps) >= 0) return this.#told(speedMps, distanceM, timeS, 'speed');
		if (goal.distanceM - brakingDistanceM(speedMps, braking) <= 0) return this.#told(speedMps, distanceM, timeS, 'end');
		for (let cell = Math.floor(speedMps / cellMps); cell < lastCell; ) {
			const top = (cell + 1) * cellMps;
			let far = Math.min(toMps, top);
			if (entryMps > speedMps && entryMps < far) far = entryMps;
			if (far === top && speedMps === cell * cellMps) {
				if (cells.stamp[cell] !== this.#stamp) this.#keepCell(gear, cells, cell);
				this.#distanceM = cells.distanceM[cell]!;
				this.#timeS = cells.timeS[cell]!;
			} else if (far === top) this.#startCell(gear, cells, speedMps, cell);
			else this.#integrate(gear, speedMps, this.#startMps2(gear, speedMps, cell), far, this.#mps2(gear, far));
			if (Number.isNaN(this.#timeS)) break;
			const brakesM = far > entryMps ? brakingDistanceM(far, braking) : 0;
			if (distanceM + this.#distanceM + brakesM > goal.distanceM)
				return this.#meet(gear, this.#startMps2(gear, speedMps, cell), speedMps, distanceM, timeS, far, goal);
			distanceM += this.#distanceM;
			timeS += this.#timeS;
			speedMps = far;
			if (speedMps >= toMps) return this.#told(speedMps, distanceM, timeS, 'speed');
			if (far === top) cell++;
		}
		return this.#onExactly(gear, {speedMps, distanceM, timeS, why: 'end'}, goal);
	}

	#onExactly(gear: number, here: Travel, goal: Goal): Travel {
		this.#exact ??= new RoadGears(this.vehicle, this.#tables.train, this.#road.road);
		const rest = this.#exact.carry(gear, here.speedMps, {...goal, distanceM: goal.distanceM - here.distanceM});
		return {...rest, distanceM: here.distanceM + rest.distanceM, timeS: here.timeS + rest.timeS};
	}

	/** Where inside a stretch the distance ends or the brakes go on: one step of Newton's method; what it leaves is driven evenly. */
	#meet(
		gear: number,
		fromMps2: number,
		fromMps: number,
		goneM: number,
		goneS: number,
		farMps: number,
		goal: Goal,
	): Travel {
		const {braking} = goal;
		const leftM = goal.distanceM - goneM;
		const room = leftM - brakingDistanceM(fromMps, braking);
		const over = this.#distanceM + brakingDistanceM(farMps, braking) - leftM;
		const guess = fromMps + ((farMps - fromMps) * room) / (room + over);
		const guessMps2 = this.#mps2(gear, guess);
		this.#integrate(gear, fromMps, fromMps2, guess, guessMps2);
		const brakes = braking !== undefined && guess > braking.entryMps ? braking.brakingMps2 : Infinity;
		const step = (leftM - this.#distanceM - brakingDistanceM(guess, braking)) / (guess / guessMps2 + guess / brakes);
		const speed = Math.min(farMps, Math.max(fromMps, guess + step));
		// So near to the guess the acceleration is even.
		const gainS = (speed - guess) / guessMps2;
		const furtherM = this.#distanceM + (gainS * (speed + guess)) / 2;
		const leftoverM = leftM - furtherM - brakingDistanceM(speed, braking);
		return this.#told(speed, goneM + furtherM + leftoverM, goneS + this.#timeS + gainS + leftoverM / speed, 'end');
	}

	#told(speedMps: number, distanceM: number, timeS: number, why: Travel['why']): Travel {
		this.#travel.speedMps = speedMps;
		this.#travel.distanceM = distanceM;
		this.#travel.timeS = timeS;
		this.#travel.why = why;
		return this.#travel;
	}

	#shiftAt(speedMps: number): Shift {
		return {speedMps, coasted: coast(this.vehicle, this.#road.forces, speedMps, this.vehicle.shiftTimeS)};
	}

	/** As `shiftSpeedMps`, with signs looked for at the grid's speeds. */
	#shiftMps(gear: number): number {
		const {capMps, limiterMps} = this.#tables.gear(gear);
		const advantage = (speedMps: number) => this.#mps2(gear + 1, speedMps) - this.#mps2(gear, speedMps);
		const cap = Math.min(capMps, limiterMps);
		if (advantage(cap) <= 0) return cap;
		if (limiterMps > cap && (advantage((cap + limiterMps) / 2) < 0 || advantage(limiterMps) < 0)) return cap;
		let lowestBetter = cap;
		for (let speed = Math.ceil(cap / nodeMps - 1) * nodeMps; speed >= 0; speed -= nodeMps) {
			const at = advantage(speed);
			if (at < 0) return brentRoot(advantage, speed, lowestBetter, shiftMps) ?? lowestBetter;
			if (at > 0) lowestBetter = speed;
		}
		return 0;
	}

	#nodeMps2(gear: number, node: number): number {
		const powered = this.#tables.poweredAtNode(gear, node, this.#road.resistanceN[node]!);
		const held = this.#road.heldMps2[node]!;
		this.#surplus = powered - held;
		return Math.min(powered, held);
	}

	/** Where a stretch of a cell starts: the table has it at the cell's foot. */
	#startMps2(gear: number, speedMps: number, cell: number): number {
		return speedMps === cell * cellMps ? this.#nodeMps2(gear, 2 * cell) : this.#mps2(gear, speedMps);
	}

	/** The acceleration at any speed. All in one place, since nothing is asked for as often. */
	#mps2(gear: number, speedMps: number): number {
		const {headwindMps, fixedN, dragKgPerM, rollingKgPerM, gripN, gripKgPerM} = this.#forces;
		const table = this.#tables.table;
		const turns = 1 / (table.rolloutM * (1 + table.growth * speedMps * speedMps));
		const perInertia = inertiaFactor * turns * turns;
		const air = speedMps + headwindMps;
		const square = air * air;
		const resistance = fixedN + (air < 0 ? -dragKgPerM : dragKgPerM) * square + rollingKgPerM * square;
		const here = this.#tables.gear(gear);
		const thrust = here.thrustFactor * torqueAt(table.torqueNm, here.rpmFactor * speedMps * turns, here) * turns;
		const poweredN = thrust - resistance;
		const heldN = gripN + gripKgPerM * square - resistance;
		const poweredKg = table.massKg + perInertia * here.drivenKgM2;
		const heldKg = table.massKg + perInertia * table.undrivenKgM2;
		// The lesser of the two quotients, for one division.
		return poweredN * heldKg < heldN * poweredKg ? poweredN / poweredKg : heldN / heldKg;
	}

	#keepCell(gear: number, cells: CellTable, cell: number): void {
		const low = this.#nodeMps2(gear, 2 * cell);
		const lowSurplus = this.#surplus;
		const middle = this.#nodeMps2(gear, 2 * cell + 1);
		const middleSurplus = this.#surplus;
		const high = this.#nodeMps2(gear, 2 * cell + 2);
		const highSurplus = this.#surplus;
		const lowMps = cell * cellMps;
		const highMps = lowMps + cellMps;
		if (!(low > 0) || Math.abs(high - low) > steepest * low) this.#timeS = Number.NaN;
		else if (lowSurplus > 0 === middleSurplus > 0 && middleSurplus > 0 === highSurplus > 0)
			this.#simpson(lowMps, low, middle, highMps, high);
		else {
			const inLower = lowSurplus > 0 !== middleSurplus > 0;
			const [from, to] = inLower ? [lowSurplus, middleSurplus] : [middleSurplus, highSurplus];
			const kinkMps = lowMps + nodeMps * ((inLower ? 0 : 1) + from / (from - to));
			const kink = this.#mps2(gear, kinkMps);
			this.#integrate(gear, lowMps, low, kinkMps, kink);
			const [distanceM, timeS] = [this.#distanceM, this.#timeS];
			this.#integrate(gear, kinkMps, kink, highMps, high);
			this.#distanceM += distanceM;
			this.#timeS += timeS;
		}
		cells.stamp[cell] = this.#stamp;
		cells.distanceM[cell] = this.#distanceM;
		cells.timeS[cell] = this.#timeS;
	}

	/** From inside a cell to its top: every run that comes into the gear at the same speed goes the same way. */
	#startCell(gear: number, cells: CellTable, fromMps: number, cell: number): void {
		if (cells.startStamp !== this.#stamp || cells.startMps !== fromMps) {
			const high = this.#nodeMps2(gear, 2 * cell + 2);
			this.#integrate(gear, fromMps, this.#mps2(gear, fromMps), (cell + 1) * cellMps, high);
			cells.startStamp = this.#stamp;
			cells.startMps = fromMps;
			cells.startDistanceM = this.#distanceM;
			cells.startTimeS = this.#timeS;
		}
		this.#distanceM = cells.startDistanceM;
		this.#timeS = cells.startTimeS;
	}

	/** Part of a cell; NaN where the acceleration is steep for it. */
	#integrate(gear: number, fromMps: number, from: number, toMps: number, to: number): void {
		if (!(from > 0) || Math.abs(to - from) > steepest * from) this.#timeS = Number.NaN;
		else this.#simpson(fromMps, from, this.#mps2(gear, (fromMps + toMps) / 2), toMps, to);
	}

	#simpson(fromMps: number, fromMps2: number, middleMps2: number, toMps: number, toMps2: number): void {
		const sixth = (toMps - fromMps) / 6;
		const first = 1 / fromMps2;
		const middle = 4 / middleMps2;
		const last = 1 / toMps2;
		this.#timeS = sixth * (first + middle + last);
		this.#distanceM = sixth * (first * fromMps + (middle * (fromMps + toMps)) / 2 + last * toMps);
	}
}
