import {describe, expect, test} from 'vitest';
import {found, hesperRidge, quillmere, tarrowdale} from '../sample.ts';

const kinds = (findings: {laps: readonly {kind: string}[]}) => findings.laps.map(({kind}) => kind);
const count = (all: readonly string[], kind: string) => all.filter(one => one === kind).length;

describe('laps by the column of the log', () => {
	test('out lap, in lap and laps behind the pace car are marked, and left out', async () => {
		const {findings} = await found({...tarrowdale, driving: {laps: 10, paceLaps: 3}});
		const all = kinds(findings);
		expect(findings.lapsFrom).toBe('column');
		expect(all[0]).toBe('out');
		expect(all.at(-1)).toBe('in');
		expect(count(all, 'pace')).toBeGreaterThanOrEqual(2);
		expect(count(all, 'good')).toBeGreaterThanOrEqual(8);
		for (const lap of findings.laps) expect(lap.why === '').toBe(lap.kind === 'good');
		for (const pass of findings.passes) if (pass.good) expect(findings.laps[pass.lap]!.kind).toBe('good');
		expect(findings.notes.find(({code}) => code === 'lapsLeftOut')!.text).toContain('out lap: starts at 45');
	});

	test('a hole in the log breaks its lap', async () => {
		const hole = (values: Float64Array) => values.map((value, i) => (i > 6000 ? value + 20 : value));
		const {findings} = await found({
			...quillmere,
			driving: {laps: 8},
			change: run => ({...run, timeS: hole(run.timeS), distanceM: hole(run.distanceM)}),
		});
		const broken = findings.laps.find(({from, to}) => from <= 6000 && to > 6001)!;
		expect(broken.kind).toBe('part');
		expect(broken.why).toBe('the log has a hole of 20.0 s');
	});
});

describe('laps without a column', () => {
	test('come from the straights that repeat, and are found again after laps behind the pace car', async () => {
		const {findings, log} = await found({...hesperRidge, driving: {laps: 8, paceLaps: 1}, sensors: {lap: false}});
		expect(findings.lapsFrom).toBe('straights');
		expect(findings.matching.runsPerLap).toBe(11);
		expect(count(kinds(findings), 'good')).toBeGreaterThanOrEqual(7);
		const named = findings.passes.filter(({straight}) => straight !== undefined);
		const right = named.filter(pass => {
			const nearest = log.passes.reduce((best, one) =>
				Math.abs(one.startS - pass.startS) < Math.abs(best.startS - pass.startS) ? one : best,
			);
			return nearest.straight === pass.straight;
		});
		expect(right.length).toBe(named.length);
	});

	test('are as long as the track says', async () => {
		const {findings, plan} = await found({...quillmere, driving: {laps: 8}, sensors: {lap: false}});
		expect(Math.abs(findings.matching.lapM! / plan.track.lapM! - 1)).toBeLessThan(0.01);
		expect(findings.notes.find(({code}) => code === 'straightsDiffer')!.text).toContain('may be exchanged');
	});
});

test('a single lap is taken, and no spread is told of it', async () => {
	const {findings} = await found({...quillmere, driving: {laps: 1}});
	expect(count(kinds(findings), 'good')).toBe(1);
	expect(findings.straights.map(({passes}) => passes)).toEqual([1, 1]);
	expect(findings.straights[0]!.exitMps!.sd).toBeUndefined();
	expect(findings.notes.map(({code}) => code)).toContain('oneLap');
	expect(findings.circumference!.passes).toBe(2);
});
