/** What the screen asks of whoever started it beside saving: the clipboard, files, the history and all that is kept. */
import type {AskedColumns, LogRead} from '../logs/read-log.ts';
import type {HistoryEntry} from '../store/kept-documents.ts';

/** `words` are for the person. */
export type Saving = {readonly ok: boolean; readonly words: string};

export type FileText =
	| {readonly ok: true; readonly label: string; readonly text: string}
	| {readonly ok: false; readonly words: string};

export type LogAnswer =
	| {readonly ok: true; readonly label: string; readonly reading: LogRead}
	/** `channel`: whose column is asked for. */
	| {readonly ok: false; readonly words: string; readonly channel?: string};

/** `exists`: there is such a file, and nothing was written. */
export type Writing = Saving | 'exists';

export type Errands = {
	/** ISO 8601. */
	now(): string;
	/** YYYY-MM-DD, where the person is. */
	today(): string;
	/** The words say how far it is sure to have come. */
	copy(text: string): string;
	/** An existing file gives way only where `replace` is set. */
	write(file: string, text: string, replace: boolean): Writing;
	read(file: string): Promise<FileText>;
	/**
	 * A logged run; how its columns are read is remembered by the car. `onProgress` gets the share that was read, where that is
	 * known; `signal` ends it, and what comes then is not looked at.
	 */
	readLog(
		file: string,
		columns: AskedColumns,
		car: string,
		onProgress: (share: number | undefined) => void,
		signal: AbortSignal,
	): Promise<LogAnswer>;
	/** What is kept of the track of that name, in the order in which it was added. */
	history(track: string): readonly HistoryEntry[];
	addToHistory(track: string, entry: HistoryEntry): Saving;
	/** Takes the saved document of that name away; it stays beside its place as `.bak`. */
	forget(kind: 'track' | 'car', name: string): Saving;
	/** Writes all that is kept to a directory. */
	exportTo(directory: string): Saving;
};
