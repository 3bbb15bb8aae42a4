/** A log from a file or from standard input, with a line of progress where a terminal looks on. */
import {createReadStream} from 'node:fs';
import {stat} from 'node:fs/promises';
import {describeProblems} from '../documents/problem.ts';
import {visible} from '../documents/visible.ts';
import {type LogRead, type LogReading, type LogRefused, type ReadLogOptions, readLog} from '../logs/read-log.ts';
import {progressLine} from './progress-line.ts';
import {refusalOf} from './read-input.ts';
import {badInput, type Found, found, type Refusal} from './reply.ts';
import type {Surroundings} from './surroundings.ts';

export type LogFile<Reading = LogRead> = {
	/** What messages call it. */
	readonly label: string;
	readonly reading: Reading;
};

type Asked = Pick<ReadLogOptions, 'columns' | 'remembered' | 'rest'> & {
	/** Ends the reading of a file. */
	readonly signal?: AbortSignal;
	/** Shows the progress in place of the line on the terminal: bytes read, and of how many where that is known. */
	readonly onProgress?: (bytes: number, totalBytes: number | undefined) => void;
};

/** Where standard input and the terminal come from. */
type Source = Pick<Surroundings, 'standardInput' | 'progress'>;

/** Larger pieces than a stream takes of itself: half of the time for a long file. */
const pieceBytes = 1 << 18;

/** The log of that name, or of standard input for `-`; a log that cannot be used is a refusal with what to do about it. */
export const readLogFile = async (asked: string, around: Source, options: Asked): Promise<Found<LogFile>> => {
	const file = await tryLogFile(asked, around, options);
	if (!file.ok) return file;
	const {label, reading} = file.value;
	return reading.ok ? found({label, reading}) : refuseLog(label, reading.problems);
};

/** As `readLogFile`; what is wrong with the log itself is left as it is, for whoever can ask about it. */
export const tryLogFile = async (
	asked: string,
	around: Source,
	options: Asked,
): Promise<Found<LogFile<LogReading>>> => {
	const label = asked === '-' ? 'standard input' : visible(asked);
	try {
		const sizeBytes = asked === '-' ? undefined : await sizeOf(asked);
		const {signal} = options;
		const chunks =
			asked === '-' ? around.standardInput() : createReadStream(asked, {highWaterMark: pieceBytes, signal});
		const line = progressLine(options.onProgress ? undefined : around.progress?.(), label, sizeBytes);
		const onProgress = (bytes: number) => {
			line.update(bytes);
			options.onProgress?.(bytes, sizeBytes);
		};
		try {
			return found({label, reading: await readLog(chunks, {...options, sizeBytes, onProgress})});
		} finally {
			line.clear();
		}
	} catch (error) {
		if (typeof (error as NodeJS.ErrnoException).code !== 'string') throw error;
		return refusalOf(label, error, 'a log');
	}
};

/** Undefined for a pipe and the like. */
const sizeOf = async (file: string): Promise<number | undefined> => {
	const about = await stat(file);
	return about.isFile() && about.size > 0 ? about.size : undefined;
};

/** One line a problem. */
export const refuseLog = (label: string, problems: LogRefused['problems']): Refusal =>
	badInput(
		describeProblems(
			label,
			problems.map(({where, found, allowed, do: hint}) => ({path: where, found, allowed, hint})),
		),
	);
