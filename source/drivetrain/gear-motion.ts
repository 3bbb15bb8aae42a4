/** How the car moves in one gear on one piece of road: acceleration as a function of road speed, and where it has kinks. */
import {brentRoot} from './brent.ts';
import {gripLimitN, type RoadForces, resistanceN} from './forces.ts';
import {cellOf} from './monotone-cubic.ts';
import type {Vehicle} from './straight.ts';
import {engineRpm, growthReferenceMps, speedAtRpmMps} from './tire.ts';

/** No car on wheels is faster: where every gear ends that no limiter and no growing tire ends before. */
const fastestMps = 500;

const none: readonly number[] = [];

/** Kinks closer together than this are one. */
const apartMps = 1e-9;

/** Both sides meet at a crossing, so an integral split this far beside it is off by no more than the square of this. */
const crossingMps = 1e-7;

export class GearMotion {
	/** Speed at the limiter: thrust ends above it. The fastest that there is where it is never reached. */
	readonly limiterMps: number;
	/** Rising from 0 to the limiter: the speeds at the curve's points, and where the air stands still. */
	readonly images: readonly number[];
	readonly #vehicle: Vehicle;
	readonly #forces: RoadForces;
	readonly #overall: number;
	readonly #growth: number;
	readonly #rpmFactor: number;
	readonly #thrustFactor: number;
	readonly #drivenKgM2: number;
	#cell = 0;
	#breaks: readonly number[] | undefined;

	/** `overall` is R_k, `efficiency` η_k; `limiterRpm` Infinity looks past the limiter. */
	constructor(vehicle: Vehicle, forces: RoadForces, overall: number, efficiency: number, limiterRpm: number) {
		this.#vehicle = vehicle;
		this.#forces = forces;
		this.#overall = overall;
		this.#growth = vehicle.growth / growthReferenceMps ** 2;
		this.#rpmFactor = 60 * (1 + vehicle.slip) * overall;
		this.#thrustFactor = 2 * Math.PI * efficiency * overall;
		this.#drivenKgM2 = vehicle.wheelInertiaKgM2 + vehicle.engineInertiaKgM2 * overall * overall;
		const limiterMps = limiterRpm === Number.POSITIVE_INFINITY ? limiterRpm : this.speedAt(limiterRpm);
		this.limiterMps = Math.min(limiterMps, fastestMps);
		this.images = apart(this.#curveImages());
	}

	/** Rising speeds from 0 to the limiter; between two neighbors the acceleration is smooth. */
	get breaks(): readonly number[] {
		this.#breaks ??= apart(
			this.images.flatMap((image, i) => [...(i === 0 ? [] : this.gripCrossings(this.images[i - 1]!, image)), image]),
		);
		return this.#breaks;
	}

	/** The speeds between two neighboring images at which grip takes over from the engine or lets go, rising. */
	gripCrossings(lowMps: number, highMps: number): readonly number[] {
		const middleMps = (lowMps + highMps) / 2;
		const low = this.#surplus(lowMps) < 0;
		const middle = this.#surplus(middleMps) < 0;
		const high = this.#surplus(highMps) < 0;
		if (low === middle && middle === high) return none;
		const crossings: number[] = [];
		if (low !== middle) this.#addCrossing(lowMps, middleMps, crossings);
		if (middle !== high) this.#addCrossing(middleMps, highMps, crossings);
		return crossings;
	}

	#addCrossing(lowMps: number, highMps: number, crossings: number[]): void {
		const crossing = brentRoot(speedMps => this.#surplus(speedMps), lowMps, highMps, crossingMps);
		if (crossing !== undefined && crossing - lowMps > apartMps && highMps - crossing > apartMps)
			crossings.push(crossing);
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

	/** 0, the speeds at the curve's points below the limiter, where the air stands still, and the limiter. */
	#curveImages(): number[] {
		const images = [0];
		for (const rpm of this.#vehicle.torqueNm.x) {
			const speed = this.speedAt(rpm);
			if (speed < this.limiterMps) images.push(speed);
		}
		images.push(this.limiterMps);
		const still = -this.#forces.headwindMps;
		if (still > 0 && still < this.limiterMps) images.splice(cellOf(images, still) + 1, 0, still);
		return images;
	}
}

/** Without the kinks that a neighbor above, or the start, stands for; both ends stay. */
function apart(rising: readonly number[]): number[] {
	const last = rising.length - 1;
	return rising.filter((speed, i) => i === 0 || i === last || (speed > apartMps && rising[i + 1]! - speed > apartMps));
}
