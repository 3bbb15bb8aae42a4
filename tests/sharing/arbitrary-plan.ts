/** Arbitrary valid plans: any text where text may stand, quantities in many spellings, every field there or not. */
import fc from 'fast-check';
import type {PlanDocument} from '../../source/sharing/plan-document.ts';

const awkward = [
	'5',
	'true',
	'-0',
	'{none}',
	'{}',
	'A, B; C: D',
	"Joe's",
	'St. Louis',
	'  x  ',
	'a\u00a0b',
	'[k7q]',
	'> a',
	'Check:',
];
const names = fc
	.oneof(
		fc.string({unit: 'grapheme', minLength: 1, maxLength: 20}),
		fc.string({unit: 'binary', minLength: 1, maxLength: 12}),
		fc.string({unit: fc.constantFrom(...'ab1 -+/.,;:{}[]()\'"*_~`%^<>&#@\n\t\ud800é漢'), minLength: 1, maxLength: 90}),
		fc.constantFrom('Front', 'Back stretch', 'In the tow', 'Open 2', 'A'),
		fc.constantFrom(...awkward),
	)
	.filter(text => /\S/.test(text));
const uniqueNames = (minLength: number, maxLength: number) => fc.uniqueArray(names, {minLength, maxLength});
const setNames = (count: number) => fc.uniqueArray(names, {minLength: count, maxLength: count});

const number = (min: number, max: number) =>
	fc.oneof(
		fc.double({min, max, noNaN: true, noDefaultInfinity: true}),
		fc.integer({min: Math.ceil(min), max: Math.floor(max)}),
	);
/** The value in the unit, as people type it. */
const quantity = (min: number, max: number, ...units: string[]) =>
	fc
		.tuple(
			fc.integer({min: min * 100, max: max * 100}),
			fc.constantFrom(...units),
			fc.constantFrom(' ', '', '  ', '\u00a0'),
			fc.constantFrom('', '+0', '*1', '-0.0', '÷1', '−0'),
		)
		.map(([hundredths, unit, gap, more]) => `${hundredths / 100}${more}${gap}${unit}`);
const temperature = () =>
	fc.integer({min: 40, max: 110}).chain(t => fc.constantFrom(`${t} degF`, `${t}°F`, `${t}  °F`));
const change = (most: number, ...units: string[]) =>
	fc
		.tuple(fc.constantFrom('+', '-', '−'), fc.integer({min: 0, max: most * 10}), fc.constantFrom(...units, '%'))
		.map(([sign, tenths, unit]) => `${sign}${tenths / 10} ${unit}`);
/** Some fields always, the others there or not. */
const record = <T extends Record<string, fc.Arbitrary<unknown>>>(fields: T, requiredKeys: (keyof T & string)[] = []) =>
	fc.record(fields, {requiredKeys, noNullPrototype: true});

const whole = <T extends Record<string, fc.Arbitrary<unknown>>>(fields: T) =>
	fc.record(fields, {noNullPrototype: true});

const speed = quantity(60, 90, 'mph', 'km/h');
const gears = fc
	.tuple(fc.integer({min: 1, max: 4}), fc.integer({min: 1, max: 5}))
	.map(([a, n]) => Array.from({length: n}, (_, i) => a + i));
const teeth = fc.integer({min: 1, max: 400});
const pairs = fc.tuple(teeth, teeth);
const pairText = pairs.map(([a, b]) => `${a}/${b}`);
const wind = record({speed: quantity(0, 20, 'mph'), from: quantity(0, 360, 'deg')}, ['speed', 'from']);
const air = record({temperature: temperature(), pressure: quantity(28, 30, 'inHg'), humidity: quantity(0, 99, '%')});

const straight = (name: string) =>
	fc
		.tuple(
			record({
				minimum: speed,
				grade: change(5, '%'),
				heading: quantity(0, 360, 'deg', '°'),
				load: number(0.5, 3),
				extraDrag: quantity(0, 900, 'N', 'lbf'),
				gears,
				measured: record({
					end: speed,
					rpm: number(1, 9000),
					pair: pairText,
					gearbox: names,
					gear: fc.integer({min: 1, max: 20}),
				}),
			}),
			fc.oneof(
				record({end: speed}),
				record({length: quantity(300, 900, 'ft', 'm')}),
				record({entry: speed, braking: quantity(0.1, 2, 'g')}, ['entry', 'braking']),
			),
			speed,
		)
		.map(([some, more, exit]) => ({name, exit, ...some, ...more}));

