import {describe, expect, test} from 'vitest';
import {agreements} from '../../source/sharing/agreement.ts';
import {checkPlan, readPlanJson} from '../../source/sharing/check-plan.ts';
import {reduceCar} from '../../source/sharing/reduce-car.ts';
import {statedResults} from '../../source/sharing/stated-results.ts';
import {carDocument, date, ground, samplePlan, trackDocument} from './sample.ts';

const plan = await samplePlan();

describe('a plan', () => {
	test('holds the track as it was written, and the choice', () => {
		expect(plan.track).toEqual(trackDocument);
		expect(plan).toMatchObject({kind: 'plan', version: 1, date, pair: '34/37', gearbox: 'A', engine: 'Open'});
	});

	test('holds of the car one engine, the sets and pairs it speaks of, and the rules of this type of track', () => {
		const car = plan.car as typeof carDocument;
		expect(car.engines.map(({name}) => name)).toEqual(['Open']);
		expect(car.gearboxes.map(({name}) => name)).toEqual(['A']);
		expect(car.rack.pairs.map(({driving}) => driving)).toEqual([33, 34]);
		expect(car.rack.toothSums).toEqual([71]);
		expect(car.rules).toEqual({short: {pairs: ['33/38', '34/37']}});
		expect(car.mass).toBe('3650 lb');
	});

	test('keeps sets and pairs that the track names, since planning looks them up', () => {
		const track = {
			...trackDocument,
			rules: {gearboxes: ['B']},
			straights: [{name: 'Front', exit: '88 mph', measured: {end: '100 mph', pair: '36/36'}}],
		};
		const car = reduceCar(carDocument, track, {pair: '34/37', gearbox: 'A', engine: 'Open'}) as typeof carDocument;
		expect(car.gearboxes.map(({name}) => name)).toEqual(['A', 'B']);
		expect(car.rack.pairs.map(({driving}) => driving)).toEqual([33, 34, 36]);
	});

	test('states the highest RPM of each situation as the limit check finds it', async () => {
		const {row} = await ground();
		const highest = Math.max(...plan.results.highest.map(({rpm}) => rpm));
		expect(plan.results.highest.map(({situation}) => situation)).toEqual(row.situations.map(({name}) => name));
		expect(highest).toBe(Math.ceil(row.checks.find(({check}) => check === 'limit')!.value! - 1e-6));
	});

	test('gives the same numbers when its own car and track are run again', async () => {
		const again = await ground(plan.track, plan.car);
		const restart = plan.results.restart;
		const compared = agreements(plan.results, statedResults(again.row, again.setting, restart));
		expect(compared.length).toBeGreaterThan(8);
		expect(compared.filter(({agrees}) => !agrees)).toEqual([]);
	});

	test('is accepted by its reader, as JSON too', async () => {
		expect(await readPlanJson(JSON.stringify(plan))).toMatchObject({ok: true, plan});
	});
});

describe('what is no plan', () => {
	const problemsOf = async (change: object) => {
		const reading = await checkPlan({...plan, ...change});
		return reading.ok ? [] : reading.problems.map(({path}) => path);
	};

	test.each([
		['kind', {kind: 'track'}],
		['version', {version: 2}],
		['date', {date: '14.6.2025'}],
		['date', {date: '2025-13-01'}],
		['pair', {pair: '31/40'}],
		['gearbox', {gearbox: 'B'}],
		['engine', {engine: 'Restricted'}],
		['extra', {extra: 1}],
		['notes', {notes: 'x'.repeat(2001)}],
		['results.limit', {results: {highest: plan.results.highest, shifts: []}}],
		['car.rack.pairs[0]', {car: {...plan.car, rack: {pairs: [null]}}}],
		['track.straights[0].exit', {track: {...plan.track, straights: [{name: 'Front', exit: 88}]}}],
	])('is named by its path: %s', async (path, change) => {
		expect(await problemsOf(change)).toContain(path);
	});
});

test('numbers one apart agree, gears and more do not', () => {
	const other = {...plan.results, pitRoad: {gear: 3, rpm: plan.results.pitRoad!.rpm + 1, tolerance: 1}};
	const differing = agreements(plan.results, other).filter(({agrees}) => !agrees);
	expect(differing.map(({what}) => what)).toEqual(['pit-road gear', 'pit-road RPM with tolerance']);
});
