/** What was typed into a field: what it means and how that is told, or what is wrong with it. */

import {isList, type Json} from '../../documents/json.ts';
import {didYouMean} from '../../documents/nearest.ts';
import {type Dimension, type Quantity, quantityOf} from '../../documents/quantity.ts';
import {findUnit} from '../../documents/units.ts';
import {fixed, type UnitSystem} from '../../text/units.ts';
import type {FieldKind} from './field-kind.ts';

export type Understanding =
	| {
			readonly ok: true;
			readonly value: Json /** What was understood; empty where there is nothing to say. */;
			readonly words: string;
	  }
	| {readonly ok: false; readonly words: string; readonly unknownUnits?: readonly string[]};

/** Units in which a person is told a quantity. */
const told: Record<UnitSystem, Partial<Record<Dimension, string>>> = {
	us: {
		length: 'ft',
		speed: 'mph',
		mass: 'lb',
		area: 'ft^2',
		acceleration: 'g',
		angle: 'deg',
		temperature: 'degF',
		pressure: 'inHg',
		time: 's',
		torque: 'lbf ft',
		force: 'lbf',
		inertia: 'lb ft^2',
		power: 'hp',
		volume: 'gal',
		density: 'lb/gal',
		consumption: 'lb/(hp h)',
		share: '%',
	},
	metric: {
		length: 'm',
		speed: 'km/h',
		mass: 'kg',
		area: 'm^2',
		acceleration: 'm/s^2',
		angle: 'deg',
		temperature: 'degC',
		pressure: 'hPa',
		time: 's',
		torque: 'N m',
		force: 'N',
		inertia: 'kg m^2',
		power: 'kW',
		volume: 'L',
		density: 'kg/L',
		consumption: 'kg/kWh',
		share: '%',
	},
};

/** Rollouts and the like are told in the small unit. */
const shortLengthM = 5;
const shortLength: Record<UnitSystem, string> = {us: 'in', metric: 'mm'};

/**
 * `before` is what stood there: its unit is taken where a number comes alone. The value is what goes into the document;
 * the range is not looked at here, the document's reader does that.
 */
export function understand(text: string, kind: FieldKind, before: Json | undefined, system: UnitSystem): Understanding {
	const typed = text.trim();
	if (typed === '') return {ok: false, words: 'nothing typed; Esc leaves it as it was'};
	switch (kind.is) {
		case 'text':
			return {ok: true, value: typed, words: ''};
		case 'flag':
			return flag(typed);
		case 'choice':
			return choice(typed, kind.among);
		case 'number':
			return number(typed);
		case 'list':
			return list(typed, kind.of, before, system);
		case 'quantity':
			return quantity(typed, kind, before, system);
	}
}

function flag(typed: string): Understanding {
	const word = typed.toLowerCase();
	if (['yes', 'y', 'true'].includes(word)) return {ok: true, value: true, words: 'yes'};
	if (['no', 'n', 'false'].includes(word)) return {ok: true, value: false, words: 'no'};
	return {ok: false, words: 'yes or no'};
}

/** The beginning of a word is enough where it is clear. */
function choice(typed: string, among: readonly string[]): Understanding {
	const same = (one: string) => one.toLowerCase().startsWith(typed.toLowerCase());
	const exact = among.find(one => one.toLowerCase() === typed.toLowerCase());
	const [only, other] = among.filter(same);
	const found = exact ?? (other === undefined ? only : undefined);
	if (found !== undefined) return {ok: true, value: found, words: found};
	return {ok: false, words: [`one of ${among.join(', ')}`, didYouMean(typed, among)].filter(Boolean).join('. ')};
}

function number(typed: string): Understanding {
	const reading = quantityOf(typed, 'number');
	if (!reading.ok) return refused(reading);
	return {ok: true, value: reading.value, words: String(Number(reading.value.toPrecision(10)))};
}

