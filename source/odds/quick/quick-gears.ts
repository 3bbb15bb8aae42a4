/**
 * The gears of a car on a road for a great many runs. The same equations, shifts and sequences as the exact solver, but the
 * integrals t = ∫ dV/a and s = ∫ V dV/a go by Simpson's rule over the cells of a fixed grid of speeds, cut where grip takes
 * over from the engine. A straight comes out within 0.1 ms and a few hundredths of a mph of the exact solver
 * (`tests/odds/quick/quick-gears.test.ts`); where the acceleration is steep for the grid, as near the highest speed, the
 * exact solver takes over.
 */
import {brentRoot} from '../../drivetrain/brent.ts';
import {coast} from '../../drivetrain/coast.ts';
import {gripLimitN, resistanceN} from '../../drivetrain/forces.ts';
import {mostMps2} from '../../drivetrain/least-time.ts';
import {type Gears, RoadGears} from '../../drivetrain/road-gears.ts';
import type {Vehicle} from '../../drivetrain/straight.ts';
import {brakingDistanceM, type Goal, type Travel} from '../../drivetrain/travel.ts';
import type {RoadTable} from './road-table.ts';
import {cellMps, lastCell, nodeMps} from './speed-grid.ts';
import type {CellTable, ThrustTables} from './vehicle-table.ts';

/** Over a cell the acceleration may change by this share of itself; more is the exact solver's. */
const steepest = 0.2;
/** Where a shift is planned, within a millimeter a second. */
const shiftMps = 1e-6;

type Shift = {readonly speedMps: number; readonly coasted: {readonly speedMps: number; readonly distanceM: number}};

export class QuickGears implements Gears {
	readonly vehicle: Vehicle;
	readonly #tables: ThrustTables;
	readonly #road: RoadTable;
	readonly #shifts: Shift[] = [];
	#exact: RoadGears | undefined;
	/** What the cells in the tables must carry to be of this road. */
	readonly #stamp: number;
	/** At the node asked for last: by how much what the engine gives is above what grip holds, m/s². */
	#surplus = 0;
	/** Of the stretch integrated last. */
	#distanceM = 0;
	#timeS = 0;

	constructor(tables: ThrustTables, road: RoadTable) {
		this.vehicle = tables.table.vehicle;
		this.#tables = tables;
		this.#road = road;
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

	carry(gear: number, fromMps: number, goal: Goal): Travel {
		const {braking, toMps} = goal;
		const cells = this.#tables.gear(gear);
		let speedMps = fromMps;
		let distanceM = 0;
		let timeS = 0;
		if (speedMps >= toMps && this.#mps2(gear, speedMps) >= 0) return {speedMps, distanceM, timeS, why: 'speed'};
		if (goal.distanceM - brakingDistanceM(speedMps, braking) <= 0) return {speedMps, distanceM, timeS, why: 'end'};
		for (let cell = Math.floor(speedMps / cellMps); cell < lastCell; ) {
			const top = (cell + 1) * cellMps;
			let far = Math.min(toMps, top);
			if (braking !== undefined && braking.entryMps > speedMps && braking.entryMps < far) far = braking.entryMps;
			if (far === top && speedMps === cell * cellMps) {
				if (cells.stamp[cell] !== this.#stamp) this.#keepCell(gear, cells, cell);
				this.#distanceM = cells.distanceM[cell]!;
				this.#timeS = cells.timeS[cell]!;
			} else if (far === top) this.#startCell(gear, cells, speedMps, cell);
			else this.#integrate(gear, speedMps, this.#mps2(gear, speedMps), far, this.#mps2(gear, far));
			if (Number.isNaN(this.#timeS)) break;
			if (distanceM + this.#distanceM + brakingDistanceM(far, braking) > goal.distanceM)
				return this.#meet(gear, {speedMps, distanceM, timeS, why: 'end'}, far, goal);
			distanceM += this.#distanceM;
			timeS += this.#timeS;
			speedMps = far;
			if (speedMps >= toMps) return {speedMps, distanceM, timeS, why: 'speed'};
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
	#meet(gear: number, here: Travel, farMps: number, goal: Goal): Travel {
		const {braking} = goal;
		const leftM = goal.distanceM - here.distanceM;
		const room = leftM - brakingDistanceM(here.speedMps, braking);
		const over = this.#distanceM + brakingDistanceM(farMps, braking) - leftM;
		const guess = here.speedMps + ((farMps - here.speedMps) * room) / (room + over);
		const hereMps2 = this.#mps2(gear, here.speedMps);
		const guessMps2 = this.#mps2(gear, guess);
		this.#integrate(gear, here.speedMps, hereMps2, guess, guessMps2);
		const brakes = braking !== undefined && guess > braking.entryMps ? braking.brakingMps2 : Infinity;
		const step = (leftM - this.#distanceM - brakingDistanceM(guess, braking)) / (guess / guessMps2 + guess / brakes);
		const speed = Math.min(farMps, Math.max(here.speedMps, guess + step));
		// So near to the guess the acceleration is even.
		const gainS = (speed - guess) / guessMps2;
		const [distanceM, timeS] = [this.#distanceM + (gainS * (speed + guess)) / 2, this.#timeS + gainS];
		const leftoverM = leftM - distanceM - brakingDistanceM(speed, braking);
		return {
			speedMps: speed,
			distanceM: here.distanceM + distanceM + leftoverM,
			timeS: here.timeS + timeS + leftoverM / speed,
			why: 'end',
		};
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

	#mps2(gear: number, speedMps: number): number {
		const {forces} = this.#road;
		const {vehicle} = this;
		const turns = this.#tables.table.turnsAt(speedMps);
		const perInertia = 4 * Math.PI * Math.PI * turns * turns;
		const resistance = resistanceN(forces, speedMps);
		const powered = this.#tables.poweredAt(gear, speedMps, turns, perInertia, resistance);
		const held =
			(gripLimitN(forces, speedMps) - resistance) / (vehicle.massKg + perInertia * vehicle.undrivenInertiaKgM2);
		return Math.min(powered, held);
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
