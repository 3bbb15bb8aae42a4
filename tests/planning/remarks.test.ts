import {describe, expect, test} from 'vitest';
import type {Car} from '../../source/drivetrain/car.ts';
import type {Track} from '../../source/drivetrain/track.ts';
import {rankRack} from '../../source/planning/rank-rack.ts';
import {car, engine, foot, mph, situation, straight, track} from './build.ts';

function remarksOf(carChange: Partial<Car> = {}, trackChange: Partial<Track> = {}): string[] {
	const ranking = rankRack(car(carChange), track({situations: [situation('Base')], ...trackChange}));
	if (!ranking.ok) throw new Error(JSON.stringify(ranking.faults));
	return ranking.value.remarks;
}

describe('remarks', () => {
	test('are only that the track is not anchored, where there is nothing else', () => {
		expect(remarksOf()).toEqual(['Not anchored: no measured speed yet.']);
	});

	test('say that the wind has no heading to blow along, or no direction', () => {
		const wind = {speedMps: 4, fromRad: 0};
		expect(remarksOf({}, {wind})).toContain('No wind on Front and Back: no heading given.');
		const gust = [situation('Base'), situation('Gust', {wind: {speedMps: 3}})];
		expect(remarksOf({}, {situations: gust}).slice(1)).toEqual([
			'Wind without a direction is left out.',
			'No wind on Front and Back: no heading given.',
		]);
		const headed = [straight('Front', {headingRad: 1})];
		expect(remarksOf({}, {wind, straights: headed})).toHaveLength(1);
	});

	test('say that the correction is outside its standard’s range', () => {
		const air = {temperatureC: 45, pressurePa: 80_000, humidity: undefined, dewPointC: undefined};
		expect(remarksOf({}, {air})[1]).toMatch(/^The air: correction factor 1\.3\d\d, outside the 0\.93 to 1\.07/);
		expect(remarksOf({engines: [engine({correctedTo: 'air'})]}, {air})).toHaveLength(1);
	});

	test('say that the straights are longer than the lap', () => {
		expect(remarksOf({}, {lapM: 1449 * foot})).toContain('The straights together are longer than the lap.');
		expect(remarksOf({}, {lapM: 1451 * foot})).toHaveLength(1);
	});

	test('say which of the car’s numbers the track replaces', () => {
		const own = {
			tires: {},
			grip: 1.2,
			power: undefined,
			massKg: 1600,
			dragAreaM2: undefined,
			downforceAreaM2: undefined,
		};
		expect(remarksOf({}, {car: own})).toContain("This track's own numbers replace the car's: grip and mass.");
	});

	test('say on which straight the car slows, or never reaches its entry speed', () => {
		const straights = [
			straight('Up', {exitMps: 130 * mph, grade: 0.45, lengthM: 200 * foot}),
			straight('Short', {lengthM: 200 * foot, entryMps: 150 * mph, brakingMps2: 9}),
		];
		const remarks = remarksOf({}, {straights, gears: {lowest: 3, highest: 5}});
		expect(remarks).toContain('Up: the car slows in every row (Base).');
		expect(remarks).toContain('Short: runs below its entry speed, without braking, in every row (Base).');
	});

	test('say that the torque is held where the curve has no points', () => {
		const short = engine({curve: engine().curve.slice(3, 6)});
		const remarks = remarksOf({engines: [short]});
		expect(remarks[1]).toMatch(
			/^The curve starts at 7000 rpm: its torque is held below, where rows run down to \d{4} rpm\.$/,
		);
		expect(remarks[2]).toMatch(
			/^The curve ends at 9000 rpm: its torque is held above, where rows run up to 9\d{3} rpm\.$/,
		);
	});

	test('show what textbooks do not know: rollout, drag area, slip, efficiency', () => {
		const tires = {...car().tires, diameterM: 0.65, slip: 0.12};
		const remarks = remarksOf({dragAreaM2: 1.4, efficiencies: 0.99, tires});
		expect(remarks.slice(1)).toEqual([
			"Rollout is 3.38 × the tire's diameter; about 3.05 is usual.",
			'Drag area is 1.40 m²; cars run 0.5 to 1.2 m².',
			'Slip of 12.0 %: above the 5 to 10 % at which a racing tire pulls best.',
			'Efficiency 0.990: less loss than three gear meshes at 0.5 % each.',
		]);
	});
});
