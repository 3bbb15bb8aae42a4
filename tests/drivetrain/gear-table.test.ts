import {describe, expect, test} from 'vitest';
import {RoadGears} from '../../source/drivetrain/road-gears.ts';
import {relativeError} from '../close.ts';
import {sampleTrain, sampleVehicle} from './sample-car.ts';

const gears = new RoadGears(sampleVehicle(), sampleTrain, {grade: 0, headwindMps: 0, load: 1, extraDragN: 0});

describe('the speed some time before', () => {
	test('is undone by the time between, over kinks of the curve and within one', () => {
		const table = gears.table(4);
		for (const timeS of [0.01, 0.25, 2, 5]) {
			const before = table.speedBefore(66, timeS);
			expect(before).toBeLessThan(66);
			const back = table.travel(before, {distanceM: 1e4, toMps: 66, braking: undefined});
			expect(relativeError(back.timeS, timeS)).toBeLessThan(1e-9);
		}
	});

	test('is the speed itself for no time, and never below 0', () => {
		expect(gears.table(4).speedBefore(66, 0)).toBe(66);
		expect(gears.table(4).speedBefore(66, 1e4)).toBe(0);
	});

	test('of a car that gains none is 0', () => {
		const uphill = new RoadGears(sampleVehicle(), sampleTrain, {grade: 0.6, headwindMps: 0, load: 1, extraDragN: 0});
		expect(uphill.table(5).speedBefore(60, 0.25)).toBe(0);
	});
});
