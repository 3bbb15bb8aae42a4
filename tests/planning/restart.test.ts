import {describe, expect, test} from 'vitest';
import type {Car} from '../../source/drivetrain/car.ts';
import type {Track} from '../../source/drivetrain/track.ts';
import {rankRack} from '../../source/planning/rank-rack.ts';
import type {Row} from '../../source/planning/results.ts';
import {car, foot, mph, situation, straight, track} from './build.ts';

function rowOf(change: Partial<Track>, gearbox = 'A', carChange: Partial<Car> = {}): Row {
	const ranking = rankRack(car(carChange), track({situations: [situation('Base')], ...change}));
	if (!ranking.ok) throw new Error(JSON.stringify(ranking.faults));
	return ranking.value.rows.find(row => row.pair === '33/38' && row.gearbox === gearbox)!;
}

const restart = {speedMps: 50 * mph, distanceM: 700 * foot, gear: undefined};

describe('the restart', () => {
	test('is beside the lap, not part of its time', () => {
		const [beside, without] = [rowOf({restart}), rowOf({restart: undefined})];
		expect(beside.timeS).toBe(without.timeS);
		expect(beside.situations[0]!.restart!.timeS).toBeGreaterThan(0);
		expect(without.situations[0]!.restart).toBeNull();
	});

	test('starts in the gear of least time, whatever gears the track allows', () => {
		const result = rowOf({restart, gears: {lowest: 4, highest: 5}}).situations[0]!.restart!;
		expect(result.exitGear).toBeLessThan(4);
		const others = [1, 2, 3, 4, 5].map(gear => rowOf({restart: {...restart, gear}}).situations[0]!.restart!);
		for (const {timeS} of others) expect(timeS).toBeGreaterThanOrEqual(result.timeS!);
	});

	test('takes the gears of least time even where the tie-break would save a shift', () => {
		const margins = {...car().margins, sameTimeS: 10};
		const result = rowOf({restart}, 'A', {margins}).situations[0]!;
		expect(result.restart!.timeS).toBe(result.restart!.fastestS);
		expect(result.timeS).toBeGreaterThan(result.fastestS!);
	});

	test('starts in the given gear, and in the gear of least time where the gearbox has not got it', () => {
		expect(rowOf({restart: {...restart, gear: 4}}).situations[0]!.restart!.exitGear).toBe(4);
		const gearboxes = [...car().gearboxes, {name: 'C', ratios: [2, 1.5, 1]}];
		const short = rowOf({restart: {...restart, gear: 4}}, 'C', {gearboxes});
		expect(short.situations[0]!.restart!.exitGear).toBe(
			rowOf({restart}, 'C', {gearboxes}).situations[0]!.restart!.exitGear,
		);
		expect(short.remarks).toContain('no gear 4 for the restart: the gear of least time taken');
	});
});

describe('a straight without length', () => {
	const held = (exit: number, end: number) =>
		rowOf({
			straights: [straight('Held', {lengthM: undefined, exitMps: exit * mph, endMps: end * mph})],
			restart: undefined,
		}).situations[0]!.straights[0]!;

	test('is driven in the shortest gear whose shift speed is not behind', () => {
		const timed = rowOf({
			straights: [straight('Timed', {exitMps: 88 * mph, lengthM: 3000 * foot})],
			restart: undefined,
		});
		const {shifts, exitGear} = timed.situations[0]!.straights[0]!;
		const shiftMph = shifts[0]!.speedMps / mph;
		expect(held(shiftMph - 0.01, 150).exitGear).toBe(exitGear);
		expect(held(shiftMph + 0.01, 150).exitGear).toBe(exitGear + 1);
		expect(held(88, shiftMph + 0.01).endGear).toBe(exitGear + 1);
	});

	test('never ends in a lower gear than it starts in', () => {
		expect(held(120, 60).endGear).toBe(held(120, 60).exitGear);
	});
});
