/** Logs for the tests: as text, in pieces of any size. */
import {
	type LogRead,
	type LogReading,
	type LogRefused,
	type ReadLogOptions,
	readLog,
} from '../../source/logs/read-log.ts';

/** Bytes in pieces of so many. */
export async function* inPieces(bytes: Uint8Array, size = bytes.length): AsyncGenerator<Uint8Array> {
	for (let at = 0; at < bytes.length; at += Math.max(1, size)) yield bytes.subarray(at, at + Math.max(1, size));
}

export function reading(log: string | Uint8Array, options: ReadLogOptions = {}, size?: number): Promise<LogReading> {
	return readLog(inPieces(typeof log === 'string' ? new TextEncoder().encode(log) : log, size), options);
}

export async function read(log: string | Uint8Array, options: ReadLogOptions = {}): Promise<LogRead> {
	const result = await reading(log, options);
	if (!result.ok) throw new Error(JSON.stringify(result.problems));
	return result;
}

export async function problemsOf(
	log: string | Uint8Array,
	options: ReadLogOptions = {},
): Promise<LogRefused['problems']> {
	const result = await reading(log, options);
	if (result.ok) throw new Error(`it was read: ${result.run.samples} samples`);
	return result.problems;
}

export const texts = ({remarks}: LogRead): string[] => remarks.map(({text}) => text);

/** So many rows under a line of headers. */
export const table = (headers: string, count: number, row: (i: number) => string): string =>
	`${[headers, ...Array.from({length: count}, (_, i) => row(i))].join('\n')}\n`;

/** Ten samples a second of a car that gains 0.5 m/s in each: time in s, speed in m/s, engine speed, throttle in %. */
export const plainRow = (i: number): string =>
	`${(i / 10).toFixed(1)},${(50 + i / 2).toFixed(1)},${5000 + 50 * i},${2 * i}`;
export const plainLog = table('Time [s],Speed [m/s],RPM,Throttle [%]', 50, plainRow);

export const numbers = (values: ArrayLike<number> | null, count = 4): number[] =>
	Array.from(values ?? []).slice(0, count);
