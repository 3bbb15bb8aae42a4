/** What the answers about engine life and fuel assume, and what they leave out, said as sentences. */
import {lengthText} from '../planning/words.ts';
import type {LapParts} from './lap-parts.ts';

export function lapAssumptions({cornerM, leftOut}: LapParts): string[] {
	if (cornerM === undefined) return [...leftOut];
	if (cornerM === 0) return ['The straights make up the whole lap: no corners.'];
	return [
		`Corners: what the straights leave of the lap, ${lengthText(cornerM)} before each; the first half slowing evenly to the minimum, the second gaining evenly, in the exit gear.`,
	];
}

const notCounted = 'Pace laps, restarts and pit road are not counted';

/** Of engine life alone. */
export const lifeAssumptions: readonly string[] = [`${notCounted}, nor a missed shift.`];

/** Of fuel alone. */
export const fuelAssumptions: readonly string[] = [
	'Full throttle burns what power and grip take; in corners the throttle gives what drag, rolling and gain of speed need. Tire scrub in corners is not known and left out.',
	`Shifting, braking and a closed throttle burn nothing. ${notCounted}.`,
];

/** Textbooks and handbooks: 0.26 to 0.30 at full load (Heywood, Internal Combustion Engine Fundamentals), racing engines up to 0.34. */
const usualKgPerKwh = {lowest: 0.26, highest: 0.34};
const kilowattHourJ = 3.6e6;
/** A value at the bound that was typed in another unit. */
const rounding = 1e-6;

export function consumptionRemarks(consumptionKgPerJ: number): string[] {
	const kgPerKwh = consumptionKgPerJ * kilowattHourJ;
	const {lowest, highest} = usualKgPerKwh;
	if (kgPerKwh >= lowest * (1 - rounding) && kgPerKwh <= highest * (1 + rounding)) return [];
	return [
		`Fuel consumption of ${kgPerKwh.toFixed(3)} kg/kWh: handbooks give ${lowest.toFixed(2)} to ${highest.toFixed(2)} at full load.`,
	];
}
