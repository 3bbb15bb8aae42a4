import {describe, expect, test} from 'vitest';
import {findInLog} from '../../../source/practice/find/find-in-log.ts';
import type {CircumferenceFit} from '../../../source/practice/find/findings.ts';
import {full, runs} from '../../runs.ts';
import {type GeneratedLog, generateLog, type LogWish} from '../log-generator.ts';
import {found, hesperRidge, mount, quillmere, type Sample, samplePlan, tarrowdale} from '../sample.ts';

const at = ({vehicle}: GeneratedLog, mps: number) => vehicle.rolloutM * (1 + vehicle.growth * (mps / 44.704) ** 2);

describe('circumference and growth are recovered to 0.1 % and 0.2 points on', () => {
	test.each([
		['a short track', {...quillmere, driving: {laps: 25}}],
		['an intermediate track', {...tarrowdale, driving: {laps: 25}}],
		['a road course', {...hesperRidge, driving: {laps: 6}}],
		[
			'a road course, with steps of 10 rpm and 0.2 mph',
			{
				...hesperRidge,
				driving: {laps: 6},
				sensors: {rpmStep: 10, speedStepMps: 0.09},
			},
		],
		['much wheelspin', {...hesperRidge, driving: {laps: 6, spinning: 0.9}}],
		['many strays and gaps', {...hesperRidge, driving: {laps: 8}, sensors: {stray: 0.02, lost: 0.05}}],
		['20 samples a second', {...hesperRidge, driving: {laps: 8}, sensors: {rateHz: 20}}],
	] as [string, Sample][])('%s', async (_, sample) => {
		const {log, findings} = await found(sample);
		const fit = findings.circumference!;
		expect(fit.growthHeld).toBe(false);
		expect(Math.abs(fit.rolloutM.value / log.vehicle.rolloutM - 1)).toBeLessThan(0.001);
		expect(Math.abs(fit.circumferenceM.value / at(log, fit.atMps) - 1)).toBeLessThan(0.0005);
		expect(Math.abs(fit.growth.value - log.vehicle.growth)).toBeLessThan(0.002);
	});

	test('one sample a second, as nearly as its own errors say', async () => {
		const {log, findings} = await found({...hesperRidge, driving: {laps: 12}, sensors: {rateHz: 1}});
		const fit = findings.circumference!;
		expect(Math.abs(fit.circumferenceM.value / at(log, fit.atMps) - 1)).toBeLessThan(0.001);
		expect(Math.abs(fit.rolloutM.value - log.vehicle.rolloutM)).toBeLessThan(3 * fit.rolloutM.se);
	});
});

// Student's and normal errors alike: two standard errors hold 95 %. 90 to 99 % of 200 logs; of 40, 34 and more.
describe('standard errors are honest: the truth lies within two of them in 90 to 99 % of the logs', () => {
	const logs = runs(40, 200);
	const [least, most] = full ? [0.9, 0.99] : [0.85, 1];
	test.each([
		['a short track at 50 samples a second', quillmere, {driving: {laps: 6}}],
		['an intermediate track at 20', tarrowdale, {driving: {laps: 8}, sensors: {rateHz: 20}}],
		['passes that differ in slip', quillmere, {driving: {laps: 12, slipSpread: 0.002}, sensors: {rateHz: 20}}],
	] as [string, typeof quillmere, Partial<LogWish>][])('%s', async (_, {track, mounted}, wish) => {
		const plan = await samplePlan(track);
		const inside = {rolloutM: 0, growth: 0, circumferenceM: 0};
		for (let seed = 1; seed <= logs; seed++) {
			const log = generateLog({...wish, seed, plan, mounted: mount(plan, mounted)});
			const fit = findInLog(log.run, plan, {
				pair: mount(plan, mounted).pair,
				gearbox: mount(plan, mounted).gearbox.name,
			});
			const truth = truthOf(log, fit.circumference!);
			for (const name of ['rolloutM', 'growth', 'circumferenceM'] as const) {
				const {value, se} = fit.circumference![name];
				if (Math.abs(value - truth[name]) <= 2 * se) inside[name]++;
			}
		}
		for (const count of Object.values(inside)) {
			expect(count / logs).toBeGreaterThanOrEqual(least);
			expect(count / logs).toBeLessThanOrEqual(most);
		}
	});

	const truthOf = (log: GeneratedLog, fit: CircumferenceFit) => ({
		rolloutM: log.vehicle.rolloutM,
		growth: log.vehicle.growth,
		circumferenceM: at(log, fit.atMps),
	});
});

test('speeds too close together hold growth, and say so; the circumference there is found all the same', async () => {
	const {log, findings, plan} = await found({
		...tarrowdale,
		driving: {laps: 2},
		sensors: {rateHz: 2, rpmNoise: 40, speedNoiseMps: 0.4},
	});
	const fit = findings.circumference!;
	expect(fit.growthHeld).toBe(true);
	expect(fit.growth.value).toBeCloseTo(plan.base.vehicle.growth, 10);
	expect(findings.notes.map(({code}) => code)).toContain('growthHeld');
	expect(Math.abs(fit.circumferenceM.value / at(log, fit.atMps) - 1)).toBeLessThan(0.002);
	expect(Math.abs(fit.rolloutM.value - log.vehicle.rolloutM)).toBeLessThan(2 * fit.rolloutM.se);
});

test('slip is held: a log of a tire that slips more looks like a smaller circumference', async () => {
	const {findings, log} = await found({...hesperRidge, truth: {slip: 0.031}, driving: {laps: 4}});
	const fit = findings.circumference!;
	expect(fit.slipHeld).toBe(0.021);
	expect(fit.rolloutM.value / log.vehicle.rolloutM).toBeCloseTo(1.021 / 1.031, 3);
});
