/** The fields of a car document: what reads it, and what its JSON Schema is made from. */
import * as z from 'zod/mini';
import {type CorrectedTo, trackTypes} from '../drivetrain/car.ts';
import {carRules, curveRules, efficiencyRules, engineRules, inventoryRules, ratioRules} from './car-rules.ts';
import {choice, flag, group, list, name, number, quantity, type Range, wholeNumber} from './fields.ts';
import * as shared from './shared-fields.ts';

const {ranges} = shared;

const bounds = {
	share: {above: 0, to: 1},
	rolling: {from: 0, to: 0.2},
	wheelInertia: {from: 0, to: 100},
	engineInertia: {from: 0, to: 10},
	interruptionS: {from: 0, to: 5},
	marginS: {from: 0, to: 60},
	marginRpm: {from: 0, to: 10_000},
	wheelbaseM: {from: 1, to: 10},
	cgHeightM: {from: 0.05, to: 3},
	torqueNm: {from: 0, to: 10_000},
	ratio: {above: 0, to: 30},
	toothSum: {from: 2, to: 800},
	step: {from: 1, to: 10},
	sets: {from: 0, to: 1000},
	consumptionKgPerJ: {above: 0, to: 1e-6},
	fuelDensityKgM3: {from: 500, to: 1500},
	tankM3: {above: 0, to: 1},
	miles: {from: 0, to: 1e6},
	maxMiles: {above: 0, to: 1e6},
} satisfies Record<string, Range>;

/** Most that a list may hold: far more than any car has. */
const most = {engines: 20, curve: 500, gearboxes: 200, spareGears: 120, fits: 20, toothSums: 200} as const;
const leastCurvePoints = 3;

const seconds = (unlessGiven: string, description: string) =>
	z.prefault(quantity('time', bounds.marginS, description), unlessGiven);
const rpmMargin = (unlessGiven: number, description: string) =>
	z.prefault(number(bounds.marginRpm, description), unlessGiven);

const engine = () =>
	group(
		{
			name: name('Name of the engine build.'),
			for: list(
				shared.trackType('A type of track.'),
				[1, trackTypes.length],
				'Types of track that this build runs at.',
			),
			rpmLimit: shared.rpm('RPM limit of the engine builder.'),
			inertia: quantity('inertia', bounds.engineInertia, 'All that turns at engine speed.'),
			correctedTo: z.prefault(
				choice(
					['J1349', 'J607', 'air'] satisfies CorrectedTo[],
					'Day that the curve is corrected to; "air": the day\'s own.',
				),
				'J1349',
			),
			limiter: z.optional(shared.rpm('Where the ignition cuts; the limit in force unless given.')),
			pullRpm: z.optional(shared.rpm('Lowest RPM from which it pulls cleanly; the first curve point unless given.')),
			bandShare: z.prefault(number(bounds.share, 'Share of peak power that bounds the power band.'), 0.9),
			fuelConsumption: z.prefault(
				quantity(
					'consumption',
					bounds.consumptionKgPerJ,
					'Fuel for the work at the crankshaft, taken as the same at every load.',
				),
				'0.30 kg/kWh',
			),
			curve: list(curvePoint(), [leastCurvePoints, most.curve], 'Full-throttle torque, rising in RPM.').check(
				curveRules(),
			),
		},
		'An engine build.',
	).check(engineRules());

const curvePoint = () =>
	group(
		{rpm: shared.rpm('Engine speed.'), torque: quantity('torque', bounds.torqueNm, 'Torque there.')},
		'A dyno point.',
	);

const gearbox = () =>
	group(
		{
			name: name('Name of the gearbox set.'),
			ratios: list(
				number(bounds.ratio, 'Ratio of a gear.'),
				[1, ranges.gear.to],
				'Gear 1 first, none above the one before.',
			).check(ratioRules()),
		},
		'The ratios of all forward gears of one gearbox.',
	);

const spareGear = () =>
	group(
		{
			gear: shared.gear('Which gear it serves as, counted from 1.'),
			ratio: number(bounds.ratio, 'Its ratio.'),
			pieces: z.prefault(wholeNumber(bounds.sets, 'Pieces on hand.'), 1),
			fits: z.optional(
				list(
					name('A group of gears that go together, such as those of one layshaft.'),
					[1, most.fits],
					'Groups that it goes together with; with everything unless given.',
				),
			),
		},
		'A single gear.',
	);

const gearInventory = () =>
	group(
		{
			gears: list(spareGear(), [1, most.spareGears], 'Single gears, at least one for every gear from 1 up.'),
			smallestStep: z.optional(number(bounds.step, 'Least ratio of a gear to the next; more than 1 in any case.')),
			largestStep: z.optional(number(bounds.step, 'Most ratio of a gear to the next; any unless given.')),
		},
		'What a gearbox may be built from. A set goes together where one group is among those of all its gears.',
	).check(inventoryRules());

const tires = () =>
	group(
		{
			left: shared.rollout('left'),
			right: shared.rollout('right'),
			growth: z.prefault(shared.growth(), '0 %'),
			slip: z.prefault(shared.slip(), '0 %'),
			steadySlip: z.prefault(shared.steadySlip(), '0 %'),
			...shared.tireFields(),
		},
		'The driven tires.',
	).check(shared.oneDiameter());

const teeth = (which: string) => wholeNumber(ranges.teeth, `Teeth of the ${which} gear.`);

