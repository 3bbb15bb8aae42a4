/**
 * A car driven around a track, second by second, for the generated logs: full throttle by the equations written a second time
 * for the tests (Runge-Kutta of the fourth order, fixed step), corners by plain kinematics. Nothing of the solver is in it.
 */
import type {Course, GearTrain, Vehicle} from '../../source/drivetrain/straight.ts';
import {accelerationIn, accelerationOut, circumference} from '../drivetrain/equations.ts';
import type {Chance} from './chance.ts';

/** A straight as driven, with the corner after it. */
export type DrivenStraight = {
	readonly course: Course;
	readonly minimumMps: number;
	/** From the end of the straight to the next exit. */
	readonly cornerM: number;
};

export type Driving = {
	/** What the car really is. */
	readonly vehicle: Vehicle;
	readonly steadySlip: number;
	readonly train: GearTrain;
	readonly straights: readonly DrivenStraight[];
	readonly lowestGear: number;
	readonly highestGear: number;
	/** Where the driver means to shift, and how well he hits it. */
	readonly shiftRpm: number;
	readonly shiftSpreadRpm: number;
	/** Throttle in a shift: 1 where the driver keeps it down. */
	readonly shiftThrottle: number;
	/** Lap to lap. */
	readonly exitSpreadMps: number;
	readonly liftSpreadM: number;
	/** Pass to pass, of 1 + slip. */
	readonly slipSpread: number;
	/** Share of the exits with wheelspin. */
	readonly spinning: number;
	/** Share of the shifts that are missed. */
	readonly missed: number;
	/** Good laps, with an out lap before and an in lap after. */
	readonly laps: number;
	/** Laps behind a pace car, in the middle. */
	readonly paceLaps: number;
	readonly paceMps: number;
	readonly pitMps: number;
	/** Where the finish line lies on the first straight, as a share of its length. */
	readonly finishShare: number;
};

export type DrivenLap = 'good' | 'out' | 'in' | 'pace';

/** One step of the drive. */
export type Moment = {
	timeS: number;
	distanceM: number;
	speedMps: number;
	rpm: number;
	throttle: number;
	/** 0: between gears. */
	gear: number;
	lap: number;
	/** In gear at full throttle, without wheelspin and with it, and all else. */
	power: 'steady' | 'spin' | 'part';
};

export type DrivenPass = {
	readonly lap: number;
	readonly kind: DrivenLap;
	readonly straight: number;
	readonly startS: number;
	readonly exitMps: number;
	readonly endMps: number;
	readonly lengthM: number;
	readonly missedShift: boolean;
};

export const stepS = 0.01;
/** A missed shift takes so long, with the engine free so far above. */
const missedS = 0.7;
const flareRpm = 700;
const brakingMps2 = 7;
const pickUpMps2 = 1.6;

export class Drive {
	readonly moments: Moment[] = [];
	readonly passes: DrivenPass[] = [];
	readonly kinds: DrivenLap[] = [];
	readonly driving: Driving;
	readonly #chance: Chance;
	#timeS = 0;
	#distanceM = 0;
	#speedMps: number;
	#gear: number;
	#lap = 0;

	constructor(driving: Driving, chance: Chance) {
		this.driving = driving;
		this.#chance = chance;
		this.#speedMps = driving.pitMps;
		this.#gear = driving.lowestGear;
		const {laps, paceLaps} = driving;
		const first = Math.ceil(laps / 2);
		this.kinds.push('out', ...Array<'good'>(first).fill('good'), ...Array<'pace'>(paceLaps).fill('pace'));
		this.kinds.push(...Array<'good'>(laps - first).fill('good'), 'in');
		for (const kind of this.kinds) this.#driveLap(kind);
	}

