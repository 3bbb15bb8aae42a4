import {expect, test} from 'vitest';
import type {Block} from '../../source/text/blocks.ts';
import {layOut} from '../../source/text/layout.ts';
import {rankView} from '../../source/text/rank-view.ts';
import {rpmView} from '../../source/text/rpm-view.ts';
import {runView} from '../../source/text/run-view.ts';
import {unitsOf} from '../../source/text/units.ts';
import {displayWidth} from '../../source/text/width.ts';
import {front, heading, ranking, row, setting, table} from '../commands/answers.ts';

const us = unitsOf('us');
const lines = (blocks: Block[], width: number) =>
	layOut(blocks, width).map(cells => cells.map(each => each.text).join(''));
const rank = (width: number, top = 3, rows = 20) => lines(rankView({heading, ranking: ranking(rows), top}, us), width);
const rpm = (width: number, units = us) => lines(rpmView(heading, table, units), width);
const run = (width: number, change: Parameters<typeof row>[0] = {}) =>
	lines(runView(heading, {setting, row: row(change), remarks: []}, us), width);
const lineWith = (all: string[], start: RegExp) => all.find(each => start.test(each)) ?? `no line with ${start}`;

test('the first line names car, engine build, day and air', () => {
	const first = 'Fixture Car · engine Open 358 · 2026-03-14 · 68°F, 28.94 inHg, 40 % humidity';
	expect([rank(120)[0], rpm(120)[0], run(120)[0]]).toEqual([first, first, first]);
});

test('without air the day is the reference of J1349', () => {
	const view = rpmView({...heading, air: undefined}, table, unitsOf('metric'));
	expect(lines(view, 120)[0]).toContain('25°C, 990 hPa, 0 % humidity');
});

test('the third line says what bounds the answer', () => {
	expect(rank(160)[2]).toBe(
		'limit 8900 rpm (track) · band 6904-8790 · 657 hp at 8210 today (correction 0.988) · air 0.0725 lb/ft³',
	);
});

test('a row of the ranking, at 120 columns and at 60', () => {
	expect(lineWith(rank(120), /^ 1 /)).toBe(
		' 1  33/38   1.1515  A    12.341  +0.012     8861  Front end, In the tow      39      6890   -14       1  pass',
	);
	expect(lineWith(rank(60), /^ 1 /)).toBe(' 1  33/38   A    12.341     8861      39      6890  pass');
});

test('the checks that a verdict comes from stand beside it where there is room', () => {
	const view = rankView({heading, ranking: {setting, remarks: [], rows: [row()]}, top: 1}, us);
	expect(lineWith(lines(view, 160), /^1 /)).toMatch(/near {5}RPM limit, mileage$/);
	expect(lineWith(lines(view, 80), /^1 /)).toMatch(/near$/);
});

test('the installed row is shown and marked wherever it stands', () => {
	const shown = rank(80).filter(each => /^ ?\d+ {2}\d\d\/\d\d\*? +A {4}\d/.test(each));
	expect(shown.map(each => each.slice(0, 10))).toEqual([' 1  33/38 ', ' 2  32/39 ', ' 3  31/40 ', '20  32/57*']);
	expect(rank(80)).toContain('16 more; --top 20 shows all.');
	expect(rank(80, 20).join('\n')).not.toContain('more;');
});

test('every reason is told in full, hanging under its place', () => {
	const all = rank(60).join('\n');
	expect(all).toContain(
		' 1  33/38 A  Fastest of the pairs that keep the limit in\n    every situation; 40 rpm are left in the tow at the end\n    of the front straight.',
	);
	expect(all).toContain(' 2  32/39 A  Fastest of the pairs that keep the limit in\n    every situation;');
	expect(all).not.toContain('…');
});

test('every answer ends with its remarks and the caution', () => {
	const caution = "An estimate: the engine builder's limit, the rule book and officials decide.";
	expect(rank(80).slice(-3)).toEqual(['- Headwind comes from the wind at car height.', '', caution]);
	expect(rpm(80).at(-1)).toBe(caution);
	expect(run(80).at(-1)).toBe(caution);
});

