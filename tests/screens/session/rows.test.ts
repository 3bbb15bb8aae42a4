import {expect, test} from 'vitest';
import {rankRack} from '../../../source/planning/rank-rack.ts';
import {readCarOf, readTrackOf} from '../../../source/screens/session/forms.ts';
import {cursorIn, noFilter, placedRows, shownRows, stepped} from '../../../source/screens/session/rows.ts';
import {car, oval} from './documents.ts';

const [track, vehicle] = [readTrackOf(oval.json), readCarOf(car.json)];
if (!track.ok || !vehicle.ok) throw new Error('the fixtures do not read');
const ranking = rankRack(vehicle.value, track.value);
if (!ranking.ok) throw new Error('the fixtures do not rank');
const rows = placedRows(ranking.value.rows);
const names = (some: readonly {name: string}[]) => some.map(({name}) => name);

test('rows have their place and name', () => {
	expect(rows).toHaveLength(10);
	expect(rows[0]).toMatchObject({place: 1});
	expect(new Set(names(rows)).size).toBe(10);
});

test('by ratio the shortest comes first', () => {
	const ratios = shownRows(rows, 'ratio', noFilter).map(({row}) => row.pairRatio);
	expect(ratios).toEqual(ratios.toSorted((a, b) => b - a));
});

test('by shifts the fewest come first', () => {
	const shifts = shownRows(rows, 'shifts', noFilter).map(({row}) =>
		row.situations[0]!.straights.reduce((sum, {shifts}) => sum + shifts.length, 0),
	);
	expect(shifts).toEqual(shifts.toSorted((a, b) => a - b));
});

test('rows are hidden by verdict, by set and by margin', () => {
	expect(shownRows(rows, 'place', {...noFilter, hideFailing: true}).every(({row}) => row.verdict !== 'fail')).toBe(
		true,
	);
	expect(shownRows(rows, 'place', {...noFilter, gearbox: 'B'})).toHaveLength(5);
	const wide = shownRows(rows, 'place', {...noFilter, leastMarginRpm: 100});
	expect(wide.every(({row}) => row.checks.find(({check}) => check === 'limit')!.margin! >= 100)).toBe(true);
});

test('the cursor finds its row by name, whatever the order', () => {
	const byRatio = shownRows(rows, 'ratio', noFilter);
	expect(byRatio[cursorIn(byRatio, '36/36 A')]!.name).toBe('36/36 A');
	expect(cursorIn(rows, undefined)).toBe(0);
	expect(cursorIn([], '36/36 A')).toBe(0);
});

test('a step goes to the next ratio of the same set, shorter or taller, and ends with the rack', () => {
	const at = (name: string) => rows.find(row => row.name === name)!;
	expect(stepped(rows, at('36/36 A'), 1)?.name).toBe('35/36 A');
	expect(stepped(rows, at('36/36 A'), -1)?.name).toBe('36/35 A');
	expect(stepped(rows, at('34/37 B'), 1)).toBeUndefined();
	expect(stepped(rows, at('37/34 B'), -1)).toBeUndefined();
});
