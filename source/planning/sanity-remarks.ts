/** Numbers outside what textbooks and standards give for such a car: shown, not hidden. */
import type {Plan} from './plan.ts';
import {placeText} from './words.ts';

/** Rolling circumference of a radial tire ÷ overall diameter at 60 km/h (ETRTO Standards Manual). */
const rolloutPerDiameter = 3.05;
/** A rollout this far from it is worth a look. */
const rolloutTolerance = 0.03;
/** Drag areas of road and racing cars, m². */
const dragArea = {lowest: 0.5, highest: 1.2};
/** A radial racing tire's best longitudinal slip is of the order of 5 to 10 %; on a straight it runs well below. */
const highestSlip = 0.1;
/** Three meshes at the least loss of a spur mesh, 0.5 % each. */
const highestEfficiency = 0.995 ** 3;

export function sanityRemarks({car, conditions}: Plan): string[] {
	const remarks: string[] = [];
	const {diameterM, slip, steadySlip} = car.tires;
	for (const {name, vehicle} of conditions) {
		const ratio = diameterM === undefined ? rolloutPerDiameter : vehicle.rolloutM / diameterM;
		if (Math.abs(ratio / rolloutPerDiameter - 1) > rolloutTolerance) {
			const usual = rolloutPerDiameter.toFixed(2);
			remarks.push(
				`${placeText('Rollout', name)} is ${ratio.toFixed(2)} × the tire's diameter; about ${usual} is usual.`,
			);
		}
		if (vehicle.dragAreaM2 < dragArea.lowest || vehicle.dragAreaM2 > dragArea.highest) {
			remarks.push(
				`${placeText('Drag area', name)} is ${vehicle.dragAreaM2.toFixed(2)} m²; cars run ${dragArea.lowest} to ${dragArea.highest} m².`,
			);
		}
	}
	if (Math.max(slip, steadySlip) > highestSlip) {
		remarks.push(
			`Slip of ${(100 * Math.max(slip, steadySlip)).toFixed(1)} %: above the 5 to 10 % at which a racing tire pulls best.`,
		);
	}
	const best = typeof car.efficiencies === 'number' ? car.efficiencies : Math.max(...car.efficiencies);
	if (best > highestEfficiency) {
		remarks.push(`Efficiency ${best.toFixed(3)}: less loss than three gear meshes at 0.5 % each.`);
	}
	return remarks;
}
