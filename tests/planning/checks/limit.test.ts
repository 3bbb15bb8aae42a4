import {describe, expect, test} from 'vitest';
import {candidateOf} from '../../../source/planning/candidates.ts';
import {limit} from '../../../source/planning/checks/limit.ts';
import {limiter} from '../../../source/planning/checks/limiter.ts';
import type {MeasuredPoint} from '../../../source/planning/measured.ts';
import {rpmAt} from '../../../source/planning/run-place.ts';
import {car, rackPair, track} from '../build.ts';
import {type Change, fakeRow, fakeRun, groundOf, planOf, shift} from '../fake-row.ts';

const plan = planOf(car(), track({restart: undefined}));
const ground = groundOf(plan);
const of = (...straights: Change[]) => limit(fakeRow(plan, straights), ground)!;

describe('limit, 9200 here', () => {
	test('passes with the margin of 100 rpm in hand, is near below it, fails above the limit', () => {
		expect(of({result: {endRpm: 9100}})).toMatchObject({verdict: 'pass', value: 9100, bound: 9200, margin: 100});
		expect(of({result: {endRpm: 9100.5}})).toMatchObject({verdict: 'near', margin: 99.5});
		expect(of({result: {endRpm: 9200}})).toMatchObject({verdict: 'near', margin: 0});
		expect(of({result: {endRpm: 9200.5}})).toMatchObject({verdict: 'fail', margin: -0.5});
	});

	test('takes the rounding of a speed at the limit for the limit', () => {
		expect(of({result: {endRpm: 9200.000000000002}}).verdict).toBe('near');
		expect(of({result: {shifts: [shift({rpm: 9100.000000000004})]}}).verdict).toBe('pass');
	});

	test('asks for half the margin once the track is anchored', () => {
		const row = fakeRow(plan, [{result: {endRpm: 9150}}]);
		expect(limit(row, ground)!.verdict).toBe('near');
		expect(limit(row, groundOf(plan, {anchored: true}))!.verdict).toBe('pass');
		const closer = fakeRow(plan, [{result: {endRpm: 9150.5}}]);
		expect(limit(closer, groundOf(plan, {anchored: true}))!.verdict).toBe('near');
	});

	test('looks at exit, minimum, shifts, end, and what the end would be without the limiter', () => {
		expect(of({result: {exitRpm: 9050}})).toMatchObject({value: 9050, at: 'Front exit', situation: 'Base'});
		expect(of({result: {minimumRpm: 9051}})).toMatchObject({value: 9051, at: 'Front minimum'});
		expect(of({result: {shifts: [shift({rpm: 9052})]}})).toMatchObject({value: 9052, at: 'Front shift 3-4'});
		expect(of({}, {result: {endRpm: 9053}})).toMatchObject({value: 9053, at: 'Back end'});
		const pushedTo = {sequence: {...sequence, reachRpm: 9500}};
		expect(of(pushedTo)).toMatchObject({verdict: 'fail', value: 9500, at: 'Front end', remark: 'without the limiter'});
	});

	test('fails an exit above every gear’s limit, against the lower of limiter and limit', () => {
		expect(of({state: 'overLimit', result: {exitRpm: 9300}})).toMatchObject({
			verdict: 'fail',
			value: 9300,
			bound: 9200,
			margin: -100,
			at: 'Front exit',
		});
	});

	test('counts the restart’s end, but not what it would reach without the limiter', () => {
		const withRestart = planOf();
		const row = fakeRow(withRestart);
		const restart = fakeRun(withRestart, -1, {result: {endRpm: 9190}, sequence: {...sequence, reachRpm: 9900}});
		const checked = limit({...row, situations: [{...row.situations[0]!, restart}]}, groundOf(withRestart))!;
		expect(checked).toMatchObject({verdict: 'near', value: 9190, at: 'restart end'});
	});

	test('counts a measured speed in the row’s own end gear, and a measured RPM for the row it was seen with', () => {
		const point: MeasuredPoint = {
			index: 0,
			straight: 'Front',
			speedMps: 60,
			rpm: 9180,
			candidate: candidateOf(plan.car, rackPair(33, 38), plan.car.gearboxes[0]!),
			gear: 4,
			model: undefined,
		};
		const measured = groundOf(plan, {measured: [point]});
		expect(limit(fakeRow(plan), measured)).toMatchObject({value: 9180, at: 'Front measured'});
		const other = candidateOf(plan.car, rackPair(29, 42), plan.car.gearboxes[0]!);
		const rpm = rpmAt(plan.base.vehicle, other.train.overall[3]!, 60);
		expect(limit(fakeRow(plan, [], {candidate: other}), measured)).toMatchObject({value: rpm, at: 'Front measured'});
	});

	test('names the situation of the worst', () => {
		const row = fakeRow(plan);
		const tow = plan.conditions[1]!;
		const places = [fakeRun(plan, 0, {result: {endRpm: 9199}}, tow), fakeRun(plan, 1, {}, tow)];
		const both = {...row, situations: [...row.situations, {condition: tow, places, restart: undefined}]};
		expect(limit(both, ground)).toMatchObject({value: 9199, situation: 'In the tow'});
	});
});

describe('limiter', () => {
	const held = (limiterM: number, change: Change = {}) =>
		limiter(fakeRow(plan, [{...change, result: {limiterM}}]), ground)!;

	test('fails for any distance, and passes without', () => {
		expect(held(0)).toMatchObject({verdict: 'pass', value: 0, bound: 0, margin: 0});
		expect(held(0.1)).toMatchObject({verdict: 'fail', value: 0.1, margin: -0.1, at: 'Front end'});
	});

	test('fails a car that a grade pushes past it', () => {
		expect(held(0, {sequence: {...sequence, pushed: true}}).verdict).toBe('fail');
	});

	test('does not apply where no straight has a length', () => {
		expect(limiter(fakeRow(plan, [{state: 'held'}, {state: 'held'}]), ground)).toBeUndefined();
	});
});

const sequence = {
	firstGear: 4,
	lastGear: 4,
	timeS: 6,
	topMps: 55,
	topGear: 4,
	topRpm: 8500,
	finalMps: 40,
	limiterM: 0,
	reachRpm: 8500,
	shifts: [],
	slows: false,
	entryMissed: false,
	pushed: false,
};
