import {describe, expect, test} from 'vitest';
import {describeProblems} from '../../source/documents/problem.ts';
import type {ReadLogOptions} from '../../source/logs/read-log.ts';
import {numbers, plainLog, plainRow, problemsOf, read, table, texts} from './log.ts';

/** The message as a command prints it. */
async function refusal(log: string | Uint8Array, options: ReadLogOptions = {}): Promise<string> {
	const problems = await problemsOf(log, options);
	return describeProblems(
		'run.csv',
		problems.map(({where, found, allowed, do: hint}) => ({path: where, found, allowed, hint})),
	);
}

const text =
	'a table as text: a line of headers, then a line of numbers for each sample, parted by commas, semicolons or tabs';
const [speedMps, rpm] = [50, 5000];
const steady = (i: number) => `${(i / 10).toFixed(1)},${speedMps},${rpm}`;
const headers = 'Time [s],Speed [m/s],RPM';

describe('a file that is no log is refused', () => {
	test('an empty one', async () => {
		const expected = `run.csv: the file: found nothing; allowed ${text}. Export the run from the logger as CSV text.`;
		expect(await refusal('')).toBe(expected);
		expect(await refusal('\uFEFF \r\n\n')).toBe(expected);
	});

	test('a header without rows', async () => {
		const expected = 'the lines after the header (line 1): found no row of numbers;';
		expect(await refusal(headers)).toContain(expected);
		expect(await refusal('Time,Speed,RPM\ns,mph,rpm\n')).toContain(expected);
	});

	test('rows without a header', async () => {
		expect(await refusal('0,50,5000\n0.1,51,5050\n')).toBe(
			`run.csv: the file: found no line of headers; it begins with "0,50,5000"; allowed ${text}. Export it with a line that names the columns: Time, Speed, RPM.`,
		);
	});

	test('binary zeros, an archive, and UTF-16 without its mark', async () => {
		expect(await refusal(new Uint8Array(5000))).toContain('the file: found binary zeros, so it is no text;');
		expect(await refusal(Buffer.from('PK\x03\x04\0\0'))).toContain('found a ZIP archive or a workbook;');
		expect(await refusal(Uint8Array.of(0x1f, 0x8b, 8, 0))).toContain('found a gzip file;');
		expect(await refusal(Buffer.from(plainLog, 'utf16le'))).toMatch(
			/UTF-16 text without its mark;.*Save it as UTF-8\./,
		);
	});

	test('one line without end', async () => {
		expect(await refusal('x'.repeat(3_000_000))).toContain('line 1: found no end within 256 kB;');
	});

	test('one byte', async () => {
		expect(await refusal('x')).toContain('it begins with "x"');
	});
});

