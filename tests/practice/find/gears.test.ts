import {describe, expect, test} from 'vitest';
import {sampleState} from '../../../source/practice/find/findings.ts';
import {found, hesperRidge, quillmere, type Sample, tarrowdale} from '../sample.ts';

const near = (read: number, truth: number) => Math.abs(read / truth - 1) < 0.02;

describe('gears are right in 99.5 % of the steady samples', () => {
	test.each([
		['a short track', 100, quillmere],
		['a short track', 10, quillmere],
		['an intermediate track', 50, tarrowdale],
		['an intermediate track', 1, tarrowdale],
		['a road course', 100, hesperRidge],
		['a road course', 20, hesperRidge],
		['a road course', 1, hesperRidge],
	] as [string, number, Sample][])('%s at %d samples a second', async (_, rateHz, sample) => {
		const {log, findings} = await found({...sample, sensors: {rateHz}, driving: {laps: 10, missed: 0.02, paceLaps: 1}});
		let [right, all] = [0, 0];
		for (const [i, moment] of log.moments.entries()) {
			const readable = near(log.run.rpm[i]!, moment.rpm) && near(log.run.speedMps[i]!, moment.speedMps);
			if (moment.power !== 'steady' || !readable) continue;
			all++;
			if (findings.samples.gear[i] === moment.gear) right++;
		}
		expect(all).toBeGreaterThan(100);
		expect(right / all).toBeGreaterThan(0.995);
	});
});

test('what counts as steady is in gear, at full throttle and without wheelspin', async () => {
	const {log, findings} = await found({...hesperRidge, driving: {laps: 6, spinning: 0.8, missed: 0.03}});
	const steady = log.moments.filter((_, i) => findings.samples.state[i] === sampleState.steady);
	expect(steady.length).toBeGreaterThan(5000);
	expect(steady.filter(({power}) => power !== 'steady').length / steady.length).toBeLessThan(0.003);
});

test('wheelspin is found where it was, and only there', async () => {
	const {log, findings} = await found({...hesperRidge, driving: {laps: 6, spinning: 0.4}});
	let [hit, spun, marked] = [0, 0, 0];
	for (const [i, moment] of log.moments.entries()) {
		const isSpin = findings.samples.state[i] === sampleState.spin;
		// Below 1.5 % it is within the noise of a gear.
		const strong = moment.power === 'spin' && moment.rpm / steadyRpm(log, i) > 1.015;
		if (isSpin) marked++;
		if (strong) spun++;
		if (strong && isSpin) hit++;
	}
	expect(hit / spun).toBeGreaterThan(0.95);
	const spinning = log.moments.filter(({power}) => power === 'spin').length;
	expect(marked).toBeLessThan(1.05 * spinning);
	expect(findings.wheelspin.spinning / findings.wheelspin.exits).toBeGreaterThan(0.25);
	expect(findings.wheelspin.spinning / findings.wheelspin.exits).toBeLessThan(0.55);
});

function steadyRpm({vehicle, train, moments}: Awaited<ReturnType<typeof found>>['log'], i: number): number {
	const {speedMps, gear} = moments[i]!;
	const circumference = vehicle.rolloutM * (1 + vehicle.growth * (speedMps / 44.704) ** 2);
	return (60 * speedMps * (1 + vehicle.slip) * train.overall[gear - 1]!) / circumference;
}

test('a gear column that counts from another end is said, and the ratio is used', async () => {
	const {findings} = await found({
		...hesperRidge,
		driving: {laps: 4},
		sensors: {gear: true},
		change: run => ({...run, gear: run.gear!.map(gear => (gear === 0 ? 0 : 6 - gear))}),
	});
	expect(findings.mounted.verdict).toBe('asInstalled');
	expect(findings.mounted.gearColumnAgrees!).toBeLessThan(0.7);
	expect(findings.notes.map(({code}) => code)).toContain('gearColumn');
});

test('a gear column that is right agrees', async () => {
	const {findings} = await found({...hesperRidge, driving: {laps: 4}, sensors: {gear: true}});
	expect(findings.mounted.gearColumnAgrees!).toBeGreaterThan(0.99);
});
