import {describe, expect, test} from 'vitest';
import {withEdits} from '../../../source/documents/edits.ts';
import {harmonicRolloutM} from '../../../source/drivetrain/tire.ts';
import {planFor} from '../../../source/planning/plan.ts';
import {carAt} from '../../../source/planning/situations.ts';
import {findInLog} from '../../../source/practice/find/find-in-log.ts';
import {acceptEdits} from '../../../source/practice/learn/accept.ts';
import {candidateFor, type Learning, learnFromFindings, type Subject} from '../../../source/practice/learn/learn.ts';
import {proposalsOf} from '../../../source/practice/learn/proposals.ts';
import {runs} from '../../runs.ts';
import {type GeneratedLog, generateLog, type LogWish} from '../log-generator.ts';
import {demoDocuments, subjectOf} from './subject.ts';

const documents = demoDocuments();
/** The demo with what the generated logs are driven with. */
const car = {...documents.car, installed: {pair: '34/35', gearbox: 'C'}};
const written = {...documents, car};
const demo = subjectOf(written);
const mounted = candidateFor(demo.car, undefined, undefined);
const planned = planFor(demo.car, demo.track);
if (!mounted.ok || !planned.ok) throw new Error('the demo has no plan');

const logged = (wish: Partial<LogWish> & {seed: number}): GeneratedLog =>
	generateLog({plan: planned.value, mounted: mounted.value, ...wish});
const findingsOf = ({run}: GeneratedLog) => findInLog(run, planned.value);
function learned(log: GeneratedLog, subject: Subject = demo): Learning {
	const outcome = learnFromFindings(subject, findingsOf(log));
	if (!outcome.ok) throw new Error('no plan');
	return outcome.value;
}

describe('a logged run of a car with 6 % more drag, 0.6 % more rollout and more growth than its documents say', () => {
	const log = logged({seed: 11});
	const learning = learned(log);
	const plan = planned.value.base.vehicle;

	test('gives back the circumference within 0.1 % and the drag within 2 %', () => {
		expect(Math.abs(learning.circumference!.rolloutM.value / log.vehicle.rolloutM - 1)).toBeLessThan(0.001);
		const dragM2 = learning.anchor!.drag!.value * plan.dragAreaM2;
		expect(Math.abs(dragM2 / log.vehicle.dragAreaM2 - 1)).toBeLessThan(0.02);
		expect(learning.circumference?.growth?.value).toBeCloseTo(log.vehicle.growth, 2);
	});

	test('is then reproduced: end speeds within 0.2 mph, RPM within 20, times within 0.02 s', () => {
		expect(learning.compared.map(({reading}) => reading.name)).toEqual(['Front', 'Back']);
		for (const {reading, before, after} of learning.compared) {
			expect(Math.abs(after!.endMps - reading.endMps!.value)).toBeLessThan(0.09);
			expect(Math.abs(after!.endRpm - reading.endRpm!.value)).toBeLessThan(20);
			expect(Math.abs(after!.timeS! - reading.timeS!.value)).toBeLessThan(0.02);
			expect(Math.abs(before!.endMps - reading.endMps!.value)).toBeGreaterThan(0.4);
		}
	});

	test('is told with what it was learned from', () => {
		expect(learning).toMatchObject({source: 'log', from: 'practice, 20 laps', held: undefined});
	});

	test('proposes growth for the car, and all else for the track', () => {
		const rows = proposalsOf(demo, written, learning, findingsOf(log), 'us').flatMap(({rows}) => rows);
		expect(rows.filter(({document}) => document === 'car').map(({label}) => label)).toEqual(['growth at 100 mph']);
		expect(rows.map(({label}) => label)).toEqual([
			'rollout left',
			'rollout right',
			'growth at 100 mph',
			'drag area',
			'exit Front',
			'minimum Front',
			'exit Back',
			'minimum Back',
			'measured speed Front',
			'measured RPM Front',
			'measured with pair Front',
			'measured speed Back',
			'measured RPM Back',
			'measured with pair Back',
		]);
	});

	test('once accepted, has the documents say what the car is', () => {
		const proposals = proposalsOf(demo, written, learning, findingsOf(log), 'us');
		const edits = acceptEdits(proposals, written, {from: learning.from, date: '2026-05-02'});
		const after = subjectOf({track: withEdits(written.track, edits.track), car: withEdits(written.car, edits.car)});
		const {tires, dragAreaM2} = carAt(after.track, after.car);
		expect(harmonicRolloutM(tires.leftM, tires.rightM) / log.vehicle.rolloutM).toBeCloseTo(1, 2);
		expect(dragAreaM2 / log.vehicle.dragAreaM2).toBeCloseTo(1, 2);
		expect(after.uncertainties.track.get('straights[0].exit')).toBeGreaterThan(0.2);
	});
});

test('drag is within 2 % and its standard error honest over many logs', () => {
	const seeds = Array.from({length: runs(12, 200)}, (_, i) => 100 + i);
	let inside = 0;
	for (const seed of seeds) {
		const log = logged({seed, driving: {laps: 12}});
		const {value, se} = learned(log).anchor!.drag!;
		const truth = log.vehicle.dragAreaM2 / planned.value.base.vehicle.dragAreaM2;
		expect(Math.abs(value / truth - 1)).toBeLessThan(0.02);
		if (Math.abs(value - truth) <= 2 * se) inside++;
	}
	expect(inside / seeds.length).toBeGreaterThanOrEqual(0.9);
}, 300_000);

test('a log of another car teaches nothing and says so', () => {
	const log = logged({seed: 3});
	const rack = {
		pairs: [
			{driving: 34, driven: 35},
			{driving: 34, driven: 34},
		],
	};
	const gearboxes = [{name: 'C', ratios: [2.94, 2.07, 1.57, 1.2, 0.94]}];
	const {rules: _, ...alone} = car as {rules?: unknown} & typeof car;
	const other = subjectOf({...written, car: {...alone, rack, gearboxes, finalDrive: 5.6}});
	const plan = planFor(other.car, other.track);
	if (!plan.ok) throw new Error('no plan');
	const findings = findInLog(log.run, plan.value);
	const outcome = learnFromFindings(other, findings);
	expect(outcome.ok && [outcome.value.circumference, outcome.value.anchor]).toEqual([undefined, undefined]);
	expect(findings.notes.map(({code}) => code)).toContain('wrongCar');
});
