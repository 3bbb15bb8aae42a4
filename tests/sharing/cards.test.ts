import {describe, expect, test} from 'vitest';
import {driverCard} from '../../source/sharing/cards/driver-card.ts';
import {engineSheet} from '../../source/sharing/cards/engine-sheet.ts';
import {swapSheet} from '../../source/sharing/cards/swap-sheet.ts';
import {ground} from './sample.ts';

const pair = {driving: 33, driven: 38};
const source = {...(await ground(undefined, undefined, pair)), day: '2025-06-14', units: 'us' as const};
const {row, setting, car} = source;
const cards = {driverCard, swapSheet, engineSheet};
const lineWith = (lines: readonly string[], start: string) => lines.find(line => line.trim().startsWith(start)) ?? '';
const numberAfter = (lines: readonly string[], start: string) =>
	Number(/(\d+(\.\d+)?)$/.exec(lineWith(lines, start))?.[0]);

describe.each(Object.keys(cards) as (keyof typeof cards)[])('the %s', name => {
	const lines = cards[name](source);

	test('says whose numbers these are, for which day, how far they are trusted, and its caution', () => {
		expect(lines.slice(1, 5)).toEqual([
			'Test car 7 at Pine Hollow',
			'Day 2025-06-14: 75°F, 28.90 inHg',
			'Pair 33/38, gearbox A, engine Open',
			'Not anchored: no measured speed here that the model meets.',
		]);
		expect(cards[name]({...source, setting: {...setting, anchored: true}})[4]).toBe(
			'Anchored to speeds measured here.',
		);
		expect(lines.join(' ')).toMatch(/estimate/i);
	});

	test('says below its heading that the plan fails a check, and which, and nothing of the kind of one that does not', () => {
		expect(lines.join(' ')).not.toContain('FAILS');
		const reason = 'Over the limit: 9400 at Front end, 200 above 9200.';
		expect(cards[name]({...source, row: {...row, verdict: 'fail', reason}})[5]).toBe(
			'FAILS A CHECK. Over the limit: 9400 at Front end, 200 above',
		);
	});

	test('is at most 60 columns wide', () => {
		expect(Math.max(...lines.map(line => line.length))).toBeLessThanOrEqual(60);
	});

	test('shows control characters in names as symbols', () => {
		const hostile = {...source, track: {...source.track, name: 'A\u001b[2J\u202eB\nC'}};
		expect(cards[name](hostile).join('')).not.toMatch(/[\p{Cc}\u202e]/u);
		expect(cards[name](hostile)[1]).toBe('Test car 7 at A␛[2J\ufffdB␊C');
	});
});

describe('the driver card', () => {
	const lines = driverCard(source);

	test('has shift RPM down to 50 and light RPM down, the lowest of all straights and situations; a shift that only the restart makes as it is there', () => {
		const shift = {from: 3, rpmAfter: 0, speedMps: 0, distanceM: 0, timeS: 0, leftS: 0};
		const shifts = [[{...shift, rpm: 9099.9, lightRpm: 8890.7}], [{...shift, rpm: 9180, lightRpm: 8881.2}]];
		const situations = row.situations.slice(0, 2).map((situation, i) => ({
			...situation,
			restart: {
				...situation.restart!,
				shifts: [
					{...shift, rpm: 9000, lightRpm: 8000},
					{...shift, from: 2, rpm: 9100, lightRpm: 8882},
				],
			},
			straights: [{...situation.straights[0]!, shifts: shifts[i]!}],
		}));
		const card = driverCard({...source, row: {...row, situations}});
		expect(lineWith(card, '3 to 4')).toMatch(/ 9050 +8881$/);
		expect(lineWith(card, '2 to 3')).toMatch(/ 9100 +8882$/);
	});

	test('rounds pit-road RPM down and marks the tolerance as never to be exceeded', () => {
		expect(numberAfter(lines, '40.0 mph, the limit')).toBe(Math.floor(row.pitRoad!.rpm));
		expect(numberAfter(lines, 'NEVER above, 45.0 mph')).toBe(Math.floor(row.pitRoad!.toleranceRpm));
		expect(lineWith(driverCard({...source, units: 'metric'}), 'NEVER above')).toContain('72.4 km/h');
	});

	test('has for each gear the RPM below which the next lower one may be taken', () => {
		// (9200 − 200)·1.24/1.58 = 7063.29…: hand-worked
		expect(numberAfter(lines, '4 to 3')).toBe(7063);
		// (9200 − 200)·2.04/2.9 = 6331.03…: hand-worked
		expect(numberAfter(lines, '2 to 1')).toBe(6331);
	});

	test('has restart gear and RPM', () => {
		expect(lineWith(lines, 'in gear')).toMatch(/in gear \d, at +\d{4}$/);
	});
});

