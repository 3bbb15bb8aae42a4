import {describe, expect, test} from 'vitest';
import {band} from '../../../source/planning/checks/band.ts';
import {restart} from '../../../source/planning/checks/restart.ts';
import {afterShift, settle} from '../../../source/planning/checks/shifts.ts';
import {rpmAt} from '../../../source/planning/run-place.ts';
import {car, engine, mph, track} from '../build.ts';
import {type Change, fakeRow, fakeRun, groundOf, planOf, shift} from '../fake-row.ts';

const plan = planOf();
const ground = groundOf(plan);
const low = plan.band.lowRpm;
const of = (change: Change) => band(fakeRow(plan, [change]), ground)!;

describe('band', () => {
	test('passes at the bottom of the band and is near just below it', () => {
		expect(of({result: {exitRpm: low}})).toMatchObject({verdict: 'pass', value: low, bound: low, margin: 0});
		expect(of({result: {exitRpm: low - 0.5}})).toMatchObject({verdict: 'near', margin: -0.5, at: 'Front exit'});
	});

	test('passes below the band where grip is the limit', () => {
		const spun = of({result: {exitRpm: low - 500}, spareGripN: {exit: -1, minimum: -1}});
		expect(spun).toMatchObject({
			verdict: 'pass',
			value: low - 500,
			remark: 'below the band, but grip is the limit there',
		});
	});

	test('is near below the RPM from which the engine pulls, whatever the grip', () => {
		const held = {exit: -1, minimum: -1};
		expect(of({result: {exitRpm: 4000}, spareGripN: held}).verdict).toBe('pass');
		expect(of({result: {exitRpm: 3999}, spareGripN: held}).verdict).toBe('near');
	});

	test('is bound by the pulling RPM where that is above the band', () => {
		const late = planOf(car({engines: [engine({pullRpm: 8000})]}));
		const check = band(fakeRow(late, [{result: {exitRpm: 7900}}]), groundOf(late))!;
		expect(check).toMatchObject({verdict: 'near', bound: 8000, margin: -100});
	});

	test('looks at the minimum too', () => {
		expect(of({result: {minimumRpm: low - 100, minimumSpeedMps: 30}})).toMatchObject({
			verdict: 'near',
			at: 'Front minimum',
		});
	});

	test('fails a car that stops before the end', () => {
		expect(of({state: 'stops'})).toMatchObject({
			verdict: 'fail',
			value: null,
			bound: null,
			at: 'Front exit',
			remark: 'stops before the end',
		});
	});
});

describe('afterShift', () => {
	const entering = (rpmAfter: number) => afterShift(fakeRow(plan, [{result: {shifts: [shift({rpmAfter})]}}]), ground)!;

	test('passes at the bottom of the band and is near just below it', () => {
		expect(entering(low)).toMatchObject({verdict: 'pass', margin: 0, at: 'Front shift 3-4'});
		expect(entering(low - 0.5)).toMatchObject({verdict: 'near', value: low - 0.5, bound: low, margin: -0.5});
	});

	test('does not apply without a shift', () => {
		expect(afterShift(fakeRow(plan), ground)).toBeUndefined();
	});
});

describe('settle', () => {
	const at = (timeS: number, leftS: number) =>
		settle(fakeRow(plan, [{result: {shifts: [shift({timeS, leftS})]}}]), ground)!;

	test('passes at 0.6 s after the exit and 0.5 s before the end', () => {
		expect(at(0.6, 0.5)).toMatchObject({verdict: 'pass', margin: 0});
	});

	test('is near below either, and shows the one with the lesser margin', () => {
		expect(at(0.59, 2)).toMatchObject({verdict: 'near', value: 0.59, bound: 0.6, remark: 'after the exit'});
		expect(at(2, 0.49)).toMatchObject({verdict: 'near', value: 0.49, bound: 0.5, remark: 'before the end'});
		expect(at(0.5, 0.2)).toMatchObject({value: 0.2, bound: 0.5});
	});
});

describe('restart', () => {
	const run = (change: Change) => {
		const row = fakeRow(plan);
		const situations = [{...row.situations[0]!, restart: fakeRun(plan, -1, change)}];
		return restart({...row, situations}, ground);
	};
	const overall = fakeRow(plan).candidate.train.overall;

	test('is the RPM at pace speed without slip in the gear of the restart, with the band for its bound', () => {
		const rpm = rpmAt(plan.base.vehicle, overall[1]!, 50 * mph, 0);
		expect(run({result: {exitGear: 2}})).toMatchObject({value: rpm, bound: low, at: 'restart', situation: 'Base'});
		expect(rpm).toBeGreaterThan(4000);
	});

	test('is near below the band with grip to spare, passes where grip is the limit, fails where the car stops', () => {
		expect(run({result: {exitGear: 2}})!.verdict).toBe('near');
		expect(run({result: {exitGear: 2}, spareGripN: {exit: -1, minimum: -1}})!.verdict).toBe('pass');
		expect(run({state: 'stops'})!.verdict).toBe('fail');
	});

	test('does not apply to a track without one', () => {
		expect(restart(fakeRow(planOf(car(), track({restart: undefined}))), ground)).toBeUndefined();
	});
});