const situation = (name: string) =>
	name === 'Base'
		? whole({name: fc.constant(name), share: number(0.1, 10)})
		: record(
				{
					name: fc.constant(name),
					share: number(0.1, 10),
					exit: change(5, 'mph'),
					drag: change(9, '%'),
					grip: fc.oneof(number(0.5, 3), fc.constantFrom('1.2', '+0.05', '-3 %')),
					power: change(9, 'hp'),
					mass: fc.oneof(change(50, 'lb'), quantity(2000, 4000, 'lb')),
					rollout: change(1, 'in'),
					air,
					wind,
					headwind: quantity(0, 20, 'mph'),
				},
				['name'],
			);

const rules = record({
	rpmLimit: number(1, 9000),
	gearboxes: uniqueNames(1, 3),
	pairs: fc.array(pairText, {minLength: 1, maxLength: 4}),
});

const track = fc.tuple(uniqueNames(1, 5), uniqueNames(0, 4)).chain(([straights, situations]) =>
	record(
		{
			kind: fc.constant('track'),
			version: fc.constant(1),
			$schema: fc.constantFrom('', './track.schema.json', 'https://example.org/a?b=c#d'),
			name: names,
			type: fc.constantFrom('short', 'intermediate', 'superspeedway', 'road'),
			lap: quantity(1, 3, 'mi', 'km'),
			laps: fc.integer({min: 1, max: 500}),
			air,
			wind,
			pitRoad: record({limit: speed, tolerance: quantity(0, 5, 'mph'), gear: fc.integer({min: 1, max: 5})}, ['limit']),
			restart: record({speed, distance: quantity(100, 900, 'ft'), gear: fc.integer({min: 1, max: 5})}, [
				'speed',
				'distance',
			]),
			gears,
			straights: fc.tuple(...straights.map(straight)),
			situations: fc.tuple(...situations.map(situation)),
			rules,
			car: record({
				tires: record({left: quantity(80, 90, 'in'), growth: quantity(0, 2, '%'), size: fc.constant('275/40R17')}),
				grip: number(0, 5),
				mass: quantity(3000, 4000, 'lb'),
			}),
		},
		['kind', 'version', 'name', 'type', 'straights'],
	),
);

const curve = fc
	.uniqueArray(fc.integer({min: 1, max: 30_000}), {minLength: 3, maxLength: 8})
	.chain(rpms =>
		fc.tuple(
			...rpms.sort((a, b) => a - b).map(rpm => quantity(1, 600, 'lbf ft', 'N m').map(torque => ({rpm, torque}))),
		),
	);
const engine = (name: string) =>
	record(
		{
			name: fc.constant(name),
			for: fc.uniqueArray(fc.constantFrom('short', 'intermediate', 'superspeedway', 'road'), {minLength: 1}),
			rpmLimit: number(1, 30_000),
			inertia: quantity(0, 1, 'kg m^2', 'kg·m²'),
			correctedTo: fc.constantFrom('J1349', 'J607', 'air'),
			limiter: number(1, 30_000),
			bandShare: number(0.1, 1),
			fuelConsumption: quantity(1, 2, 'lb/(hp h)', 'lb/hp h'),
			curve,
		},
		['name', 'for', 'rpmLimit', 'inertia', 'curve'],
	);
const ratios = fc.array(number(0.1, 10), {minLength: 1, maxLength: 6}).map(list => list.sort((a, b) => b - a));

const rackPair = ([driving, driven]: [number, number]) =>
	record(
		{
			driving: fc.constant(driving),
			driven: fc.constant(driven),
			sets: fc.nat(9),
			miles: number(0, 900),
			maxMiles: number(1, 900),
		},
		['driving', 'driven'],
	);

