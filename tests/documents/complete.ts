/** Documents with every field there is, to change in tests. The numbers mean nothing. */
import {carDocument, engine, trackDocument} from './examples.ts';

const air = {temperature: '75 degF', altimeter: '29.9 inHg', elevation: '650 ft', humidity: '40 %'};
const wind = {speed: '8 mph', from: '270 deg'};
const rules = {rpmLimit: 8900, gearboxes: ['A'], pairs: ['33/38']};

const learned = (field: string, value: string) => ({
	field,
	value,
	before: '1.05',
	from: 'practice, 41 laps',
	date: '2026-05-30',
});

export const completeTrack = () =>
	trackDocument({
		$schema: './track.json',
		lap: '0.6 mi',
		laps: 300,
		air,
		wind,
		gears: [1, 2, 3, 4, 5],
		pitRoad: {limit: '40 mph', tolerance: '5 mph', gear: 2},
		restart: {speed: '50 mph', distance: '700 ft', gear: 2},
		straights: [
			{
				name: 'Front',
				exit: '88 mph',
				minimum: '80 mph',
				length: '650 ft',
				entry: '92 mph',
				braking: '0.9 g',
				grade: '1 %',
				heading: '90 deg',
				load: 1.1,
				extraDrag: '100 N',
				gears: [4, 5],
				measured: {end: '116 mph', rpm: 8420, pair: '33/38', gearbox: 'A', gear: 4},
			},
			{name: 'Back', exit: '80 mph', end: '100 mph'},
		],
		situations: [
			{name: 'Base', share: 2},
			{
				name: 'Night',
				share: 1,
				exit: '+1 mph',
				end: '+1 mph',
				entry: '-1 mph',
				minimum: '80 mph',
				drag: '-15 %',
				grip: '-3 %',
				power: '+5 hp',
				mass: '-75 lb',
				rollout: '-0.3 in',
				air: {pressure: '28.9 inHg', dewPoint: '40 degF'},
				wind: {speed: '3 mph'},
				headwind: '5 mph',
			},
		],
		rules,
		car: {
			tires: {left: '86.1 in', right: '86.3 in', growth: '0.8 %', slip: '1.5 %', steadySlip: '0.2 %'},
			grip: '1.2 ± 0.05',
			power: '98.2 % ± 0.5 %',
			mass: '3640 lb',
			dragArea: '1 m^2 ± 0.02 m^2',
			downforceArea: '1.5 m^2',
		},
		learned: [learned('car.dragArea', '1 m^2 ± 0.02 m^2')],
	});

export const completeCar = () =>
	carDocument({
		$schema: './car.json',
		fuelDensity: '0.745 kg/L',
		tank: '18 gal',
		rearDownforceShare: 0.55,
		undrivenInertia: '2 kg m^2',
		wheelbase: '110 in',
		cgHeight: '18 in',
		shiftTime: '0.08 s',
		reactionTime: '0.25 s',
		engines: [
			engine({
				for: ['short', 'road'],
				correctedTo: 'J1349',
				limiter: 9300,
				pullRpm: 4000,
				bandShare: 0.9,
				fuelConsumption: '0.28 kg/(kW h)',
				power: '99 %',
			}),
		],
		gearInventory: {
			gears: [
				{gear: 1, ratio: 2.9, pieces: 2, fits: ['X']},
				{gear: 2, ratio: 2.04, fits: ['X']},
				{gear: 3, ratio: 1.58},
				{gear: 4, ratio: 1.24},
				{gear: 5, ratio: 1},
			],
			smallestStep: 1.1,
			largestStep: 1.5,
		},
		efficiency: undefined,
		efficiencies: [0.9, 0.91, 0.92, 0.93, 0.94],
		tires: {left: '86.4 in', right: '86.6 in', growth: '0.8 %', slip: '1.5 %', steadySlip: '0 %'},
		rack: {
			toothSums: [71, 72],
			eitherShaft: true,
			pairs: [
				{driving: 33, driven: 38, sets: 2, miles: 310, maxMiles: 1200},
				{driving: 36, driven: 36},
			],
		},
		margins: {
			limitRpm: 100,
			shiftRpm: 100,
			downshiftRpm: 200,
			cleanRpm: 2500,
			settleStart: '0.6 s',
			settleEnd: '0.5 s',
			sameTime: '0.02 s',
			level: '0.02 s',
		},
		installed: {pair: '38/33', gearbox: 'A'},
		rules: {short: rules, intermediate: {}, superspeedway: {}, road: {}},
		learned: [learned('tires.growth', '0.8 %')],
	});