describe('columns that do not fit are refused with what to type', () => {
	test('missing ones, with the nearest header', async () => {
		expect(await refusal(table('Time [s],Sped,Temp', 9, steady))).toBe(
			[
				'run.csv: the column of speed: found no such column; the headers are "Time [s]", "Sped", "Temp"; allowed speed, rpm, and one of time and distance; a header such as Speed, GPS speed, Wheel speed. If it is "Sped": --column speed=Sped.',
				'run.csv: the column of rpm: found no such column; the headers are "Time [s]", "Sped", "Temp"; allowed speed, rpm, and one of time and distance; a header such as RPM, Engine speed. Say which column it is: --column rpm=HEADER.',
			].join('\n'),
		);
	});

	test('neither time nor distance', async () => {
		expect(await refusal('Speed [mph],RPM\n50,5000\n')).toContain(
			'the column of time or distance: found no such column;',
		);
	});

	test('two that may be the same channel', async () => {
		expect(await refusal(table('Time [s],GPS Speed [mph],Wheel Speed [mph],RPM', 9, plainRow))).toBe(
			'run.csv: the column of speed: found 2 columns that it may be: "GPS Speed [mph]" (#2), "Wheel Speed [mph]" (#3); allowed one of them. Say which: --column speed="GPS Speed [mph]", or --column speed="Wheel Speed [mph]".',
		);
	});

	test('so many that only the first are listed', async () => {
		const message = await refusal(table(`Time [s],RPM,${'Speed [mph],'.repeat(30)}X`, 9, i => `${i},`.repeat(32) + i));
		expect(message).toContain('found 30 columns that it may be: "Speed [mph]" (#3), ');
		expect(message).toMatch(/"Speed \[mph\]" \(#26\) and 6 more; .*--column speed="#26" and 6 more\.$/);
	});

	test('two with the same header', async () => {
		expect(await refusal(table('Time [s],Speed [mph],RPM,RPM', 9, plainRow))).toContain(
			'found 2 columns that it may be: "RPM" (#3), "RPM" (#4); allowed one of them. Say which: --column rpm="#3", or --column rpm="#4".',
		);
	});

	test('a speed without a unit', async () => {
		expect(await refusal(table('Time [s],Speed,RPM', 9, steady))).toBe(
			'run.csv: the column of speed, "Speed" (#2): found no unit, neither in the header, nor in a row under it, nor in the cells; allowed mph, km/h, m/s, ft/s, kn. Say which: --column speed="Speed [mph]", with the unit in the brackets.',
		);
	});

	test('a time whose steps of 1 may be seconds or thousandths of one', async () => {
		expect(await refusal(table('Time,Speed [m/s],RPM', 9, i => `${i},50,5000`))).toContain(
			'allowed s, ms, µs, min. Say which: --column time="Time [s]"',
		);
	});

	test('a unit row with a unit that no speed has', async () => {
		expect(await refusal('Time,Speed,RPM\ns,bar,rpm\n0,50,5000\n0.1,51,5000\n')).toBe(
			'run.csv: the column of speed, "Speed" (#2): found the unit "bar"; allowed mph, km/h, m/s, ft/s, kn. If the numbers are in another unit than the log says: --column speed="Speed [mph]", with the unit in the brackets.',
		);
	});

	test('columns asked for that are not there, are there twice, or are taken', async () => {
		expect(await refusal(plainLog, {columns: {speed: 'Spede [m/s]'}})).toContain('Did you mean "Speed [m/s]"?');
		expect(await refusal(plainLog, {columns: {speed: '#9'}})).toContain('found no header "#9";');
		expect(await refusal(plainLog, {columns: {speed: 'none'}})).toContain('the column of speed: found no such column;');
		expect(await refusal(table('Time [s],A,A,RPM', 9, plainRow), {columns: {speed: 'A [mph]'}})).toContain(
			'Say which: --column speed="#2", or --column speed="#3".',
		);
		expect(await refusal(plainLog, {columns: {speed: 'RPM [mph]'}})).toContain(
			'the column of rpm: found "RPM" (#3), which is speed already;',
		);
		expect(await refusal(plainLog, {columns: {speed: 'Speed [bar]'}})).toContain(
			'found the unit "bar"; allowed mph, km/h, m/s, ft/s, kn. If the numbers are in another unit than the log says: --column speed="Speed [mph]"',
		);
	});
});

describe('numbers that say two things are refused', () => {
	test('marks between thousands', async () => {
		expect(await refusal('Time [s];Speed [mph];RPM\n0.0;100;5,000\n0.1;100;5,010\n')).toBe(
			'run.csv: the numbers: found "0.0" and "5,000"; allowed one mark before decimals, a point or a comma, and none between thousands. Export it without marks between thousands.',
		);
		expect(await refusal('Time [s];Speed [mph];RPM\n0,1;100;5.000,5\n')).toContain('the numbers: found "5.000,5";');
		expect(await refusal('Time [s]\tSpeed [mph]\tRPM\n1\t100\t5,000\n2\t100\t6,000\n')).toContain('found "5,000";');
	});

	test('decimal commas between commas', async () => {
		expect(await refusal(table(headers, 20, i => `0,${i},50,5000`))).toBe(
			'run.csv: line 2 and 19 others: found another number of cells than the 3 headers, in 20 of 20 rows; allowed a cell for each header in every row. Export it again; numbers with decimal commas need semicolons or tabs between cells.',
		);
	});

	test('a column that holds no number', async () => {
		expect(await refusal(table(headers, 9, i => `${i / 10},fast,5000`))).toBe(
			'run.csv: the column of speed, "Speed [m/s]" (#2): found no number; on line 2: "fast"; allowed numbers. Take another column: --column speed=HEADER.',
		);
		expect(await refusal(table(headers, 9, i => `${i / 10},50,`))).toContain(
			'the column of rpm, "RPM" (#3): found only empty cells;',
		);
	});

	test('a time that runs backward', async () => {
		const message = (back: number) =>
			`run.csv: the column of time: found a time that goes back in ${back} of 20 rows; allowed rows in the order in which they were recorded; a few may be out of it. Sort the rows, or take another column: --column time=HEADER.`;
		expect(await refusal(table(headers, 20, i => `${20 - i},50,${5000 + i}`))).toBe(message(19));
		expect(await refusal(table(headers, 20, i => `${i === 0 ? 0 : 20 - i},50,${5000 + i}`))).toBe(message(18));
	});

	test('a sensor that hangs all the time', async () => {
		expect(await refusal(table(headers, 90, i => `${i / 10},${30 + i},5000`))).toContain(
			'the column of rpm, "RPM" (#3): found the same value throughout, while the other of speed and rpm moves;',
		);
	});
});

describe('what is sound of a damaged log is used, and the rest is said', () => {
	test('text in number cells', async () => {
		const log = await read(table(headers, 20, i => `${i / 10},${i === 7 ? 'ERR' : 50},${i === 3 ? '' : 5000}`));
		expect(texts(log)).toContain(
			'1 cell of speed is no number with a known unit and was left out, the first on line 9: "ERR".',
		);
		expect([log.run.speedMps[7], log.run.rpm[3], log.run.samples]).toEqual([Number.NaN, Number.NaN, 20]);
	});

	test('units that differ from cell to cell', async () => {
		const log = await read(
			table('Time [s],Speed,RPM', 20, i => `${i / 10},${i % 2 ? '100 mph' : '160.9344 km/h'},5000`),
		);
		expect(texts(log)).toContain('Cells of speed state their own units (km/h, mph); each was read in its own.');
		// 100 mph is 44.704 m/s by definition.
		expect(numbers(log.run.speedMps, 20)).toEqual(Array.from({length: 20}, () => Math.fround(44.704)));
	});

	test('cells without a unit in a column where others have one', async () => {
		const log = await read(table('Time [s],Speed,RPM', 20, i => `${i / 10},${i === 4 ? '100' : '100 mph'},5000`));
		expect(texts(log)).toContain(
			'1 cell of speed is no number with a known unit and was left out, the first on line 6: "100".',
		);
	});

	test('rows with too few and too many cells', async () => {
		const log = await read(`${table(headers, 20, i => `${steady(i)}${i === 5 ? ',7' : ''}`)}2.0,50\n2.1,50,5000\n`);
		expect(texts(log)).toContain('2 rows with more or fewer cells than headers were left out, the first on line 7.');
		expect(log.run.samples).toBe(20);
	});

	test('a file that ends in the middle of a row', async () => {
		const log = await read(`${table(headers, 20, steady)}2.0,5`);
		expect(texts(log)).toContain('The file ends in the middle of a row, on line 22; that row was left out.');
		expect(log.run.samples).toBe(20);
	});

	test('a file that ends in zeros, as after a loss of power', async () => {
		const log = await read(`${table(headers, 20, steady)}${'\0'.repeat(3000)}`);
		expect(texts(log)).toContain('The file ends in the middle of a row, on line 22; that row was left out.');
	});

	test('a line too long for a row', async () => {
		const log = await read(`${table(headers, 20, steady)}${'9'.repeat(1_000_000)}\n2.0,50,5000\n`);
		expect(texts(log)).toContain('1 line too long for a row was left out, the first is line 22.');
		expect(log.run.samples).toBe(21);
	});

	test('rows without a time', async () => {
		const log = await read(table(headers, 20, i => (i === 4 ? ',50,5000' : steady(i))));
		expect(texts(log)).toContain('1 row without time or distance was left out.');
		expect(log.run.samples).toBe(19);
	});

	test('a gap', async () => {
		const log = await read(table(headers, 40, i => `${i / 10 + (i > 20 ? 7 : 0)},50,5000`));
		expect(texts(log)).toContain(
			'1 gap in the samples, the longest 7.10 s from 2.00 s on; nothing is known of what happened in it.',
		);
	});

	test('a stuck speed, which makes no distance either', async () => {
		const speed = (i: number) => (i > 20 && i < 60 ? 95 : 30 + i);
		const log = await read(table(headers, 80, i => `${i / 10},${speed(i)},${3000 + 100 * i}`));
		expect(texts(log)).toContain(
			'The speed stands still while the other of speed and rpm moves, 1 time, 3.80 s in all, first at 2.10 s: a stuck sensor; left out there.',
		);
		expect([log.run.speedMps[20], log.run.speedMps[21], log.run.speedMps[59], log.run.speedMps[60]]).toEqual([
			50,
			Number.NaN,
			Number.NaN,
			90,
		]);
		// Straight from 30 to 109 m/s: 69.5 m/s on the mean, over 7.9 s.
		expect(log.run.distanceM[79]).toBeCloseTo(69.5 * 7.9, 3);
	});

	test('a car that stands while its engine revs is no stuck sensor', async () => {
		const log = await read(table(headers, 80, i => `${i / 10},${i < 60 ? 0 : i},${3000 + 100 * i}`));
		expect(log.remarks.map(({kind}) => kind)).toEqual(['workedOut']);
	});

	test('a car that holds a speed in one gear is no stuck sensor', async () => {
		const log = await read(table(headers, 80, i => `${i / 10},50,${5000 + 5 * i}`));
		expect(log.remarks.map(({kind}) => kind)).toEqual(['workedOut']);
	});

	test('one sample a second', async () => {
		const log = await read(table(headers, 40, i => `${i},${30 + i},${3000 + 100 * i}`));
		expect(texts(log)).toContain(
			'About 1.0 samples a second: exits, lift points and shifts fall between samples, and so may the highest RPM and speed.',
		);
	});

	test('a clock too coarse for its samples', async () => {
		const log = await read(table(headers, 40, i => `${Math.floor(i / 10)},${30 + i},${3000 + 100 * i}`));
		expect(texts(log)).toContain(
			'92 % of the samples have the same time as the one before: the clock is too coarse for exits and shifts.',
		);
	});

	test('numbers that no car has', async () => {
		const log = await read(table(headers, 40, i => `${i / 10},${300 + i},${90 + i}`));
		expect(texts(log)).toContain(
			'The highest speed would be 758 mph, 1,220 km/h: its unit may be wrong. If so: --column speed="HEADER [unit]".',
		);
		expect(texts(log)).toContain('The highest rpm would be 129: the column or its unit may be wrong.');
	});

	test('a distance and a speed that disagree', async () => {
		const log = await read(table('Time [s],Distance [m],Speed [mph],RPM', 40, i => `${i / 10},${5 * i},50,5000`));
		// 39 × 5 m against 3.9 s at 50 mph, which is 22.352 m/s.
		expect(texts(log)).toContain(
			'The distance of the log (640 ft, 195 m) is 2.24 × what its speed and time make: the unit of one of them may be wrong.',
		);
	});
});

describe('nothing in a file reaches the terminal as it is', () => {
	test('control characters in headers and cells', async () => {
		const message = await refusal(table('Time [s],\x1B[31mSpeed,\x07', 9, steady));
		expect(message).toContain('"␛[31mSpeed", "␇"');
		expect(message).toContain('If it is "␛[31mSpeed": --column speed="#2".');
		const log = await read(table(headers, 20, i => `${i / 10},${i === 7 ? '\x1B[2J' : 50},5000`));
		expect(texts(log).join()).toContain('"␛[2J"');
		expect(JSON.stringify(log.columns) + texts(log).join()).not.toMatch(/\p{Cc}/u);
	});

	test('headers that are names of an object', async () => {
		const log = await read(table('Time [s],__proto__,Speed [m/s],constructor,RPM', 20, i => `${i / 10},1,50,2,5000`));
		expect(numbers(log.run.rpm, 2)).toEqual([5000, 5000]);
		expect(Object.keys(log.columns)).toEqual(['time', 'speed', 'rpm']);
	});
});