const parts = fc.record({
	engines: uniqueNames(1, 2),
	sets: setNames(2),
	pairs: fc.uniqueArray(pairs, {minLength: 1, maxLength: 3, selector: ([a, b]) => `${a}/${b}`}),
});

const car = ({engines, sets, pairs: rack}: {engines: string[]; sets: string[]; pairs: [number, number][]}) =>
	record(
		{
			kind: fc.constant('car'),
			version: fc.constant(1),
			name: names,
			mass: quantity(3000, 4000, 'lb', 'pounds'),
			rearShare: number(0.1, 1),
			dragArea: quantity(0, 2, 'm^2', 'm²', 'ft²'),
			downforceArea: quantity(0, 3, 'm^2'),
			rolling: number(0, 0.2),
			grip: number(0, 5),
			wheelInertia: quantity(0, 9, 'kg m^2'),
			engines: fc.tuple(...engines.map(engine)),
			gearboxes: fc.tuple(...sets.map(name => ratios.map(list => ({name, ratios: list})))),
			finalDrive: number(1, 9),
			fuelDensity: quantity(1, 1, 'kg/L'),
			tank: quantity(10, 30, 'gal', 'L'),
			efficiency: number(0.5, 1),
			tires: record(
				{left: quantity(80, 90, 'in'), right: quantity(80, 90, 'in"'.slice(0, 2)), growth: quantity(0, 2, '%')},
				['left', 'right'],
			),
			rack: record(
				{
					toothSums: fc.array(fc.integer({min: 2, max: 800}), {minLength: 1, maxLength: 3}),
					eitherShaft: fc.boolean(),
					pairs: fc.tuple(...rack.map(rackPair)),
				},
				['pairs'],
			),
			margins: record({limitRpm: number(0, 100), settleStart: quantity(0, 2, 's')}),
			installed: fc.constant({pair: rack.at(-1)!.join('/'), gearbox: sets.at(-1)!}),
			rules: record({
				short: record({pairs: fc.array(pairText, {minLength: 1}), gearboxes: fc.constant(sets)}),
				road: record({rpmLimit: number(1, 9000)}),
			}),
		},
		[
			'kind',
			'version',
			'name',
			'mass',
			'rearShare',
			'dragArea',
			'downforceArea',
			'rolling',
			'grip',
			'wheelInertia',
			'engines',
			'gearboxes',
			'finalDrive',
			'efficiency',
			'tires',
			'rack',
		],
	);

const rpm = fc.nat(12_000);
const gear = fc.integer({min: 1, max: 20});
const results = record(
	{
		limit: whole({rpm: number(1, 30_000), from: fc.constantFrom('engine', 'rules', 'track')}),
		highest: fc.array(whole({situation: names, rpm, at: fc.oneof(names, fc.constant(''))}), {
			minLength: 1,
			maxLength: 4,
		}),
		shifts: fc.array(whole({from: fc.integer({min: 1, max: 19}), rpm, light: rpm}), {maxLength: 5}),
		pitRoad: whole({gear, rpm, tolerance: rpm}),
		restart: whole({gear, rpm}),
	},
	['limit', 'highest', 'shifts'],
);

export const arbitraryPlan: fc.Arbitrary<PlanDocument> = parts.chain(chosen =>
	record(
		{
			kind: fc.constant('plan'),
			version: fc.constant(1),
			date: fc.constantFrom('2025-06-14', '2025-06-14T18:05:00Z', '2024-02-29T23:59:59.123-04:00'),
			pair: fc.constant(chosen.pairs[0]!.join('/')),
			gearbox: fc.constant(chosen.sets[0]!),
			engine: fc.constant(chosen.engines[0]!),
			results,
			notes: fc.oneof(
				fc.string({unit: 'grapheme', maxLength: 200}),
				fc.constantFrom('', 'Watch the oil, all day.\n\n-- Joe'),
			),
			track,
			car: car(chosen),
		},
		['kind', 'version', 'date', 'pair', 'gearbox', 'engine', 'results', 'track', 'car'],
	),
) as fc.Arbitrary<PlanDocument>;
