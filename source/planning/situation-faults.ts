/** Changes of a situation that leave nothing to run: a speed, a mass, a rollout at or below zero. */
import type {Car} from '../drivetrain/car.ts';
import type {Situation, Track} from '../drivetrain/track.ts';
import {fault} from './faults.ts';
import type {Fault} from './results.ts';
import {carIn, straightIn} from './situations.ts';
import {type EngineInUse, powerFactor} from './vehicle.ts';
import {speedText} from './words.ts';

/** Every such fault, one a field of a situation; a straight's own speed is named with its straight. */
export function situationFaults(car: Car, track: Track, inUse: EngineInUse): Fault[] {
	return track.situations.flatMap(situation => [...carFaults(situation, car, inUse), ...speedFaults(situation, track)]);
}

function carFaults(situation: Situation, car: Car, {ratedPeak}: EngineInUse): Fault[] {
	const changed = carIn(situation, car);
	const fields: [string, number][] = [
		['mass', changed.massKg],
		['drag', changed.dragAreaM2],
		['grip', changed.grip],
		['rollout', Math.min(changed.tires.leftM, changed.tires.rightM)],
		['power', powerFactor(situation.power, ratedPeak.powerW)],
	];
	const tips = changed.grip * ((car.cgHeightM ?? 0) / (car.wheelbaseM ?? 1)) >= 1;
	const tipping = fault(
		'track',
		`situations.${situation.name}.grip`,
		`${changed.grip.toFixed(2)}, with which all the weight would move to the driven axle`,
		'a grip below wheelbase ÷ height of the center of gravity',
	);
	const empty = fields
		.filter(([, value]) => !(value > 0))
		.map(([field]) =>
			fault(
				'track',
				`situations.${situation.name}.${field}`,
				'a change that leaves nothing',
				`a ${field} that stays above 0`,
			),
		);
	return tips ? [...empty, tipping] : empty;
}

function speedFaults(situation: Situation, track: Track): Fault[] {
	return track.straights.flatMap(straight => {
		const {exitMps, minimumMps, endMps, entryMps} = straightIn(situation, straight);
		const fields: [string, number | undefined][] = [
			['exit', exitMps],
			['minimum', minimumMps],
			['end', endMps],
			['entry', entryMps],
		];
		return fields
			.filter(([, speed]) => speed !== undefined && !(speed > 0))
			.map(([field, speed]) =>
				fault(
					'track',
					`situations.${situation.name}.${field}`,
					`${speedText(speed!)} on ${straight.name}`,
					'a speed above 0',
				),
			);
	});
}
