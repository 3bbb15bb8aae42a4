import {readFileSync} from 'node:fs';
import {describe, expect, test} from 'vitest';
import {withEdits} from '../../../source/documents/edits.ts';
import type {JsonObject} from '../../../source/documents/json.ts';
import type {Vehicle} from '../../../source/drivetrain/straight.ts';
import {acceptEdits} from '../../../source/practice/learn/accept.ts';
import {learnFromFindings} from '../../../source/practice/learn/learn.ts';
import {findingsFor} from '../../../source/practice/learn/lesson.ts';
import {proposalsOf} from '../../../source/practice/learn/proposals.ts';
import {fittedLines} from '../../../source/text/learned-words.ts';
import {runs} from '../../runs.ts';
import {shippedCar, shippedTrack} from '../../tracks/demo.ts';
import {generateLog, type LogWish} from '../log-generator.ts';
import {mount, named, samplePlan} from '../sample.ts';
import {demoDocuments, subjectOf} from './subject.ts';

/** A log of a car with so many times the documents' grip, and what is learned from it. */
async function learnedWith(
	track: string,
	installed: string,
	truth: (documented: Vehicle) => Partial<Vehicle>,
	wish: Partial<LogWish> = {},
) {
	const plan = await samplePlan(track);
	const vehicle = truth(plan.base.vehicle);
	const log = generateLog({
		seed: 1,
		plan,
		mounted: mount(plan, installed),
		driving: {laps: 8},
		...wish,
		truth: vehicle,
	});
	const [car, at] = [await shippedCar('demo.json'), await shippedTrack(`${track}.json`)];
	const findings = findingsFor(car, at, log.run, named(installed));
	if (!findings.ok) throw new Error('no plan');
	const subject = {car, track: at, uncertainties: {car: new Map(), track: new Map()}};
	const learning = learnFromFindings(subject, findings.value, log.run);
	if (!learning.ok) throw new Error('no plan');
	return {subject, findings: findings.value, learning: learning.value, run: log.run};
}

const times = (grip: number) => (vehicle: Vehicle) => ({
	rolloutM: 1.004 * vehicle.rolloutM,
	growth: 0.0135,
	dragAreaM2: 1.04 * vehicle.dragAreaM2,
	grip: grip * vehicle.grip,
});

describe('a known grip is recovered within 2 %, and within two of its own standard errors and a little', () => {
	test.each([
		['a short track on worn tires', 'quillmere', '33/35 A', 0.9],
		['a short track in the wet', 'quillmere', '33/35 A', 0.6],
		['a road course as its document says', 'hesper-ridge', '33/35 A', 1],
		['a road course with less', 'hesper-ridge', '33/35 A', 0.8],
		['a road course with more', 'hesper-ridge', '33/35 A', 1.1],
	] as const)('%s', async (_, track, installed, grip) => {
		for (let seed = 1; seed <= runs(2, 20); seed++) {
			const rateHz = [20, 50, 100][seed % 3]!;
			const {learning} = await learnedWith(track, installed, times(grip), {seed, sensors: {rateHz}});
			const {value, se} = learning.grip!.factor!;
			expect(Math.abs(value / grip - 1)).toBeLessThan(0.02);
			expect(Math.abs(value - grip)).toBeLessThan(3 * se);
			expect(se).toBeLessThan(0.02);
		}
	});
});

test('a fast track with grip to spare says nothing of it, and the learning is what it was without', async () => {
	const {subject, findings, learning} = await learnedWith('tarrowdale', '34/34 C', times(1));
	expect(learning.grip).toEqual({factor: undefined, straights: [], untold: []});
	expect(fittedLines(learning)).toContain('No exit is held by grip: the log says nothing about how much there is.');
	const without = learnFromFindings(subject, findings);
	expect(without.ok && {...without.value, grip: learning.grip}).toEqual(learning);
});

test('an engine that gives less is not taken for a tire that does', async () => {
	const weak = (vehicle: Vehicle) => ({torqueNm: scaled(vehicle, 0.95)});
	const {learning} = await learnedWith('quillmere', '33/35 A', weak);
	expect(learning.anchor?.power?.value).toBeCloseTo(0.95, 1);
	expect(learning.grip?.factor).toBeUndefined();
});
const scaled = ({torqueNm}: Vehicle, by: number): Vehicle['torqueNm'] => ({
	...torqueNm,
	coefficients: torqueNm.coefficients.map(one => one * by) as typeof torqueNm.coefficients,
	last: torqueNm.last * by,
});

test('at one sample a second it is said that the samples cannot tell', async () => {
	const {learning} = await learnedWith('quillmere', '33/35 A', times(0.6), {sensors: {rateHz: 1}});
	expect(learning.grip?.factor).toBeUndefined();
	expect(learning.grip?.untold.length).toBeGreaterThan(0);
	expect(fittedLines(learning).join(' ')).toMatch(/seems to hold the exit of .+, but the samples cannot tell/);
});

test('it is proposed as a field of the track with its uncertainty, accepted and read back', async () => {
	const {learning, findings} = await learnedWith('quillmere', '33/35 A', times(0.8));
	const documents = {...demoDocuments(), track: quillmereDocument()};
	const subject = subjectOf(documents);
	const grip = proposalsOf(subject, documents, learning, findings, 'us').find(({name}) => name === 'grip')!;
	expect(grip.rows).toEqual([
		{
			label: 'grip',
			document: 'track',
			path: ['car', 'grip'],
			before: undefined,
			now: '1.15',
			value: expect.stringMatching(/^0\.9\d+ ± 0\.00\d+$/),
		},
	]);
	const edits = acceptEdits([grip], documents, {from: learning.from, date: '2026-05-31'});
	const after = subjectOf({...documents, track: withEdits(documents.track, edits.track)});
	expect(after.track.car.grip! / 1.15).toBeCloseTo(0.8, 1);
	expect(after.uncertainties.track.get('car.grip')).toBeGreaterThan(0.001);
});

function quillmereDocument(): JsonObject {
	return JSON.parse(readFileSync(new URL('../../../tracks/quillmere.json', import.meta.url), 'utf8'));
}
