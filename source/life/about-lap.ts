/** What the answers about engine life and fuel say of the lap that they are about. */
import {type Ranked, rowName} from '../planning/rank-rack.ts';
import {remarksOn} from '../planning/remarks.ts';
import {lapAssumptions} from './assumptions.ts';
import type {Compared} from './compared-rows.ts';
import {type LapParts, lapParts} from './lap-parts.ts';
import type {LifeOptions} from './options.ts';
import type {About} from './results.ts';

export function aboutLap({ranking, ground, runs}: Ranked, {rows, remarks}: Compared, options: LifeOptions): About {
	const {plan} = ground;
	const parts = lapParts(plan.track);
	const laps = options.laps ?? plan.track.laps ?? null;
	return {
		setting: ranking.setting,
		situation: options.situation ?? null,
		situations: plan.conditions.filter(({weight}) => weight > 0).length,
		laps,
		lapM: parts.lapM ?? null,
		cornerM: parts.cornerM ?? null,
		assumptions: lapAssumptions(parts),
		remarks: [
			...remarks,
			...rows.filter(({verdict}) => verdict === 'fail').map(row => `${rowName(row)} fails a check. ${row.reason}`),
			...raceRemarks(laps, parts),
			...remarksOn(
				ground,
				rows.map(row => runs.get(rowName(row))!),
			),
		],
	};
}

/** Laps of the race that can be told of: none where parts of the lap are left out. */
export function wholeLaps({laps, lapM}: About): number | null {
	return lapM === null ? null : laps;
}

function raceRemarks(laps: number | null, {lapM}: LapParts): string[] {
	if (lapM === undefined) return ['Parts of the lap are left out: nothing is told of fuel or of a whole race.'];
	return laps === null ? ['No race length: the track has no "laps".'] : [];
}
