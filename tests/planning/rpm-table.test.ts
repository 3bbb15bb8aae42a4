import {describe, expect, test} from 'vitest';
import type {Track} from '../../source/drivetrain/track.ts';
import type {Choice, RpmTable} from '../../source/planning/results.ts';
import {rpmTable} from '../../source/planning/rpm-table.ts';
import {car, foot, mph, pair, scale, situation, straight, track} from './build.ts';

function tableOf(change: Partial<Track> = {}, choice: Choice = {}): RpmTable {
	const table = rpmTable(car(), track(change), choice);
	if (!table.ok) throw new Error(JSON.stringify(table.faults));
	return table.value;
}

const measured = {endMps: 52, rpm: undefined, pair: undefined, gearbox: undefined, gear: undefined};
const straights = [
	straight('Front', {minimumMps: 80 * mph, entryMps: 92 * mph, brakingMps2: 9, measured}),
	straight('Held', {lengthM: undefined, exitMps: 70 * mph, endMps: 110 * mph}),
];
const situations = [situation('Base'), situation('Tow', {drag: scale(0.85)})];

describe('the RPM table', () => {
	const table = tableOf({straights, situations});

	test('has every point of each situation, then pit road and the restarts', () => {
		expect(table.points.map(({at, situation}) => [at, situation].join(' | '))).toEqual([
			'Front minimum | Base',
			'Front exit | Base',
			'Front top | Base',
			'Front entry | Base',
			'Front measured | Base',
			'Held exit | Base',
			'Held end | Base',
			'Front minimum | Tow',
			'Front exit | Tow',
			'Front top | Tow',
			'Front entry | Tow',
			'Held exit | Tow',
			'Held end | Tow',
			'pit road | ',
			'pit road + tolerance | ',
			'restart | Base',
			'restart | Tow',
		]);
	});

	test('turns as the overall ratios say, with slip at full throttle only', () => {
		const at = (name: string) => table.points.find(point => point.at === name)!;
		for (const {rpm} of table.points) {
			rpm.forEach((value, i) => {
				expect(value / rpm[0]!).toBeCloseTo(table.overall[i]! / table.overall[0]!, 12);
			});
		}
		// n = 60·V·(1 + κ)·R/C, C = C0·(1 + 0.008·(V/44.704)²), C0 = 2/(1/2.19456 + 1/2.19964) = 2.197097 m
		const perSpeed = (speed: number) => (60 * speed) / (2.1970971 * (1 + 0.008 * (speed / 44.704) ** 2));
		expect(at('Front exit').rpm[0]).toBeCloseTo(perSpeed(88 * mph) * 1.015 * 10.8530303, 1);
		expect(at('Front minimum').rpm[0]).toBeCloseTo(perSpeed(80 * mph) * 10.8530303, 1);
		expect(at('pit road').rpm[0]).toBeCloseTo(perSpeed(40 * mph) * 10.8530303, 1);
	});

	test('marks the gear in use: the exit’s for the minimum, a higher one at the end of a held straight', () => {
		const gear = (name: string) => table.points.find(point => point.at === name)!.gear;
		expect(gear('Front minimum')).toBe(gear('Front exit'));
		expect(gear('Held end')).toBeGreaterThan(gear('Held exit')!);
		expect(gear('pit road')).toBe(1);
	});

	test('is of the pair and set chosen', () => {
		const chosen = tableOf({straights, situations}, {pair: pair(31, 40), gearbox: 'B'});
		expect([chosen.pair, chosen.gearbox]).toEqual(['31/40', 'B']);
		expect(chosen.points[0]!.rpm[4]).toBeGreaterThan(table.points[0]!.rpm[4]!);
		expect(chosen.points[1]!.rpm[4]).toBeGreaterThan(table.points[1]!.rpm[4]!);
	});

	test('has no gear in use where the car cannot go through', () => {
		const out = tableOf(
			{straights: [straight('Front', {exitMps: 195 * mph, lengthM: 300 * foot})]},
			{pair: pair(31, 40)},
		);
		expect(out.points.find(({at}) => at === 'Front exit')!.gear).toBeNull();
		expect(out.points.some(({at}) => at === 'Front top')).toBe(false);
	});
});
