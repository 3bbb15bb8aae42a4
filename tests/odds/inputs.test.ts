import {expect, test} from 'vitest';
import {inputsOf} from '../../source/odds/inputs.ts';
import {nothingStated, type Stated} from '../../source/odds/stated.ts';
import {add, car, inch, mph, scale, situation, straight, track} from '../planning/build.ts';

const inputs = (stated: Stated = nothingStated, anchored = false, at = track()) =>
	inputsOf(car(), at, car().engines[0]!, anchored, stated);
const sdOf = (name: string, stated?: Stated, anchored?: boolean) =>
	inputs(stated, anchored).inputs.find(input => input.name === name)?.sd;

test('every number that is drawn has a default with its reason', () => {
	const all = inputs().inputs;
	expect(all.map(({name}) => name)).toEqual([
		'rollout',
		'slip',
		'drag area',
		'power',
		'growth',
		'grip',
		'air temperature',
		'air pressure',
		'drag in In the tow',
		'exit in In the tow',
		'exit in Long run',
		'exit of Front',
		'exit of Back',
	]);
	for (const {sd, why, source} of all) {
		expect(sd).toBeGreaterThan(0);
		expect(why.length).toBeGreaterThan(10);
		expect(source).toBe('default');
	}
});

test('what is stated takes the place of the default, as a share where the input is one', () => {
	const stated: Stated = {
		car: new Map([
			['tires.left', 0.1 * inch],
			['engines[0].power', 0.03],
			['mass', 10],
		]),
		track: new Map([
			['straights[1].exit', 2 * mph],
			['situations[0].drag', 0.05],
		]),
		situations: ['In the tow', 'Long run'],
	};
	expect(sdOf('rollout', stated)).toBeCloseTo(0.1 / 86.4, 9);
	expect(sdOf('power', stated)).toBeCloseTo(0.03, 12);
	expect(sdOf('mass', stated)).toBe(10);
	expect(sdOf('exit of Back', stated)).toBe(2 * mph);
	expect(sdOf('exit of Front', stated)).toBe(mph);
	expect(sdOf('drag in In the tow', stated)).toBe(0.05);
	expect(inputs(stated).notDrawn).toEqual([]);
});

test('the track has the word on what it replaces', () => {
	const at = track({car: {...track().car, grip: 1}});
	const stated: Stated = {...nothingStated, car: new Map([['grip', 0.5]]), track: new Map([['car.grip', 0.1]])};
	const found = inputsOf({...car(), grip: 1}, at, car().engines[0]!, false, stated);
	expect(found.inputs.find(({name}) => name === 'grip')).toMatchObject({sd: 0.1, source: 'stated'});
});

test('where the track is anchored, drag, power, slip and growth are known better', () => {
	for (const name of ['drag area', 'power', 'slip', 'growth'])
		expect(sdOf(name, nothingStated, true)!).toBe(sdOf(name, nothingStated, false)! / 2);
	expect(sdOf('rollout', nothingStated, true)).toBe(sdOf('rollout'));
});

test('what is stated and not drawn is told', () => {
	const stated: Stated = {...nothingStated, track: new Map([['pitRoad.limit', 1]])};
	expect(inputs(stated).notDrawn).toEqual(['track: pitRoad.limit']);
});

test('wind is drawn where it blows on a straight whose heading is known', () => {
	const windy = track({wind: {speedMps: 4, fromRad: 1}, straights: [straight('Front', {headingRad: 0})]});
	expect(inputs(nothingStated, false, windy).inputs.map(({name}) => name)).toContain('wind direction');
	const unknown = track({wind: {speedMps: 4, fromRad: 1}});
	expect(inputs(nothingStated, false, unknown).inputs.map(({name}) => name)).not.toContain('wind speed');
});

test('a tow is uncertain by a fifth of its change, a change of the exit by half a mile an hour', () => {
	const at = track({situations: [situation('Base'), situation('Tow', {drag: scale(0.9), exit: add(2)})]});
	const found = inputs(nothingStated, false, at).inputs;
	expect(found.find(({name}) => name === 'drag in Tow')!.sd).toBeCloseTo(0.02, 12);
	expect(found.find(({name}) => name === 'exit in Tow')!.sd).toBeCloseTo(0.5 * mph, 12);
});
