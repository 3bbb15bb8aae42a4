import fc from 'fast-check';
import {inferSchema, initParser} from 'udsv';
import {describe, expect, test} from 'vitest';
import {runs} from '../runs.ts';
import {numbers, plainLog, read, reading, table, texts} from './log.ts';

type Dialect = {
	separator: string;
	decimal: string;
	lineEnd: string;
	quotes: boolean;
	blanks: boolean;
	mark: boolean;
	unitsRow: boolean;
	preamble: number;
	lastEnd: boolean;
};

/** A decimal comma needs another separator, or quotes. */
const dialects: fc.Arbitrary<Dialect> = fc
	.record({
		separator: fc.constantFrom(',', ';', '\t', '|'),
		decimal: fc.constantFrom('.', ','),
		lineEnd: fc.constantFrom('\n', '\r\n', '\r'),
		quotes: fc.boolean(),
		blanks: fc.boolean(),
		mark: fc.boolean(),
		unitsRow: fc.boolean(),
		preamble: fc.nat(4),
		lastEnd: fc.boolean(),
	})
	.filter(({separator, decimal, quotes}) => separator !== ',' || decimal === '.' || quotes);

function written(
	columns: readonly string[],
	units: readonly string[],
	rows: readonly number[][],
	how: Dialect,
): string {
	const cell = (text: string) =>
		how.blanks ? `  ${how.quotes ? `"${text}"` : text} ` : how.quotes ? `"${text}"` : text;
	const line = (cells: readonly string[]) => cells.map(cell).join(how.separator);
	// Four places always: with three, a comma may part thousands.
	const decimal = (value: number) => value.toFixed(4).replace('.', how.decimal);
	const headers = how.unitsRow
		? [line(columns), line(units)]
		: [line(columns.map((column, i) => (units[i] === '' ? column : `${column} (${units[i]})`)))];
	const preamble = Array.from({length: how.preamble}, (_, i) => ['Session,Friday; practice', '', '"Rate";100'][i % 3]!);
	const lines = [...preamble, ...headers, ...rows.map(row => line(row.map(decimal)))];
	return `${how.mark ? '\uFEFF' : ''}${lines.join(how.lineEnd)}${how.lastEnd ? how.lineEnd : ''}`;
}

const tables = fc.array(
	fc.tuple(fc.integer({min: 100, max: 1_000_000}), fc.integer({min: 300_000, max: 900_000}), fc.nat(1000)),
	{minLength: 2, maxLength: 40},
);

/** Rising times in steps of 0.01 to 100 s, speeds of 0 to 100 m/s and rpm of 3000 to 9000, all with four places. */
function rowsOf(raw: readonly [number, number, number][]): number[][] {
	let time = 0;
	return raw.map(([step, speed, other]) => {
		time += step;
		return [other / 7, time / 1e4, (speed * 100) / 900_000, speed / 100];
	});
}

test('a table in any dialect gives the numbers that were written', async () => {
	await fc.assert(
		fc.asyncProperty(tables, dialects, async (raw, how) => {
			const rows = rowsOf(raw);
			const {run} = await read(written(['Temp', 'Time', 'Speed', 'RPM'], ['degC', 's', 'm/s', ''], rows, how));
			const exactly = (i: number) => rows.map(row => Number(row[i]!.toFixed(4)));
			const times = exactly(1).map(time => time + -exactly(1)[0]!);
			expect(Array.from(run.timeS)).toEqual(times);
			expect(Array.from(run.rpm)).toEqual(exactly(3).map(Math.fround));
			expect(Array.from(run.speedMps)).toEqual(exactly(2).map(Math.fround));
		}),
		{numRuns: runs(300, 20_000)},
	);
});

test('units do not change the run', async () => {
	const inUnits = (time: string, perS: number, speed: string, perMps: number) =>
		read(table(`Time [${time}],Speed [${speed}],RPM`, 30, i => `${(i * perS) / 10},${(40 + i) * perMps},${5000 + i}`));
	const plain = await inUnits('s', 1, 'm/s', 1);
	for (const [time, perS] of [
		['ms', 1000],
		['min', 1 / 60],
		['µs', 1e6],
	] as const)
		for (const [speed, perMps] of [
			['km/h', 3.6],
			['mph', 1 / 0.44704],
			['ft/s', 1 / 0.3048],
			['kn', 3600 / 1852],
		] as const) {
			const {run} = await inUnits(time, perS, speed, perMps);
			for (let i = 0; i < 30; i++) {
				expect(run.timeS[i]).toBeCloseTo(plain.run.timeS[i]!, 9);
				expect(run.speedMps[i]).toBeCloseTo(plain.run.speedMps[i]!, 4);
			}
		}
});

