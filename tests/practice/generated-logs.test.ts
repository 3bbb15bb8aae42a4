/** That the generator is worth being believed: its motion is the solver's, though it has none of it, and its logs are the same each time. */
import {describe, expect, test} from 'vitest';
import {runStraightPlainly} from '../../source/drivetrain/run-straight.ts';
import {logAsCsv, plainDialect, usualColumns} from './log-as-csv.ts';
import {generateLog, type LogWish} from './log-generator.ts';
import {hesperRidge, mount, quillmere, samplePlan, tarrowdale} from './sample.ts';

const exact = {slipSpread: 0, spinning: 0, laps: 3} as const;

describe('full throttle agrees with the solver to 1e-5', () => {
	test.each([quillmere, tarrowdale])('on straights of one gear: $track', async ({track, mounted}) => {
		const plan = await samplePlan(track);
		const log = generateLog({seed: 2, plan, mounted: mount(plan, mounted), driving: exact});
		const driven = log.passes.filter(({kind}) => kind === 'good');
		expect(driven.length).toBeGreaterThan(4);
		for (const pass of driven) {
			const course = plan.base.places[pass.straight]!.courses.get(log.train.overall.length)!;
			const gear = log.moments.find(({timeS}) => timeS >= pass.startS)!.gear;
			const free = {entryMps: undefined, brakingMps2: undefined, lowestGear: gear, highestGear: gear};
			const only = {...course, ...free, exitMps: pass.exitMps, lengthM: pass.lengthM};
			const run = runStraightPlainly(log.vehicle, log.train, only);
			expect(run.kind).toBe('ran');
			if (run.kind === 'ran') expect(Math.abs(run.fastest.finalMps / pass.endMps - 1)).toBeLessThan(1e-5);
		}
	});
});

test('the same wish gives the same log, another seed another', async () => {
	const plan = await samplePlan('hesper-ridge');
	const wish: LogWish = {seed: 1, plan, mounted: mount(plan, hesperRidge.mounted), driving: {laps: 1}};
	const text = logAsCsv(generateLog(wish).run);
	expect(logAsCsv(generateLog(wish).run)).toBe(text);
	expect(logAsCsv(generateLog({...wish, seed: 2}).run)).not.toBe(text);
});

test('a log is written in any dialect', async () => {
	const plan = await samplePlan('quillmere');
	const wish: LogWish = {seed: 1, plan, mounted: mount(plan, '33/35 A'), sensors: {rateHz: 10, gear: true}};
	const {run} = generateLog({...wish, driving: {laps: 1}});
	const {time, speed, gear, distance} = usualColumns;
	const kmh = {...speed, unit: 'km/h', perSi: 3.6, digits: 1};
	const columns = {time, distance, speed: kmh, gear};
	const lines = logAsCsv(run, {...plainDialect, delimiter: ';', decimal: ',', units: 'row', columns}).split('\n');
	expect(lines.slice(0, 4)).toEqual(['Time;Distance;Speed;Gear', 's;ft;km/h;', '0,00;0,0;48,6;3', '0,10;4,5;49,2;3']);
	expect(lines.length).toBe(run.samples + 3);
	expect(lines.at(-1)).toBe('');
});
