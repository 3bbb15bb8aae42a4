import {describe, expect, test} from 'vitest';
import type {Car} from '../../source/drivetrain/car.ts';
import type {Track} from '../../source/drivetrain/track.ts';
import {rankRack} from '../../source/planning/rank-rack.ts';
import type {Fault} from '../../source/planning/results.ts';
import {add, car, foot, mph, pair, rackPair, scale, situation, straight, track} from './build.ts';

function faultsOf(carChange: Partial<Car>, trackChange: Partial<Track> = {}, only?: string): Fault[] {
	const ranking = rankRack(car(carChange), track(trackChange), {situation: only});
	return ranking.ok ? [] : ranking.faults;
}

const measured = {endMps: 50, rpm: undefined, pair: undefined, gearbox: undefined, gear: undefined};

describe('a fault', () => {
	test('is a track without a straight, a rack without a pair', () => {
		expect(faultsOf({}, {straights: []})).toEqual([
			{document: 'track', path: 'straights', found: 'no straight', allowed: 'at least one'},
		]);
		expect(faultsOf({rack: {...car().rack, pairs: []}, installed: undefined})).toMatchObject([{path: 'rack.pairs'}]);
	});

	test('is a type of track that no engine is for', () => {
		expect(faultsOf({}, {type: 'superspeedway'})).toEqual([
			{
				document: 'car',
				path: 'engines',
				found: 'no engine for the track type superspeedway',
				allowed: 'an engine with "superspeedway" in its "for"',
			},
		]);
	});

	test('is an unknown situation, with the known ones', () => {
		expect(faultsOf({}, {}, 'Rain')).toEqual([
			{document: 'command', path: 'situation', found: '"Rain"', allowed: 'one of Base, In the tow, Long run'},
		]);
	});

	test('is an unknown pair or gearbox in what is installed, measured or ruled, all listed at once', () => {
		const rules = {rpmLimit: undefined, gearboxes: ['A', 'Y'], pairs: undefined};
		const straights = [straight('Front', {measured: {...measured, pair: pair(1, 2), gearbox: 'Z', gear: 7}})];
		const found = faultsOf({installed: {pair: pair(3, 4), gearbox: 'X'}, rules: {road: rules}}, {straights, rules});
		expect(found.map(({document, path, found: what}) => [document, path, what])).toEqual([
			['car', 'installed.pair', '"3/4"'],
			['car', 'installed.gearbox', '"X"'],
			['track', 'straights.Front.measured.pair', '"1/2"'],
			['track', 'straights.Front.measured.gearbox', '"Z"'],
			['car', 'rules.road.gearboxes', '"Y"'],
			['track', 'rules.gearboxes', '"Y"'],
			['track', 'straights.Front.measured.gear', 'gear 7'],
		]);
	});

	test('is a gear that no gearbox has', () => {
		const pitRoad = {limitMps: 18, toleranceMps: 2, gear: 6};
		expect(faultsOf({}, {pitRoad, gears: {lowest: 6, highest: 7}})).toMatchObject([
			{path: 'pitRoad.gear', found: 'gear 6', allowed: 'at most 5: no gearbox of this car has more than 5 gears'},
			{path: 'gears', found: 'gears 6 to 7'},
		]);
	});

	test('is a list of efficiencies that is too short', () => {
		expect(faultsOf({efficiencies: [0.9, 0.91]})).toMatchObject([
			{path: 'efficiencies', found: '2 for the 5 gears of gearbox A'},
		]);
	});

	test('is a situation that leaves no speed, mass or grip', () => {
		const situations = [situation('Base'), situation('Odd', {exit: add(-100 * mph), mass: scale(0), grip: add(-2)})];
		expect(faultsOf({}, {situations}).map(({path, found}) => [path, found])).toEqual([
			['situations.Odd.mass', 'a change that leaves nothing'],
			['situations.Odd.grip', 'a change that leaves nothing'],
			['situations.Odd.exit', '-12.0 mph (-19.3 km/h) on Front'],
			['situations.Odd.exit', '-8.0 mph (-12.9 km/h) on Back'],
		]);
	});

	test('is a grip that lifts the front axle', () => {
		expect(faultsOf({wheelbaseM: 1, cgHeightM: 1})[0]).toMatchObject({path: 'situations.Base.grip'});
	});
});

describe('what no row can run', () => {
	test('is an exit above every gear’s limit in every row, with the speed that the tallest row allows', () => {
		const faults = faultsOf({}, {straights: [straight('Front', {exitMps: 250 * mph})]});
		expect(faults).toHaveLength(1);
		expect(faults[0]).toMatchObject({document: 'track', path: 'straights.Front.exit'});
		expect(faults[0]!.found).toMatch(
			/^250\.0 mph \(402\.3 km\/h\): \d{4,5} rpm or more in every allowed gear of every row$/,
		);
		expect(faults[0]!.allowed).toMatch(
			/^at most \d{3}\.\d mph \(\d{3}\.\d km\/h\), which is 9200 rpm in the tallest row$/,
		);
	});

	test('is the same exit in a situation, which is named', () => {
		const situations = [situation('Base'), situation('Rocket', {exit: add(200 * mph)})];
		expect(faultsOf({}, {situations})[0]!.found).toContain('in the situation "Rocket"');
	});

	test('is a grade on which the car stops in every row', () => {
		const hill = straight('Hill', {exitMps: 40 * mph, grade: 2, lengthM: 900 * foot});
		expect(faultsOf({}, {straights: [hill]})).toEqual([
			{
				document: 'track',
				path: 'straights.Hill.grade',
				found: 'from 40.0 mph (64.4 km/h) the car stops within 900 ft (274 m) at a grade of 200.0 % in every row',
				allowed: 'a grade, wind and length that one pair and set at least can drive through',
			},
		]);
	});

	test('is an exit from which it cannot brake to the entry speed in the length', () => {
		const short = straight('Short', {exitMps: 100 * mph, entryMps: 40 * mph, brakingMps2: 9, lengthM: 30});
		// √((40 mph)² + 2·9·30) = √(319.74 + 540) = 29.32 m/s = 65.6 mph
		expect(faultsOf({}, {straights: [short]})).toEqual([
			{
				document: 'track',
				path: 'straights.Short.exit',
				found: '100.0 mph (160.9 km/h), from which the car cannot brake to 40.0 mph (64.4 km/h) in 98 ft (30 m)',
				allowed: 'at most 65.6 mph (105.6 km/h)',
			},
		]);
	});

	test('is a result where one row can', () => {
		const rack = {...car().rack, pairs: [rackPair(33, 38), rackPair(20, 50)]};
		expect(faultsOf({rack}, {straights: [straight('Front', {exitMps: 115 * mph})]})).toEqual([]);
	});
});
