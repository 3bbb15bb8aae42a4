import fc from 'fast-check';
import {describe, expect, test} from 'vitest';
import {describeProblems, readCar, readTrack} from '../../source/documents/read.ts';
import {carSchema, trackSchema} from '../../source/documents/schema.ts';
import {runs} from '../runs.ts';
import {completeCar, completeTrack} from './complete.ts';
import {carDocument, engine, text, trackDocument} from './examples.ts';

const unit = fc.constantFrom('mph', 'km/h', 'm/s', 'ft/s', 'kn');
const speed = fc.tuple(fc.integer({min: 10, max: 90}), unit).map(([number, name]) => `${number} ${name}`);
const share = fc.integer({min: -20, max: 20}).map(percent => `${percent < 0 ? '' : '+'}${percent} %`);
const optional = <T>(value: fc.Arbitrary<T>) => fc.option(value, {nil: undefined});

const track = fc
	.record({
		name: fc.string({minLength: 1, maxLength: 30}).filter(name => /\S/.test(name)),
		type: fc.constantFrom('short', 'intermediate', 'superspeedway', 'road'),
		straights: fc
			.array(
				fc.record({exit: speed, minimum: optional(speed), length: optional(fc.constantFrom('650 ft', '0.3 km'))}),
				{
					minLength: 1,
					maxLength: 6,
				},
			)
			.map(list => list.map((straight, i) => ({name: `S${i}`, ...straight}))),
		situations: optional(
			fc
				.array(
					fc.record({exit: optional(share), drag: optional(share), power: optional(share), grip: optional(share)}),
					{maxLength: 4},
				)
				.map(list => list.map((situation, i) => ({name: `T${i}`, ...situation}))),
		),
	})
	.map(trackDocument);

const car = fc
	.record({
		grip: fc.double({min: 0.5, max: 2, noNaN: true}),
		gearboxes: fc
			.array(fc.double({min: 0.5, max: 4, noNaN: true}), {minLength: 1, maxLength: 6})
			.map(ratios => [{name: 'A', ratios: ratios.toSorted((a, b) => b - a)}]),
		engines: fc
			.uniqueArray(fc.integer({min: 1000, max: 12_000}), {minLength: 3, maxLength: 20})
			.map(rpms => rpms.toSorted((a, b) => a - b).map(rpm => ({rpm, torque: '500 N m'})))
			.map(curve => [engine({curve})]),
	})
	.map(carDocument);

test('every valid track is read', async () => {
	await fc.assert(
		fc.asyncProperty(track, async document => {
			const reading = await readTrack(text(document));
			expect(reading).toMatchObject({ok: true, document: JSON.parse(text(document))});
		}),
		{numRuns: runs(100, 2000)},
	);
});

test('every valid car is read', async () => {
	await fc.assert(
		fc.asyncProperty(car, async document => {
			expect(await readCar(text(document))).toMatchObject({ok: true, document: JSON.parse(text(document))});
		}),
		{numRuns: runs(100, 2000)},
	);
});

