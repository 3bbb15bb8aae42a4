/** How the car moves in one gear on one piece of road: acceleration as a function of road speed, and where it has kinks. */
import {brentRoot} from './brent.ts';
import {gripLimitN, type RoadForces, resistanceN} from './forces.ts';
import {cellOf} from './monotone-cubic.ts';
import type {Vehicle} from './straight.ts';
import {engineRpm, growthReferenceMps, speedAtRpmMps} from './tire.ts';

/** No car on wheels is faster: where every gear ends. */
export const fastestMps = 500;

/** Above the curve's last point the torque is held; edges that far apart, each over the one below, keep the pieces short. */
const stepAbove = 1.25;

/** Kinks closer together than this are one. */
const apartMps = 1e-9;

/** Both sides meet at a crossing, so an integral split this far beside it is off by no more than the square of this. */
const crossingMps = 1e-7;

/** A speed, and the acceleration there. */
export type Mark = {
	readonly speedMps: number;
	readonly mps2: number;
	/** Whether grip is what bounds it. */
	readonly gripHolds: boolean;
};

export class GearMotion {
	/** Speed at the limiter, where thrust ends; the other functions look past it. The fastest that there is where it is never reached. */
	readonly limiterMps: number;
	/** The last of the edges, from 0 on: 0 m/s, the speeds at the curve's points, steps above them, and the fastest that there is. */
	readonly lastEdge: number;
	readonly #vehicle: Vehicle;
	readonly #forces: RoadForces;
	readonly #overall: number;
	readonly #growth: number;
	readonly #rpmFactor: number;
	readonly #thrustFactor: number;
	readonly #drivenKgM2: number;
	#cell = 0;
	/** How many of the curve's points lie below the fastest speed. */
	readonly #points: number;
	readonly #edges: number[] = [0];
	#breaks: readonly number[] | undefined;

	/** `overall` is R_k, `efficiency` η_k. */
	constructor(vehicle: Vehicle, forces: RoadForces, overall: number, efficiency: number) {
		this.#vehicle = vehicle;
		this.#forces = forces;
		this.#overall = overall;
		this.#growth = vehicle.growth / growthReferenceMps ** 2;
		this.#rpmFactor = 60 * (1 + vehicle.slip) * overall;
		this.#thrustFactor = 2 * Math.PI * efficiency * overall;
		this.#drivenKgM2 = vehicle.wheelInertiaKgM2 + vehicle.engineInertiaKgM2 * overall * overall;
		this.limiterMps = Math.min(this.speedAt(vehicle.limiterRpm), fastestMps);
		this.#points = this.#pointsBelowFastest();
		const highestMps = this.#points === 0 ? fastestMps : this.edge(this.#points);
		this.lastEdge = this.#points + Math.max(1, Math.ceil(Math.log(fastestMps / highestMps) / Math.log(stepAbove)));
		this.#edges.length = this.lastEdge + 1;
		this.#edges[this.lastEdge] = fastestMps;
	}

