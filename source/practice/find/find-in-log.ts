/** From a logged run to what it shows. */
import type {LoggedRun} from '../../logs/logged-run.ts';
import type {Plan} from '../../planning/plan.ts';
import {finish} from '../../planning/run-rack.ts';
import {type Channels, channelsOf, overallBy} from './channels.ts';
import {fitCircumference} from './circumference.ts';
import {humpsOf} from './clusters.ts';
import type {CircumferenceFit, Findings, Lap, LimiterFinding, Mounted, Pass, Peak, Wheelspin} from './findings.ts';
import {sampleState} from './findings.ts';
import type {Installed} from './fittings.ts';
import {fullThrottle, type Stretch} from './full-throttle.ts';
import {type GearPlaces, gearPlaces, gearsOf} from './gears.ts';
import {type LaidOut, layOut} from './lay-out.ts';
import {mountedBy} from './mounted.ts';
import {notesOn} from './notes.ts';
import {measured} from './passes.ts';
import {type Power, powerOf} from './power.ts';
import {revEvents, shiftFindings} from './shift-findings.ts';
import type {Steps} from './steps.ts';
import {straightFindings} from './straight-findings.ts';

/**
 * Everything that a logged run shows, in passes over the log of one sample each. `plan` gives car, track, limits and the
 * documents' circumference; `installed` what is said to be mounted, the car's own unless given.
 */
export function findInLog(run: LoggedRun, plan: Plan, installed: Installed | undefined = plan.car.installed): Findings {
	return finish(findSteps(run, plan, installed));
}

/** The same step by step, for a caller that has other things to do in between: each looks at a bounded number of samples. */
export function* findSteps(
	run: LoggedRun,
	plan: Plan,
	installed: Installed | undefined = plan.car.installed,
): Steps<Findings> {
	yield 'full throttle';
	const channels = yield* channelsOf(run, plan);
	const {stretches, by} = yield* fullThrottle(channels, plan.track.lapM);
	yield 'laps and straights';
	const laid = yield* layOut(channels, plan, yield* measured(channels, undefined, stretches, []));
	yield 'the pair';
	const fit = mountedBy(plan, yield* humpsOf(channels, stretches), installed);
	yield 'gears';
	const {gears, power, circumference, passes} = yield* inGears({channels, plan, stretches, laid}, fit);
	yield 'events';
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
		laps: laid.laps,
		lapsFrom: laid.lapsFrom,
		mounted: {...fit, gearColumnAgrees: yield* columnAgrees(channels, gears, stretches)},
		matching: laid.matching,
		straights: straightFindings(plan.track, passes),
		passes,
		shifts: yield* shiftFindings(channels, passes, power.shifts),
		events: yield* revEvents(channels, gears, laid.laps, stretches, power.shifts, plan.limit.rpm),
		wheelspin: yield* wheelspinOf(channels, power.state, passes),
		limiter: yield* limiterOf(channels, power.state, passes, plan.base.vehicle.limiterRpm),
		highestRpm: yield* peak(channels, laid.laps, channels.middleRpm),
		highestMps: yield* peak(channels, laid.laps, channels.smoothMps),
		circumference,
		samples: {gear: gears, state: power.state, overall: channels.overall},
	};
	return {...findings, notes: notesOn(findings, plan, by)};
}

type Ground = {
	readonly channels: Channels;
	readonly plan: Plan;
	readonly stretches: readonly Stretch[];
	readonly laid: LaidOut;
};

type Geared = {
	readonly gears: Uint8Array;
	readonly power: Power;
	readonly passes: Pass[];
	readonly circumference: CircumferenceFit | undefined;
};

/**
 * Gears twice: by the documents' circumference, moved as a whole to where the humps lie, then by the one that these gears
 * give, whose growth is the log's own. Without a pair that fits there are no gears.
 */
