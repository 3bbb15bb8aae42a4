import fc from 'fast-check';
import {describe, expect, test} from 'vitest';
import type {Car} from '../../source/drivetrain/car.ts';
import type {Track} from '../../source/drivetrain/track.ts';
import {fuelAnswer, lifeAnswer} from '../../source/life/answer.ts';
import type {LifeOptions} from '../../source/life/options.ts';
import {rankRack} from '../../source/planning/rank-rack.ts';
import {car, engine, foot, mph, pair, situation, straight, track} from '../planning/build.ts';
import {runs} from '../runs.ts';
import {shippedCar, shippedTrack} from '../tracks/demo.ts';

const mile = 1609.344;
const gallonM3 = 3.785411784e-3;
const lapped = (changes: Partial<Track> = {}) => track({lapM: 0.5 * mile, laps: 300, ...changes});
const life = (options: LifeOptions = {}, at: Track = lapped(), with_: Car = car()) => {
	const outcome = lifeAnswer(with_, at, options);
	if (!outcome.ok) throw new Error(JSON.stringify(outcome.faults));
	return outcome.value;
};
const fuel = (options: LifeOptions = {}, at: Track = lapped(), with_: Car = car()) => {
	const outcome = fuelAnswer(with_, at, options);
	if (!outcome.ok) throw new Error(JSON.stringify(outcome.faults));
	return outcome.value;
};
const faults = (options: LifeOptions, at = lapped()) => {
	const outcome = lifeAnswer(car(), at, options);
	return outcome.ok ? [] : outcome.faults;
};
const milesPerGallon = (fuelM3PerM: number | null) => gallonM3 / mile / fuelM3PerM!;
const total = (numbers: readonly number[]) => numbers.reduce((sum, number) => sum + number, 0);

describe('engine life', () => {
	test('the dwell adds up to the straights and the corners', () => {
		// Corners: 2640 ft less 1450 ft over two, at the mean speeds of their halves (recomputed).
		const at = lapped({situations: [situation('Base')]});
		const [told] = life({}, at).pairs;
		const ranked = rankRack(car(), at);
		if (!ranked.ok) throw new Error('not ranked');
		const row = ranked.value.rows.find(({pair, gearbox}) => pair === told!.pair && gearbox === told!.gearbox)!;
		const [front, back] = row.situations[0]!.straights;
		const half = ((2640 - 1450) / 4) * foot;
		const leg = (from: number, to: number) => (2 * half) / (from + to);
		const intoBack = leg(front!.finalSpeedMps, 84 * mph) + leg(84 * mph, 92 * mph);
		const intoFront = leg(back!.finalSpeedMps, 80 * mph) + leg(80 * mph, 88 * mph);
		const lapS = row.timeS! + intoBack + intoFront;
		expect(Math.abs(total(told!.dwell.map(each => each.lapS)) - lapS)).toBeLessThan(1e-9);
		expect(Math.abs(told!.lapS - lapS)).toBeLessThan(1e-9);
	});

	test('a race is its laps', () => {
		const [told] = life({laps: 40}).pairs;
		expect(told!.raceS).toBeCloseTo(40 * told!.lapS, 9);
		expect(told!.turnsPerRace).toBeCloseTo(40 * told!.turnsPerLap, 6);
		expect(told!.dwell[0]!.raceS).toBeCloseTo(40 * told!.dwell[0]!.lapS, 9);
		expect(life().laps).toBe(300);
	});

	test('the mean is over the situations by share', () => {
		const at = lapped({
			situations: [situation('Base', {share: 3}), situation('Long run', {exit: {kind: 'add', value: -2 * mph}})],
		});
		const [base, long, mean] = ['Base', 'Long run', undefined].map(name => life({situation: name}, at).pairs[0]!);
		expect(mean!.turnsPerLap).toBeCloseTo(0.75 * base!.turnsPerLap + 0.25 * long!.turnsPerLap, 6);
		expect(mean!.highestRpm).toBe(Math.max(base!.highestRpm, long!.highestRpm));
	});

	test('the time above an RPM is the dwell above it where that is a whole step', () => {
		const [told] = life({aboveRpm: 8000}).pairs;
		const above = told!.dwell.filter(({fromRpm}) => fromRpm >= 8000).map(({lapS}) => lapS);
		expect(told!.aboveLapS).toBeCloseTo(total(above), 12);
		expect(life({aboveRpm: 8100}).pairs[0]!.aboveLapS).toBeLessThan(told!.aboveLapS);
	});

	test('unless asked it tells the time above 500 rpm under the limit', () => {
		expect(life().aboveRpm).toBe(8700);
	});

	test('without the length of the lap, or of a straight, nothing is told of a race', () => {
		const without = life({}, track({laps: 300}));
		expect([without.pairs[0]!.turnsPerRace, without.lapM, without.cornerM]).toEqual([null, null, null]);
		expect(without.assumptions[0]).toBe('The track has no "lap": its corners are left out.');
		const straights = [straight('Front'), straight('Back', {lengthM: undefined})];
		expect(life({}, lapped({straights})).assumptions[0]).toBe('Back has no length: left out, and the corners too.');
	});

	test('straights that make up the lap leave no corners', () => {
		const all = life({}, lapped({lapM: 1450 * foot}));
		expect(all.cornerM).toBe(0);
		expect(all.assumptions[0]).toBe('The straights make up the whole lap: no corners.');
	});

	test('no straight with a length is bad input', () => {
		expect(faults({}, lapped({straights: [straight('Front', {lengthM: undefined})]}))).toMatchObject([
			{document: 'track', path: 'straights'},
		]);
	});
});

