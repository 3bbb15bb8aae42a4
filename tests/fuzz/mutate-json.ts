/** Changes to the content of a JSON text, so that what comes out is JSON again. */
import type {Random} from './random.ts';

type Spot = {holder: Record<string, unknown> | unknown[]; key: string | number};

const values: readonly unknown[] = [
	null,
	true,
	false,
	0,
	-1,
	1.5,
	1e308,
	1e-308,
	'',
	' ',
	'1 mph',
	'-3 %',
	'+1 mph',
	[],
	{},
];

/** The text with a field or entry taken out, doubled, renamed or given another's value; undefined for what is no JSON. */
export function inJson(text: string, random: Random): string | undefined {
	const document = parsed(text);
	if (typeof document !== 'object' || document === null) return undefined;
	const spots = spotsIn(document);
	if (spots.length === 0) return undefined;
	const [one, other] = [random.of(spots), random.of(spots)];
	change(one, other, random);
	return JSON.stringify(document, null, random.of([0, 1]));
}

function change({holder, key}: Spot, other: Spot, random: Random): void {
	const value = Reflect.get(holder, key);
	const isList = Array.isArray(holder);
	switch (random.below(6)) {
		case 0:
			if (isList) holder.splice(Number(key), 1);
			else Reflect.deleteProperty(holder, key);
			return;
		case 1:
			if (isList) holder.splice(Number(key), 0, ...Array(random.of([1, 1, 9])).fill(copy(value)));
			else Object.defineProperty(holder, `${key}2`, {value, enumerable: true, configurable: true, writable: true});
			return;
		case 2:
			// A copy: a value inside itself would be a circle.
			Reflect.set(holder, key, copy(Reflect.get(other.holder, other.key)));
			return;
		case 3:
			Reflect.set(holder, key, typeof value === 'number' ? numberNear(value, random) : random.of(values));
			return;
		case 4:
			if (!isList) Reflect.set(holder, other.key, copy(Reflect.get(other.holder, other.key)));
			return;
		default:
			if (isList) holder.reverse();
			else Reflect.set(holder, key, typeof value === 'string' ? textNear(value, random) : [value]);
	}
}

function numberNear(value: number, random: Random): number {
	return random.of([value + 1, value - 1, -value, value * 2, value / 2, value * 1000, value + 0.5, 0]);
}

/** The number in a quantity changed, its unit kept. */
function textNear(text: string, random: Random): string {
	return text.replace(/\d+(\.\d+)?/, number => String(numberNear(Number(number), random)));
}

function copy(value: unknown): unknown {
	return value === undefined ? null : structuredClone(value);
}

function spotsIn(value: object): Spot[] {
	const holder = value as Spot['holder'];
	return Object.entries(value).flatMap(([key, inner]) => [
		{holder, key: Array.isArray(value) ? Number(key) : key},
		...(typeof inner === 'object' && inner !== null ? spotsIn(inner) : []),
	]);
}

function parsed(text: string): unknown {
	if (!/^\s*[[{]/.test(text)) return undefined;
	try {
		return JSON.parse(text);
	} catch {
		return undefined;
	}
}
