/** From a dyno's standard day to today: rated torque ÷ correction factor is today's torque. */
import type {AirState} from './air.ts';
import type {CorrectedTo} from './car.ts';
import {celsiusZeroK, inchOfMercuryPa} from './constants.ts';

/** SAE J607's day: 60 °F and 29.92 inHg of dry air. */
const j607TemperatureK = (60 - 32) / 1.8 + celsiusZeroK;
const j607PressurePa = 29.92 * inchOfMercuryPa;

/** The range in which SAE J1349 holds its own correction to be good. */
const j1349Range = {lowest: 0.93, highest: 1.07};

/**
 * The factor that takes torque or power measured in `air` to the standard day: 1 for a curve that is the day's own.
 * J1349 as commonly published for JUN 1990: 1.180·(990/p_d)·√((t + 273)/298) − 0.180, p_d the dry pressure in hPa, which
 * holds 15 % of the power to be friction that no air changes. J607: (29.92 inHg/p_d)·√(T/T_60F), without friction.
 */
export function correctionFactor(correctedTo: CorrectedTo, air: AirState): number {
	if (correctedTo === 'air') return 1;
	if (correctedTo === 'J607') {
		return (j607PressurePa / air.dryPressurePa) * Math.sqrt((air.temperatureC + celsiusZeroK) / j607TemperatureK);
	}
	return 1.18 * (99_000 / air.dryPressurePa) * Math.sqrt((air.temperatureC + 273) / 298) - 0.18;
}

/** Whether a factor is outside the range that its standard gives itself. Only J1349 gives one: 0.93 to 1.07. */
export function outsideStandard(correctedTo: CorrectedTo, factor: number): boolean {
	return correctedTo === 'J1349' && (factor < j1349Range.lowest || factor > j1349Range.highest);
}
