import {describe, expect, test} from 'vitest';
import {found, hesperRidge} from '../sample.ts';

describe('shifts', () => {
	test('are made where the driver made them, with his spread', async () => {
		const {findings} = await found({
			...hesperRidge,
			driving: {laps: 10, shiftRpm: 8700, shiftSpreadRpm: 60},
			sensors: {rateHz: 100},
		});
		expect(findings.shifts.map(({from}) => from)).toEqual([2, 3, 4]);
		for (const {rpm, timeS} of findings.shifts.slice(0, 2)) {
			expect(rpm.count).toBeGreaterThan(20);
			expect(Math.abs(rpm.median - 8700)).toBeLessThan(50);
			expect(rpm.sd!).toBeGreaterThan(30);
			expect(rpm.sd!).toBeLessThan(120);
			expect(timeS.median).toBeGreaterThan(0.05);
			expect(timeS.median).toBeLessThan(0.13);
		}
	});

	test('that were missed are listed, each of them and no other', async () => {
		const {findings, log} = await found({...hesperRidge, seed: 4, driving: {laps: 10, missed: 0.06}});
		const missed = log.passes.filter(({missedShift}) => missedShift);
		expect(missed.length).toBeGreaterThan(5);
		const listed = findings.events.filter(({kind}) => kind === 'missedShift');
		for (const pass of missed) {
			expect(listed.some(({timeS}) => timeS > pass.startS && timeS < pass.startS + 12)).toBe(true);
		}
		for (const event of listed) {
			expect(missed.some(({startS}) => event.timeS > startS && event.timeS < startS + 12)).toBe(true);
			expect([event.from! + 1, undefined]).toContain(event.into);
			expect(event.rpm).toBeGreaterThan(9000);
			expect(event.forS).toBeGreaterThan(event.into === undefined ? 0.08 : 0.5);
		}
	});

	test('with a lift of the throttle do not end the straight', async () => {
		const flat = await found({...hesperRidge, driving: {laps: 4}});
		const lifting = await found({...hesperRidge, driving: {laps: 4, shiftThrottle: 0.1}});
		const counts = ({findings}: typeof flat) =>
			findings.straights.map(({passes, exitGear, endGear}) => [passes, exitGear, endGear]);
		expect(counts(lifting)).toEqual(counts(flat));
		expect(lifting.findings.shifts.map(({from, rpm}) => [from, rpm])).toEqual(
			flat.findings.shifts.map(({from, rpm}) => [from, rpm]),
		);
	});

	test('that went well give no events', async () => {
		const {findings} = await found({...hesperRidge, driving: {laps: 6}});
		expect(findings.events).toEqual([]);
	});
});

test('an early downshift over the limit is listed as one', async () => {
	const {findings} = await found({
		...hesperRidge,
		driving: {laps: 4},
		change: run => {
			const at = run.throttle!.findIndex((throttle, i) => i > 9000 && throttle < 0.1);
			return {...run, rpm: run.rpm.map((rpm, i) => (i >= at + 3 && i < at + 15 ? 9600 : rpm))};
		},
	});
	expect(findings.events.map(({kind, rpm}) => ({kind, rpm}))).toEqual([{kind: 'downshift', rpm: 9600}]);
});

test('one stray reading over the limit is no over-rev, and not the highest RPM', async () => {
	const {findings} = await found({
		...hesperRidge,
		driving: {laps: 4},
		change: run => ({...run, rpm: run.rpm.map((rpm, i) => (i === 9000 ? 12_000 : rpm))}),
	});
	expect(findings.events).toEqual([]);
	expect(findings.highestRpm!.value).toBeLessThan(9000);
});

test('distance on the limiter is that of the log', async () => {
	const {findings, log} = await found({track: 'tarrowdale', mounted: '32/36 A', driving: {laps: 8}});
	const {limiterRpm} = log.vehicle;
	const held = log.moments.filter(({rpm, power}) => power === 'steady' && rpm > limiterRpm - 5).length * 0.02;
	expect(held).toBeGreaterThan(10);
	expect(Math.abs(findings.limiter.timeS / held - 1)).toBeLessThan(0.1);
	expect(findings.limiter.passes).toBeGreaterThan(10);
	expect(findings.straights[0]!.limiterM!.median).toBeGreaterThan(50);
});

test('without a limiter in reach, none of it', async () => {
	const {findings} = await found({...hesperRidge, driving: {laps: 4}});
	expect(findings.limiter).toEqual({rpm: 9000, distanceM: 0, timeS: 0, passes: 0});
});
