import {describe, expect, test} from 'vitest';
import {valueAt} from '../../source/drivetrain/monotone-cubic.ts';
import {gearsOf} from '../../source/planning/conditions.ts';
import {weightsOf} from '../../source/planning/plan.ts';
import {powerFactor} from '../../source/planning/vehicle.ts';
import {add, car, engine, mph, scale, situation, straight, track} from './build.ts';
import {planOf} from './fake-row.ts';

const coolAir = {temperatureC: 10, pressurePa: 99_000, humidity: undefined, dewPointC: undefined};

describe('a vehicle', () => {
	test('rolls on the harmonic mean of both tires: 2/(1/2 + 1/2.5) = 2.2222', () => {
		const plan = planOf(car({tires: {...car().tires, leftM: 2, rightM: 2.5}}));
		expect(plan.base.vehicle.rolloutM).toBeCloseTo(20 / 9, 12);
	});

	test('is rated torque at the reference day, and more on a cool one', () => {
		const plan = planOf(car(), track({situations: [situation('Base'), situation('Cool', {air: coolAir})]}));
		const [base, cool] = plan.conditions;
		expect(base!.correction).toBeCloseTo(1, 12);
		expect(valueAt(base!.vehicle.torqueNm, 6000)).toBeCloseTo(610, 9);
		// recomputed: cf = 1.18·√(283/298) − 0.18 = 0.9699186
		expect(cool!.correction).toBeCloseTo(0.9699186, 6);
		expect(valueAt(cool!.vehicle.torqueNm, 6000)).toBeCloseTo(610 / 0.9699186, 3);
		expect(cool!.vehicle.airDensityKgM3).toBeGreaterThan(base!.vehicle.airDensityKgM3);
	});

	test('is shared between situations that change nothing of it', () => {
		const plan = planOf(
			car(),
			track({
				situations: [situation('Base'), situation('Slow', {exit: add(-1)}), situation('Tow', {drag: scale(0.9)})],
			}),
		);
		const [base, slow, tow] = plan.conditions;
		expect(slow!.vehicle).toBe(base!.vehicle);
		expect(tow!.vehicle).not.toBe(base!.vehicle);
	});

	test('shifts below the lower of limiter and limit', () => {
		const high = planOf(car({engines: [engine({rpmLimit: 9000, limiter: 9300})]})).base.vehicle;
		expect([high.limiterRpm, high.topRpm, high.shiftCapRpm]).toEqual([9300, 9000, 8900]);
		const low = planOf(car({engines: [engine({rpmLimit: 9000, limiter: 8800})]})).base.vehicle;
		expect([low.limiterRpm, low.topRpm, low.shiftCapRpm]).toEqual([8800, 8800, 8700]);
	});

	test('has power moved by a share, by watts and to watts of today’s peak', () => {
		expect(powerFactor({kind: 'scale', factor: 0.97}, 500_000)).toBe(0.97);
		expect(powerFactor({kind: 'add', watts: 5000}, 500_000)).toBe(1.01);
		expect(powerFactor({kind: 'set', watts: 450_000}, 500_000)).toBe(0.9);
		expect(powerFactor(undefined, 500_000)).toBe(1);
	});

	test('moves weight only where wheelbase and height are both given', () => {
		expect(planOf(car({wheelbaseM: 2.8, cgHeightM: 0.42})).base.vehicle.cgHeightRatio).toBeCloseTo(0.15, 12);
		expect(planOf(car()).base.vehicle.cgHeightRatio).toBe(0);
	});
});

describe('a place', () => {
	const windy = track({
		wind: {speedMps: 4, fromRad: 0},
		straights: [straight('North', {headingRad: 0}), straight('South', {headingRad: Math.PI}), straight('Unknown')],
		situations: [situation('Base'), situation('Gust', {headwindMps: 2})],
	});

	test('has the wind by its heading, and the added headwind everywhere', () => {
		const [base, gust] = planOf(car(), windy).conditions;
		const headwinds = (places: typeof base) => places!.places.map(({courses}) => courses.get(5)!.headwindMps);
		expect(headwinds(base)).toEqual([4, -4, 0]);
		expect(headwinds(gust)).toEqual([6, -2, 2]);
		expect(base!.restart!.courses.get(5)!.headwindMps).toBe(0);
		expect(gust!.restart!.courses.get(5)!.headwindMps).toBe(2);
	});

	test('has the straight’s gears before the track’s, and none where the gearbox lacks them', () => {
		const plan = planOf(
			car({gearboxes: [...car().gearboxes, {name: 'C', ratios: [2, 1.5, 1]}]}),
			track({
				gears: {lowest: 4, highest: 5},
				straights: [straight('Front'), straight('Back', {gears: {lowest: 2, highest: 3}})],
			}),
		);
		const gears = (i: number, count: number) => plan.base.places[i]!.courses.get(count);
		expect(gears(0, 5)).toMatchObject({lowestGear: 4, highestGear: 5});
		expect(gears(0, 3)).toBeUndefined();
		expect(gears(1, 3)).toMatchObject({lowestGear: 2, highestGear: 3});
		expect(plan.base.restart!.courses.get(3)).toMatchObject({lowestGear: 1, highestGear: 3});
	});

	test('shares its road with the straights that are alike', () => {
		const plan = planOf(
			car(),
			track({straights: [straight('A'), straight('B', {exitMps: 30 * mph}), straight('C', {grade: 0.01})]}),
		);
		const [a, b, c] = plan.base.places;
		expect(b!.road).toBe(a!.road);
		expect(c!.road).not.toBe(a!.road);
	});

	test('cuts a range of gears to what the gearbox has', () => {
		expect(gearsOf(undefined, 5)).toEqual({lowest: 1, highest: 5});
		expect(gearsOf({lowest: 4, highest: 6}, 5)).toEqual({lowest: 4, highest: 5});
		expect(gearsOf({lowest: 4, highest: 5}, 3)).toBeUndefined();
	});
});

describe('weights', () => {
	test('are the shares over their sum', () => {
		expect(weightsOf([{share: 1}, {share: 3}])).toEqual([0.25, 0.75]);
		expect(weightsOf([{share: 1}, {share: 0}])).toEqual([1, 0]);
	});

	test('fall on the base where every share is 0, and on a single situation whatever its share', () => {
		expect(weightsOf([{share: 0}, {share: 0}])).toEqual([1, 0]);
		expect(weightsOf([{share: 0}])).toEqual([1]);
	});
});