describe('which pairs', () => {
	const names = (options: LifeOptions) => life(options).pairs.map(({pair, gearbox}) => `${pair} ${gearbox}`);

	test('the installed one against the first of the ranking, another against the installed one', () => {
		const [first] = (rankRack(car(), lapped()) as {value: {rows: {pair: string; gearbox: string}[]}}).value.rows;
		expect(names({})).toEqual(['33/38 A', `${first!.pair} ${first!.gearbox}`]);
		expect(names({pair: pair(32, 39)})).toEqual(['32/39 A', '33/38 A']);
	});

	test('against a pair of the same set', () => {
		expect(names({gearbox: 'B', against: pair(31, 40)})).toEqual(['33/38 B', '31/40 B']);
		expect(names({against: pair(33, 38)})).toEqual(['33/38 A']);
	});

	test('a pair that is not there is said', () => {
		expect(faults({pair: pair(1, 2), against: pair(3, 4)}).map(({path}) => path)).toEqual(['pair', 'against']);
	});

	test('a pair that cannot run here is said; an installed one is passed over', () => {
		const fast = lapped({straights: [straight('Front', {exitMps: 185 * mph, lengthM: 800 * foot})]});
		expect(faults({pair: pair(31, 40)}, fast)[0]?.found).toMatch(/^31\/40 A, which does not run here/);
		const tall = car({installed: {pair: pair(31, 40), gearbox: 'A'}});
		const told = life({}, fast, tall);
		expect(told.pairs[0]!.pair).not.toBe('31/40');
		expect(told.remarks[0]).toMatch(
			new RegExp(
				String.raw`^31/40 A does not run here \(.+\): ${told.pairs[0]!.pair} A, the first that does, is shown\.$`,
			),
		);
	});
});

describe('fuel', () => {
	test('the demo at its flat-out track goes 4 to 6 miles to the gallon', async () => {
		// Common practice, no source: 4 to 6 mpg at race speed.
		const told = fuel({}, await shippedTrack('ostrand-flats.json'), await shippedCar('demo.json'));
		for (const {fuelM3PerM} of told.pairs) {
			expect(milesPerGallon(fuelM3PerM)).toBeGreaterThan(4);
			expect(milesPerGallon(fuelM3PerM)).toBeLessThan(6);
		}
	});

	test('an unusual consumption is said', () => {
		const remarks = (kgPerKwh: number) =>
			fuel({}, lapped(), car({engines: [engine({fuelConsumptionKgPerJ: kgPerKwh / 3.6e6})]})).remarks[0] ?? '';
		expect(remarks(0.2)).toBe('The car has no "tank".');
		const tank = car({tankM3: 0.07, engines: [engine({fuelConsumptionKgPerJ: 0.2 / 3.6e6})]});
		expect(fuel({}, lapped(), tank).remarks[0]).toBe(
			'Fuel consumption of 0.200 kg/kWh: handbooks give 0.26 to 0.34 at full load.',
		);
		const usual = car({tankM3: 0.07, engines: [engine({fuelConsumptionKgPerJ: 0.34 / 3.6e6})]});
		expect(fuel({}, lapped(), usual).remarks[0]).not.toMatch(/consumption/);
	});

	test('at a steady speed the work is the resistance times the way, over the efficiency', () => {
		// One 100 ft straight on which the limiter holds 60 m/s, the rest of a mile at 60 m/s: no gain of speed anywhere.
		const rpm = 60 * 60 * 3.25 * (38 / 33) * 1.58;
		const only = car({
			engines: [engine({limiter: (rpm / 2.1977) * (1 + 1e-12), rpmLimit: 20_000})],
			tires: {leftM: 2.1977, rightM: 2.1977, growth: 0, slip: 0, steadySlip: 0, diameterM: undefined},
		});
		const at = lapped({
			type: 'short',
			lapM: mile,
			restart: undefined,
			pitRoad: undefined,
			situations: [situation('Base')],
			gears: {lowest: 3, highest: 3},
			straights: [straight('Front', {exitMps: 60, minimumMps: 60, lengthM: 100 * foot})],
		});
		const [told] = fuel({}, at, only).pairs;
		// J1349's reference day: 990 hPa of dry air at 25 °C, 1.15674 kg/m³ (recomputed from the gas law).
		const density = 99_000 / (287.058 * 298.15);
		const resistance = 0.5 * density * 3600 * (0.95 + 0.018 * 1.6) + 0.018 * 1650 * 9.80665;
		expect(Math.abs(told!.energyPerLapJ / ((resistance * mile) / 0.92) - 1)).toBeLessThan(1e-6);
	});
});

test('a shorter pair turns the engine more, at any track in any gear that stays the same', () => {
	const anyTrack = fc.record({
		exit: fc.double({min: 25, max: 50, noNaN: true}),
		length: fc.integer({min: 300, max: 1500}),
	});
	fc.assert(
		fc.property(anyTrack, ({exit, length}) => {
			const at = lapped({
				lapM: mile,
				gears: {lowest: 5, highest: 5},
				straights: [straight('Front', {exitMps: exit, lengthM: length * foot})],
			});
			const [shorter, taller] = life({pair: pair(31, 40), against: pair(35, 36)}, at).pairs;
			return shorter!.turnsPerLap > taller!.turnsPerLap && shorter!.meanRpm > taller!.meanRpm;
		}),
		{numRuns: runs(20, 1000)},
	);
});
