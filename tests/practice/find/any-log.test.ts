/** Whatever a log holds, the findings are whole: no throw, no endless loop, everything in its range. */
import fc from 'fast-check';
import {beforeAll, expect, test} from 'vitest';
import type {LoggedRun} from '../../../source/logs/logged-run.ts';
import type {Plan} from '../../../source/planning/plan.ts';
import {findInLog} from '../../../source/practice/find/find-in-log.ts';
import type {Findings} from '../../../source/practice/find/findings.ts';
import {runs} from '../../runs.ts';
import {generateLog} from '../log-generator.ts';
import {hesperRidge, mount, samplePlan} from '../sample.ts';

let plan: Plan;
let drivenRun: LoggedRun;
beforeAll(async () => {
	plan = await samplePlan('hesper-ridge');
	const wish = {driving: {laps: 1}, sensors: {rateHz: 10, gear: true}};
	drivenRun = generateLog({...wish, seed: 1, plan, mounted: mount(plan, hesperRidge.mounted)}).run;
});

const near = (low: number, high: number) =>
	fc.oneof(
		{weight: 5, arbitrary: fc.double({min: low, max: high, noNaN: true})},
		{weight: 1, arbitrary: fc.constantFrom(Number.NaN, 0, low, high)},
	);

const anySample = fc.record({
	step: fc.oneof({weight: 9, arbitrary: fc.constant(0.1)}, {weight: 1, arbitrary: fc.constantFrom(0, 0.001, 30)}),
	mps: near(0, 100),
	rpm: near(0, 11_000),
	throttle: near(0, 1),
	gear: near(0, 6).map(Math.round),
	lap: near(0, 4).map(Math.round),
});

/** Noise alone. */
const anyRun = fc
	.tuple(fc.array(anySample, {maxLength: 400}), fc.boolean(), fc.boolean(), fc.boolean())
	.map(([samples, throttle, gear, lap]): LoggedRun => {
		let [time, distance] = [0, 0];
		const times = samples.map(({step}, i) => {
			time += i === 0 ? 0 : step;
			return time;
		});
		const distances = samples.map(({step, mps}, i) => {
			distance += i === 0 || Number.isNaN(mps) ? 0 : step * mps;
			return distance;
		});
		const channel = (has: boolean, of: (sample: (typeof samples)[number]) => number) =>
			has ? Float32Array.from(samples, of) : null;
		return {
			samples: samples.length,
			timeS: Float64Array.from(times),
			distanceM: Float64Array.from(distances),
			speedMps: channel(true, ({mps}) => mps)!,
			rpm: channel(true, ({rpm}) => rpm)!,
			throttle: channel(throttle, sample => sample.throttle),
			gear: channel(gear, sample => sample.gear),
			lap: channel(lap, sample => sample.lap),
			brake: null,
			steering: null,
		};
	});

/** A real log with stretches of it spoiled. */
const anySpoil = fc.array(
	fc.record({
		channel: fc.constantFrom('speedMps', 'rpm', 'throttle', 'gear', 'lap'),
		from: fc.double({min: 0, max: 1, noNaN: true}),
		length: fc.double({min: 0, max: 0.5, noNaN: true}),
		value: fc.constantFrom(Number.NaN, 0, 1, 7, 55, 9100),
	}),
	{maxLength: 5},
);

function whole(run: LoggedRun, findings: Findings): void {
	const {samples, laps, passes, circumference} = findings;
	expect(samples.gear.length).toBe(run.samples);
	expect(laps.reduce((sum, {from, to}) => sum + to - from, 0)).toBe(
		laps.length === 0 ? 0 : laps.at(-1)!.to - laps[0]!.from,
	);
	for (const pass of passes) {
		expect(pass.from).toBeLessThan(pass.to);
		expect(pass.to).toBeLessThan(run.samples);
		expect(pass.timeS).toBeGreaterThan(0);
		expect(laps[pass.lap]).toBeDefined();
	}
	for (const {endMps, exitMps} of findings.straights) {
		for (const spread of [endMps, exitMps]) if (spread) expect(Number.isFinite(spread.median)).toBe(true);
	}
	if (circumference) expect(circumference.rolloutM.value).toBeGreaterThan(0);
	expect(JSON.stringify({...findings, samples: undefined})).not.toMatch(/NaN|null/);
}

test('noise', () => {
	fc.assert(
		fc.property(anyRun, run => whole(run, findInLog(run, plan))),
		{numRuns: runs(60, 3000)},
	);
});

test('a real log with parts of it spoiled', () => {
	fc.assert(
		fc.property(anySpoil, spoils => {
			const run = {...drivenRun, speedMps: drivenRun.speedMps.slice(), rpm: drivenRun.rpm.slice()};
			const channels: Record<string, Float32Array> = {
				speedMps: run.speedMps,
				rpm: run.rpm,
				throttle: run.throttle!.slice(),
				gear: run.gear!.slice(),
				lap: run.lap!.slice(),
			};
			for (const {channel, from, length, value} of spoils) {
				channels[channel]!.fill(value, from * run.samples, (from + length) * run.samples);
			}
			const spoiled = {...run, throttle: channels.throttle!, gear: channels.gear!, lap: channels.lap!};
			whole(spoiled, findInLog(spoiled, plan));
		}),
		{numRuns: runs(25, 1500)},
	);
});
