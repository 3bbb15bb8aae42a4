import {expect, test} from 'vitest';
import {readTrack} from '../../source/documents/read.ts';
import type {Track} from '../../source/drivetrain/track.ts';
import {text, trackDocument} from './examples.ts';

const mph = 0.44704;
const track = async (changes: Record<string, unknown> = {}): Promise<Track> => {
	const reading = await readTrack(text(trackDocument(changes)));
	if (!reading.ok) throw new Error(JSON.stringify(reading.problems));
	return reading.value;
};
const situation = async (fields: Record<string, unknown>, changes: Record<string, unknown> = {}) =>
	(await track({...changes, situations: [{name: 'S', ...fields}]})).situations[1]!;

test('the smallest track has every default of the contract', async () => {
	expect(await track()).toEqual({
		name: 'Sample',
		type: 'short',
		straights: [{name: 'Front', exitMps: 88 * mph, lengthM: 650 * 0.3048, grade: 0, load: 1, extraDragN: 0}],
		situations: [{name: 'Base', share: 1}],
		rules: {},
		car: {tires: {}},
	});
});

test('a full track is read to SI', async () => {
	const full = await track({
		$schema: './track.schema.json',
		lap: '0.6 mi',
		laps: 300,
		air: {temperature: '75 degF', pressure: '28.9 inHg', humidity: '40 %'},
		wind: {speed: '10 m/s', from: '270 deg'},
		pitRoad: {limit: '40 mph', tolerance: '5 mph', gear: 2},
		restart: {speed: '50 mph', distance: '700 ft', gear: 3},
		gears: [3, 4],
		straights: [
			{
				name: 'Front',
				exit: '88 mph',
				minimum: '80 mph',
				length: '650 ft',
				entry: '92 mph',
				braking: '0.9 g',
				grade: '-2 %',
				heading: '90 deg',
				load: 1.4,
				extraDrag: '1000 N',
				gears: [4],
				measured: {end: '116 mph', rpm: 8420, pair: '33/38', gearbox: 'A', gear: 4},
			},
			{name: 'Back', exit: '80 mph', end: '100 mph'},
		],
		rules: {rpmLimit: 8900, gearboxes: ['A'], pairs: ['33/38']},
		car: {
			tires: {left: '86.1 in', right: '86.3 in', growth: '0.5 %', slip: '2 %', steadySlip: '0.1 %', diameter: '27 in'},
			grip: 1.2,
			mass: '3640 lb',
			dragArea: '1.0 m^2',
			downforceArea: '1.5 m^2',
		},
	});
	expect(full.lapM).toBeCloseTo(965.6064, 9);
	expect(full.laps).toBe(300);
	expect(full.air?.temperatureC).toBeCloseTo((75 - 32) / 1.8, 12);
	expect(full.air?.pressurePa).toBeCloseTo(28.9 * 3386.389, 1);
	expect(full.air?.humidity).toBe(0.4);
	expect(full.wind).toEqual({speedMps: 10, fromRad: 1.5 * Math.PI});
	expect(full.pitRoad).toEqual({limitMps: 40 * mph, toleranceMps: 5 * mph, gear: 2});
	expect(full.restart).toEqual({speedMps: 50 * mph, distanceM: 213.36, gear: 3});
	expect(full.gears).toEqual({lowest: 3, highest: 4});
	const [front, back] = full.straights;
	expect(front).toMatchObject({minimumMps: 80 * mph, entryMps: 92 * mph, grade: -0.02, load: 1.4, extraDragN: 1000});
	expect(front?.brakingMps2).toBeCloseTo(8.825985, 12);
	expect(front?.headingRad).toBeCloseTo(Math.PI / 2, 12);
	expect(front?.gears).toEqual({lowest: 4, highest: 4});
	expect(front?.measured).toEqual({
		endMps: 116 * mph,
		rpm: 8420,
		pair: {driving: 33, driven: 38},
		gearbox: 'A',
		gear: 4,
	});
	expect(back).toMatchObject({endMps: 100 * mph, lengthM: undefined});
	expect(full.rules).toEqual({rpmLimit: 8900, gearboxes: ['A'], pairs: [{driving: 33, driven: 38}]});
	expect(full.car.tires).toMatchObject({growth: 0.005, slip: 0.02, steadySlip: 0.001, diameterM: 0.6858});
	expect(full.car.massKg).toBeCloseTo(3640 * 0.45359237, 9);
});

