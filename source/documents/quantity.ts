import {evaluate} from './expression.ts';
import {didYouMean} from './nearest.ts';
import {shortened} from './problem.ts';
import {rareUnit, rareUnitOf} from './rare-units.ts';
import {type Stop, type Token, tokensOf} from './tokens.ts';
import {type Dimension, dimensionsOf, findUnit, spellingsOf, type Unit, unitNames} from './units.ts';

export type {Dimension} from './units.ts';

export type QuantityProblem = {
	found: string;
	allowed: string;
	hint?: string;
	/** Units that the table lacks; `learnUnits` may know them. */
	unknownUnits?: readonly string[];
};
export type Quantity = {
	/** SI; angles in radians, temperatures in °C, shares as fractions of 1. */
	value: number;
	/** Whether the text starts with a plus or minus sign: in a situation, a change. */
	signed: boolean;
	/** The one of the expected dimensions that the text has. */
	dimension: Dimension;
	/** The last unit in the text; undefined for a plain number. */
	unit: Unit | undefined;
};
export type QuantityReading = ({ok: true} & Quantity) | ({ok: false} & QuantityProblem);

/** Longer text is no quantity. */
const maxQuantityLength = 200;

const examples: Record<Dimension, string> = {
	length: '650 ft',
	speed: '118 mph',
	mass: '3650 lb',
	area: '0.95 m^2',
	acceleration: '0.9 g',
	angle: '270 deg',
	temperature: '75 degF',
	pressure: '28.9 inHg',
	time: '0.25 s',
	torque: '405 lbf ft',
	force: '1000 N',
	inertia: '4 kg m^2',
	power: '640 hp',
	volume: '20 gal',
	density: '0.745 kg/L',
	consumption: '0.30 kg/kWh',
	share: '1.5 %',
	number: '1.2',
};

/** What a reader may write: "a speed with its unit (mph, km/h, …), like "118 mph"". */
export function allowedText(expected: readonly Dimension[]): string {
	return expected.map(allowedDimension).join('; or ');
}

/** An example of a dimension, as it stands in a document. */
export function exampleOf(dimension: Dimension): string {
	return examples[dimension];
}

function allowedDimension(dimension: Dimension): string {
	if (dimension === 'number') return 'a number without unit, like "1.2"';
	if (dimension === 'share') return 'a percentage, like "1.5 %"';
	return `${article(dimension)} ${dimension} with its unit (${unitNames(dimension).join(', ')}), like "${examples[dimension]}"`;
}

function article(noun: string): string {
	return /^[aeiou]/.test(noun) ? 'an' : 'a';
}

/**
 * The quantity that a text states, by the unit table and what `learnUnits` has added to it. Arithmetic as in `expression.ts`;
 * none on temperatures. Expected failure is a value that says what was found and what is allowed.
 */
export function quantityOf(text: string, expected: Dimension | readonly Dimension[]): QuantityReading {
	const dimensions = typeof expected === 'string' ? [expected] : expected;
	const refused = (stop: Stop, unknownUnits?: readonly string[]): QuantityReading => {
		const found = `"${shortened(text)}"${stop.found === '' ? '' : ` (${shortened(stop.found)})`}`;
		const problem = {ok: false as const, found, allowed: allowedText(dimensions)};
		return {...problem, ...(stop.hint && {hint: stop.hint}), ...(unknownUnits && {unknownUnits})};
	};
	if (text.length > maxQuantityLength)
		return refused({found: `${text.length} characters, at most ${maxQuantityLength}`});
	const read = tokensOf(text);
	if (!read.ok) return refused(read.stop);
	const units = unitsOf(read.tokens, dimensions);
	if ('stop' in units) return refused(units.stop, units.unknownUnits);
	const {dimension, byName} = units;
	if (dimension === 'temperature' && !isSingle(read.tokens)) return refused({found: 'arithmetic on temperatures'});
	const result = evaluate(read.tokens, byName);
	if (!result.ok) return refused(result.stop);
	if (!result.hasUnit && dimension !== 'number') return refused({found: 'no unit'});
	const last = read.tokens.findLast(token => token.kind === 'unit');
	return {ok: true, value: result.value, signed: isSigned(read.tokens), dimension, unit: last && byName.get(last.name)};
}

/** As `quantityOf`; a unit that the table lacks (`furlong`, `stone`) is looked up first, which loads a library. */
export async function readQuantity(text: string, expected: Dimension | readonly Dimension[]): Promise<QuantityReading> {
	const reading = quantityOf(text, expected);
	if (reading.ok || reading.unknownUnits === undefined) return reading;
	const {learnUnits} = await import('./learn-units.ts');
	return (await learnUnits(reading.unknownUnits)) ? quantityOf(text, expected) : reading;
}

type Units = {dimension: Dimension; byName: Map<string, Unit>} | {stop: Stop; unknownUnits?: readonly string[]};

/** What the unit names mean in the first of the expected dimensions that has them all. */
function unitsOf(tokens: readonly Token[], dimensions: readonly Dimension[]): Units {
	const names = tokens.flatMap(token => (token.kind === 'unit' ? [token.name] : []));
	if (names.length === 0)
		return {dimension: dimensions.includes('number') ? 'number' : dimensions[0]!, byName: new Map()};
	for (const dimension of dimensions) {
		const found = names.map(name => findUnit(name, dimension) ?? rareUnit(name, dimension));
		if (found.every(unit => unit !== undefined))
			return {dimension, byName: new Map(names.map((name, i) => [name, found[i]!]))};
	}
	return unitProblem(names, dimensions);
}

function unitProblem(names: readonly string[], dimensions: readonly Dimension[]): Units {
	const isKnown = (name: string) =>
		dimensions.some(dimension => findUnit(name, dimension) ?? rareUnit(name, dimension));
	const unknownUnits = names.filter(name => !isKnown(name));
	const wrong = unknownUnits[0];
	if (wrong === undefined) return {stop: {found: 'units of different kinds'}};
	const other = dimensionsOf(wrong)[0] ?? rareUnitOf(wrong)?.dimension;
	if (other !== undefined)
		return {stop: {found: other === 'share' ? 'a percentage' : `${wrong} is ${article(other)} ${other}`}};
	const hint = didYouMean(wrong, dimensions.flatMap(spellingsOf));
	return {stop: {found: `unknown unit ${wrong}`, ...(hint && {hint})}, unknownUnits};
}

function isSigned([first]: readonly Token[]): boolean {
	return first?.kind === 'operator' && (first.operator === '+' || first.operator === '-');
}

/** One number with its unit, with or without a sign. */
function isSingle(tokens: readonly Token[]): boolean {
	return tokens.length === (isSigned(tokens) ? 3 : 2);
}
