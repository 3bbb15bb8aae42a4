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
	/** One standard deviation in SI, at least 0, where the text states it: "88 mph ± 1.5 mph". */
	uncertainty: number | undefined;
};
export type QuantityReading = ({ok: true} & Quantity) | ({ok: false} & QuantityProblem);

/** Longer text is no quantity. */
const maxQuantityLength = 200;
/** Between a value and its uncertainty. */
const plusMinus = /±|\+\/[-−]/;

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

type Refusal = {stop: Stop; unknownUnits?: readonly string[]};

/**
 * The quantity that a text states, by the unit table and what `learnUnits` has added to it. Arithmetic as in `expression.ts`;
 * none on temperatures. After "±" or "+/-" its uncertainty may follow, of the same dimension, as one standard deviation;
 * the unit may stand at its end for both. Expected failure is a value that says what was found and what is allowed.
 */
export function quantityOf(text: string, expected: Dimension | readonly Dimension[]): QuantityReading {
	const dimensions = typeof expected === 'string' ? [expected] : expected;
	const reading = readingOf(text, dimensions);
	if (!('stop' in reading)) return {ok: true, ...reading};
	const {stop, unknownUnits} = reading;
	const found = `"${shortened(text)}"${stop.found === '' ? '' : ` (${shortened(stop.found)})`}`;
	const problem = {ok: false as const, found, allowed: allowedText(dimensions)};
	return {...problem, ...(stop.hint && {hint: stop.hint}), ...(unknownUnits && {unknownUnits})};
}

function readingOf(text: string, dimensions: readonly Dimension[]): Quantity | Refusal {
	if (text.length > maxQuantityLength)
		return {stop: {found: `${text.length} characters, at most ${maxQuantityLength}`}};
	const parts = text.split(plusMinus);
	if (parts.length > 2) return {stop: {found: 'a second ±'}};
	const [written, spread] = parts.map(tokensOf);
	if (!written!.ok) return {stop: written!.stop};
	if (spread === undefined) return plainReading(written!.tokens, dimensions);
	if (!spread.ok) return {stop: spread.stop};
	return readingWithSpread(written!.tokens, spread.tokens, dimensions);
}

/** A value without unit takes the one at the end: "88 ± 1.5 mph". */
function readingWithSpread(
	written: readonly Token[],
	spread: readonly Token[],
	dimensions: readonly Dimension[],
): Quantity | Refusal {
	const last = lastUnit(spread);
	const whole = last === undefined || lastUnit(written) !== undefined ? written : [...written, last];
	const value = plainReading(whole, dimensions);
	if ('stop' in value) return value;
	const read = plainReading(spread, [value.dimension], true);
	if ('stop' in read) return {...read, stop: {...read.stop, found: `after ±: ${read.stop.found}`}};
	if (read.value < 0) return {stop: {found: 'an uncertainty below 0'}};
	return {...value, uncertainty: read.value};
}

/** `difference`: a temperature is one between two temperatures, without the zero point of its scale. */
function plainReading(
	tokens: readonly Token[],
	dimensions: readonly Dimension[],
	difference = false,
): Quantity | Refusal {
	const units = unitsOf(tokens, dimensions);
	if ('stop' in units) return units;
	const {dimension, byName} = units;
	if (dimension === 'temperature' && !isSingle(tokens)) return {stop: {found: 'arithmetic on temperatures'}};
	const meant = difference ? new Map([...byName].map(([name, unit]) => [name, {...unit, zero: 0}])) : byName;
	const result = evaluate(tokens, meant);
	if (!result.ok) return {stop: result.stop};
	if (!result.hasUnit && dimension !== 'number') return {stop: {found: 'no unit'}};
	const unit = byName.get(lastUnit(tokens)?.name ?? '');
	return {value: result.value, signed: isSigned(tokens), dimension, unit, uncertainty: undefined};
}

function lastUnit(tokens: readonly Token[]) {
	return tokens.findLast(token => token.kind === 'unit');
}

/** As `quantityOf`; a unit that the table lacks (`chain`, `stone`) is looked up first, which loads a library. */
export async function readQuantity(text: string, expected: Dimension | readonly Dimension[]): Promise<QuantityReading> {
	const reading = quantityOf(text, expected);
	if (reading.ok || reading.unknownUnits === undefined) return reading;
	const {learnUnits} = await import('./learn-units.ts');
	return (await learnUnits(reading.unknownUnits)) ? quantityOf(text, expected) : reading;
}

type Units = {dimension: Dimension; byName: Map<string, Unit>} | Refusal;

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