describe('a damaged document is answered, never a crash', () => {
	const junk = fc.constantFrom(
		'"',
		'{',
		'}',
		'[',
		']',
		',',
		':',
		'0',
		'-',
		'1e999',
		'null',
		'\0',
		'\u001B',
		'\u202E',
		'\\',
		'NaN',
		'x',
	);
	const damage = fc.array(fc.tuple(fc.nat(), fc.nat({max: 4}), junk), {minLength: 1, maxLength: 4});
	const damaged = (whole: string, cuts: [number, number, string][]) =>
		cuts.reduce((left, [at, length, piece]) => {
			const start = at % (left.length + 1);
			return left.slice(0, start) + piece + left.slice(start + length);
		}, whole);

	test.each([
		['track', track, readTrack],
		['car', car, readCar],
	] as const)('%s', async (_, documents, read) => {
		await fc.assert(
			fc.asyncProperty(documents, damage, async (document, cuts) => {
				const reading = await read(damaged(text(document), cuts));
				if (reading.ok) return;
				expect(reading.problems.length).toBeGreaterThan(0);
				const message = describeProblems('x.json', reading.problems);
				expect(message.replaceAll('\n', '')).not.toMatch(/[\p{Cc}\u202E]/u);
				expect(message).not.toMatch(/undefined|Invalid input|\[object/);
			}),
			{numRuns: runs(500, 20_000)},
		);
	});
});

/** The document with the value in the place of every field and entry, on every level, in turn. */
function* withEverywhere(document: unknown, value: unknown): Generator<unknown> {
	if (typeof document !== 'object' || document === null) return;
	for (const [key, inner] of Object.entries(document)) {
		const changed = (to: unknown) =>
			Array.isArray(document) ? document.with(Number(key), to) : {...document, [key]: to};
		yield changed(value);
		for (const other of withEverywhere(inner, value)) yield changed(other);
	}
}

/** The names of all fields in a schema. */
function namesIn(schema: unknown): string[] {
	if (typeof schema !== 'object' || schema === null) return [];
	const {properties = {}} = schema as {properties?: object};
	return [...Object.keys(properties), ...Object.values(schema).flatMap(namesIn)];
}

describe('any value in the place of any field, list or entry is answered', () => {
	const values = runs(
		[null, {}, [null], ''],
		[null, {}, [], [null], [[]], '', ' ', '1', '1 mph', '-1 %', -1, 0, 1.5, 1e308, true],
	);
	test.each([
		['track', completeTrack(), readTrack, trackSchema()],
		['car', completeCar(), readCar, carSchema()],
	] as const)('%s', async (_, document, read, schema) => {
		expect((await read(text(document))).ok).toBe(true);
		for (const value of values) {
			for (const changed of withEverywhere(document, value)) {
				const reading = await read(text(changed));
				if (!reading.ok) expect(describeProblems('x', reading.problems)).toMatch(/found .+; allowed (?!.*\[object)/);
			}
		}
		const written = text(document);
		// Of two fields that cannot stand together one is left out.
		const absent = ['efficiency', 'size', 'diameter'];
		const names = namesIn(schema).filter(name => !absent.includes(name));
		expect(names.length).toBeGreaterThan(30);
		expect(names.filter(name => !written.includes(`"${name}"`))).toEqual([]);
	});
});

test('__proto__ is an unknown field like any other', async () => {
	for (const [written, path] of [
		['"__proto__": {"polluted": true}', '__proto__'],
		['"air": {"__proto__": {"temperature": "20 degC"}}', 'air.__proto__'],
		['"constructor": {"prototype": {"polluted": true}}', 'constructor'],
	] as const) {
		const reading = await readTrack(text(trackDocument()).replace('{', `{${written},`));
		expect(reading).toMatchObject({ok: false, problems: [{path, found: 'an unknown field'}]});
	}
	expect(({} as Record<string, unknown>).polluted).toBeUndefined();
});

const timed = async (document: unknown) => {
	const written = text(document);
	const started = performance.now();
	const reading = await readTrack(written);
	return {reading, elapsedMs: performance.now() - started};
};

test('a hundred thousand straights end in one clear error within a second', async () => {
	const straights = Array.from({length: 100_000}, (_, i) => ({name: `S${i}`, exit: '88 mph', length: '650 ft'}));
	const {reading, elapsedMs} = await timed(trackDocument({straights}));
	expect(reading).toMatchObject({ok: false, problems: [{path: 'straights'}]});
	expect(elapsedMs).toBeLessThan(1000);
});

test('a hundred thousand unknown fields end in an error within a second', async () => {
	const fields = Object.fromEntries(Array.from({length: 100_000}, (_, i) => [`field${i}`, i]));
	const {reading, elapsedMs} = await timed(trackDocument(fields));
	expect(reading.ok).toBe(false);
	expect(elapsedMs).toBeLessThan(1000);
});

test('two thousand broken pairs are all looked at within a second', async () => {
	const pairs = Array.from({length: 2000}, () => ({driving: -1, drivn: 'x', miles: '5'}));
	const started = performance.now();
	const reading = await readCar(text(carDocument({rack: {pairs}})));
	expect(reading.ok ? 0 : reading.problems.length).toBe(4 * 2000);
	expect(performance.now() - started).toBeLessThan(1000);
});

test('text from a stranger is shown without control characters', async () => {
	const reading = await readTrack(text(trackDocument({type: '\u001B[2J\u202E', '\u001B]0;x\u0007': 1})));
	const message = reading.ok ? '' : describeProblems('\u001B[31mfile', reading.problems);
	expect(message.split('\n')).toHaveLength(2);
	expect(message.replaceAll('\n', '')).not.toMatch(/[\p{Cc}\u202E]/u);
});

test('names in a problem are safe to show before anyone describes it', async () => {
	const straights = ['a\u001B[2J', 'a\u001B[2J'].map(name => ({name, exit: '88\u2028mph'}));
	const reading = await readTrack(text(trackDocument({straights})));
	const [problem] = reading.ok ? [] : reading.problems;
	expect(problem?.found).toBe('a second "a␛[2J"');
});
