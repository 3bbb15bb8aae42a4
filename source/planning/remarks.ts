/** What a reader should know beside the numbers of an answer. Each is said once. */
import {outsideStandard} from '../drivetrain/power-correction.ts';
import {anchorRemarks} from './anchor-remarks.ts';
import type {Ground} from './checks/check.ts';
import type {Plan} from './plan.ts';
import {runRemarks} from './run-remarks.ts';
import type {RowRun} from './run-row.ts';
import {sanityRemarks} from './sanity-remarks.ts';
import {replacedBy} from './situations.ts';
import {listed, placeText} from './words.ts';

export function remarksOn(ground: Ground, rows: readonly RowRun[]): string[] {
	const {plan} = ground;
	return [
		...new Set([
			...anchorRemarks(ground),
			...trackCarRemarks(plan),
			...airRemarks(plan),
			...windRemarks(plan),
			...lapRemarks(plan),
			...runRemarks(plan, rows),
			...sanityRemarks(plan),
		]),
	];
}

function trackCarRemarks({track}: Plan): string[] {
	const names = replacedBy(track.car);
	return names.length === 0 ? [] : [`This track's own numbers replace the car's: ${listed(names)}.`];
}

function airRemarks({conditions, engine}: Plan): string[] {
	return conditions
		.filter(({correction}) => outsideStandard(engine.correctedTo, correction))
		.map(
			({name, correction}) =>
				`${placeText('The air', name)}: correction factor ${correction.toFixed(3)}, outside the 0.93 to 1.07 that SAE J1349 holds good.`,
		);
}

function windRemarks({conditions, track}: Plan): string[] {
	const windy = conditions.filter(({wind}) => (wind.speedMps ?? 0) > 0);
	if (windy.length === 0) return [];
	const aimless = windy.some(({wind}) => wind.fromRad === undefined);
	const without = track.straights.filter(({headingRad}) => headingRad === undefined).map(({name}) => name);
	return [
		...(aimless ? ['Wind without a direction is left out.'] : []),
		...(without.length > 0 ? [`No wind on ${listed(without)}: no heading given.`] : []),
	];
}

function lapRemarks({track}: Plan): string[] {
	const sumM = track.straights.reduce((sum, {lengthM}) => sum + (lengthM ?? 0), 0);
	if (track.lapM === undefined || sumM <= track.lapM) return [];
	return ['The straights together are longer than the lap.'];
}
