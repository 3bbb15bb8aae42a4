import {mkdtempSync, rmSync, writeFileSync} from 'node:fs';
import {tmpdir} from 'node:os';
import {join} from 'node:path';
import {Readable} from 'node:stream';
import {afterAll, expect, test} from 'vitest';
import {readLogFile, tryLogFile} from '../../source/commands/read-log-file.ts';
import {processSurroundings, type Surroundings} from '../../source/commands/surroundings.ts';
import {plainLog, table} from '../logs/log.ts';

const directory = mkdtempSync(join(tmpdir(), 'droprack-logs-'));
afterAll(() => rmSync(directory, {recursive: true}));
const file = (name: string, content: string | Uint8Array): string => {
	const path = join(directory, name);
	writeFileSync(path, content);
	return path;
};
const around = (changes: Partial<Surroundings> = {}): Surroundings => ({
	...processSurroundings(new URL('file:///nonexistent/')),
	progress: () => undefined,
	...changes,
});
const input = (...pieces: (string | Uint8Array)[]) =>
	around({standardInput: () => Readable.from(pieces.map(piece => Buffer.from(piece)))});

test('a file and standard input give the same run', async () => {
	const ofFile = await readLogFile(file('run.csv', plainLog), around(), {});
	const ofInput = await readLogFile('-', input(plainLog.slice(0, 100), plainLog.slice(100)), {});
	expect(ofFile).toMatchObject({ok: true, value: {reading: {run: {samples: 50}}}});
	expect(ofInput).toEqual({ok: true, value: {label: 'standard input', reading: ofFile.ok && ofFile.value.reading}});
});

test('a log that cannot be used is bad input, with what to type', async () => {
	const log = table('Time [s],Speed,RPM', 9, i => `${i / 10},50,5000`);
	expect(await readLogFile('-', input(log), {})).toEqual({
		ok: false,
		status: 2,
		message:
			'standard input: the column of speed, "Speed" (#2): found no unit, neither in the header, nor in a row under it, nor in the cells; allowed mph, km/h, m/s, ft/s, kn. Say which: --column speed="Speed [mph]", with the unit in the brackets.',
	});
	expect(await readLogFile('-', input(log), {columns: {speed: 'Speed [mph]'}})).toMatchObject({ok: true});
	expect(await tryLogFile('-', input(log), {})).toMatchObject({
		ok: true,
		value: {reading: {ok: false, problems: [{kind: 'unit', choice: {channel: 'speed'}}]}},
	});
});

test('what is no file is told from what cannot be read', async () => {
	const missing = join(directory, 'none.csv');
	expect(await readLogFile(missing, around(), {})).toEqual({
		ok: false,
		status: 2,
		message: `${missing}: there is no such file.`,
	});
	expect(await readLogFile(directory, around(), {})).toEqual({
		ok: false,
		status: 2,
		message: `${directory}: is a directory; a log is one file.`,
	});
	const broken = new Readable({
		read() {
			this.destroy(Object.assign(new Error('io'), {code: 'EIO'}));
		},
	});
	expect(await readLogFile('-', around({standardInput: () => broken}), {})).toEqual({
		ok: false,
		status: 3,
		message: 'standard input: cannot be read (EIO).',
	});
});

test('a device without end is refused after its beginning', async () => {
	expect(await readLogFile('/dev/zero', around(), {})).toMatchObject({
		ok: false,
		status: 2,
		message: expect.stringContaining('found binary zeros'),
	});
});

test('a fault of ours is not told as one of the file', async () => {
	const standardInput = () => {
		throw new TypeError('ours');
	};
	await expect(readLogFile('-', around({standardInput}), {})).rejects.toThrow('ours');
});

test('a line of progress is drawn where a terminal looks on, unless someone else shows it', async () => {
	const path = file('long.csv', plainLog + '5.0,80,9000,100\n'.repeat(50_000));
	const asked: number[] = [];
	const progress = () => {
		asked.push(1);
		return {write: () => {}, columns: 80};
	};
	const seen: [number, number | undefined][] = [];
	await readLogFile(path, around({progress}), {onProgress: (...told) => seen.push(told)});
	expect(asked).toEqual([]);
	expect(seen.at(-1)).toEqual([seen.at(-1)![1], seen.at(-1)![1]]);
	expect(seen.length).toBeGreaterThan(2);
	await readLogFile(path, around({progress}), {});
	expect(asked).toEqual([1]);
});