describe('the swap sheet', () => {
	const lines = swapSheet(source);

	test('has the teeth and which gear goes where', () => {
		expect(numberAfter(lines, 'DRIVING gear, teeth')).toBe(33);
		expect(lines.join('\n')).toMatch(/33\n +on the shaft that the torque comes from\n +DRIVEN gear, teeth +38\n/);
	});

	test('has the counts of ten wheel turns: expected, flipped, nearest', () => {
		// gear 5: 10 · 1 · 38/33 · 3.25 = 37.42; flipped 10 · 33/38 · 3.25 = 28.22; 34/38: 36.32: hand-worked
		expect(numberAfter(lines, 'expected, 33/38')).toBe(37.4);
		expect(numberAfter(lines, 'flipped, 38/33')).toBe(28.2);
		expect(numberAfter(lines, 'nearest on the rack, 34/38')).toBe(36.3);
		expect(lines.join(' ')).toContain('One wheel standing still gives half: 18.7.');
	});

	test('has the pit-road RPM that a flipped pair would show', () => {
		// (33/38)² = 0.754155…: hand-worked
		expect(numberAfter(lines, 'if the pair were flipped')).toBe(Math.floor((row.pitRoad!.rpm * 33 ** 2) / 38 ** 2));
	});

	test('has hunting tooth, mileage, cautions and two lines to sign', () => {
		const text = lines.join('\n');
		expect(text).toContain('Hunting tooth: yes');
		expect(text).toContain('Mileage: 310 miles, of 1200 miles; sets on hand: 2');
		expect(text).toMatch(/stands, wheels chocked, ignition and fuel pump off[\s\S]*second person counts the teeth/);
		expect(lines.filter(line => line.includes('____'))).toHaveLength(2);
	});

	test('has the cautions before the first thing that is done, and what to look at before the engine is started', () => {
		const at = (start: string) => lines.findIndex(line => line.trim().startsWith(start));
		expect(at('Before and during the swap')).toBeGreaterThan(0);
		expect(at('- The oil is hot')).toBeLessThan(at('DRIVING gear'));
		expect(at('- Before the engine is started')).toBeLessThan(at('Hand-turn check'));
	});

	test('tells when a pair does not hunt', async () => {
		const even = await ground(undefined, undefined, {driving: 36, driven: 36});
		expect(swapSheet({...source, ...even}).join(' ')).toContain('Hunting tooth: no: the same teeth meet every 1 turn');
	});
});

describe("the engine builder's sheet", () => {
	test('has limit, cut, highest RPM by situation with where, and shift RPM', () => {
		const lines = engineSheet(source);
		expect(numberAfter(lines, 'Limit in force (engine)')).toBe(9200);
		expect(numberAfter(lines, 'Ignition cut')).toBe(9300);
		for (const {name} of row.situations) expect(lineWith(lines, name)).toMatch(/^ {2}.* \d{4,5} {2}\S/);
		expect(lines).toContain('Shift RPM');
	});

	test('says that the highest RPM are without the cut where they are above it', () => {
		expect(engineSheet(source)).toContain('Highest RPM, and where');
		const lower = {...car, engines: car.engines.map(engine => ({...engine, limiter: 8000}))};
		expect(engineSheet({...source, car: lower})).toContain('Highest RPM were there no cut, and where');
	});

	test('has the seconds on the limiter where there are any, and time above an RPM only when it is known', () => {
		const straights = row.situations[0]!.straights.map(one => ({...one, limiterM: 30, endSpeedMps: 60}));
		const held = {...row, situations: [{...row.situations[0]!, straights}]};
		expect(engineSheet(source)).toContain('On the limiter: never');
		expect(numberAfter(engineSheet({...source, row: held}), 'Front (Base)')).toBe(0.5);
		expect(engineSheet(source).join('')).not.toContain('Seconds above');
		expect(numberAfter(engineSheet({...source, timeAbove: {rpm: 8500, seconds: 41.26}}), 'Seconds above 8500')).toBe(
			41.3,
		);
	});
	test('is of the car that was asked for', () => expect(car.name).toBe('Test car 7'));
});
