/**
 * Logs of practice runs whose truth is known: a car driven around a track (`drive.ts`), seen through sensors with noise, steps,
 * stray readings and dropouts. Seeded: the same wish gives the same log everywhere.
 */
import type {GearTrain, Vehicle} from '../../source/drivetrain/straight.ts';
import type {LoggedRun} from '../../source/logs/logged-run.ts';
import type {Candidate} from '../../source/planning/candidates.ts';
import type {Plan} from '../../source/planning/plan.ts';
import {type Chance, chance} from './chance.ts';
import {
	Drive,
	type DrivenLap,
	type DrivenPass,
	type DrivenStraight,
	type Driving,
	type Moment,
	stepS,
} from './drive.ts';

/** Standard deviations and steps of the channels; steps of 0 are none. */
export type Sensors = {
	/** Divides 100. */
	readonly rateHz: number;
	readonly speedNoiseMps: number;
	readonly speedStepMps: number;
	readonly rpmNoise: number;
	readonly rpmStep: number;
	readonly throttleNoise: number;
	/** Share of the readings that are lost, in stretches of up to a third of a second. */
	readonly lost: number;
	/** Share of the readings that are far off. */
	readonly stray: number;
	readonly throttle: boolean;
	readonly gear: boolean;
	readonly lap: boolean;
};

export type LogWish = {
	readonly seed: number;
	readonly plan: Plan;
	/** What is really mounted. */
	readonly mounted: Candidate;
	/** What the car really is, where it differs from the plan's. */
	readonly truth?: Partial<Vehicle>;
	readonly driving?: Partial<Driving>;
	readonly sensors?: Partial<Sensors>;
};

export type GeneratedLog = {
	readonly run: LoggedRun;
	/** The car as it really was. */
	readonly vehicle: Vehicle;
	readonly train: GearTrain;
	readonly passes: readonly DrivenPass[];
	/** Of each lap as driven, out lap first. */
	readonly kinds: readonly DrivenLap[];
	/** The truth at each sample of the run. */
	readonly moments: readonly Moment[];
};

export const usualSensors: Sensors = {
	rateHz: 50,
	speedNoiseMps: 0.08,
	speedStepMps: 0.02,
	rpmNoise: 12,
	rpmStep: 1,
	throttleNoise: 0.004,
	lost: 0.002,
	stray: 0.001,
	throttle: true,
	gear: false,
	lap: true,
};

/** What the demo car is not told about itself: what learning has to find. */
export const usualTruth = ({rolloutM, dragAreaM2}: Vehicle): Partial<Vehicle> => ({
	rolloutM: 1.0062 * rolloutM,
	growth: 0.0135,
	dragAreaM2: 1.06 * dragAreaM2,
});

export function generateLog({seed, plan, mounted, truth, driving, sensors}: LogWish): GeneratedLog {
	const dice = chance(seed);
	const vehicle = {...plan.base.vehicle, ...(truth ?? usualTruth(plan.base.vehicle))};
	const {train} = mounted;
	const drive = new Drive({...usualDriving(plan, vehicle, train), ...driving}, dice);
	const {run, moments} = seen(drive.moments, {...usualSensors, ...sensors}, dice);
	return {run, vehicle, train, passes: drive.passes, kinds: drive.kinds, moments};
}

function usualDriving(plan: Plan, vehicle: Vehicle, train: GearTrain): Driving {
	const gears = plan.track.gears ?? {lowest: 2, highest: train.overall.length};
	return {
		vehicle,
		steadySlip: plan.base.steadySlip,
		train,
		straights: drivenStraights(plan, train),
		lowestGear: gears.lowest,
		highestGear: Math.min(gears.highest, train.overall.length),
		shiftRpm: plan.limit.rpm - 250,
		shiftSpreadRpm: 60,
		shiftThrottle: 1,
		exitSpreadMps: 0.45,
		liftSpreadM: 4,
		slipSpread: 0.0005,
		spinning: 0.25,
		missed: 0,
		laps: 20,
		paceLaps: 0,
		paceMps: plan.track.restart?.speedMps ?? 22,
		pitMps: plan.track.pitRoad?.limitMps ?? 15,
		finishShare: 0.45,
	};
}

/** The straights of the track that have a length, and corners that share what is left of the lap. */
function drivenStraights(plan: Plan, train: GearTrain): DrivenStraight[] {
	const places = plan.base.places.flatMap(({straight, courses}) => {
		const course = courses.get(train.overall.length);
		return course === undefined || straight.lengthM === undefined ? [] : [{straight, course}];
	});
	const straightM = places.reduce((sum, {course}) => sum + course.lengthM, 0);
	const cornerM = Math.max(60, ((plan.track.lapM ?? 1.9 * straightM) - straightM) / places.length);
	return places.map(({straight, course}, i) => {
		const next = places[(i + 1) % places.length]!.straight;
		const slowest = Math.min(next.minimumMps ?? next.exitMps - 1, course.entryMps ?? Number.POSITIVE_INFINITY);
		return {course: {...course, exitMps: straight.exitMps}, minimumMps: slowest, cornerM};
	});
}

function seen(driven: readonly Moment[], sensors: Sensors, dice: Chance): {run: LoggedRun; moments: Moment[]} {
	const every = Math.round(1 / (sensors.rateHz * stepS));
	const moments = driven.filter((_, i) => i % every === 0);
	const {speedNoiseMps, speedStepMps, rpmNoise, rpmStep, throttleNoise} = sensors;
	const channel = (of: (moment: Moment) => number, noise: number, step: number) =>
		Float32Array.from(moments, moment => stepped(of(moment) + noise * dice.normal(), step));
	const speedMps = channel(({speedMps}) => speedMps, speedNoiseMps, speedStepMps);
	const distanceM = distanceOf(speedMps, 1 / sensors.rateHz);
	const rpm = channel(moment => moment.rpm, rpmNoise, rpmStep);
	for (const values of [speedMps, rpm]) spoil(values, sensors, dice);
	const throttle = channel(moment => moment.throttle, throttleNoise, 0.001).map(value =>
		Math.max(0, Math.min(1, value)),
	);
	const run: LoggedRun = {
		samples: moments.length,
		timeS: Float64Array.from(moments, ({timeS}) => timeS - moments[0]!.timeS),
		distanceM,
		speedMps,
		rpm,
		throttle: sensors.throttle ? throttle : null,
		gear: sensors.gear ? Float32Array.from(moments, ({gear}) => gear) : null,
		lap: sensors.lap ? Float32Array.from(moments, ({lap}) => lap) : null,
		brake: null,
		steering: null,
	};
	return {run, moments};
}

const stepped = (value: number, step: number) => (step > 0 ? step * Math.round(value / step) : value);

/** As a reader works it out from the speed alone. */
function distanceOf(speedMps: Float32Array, everyS: number): Float64Array {
	const distanceM = new Float64Array(speedMps.length);
	for (let i = 1; i < speedMps.length; i++) {
		distanceM[i] = distanceM[i - 1]! + Math.max(0, ((speedMps[i - 1]! + speedMps[i]!) / 2) * everyS);
	}
	return distanceM;
}

/** Loses some readings and sends some astray. */
function spoil(values: Float32Array, {lost, stray, rateHz}: Sensors, dice: Chance): void {
	const longest = Math.max(1, Math.round(rateHz / 3));
	for (let i = 0; i < values.length; i++) {
		if (dice.share() < stray) values[i]! *= dice.between(0.2, 1.6);
		if (dice.share() < lost / ((1 + longest) / 2)) values.fill(Number.NaN, i, i + Math.ceil(dice.between(0, longest)));
	}
}
