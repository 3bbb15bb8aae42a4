/** A situation is a change to the track as it stands: what it makes of the car, the straights, the air and the wind. */
import type {Car} from '../drivetrain/car.ts';
import type {CarChange, Change, Situation, Straight, Track, Wind} from '../drivetrain/track.ts';

/** The changed value, in the unit of `base`; without a change `base` itself. */
export function apply(change: Change | undefined, base: number): number {
	if (change === undefined) return base;
	if (change.kind === 'add') return base + change.value;
	return change.kind === 'scale' ? base * change.factor : change.value;
}

/** The car as it is at this track: the track's own numbers replace the car's. */
export function carAt(track: Track, car: Car): Car {
	const {tires, grip, power, massKg, dragAreaM2, downforceAreaM2} = track.car;
	return {
		...car,
		tires: {...car.tires, ...given(tires)},
		grip: grip ?? car.grip,
		massKg: massKg ?? car.massKg,
		dragAreaM2: dragAreaM2 ?? car.dragAreaM2,
		downforceAreaM2: downforceAreaM2 ?? car.downforceAreaM2,
		engines: power === undefined ? car.engines : car.engines.map(engine => ({...engine, power})),
	};
}

/** The car in a situation. `rollout` changes both tires. */
export function carIn(situation: Situation, car: Car): Car {
	return {
		...car,
		massKg: apply(situation.mass, car.massKg),
		dragAreaM2: apply(situation.drag, car.dragAreaM2),
		grip: apply(situation.grip, car.grip),
		tires: {
			...car.tires,
			leftM: apply(situation.rollout, car.tires.leftM),
			rightM: apply(situation.rollout, car.tires.rightM),
		},
	};
}

/** The straight in a situation: only speeds that it has are changed. */
export function straightIn(situation: Situation, straight: Straight): Straight {
	const changed = (change: Change | undefined, base: number | undefined) =>
		base === undefined ? undefined : apply(change, base);
	return {
		...straight,
		exitMps: apply(situation.exit, straight.exitMps),
		minimumMps: changed(situation.minimum, straight.minimumMps),
		endMps: changed(situation.end, straight.endMps),
		entryMps: changed(situation.entry, straight.entryMps),
	};
}

/** The wind as far as it is known in a situation: fields given replace the track's. */
export function windIn(situation: Situation, wind: Wind | undefined): Partial<Wind> {
	return {...wind, ...given(situation.wind ?? {})};
}

/**
 * Headwind along a straight, m/s: the wind's component against the heading, positive from ahead. 0 where the heading, the
 * wind's speed or the direction it blows from is not known.
 */
export function headwindMps(wind: Partial<Wind>, headingRad: number | undefined): number {
	if (headingRad === undefined || wind.speedMps === undefined || wind.fromRad === undefined) return 0;
	return wind.speedMps * Math.cos(wind.fromRad - headingRad);
}

/** Whether a situation leaves the car and its air as they are in the base, so that both may be the same vehicle. */
export function keepsVehicle(situation: Situation): boolean {
	const {drag, grip, power, mass, rollout, air} = situation;
	return [drag, grip, power, mass, rollout, air].every(change => change === undefined);
}

/** The names of what the track's own car numbers replace. */
export function replacedBy(change: CarChange): string[] {
	const names: [string, unknown][] = [
		['tires', Object.keys(given(change.tires)).length > 0 ? true : undefined],
		['grip', change.grip],
		['power', change.power],
		['mass', change.massKg],
		['drag area', change.dragAreaM2],
		['downforce area', change.downforceAreaM2],
	];
	return names.filter(([, value]) => value !== undefined).map(([name]) => name);
}

/** The fields that are given: a field that is present and undefined replaces nothing. */
function given<T extends object>(fields: T): Partial<T> {
	return Object.fromEntries(Object.entries(fields).filter(([, value]) => value !== undefined)) as Partial<T>;
}