test('without times and without an installed pair there are dashes', () => {
	const view = rankView(
		{heading, ranking: {setting, remarks: [], rows: [row({timeS: null, fastestS: null, gainS: null})]}, top: 3},
		us,
	);
	expect(lineWith(lines(view, 80), /^1 /)).toBe('1  33/38  A         -       -     8861      39      6890   -14  near');
});

test('RPM in every gear, with signs for the gear in use and for what is above the limit', () => {
	expect(lineWith(rpm(80), /^Front exit/)).toBe(
		'Front exit  Base         88.0  12701!    9012!    7110*   5600    4500',
	);
	expect(lineWith(rpm(80), /^Front top/)).toBe(
		'Front top   In the tow  138.7  20000!   14000!   11200!   8901!*  7100',
	);
	expect(lineWith(rpm(60), /^Front top/)).toMatch(
		/^Front top {3}138\.7 {2}20000! {3}14000! {3}11200! {3}8901!\* {2}7100$/,
	);
});

test('pit-road RPM are rounded down, as on the cards, and the name with the tolerance leaves room beside it', () => {
	const point = {
		at: 'pit road + tolerance',
		situation: '',
		speedMps: 20,
		rpm: [6800.6, 5000.6, 3960.6, 3100.6, 2600.6],
		gear: 3,
	};
	const view = rpmView(heading, {...table, points: [point]}, us);
	expect(lineWith(lines(view, 80), /^pit/)).toMatch(/^pit \+ tolerance .* 3960\* /);
});

test('a run shows gears, shifts rounded down, pit road and checks', () => {
	const all = run(100);
	expect(lineWith(all, /^ {2}Front +3-4 +88/)).toBe(
		'  Front     3-4        88.0      7110    136.2     7717   6.344      6.341',
	);
	expect(lineWith(all, /^ {2}Front +3-4 +8799/)).toBe(
		'  Front     3-4      8799       8620       7201  126.8    536    3.500   2.600',
	);
	expect(all).toContain('- Back: the car slows on it');
	expect(all).toContain('Pit road · gear 2 · 4211 rpm at the limit · 4737 at limit and tolerance, never above');
	expect(lineWith(all, /^RPM limit/)).toBe(
		'RPM limit           near      8861   8900      39  Front end        In the tow',
	);
	expect(lineWith(all, /^mileage/)).toBe('mileage, mi         near      1100   1200     100');
	expect(all).toContain('- mileage: change the pair soon');
});

test('columns for the limiter and for the RPM beyond it come with a need', () => {
	const held = {...front, limiterM: 91.44, reachRpm: 9200.4};
	const all = run(160, {situations: [{...row().situations[0]!, straights: [held]}]});
	expect(lineWith(all, /^ {2}straight/)).toMatch(/reach rpm {2}limiter ft/);
	expect(lineWith(all, /^ {2}Front/)).toMatch(/ 9201 +300 /);
	expect(run(160).join('\n')).not.toContain('limiter ft');
});

test.each([40, 60, 80, 100, 120, 160, 200])('nothing is wider than %i columns, long and wide names included', width => {
	const wide = {...front, name: '直線直線直線直線直線直線直線直線', remarks: ['x'.repeat(300)]};
	const long = row({
		gearbox: 'Gearbox of a long name',
		reason: '直線'.repeat(90),
		situations: [{...row().situations[0]!, straights: [wide]}],
	});
	const views = [
		rankView(
			{heading: {...heading, car: '車'.repeat(120)}, ranking: {setting, rows: [long, row()], remarks: []}, top: 2},
			us,
		),
		rpmView(
			heading,
			{...table, points: table.points.map(point => ({...point, at: '直線直線直線直線直線直線 exit'}))},
			us,
		),
		runView(heading, {setting, row: long, remarks: ['y'.repeat(300)]}, us),
	];
	for (const view of views)
		for (const each of lines(view, width)) expect(displayWidth(each)).toBeLessThanOrEqual(width);
});
