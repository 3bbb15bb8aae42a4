/** Two documents side by side, differences only. */
import {quantityOf} from '../documents/quantity.ts';
import {type Dimension, dimensions} from '../documents/units.ts';

/** A value that is missing on one side is undefined there; what is shown is as it was written. */
export type Difference = {path: string; a: string | undefined; b: string | undefined};
type Json = Record<string, unknown>;

/** Deeper than any document that a reader accepts. */
const maxDepth = 32;

/** The leaves that differ, in the order of the first document, then what only the second has. Quantities count by value. */
export function compare(a: Json, b: Json): Difference[] {
	const differences: Difference[] = [];
	compareAt('', a, b, differences, 0);
	return differences;
}

function compareAt(path: string, a: unknown, b: unknown, differences: Difference[], depth: number): void {
	if (depth > maxDepth) throw new RangeError('documents deeper than their readers accept');
	const [branchA, branchB] = [branchesOf(a), branchesOf(b)];
	if (isBranch(branchA, a, b) || isBranch(branchB, b, a)) {
		const keys = new Set([...(branchA?.keys() ?? []), ...(branchB?.keys() ?? [])]);
		const list = Array.isArray(a) || Array.isArray(b);
		for (const key of keys)
			compareAt(below(path, key, list), branchA?.get(key), branchB?.get(key), differences, depth + 1);
	} else if (!sameValue(a, b, path)) differences.push({path, a: written(a), b: written(b)});
}

/** Goes into an object with entries unless the other side holds something else there. */
function isBranch(branches: Map<string, unknown> | undefined, own: unknown, other: unknown): boolean {
	if (branches === undefined || branches.size === 0) return false;
	return other === undefined || (branchesOf(other) !== undefined && Array.isArray(own) === Array.isArray(other));
}

function below(path: string, key: string, inList: boolean): string {
	if (path === '') return key;
	return inList && /^[\d.]+$/.test(key) ? `${path}[${key}]` : `${path}.${key}`;
}

/** Fields of an object; entries of a list by what names them, else by their place. Undefined for a plain value. */
function branchesOf(value: unknown): Map<string, unknown> | undefined {
	if (typeof value !== 'object' || value === null) return undefined;
	if (!Array.isArray(value)) return new Map(Object.entries(value));
	if (value.every(entry => typeof entry !== 'object' || entry === null)) return undefined;
	const names = value.map(nameOf);
	const isNamed = names.every(name => name !== undefined) && new Set(names).size === names.length;
	return new Map(value.map((entry, i) => [isNamed ? names[i]! : String(i), entry]));
}

/** A name, a situation, a pair, or the RPM of a dyno point or the gear of a shift. */
function nameOf(entry: unknown): string | undefined {
	if (typeof entry !== 'object' || entry === null) return undefined;
	const {name, situation, field, driving, driven, from, rpm} = entry as Json;
	if (driving !== undefined && driven !== undefined) return `${driving}/${driven}`;
	for (const text of [name, situation, field]) if (typeof text === 'string') return text;
	for (const number of [from, rpm]) if (typeof number === 'number') return String(number);
	return undefined;
}

/** Fields whose text is a name, not a quantity, whatever it looks like. */
const nameFields = /(^|\.)(name|engine|gearbox|gearboxes|notes|at|date|type|situation|field|from)$/;

function sameValue(a: unknown, b: unknown, path: string): boolean {
	if (typeof a === 'string' && typeof b === 'string') {
		const isName = nameFields.test(path) && !/(^|\.)wind\.from$/.test(path);
		return a === b || (!isName && sameQuantity(a, b));
	}
	if (Array.isArray(a) && Array.isArray(b))
		return a.length === b.length && a.every((entry, i) => sameValue(entry, b[i], path));
	return Object.is(a, b) || (a === 0 && b === 0) || isEmptyPair(a, b);
}

function isEmptyPair(a: unknown, b: unknown): boolean {
	const isEmpty = (value: unknown) => branchesOf(value)?.size === 0;
	return isEmpty(a) && isEmpty(b);
}

/** Relative, in SI; temperatures from absolute zero. */
const tolerance = 1e-12;
const absoluteZeroC = 273.15;

/** Whether both texts are one quantity of the same kind, both a change or both a value. */
function sameQuantity(a: string, b: string): boolean {
	return dimensions.some(dimension => {
		const [one, other] = [quantityOf(a, dimension), quantityOf(b, dimension)];
		if (!one.ok || !other.ok || one.signed !== other.signed) return false;
		return close(one.value, other.value, dimension) && sameSpread(one.uncertainty, other.uncertainty);
	});
}

function sameSpread(a: number | undefined, b: number | undefined): boolean {
	return a === b || (a !== undefined && b !== undefined && close(a, b, 'number'));
}

function close(a: number, b: number, dimension: Dimension): boolean {
	const shift = dimension === 'temperature' ? absoluteZeroC : 0;
	return Math.abs(a - b) <= tolerance * Math.max(Math.abs(a + shift), Math.abs(b + shift));
}

function written(value: unknown): string | undefined {
	if (value === undefined) return undefined;
	return typeof value === 'string' ? value : JSON.stringify(value);
}
