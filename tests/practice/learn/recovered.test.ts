/**
 * From the text of a log to the numbers learned: circumference within 0.1 %, growth within 0.2 points, drag area within 2 %, in
 * logs with noise, wheelspin, gaps and strays, at several rates and in several units.
 */
import {expect, test} from 'vitest';
import {readLog} from '../../../source/logs/read-log.ts';
import {tellingMps} from '../../../source/practice/learn/anchor.ts';
import {learnFromFindings} from '../../../source/practice/learn/learn.ts';
import {findingsFor} from '../../../source/practice/learn/lesson.ts';
import {proposalsOf} from '../../../source/practice/learn/proposals.ts';
import {runs} from '../../runs.ts';
import {shippedCar, shippedTrack} from '../../tracks/demo.ts';
import {type Dialect, logAsCsv, plainDialect, usualColumns} from '../log-as-csv.ts';
import {generateLog, type LogWish} from '../log-generator.ts';
import {mount, named, samplePlan} from '../sample.ts';
import {demoDocuments, subjectOf} from './subject.ts';

const {time, distance, speed, rpm, throttle, lap} = usualColumns;
const kmh = {...speed, unit: 'km/h', perSi: 3.6};
const dialects: readonly Dialect[] = [
	plainDialect,
	{...plainDialect, delimiter: ';', decimal: ',', units: 'row', columns: {time, speed: kmh, rpm, throttle, lap}},
	{
		...plainDialect,
		delimiter: '\t',
		lineEnd: '\r\n',
		columns: {
			time,
			distance: {...distance, unit: 'm', perSi: 1},
			speed: {...speed, unit: 'm/s', perSi: 1, digits: 3},
			rpm,
			lap,
		},
	},
];
const worn = {spinning: 0.5, slipSpread: 0.0005} as const;
const sensed = {stray: 0.005, lost: 0.01} as const;

async function learnedAt(track: string, installed: string, wish: Partial<LogWish> & {seed: number}) {
	const plan = await samplePlan(track);
	const log = generateLog({plan, mounted: mount(plan, installed), ...wish});
	const text = logAsCsv(log.run, dialects[wish.seed % dialects.length]!);
	const reading = await readLog(
		(async function* () {
			yield new TextEncoder().encode(text);
		})(),
	);
	if (!reading.ok) throw new Error(JSON.stringify(reading.problems));
	const [car, at] = [await shippedCar('demo.json'), await shippedTrack(`${track}.json`)];
	const findings = findingsFor(car, at, reading.run, named(installed));
	if (!findings.ok) throw new Error('no plan');
	const uncertainties = {car: new Map(), track: new Map()};
	const learning = learnFromFindings({car, track: at, uncertainties}, findings.value);
	if (!learning.ok) throw new Error('no plan');
	return {log, plan, findings: findings.value, learning: learning.value};
}

const rates = [20, 25, 50, 100];

test.each([
	['an intermediate track, 30 laps', 'tarrowdale', '34/34 C', 30, true],
	['a short track, 30 laps', 'quillmere', '33/35 A', 30, false],
	['a road course, 6 laps', 'hesper-ridge', '33/35 A', 6, false],
] as const)(
	'%s, at 20 samples a second and more',
	async (_, track, installed, laps, tellsDrag) => {
		const seeds = Array.from({length: runs(8, 40)}, (__, i) => i + 1);
		for (const seed of seeds) {
			const wish = {seed, driving: {...worn, laps}, sensors: {...sensed, rateHz: rates[seed % rates.length]!}};
			const {log, plan, learning} = await learnedAt(track, installed, wish);
			const {circumference, anchor} = learning;
			expect(Math.abs(circumference!.rolloutM.value / log.vehicle.rolloutM - 1)).toBeLessThan(0.001);
			expect(Math.abs(circumference!.growth!.value - log.vehicle.growth)).toBeLessThan(0.002);
			if (!tellsDrag) continue;
			const truth = log.vehicle.dragAreaM2 / plan.base.vehicle.dragAreaM2;
			expect(Math.abs(anchor!.drag!.value / truth - 1)).toBeLessThan(0.02);
		}
	},
	300_000,
);

/** Not in the log: 20 laps at 10 samples a second know the circumference at standstill of an oval to 0.07 %, and say so. */
test('fewer samples know the circumference at standstill less well, and say so; at the speeds that were driven they know it', async () => {
	for (let seed = 1; seed <= runs(8, 40); seed++) {
		const wish = {seed, driving: {...worn, laps: 20}, sensors: {...sensed, rateHz: 10}};
		const {log, findings} = await learnedAt('tarrowdale', '34/34 C', wish);
		const {rolloutM, atMps, circumferenceM} = findings.circumference!;
		const {vehicle} = log;
		const truth = vehicle.rolloutM * (1 + vehicle.growth * (atMps / 44.704) ** 2);
		expect(rolloutM.se / rolloutM.value).toBeGreaterThan(0.0003);
		expect(Math.abs(rolloutM.value - vehicle.rolloutM)).toBeLessThan(4 * rolloutM.se);
		expect(Math.abs(circumferenceM.value / truth - 1)).toBeLessThan(0.0005);
	}
}, 300_000);

test('a straight that ends just at a shift, where a little more drag leaps over it, tells no drag', async () => {
	const wish = {seed: 4, driving: {...worn, laps: 6}, sensors: {...sensed, rateHz: 50}};
	const {learning} = await learnedAt('hesper-ridge', '33/35 A', wish);
	const ledge = learning.anchor!.straights.find(({reading}) => reading.name === 'Ledge')!;
	expect(ledge.perPercent.drag).toBeGreaterThan(tellingMps);
	expect(ledge.tells).toBeUndefined();
	expect(learning.anchor!.drag).toBeUndefined();
});

test('at one sample a second nothing is proposed that lies between two samples', async () => {
	const {learning, findings} = await learnedAt('tarrowdale', '34/34 C', {
		seed: 0,
		driving: {laps: 12},
		sensors: {rateHz: 1},
	});
	const documents = demoDocuments();
	const names = proposalsOf(subjectOf(documents), documents, learning, findings, 'us').map(({name}) => name);
	expect(names).toEqual(['rollout', 'growth', 'drag', 'minimum:Front', 'minimum:Back']);
	expect(findings.notes.find(({code}) => code === 'slowSampling')!.text).toContain(
		'so no exit speed and no highest RPM is proposed',
	);
});