function* inGears(ground: Ground, fit: Omit<Mounted, 'gearColumnAgrees'>): Steps<Geared> {
	const {channels, plan} = ground;
	const {vehicle} = plan.base;
	const places = gearPlaces(fit, vehicle.slip);
	if (places === undefined) {
		const gears = new Uint8Array(channels.run.samples);
		const power = {state: gears, inGear: [], shifts: []};
		return {gears, power, passes: yield* passesOf(ground, channels, power), circumference: undefined};
	}
	const rough = yield* inPlaces(ground, channels, places);
	if (rough.circumference === undefined) return rough;
	const tire = {
		rolloutM: rough.circumference.rolloutM.value,
		growth: rough.circumference.growth.value,
		slip: vehicle.slip,
	};
	const own = {...channels, overall: yield* overallBy(channels.run, tire, channels.pace)};
	return yield* inPlaces(ground, own, {...places, at: places.overall.map(Math.log)});
}

function* inPlaces(ground: Ground, channels: Channels, places: GearPlaces): Steps<Geared> {
	const {plan, stretches} = ground;
	const {vehicle} = plan.base;
	const gears = yield* gearsOf(channels, places, stretches);
	const power = yield* powerOf(channels, gears, places, stretches, plan.car.shiftTimeS, vehicle.limiterRpm);
	const passes = yield* passesOf(ground, channels, power);
	const circumference = yield* fitCircumference(channels, gears, power.state, passes, places.overall, vehicle);
	return {gears, power, passes, circumference};
}

function* passesOf({laid, stretches}: Ground, channels: Channels, power: Power): Steps<Pass[]> {
	const runs = yield* measured(channels, power.state, stretches, power.inGear);
	return runs.map((one, i) => ({...one, ...laid.runs[i]!}));
}

/** Of the samples in gear at full throttle: how often the column says the same; undefined without a column. */
function* columnAgrees(
	{run: {gear}, pace}: Channels,
	gears: Uint8Array,
	stretches: readonly Stretch[],
): Steps<number | undefined> {
	if (gear === null) return undefined;
	let [same, all] = [0, 0];
	for (const {from, to} of stretches) {
		for (let i = from; i <= to; i++) {
			if (pace.isDue()) yield;
			if (gears[i] === 0 || Number.isNaN(gear[i]!)) continue;
			all++;
			if (gear[i] === gears[i]) same++;
		}
	}
	return all === 0 ? undefined : same / all;
}

function* wheelspinOf({pace}: Channels, state: Uint8Array, passes: readonly Pass[]): Steps<Wheelspin> {
	let [spin, all] = [0, 0];
	for (const pass of passes) {
		for (let i = pass.from; i <= pass.to; i++) {
			if (pace.isDue()) yield;
			if (state[i] === sampleState.spin) spin++;
		}
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

function* limiterOf(
	{run: {timeS}, pace}: Channels,
	state: Uint8Array,
	passes: readonly Pass[],
	rpm: number,
): Steps<LimiterFinding> {
	let heldS = 0;
	for (let i = 1; i < state.length; i++) {
		if (pace.isDue()) yield;
		if (state[i] === sampleState.limiter) heldS += timeS[i]! - timeS[i - 1]!;
	}
	const distanceM = passes.reduce((sum, pass) => sum + pass.limiterM, 0);
	return {rpm, distanceM, timeS: heldS, passes: passes.filter(pass => pass.limiterM > 0).length};
}

function* peak(
	{run: {timeS, distanceM}, pace}: Channels,
	laps: readonly Lap[],
	values: Float32Array,
): Steps<Peak | undefined> {
	let at = -1;
	for (let i = 0; i < values.length; i++) {
		if (pace.isDue()) yield;
		if (values[i]! > (values[at] ?? Number.NEGATIVE_INFINITY)) at = i;
	}
	if (at < 0) return undefined;
	const lap = Math.max(
		0,
		laps.findLastIndex(({from}) => from <= at),
	);
	return {value: values[at]!, lap, timeS: timeS[at]!, distanceM: distanceM[at]!};
}
