/** The fields of a track document: what reads it, and what its JSON Schema is made from. */
import * as z from 'zod/mini';
import {airFields, airRules, windFields} from './air-fields.ts';
import {change, coefficientChange, powerChange} from './changes.ts';
import {group, list, name, number, quantity, type Range, wholeNumber} from './fields.ts';
import * as shared from './shared-fields.ts';
import {gearListRules, situationRules, straightRules, trackRules} from './track-rules.ts';

const {ranges} = shared;

const bounds = {
	lapM: {from: 50, to: 50_000},
	laps: {from: 1, to: 10_000},
	lengthM: {from: 1, to: 20_000},
	restartM: {from: 1, to: 20_000},
	braking: {above: 0, to: 60},
	grade: {from: -0.3, to: 0.3},
	headingRad: {from: -2 * Math.PI, to: 2 * Math.PI},
	load: {above: 0, to: 10},
	extraDragN: {from: 0, to: 50_000},
	tolerance: {from: 0, to: 50},
	headwind: {from: -60, to: 60},
	share: {from: 0, to: 1000},
} satisfies Record<string, Range>;

const speed = (description: string) => quantity('speed', ranges.speed, description);
const speedChange = (what: string) =>
	z.optional(change('speed', ranges.speed, `Changes or replaces ${what} of every straight that has it.`));

const gears = (description: string) =>
	z.optional(list(shared.gear('A gear, counted from 1.'), [1, ranges.gear.to], description).check(gearListRules()));

const measured = () =>
	group(
		{
			end: z.optional(speed('Highest speed seen.')),
			rpm: z.optional(shared.rpm('Highest RPM seen.')),
			pair: z.optional(shared.pair('Pair in the car then; the installed one unless given.')),
			gearbox: z.optional(name('Gearbox set then; the installed one unless given.')),
			gear: z.optional(shared.gear('Gear at the end.')),
		},
		'What was seen on this straight.',
	);

const straight = () =>
	group(
		{
			name: name('Name of the straight.'),
			exit: speed('Speed where the driver is back to full throttle.'),
			minimum: z.optional(speed('Slowest speed in the corner before, run in the exit gear.')),
			length: z.optional(
				quantity(
					'length',
					bounds.lengthM,
					'From the exit to the next lift point, or to the corner entry where "entry" is given.',
				),
			),
			end: z.optional(speed('Speed held at the end; only without "length".')),
			entry: z.optional(speed('Corner entry speed; together with "braking".')),
			braking: z.optional(
				quantity('acceleration', bounds.braking, 'Deceleration under braking; together with "entry".'),
			),
			grade: z.prefault(quantity('share', bounds.grade, 'Rise over run.'), '0 %'),
			heading: z.optional(quantity('angle', bounds.headingRad, 'Direction of travel, clockwise from north.')),
			load: z.prefault(number(bounds.load, 'Normal-load factor of a flat-out banked corner.'), 1),
			extraDrag: z.prefault(
				quantity('force', bounds.extraDragN, 'Extra drag, as of scrub in a flat-out corner.'),
				'0 N',
			),
			gears: gears('Gears that may be used here, lowest first, without gaps.'),
			measured: z.optional(measured()),
		},
		'A full-throttle piece.',
	).check(straightRules());

const situation = () =>
	group(
		{
			name: name('Name of the situation; "Base" is the track as it stands.'),
			share: z.prefault(number(bounds.share, 'Part in the mean time.'), 1),
			exit: speedChange('the exit speed'),
			end: speedChange('the held end speed'),
			entry: speedChange('the entry speed'),
			minimum: speedChange('the minimum speed'),
			drag: z.optional(change('area', ranges.dragAreaM2, 'Changes or replaces the drag area.')),
			grip: z.optional(coefficientChange(ranges.grip, 'Changes or replaces the grip.')),
			power: z.optional(
				powerChange(ranges.powerW, 'Changes or replaces peak power; a percentage without sign is a share of it.'),
			),
			mass: z.optional(change('mass', ranges.massKg, 'Changes or replaces the mass.')),
			rollout: z.optional(change('length', ranges.rolloutM, 'Changes or replaces the rollout of both tires.')),
			air: z.optional(group(airFields(), 'Fields given replace those of the track.').check(airRules())),
			wind: z.optional(group(windFields(), 'Fields given replace those of the track.')),
			headwind: z.optional(quantity('speed', bounds.headwind, 'Headwind added on every straight.')),
		},
		'A named change to the track as it stands.',
	).check(situationRules());

