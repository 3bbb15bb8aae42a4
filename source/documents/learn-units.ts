/** Units that the table lacks, from mathjs. Only the name of a unit is handed over, never text to evaluate. */
import {keepRareUnit} from './rare-units.ts';
import type {Dimension} from './units.ts';

/** What mathjs calls our SI unit of a dimension. No temperatures: a scale with a zero point is no factor. */
const siNames: Partial<Record<Dimension, string>> = {
	length: 'm',
	speed: 'm/s',
	mass: 'kg',
	area: 'm^2',
	acceleration: 'm/s^2',
	angle: 'rad',
	pressure: 'Pa',
	time: 's',
	torque: 'N m',
	force: 'N',
	inertia: 'kg m^2',
	power: 'W',
	volume: 'm^3',
	density: 'kg/m^3',
	consumption: 'kg/J',
};

const unitNamePattern = /^[\p{L}]+(\^-?\d)?([ /][\p{L}]+(\^-?\d)?)*$/u;
const longestName = 40;
// A document that needs more is no document that a person wrote.
const mostNames = 50;

/** Looks the names up and keeps those that are units; says whether any was. */
export async function learnUnits(names: Iterable<string>): Promise<boolean> {
	const wanted = [...new Set(names)].filter(name => name.length <= longestName && unitNamePattern.test(name));
	if (wanted.length === 0) return false;
	const {unit} = await import('mathjs');
	let learned = false;
	for (const name of wanted.slice(0, mostNames)) {
		const found = lookUp(name, unit);
		if (found === undefined) continue;
		keepRareUnit({name, ...found, zero: 0});
		learned = true;
	}
	return learned;
}

type MathUnit = {equalBase(other: MathUnit): boolean; toNumber(name: string): number};

function lookUp(
	name: string,
	unit: (value: number, name: string) => MathUnit,
): {dimension: Dimension; factor: number} | undefined {
	let one: MathUnit;
	try {
		one = unit(1, name);
	} catch {
		return undefined; // not a unit: the library has no other way to say so
	}
	for (const [dimension, siName] of Object.entries(siNames) as [Dimension, string][]) {
		if (one.equalBase(unit(1, siName))) return {dimension, factor: one.toNumber(siName)};
	}
	return undefined;
}
