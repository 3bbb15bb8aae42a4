/** The car and the track with every number moved by a draw: what `rankRack` would be asked if the numbers were these. */
import type {Car} from '../drivetrain/car.ts';
import type {Air, Change, Situation, Straight, Track, Wind} from '../drivetrain/track.ts';
import {carAt} from '../planning/situations.ts';

export type World = {readonly car: Car; readonly track: Track};

/** Of one situation. `drag` is in the unit of its change: m² added or set, or a share. */
export type SituationShift = {
	exitMps: number;
	drag: number;
	grip: number;
	power: number;
	mass: number;
	rollout: number;
};
export type StraightShift = {exitMps: number; endMps: number; entryMps: number; lengthM: number};

/** By how much each number is off; shares are of the number itself, and 0 everywhere is the world as the documents have it. */
export type Shift = {
	rollout: number;
	growth: number;
	slip: number;
	drag: number;
	power: number;
	grip: number;
	massKg: number;
	downforceM2: number;
	rolling: number;
	temperatureC: number;
	pressurePa: number;
	windMps: number;
	windRad: number;
	readonly straights: StraightShift[];
	readonly situations: SituationShift[];
};

/** What a draw can do no more than: the reader's own bounds, where a number could leave them. */
const leastMps = 0.5;
const leastShare = 0.2;
const mostSlip = 0.3;
const leastPressurePa = 50_000;

export function noShift({straights, situations}: Track): Shift {
	return {
		rollout: 0,
		growth: 0,
		slip: 0,
		drag: 0,
		power: 0,
		grip: 0,
		massKg: 0,
		downforceM2: 0,
		rolling: 0,
		temperatureC: 0,
		pressurePa: 0,
		windMps: 0,
		windRad: 0,
		straights: straights.map(() => ({exitMps: 0, endMps: 0, entryMps: 0, lengthM: 0})),
		situations: situations.map(() => ({exitMps: 0, drag: 0, grip: 0, power: 0, mass: 0, rollout: 0})),
	};
}

/** The car as it is at the track, and the track without what it replaces: the same world in the form that shifts apply to. */
export function worldOf(car: Car, track: Track): World {
	const nothing = {
		tires: {},
		grip: undefined,
		power: undefined,
		massKg: undefined,
		dragAreaM2: undefined,
		downforceAreaM2: undefined,
	};
	return {car: carAt(track, car), track: {...track, car: nothing}};
}

export function shifted({car, track}: World, shift: Shift): World {
	return {
		car: {
			...car,
			massKg: car.massKg + shift.massKg,
			dragAreaM2: car.dragAreaM2 * share(shift.drag),
			downforceAreaM2: car.downforceAreaM2 + shift.downforceM2,
			rolling: Math.max(0, car.rolling + shift.rolling),
			grip: car.grip * share(shift.grip),
			engines: car.engines.map(engine => ({...engine, power: engine.power * share(shift.power)})),
			tires: {
				...car.tires,
				leftM: car.tires.leftM * share(shift.rollout),
				rightM: car.tires.rightM * share(shift.rollout),
				growth: Math.max(0, car.tires.growth + shift.growth),
				slip: Math.min(mostSlip, Math.max(0, car.tires.slip + shift.slip)),
			},
		},
		track: {
			...track,
			air: airWith(track.air, shift, true),
			wind: track.wind && windWith(track.wind, shift),
			straights: track.straights.map((straight, i) => straightWith(straight, shift.straights[i]!)),
			situations: track.situations.map((situation, i) => situationWith(situation, shift.situations[i]!, shift)),
		},
	};
}

const share = (off: number): number => Math.max(leastShare, 1 + off);
const speed = (mps: number): number => Math.max(leastMps, mps);

/** A missing number of the base's air is the reference day's, which `airState` fills in; it can be off as well. */
function airWith(air: Air | undefined, {temperatureC, pressurePa}: Shift, isBase: boolean): Air | undefined {
	if (temperatureC === 0 && pressurePa === 0) return air;
	if (air === undefined && !isBase) return undefined;
	const {temperature, pressure} = isBase ? reference : none;
	const t = air?.temperatureC ?? temperature;
	const p = air?.pressurePa ?? pressure;
	return {
		temperatureC: t === undefined ? undefined : t + temperatureC,
		pressurePa: p === undefined ? undefined : Math.max(leastPressurePa, p + pressurePa),
		humidity: air?.humidity,
		dewPointC: air?.dewPointC,
	};
}

const reference = {temperature: 25, pressure: 99_000};
const none = {temperature: undefined, pressure: undefined};

function windWith<W extends Partial<Wind>>(wind: W, {windMps, windRad}: Shift): W {
	return {
		...wind,
		...(wind.speedMps !== undefined && {speedMps: Math.max(0, wind.speedMps + windMps)}),
		...(wind.fromRad !== undefined && {fromRad: wind.fromRad + windRad}),
	};
}

/** `minimum` follows its exit: the driver who is faster at one is at the other. */
function straightWith(straight: Straight, off: StraightShift): Straight {
	const moved = (mps: number | undefined, by: number) => (mps === undefined ? undefined : speed(mps + by));
	return {
		...straight,
		exitMps: speed(straight.exitMps + off.exitMps),
		minimumMps: moved(straight.minimumMps, off.exitMps),
		endMps: moved(straight.endMps, off.endMps),
		entryMps: moved(straight.entryMps, off.entryMps),
		lengthM: straight.lengthM === undefined ? undefined : Math.max(1, straight.lengthM + off.lengthM),
	};
}

function situationWith(situation: Situation, off: SituationShift, shift: Shift): Situation {
	const {power} = situation;
	return {
		...situation,
		exit: changeWith(situation.exit, off.exitMps),
		minimum: changeWith(situation.minimum, off.exitMps),
		drag: changeWith(situation.drag, off.drag),
		grip: changeWith(situation.grip, off.grip),
		mass: changeWith(situation.mass, off.mass),
		rollout: changeWith(situation.rollout, off.rollout),
		power:
			power === undefined || off.power === 0
				? power
				: power.kind === 'scale'
					? {kind: 'scale', factor: Math.max(leastShare, power.factor + off.power)}
					: {...power, watts: power.watts + off.power},
		air: airWith(situation.air, shift, false),
		wind: situation.wind && windWith(situation.wind, shift),
	};
}

function changeWith(change: Change | undefined, by: number): Change | undefined {
	if (change === undefined || by === 0) return change;
	if (change.kind === 'scale') return {kind: 'scale', factor: Math.max(leastShare, change.factor + by)};
	return {kind: change.kind, value: change.value + by};
}
