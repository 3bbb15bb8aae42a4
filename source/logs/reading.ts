/** What reading a log gives: a run, with how it was understood, or what stands in the way. All text is safe to show. */
import type {ChannelName, RememberedColumns} from './channels.ts';
import type {LoggedRun} from './logged-run.ts';

export type LogReading = LogRead | LogRefused;

export type LogRead = {
	readonly ok: true;
	readonly run: LoggedRun;
	/** Of each channel that is used. */
	readonly columns: Partial<Record<ChannelName, ColumnUse>>;
	/** What the names of the columns alone did not tell: to be handed in as `remembered` with the next log of the same car. */
	readonly remember: RememberedColumns;
	readonly remarks: readonly LogRemark[];
};

export type LogRefused = {readonly ok: false; readonly problems: readonly LogProblem[]};

export type ColumnUse = {
	/** Of the column, from 1. */
	readonly column: number;
	/** As it stands in the log. */
	readonly header: string;
	/** Short name of the unit; null for a plain number. */
	readonly unit: string | null;
	/** By its name, by what was remembered, or because it was asked for. */
	readonly by: 'name' | 'remembered' | 'asked';
	/** Whether the unit stood in the log, was given, was remembered, or was told from the numbers. */
	readonly unitBy: 'log' | 'asked' | 'remembered' | 'numbers' | null;
};

export type LogProblem = {
	readonly kind:
		| 'empty'
		| 'binary'
		| 'noHeader'
		| 'noRows'
		| 'longLine'
		| 'tooLarge'
		| 'missing'
		| 'ambiguous'
		| 'unit'
		| 'decimals'
		| 'asked'
		| 'noNumbers'
		| 'misshapen'
		| 'backward';
	/** Like `line 3` or `the column of speed`. */
	readonly where: string;
	readonly found: string;
	readonly allowed: string;
	readonly do: string;
	/** Where a choice answers it: the values of `columns`, any one of which is taken. */
	readonly choice?: {readonly channel: ChannelName; readonly values: readonly string[]};
};

/** What one should know besides, each with its sentence. */
export type LogRemark = RemarkData & {readonly text: string};

export type RemarkData =
	/** Lines before the header, and under it, that are no part of the table. */
	| {readonly kind: 'preamble'; readonly lines: number}
	/** The text is not UTF-8. */
	| {readonly kind: 'encoding'; readonly encoding: string}
	/** The remembered columns are not those of this log. */
	| {readonly kind: 'notRemembered'; readonly headers: readonly string[]}
	/** The unit was told from the numbers. */
	| {
			readonly kind: 'unitFromNumbers';
			readonly channel: ChannelName;
			readonly header: string;
			readonly unit: string;
	  }
	/** A column that is there is not used. */
	| {
			readonly kind: 'leftOut';
			readonly channel: ChannelName;
			readonly headers: readonly string[];
			/** Several that it may be, a unit that is not known, or numbers that are no share. */
			readonly why: 'several' | 'unit' | 'numbers';
	  }
	/** The log lacks it; it was worked out from the speed. */
	| {readonly kind: 'workedOut'; readonly channel: 'time' | 'distance'}
	/** Cells that are no numbers, or have no unit where they need one: read as not known. */
	| {
			readonly kind: 'textCells';
			readonly channel: ChannelName;
			readonly cells: number;
			readonly firstLine: number;
			readonly first: string;
	  }
	/** Cells with units of their own, which differ from one another or from the column's. */
	| {readonly kind: 'cellUnits'; readonly channel: ChannelName; readonly units: readonly string[]}
	/** A column that is empty in more than half of the rows. */
	| {readonly kind: 'sparse'; readonly channel: ChannelName; readonly share: number}
	/** Rows with more or fewer cells than there are headers: not used. */
	| {readonly kind: 'wrongCells'; readonly rows: number; readonly firstLine: number}
	/** Lines too long to be a row: not used. */
	| {readonly kind: 'longLines'; readonly lines: number; readonly firstLine: number}
	/** The file ends in the middle of a row, which is not used. */
	| {readonly kind: 'cutRow'; readonly line: number}
	/** Rows without the time (or distance) that says where they belong: not used. */
	| {readonly kind: 'unplaced'; readonly rows: number}
	/** Single rows out of order: not used. */
	| {readonly kind: 'outOfOrder'; readonly channel: 'time' | 'distance'; readonly rows: number}
	/** The clock or the distance begins anew; what follows is joined to what was before. Times as in the run. */
	| {readonly kind: 'restart'; readonly channel: 'time' | 'distance'; readonly atS: readonly number[]}
	| {readonly kind: 'gap'; readonly gaps: number; readonly longestS: number; readonly atS: number}
	/** A value that stands still while the other one of speed and rpm moves: read as not known. */
	| {
			readonly kind: 'stuck';
			readonly channel: 'speed' | 'rpm';
			readonly times: number;
			readonly totalS: number;
			readonly atS: number;
	  }
	| {readonly kind: 'slowSampling'; readonly samplesPerS: number}
	/** Neighboring samples with the same time, more often than not. */
	| {readonly kind: 'coarseClock'; readonly share: number}
	/** Distance as logged, and as time and speed make it. */
	| {readonly kind: 'disagree'; readonly loggedM: number; readonly bySpeedM: number}
	/** A highest value that no car has: the unit may be wrong. */
	| {readonly kind: 'implausible'; readonly channel: 'speed' | 'rpm'; readonly highest: number};