	#driveLap(kind: DrivenLap): void {
		for (const [i, straight] of this.driving.straights.entries()) {
			if (kind === 'pace') this.#atPace(straight, i);
			else this.#flatOut(straight, i, kind);
		}
	}

	/** A full-throttle run and the corner after it. */
	#flatOut(straight: DrivenStraight, index: number, kind: DrivenLap): void {
		const {driving} = this;
		const {course} = straight;
		const next = driving.straights[(index + 1) % driving.straights.length]!;
		if (kind === 'out' && index === 0) this.#roll(course.lengthM, driving.pitMps, 0.8 * course.exitMps, true);
		else this.#pass(straight, index, kind);
		const pits = kind === 'in' && index === driving.straights.length - 1;
		this.#corner(straight, pits ? driving.pitMps : this.#about(next.course.exitMps, driving.exitSpreadMps));
	}

	#pass({course}: DrivenStraight, index: number, kind: DrivenLap): void {
		const {driving} = this;
		const chance = this.#chance;
		const lengthM = this.#about(course.lengthM, driving.liftSpreadM);
		const slip = (1 + driving.vehicle.slip) * this.#about(1, driving.slipSpread) - 1;
		const spin = {most: chance.between(0.03, 0.12), forS: chance.between(0.25, 0.8)};
		const spins = chance.share() < driving.spinning;
		const begun = {lap: this.#lap, kind, straight: index, startS: this.#timeS, exitMps: this.#speedMps};
		const startM = this.#distanceM;
		const finish = this.#finishLine(startM + driving.finishShare * course.lengthM, index === 0);
		let [shiftAt, outS, missing, missedShift] = [this.#shiftRpm(), 0, false, false];
		while (this.#distanceM - startM < lengthM && !this.#mustBrake(course, startM + lengthM)) {
			const sinceS = this.#timeS - begun.startS;
			const spinning = spins && sinceS < spin.forS ? spin.most * (1 - sinceS / spin.forS) : 0;
			const rpm = this.#rpm(this.#gear, slip) * (1 + spinning);
			if (outS <= 0 && rpm > shiftAt && this.#gear < driving.highestGear) {
				missing = chance.share() < driving.missed;
				missedShift ||= missing;
				outS = missing ? missedS : driving.vehicle.shiftTimeS;
				this.#gear++;
				shiftAt = this.#shiftRpm();
			}
			if (outS > 0) {
				const goneShare = 1 - outS / driving.vehicle.shiftTimeS;
				const [left, entered] = [this.#rpm(this.#gear - 1, slip), this.#rpm(this.#gear, slip)];
				const rpmOut = missing ? left + flareRpm : left + goneShare * (entered - left);
				this.#note(rpmOut, driving.shiftThrottle, 0);
				this.#step(v => accelerationOut(driving.vehicle, course, v));
				outS -= stepS;
			} else {
				this.#note(rpm, 1, this.#gear, spinning > 0 ? 'spin' : 'steady');
				const cut = rpm >= driving.vehicle.limiterRpm;
				this.#step(v => {
					const acceleration = accelerationIn(driving.vehicle, driving.train, course, this.#gear, v);
					return cut ? Math.min(0, acceleration) : acceleration;
				});
			}
			finish.pass();
		}
		this.passes.push({...begun, endMps: this.#speedMps, lengthM: this.#distanceM - startM, missedShift});
		if (course.entryMps !== undefined) this.#slowTo(course.entryMps, course.brakingMps2!);
		finish.passAtLast();
	}

	#mustBrake({entryMps, brakingMps2}: Course, endM: number): boolean {
		if (entryMps === undefined || brakingMps2 === undefined) return false;
		return this.#speedMps ** 2 >= entryMps ** 2 + 2 * brakingMps2 * (endM - this.#distanceM);
	}

	#about(middle: number, spread: number): number {
		return middle + spread * this.#chance.normal();
	}

	#shiftRpm(): number {
		return this.#about(this.driving.shiftRpm, this.driving.shiftSpreadRpm);
	}

	/** Counts the lap up where the line is crossed; on other straights there is none. */
	#finishLine(atM: number, there: boolean) {
		let ahead = there;
		const cross = () => {
			this.#lap++;
			ahead = false;
		};
		return {
			pass: () => {
				if (ahead && this.#distanceM >= atM) cross();
			},
			passAtLast: () => {
				if (ahead) cross();
			},
		};
	}

	#slowTo(toMps: number, byMps2: number): void {
		while (this.#speedMps > toMps) this.#onTheRoad(-byMps2, 0);
	}

	/** Brakes to the lowest speed, holds it, and picks up to the exit speed. */
	#corner({minimumMps, cornerM}: DrivenStraight, exitMps: number): void {
		const startM = this.#distanceM;
		const lowestMps = Math.min(minimumMps, exitMps - 0.3);
		const riseM = (exitMps ** 2 - lowestMps ** 2) / (2 * pickUpMps2);
		this.#slowTo(lowestMps, brakingMps2);
		this.#gear = this.#gearFor(exitMps);
		while (this.#distanceM - startM < cornerM - riseM) this.#onTheRoad(0, 0.45);
		while (this.#speedMps < exitMps) this.#onTheRoad(pickUpMps2, 0.65);
	}

	/** Behind the pace car. */
	#atPace({course, cornerM}: DrivenStraight, index: number): void {
		const {paceMps, straights} = this.driving;
		this.#gear = this.#gearFor(paceMps);
		this.#slowTo(paceMps, 2);
		this.#roll(course.lengthM + cornerM, this.#speedMps, paceMps, index === 0);
		if (index === straights.length - 1) this.#gear = this.#gearFor(straights[0]!.course.exitMps);
	}

	/** At part throttle from one speed to another over a length. */
	#roll(lengthM: number, fromMps: number, toMps: number, isFirst: boolean): void {
		const startM = this.#distanceM;
		const finish = this.#finishLine(startM + this.driving.finishShare * lengthM, isFirst);
		this.#speedMps = Math.max(this.#speedMps, fromMps);
		this.#gear = this.#gearFor(toMps);
		while (this.#distanceM - startM < lengthM) {
			this.#onTheRoad(this.#speedMps < toMps ? 1.5 : 0, 0.25);
			finish.pass();
		}
	}

	/** The lowest gear that leaves room to accelerate. */
	#gearFor(exitMps: number): number {
		const {vehicle, train, shiftRpm, lowestGear, highestGear} = this.driving;
		for (let gear = lowestGear; gear < highestGear; gear++) {
			if ((60 * exitMps * train.overall[gear - 1]!) / circumference(vehicle, exitMps) < 0.86 * shiftRpm) return gear;
		}
		return highestGear;
	}

	/** A step in gear with the engine following the wheels. */
	#onTheRoad(accelerationMps2: number, throttle: number): void {
		this.#note(this.#rpm(this.#gear, this.driving.steadySlip), throttle, this.#gear);
		this.#step(() => accelerationMps2);
	}

	#rpm(gear: number, slip: number): number {
		const {vehicle, train} = this.driving;
		return (60 * this.#speedMps * (1 + slip) * train.overall[gear - 1]!) / circumference(vehicle, this.#speedMps);
	}

	#note(rpm: number, throttle: number, gear: number, power: 'steady' | 'spin' | 'part' = 'part'): void {
		const [timeS, distanceM, speedMps, lap] = [this.#timeS, this.#distanceM, this.#speedMps, this.#lap];
		this.moments.push({timeS, distanceM, speedMps, rpm, throttle, gear, lap, power});
	}

	/** The classic Runge-Kutta step of dV/dt = a(V), ds/dt = V. */
	#step(a: (v: number) => number): void {
		const v = this.#speedMps;
		const h = stepS;
		const a1 = a(v);
		const a2 = a(v + (h / 2) * a1);
		const a3 = a(v + (h / 2) * a2);
		const a4 = a(v + h * a3);
		this.#distanceM += h * v + ((h * h) / 6) * (a1 + a2 + a3);
		this.#speedMps += (h / 6) * (a1 + 2 * a2 + 2 * a3 + a4);
		this.#timeS += h;
	}
}
