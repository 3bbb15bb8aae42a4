/** Fields that a track and a car have in common, and the bounds of what a stock car and a track can be. SI. */
import * as z from 'zod/mini';
import {type Pair, trackTypes} from '../drivetrain/car.ts';
import {choice, group, list, name, number, quantity, type Range, report, rule, wholeNumber} from './fields.ts';
import {shortened} from './problem.ts';
import {sidewallDiameterM} from './tire-size.ts';

export const ranges = {
	speed: {above: 0, to: 200},
	rpm: {above: 0, to: 30_000},
	grip: {from: 0, to: 5},
	massKg: {from: 100, to: 5000},
	dragAreaM2: {from: 0, to: 10},
	/** Below zero is lift. */
	downforceAreaM2: {from: -10, to: 20},
	powerW: {above: 0, to: 5e6},
	rolloutM: {from: 0.5, to: 5},
	diameterM: {from: 0.15, to: 1.6},
	growth: {from: 0, to: 0.1},
	slip: {from: 0, to: 0.3},
	/** Share of the dyno curve that reaches the car. */
	power: {above: 0, to: 2},
	gear: {from: 1, to: 20},
	teeth: {from: 1, to: 400},
} as const satisfies Record<string, Range>;

export const mostNames = 200;
export const mostPairs = 2000;

export const trackType = (description: string) =>
	choice(trackTypes as readonly ['short', 'intermediate', 'superspeedway', 'road'], description);

export const gear = (description: string) => wholeNumber(ranges.gear, description);

export const rpm = (description: string) => number(ranges.rpm, description);

const pairPattern = /^([1-9]\d{0,2})\/([1-9]\d{0,2})$/;

/** `driving/driven`. */
export function pair(description: string) {
	const allowed = `driving/driven teeth, each from ${ranges.teeth.from} to ${ranges.teeth.to}, like "33/38"`;
	return z.pipe(
		z.string({error: allowed}).check(z.meta({description, examples: ['33/38'], pattern: pairPattern.source})),
		z.transform((text: string, context): Pair => {
			const [, driving, driven] = (pairPattern.exec(text) ?? []).map(Number);
			const fits = (teeth: number | undefined) => teeth !== undefined && teeth <= ranges.teeth.to;
			if (fits(driving) && fits(driven)) return {driving: driving!, driven: driven!};
			report(context, text, allowed);
			return z.NEVER;
		}),
	);
}

/** The optional fields of tires; the car adds which ones it needs. */
export function tireFields() {
	return {
		size: z.optional(tireSize()),
		diameter: z.optional(quantity('length', ranges.diameterM, 'Overall diameter, where no size is given.')),
	};
}

export const rollout = (side: string) =>
	quantity('length', ranges.rolloutM, `Rollout of the ${side} driven tire at race pressure.`);
export const growth = () => quantity('share', ranges.growth, 'Growth of the rolling circumference at 100 mph.');
export const power = (description: string) => quantity('share', ranges.power, description);
export const slip = () => quantity('share', ranges.slip, 'Slip under full throttle.');
export const steadySlip = () => quantity('share', ranges.slip, 'Slip at a steady or closed throttle.');

/** A size on the sidewall and a diameter say the same thing twice. */
export const oneDiameter = () =>
	rule<{size?: unknown; diameter?: unknown}>((tires, report) => {
		if (tires.size !== undefined && tires.diameter !== undefined) report(['diameter'], 'either "size" or "diameter"');
	});

function tireSize() {
	const allowed = 'a size from the sidewall, like "275/40R17"';
	return z.pipe(
		z
			.string({error: allowed})
			.check(z.meta({description: 'Size on the sidewall (ISO 4000-1).', examples: ['275/40R17']})),
		z.transform((text: string, context): number => {
			const diameterM = sidewallDiameterM(text);
			if (diameterM !== undefined) return diameterM;
			report(context, text, allowed, {found: `"${shortened(text)}"`});
			return z.NEVER;
		}),
	);
}

/** What a rule book allows. */
export function rules(description: string) {
	return group(
		{
			rpmLimit: z.optional(rpm('RPM limit.')),
			gearboxes: z.optional(
				list(name('A gearbox set by its name.'), [1, mostNames], 'Gearbox sets allowed; all unless given.'),
			),
			pairs: z.optional(list(pair('Driving/driven.'), [1, mostPairs], 'Pairs allowed; all unless given.')),
		},
		description,
	);
}

const datePattern =
	/^\d{4}-(0[1-9]|1[0-2])-(0[1-9]|[12]\d|3[01])(T\d{2}:\d{2}(:\d{2}(\.\d{1,9})?)?(Z|[+-]\d{2}:\d{2})?)?$/;
const dateError = 'a date like "2025-06-14" or "2025-06-14T18:05:00Z" (ISO 8601)';
export const date = (description: string) =>
	z.string({error: dateError}).check(
		z.refine(text => datePattern.test(text) && !Number.isNaN(Date.parse(text)), {error: dateError}),
		z.meta({description}),
	);

/** A `$schema` is for editors; the reading ignores it. */
export const schemaLink = () => z.optional(z.string({error: 'the address of a JSON Schema, as text'}));

export const kind = <const K extends string>(value: K) => z.literal(value, {error: `"${value}"`});
export const documentVersion = 1;
export const version = () => z.literal(documentVersion, {error: `${documentVersion}`});