test('an altimeter setting with its elevation becomes station pressure', async () => {
	// ISO 2533 at 1000 m: 89874.57 Pa (recomputed); a setting of 101325 Pa is the standard day.
	const {air, situations} = await track({
		air: {altimeter: '1013.25 hPa', elevation: '1000 m'},
		situations: [
			{name: 'Low', air: {altimeter: '1000 hPa'}},
			{name: 'Station', air: {pressure: '900 hPa'}},
		],
	});
	expect(air?.pressurePa).toBeCloseTo(89874.57, 1);
	// 13.25 hPa less at sea level is about 11.9 hPa less up there, and the elevation is the track's.
	expect(situations[1]?.air?.pressurePa).toBeCloseTo(88665, -2);
	expect(situations[2]?.air?.pressurePa).toBe(90_000);
});

test('Base comes first, with the share of an entry of that name', async () => {
	const {situations} = await track({
		situations: [
			{name: 'Tow', drag: '-15 %'},
			{name: 'Base', share: 0.25},
			{name: 'Long run', share: 0},
		],
	});
	expect(situations.map(({name, share}) => [name, share])).toEqual([
		['Base', 0.25],
		['Tow', 1],
		['Long run', 0],
	]);
});

test.each<[string, Record<string, unknown>, Record<string, unknown>]>([
	['a signed speed is added', {exit: '+2 m/s'}, {exit: {kind: 'add', value: 2}}],
	['a negative speed is added', {entry: '-2 m/s'}, {entry: {kind: 'add', value: -2}}],
	['a speed without sign replaces', {minimum: '30 m/s'}, {minimum: {kind: 'set', value: 30}}],
	['a signed percentage scales', {end: '+5 %'}, {end: {kind: 'scale', factor: 1.05}}],
	['less drag', {drag: '-15 %'}, {drag: {kind: 'scale', factor: 0.85}}],
	['drag area added', {drag: '+0.1 m^2'}, {drag: {kind: 'add', value: 0.1}}],
	['drag area replaced', {drag: '0.8 m^2'}, {drag: {kind: 'set', value: 0.8}}],
	['a bare grip replaces', {grip: 1.1}, {grip: {kind: 'set', value: 1.1}}],
	['a signed grip is added', {grip: '+0.05'}, {grip: {kind: 'add', value: 0.05}}],
	['a percentage of grip scales', {grip: '-25 %'}, {grip: {kind: 'scale', factor: 0.75}}],
	['a signed percentage of power scales', {power: '-3 %'}, {power: {kind: 'scale', factor: 0.97}}],
	['a percentage of power without sign is a share of it', {power: '80 %'}, {power: {kind: 'scale', factor: 0.8}}],
	['power is added', {power: '+10 kW'}, {power: {kind: 'add', watts: 10_000}}],
	['power is replaced', {power: '480 kW'}, {power: {kind: 'set', watts: 480_000}}],
	['mass is added', {mass: '+20 kg'}, {mass: {kind: 'add', value: 20}}],
	['rollout is added', {rollout: '-10 mm'}, {rollout: {kind: 'add', value: -0.01}}],
	['headwind is a number', {headwind: '-3 m/s'}, {headwindMps: -3}],
	['wind is partial where the track has wind', {wind: {speed: '3 m/s'}}, {wind: {speedMps: 3}}],
	['air keeps what it does not say', {air: {temperature: '14 degC'}}, {air: {temperatureC: 14}}],
])('%s', async (_, fields, wanted) => {
	const read = await situation(fields, {wind: {speed: '1 m/s', from: '0 deg'}});
	expect(read).toEqual({name: 'S', share: 1, ...wanted});
});

test('the JSON comes back as it was written', async () => {
	const written = trackDocument({$schema: 'x', situations: [{name: 'Tow', drag: '-15 %'}]});
	const reading = await readTrack(text(written));
	expect(reading).toMatchObject({ok: true, document: written});
});

test('a byte order mark is passed over', async () => {
	expect(await readTrack(`\uFEFF${text(trackDocument())}`)).toMatchObject({ok: true});
});

test('the unit that a value is written in does not change the track', async () => {
	const us = await track({straights: [{name: 'Front', exit: '88 mph', length: '656.16797900262467 ft'}]});
	const metric = await track({straights: [{name: 'Front', exit: '141.622272 km/h', length: '200 m'}]});
	expect(us.straights[0]!.exitMps).toBeCloseTo(metric.straights[0]!.exitMps, 12);
	expect(us.straights[0]!.lengthM).toBeCloseTo(metric.straights[0]!.lengthM!, 10);
});

test('a unit that the table lacks is looked up', async () => {
	const {lapM} = await track({lap: '200 rod'});
	expect(lapM).toBeCloseTo(200 * 16.5 * 0.3048, 9);
});
