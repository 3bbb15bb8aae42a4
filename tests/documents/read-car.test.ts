import {expect, test} from 'vitest';
import {readCar} from '../../source/documents/read.ts';
import type {Car} from '../../source/drivetrain/car.ts';
import {carDocument, engine, text} from './examples.ts';

const car = async (changes: Record<string, unknown> = {}): Promise<Car> => {
	const reading = await readCar(text(carDocument(changes)));
	if (!reading.ok) throw new Error(JSON.stringify(reading.problems));
	return reading.value;
};

test('the smallest car has every default of the contract', async () => {
	const smallest = await car();
	expect(smallest).toMatchObject({
		rearDownforceShare: 0.5,
		wheelInertiaKgM2: 4,
		undrivenInertiaKgM2: 2,
		shiftTimeS: 0.1,
		reactionTimeS: 0.25,
		wheelbaseM: undefined,
		cgHeightM: undefined,
		efficiencies: 0.92,
		installed: undefined,
		rules: {},
	});
	expect(smallest.margins).toEqual({
		limitRpm: 100,
		shiftRpm: 100,
		downshiftRpm: 200,
		cleanRpm: 2500,
		settleStartS: 0.6,
		settleEndS: 0.5,
		sameTimeS: 0.02,
		levelS: 0.02,
	});
	expect(smallest.engines[0]).toMatchObject({correctedTo: 'J1349', limiter: undefined, pullRpm: 4000, bandShare: 0.9});
	// 0.30 kg/kWh.
	expect(smallest.engines[0]!.fuelConsumptionKgPerJ).toBeCloseTo(8.3333e-8, 12);
	expect(smallest).toMatchObject({fuelDensityKgM3: 745, tankM3: undefined});
	expect(smallest.tires).toMatchObject({growth: 0, slip: 0, steadySlip: 0, diameterM: undefined});
	expect(smallest.rack).toEqual({eitherShaft: false, pairs: [{driving: 33, driven: 38, sets: 1, milesM: 0}]});
});

test('a full car is read to SI', async () => {
	const full = await car({
		rearDownforceShare: 0.55,
		undrivenInertia: '1.5 kg m^2',
		shiftTime: '80 ms',
		wheelbase: '110 in',
		cgHeight: '16 in',
		engines: [
			engine({correctedTo: 'J607', limiter: 9300, pullRpm: 4500, bandShare: 0.95, fuelConsumption: '0.5 lb/(hp h)'}),
		],
		efficiency: undefined,
		efficiencies: [0.9, 0.91, 0.92, 0.93, 0.94],
		tires: {left: '86.4 in', right: '86.6 in', growth: '0.8 %', slip: '1.5 %', steadySlip: '0.1 %', size: '275/40R17'},
		rack: {
			toothSums: [71, 72],
			eitherShaft: true,
			pairs: [{driving: 33, driven: 38, sets: 2, miles: 100, maxMiles: 1200}],
		},
		margins: {limitRpm: 50, settleStart: '0.7 s'},
		fuelDensity: '6.2173 lb/gal',
		tank: '20 gal',
		installed: {pair: '38/33', gearbox: 'A'},
		rules: {superspeedway: {rpmLimit: 8600, gearboxes: ['A'], pairs: ['33/38']}, road: {}},
	});
	expect(full.massKg).toBeCloseTo(3650 * 0.45359237, 9);
	expect(full).toMatchObject({undrivenInertiaKgM2: 1.5, shiftTimeS: 0.08, efficiencies: [0.9, 0.91, 0.92, 0.93, 0.94]});
	// Recomputed: 0.30414 kg/kWh; 231 in³ a gallon.
	expect(full.engines[0]!.fuelConsumptionKgPerJ * 3.6e6).toBeCloseTo(0.30414, 5);
	expect(full.fuelDensityKgM3).toBeCloseTo(745, 1);
	expect(full.tankM3).toBeCloseTo(0.0757082, 7);
	expect(full.wheelbaseM).toBeCloseTo(2.794, 12);
	expect(full.engines[0]).toMatchObject({correctedTo: 'J607', limiter: 9300, pullRpm: 4500, bandShare: 0.95});
	expect(full.engines[0]!.curve[0]!.torqueNm).toBeCloseTo(405 * 1.3558179483314, 9);
	expect(full.tires).toMatchObject({growth: 0.008, slip: 0.015, steadySlip: 0.001});
	// ISO 4000-1: 25.4 · 17 + 2 · 275 · 0.40 = 651.8 mm.
	expect(full.tires.diameterM).toBeCloseTo(0.6518, 12);
	expect(full.rack.pairs[0]).toEqual({driving: 33, driven: 38, sets: 2, milesM: 160934.4, maxMilesM: 1200 * 1609.344});
	expect(full.margins).toMatchObject({limitRpm: 50, settleStartS: 0.7, settleEndS: 0.5});
	expect(full.installed).toEqual({pair: {driving: 38, driven: 33}, gearbox: 'A'});
	expect(full.rules).toEqual({
		superspeedway: {rpmLimit: 8600, gearboxes: ['A'], pairs: [{driving: 33, driven: 38}]},
		road: {},
	});
});

test('single gears are on hand once and go with everything, and steps are free, unless it is said otherwise', async () => {
	const gears = [
		{gear: 1, ratio: 2.9},
		{gear: 1, ratio: 2.7, pieces: 2, fits: ['long']},
		{gear: 2, ratio: 2},
	];
	expect((await car({gearInventory: {gears}})).gearInventory).toEqual({
		gears: [
			{gear: 1, ratio: 2.9, pieces: 1, fits: undefined},
			{gear: 1, ratio: 2.7, pieces: 2, fits: ['long']},
			{gear: 2, ratio: 2, pieces: 1, fits: undefined},
		],
		smallestStep: 1,
		largestStep: Number.POSITIVE_INFINITY,
	});
	const bounded = await car({gearInventory: {gears, smallestStep: 1.1, largestStep: 1.5}});
	expect(bounded.gearInventory).toMatchObject({smallestStep: 1.1, largestStep: 1.5});
	expect((await car()).gearInventory).toBeUndefined();
});

test.each([
	['lb ft^2', 94.92],
	['in lbf s^2', 35.4],
])('inertia may be given in %s', async (unit, number) => {
	// 4 kg m² is 94.92 lb ft² and 35.40 in lbf s² (recomputed from the definitions).
	expect((await car({wheelInertia: `${number} ${unit}`})).wheelInertiaKgM2).toBeCloseTo(4, 2);
});
