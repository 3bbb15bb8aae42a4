import {expect, test} from 'vitest';
import {oneTooth} from '../../source/odds/one-tooth.ts';
import {noShift, shifted, worldOf} from '../../source/odds/world.ts';
import {rankRack} from '../../source/planning/rank-rack.ts';
import {shippedCar, shippedTrack} from '../tracks/demo.ts';

const car = await shippedCar('demo.json');
const track = await shippedTrack('tarrowdale.json');
const tooth = oneTooth(car, track, '34/35 C')!;

/** A row of the ranking with every exit, or the drag of every tow, moved. */
function rowWith(name: string, change: {exitMps?: number; towShare?: number}) {
	const world = worldOf(car, track);
	const shift = noShift(world.track);
	for (const straight of shift.straights) straight.exitMps = change.exitMps ?? 0;
	world.track.situations.forEach(({drag}, i) => {
		if (drag !== undefined) shift.situations[i]!.drag = change.towShare ?? 0;
	});
	const moved = shifted(world, shift);
	const ranking = rankRack(moved.car, moved.track);
	if (!ranking.ok) throw new Error(JSON.stringify(ranking.faults));
	return ranking.value.rows.find(({pair, gearbox}) => `${pair} ${gearbox}` === name)!;
}
const marginOf = (row: ReturnType<typeof rowWith>) => row.checks.find(({check}) => check === 'limit')!.margin!;

test('the neighbors are the next that can be mounted with the same set', () => {
	expect(tooth.neighbors.map(({direction, row}) => [direction, row])).toEqual([
		['shorter', '33/35 C'],
		['taller', '34/34 C'],
	]);
	// 31/37 is past its miles, 35/34 not on hand.
	expect(oneTooth(car, track, '32/37 C')!.neighbors[0]!.row).toBe('31/38 C');
});

test('its figures are those of the ranking', () => {
	const row = rowWith('34/35 C', {});
	expect(tooth.of.timeS).toBeCloseTo(row.fastestS!, 9);
	expect(tooth.of.ends.map(({straight}) => straight)).toEqual(['Front', 'Back']);
	expect(tooth.of.ends[0]!.rpm).toBe(row.situations[0]!.straights[0]!.endRpm);
});

test('at the exit that makes two rows as fast, they are', () => {
	const {exitMps, towShare} = tooth.neighbors[0]!.sameTime;
	for (const change of [{exitMps: exitMps!}, {towShare: towShare!}]) {
		const [one, other] = ['34/35 C', '33/35 C'].map(name => rowWith(name, change).fastestS!);
		expect(Math.abs(one! - other!)).toBeLessThan(2e-4);
	}
});

test('at the exit that takes a row to the limit, it is there', () => {
	const {exitMps, towShare} = tooth.neighbors[1]!.atLimit;
	for (const change of [{exitMps: exitMps!}, {towShare: towShare!}])
		expect(Math.abs(marginOf(rowWith('34/35 C', change)))).toBeLessThan(3);
});

test('a change out of reach is none, and so is a row that is not there', () => {
	expect(tooth.neighbors[1]!.sameTime.exitMps).toBeNull();
	expect(oneTooth(car, track, '12/99 C')).toBeUndefined();
});