const carChange = () =>
	group(
		{
			tires: z.optional(
				group(
					{
						left: z.optional(shared.rollout('left')),
						right: z.optional(shared.rollout('right')),
						growth: z.optional(shared.growth()),
						slip: z.optional(shared.slip()),
						steadySlip: z.optional(shared.steadySlip()),
						...shared.tireFields(),
					},
					'What differs of the tires.',
				).check(shared.oneDiameter()),
			),
			grip: z.optional(number(ranges.grip, 'Grip here.')),
			mass: z.optional(quantity('mass', ranges.massKg, 'Mass here.')),
			dragArea: z.optional(quantity('area', ranges.dragAreaM2, 'Drag area here.')),
			downforceArea: z.optional(quantity('area', ranges.downforceAreaM2, 'Downforce area here.')),
		},
		'What of the car differs at this track.',
	);

const pitRoad = () =>
	group(
		{
			limit: speed('Pit-road speed limit.'),
			tolerance: z.prefault(quantity('speed', bounds.tolerance, 'What the officials allow above it.'), '0 mph'),
			gear: z.optional(shared.gear('Gear on pit road; the lowest with RPM 1000 or more under the limit unless given.')),
		},
		'Pit road.',
	);

const restart = () =>
	group(
		{
			speed: speed('Pace speed at which full throttle starts.'),
			distance: quantity('length', bounds.restartM, 'Distance at full throttle.'),
			gear: z.optional(shared.gear('Gear of the restart; the one of least time unless given.')),
		},
		'Full throttle from the pace speed; reported, not part of the lap.',
	);

function buildTrackFields() {
	const wind = windFields();
	return group(
		{
			$schema: shared.schemaLink(),
			kind: shared.kind('track'),
			version: shared.version(),
			name: name('Name of the track.'),
			type: shared.trackType('Type of track.'),
			lap: z.optional(quantity('length', bounds.lapM, 'Length of a lap.')),
			laps: z.optional(wholeNumber(bounds.laps, 'Laps of the race.')),
			air: z.optional(
				group(airFields(), 'The air of the day; 25 °C, 990 hPa, 0 % where a field is missing.').check(airRules()),
			),
			wind: z.optional(group({speed: wind.speed.def.innerType, from: wind.from.def.innerType}, 'Wind at car height.')),
			pitRoad: z.optional(pitRoad()),
			restart: z.optional(restart()),
			gears: gears('Gears that may be used at this track, lowest first, without gaps.'),
			straights: list(straight(), [1, shared.mostNames], 'The full-throttle pieces of a lap.'),
			situations: z.optional(list(situation(), [0, shared.mostNames], 'How the car will run beside the base.')),
			rules: z.optional(shared.rules('What the rule book allows at this track.')),
			car: z.optional(carChange()),
		},
		'A track, its day and the situations to plan for.',
	).check(trackRules());
}

export type TrackFields = ReturnType<typeof buildTrackFields>;
export type TrackDocument = z.output<TrackFields>;
export type StraightDocument = TrackDocument['straights'][number];
export type SituationDocument = NonNullable<TrackDocument['situations']>[number];

let built: TrackFields | undefined;

/** Built when first asked for: a process that reads no track does not pay for it. */
export function trackFields(): TrackFields {
	built ??= buildTrackFields();
	return built;
}
