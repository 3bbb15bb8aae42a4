/** From a logged run to what it shows. */
import type {LoggedRun} from '../../logs/logged-run.ts';
import type {Plan} from '../../planning/plan.ts';
import {median} from '../fit/robust.ts';
import {type Channels, channelsOf} from './channels.ts';
import {fitCircumference} from './circumference.ts';
import {humpsOf} from './clusters.ts';
import {
	type Findings,
	type Lap,
	type LimiterFinding,
	type Mounted,
	type Pass,
	type Peak,
	sampleState,
	type Wheelspin,
} from './findings.ts';
import type {Installed} from './fittings.ts';
import {fullThrottle} from './full-throttle.ts';
import {gearPlaces, gearsOf} from './gears.ts';
import {type LapCut, lapsByColumn, lapsByLength, lapsByPasses, rhythmOf} from './lap-cuts.ts';
import {lapsOf} from './lap-kinds.ts';
import {type Match, matchStraights} from './match-straights.ts';
import {mountedBy} from './mounted.ts';
import {notesOn} from './notes.ts';
import {type Measured, measured} from './passes.ts';
import {type Places, placesByLaps, placesByRhythm} from './places.ts';
import {type Power, powerOf} from './power.ts';
import {revEvents, shiftFindings} from './shift-findings.ts';
import {straightFindings} from './straight-findings.ts';

/**
 * Everything that a logged run shows, in passes over the log of one sample each. `plan` gives car, track, limits and the
 * documents' circumference; `installed` what is said to be mounted, the car's own unless given.
 */
export function findInLog(run: LoggedRun, plan: Plan, installed: Installed | undefined = plan.car.installed): Findings {
	const channels = channelsOf(run, plan);
	const {track} = plan;
	const power = fullThrottle(channels, track.lapM);
	const {stretches} = power;
	const fit = mountedBy(plan, humpsOf(channels, stretches), installed);
	const places = gearPlaces(fit, plan.base.vehicle.slip);
	const gears = places === undefined ? new Uint8Array(run.samples) : gearsOf(channels, places);
	const mounted: Mounted = {...fit, gearColumnAgrees: columnAgrees(run, gears, stretches)};
	const under: Power =
		places === undefined
			? {state: new Uint8Array(run.samples), inGear: [], shifts: []}
			: powerOf(channels, gears, places, stretches, plan.car.shiftTimeS, plan.base.vehicle.limiterRpm);

	const runs = measured(channels, under.state, stretches, under.inGear);
	const {cuts, lapsFrom, where, match} = lapsAndPlaces(run, plan, runs);
	const lapOf = runs.map(pass => cuts.findLastIndex(cut => cut.from <= pass.from));
	const laps = lapsOf(
		channels,
		track,
		cuts.map((cut, i) => ({...cut, runs: lapOf.filter(lap => lap === i).length})),
	);
	const straightOf = runs.map((_, i) => match?.straightAt[where?.of[i] ?? -1]);
	const passes = judged(runs, lapOf, straightOf, laps, run.samples);

	const overall = mounted.best?.candidate.train.overall;
	const findings = {
		log: {
			samples: run.samples,
			rateHz: channels.rateHz,
			timeS: run.timeS.at(-1) ?? 0,
			distanceM: run.distanceM.at(-1) ?? 0,
			throttle: run.throttle !== null,
			gear: run.gear !== null,
			lap: run.lap !== null,
		},
		laps,
		lapsFrom,
		mounted,
		matching: {
			matched: match?.matched ?? false,
			runsPerLap: where?.at.length,
			lapM: where?.lapM,
			why: match?.why ?? 'The full-throttle runs of the log do not repeat, so they are not laid on straights.',
		},
		straights: straightFindings(track, passes),
		passes,
		shifts: shiftFindings(channels, passes, under.shifts),
		events: revEvents(channels, gears, laps, stretches, under.shifts, plan.limit.rpm),
		wheelspin: wheelspinOf(under.state, passes),
		limiter: limiterOf(run, under.state, passes, plan.base.vehicle.limiterRpm),
		highestRpm: peak(run, laps, channels.middleRpm),
		highestMps: peak(run, laps, channels.smoothMps),
		circumference: overall && fitCircumference(channels, gears, under.state, passes, overall, plan.base.vehicle),
		samples: {gear: gears, state: under.state, overall: channels.overall},
	};
	return {...findings, notes: notesOn(findings, plan, power.by)};
}

type Laid = {
	readonly cuts: readonly LapCut[];
	readonly lapsFrom: Findings['lapsFrom'];
	readonly where: Places | undefined;
	readonly match: Match | undefined;
};

