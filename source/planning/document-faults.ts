/** Names and gears in car and track that must be found in the other document, or elsewhere in the same one. */
import {type Car, type Pair, type Rules, trackTypes} from '../drivetrain/car.ts';
import {pairName, pairRatio} from '../drivetrain/gear-pair.ts';
import type {GearRange, Track} from '../drivetrain/track.ts';
import {gearboxNamed, mountable, onRack} from './candidates.ts';
import {gearsOf} from './conditions.ts';
import {fault, unknownName} from './faults.ts';
import type {Fault} from './results.ts';
import {counted} from './words.ts';

/** Every such fault; empty where there is none. */
export function documentFaults(car: Car, track: Track): Fault[] {
	return [...missingFaults(car, track), ...nameFaults(car, track), ...gearFaults(car, track)];
}

export function pairFaults(document: Fault['document'], path: string, car: Car, pair: Pair | undefined): Fault[] {
	if (pair === undefined || onRack(car, pair)) return [];
	return [fault(document, path, `"${pairName(pair)}"`, `a pair on the rack: ${nearestPairs(car, pair)}`)];
}

/** As many pairs as a reader takes in, nearest in ratio first. */
const shownPairs = 8;

function nearestPairs(car: Car, pair: Pair): string {
	const away = (other: Pair) => Math.abs(Math.log(pairRatio(other) / pairRatio(pair)));
	const sorted = mountable(car).sort((one, other) => away(one) - away(other));
	const names = sorted.slice(0, shownPairs).map(pairName).join(', ');
	return sorted.length > shownPairs ? `${names} and ${sorted.length - shownPairs} more` : names;
}

export function gearboxFaults(document: Fault['document'], path: string, car: Car, name: string | undefined): Fault[] {
	if (name === undefined || gearboxNamed(car, name)) return [];
	return [
		unknownName(
			document,
			path,
			name,
			car.gearboxes.map(gearbox => gearbox.name),
		),
	];
}

function missingFaults(car: Car, track: Track): Fault[] {
	const faults: Fault[] = [];
	if (track.straights.length === 0) faults.push(fault('track', 'straights', 'no straight', 'at least one'));
	if (car.rack.pairs.length === 0) faults.push(fault('car', 'rack.pairs', 'no pair', 'at least one'));
	if (car.gearboxes.length === 0) faults.push(fault('car', 'gearboxes', 'no gearbox', 'at least one'));
	return faults;
}

function nameFaults(car: Car, track: Track): Fault[] {
	return [
		...pairFaults('car', 'installed.pair', car, car.installed?.pair),
		...gearboxFaults('car', 'installed.gearbox', car, car.installed?.gearbox),
		...track.straights.flatMap(({name, measured}) => [
			...pairFaults('track', `straights.${name}.measured.pair`, car, measured?.pair),
			...gearboxFaults('track', `straights.${name}.measured.gearbox`, car, measured?.gearbox),
		]),
		...trackTypes.flatMap(type => ruleFaults('car', `rules.${type}`, car, car.rules[type])),
		...ruleFaults('track', 'rules', car, track.rules),
	];
}

/** A rule book may list pairs that are not on the rack, but a set that the car has not is a slip of the pen. */
function ruleFaults(document: Fault['document'], path: string, car: Car, rules: Rules | undefined): Fault[] {
	return (rules?.gearboxes ?? []).flatMap(name => gearboxFaults(document, `${path}.gearboxes`, car, name));
}

function gearFaults(car: Car, track: Track): Fault[] {
	const most = Math.max(...car.gearboxes.map(gearbox => gearbox.ratios.length));
	const has = `at most ${most}: no gearbox of this car has more than ${counted(most, 'gear')}`;
	const gear = (path: string, value: number | undefined) =>
		value === undefined || value <= most ? [] : [fault('track', path, `gear ${value}`, has)];
	const range = (path: string, allowed: GearRange | undefined) =>
		gearsOf(allowed, most) === undefined
			? [fault('track', path, `gears ${allowed?.lowest} to ${allowed?.highest}`, has)]
			: [];
	const short = car.gearboxes.find(({ratios}) => ratios.length > efficiencyCount(car));
	return [
		...gear('pitRoad.gear', track.pitRoad?.gear),
		...gear('restart.gear', track.restart?.gear),
		...range('gears', track.gears),
		...track.straights.flatMap(({name, gears, measured}) => [
			...range(`straights.${name}.gears`, gears),
			...gear(`straights.${name}.measured.gear`, measured?.gear),
		]),
		...(short === undefined
			? []
			: [
					fault(
						'car',
						'efficiencies',
						`${efficiencyCount(car)} for the ${short.ratios.length} gears of gearbox ${short.name}`,
						'one for each gear',
					),
				]),
	];
}

function efficiencyCount(car: Car): number {
	return typeof car.efficiencies === 'number' ? Number.POSITIVE_INFINITY : car.efficiencies.length;
}
