/** RPM where the driver needs the engine to pull: at each exit and minimum, and at the restart, against the power band. */
import type {Condition} from '../conditions.ts';
import type {Verdict} from '../results.ts';
import type {PlaceRun} from '../run-place.ts';
import {eachStraight} from '../run-row.ts';
import {checkOf, type Ground, type Reading, type RowCheck, worseOf} from './check.ts';

export const band: RowCheck = (row, ground) => {
	let worst: Reading | undefined;
	eachStraight(row, (run, {condition}) => {
		const {place, state, result} = run;
		if (state === 'stops') worst = worseOf(worst, stops(place.name, condition.name));
		if (state !== 'ran' && state !== 'held') return;
		worst = worseOf(worst, pull(run, condition, ground, 'exit', result.exitRpm));
		if (result.minimumRpm === null) return;
		worst = worseOf(worst, pull(run, condition, ground, 'minimum', result.minimumRpm));
	});
	return checkOf('band', worst);
};

/**
 * Near below the band where grip could hold more than the engine gives, and always below the RPM from which it pulls:
 * out of the band but with wheels that could spin, a shorter gear would gain nothing.
 */
export function pull(
	run: PlaceRun,
	condition: Condition,
	ground: Ground,
	part: 'exit' | 'minimum',
	rpm: number,
): Reading {
	const {band, engine} = ground.plan;
	const lame = rpm < engine.pullRpm;
	const below = lame || (rpm < band.lowRpm && run.spareGripN[part] > 0);
	const bound = lame ? Math.max(band.lowRpm, engine.pullRpm) : band.lowRpm;
	const verdict: Verdict = below ? 'near' : 'pass';
	return {
		verdict,
		value: rpm,
		bound,
		margin: rpm - bound,
		place: run.place.name,
		part,
		situation: condition.name,
		remark: remarkOn(lame, below, rpm < band.lowRpm),
	};
}

function remarkOn(lame: boolean, below: boolean, outside: boolean): string | undefined {
	if (lame) return 'below the RPM from which the engine pulls';
	return outside && !below ? 'below the band, but grip is the limit there' : undefined;
}

function stops(place: string, situation: string): Reading {
	return {
		verdict: 'fail',
		value: null,
		bound: null,
		margin: null,
		place,
		part: 'exit',
		situation,
		remark: 'stops before the end',
	};
}