function lapsAndPlaces(run: LoggedRun, {track}: Plan, runs: readonly Measured[]): Laid {
	const all: LapCut[] = [{number: 1, from: 0, to: run.samples}];
	if (runs.length === 0)
		return {
			cuts: lapsByColumn(run) ?? all,
			lapsFrom: run.lap === null ? 'none' : 'column',
			where: undefined,
			match: undefined,
		};
	const byColumn = lapsByColumn(run);
	const rhythm = byColumn === undefined ? rhythmOf(runs, track.lapM) : undefined;
	const where = byColumn
		? placesByLaps(runs, byColumn, run.distanceM)
		: ((rhythm && placesByRhythm(runs, rhythm)) ?? inOrder(run, runs));
	const match = where && matchStraights(track, where, runs);
	if (byColumn !== undefined) return {cuts: byColumn, lapsFrom: 'column', where, match};
	if (rhythm === undefined || where === undefined) return {cuts: all, lapsFrom: 'none', where, match};
	const first = firstPlace(match);
	const starts = runs.filter((_, i) => where.of[i] === first);
	if (starts.length > 1) return {cuts: lapsByPasses(starts, run.samples), lapsFrom: 'straights', where, match};
	if (track.lapM === undefined) return {cuts: all, lapsFrom: 'none', where, match};
	return {cuts: lapsByLength(run, runs[0]!.startM, track.lapM), lapsFrom: 'length', where, match};
}

/** A log of one lap or less: its runs as they come. */
function inOrder(run: LoggedRun, runs: readonly Measured[]): Places {
	const lapM = run.distanceM.at(-1)!;
	return {lapM, at: runs.map(pass => pass.startM / lapM), of: runs.map((_, i) => i), fromLine: false};
}

/** The place of the first straight that was found. */
function firstPlace(match: Match | undefined): number {
	const found = (match?.straightAt ?? []).filter(straight => straight !== undefined);
	return found.length === 0 ? 0 : match!.straightAt.indexOf(Math.min(...found));
}

/** A run whose length is off by more than this from the others on its straight was cut short, or into. */
const lengthShare = 0.12;

function judged(
	runs: readonly Measured[],
	lapOf: readonly number[],
	straightOf: readonly (number | undefined)[],
	laps: readonly Lap[],
	samples: number,
): Pass[] {
	const onGood = runs.map((pass, i) => laps[lapOf[i]!]?.kind === 'good' && pass.from > 0 && pass.to < samples - 1);
	const usualM = new Map<number, number>();
	for (const straight of new Set(straightOf)) {
		if (straight === undefined) continue;
		usualM.set(
			straight,
			median(runs.filter((_, i) => onGood[i] && straightOf[i] === straight).map(pass => pass.lengthM)),
		);
	}
	return runs.map((pass, i) => {
		const straight = straightOf[i];
		const usual = straight === undefined ? Number.NaN : usualM.get(straight)!;
		const good = onGood[i]! && Math.abs(pass.lengthM / usual - 1) <= lengthShare;
		return {...pass, lap: lapOf[i]!, straight, good};
	});
}

/** Of the samples in gear at full throttle: how often the column says the same; undefined without a column. */
function columnAgrees(
	{gear}: LoggedRun,
	gears: Uint8Array,
	stretches: readonly {from: number; to: number}[],
): number | undefined {
	if (gear === null) return undefined;
	let [same, all] = [0, 0];
	for (const {from, to} of stretches) {
		for (let i = from; i <= to; i++) {
			if (gears[i] === 0 || Number.isNaN(gear[i]!)) continue;
			all++;
			if (gear[i] === gears[i]) same++;
		}
	}
	return all === 0 ? undefined : same / all;
}

function wheelspinOf(state: Uint8Array, passes: readonly Pass[]): Wheelspin {
	let [spin, all] = [0, 0];
	for (const pass of passes) {
		for (let i = pass.from; i <= pass.to; i++) if (state[i] === sampleState.spin) spin++;
		all += pass.to - pass.from + 1;
	}
	const good = passes.filter(pass => pass.good);
	return {
		samples: spin,
		share: all === 0 ? 0 : spin / all,
		exits: good.length,
		spinning: good.filter(pass => pass.spinS > 0).length,
	};
}

function limiterOf({timeS}: LoggedRun, state: Uint8Array, passes: readonly Pass[], rpm: number): LimiterFinding {
	let heldS = 0;
	for (let i = 1; i < state.length; i++) if (state[i] === sampleState.limiter) heldS += timeS[i]! - timeS[i - 1]!;
	const distanceM = passes.reduce((sum, pass) => sum + pass.limiterM, 0);
	return {rpm, distanceM, timeS: heldS, passes: passes.filter(pass => pass.limiterM > 0).length};
}

function peak({timeS, distanceM}: LoggedRun, laps: readonly Lap[], values: Channels['smoothMps']): Peak | undefined {
	let at = -1;
	for (let i = 0; i < values.length; i++) if (values[i]! > (values[at] ?? Number.NEGATIVE_INFINITY)) at = i;
	if (at < 0) return undefined;
	const lap = Math.max(
		0,
		laps.findLastIndex(({from}) => from <= at),
	);
	return {value: values[at]!, lap, timeS: timeS[at]!, distanceM: distanceM[at]!};
}