	/** Rising speeds from 0 on; between two neighbors the acceleration is smooth. */
	get breaks(): readonly number[] {
		this.#breaks ??= Array.from({length: this.lastEdge + 1}, (_, i) => [
			...(i === 0 ? [] : this.kinks(i - 1)),
			this.edge(i),
		]).flat();
		return this.#breaks;
	}

	/** The speed at an edge, worked out when it is first asked for. */
	edge(index: number): number {
		this.#edges[index] ??=
			index > this.#points
				? this.edge(this.#points) * stepAbove ** (index - this.#points)
				: this.speedAt(this.#vehicle.torqueNm.x[index - 1]!);
		return this.#edges[index];
	}

	/** The edge at or below a speed, not the last. */
	edgeBelow(speedMps: number): number {
		const {x} = this.#vehicle.torqueNm;
		const rpm = this.rpmAt(speedMps);
		const point = rpm < x[0]! ? 0 : rpm >= x[x.length - 1]! ? x.length : cellOf(x, rpm) + 1;
		let index = Math.min(point, this.lastEdge - 1);
		while (index > 0 && this.edge(index) > speedMps) index--;
		while (index < this.lastEdge - 1 && this.edge(index + 1) <= speedMps) index++;
		return index;
	}

	/** Between an edge and the next, rising: where grip takes over from the engine or lets go, and where the air stands still. */
	kinks(edge: number): readonly number[] {
		const lowMps = this.edge(edge);
		const highMps = this.edge(edge + 1);
		const middleMps = (lowMps + highMps) / 2;
		const still = -this.#forces.headwindMps;
		const low = this.#surplus(lowMps) < 0;
		const middle = this.#surplus(middleMps) < 0;
		const high = this.#surplus(highMps) < 0;
		const kinks: number[] = [];
		if (still - lowMps > apartMps && highMps - still > apartMps) kinks.push(still);
		if (low !== middle) this.#addCrossing(lowMps, middleMps, kinks);
		if (middle !== high) this.#addCrossing(middleMps, highMps, kinks);
		return kinks.length < 2 ? kinks : apart(kinks.sort((a, b) => a - b));
	}

	/** Whether the air stands still at a speed between an edge and the next. */
	stillBetween(edge: number): boolean {
		const still = -this.#forces.headwindMps;
		return still > this.edge(edge) && still < this.edge(edge + 1);
	}

	#addCrossing(lowMps: number, highMps: number, crossings: number[]): void {
		const crossing = brentRoot(speedMps => this.#surplus(speedMps), lowMps, highMps, crossingMps);
		if (crossing !== undefined && crossing - lowMps > apartMps && highMps - crossing > apartMps)
			crossings.push(crossing);
	}

	/** The acceleration at a speed, and what bounds it. */
	mark(speedMps: number): Mark {
		const {powered, held} = this.#bothSides(speedMps);
		return {speedMps, mps2: Math.min(powered, held), gripHolds: held < powered};
	}

	/** By how much what the engine gives, as acceleration, is above what grip holds, m/s². */
	#surplus(speedMps: number): number {
		const {powered, held} = this.#bothSides(speedMps);
		return powered - held;
	}

	/** Engine speed under full throttle at a road speed, rev/min. */
	rpmAt(speedMps: number): number {
		const {rolloutM, growth, slip} = this.#vehicle;
		return engineRpm(speedMps, this.#overall, rolloutM, growth, slip);
	}

	/** Road speed at an engine speed under full throttle, m/s; Infinity where it is never reached. */
	speedAt(rpm: number): number {
		const {rolloutM, growth, slip} = this.#vehicle;
		return speedAtRpmMps(rpm, this.#overall, rolloutM, growth, slip);
	}

	/** Thrust at the contact patch, 2π·T·η·R/C, N; the limiter is not looked at. */
	thrustN(speedMps: number): number {
		const turnsPerM = this.#turnsPerM(speedMps);
		return this.#thrustFactor * this.#torqueNm(this.#rpmFactor * speedMps * turnsPerM) * turnsPerM;
	}

	/**
	 * Acceleration at full throttle, m/s²: the lower of what the engine gives to the equivalent mass
	 * m + (2π/C)²·(I_wheels + I_engine·R²) and what grip holds, which moves only the undriven wheels with the car.
	 */
	acceleration(speedMps: number): number {
		const {powered, held} = this.#bothSides(speedMps);
		return Math.min(powered, held);
	}

	#bothSides(speedMps: number) {
		const turnsPerM = this.#turnsPerM(speedMps);
		const thrust = this.#thrustFactor * this.#torqueNm(this.#rpmFactor * speedMps * turnsPerM) * turnsPerM;
		const resistance = resistanceN(this.#forces, speedMps);
		const perInertia = (2 * Math.PI * turnsPerM) ** 2;
		return {
			powered: (thrust - resistance) / (this.#vehicle.massKg + perInertia * this.#drivenKgM2),
			held:
				(gripLimitN(this.#forces, speedMps) - resistance) /
				(this.#vehicle.massKg + perInertia * this.#vehicle.undrivenInertiaKgM2),
		};
	}

	#turnsPerM(speedMps: number): number {
		return 1 / (this.#vehicle.rolloutM * (1 + this.#growth * speedMps * speedMps));
	}

	/** As `valueAt` of the curve, remembering the cell: neighbors are asked for in a row. */
	#torqueNm(rpm: number): number {
		const {x, coefficients: c, last} = this.#vehicle.torqueNm;
		if (rpm <= x[0]!) return c[0]!;
		if (rpm >= x[x.length - 1]!) return last;
		if (rpm < x[this.#cell]! || rpm >= x[this.#cell + 1]!) this.#cell = cellOf(x, rpm);
		const i = 4 * this.#cell;
		const u = rpm - x[this.#cell]!;
		return c[i]! + u * (c[i + 1]! + u * (c[i + 2]! + u * c[i + 3]!));
	}

	#pointsBelowFastest(): number {
		const {x} = this.#vehicle.torqueNm;
		let count = x.length;
		while (count > 0 && !(this.speedAt(x[count - 1]!) < fastestMps)) count--;
		return count;
	}
}

/** Rising kinks without those that a neighbor above stands for. */
function apart(rising: readonly number[]): number[] {
	return rising.filter((speed, i) => i === rising.length - 1 || rising[i + 1]! - speed > apartMps);
}
