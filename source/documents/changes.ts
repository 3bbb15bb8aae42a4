/** A situation's changes: with a sign a value is added, or scales if it is a percentage; without one it replaces. */
import * as z from 'zod/mini';
import type {Change, PowerChange} from '../drivetrain/track.ts';
import {isWithin, type Range, rangeText, reportQuantity} from './fields.ts';
import {shortened} from './problem.ts';
import {allowedText, type Dimension, exampleOf, type QuantityProblem, quantityOf} from './quantity.ts';
import {uncertain} from './uncertainties.ts';

type ChangeReading = {ok: true; value: Change} | ({ok: false} & QuantityProblem);

/** A percentage may take away nearly everything or multiply by ten: beyond that somebody slipped. */
const factorRange: Range = {above: 0, to: 10};

/** A change of a value of this dimension; `range` is that of the value itself. */
export function change(dimension: Dimension, range: Range, description: string) {
	const field = z.pipe(
		changeText(dimension, description),
		z.transform((text: string, context) => given(changeOf(text, dimension, range), text, context)),
	);
	return uncertain(field, [dimension, 'share']);
}

/** As `change`; a bare number replaces, for a coefficient has no unit. */
export function coefficientChange(range: Range, description: string) {
	const allowed = `${allowedText(['number'])}; or a change, like "-3 %" or "+0.05"`;
	const examples = [1.2, '-3 %', '+0.05'];
	const field = z.pipe(
		z.union([z.number(), z.string()], {error: allowed}).check(z.meta({description, examples})),
		z.transform((value: number | string, context) => given(changeOf(String(value), 'number', range), value, context)),
	);
	return uncertain(field, ['number', 'share']);
}

/** As `change`; a percentage without sign is a share of the rated power. */
export function powerChange(range: Range, description: string) {
	const field = z.pipe(
		changeText('power', description),
		z.transform((text: string, context): PowerChange => {
			const reading = changeOf(text, 'power', range, true);
			const value = given(reading, text, context);
			if (!reading.ok) return z.NEVER;
			return value.kind === 'scale' ? value : {kind: value.kind, watts: value.value};
		}),
	);
	return uncertain(field, ['power', 'share']);
}

function changeText(dimension: Dimension, description: string) {
	const example = exampleOf(dimension);
	const [amount = '', unit = ''] = example.split(/ (.*)/);
	const error = `${allowedText([dimension])}; or a change with a sign, like "-3 %" or "+${Number(amount) / 10} ${unit}"`;
	return z.string({error}).check(z.meta({description, examples: [example, '-3 %']}));
}

function given(reading: ChangeReading, input: unknown, context: z.core.ParsePayload): Change {
	if (reading.ok) return reading.value;
	reportQuantity(context, input, reading);
	return z.NEVER;
}

/** The change that a text states. */
function changeOf(text: string, dimension: Dimension, range: Range, shareOfWhole = false): ChangeReading {
	const reading = quantityOf(text, [dimension, 'share']);
	if (!reading.ok) return reading;
	const {value, signed} = reading;
	const refused = (allowed: string): ChangeReading => ({ok: false, found: `"${shortened(text)}"`, allowed});
	if (reading.dimension === 'share')
		return signed || shareOfWhole
			? scaled(signed ? 1 + value : value, refused)
			: refused(`a percentage with a sign, like "+${text.trim()}"`);
	if (!signed)
		return isWithin(value, range) ? {ok: true, value: {kind: 'set', value}} : refused(rangeText(range, reading.unit));
	const span: Range = {from: -range.to, to: range.to};
	return isWithin(value, span) ? {ok: true, value: {kind: 'add', value}} : refused(rangeText(span, reading.unit));
}

function scaled(factor: number, refused: (allowed: string) => ChangeReading): ChangeReading {
	if (isWithin(factor, factorRange)) return {ok: true, value: {kind: 'scale', factor}};
	return refused('a percentage that leaves more than nothing and at most ten times the value');
}
