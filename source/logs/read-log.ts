/** A log, as bytes in pieces of any size, to one table in SI. */
import type {AskedColumns, RememberedColumns} from './channels.ts';
import type {LogReading} from './reading.ts';

export type {AskedColumns, ChannelName, RememberedColumn, RememberedColumns} from './channels.ts';
export {channelNames} from './channels.ts';
export type {LoggedRun} from './logged-run.ts';
export type {ColumnUse, LogProblem, LogRead, LogReading, LogRefused, LogRemark} from './reading.ts';

export type ReadLogOptions = {
	/** Asked for: before what is remembered, and before what the names say. */
	readonly columns?: AskedColumns;
	readonly remembered?: RememberedColumns | undefined;
	/** Called with the bytes read so far, once for each piece. */
	readonly onProgress?: (bytes: number) => void;
};

/**
 * Reads a logged run. Memory is that of the columns that are used. Whatever the bytes are, the answer is a value; only what
 * the source of the bytes throws goes through.
 */
export async function readLog(
	chunks: AsyncIterable<Uint8Array>,
	{columns = {}, remembered, onProgress}: ReadLogOptions = {},
): Promise<LogReading> {
	throw new Error(`not read yet: ${chunks}, ${columns}, ${remembered}, ${onProgress}`);
}
