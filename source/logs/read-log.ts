/** A log, as bytes in pieces of any size, to one table in SI. */
import type {AskedColumns, RememberedColumns} from './channels.ts';
import {tooLarge} from './file-problems.ts';
import {HeadBytes, headOf} from './head.ts';
import {type OpenLog, openLog} from './open-log.ts';
import type {LogReading, LogRefused} from './reading.ts';
import {RowReader} from './row-reader.ts';
import {Utf8Decoder} from './to-utf8.ts';

export type {AskedColumns, ChannelName, RememberedColumn, RememberedColumns} from './channels.ts';
export {channelNames} from './channels.ts';
export {askedColumns, columnOption} from './column-option.ts';
export type {LoggedRun} from './logged-run.ts';
export type {ColumnUse, LogProblem, LogRead, LogReading, LogRefused, LogRemark} from './reading.ts';

export type ReadLogOptions = {
	/** Asked for: before what is remembered, and before what the names say. */
	readonly columns?: AskedColumns;
	readonly remembered?: RememberedColumns | undefined;
	/** Of all bytes, where that is known: so much room is made at once. */
	readonly sizeBytes?: number | undefined;
	/** Called with the bytes read so far, once for each piece. */
	readonly onProgress?: (bytes: number) => void;
	/** Lets other things have their turn: called between the passes over all rows that come after the last piece. */
	readonly rest?: (() => Promise<void>) | undefined;
};

/** Hours of running at hundreds of samples a second; what is kept of it still fits a small computer. */
const mostBytes = 2_000_000_000;
const mostSamples = 20_000_000;

/**
 * Reads a logged run. Memory is that of the columns that are used, however long the file. Whatever the bytes are, the answer is
 * a value; only what the source of the bytes throws goes through. A refusal ends the reading early.
 */
export async function readLog(chunks: AsyncIterable<Uint8Array>, options: ReadLogOptions = {}): Promise<LogReading> {
	const decoder = new Utf8Decoder();
	const head = new HeadBytes();
	let log: Opened | LogRefused | undefined;
	let bytesRead = 0;
	for await (const chunk of chunks) {
		bytesRead += chunk.length;
		if (bytesRead > mostBytes) return refusedAsTooLarge(`${mostBytes / 1e9} GB`);
		const decoded = decoder.decode(chunk);
		const rest = log === undefined ? head.take(decoded) : decoded;
		if (log === undefined && head.isFull) log = opened(head.bytes, false, options, decoder.encoding);
		if (log?.ok === false) return log;
		log?.reader.push(rest);
		if (log !== undefined && log.reader.samples > mostSamples)
			return refusedAsTooLarge(`${mostSamples / 1e6} million rows`);
		options.onProgress?.(bytesRead);
	}
	if (log === undefined) head.take(decoder.end());
	log ??= opened(head.bytes, true, options, decoder.encoding);
	if (!log.ok) return log;
	const steps = log.finish(log.reader.end());
	for (;;) {
		const step = steps.next();
		if (step.done) return step.value;
		await options.rest?.();
	}
}

type Opened = Pick<OpenLog, 'ok' | 'finish'> & {readonly reader: RowReader};

/** What is known from the head, which has its rows read already. */
function opened(
	bytes: Uint8Array,
	isWhole: boolean,
	{columns = {}, remembered, sizeBytes}: ReadLogOptions,
	encoding: string | undefined,
): Opened | LogRefused {
	const open = openLog(headOf(bytes, isWhole), {bytes, columns, remembered, sizeBytes, encoding});
	if (!open.ok) return open;
	const reader = new RowReader(open.plan);
	reader.push(bytes.subarray(open.start));
	return {ok: true, finish: open.finish, reader};
}

const refusedAsTooLarge = (most: string): LogRefused => ({ok: false, problems: [tooLarge(most)]});
