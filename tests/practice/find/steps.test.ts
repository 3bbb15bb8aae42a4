/** That no step of the finding looks at more than a bounded number of samples, however long the log. */
import {afterEach, describe, expect, test, vi} from 'vitest';
import type {LoggedRun} from '../../../source/logs/logged-run.ts';
import {findInLog, findSteps} from '../../../source/practice/find/find-in-log.ts';
import {samplesAStep} from '../../../source/practice/find/steps.ts';
import {ratioSteps} from '../../../source/practice/learn/pictures.ts';
import {generateLog, type LogWish} from '../log-generator.ts';
import {mount, named, quillmere, samplePlan, tarrowdale} from '../sample.ts';

afterEach(() => vi.restoreAllMocks());

/** Reading, as these loops do, some samples on either side of the one that is looked at. */
const readsASample = 8;
/** What is chosen from a long channel, to tell its rate or a quantile, is one step: some 20 000 of its samples. */
const chosen = 25_000;
const mostReads = readsASample * samplesAStep + 2 * chosen;

/** Counts every reading of a channel. */
function counting(run: LoggedRun): {run: LoggedRun; reads: () => number} {
	let reads = 0;
	const counted = <T extends object>(channel: T): T =>
		new Proxy(channel, {
			get(target, name) {
				if (typeof name === 'string' && /^\d/.test(name)) reads++;
				const value = Reflect.get(target, name);
				return typeof value === 'function' ? value.bind(target) : value;
			},
		});
	const channels = Object.entries(run).map(([name, value]) => [
		name,
		ArrayBuffer.isView(value) ? counted(value) : value,
	]);
	return {run: Object.fromEntries(channels) as LoggedRun, reads: () => reads};
}

/** Whole channels are never gone through by what cannot rest. Gives the longest that was. */
function longestAtOnce(): () => number {
	let longest = 0;
	for (const of of [Float32Array.prototype, Float64Array.prototype, Uint8Array.prototype]) {
		for (const name of ['map', 'filter', 'reduce', 'forEach', 'some', 'every', 'sort'] as const) {
			const plain = of[name] as (...given: unknown[]) => unknown;
			const watched = function (this: ArrayLike<number>, ...given: unknown[]) {
				longest = Math.max(longest, this.length);
				return plain.apply(this, given);
			};
			vi.spyOn(of as Record<typeof name, typeof watched>, name).mockImplementation(watched);
		}
	}
	return () => longest;
}

describe('a step is bounded', () => {
	test.each([
		['with throttle and laps', {sensors: {rateHz: 100, gear: true}}],
		['by the speed alone', {sensors: {rateHz: 100, throttle: false, lap: false}}],
		['in one stretch', {sensors: {rateHz: 100, lap: false}, driving: {laps: 160, spinning: 1}}],
	] as [string, Partial<LogWish>][])('%s', async (_, wish) => {
		const plan = await samplePlan(quillmere.track);
		const log = generateLog({seed: 3, plan, mounted: mount(plan, quillmere.mounted), driving: {laps: 160}, ...wish});
		const {run, reads} = counting(log.run);
		expect(run.samples).toBeGreaterThan(2 * mostReads);
		const longest = longestAtOnce();
		const steps = findSteps(run, plan, named(quillmere.mounted));
		let [most, count] = [0, 0];
		for (let before = reads(); ; before = reads()) {
			const step = steps.next();
			most = Math.max(most, reads() - before);
			count++;
			if (step.done) break;
		}
		expect(most).toBeLessThanOrEqual(mostReads);
		expect(count).toBeGreaterThan((10 * run.samples) / samplesAStep);
		expect(longest()).toBeLessThanOrEqual(chosen);
	});

	test('of the picture too', async () => {
		const plan = await samplePlan(tarrowdale.track);
		const log = generateLog({seed: 3, plan, mounted: mount(plan, tarrowdale.mounted), driving: {laps: 30}});
		const findings = findInLog(log.run, plan, named(tarrowdale.mounted));
		const longest = longestAtOnce();
		expect([...ratioSteps(findings)].length).toBeGreaterThan(log.run.samples / samplesAStep - 1);
		expect(longest()).toBeLessThanOrEqual(chosen);
	});
});

test('what is looked for is told in its order', async () => {
	const plan = await samplePlan(tarrowdale.track);
	const log = generateLog({seed: 3, plan, mounted: mount(plan, tarrowdale.mounted), driving: {laps: 3}});
	const told = [...findSteps(log.run, plan, named(tarrowdale.mounted))].filter(sought => sought !== undefined);
	expect(told).toEqual(['full throttle', 'laps and straights', 'the pair', 'gears', 'events']);
});
