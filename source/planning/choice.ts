/** Which one pair and set a command means. */
import type {Car, Pair} from '../drivetrain/car.ts';
import {gearboxFaults, pairFaults} from './document-faults.ts';
import {done, failed, fault} from './faults.ts';
import type {Choice, Outcome} from './results.ts';

export type Chosen = {readonly pair: Pair; readonly gearbox: string};

/** As given, else what is installed, else the first on the rack. A pair or set that the car has not is a fault. */
export function chosenFrom(car: Car, choice: Choice): Outcome<Chosen> {
	const faults = [
		...pairFaults('command', 'pair', car, choice.pair),
		...gearboxFaults('command', 'gearbox', car, choice.gearbox),
	];
	if (faults.length > 0) return failed(faults);
	const pair = choice.pair ?? car.installed?.pair ?? car.rack.pairs[0];
	const gearbox = choice.gearbox ?? car.installed?.gearbox ?? car.gearboxes[0]?.name;
	if (pair === undefined || gearbox === undefined) {
		return failed([fault('car', 'rack.pairs', 'no pair or no gearbox', 'at least one of each')]);
	}
	return done({pair, gearbox});
}