describe('numbers are read as JavaScript reads them', () => {
	const speeds = (cells: readonly string[]) =>
		read(table('Distance [m],Speed [m/s],RPM', cells.length, i => `${cells[i]},10,5000`)).then(({run}) => run);

	test('whatever their digits, places and exponents', async () => {
		const cell = fc.oneof(
			fc.double({min: 0, max: 1e6, noNaN: true}).map(String),
			fc.tuple(fc.nat(1e9), fc.nat(999_999_999)).map(([whole, part]) => `${whole}.${part}`),
			fc.tuple(fc.bigInt(0n, 10n ** 15n - 1n), fc.nat(9)).map(([digits, at]) => `${digits}.${at}`),
			fc.nat(1e6).map(value => `+${value}.`),
			fc.nat(1e6).map(value => `.${value}`),
			fc.tuple(fc.nat(1000), fc.integer({min: -9, max: 9})).map(([value, power]) => `${value}e${power}`),
		);
		await fc.assert(
			fc.asyncProperty(fc.array(cell, {minLength: 2, maxLength: 30}), async cells => {
				const sorted = cells.toSorted((a, b) => Number(a) - Number(b));
				const {distanceM} = await speeds(sorted);
				expect(Array.from(distanceM)).toEqual(sorted.map(text => Number(text) - Number(sorted[0])));
			}),
			{numRuns: runs(200, 10_000)},
		);
	});

	test('negative ones too', async () => {
		const log = await read(table('Time [s],Speed [m/s],RPM,Steering', 4, i => `${i / 10},10,5000,-${i}.25`));
		expect(numbers(log.run.steering)).toEqual([-0.25, -1.25, -2.25, -3.25]);
	});
});

test('where the pieces end does not matter', async () => {
	const rows = Array.from({length: 60}, (_, i) => {
		const damaged = i % 17 === 3 ? ',9' : '';
		return `${i / 10},"${50 + i}",${i % 11 === 5 ? 'ERR' : 5000 + i}${damaged}`;
	});
	const log = `\uFEFF"a",1\r\nTime [s],"Speed, car [km/h]",RPM\r\n${rows.join('\r\n')}\r\n${'7'.repeat(300_000)}\r\n9.0,60,50`;
	const bytes = new TextEncoder().encode(log);
	const whole = await reading(bytes, {columns: {speed: '#2'}});
	expect(whole.ok && whole.remarks.map(({kind}) => kind)).toEqual(
		expect.arrayContaining(['preamble', 'textCells', 'wrongCells', 'longLines']),
	);
	for (const size of [1, 2, 3, 7, 64, 1000, 65_536, 262_143, 262_144, 262_145])
		expect(await reading(bytes, {columns: {speed: '#2'}}, size)).toEqual(whole);
});

test('any bytes give an answer', async () => {
	const scraps = fc.constantFrom(
		'Time [s],Speed [mph],RPM\n',
		'Time;Speed;RPM\ns;mph;\n',
		'0.1,50,5000\n',
		'"',
		',,,\n',
		'\0',
		'1:2:3',
		'\uFEFF',
		'5,5;',
		'mph',
		'\r',
	);
	const bytes = fc.oneof(
		fc.uint8Array({maxLength: 400}),
		fc.array(scraps, {maxLength: 30}).map(parts => new TextEncoder().encode(parts.join(''))),
		fc.array(scraps, {maxLength: 30}).map(parts => Buffer.from(`\uFEFF${parts.join('')}`, 'utf16le')),
	);
	await fc.assert(
		fc.asyncProperty(bytes, fc.integer({min: 1, max: 50}), fc.option(fc.string()), async (log, size, asked) => {
			const options = asked === null ? {} : {columns: {speed: asked}};
			const whole = await reading(log, options);
			expect(await reading(log, options, size)).toEqual(whole);
			if (!whole.ok)
				expect(JSON.stringify(whole.problems.map(({found, do: hint}) => found + hint))).not.toMatch(/\p{Cc}/u);
		}),
		{numRuns: runs(500, 10_000)},
	);
});

test('what we read is what another parser reads', async () => {
	const log = table(
		'Time,GPS Speed,RPM,Note',
		200,
		i => `${(i / 100).toFixed(2)},${(50 + Math.sin(i) * 9).toFixed(3)},${5000 + i},"a, ""b"""`,
	);
	const parser = initParser(inferSchema(log));
	const theirs = parser.stringArrs<string[]>(log);
	const {run} = await read(log, {columns: {speed: 'GPS Speed [m/s]'}});
	expect(Array.from(run.timeS)).toEqual(theirs.map(row => Number(row[0])));
	expect(Array.from(run.speedMps)).toEqual(theirs.map(row => Math.fround(Number(row[1]))));
});

describe('text that is not UTF-8', () => {
	test('UTF-16 with its mark is read, and said', async () => {
		const plain = await read(plainLog);
		const swapped = Buffer.from(`\uFEFF${plainLog}`, 'utf16le').swap16();
		for (const bytes of [Buffer.from(`\uFEFF${plainLog}`, 'utf16le'), swapped]) {
			const log = await read(bytes);
			expect(log.run).toEqual(plain.run);
			expect(texts(log)).toContain('The text is UTF-16, not UTF-8; it was read as that.');
		}
	});

	test('an old single-byte code is read, and said', async () => {
		const log = await read(
			Buffer.from(
				table('Time [µs],Speed [m/s],RPM', 20, i => `${i * 1e5},50,5000`),
				'latin1',
			),
		);
		expect(texts(log)).toContain('The text is Windows-1252, not UTF-8; it was read as that.');
		expect(log.run.timeS[19]).toBeCloseTo(1.9, 12);
	});
});
