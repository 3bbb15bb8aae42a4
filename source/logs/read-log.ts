/** A log, as bytes in pieces of any size, to one table in SI. */
import type {AskedColumns, RememberedColumns} from './channels.ts';
import {tooLarge} from './file-problems.ts';
import {headBytes, headOf} from './head.ts';
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
};

/** Days of running; what is kept of it still fits a small computer. */
const mostBytes = 2_000_000_000;

/**
 * Reads a logged run. Memory is that of the columns that are used, however long the file. Whatever the bytes are, the answer is a value;
 * only what the source of the bytes throws goes through. A refusal ends the reading early.
 */
export async function readLog(
	chunks: AsyncIterable<Uint8Array>,
	{columns = {}, remembered, sizeBytes, onProgress}: ReadLogOptions = {},
): Promise<LogReading> {
	const decoder = new Utf8Decoder();
	const head = new Uint8Array(headBytes);
	let headLength = 0;
	let bytesRead = 0;
	let log: {open: OpenLog; reader: RowReader} | undefined;
	const begin = (isWhole: boolean): LogRefused | undefined => {
		const bytes = head.subarray(0, headLength);
		const open = openLog(headOf(bytes, isWhole), {bytes, columns, remembered, sizeBytes, encoding: decoder.encoding});
		if (!open.ok) return open;
		log = {open, reader: new RowReader(open.plan)};
		log.reader.push(bytes.subarray(open.start));
		return undefined;
	};
	for await (const chunk of chunks) {
		bytesRead += chunk.length;
		if (bytesRead > mostBytes) return {ok: false, problems: [tooLarge(mostBytes)]};
		let bytes = decoder.decode(chunk);
		if (log === undefined) {
			const taken = Math.min(bytes.length, headBytes - headLength);
			head.set(bytes.subarray(0, taken), headLength);
			headLength += taken;
			bytes = bytes.subarray(taken);
			const refused = headLength === headBytes ? begin(false) : undefined;
			if (refused) return refused;
		}
		log?.reader.push(bytes);
		onProgress?.(bytesRead);
	}
	if (log === undefined) {
		const last = decoder.end();
		head.set(last, headLength);
		headLength += last.length;
	}
	const refused = log === undefined ? begin(true) : undefined;
	if (refused) return refused;
	return log!.open.finish(log!.reader.end());
}