/** Parted by blanks, commas or semicolons. */
function list(typed: string, of: FieldKind, before: Json | undefined, system: UnitSystem): Understanding {
	const [first] = isList(before) ? before : [];
	const parts = typed.split(of.is === 'text' ? /\s*[,;]\s*/ : /[\s,;]+/).filter(part => part !== '');
	const read = parts.map(part => understand(part, of, first, system));
	const wrong = read.find(one => !one.ok);
	if (wrong) return wrong;
	const values = read.flatMap(one => (one.ok ? [one.value] : []));
	return {ok: true, value: values, words: `${values.length}: ${values.join('  ')}`};
}

function quantity(
	typed: string,
	{dimensions, change}: FieldKind & {is: 'quantity'},
	before: Json | undefined,
	system: UnitSystem,
): Understanding {
	const whole = quantityOf(typed, dimensions);
	const borrowed = whole.ok ? undefined : withUnitOf(typed, before, dimensions, system);
	const reading = borrowed?.reading ?? whole;
	if (!reading.ok) return refused(reading);
	const isPlain = reading.dimension === 'number' && !reading.signed && reading.uncertainty === undefined;
	return {
		ok: true,
		value: isPlain ? reading.value : (borrowed?.text ?? typed),
		words: `${change ? changeWords(reading) : ''}${quantityWords(reading, system)}`,
	};
}

/** A number without a unit gets the one that stood there, else the one that people read. */
function withUnitOf(typed: string, before: Json | undefined, dimensions: readonly Dimension[], system: UnitSystem) {
	const former = typeof before === 'string' ? quantityOf(before, dimensions) : undefined;
	const unit = (former?.ok && former.unit?.name) || told[system][dimensions[0]!];
	if (unit === undefined) return undefined;
	const text = `${typed} ${unit}`;
	const reading = quantityOf(text, dimensions);
	return reading.ok ? {text, reading} : undefined;
}

const changeWords = ({signed, dimension, value}: Quantity): string => {
	if (!signed) return 'replaces: ';
	if (dimension === 'share') return `times ${fixed(1 + value, 4)}: `;
	return value < 0 ? 'takes away: ' : 'adds: ';
};

/** "118.0 mph = 189.9 km/h": in the units that are read, and as it was written where that is another. */
export function quantityWords({value, dimension, unit, uncertainty}: Quantity, system: UnitSystem): string {
	const spread = (factor: number) =>
		uncertainty === undefined ? '' : ` ± ${Number((uncertainty / factor).toPrecision(3))}`;
	if (dimension === 'number') return `${Number(value.toPrecision(6))}${spread(1)}`;
	const short = dimension === 'length' && Math.abs(value) < shortLengthM;
	const name = short ? shortLength[system] : told[system][dimension];
	const shownIn = name === undefined ? undefined : findUnit(name, dimension);
	const names = [unit, shownIn].filter(one => one !== undefined);
	const texts = names.map(
		one => `${Number((value / one.factor + one.zero).toPrecision(5))}${spread(one.factor)} ${one.name}`,
	);
	return [...new Set(texts)].join(' = ');
}

/** The value of a field in the units that are read; empty where it is written in them already. */
export function inOtherUnits(value: Json | undefined, kind: FieldKind, system: UnitSystem): string {
	if (kind.is !== 'quantity' || typeof value !== 'string') return '';
	const reading = quantityOf(value, kind.dimensions);
	if (!reading.ok) return '';
	const words = quantityWords(reading, system);
	return words.includes(' = ') ? words.slice(words.indexOf(' = ') + 3) : '';
}

function refused({
	found,
	allowed,
	hint,
	unknownUnits,
}: {
	found: string;
	allowed: string;
	hint?: string;
	unknownUnits?: readonly string[];
}): Understanding {
	const words = `found ${found}; allowed ${allowed}${hint === undefined ? '' : `. ${hint}`}`;
	return {ok: false, words, ...(unknownUnits && {unknownUnits})};
}

/** How a field shows its value. */
export function valueText(value: Json | undefined): string {
	if (value === undefined) return '';
	if (typeof value === 'boolean') return value ? 'yes' : 'no';
	if (isList(value)) return value.map(valueText).join(', ');
	return typeof value === 'object' ? '…' : String(value);
}
