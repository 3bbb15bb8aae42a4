import {describe, expect, test} from 'vitest';
import {describeProblems, type Problem, readCar, readTrack} from '../../source/documents/read.ts';
import {carDocument, engine, text, trackDocument} from './examples.ts';

type Fields = Record<string, unknown>;

const problemsOfTrack = async (changes: Fields) => problemsOf(await readTrack(text(trackDocument(changes))));
const problemsOfCar = async (changes: Fields) => problemsOf(await readCar(text(carDocument(changes))));
function problemsOf(reading: {ok: true} | {ok: false; problems: Problem[]}): Problem[] {
	return reading.ok ? [] : reading.problems;
}

const straight = (changes: Fields) => ({straights: [{name: 'Front', exit: '88 mph', ...changes}]});
const gearbox = (...ratios: unknown[]) => ({gearboxes: [{name: 'A', ratios}]});
const curve = (...rpms: number[]) => ({engines: [engine({curve: rpms.map(rpm => ({rpm, torque: '400 N m'}))})]});
const situation = (fields: Fields) => ({situations: [{name: 'S', ...fields}]});

describe('a track', () => {
	test.each<[string, Fields, string, RegExp]>([
		['of another kind', {kind: 'car'}, 'kind', /found "car"; allowed "track"/],
		['of no kind', {kind: undefined}, 'kind', /found nothing/],
		['of a later version', {version: 2}, 'version', /found 2; allowed 1\. Version 2 is newer than this program reads/],
		['of no version', {version: '1'}, 'version', /found "1"; allowed 1/],
		['without straights', {straights: []}, 'straights', /found a list of 0; allowed a list of 1 to 200/],
		['that lacks straights', {straights: undefined}, 'straights', /found nothing/],
		[
			'with a bare number',
			straight({length: 650}),
			'straights[0].length',
			/found 650; allowed a length with its unit \(in, ft/,
		],
		['with a number without unit', straight({length: '650'}), 'straights[0].length', /no unit/],
		['with the wrong dimension', straight({length: '650 mph'}), 'straights[0].length', /mph is a speed/],
		['with an unknown unit', straight({exit: '88 mhp'}), 'straights[0].exit', /unknown unit mhp.*Did you mean "mph"/],
		['with a decimal comma', straight({exit: '88,5 mph'}), 'straights[0].exit', /Write 88\.5/],
		['with NaN', straight({exit: 'NaN mph'}), 'straights[0].exit', /NaN/],
		[
			'with an exit speed of zero',
			straight({exit: '0 mph'}),
			'straights[0].exit',
			/more than 0 mph and at most 447\.4 mph/,
		],
		['with a speed out of range', straight({exit: '900 km/h'}), 'straights[0].exit', /at most 720 km\/h/],
		['with a steep grade', straight({grade: '31 %'}), 'straights[0].grade', /from -30 % to 30 %/],
		['with entry but no braking', straight({length: '1 km', entry: '90 mph'}), 'straights[0].braking', /found nothing/],
		['with braking but no entry', straight({length: '1 km', braking: '1 g'}), 'straights[0].entry', /found nothing/],
		['with end and length', straight({length: '1 km', end: '90 mph'}), 'straights[0].end', /only without "length"/],
		['with gears that leave one out', straight({gears: [2, 4]}), 'straights[0].gears', /without gaps/],
		['with falling gears', {gears: [4, 3]}, 'gears', /rising order/],
		['with half a gear', {gears: [1.5]}, 'gears[0]', /whole number/],
		['with a gear as text', straight({measured: {gear: '4'}}), 'straights[0].measured.gear', /found "4"/],
		[
			'with a pair of zero teeth',
			straight({measured: {pair: '33/0'}}),
			'straights[0].measured.pair',
			/driving\/driven/,
		],
		['with too many teeth', {rules: {pairs: ['401/38']}}, 'rules.pairs[0]', /from 1 to 400/],
		['with an unknown type', {type: 'shrot'}, 'type', /Did you mean "short"/],
		['with an unknown field', {strights: []}, 'strights', /unknown field.*Did you mean "straights"/],
		['with an unknown field deep down', straight({exitt: '1 mph'}), 'straights[0].exitt', /Did you mean "exit"/],
		[
			'with a name twice',
			{
				straights: [
					{name: 'F', exit: '88 mph'},
					{name: 'F', exit: '80 mph'},
				],
			},
			'straights[1].name',
			/a second "F"/,
		],
		['with a situation twice', {situations: [{name: 'S'}, {name: 'S'}]}, 'situations[1].name', /a second "S"/],
		['with an empty name', {name: ' '}, 'name', /1 to 200 characters/],
		[
			'with more in Base than a share',
			{situations: [{name: 'Base', exit: '+1 mph'}]},
			'situations[0].exit',
			/only "share"/,
		],
		['with no share anywhere', {situations: [{name: 'Base', share: 0}]}, 'situations', /a share of 0 everywhere/],
		[
			'with both pressures',
			{air: {pressure: '1000 hPa', altimeter: '1000 hPa', elevation: '0 m'}},
			'air.altimeter',
			/either/,
		],
		['with an altimeter without elevation', {air: {altimeter: '1000 hPa'}}, 'air.elevation', /found nothing/],
		['with an elevation alone', {air: {elevation: '10 m'}}, 'air.elevation', /only with "altimeter"/],
		['with humidity and dew point', {air: {humidity: '40 %', dewPoint: '10 degC'}}, 'air.dewPoint', /either/],
		[
			'with a dew point above the temperature',
			{air: {temperature: '20 degC', dewPoint: '21 degC'}},
			'air.dewPoint',
			/no higher/,
		],
		['below absolute zero', {air: {temperature: '-300 degC'}}, 'air.temperature', /from -60 degC to 70 degC/],
		[
			'with an unsigned percentage of drag',
			situation({drag: '15 %'}),
			'situations[0].drag',
			/with a sign, like "\+15 %"/,
		],
		['with all power gone', situation({power: '-100 %'}), 'situations[0].power', /more than nothing/],
		['with half a wind', situation({wind: {speed: '3 mph'}}), 'situations[0].wind.from', /no wind/],
		['with grip as an object', situation({grip: {}}), 'situations[0].grip', /found an object; allowed a number/],
		[
			'with a tire size and a diameter',
			{car: {tires: {size: '275/40R17', diameter: '27 in'}}},
			'car.tires.diameter',
			/either/,
		],
		['with an unreadable tire size', {car: {tires: {size: 'wide'}}}, 'car.tires.size', /275\/40R17/],
		['with null', {lap: null}, 'lap', /found null/],
	])('%s', async (_, changes, path, message) => {
		const problems = await problemsOfTrack(changes);
		expect(problems.map(problem => problem.path)).toEqual([path]);
		expect(describeProblems('x.json', problems)).toMatch(message);
	});
});

describe('a car', () => {
	test.each<[string, Fields, string, RegExp]>([
		['with a negative ratio', gearbox(2.9, -1), 'gearboxes[0].ratios[1]', /found -1; allowed a number, more than 0/],
		['with a ratio of zero', gearbox(0), 'gearboxes[0].ratios[0]', /found 0/],
		['with a rising ratio', gearbox(2.9, 3), 'gearboxes[0].ratios[1]', /no more than the 2\.9/],
		['without a ratio', gearbox(), 'gearboxes[0].ratios', /a list of 0/],
		['with a falling curve', curve(4000, 6000, 5000), 'engines[0].curve[2].rpm', /more than the 6000/],
		['with the same RPM twice', curve(4000, 4000, 5000), 'engines[0].curve[1].rpm', /more than the 4000/],
		['with two curve points', curve(4000, 6000), 'engines[0].curve', /a list of 2; allowed a list of 3/],
		['with an engine for no type', {engines: [engine({for: []})]}, 'engines[0].for', /a list of 0/],
		[
			'with an engine for a type twice',
			{engines: [engine({for: ['road', 'road']})]},
			'engines[0].for[1]',
			/a second "road"/,
		],
		['with an engine name twice', {engines: [engine(), engine()]}, 'engines[1].name', /a second "Open"/],
		[
			'with a pair twice',
			{
				rack: {
					pairs: [
						{driving: 3, driven: 4},
						{driving: 3, driven: 4},
					],
				},
			},
			'rack.pairs[1]',
			/a second "3\/4"/,
		],
		['with half a tooth', {rack: {pairs: [{driving: 3.5, driven: 4}]}}, 'rack.pairs[0].driving', /whole number/],
		['without a pair', {rack: {pairs: []}}, 'rack.pairs', /a list of 0/],
		['without efficiency', {efficiency: undefined}, 'efficiency', /"efficiencies", one a gear/],
		['with an efficiency above 1', {efficiency: 1.01}, 'efficiency', /at most 1/],
		[
			'with too few efficiencies',
			{efficiency: undefined, efficiencies: [0.9]},
			'efficiencies',
			/each of the 5 gears of gearbox "A"/,
		],
		['with a wheelbase alone', {wheelbase: '110 in'}, 'cgHeight', /found nothing/],
		[
			'with an unknown installed gearbox',
			{installed: {pair: '33/38', gearbox: 'B'}},
			'installed.gearbox',
			/a gearbox of this car: "A"/,
		],
		[
			'with an unknown installed pair',
			{installed: {pair: '38/33', gearbox: 'A'}},
			'installed.pair',
			/a pair of this rack/,
		],
		[
			'with a gearbox whose name cannot be read, which may be the installed one',
			{gearboxes: [{name: {}, ratios: [1]}], installed: {pair: '33/38', gearbox: 'A'}},
			'gearboxes[0].name',
			/found an object/,
		],
		[
			'with nothing in the place of a pair',
			{rack: {eitherShaft: true, pairs: [{driving: 33, driven: 38}, null]}, installed: {pair: '38/33', gearbox: 'A'}},
			'rack.pairs[1]',
			/found null/,
		],
		[
			'with single gears that leave out a gear',
			{
				gearInventory: {
					gears: [
						{gear: 1, ratio: 2},
						{gear: 3, ratio: 1},
					],
				},
			},
			'gearInventory.gears',
			/found none for gear 2; allowed a gear for every place up to 3/,
		],
		[
			'with a largest step below the smallest',
			{gearInventory: {gears: [{gear: 1, ratio: 2}], smallestStep: 1.3, largestStep: 1.2}},
			'gearInventory.largestStep',
			/no less than the "smallestStep" 1\.3/,
		],
		[
			'with single gears for another number of gears than efficiencies',
			{
				efficiency: undefined,
				efficiencies: [0.9, 0.9, 0.9, 0.9, 0.9],
				gearInventory: {
					gears: [
						{gear: 1, ratio: 2},
						{gear: 2, ratio: 1},
					],
				},
			},
			'efficiencies',
			/one for each of the 2 gears of "gearInventory"/,
		],
		['with rules for an unknown gearbox', {rules: {road: {gearboxes: ['B']}}}, 'rules.road.gearboxes[0]', /"A"/],
		['with rules for an unknown type', {rules: {raod: {}}}, 'rules.raod', /Did you mean "road"/],
		['with a bare mass', {mass: 3650}, 'mass', /found 3650; allowed a mass with its unit \(lb, kg/],
		['with an impossible mass', {mass: '3650 t'}, 'mass', /from 0\.1 t to 5 t/],
		['with a grip out of range', {grip: 6}, 'grip', /from 0 to 5/],
		['with too much growth', {tires: {left: '2 m', right: '2 m', growth: '11 %'}}, 'tires.growth', /from 0 % to 10 %/],
		[
			'with a flag as text',
			{rack: {eitherShaft: 'no', pairs: [{driving: 3, driven: 4}]}},
			'rack.eitherShaft',
			/true or false/,
		],
	])('%s', async (_, changes, path, message) => {
		const problems = await problemsOfCar(changes);
		expect(problems.map(problem => problem.path)).toEqual([path]);
		expect(describeProblems('x.json', problems)).toMatch(message);
	});
});

test('every problem is listed at once, in the order of the text, with line and column', async () => {
	const lines = [
		'{ "kind": "track", "version": 1,',
		'  "type": "shrt",',
		'  "nmae": "x",',
		'  "straights": [',
		'    { "name": "F", "exit": 88, "entry": "90 mph" },',
		'    { "name": "F", "exit": "80 mph", "gears": [1.5] }',
		'  ],',
		'  "air": { "humidity": "140 %" },',
		'  "type": "road"',
		'}',
	];
	const problems = problemsOf(await readTrack(lines.join('\n')));
	expect(problems.map(({path, line, column}) => [path, line, column])).toEqual([
		['name', 1, 1],
		['nmae', 3, 3],
		['straights[0].braking', 5, 5],
		['straights[0].exit', 5, 28],
		['straights[1].name', 6, 15],
		['straights[1].gears[0]', 6, 48],
		['air.humidity', 8, 24],
		['type', 9, 3],
	]);
	expect(describeProblems('a.json', problems.slice(1, 2))).toMatch(
		/^a\.json:3:3: nmae: found an unknown field; allowed one of /,
	);
});

test('a list of gears with something else in it is shown as it can be read', async () => {
	const problems = await problemsOfTrack({gears: [3, 2, [{}]]});
	expect(problems.map(({path, found}) => [path, found])).toEqual([
		['gears', '[3, 2, a list of 1]'],
		['gears[2]', 'a list of 1'],
	]);
});

test('a gearbox whose name cannot be read is named by its place', async () => {
	const gearboxes = [{name: {}, ratios: [2, 1]}];
	const problems = await problemsOfCar({gearboxes, efficiency: undefined, efficiencies: [0.9]});
	expect(problems.map(({path, allowed}) => [path, allowed])).toEqual([
		['gearboxes[0].name', expect.stringMatching(/1 to 200 characters/)],
		['efficiencies', 'one for each of the 2 gears of gearbox number 1'],
	]);
});

test('a list that is too short is searched all the same', async () => {
	const short = [
		{rpm: 4000, torque: 5},
		{rpm: '6000', torque: '1 N m'},
	];
	const problems = await problemsOfCar({engines: [engine({curve: short})]});
	expect(problems.map(({path}) => path)).toEqual([
		'engines[0].curve',
		'engines[0].curve[0].torque',
		'engines[0].curve[1].rpm',
	]);
});

test('a unit that nobody knows stands beside the other problems', async () => {
	const problems = await problemsOfTrack({lap: '3 blarg', ...straight({exit: '88 rod', length: '200 rod'})});
	expect(problems.map(({path, found}) => [path, found])).toEqual([
		['straights[0].exit', '"88 rod" (rod is a length)'],
		['lap', '"3 blarg" (unknown unit blarg)'],
	]);
});

test('a long list of problems is cut, and says so', () => {
	const problems = Array.from({length: 150}, (_, i) => ({path: `a[${i}]`, found: 'x', allowed: 'y'}));
	const lines = describeProblems('f', problems).split('\n');
	expect(lines).toHaveLength(101);
	expect(lines.at(-1)).toBe('f: and 50 more problems');
});
