import {describe, expect, test} from 'vitest';
import {findInLog} from '../../../source/practice/find/find-in-log.ts';
import {median} from '../../../source/practice/fit/robust.ts';
import {generateLog} from '../log-generator.ts';
import {found, hesperRidge, mount, named, quillmere, type Sample, samplePlan, tarrowdale} from '../sample.ts';

const mph = 0.44704;

type Found = Awaited<ReturnType<typeof found>>;

/** Each good pass found, with the one that was driven. */
function pairs({log, findings}: Found) {
	return findings.passes
		.filter(pass => pass.good)
		.map(pass => ({
			pass,
			driven: log.passes.find(one => Math.abs(one.startS - log.moments[0]!.timeS - pass.startS) < 1.5)!,
		}));
}

const middle = (values: number[]) => median(values.map(Math.abs));

describe('exits and ends are found where they were', () => {
	test.each([
		['a short track with braking', quillmere],
		['an intermediate track', tarrowdale],
		['a road course', hesperRidge],
	] as [string, Sample][])('%s', async (_, sample) => {
		const all = pairs(await found({...sample, driving: {laps: 10}}));
		expect(all.length).toBeGreaterThanOrEqual(20);
		expect(all.every(({pass, driven}) => pass.straight === driven.straight)).toBe(true);
		expect(middle(all.map(({pass, driven}) => pass.exitMps - driven.exitMps))).toBeLessThan(0.2 * mph);
		expect(middle(all.map(({pass, driven}) => pass.endMps - driven.endMps))).toBeLessThan(0.25 * mph);
		expect(middle(all.map(({pass, driven}) => pass.lengthM - driven.lengthM))).toBeLessThan(2);
	});
});

test('medians and spread of a straight are those of its laps', async () => {
	const {findings, log} = await found({...tarrowdale, driving: {laps: 20, exitSpreadMps: 0.6}});
	const [front, back] = findings.straights;
	expect(findings.matching.matched).toBe(true);
	expect([front!.name, back!.name]).toEqual(['Front', 'Back']);
	expect(front!.exitMps!.count).toBe(front!.passes);
	expect(front!.exitMps!.sd!).toBeGreaterThan(0.3);
	expect(front!.exitMps!.sd!).toBeLessThan(1);
	expect([front!.exitGear, front!.endGear]).toEqual([5, 5]);
	const driven = log.passes.filter(({straight, kind}) => straight === 0 && kind === 'good');
	expect(Math.abs(front!.endMps!.median - median(driven.map(({endMps}) => endMps)))).toBeLessThan(0.2 * mph);
	expect(front!.highestMps!).toBeGreaterThanOrEqual(front!.endMps!.median);
	expect(Math.abs(front!.minimumMps!.median - 157 * mph)).toBeLessThan(0.3 * mph);
});

test('straights driven in the order of another track are not taken for these', async () => {
	const {findings} = await found({
		...hesperRidge,
		driving: {laps: 4},
		change: run => ({...run, speedMps: run.speedMps.map(mps => 0.5 * mps), rpm: run.rpm.map(rpm => 0.5 * rpm)}),
	});
	expect(findings.matching.matched).toBe(false);
	expect(findings.matching.why).toContain('Not found in the log');
});

test('without a throttle, exits are told by the speed, and that is said', async () => {
	const sample = await found({...quillmere, driving: {laps: 10}, sensors: {throttle: false}});
	const all = pairs(sample);
	expect(all.length).toBeGreaterThanOrEqual(18);
	expect(middle(all.map(({pass, driven}) => pass.endMps - driven.endMps))).toBeLessThan(0.5 * mph);
	expect(middle(all.map(({pass, driven}) => pass.exitMps - driven.exitMps))).toBeLessThan(2 * mph);
	expect(sample.findings.notes.map(({code}) => code)).toContain('noThrottle');
});

test('a throttle that is held down all lap gives way to the speed', async () => {
	const {findings} = await found({
		track: 'ostrand-flats',
		mounted: '37/31 A',
		driving: {laps: 6},
		change: run => ({...run, throttle: run.throttle!.map((_, i) => (i < 2000 ? 0.2 : 1))}),
	});
	const named = findings.straights.filter(({passes}) => passes > 0).map(({name}) => name);
	expect(named).toEqual(['Front', 'Back']);
	expect(findings.notes.map(({code}) => code)).toContain('noThrottle');
});

test('at one sample a second the straights are still told apart, and what is coarse is said', async () => {
	const {findings} = await found({...hesperRidge, driving: {laps: 12}, sensors: {rateHz: 1}});
	expect(findings.straights.filter(({passes}) => passes >= 4).length).toBeGreaterThanOrEqual(10);
	expect(findings.notes.map(({code}) => code)).toContain('slowSampling');
});

test('a log of another track is not laid on this one, and the laps of both are told', async () => {
	const [here, there] = [await samplePlan('tarrowdale'), await samplePlan('quillmere')];
	const log = generateLog({seed: 1, plan: there, mounted: mount(there, '33/35 A'), driving: {laps: 5}});
	const {matching} = findInLog(log.run, here, named('33/35 A'));
	expect(matching.matched).toBe(false);
	expect(matching.why).toMatch(
		/^None of the straights of Tarrowdale is in the log: a lap of it is 2,?6\d\d ft .*, by the document 10,560 ft \(3219 m\), with 2 full-throttle runs\. Is it of another track\?$/,
	);
});
