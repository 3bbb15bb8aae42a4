/** What a plan document holds: a decision for a track, and all that is needed to compute it again. */
import * as z from 'zod/mini';
import {carFields} from '../documents/car-fields.ts';
import {group, list, name, type Range, rule, wholeNumber} from '../documents/fields.ts';
import {date, gear, kind, mostNames, pair, ranges, version} from '../documents/shared-fields.ts';
import {trackFields} from '../documents/track-fields.ts';

export type Stated = {
	/** The RPM limit in force, and whose it is. */
	limit: {rpm: number; from: string};
	/** The highest RPM of each situation and where, rounded up. */
	highest: {situation: string; rpm: number; at: string}[];
	/** By the gear shifted from: the RPM of the shift and of the light, rounded down; the lowest of all runs. */
	shifts: {from: number; rpm: number; light: number}[];
	/** At the limit and at limit + tolerance, rounded down. */
	pitRoad?: {gear: number; rpm: number; tolerance: number};
	/** At pace speed, rounded down. */
	restart?: {gear: number; rpm: number};
};

/** The JSON of a plan. Quantities in `track` and `car` stay as they were written. */
export type PlanDocument = {
	kind: 'plan';
	version: 1;
	/** ISO 8601. */
	date: string;
	/** `driving/driven`. */
	pair: string;
	gearbox: string;
	engine: string;
	results: Stated;
	notes?: string;
	track: Record<string, unknown>;
	car: Record<string, unknown>;
};

export const longestNotes = 2000;
/** A reach beyond the limiter may be stated, so above what an engine may turn. */
const statedRpm: Range = {from: 0, to: 999_999};
const shiftRpm: Range = {from: 0, to: ranges.rpm.to};
const shiftedFrom: Range = {from: ranges.gear.from, to: ranges.gear.to - 1};
const statedRpmOf = (what: string) => wholeNumber(statedRpm, what);
const sources = ['engine', 'rules', 'track'] as const;

const notesError = `a text of at most ${longestNotes} characters`;
const notes = () => z.string({error: notesError}).check(z.maxLength(longestNotes, {error: notesError}));

const results = () =>
	group(
		{
			limit: group(
				{
					rpm: z.number({error: 'the RPM limit'}).check(z.gt(0, {error: 'an RPM limit above 0'})),
					from: z.enum(sources, {error: `one of ${sources.map(source => `"${source}"`).join(', ')}`}),
				},
				'The RPM limit in force.',
			),
			highest: list(
				group(
					{
						situation: name('Name of the situation.'),
						rpm: statedRpmOf('Highest RPM.'),
						at: z.string({error: 'where, as text'}).check(z.maxLength(300, {error: 'at most 300 characters'})),
					},
					'The highest RPM of a situation.',
				),
				[1, mostNames + 1],
				'One entry a situation.',
			),
			shifts: list(
				group(
					{
						from: wholeNumber(shiftedFrom, 'Gear before.'),
						rpm: wholeNumber(shiftRpm, 'RPM of the shift.'),
						light: wholeNumber(shiftRpm, 'RPM of the light.'),
					},
					'A shift.',
				),
				[0, ranges.gear.to],
				'Shifts by the gear before.',
			),
			pitRoad: z.optional(
				group(
					{gear: gear('Gear.'), rpm: statedRpmOf('At the limit.'), tolerance: statedRpmOf('At limit + tolerance.')},
					'On pit road.',
				),
			),
			restart: z.optional(group({gear: gear('Gear.'), rpm: statedRpmOf('At pace speed.')}, 'At the restart.')),
		},
		'What the plan says comes out.',
	);

function buildPlanFields() {
	return group(
		{
			kind: kind('plan'),
			version: version(),
			date: date('When the plan was made.'),
			pair: pair('The pair chosen.'),
			gearbox: name('The gearbox set chosen.'),
			engine: name('The engine build.'),
			results: results(),
			notes: z.optional(notes()),
			track: trackFields(),
			car: carFields(),
		},
		'A decision for a track, with what is needed to compute it again.',
	).check(chosenRules());
}

type Named = {name?: unknown};
type Teeth = {driving?: unknown; driven?: unknown};
type Values = {
	pair?: Teeth;
	gearbox?: unknown;
	engine?: unknown;
	car?: {
		engines?: readonly Named[];
		gearboxes?: readonly Named[];
		rack?: {pairs?: readonly Teeth[]; eitherShaft?: unknown};
	};
};

/** What was chosen must be in the car that the plan carries. */
const chosenRules = () =>
	rule<Values>(({pair, gearbox, engine, car}, report) => {
		const has = (entries: readonly Named[] | undefined, wanted: unknown) =>
			typeof wanted !== 'string' || !Array.isArray(entries) || entries.some(entry => entry?.name === wanted);
		if (!has(car?.gearboxes, gearbox)) report(['gearbox'], 'a gearbox set of the car in the plan');
		if (!has(car?.engines, engine)) report(['engine'], 'an engine of the car in the plan');
		const pairs = car?.rack?.pairs;
		if (pair?.driving === undefined || !Array.isArray(pairs)) return;
		const isPair = (one: number | unknown, other: unknown) => one === pair.driving && other === pair.driven;
		// An entry may be anything: what is wrong with it is said where it stands.
		const found = pairs.some(
			(entry: Teeth | null) =>
				isPair(entry?.driving, entry?.driven) ||
				(car?.rack?.eitherShaft === true && isPair(entry?.driven, entry?.driving)),
		);
		if (!found) report(['pair'], 'a pair on the rack of the car in the plan');
	});

export type PlanFields = ReturnType<typeof buildPlanFields>;

let built: PlanFields | undefined;

/** Built when first asked for. */
export function planFields(): PlanFields {
	built ??= buildPlanFields();
	return built;
}
