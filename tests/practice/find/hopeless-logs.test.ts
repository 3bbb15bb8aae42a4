/** Logs with little or nothing in them: an answer all the same, which says what is missing. */
import {describe, expect, test} from 'vitest';
import type {LoggedRun} from '../../../source/logs/logged-run.ts';
import {findInLog} from '../../../source/practice/find/find-in-log.ts';
import {found, hesperRidge, quillmere, samplePlan} from '../sample.ts';

const cut = (run: LoggedRun, from: number, to: number): LoggedRun => ({
	...run,
	samples: to - from,
	timeS: run.timeS.slice(from, to),
	distanceM: run.distanceM.slice(from, to),
	speedMps: run.speedMps.slice(from, to),
	rpm: run.rpm.slice(from, to),
	throttle: run.throttle?.slice(from, to) ?? null,
	gear: run.gear?.slice(from, to) ?? null,
	lap: run.lap?.slice(from, to) ?? null,
});

describe('a log', () => {
	test.each([0, 1, 2, 3, 10, 60, 200])('of %d samples gives findings without a fit', async samples => {
		const {findings} = await found({...quillmere, driving: {laps: 2}, change: run => cut(run, 0, samples)});
		expect(findings.log.samples).toBe(samples);
		expect(findings.circumference).toBeUndefined();
		expect(findings.straights.map(({passes}) => passes)).toEqual([0, 0]);
		expect(findings.notes.map(({code}) => code)).toContain('noGoodLap');
	});

	test('that begins and ends anywhere is read', async () => {
		for (const [from, to] of [
			[1234, 5678],
			[2000, 2600],
			[700, 4001],
		] as const) {
			const {findings} = await found({...quillmere, driving: {laps: 4}, change: run => cut(run, from, to)});
			expect(findings.samples.gear.length).toBe(to - from);
			expect(findings.laps.length).toBeGreaterThan(0);
		}
	});

	test.each([
		['no engine speed', (run: LoggedRun) => ({...run, rpm: run.rpm.map(() => Number.NaN)})],
		['no speed', (run: LoggedRun) => ({...run, speedMps: run.speedMps.map(() => Number.NaN)})],
		['a car that stands', (run: LoggedRun) => ({...run, speedMps: run.speedMps.map(() => 0)})],
		['an engine that is off', (run: LoggedRun) => ({...run, rpm: run.rpm.map(() => 0)})],
	])('with %s knows no gear', async (_, change) => {
		const {findings} = await found({...quillmere, driving: {laps: 3}, change});
		expect(findings.mounted.verdict).toBe('unknown');
		expect(findings.circumference).toBeUndefined();
	});

	test('with a throttle that is stuck goes by the speed', async () => {
		const stuck = (run: LoggedRun) => ({...run, throttle: run.throttle!.map(() => 0.31)});
		const {findings} = await found({...quillmere, driving: {laps: 6}, change: stuck});
		expect(findings.mounted.verdict).toBe('asInstalled');
		expect(findings.straights[0]!.passes).toBeGreaterThan(3);
	});

	test('with nothing but laps behind the pace car fits nothing', async () => {
		const plan = await samplePlan('hesper-ridge');
		const {log} = await found({...hesperRidge, driving: {laps: 2, paceLaps: 3}});
		const pace = log.moments.findIndex((_, i) => i > 0 && log.run.lap![i] === 3);
		const end = log.moments.findIndex((_, i) => log.run.lap![i] === 4);
		const findings = findInLog(cut(log.run, pace, end), plan);
		expect(findings.passes.filter(({good}) => good)).toEqual([]);
		expect(findings.circumference).toBeUndefined();
	});
});
