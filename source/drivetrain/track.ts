/** What the arithmetic knows of a track and of the day. SI throughout; the unit is in the name. */
import type {Pair, Rules, Tires, TrackType} from './car.ts';

/** The air as far as it is given; the reader has turned altimeter and elevation into station pressure. */
export type Air = {
	readonly temperatureC: number | undefined;
	readonly pressurePa: number | undefined;
	/** Relative humidity, a fraction of 1; at most one of humidity and dew point is given. */
	readonly humidity: number | undefined;
	readonly dewPointC: number | undefined;
};

/** At car height. `fromRad` is where it blows from, clockwise from north. */
export type Wind = {readonly speedMps: number; readonly fromRad: number};

/** A speed, length or share that a situation changes: by adding, by scaling, or by replacing. */
export type Change =
	| {readonly kind: 'add'; readonly value: number}
	| {readonly kind: 'scale'; readonly factor: number}
	| {readonly kind: 'set'; readonly value: number};

/** Engine power of a situation: torque scaled by a share, or so that the peak power of the day moves by or to so many watts. */
export type PowerChange =
	| {readonly kind: 'scale'; readonly factor: number}
	| {readonly kind: 'add' | 'set'; readonly watts: number};

/** The allowed gears, counted from 1, both ends included. */
export type GearRange = {readonly lowest: number; readonly highest: number};

export type Measured = {
	readonly endMps: number | undefined;
	readonly rpm: number | undefined;
	/** Undefined: what was installed. */
	readonly pair: Pair | undefined;
	readonly gearbox: string | undefined;
	readonly gear: number | undefined;
};

export type Straight = {
	readonly name: string;
	readonly exitMps: number;
	readonly minimumMps: number | undefined;
	/** Undefined: only RPM at held speeds. */
	readonly lengthM: number | undefined;
	/** Only without length: the speed held at the end. */
	readonly endMps: number | undefined;
	/** Both or neither. */
	readonly entryMps: number | undefined;
	readonly brakingMps2: number | undefined;
	/** Rise over run. */
	readonly grade: number;
	readonly headingRad: number | undefined;
	readonly load: number;
	readonly extraDragN: number;
	readonly gears: GearRange | undefined;
	readonly measured: Measured | undefined;
};

export type PitRoad = {readonly limitMps: number; readonly toleranceMps: number; readonly gear: number | undefined};
export type Restart = {readonly speedMps: number; readonly distanceM: number; readonly gear: number | undefined};

/** A named change to the track as it stands. Every field may be undefined: nothing changes. */
export type Situation = {
	readonly name: string;
	readonly share: number;
	readonly exit: Change | undefined;
	readonly end: Change | undefined;
	readonly entry: Change | undefined;
	readonly minimum: Change | undefined;
	readonly drag: Change | undefined;
	readonly grip: Change | undefined;
	readonly power: PowerChange | undefined;
	readonly mass: Change | undefined;
	readonly rollout: Change | undefined;
	readonly air: Air | undefined;
	readonly wind: Partial<Wind> | undefined;
	/** Added on every straight. */
	readonly headwindMps: number | undefined;
};

/** What of the car differs at this track; undefined fields stay as the car has them. */
export type CarChange = {
	readonly tires: Partial<Tires>;
	readonly grip: number | undefined;
	readonly massKg: number | undefined;
	readonly dragAreaM2: number | undefined;
	readonly downforceAreaM2: number | undefined;
};

export type Track = {
	readonly name: string;
	readonly type: TrackType;
	readonly lapM: number | undefined;
	/** Laps of the race; undefined: not known. */
	readonly laps: number | undefined;
	readonly air: Air | undefined;
	readonly wind: Wind | undefined;
	readonly pitRoad: PitRoad | undefined;
	readonly restart: Restart | undefined;
	readonly gears: GearRange | undefined;
	/** At least one. */
	readonly straights: readonly Straight[];
	/** The first is `Base`: the track as it stands. */
	readonly situations: readonly Situation[];
	readonly rules: Rules;
	readonly car: CarChange;
};
