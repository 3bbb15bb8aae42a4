/** What is ranked: every pair on the rack with every gearbox set, each made ready once. */
import type {Car, Gearbox, Pair, RackPair} from '../drivetrain/car.ts';
import {flipped, overallRatios, pairName, samePair} from '../drivetrain/gear-pair.ts';
import type {GearTrain} from '../drivetrain/straight.ts';

export type Candidate = {
	/** As mounted. */
	readonly pair: RackPair;
	readonly pairName: string;
	readonly gearbox: Gearbox;
	readonly train: GearTrain;
};

/** Every pair × gearbox; both directions of a pair where the gears may be put on either shaft. */
export function candidatesOf(car: Car): Candidate[] {
	return mountable(car).flatMap(pair => car.gearboxes.map(gearbox => candidateOf(car, pair, gearbox)));
}

export function candidateOf(car: Car, pair: RackPair, gearbox: Gearbox): Candidate {
	const {efficiencies} = car;
	return {
		pair,
		pairName: pairName(pair),
		gearbox,
		train: {
			overall: overallRatios(gearbox.ratios, pair, car.finalDrive),
			efficiency: typeof efficiencies === 'number' ? gearbox.ratios.map(() => efficiencies) : efficiencies,
		},
	};
}

/** The pairs that can be mounted from this rack, as they would be mounted. */
export function mountable(car: Car): RackPair[] {
	const {pairs, eitherShaft} = car.rack;
	if (!eitherShaft) return [...pairs];
	const turned = pairs.map(pair => ({...pair, ...flipped(pair)}));
	return [...pairs, ...turned.filter(pair => !pairs.some(other => samePair(other, pair)))];
}

/** The mountable pair with these teeth; undefined where the rack has none. */
export function onRack(car: Car, pair: Pair): RackPair | undefined {
	return mountable(car).find(other => samePair(other, pair));
}

export function gearboxNamed(car: Car, name: string): Gearbox | undefined {
	return car.gearboxes.find(gearbox => gearbox.name === name);
}
