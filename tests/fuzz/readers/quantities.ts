import {exampleOf, quantityOf, readQuantity} from '../../../source/documents/quantity.ts';
import {dimensions, findUnit, spellingsOf} from '../../../source/documents/units.ts';
import type {Answer, Reader} from '../reader.ts';

const words = [
	...new Set(dimensions.flatMap(spellingsOf)),
	...[
		'furlong',
		'stone',
		'furlong/fortnight',
		'mach',
		'bar',
		'mg',
		'kmm',
		'm m',
		'm/m',
		'm^9',
		'degF',
		'NaN',
		'Infinity',
	],
];

/** The value written again in its own unit. */
function again({value, unit}: {value: number; unit: {name: string; factor: number; zero: number} | undefined}): string {
	return unit === undefined ? String(value) : `${value / unit.factor + unit.zero} ${unit.name}`;
}

/** So far may a value move by being written in another unit and read again. */
const closeness = 1e-9;

async function read(text: string): Promise<Answer> {
	const reading = await readQuantity(text, dimensions);
	if (!reading.ok) {
		const {found, allowed, hint = ''} = reading;
		return {accepted: false, said: `${found}${allowed}${hint}`, problems: [{path: 'field', found, allowed}]};
	}
	const {value, unit, dimension} = reading;
	const alone = quantityOf(text, dimension);
	const second = quantityOf(again(reading), dimension);
	const scale = Math.max(Math.abs(value), Math.abs((unit?.zero ?? 0) * (unit?.factor ?? 1)), Number.MIN_VALUE);
	const isSame = second.ok && Math.abs(second.value - value) <= closeness * scale;
	return {
		accepted: true,
		broken: !Number.isFinite(value)
			? `the value is a number: ${value}`
			: !alone.ok || alone.value !== value
				? `it means the same where one dimension is expected: ${JSON.stringify([reading, alone])}`
				: unit !== undefined && findUnit(unit.name, dimension) !== undefined && !isSame
					? `printed and read again it is the same: ${again(reading)} ${JSON.stringify([reading, second])}`
					: undefined,
	};
}

export const quantities: Reader = {
	name: 'quantities',
	examples: () => [
		...dimensions.map(exampleOf),
		'86.5+0.25 in',
		'118*1.02 mph',
		'88 mph + 3 km/h',
		'(1/2) mi',
		'−3 %',
		'2 stone',
	],
	words: [...words, '+', '-', '*', '/', '×', '÷', '−', '(', ')', '²', '^-2', '·'],
	longest: 300,
	read,
};