const rackPair = () =>
	group(
		{
			driving: teeth('driving'),
			driven: teeth('driven'),
			sets: z.prefault(wholeNumber(bounds.sets, 'Sets on hand.'), 1),
			miles: z.prefault(number(bounds.miles, 'Miles run.'), 0),
			maxMiles: z.optional(number(bounds.maxMiles, 'Miles after which it is not used again.')),
		},
		'A drop-gear pair.',
	);

const rack = () =>
	group(
		{
			toothSums: z.optional(
				list(
					wholeNumber(bounds.toothSum, 'Driving and driven teeth together.'),
					[1, most.toothSums],
					'Tooth sums that the housing accepts; all unless given.',
				),
			),
			eitherShaft: z.prefault(flag('Whether the gears of a pair may be put on either shaft.'), false),
			pairs: list(rackPair(), [1, shared.mostPairs], 'The pairs on hand.'),
		},
		'The rack.',
	);

const margins = () =>
	group(
		{
			limitRpm: rpmMargin(100, 'Below the limit by less than this is near.'),
			shiftRpm: rpmMargin(100, 'Shifts are planned this far below the limit.'),
			downshiftRpm: rpmMargin(200, 'Kept below the limit after a downshift.'),
			cleanRpm: rpmMargin(2500, 'Lowest RPM that runs cleanly on pit road.'),
			settleStart: seconds('0.6 s', 'From the exit to the first shift.'),
			settleEnd: seconds('0.5 s', 'From the last shift to the end.'),
			sameTime: seconds('0.02 s', 'Gear sequences this close count as equally fast.'),
			level: seconds('0.02 s', 'Rows this close in lap time are called level.'),
		},
		'Margins of the checks.',
	);

const installed = () =>
	group({pair: shared.pair('Driving/driven.'), gearbox: name('Gearbox set.')}, 'What is in the car.');

const rulesByType = () =>
	group(
		{
			short: z.optional(shared.rules('At short tracks.')),
			intermediate: z.optional(shared.rules('At intermediate tracks.')),
			superspeedway: z.optional(shared.rules('At superspeedways.')),
			road: z.optional(shared.rules('At road courses.')),
		},
		'What the rule book allows, by type of track.',
	);

function buildCarFields() {
	return group(
		{
			$schema: shared.schemaLink(),
			kind: shared.kind('car'),
			version: shared.version(),
			name: name('Name of the car.'),
			mass: quantity('mass', ranges.massKg, 'As raced, driver and fuel in.'),
			rearShare: number(bounds.share, 'Share of the weight on the rear axle.'),
			dragArea: quantity('area', ranges.dragAreaM2, 'Drag area, C_d·A.'),
			downforceArea: quantity('area', ranges.downforceAreaM2, 'Downforce area, C_l·A.'),
			rearDownforceShare: z.prefault(number({from: 0, to: 1}, 'Share of the downforce on the rear axle.'), 0.5),
			rolling: number(bounds.rolling, 'Coefficient of rolling resistance.'),
			grip: number(ranges.grip, 'Coefficient of friction of the driven tires.'),
			wheelInertia: quantity('inertia', bounds.wheelInertia, 'All four wheels with what turns with them.'),
			undrivenInertia: z.optional(
				quantity('inertia', bounds.wheelInertia, 'The undriven wheels; half of "wheelInertia" unless given.'),
			),
			shiftTime: z.prefault(quantity('time', bounds.interruptionS, 'Interruption of thrust at a shift.'), '0.1 s'),
			reactionTime: z.prefault(quantity('time', bounds.interruptionS, 'From the shift light to the shift.'), '0.25 s'),
			wheelbase: z.optional(
				quantity('length', bounds.wheelbaseM, 'Wheelbase; with "cgHeight" turns on load transfer.'),
			),
			cgHeight: z.optional(quantity('length', bounds.cgHeightM, 'Height of the center of gravity; with "wheelbase".')),
			engines: list(engine(), [1, most.engines], 'Engine builds.'),
			gearboxes: list(gearbox(), [1, most.gearboxes], 'Gearbox sets.'),
			gearInventory: z.optional(gearInventory()),
			finalDrive: number(bounds.ratio, 'Ring teeth ÷ pinion teeth.'),
			efficiency: z.optional(number(bounds.share, 'From engine to wheels, in every gear.')),
			efficiencies: z.optional(
				list(
					number(bounds.share, 'From engine to wheels in a gear.'),
					[1, ranges.gear.to],
					'One a gear, in place of "efficiency".',
				),
			),
			fuelDensity: z.prefault(quantity('density', bounds.fuelDensityKgM3, 'Density of the fuel.'), '0.745 kg/L'),
			tank: z.optional(quantity('volume', bounds.tankM3, 'Fuel that the tank holds.')),
			tires: tires(),
			rack: rack(),
			margins: z.prefault(margins(), {}),
			installed: z.optional(installed()),
			rules: z.optional(rulesByType()),
		},
		'A car, with its engines, gearbox sets and rack.',
	).check(efficiencyRules(), carRules());
}

export type CarFields = ReturnType<typeof buildCarFields>;
export type CarDocument = z.output<CarFields>;

let built: CarFields | undefined;

/** Built when first asked for: a process that reads no car does not pay for it. */
export function carFields(): CarFields {
	built ??= buildCarFields();
	return built;
}
