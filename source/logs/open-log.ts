/** What the first part of a log says about the rest of it: how to read its rows, and what to make of them. */
import {shortened} from '../documents/problem.ts';
import type {AskedColumns, RememberedColumns} from './channels.ts';
import {type Choice, chooseColumns} from './choose-columns.ts';
import {decideUnits, type UsedColumn} from './decide-units.ts';
import {decimalsIn} from './decimals.ts';
import {
	deadSensor,
	mixedDecimals,
	noHeader,
	noNumbers,
	noRows,
	notText,
	runsBackward,
	tooLongLine,
} from './file-problems.ts';
import {findTable, type Table, wantedHeaders} from './find-table.ts';
import type {Head} from './head.ts';
import {lastingName} from './header-values.ts';
import type {Header} from './headers.ts';
import type {ColumnUse, LogReading, LogRefused, RemarkData} from './reading.ts';
import {sentenceOf} from './remark-text.ts';
import type {Rows} from './row-reader.ts';
import {rowRemarks} from './row-remarks.ts';
import type {RowPlan} from './row-table.ts';
import {runFromRows, type Steps} from './run-from-rows.ts';

export type OpenLog = {
	readonly ok: true;
	readonly plan: RowPlan;
	/** Where in the head the rows begin. */
	readonly start: number;
	/** Rests after each pass over the rows. */
	readonly finish: (rows: Rows) => Steps<LogReading>;
};

type Given = {
	readonly bytes: Uint8Array;
	readonly columns: AskedColumns;
	readonly remembered: RememberedColumns | undefined;
	readonly encoding: string | undefined;
	/** Of the whole file, where that is known. */
	readonly sizeBytes: number | undefined;
};

const refused = (...problems: LogRefused['problems']): LogRefused => ({ok: false, problems});

export function openLog(head: Head, given: Given): OpenLog | LogRefused {
	const unreadable = notText(given.bytes);
	if (unreadable) return refused(unreadable);
	if (head.lines.length === 0) return refused(tooLongLine());
	const kept = Object.values(given.remembered ?? {}).map(({header}) => header);
	const table = findTable(head, wantedHeaders(given.columns, kept));
	if (table === undefined) return refused(noHeader(head.lines[0]!.text));
	const choice = chooseColumns(table.headers, given.columns, given.remembered);
	if (choice.problems.length > 0) return refused(...choice.problems);
	const seen = decimalsIn(
		table,
		choice.columns.map(({header}) => header.column),
	);
	if (!seen.ok) return refused(mixedDecimals(seen.examples));
	const units = decideUnits(choice.columns, table, seen);
	if (units.problems.length > 0) return refused(...units.problems);
	const leftOut = units.leftOut.map(
		({channel, header}): RemarkData => ({kind: 'leftOut', channel, headers: [header.written], why: 'unit'}),
	);
	const remarks = [...fileRemarks(head, table, given), ...choiceRemarks(choice), ...leftOut];
	return {
		ok: true,
		plan: planOf(head, table, units.columns, seen, given),
		start: table.start,
		finish: rows => finished(rows, table, units.columns, choice, remarks, given),
	};
}

function planOf(
	head: Head,
	table: Table,
	columns: readonly UsedColumn[],
	{mark}: RowPlan['decimals'],
	{sizeBytes}: Given,
): RowPlan {
	return {
		dialect: {separator: table.separator, lineEnd: head.lineEnd},
		width: table.headers.length,
		columns: columns.map(({channel, factor, header}) => ({index: header.column - 1, channel, factor})),
		decimals: {mark},
		decode: head.decode,
		firstLine: table.linesBefore + 1,
		expectedRows: expectedRows(head, table, sizeBytes),
	};
}

/** More than the rows are likely to be: rows of the head may be longer than later ones. */
const spare = 1.3;
/** Half a day at a hundred samples a second. Columns of more rows grow as they are read. */
const mostExpected = 4_000_000;

function expectedRows({lines}: Head, {linesBefore, start}: Table, sizeBytes: number | undefined): number {
	const rows = lines.length - linesBefore;
	const bytes = (lines.at(-1)?.end ?? 0) - start;
	const inAll = sizeBytes === undefined || bytes <= 0 ? rows : (rows * sizeBytes) / bytes;
	return Math.min(mostExpected, Math.ceil(spare * inAll));
}

function fileRemarks(head: Head, {linesBefore, units}: Table, {encoding}: Given): RemarkData[] {
	const other = encoding ?? head.encoding;
	const lines = linesBefore - (units ? 2 : 1);
	return [
		...(other === undefined ? [] : [{kind: 'encoding' as const, encoding: other}]),
		...(lines > 0 ? [{kind: 'preamble' as const, lines}] : []),
	];
}

function choiceRemarks({notThere, leftOut}: Choice): RemarkData[] {
	const several = leftOut.map(
		({channel, headers}): RemarkData => ({
			kind: 'leftOut',
			channel,
			headers: headers.map(({written}) => written),
			why: 'several',
		}),
	);
	return [...(notThere.length > 0 ? [{kind: 'notRemembered' as const, headers: notThere}] : []), ...several];
}

function* finished(
	rows: Rows,
	table: Table,
	columns: readonly UsedColumn[],
	choice: Choice,
	before: readonly RemarkData[],
	given: Given,
): Steps<LogReading> {
	if (rows.samples <= rows.wrongCells.count) return refused(noRows(rows, table));
	const empty = noNumbers(rows, columns);
	if (empty) return refused(empty);
	const made = yield* runFromRows(rows, columns);
	if ('backward' in made) return refused(runsBackward(made.backward, made.rows, rows.samples));
	if ('dead' in made) return refused(deadSensor(made.dead, columns));
	const {run, remarks} = made;
	const used = columns.filter(({channel}) => channel !== 'throttle' || run.throttle);
	const all = [...before, ...used.flatMap(fromNumbers), ...rowRemarks(rows, columns), ...remarks];
	return {
		ok: true,
		run,
		columns: Object.fromEntries(used.map(column => [column.channel, useOf(column)])),
		remember: remember(columns, table.headers, choice, given),
		remarks: all.map(data => ({...data, text: sentenceOf(data)})),
	};
}

const fromNumbers = ({channel, header, unit, unitBy}: UsedColumn): RemarkData[] =>
	unitBy === 'numbers' && unit ? [{kind: 'unitFromNumbers', channel, header: header.written, unit: unit.name}] : [];

const useOf = ({header, unit, by, unitBy}: UsedColumn): ColumnUse => ({
	column: header.column,
	header: shortened(header.written),
	unit: unit?.name ?? null,
	by,
	unitBy,
});

/**
 * What the names alone do not tell: what was asked for, and what was remembered before. A log of other columns, read without a
 * question, leaves the memory as it is.
 */
function remember(
	columns: readonly UsedColumn[],
	headers: readonly Header[],
	{none, notThere}: Choice,
	given: Given,
): RememberedColumns {
	const isAsked = Object.keys(given.columns).length > 0;
	if (notThere.length > 0 && !isAsked) return given.remembered ?? {};
	const told = columns.flatMap(({channel, header, by, unit, unitBy}) => {
		const name = lastingName(header, headers);
		if (by === 'name' || name === undefined) return [];
		// A unit that the log states is read again from the next one.
		const isOurs = unitBy === 'asked' || unitBy === 'remembered';
		return [[channel, {header: name, ...(unit && isOurs && {unit: unit.name})}] as const];
	});
	return Object.fromEntries([...told, ...none.map(channel => [channel, {header: null}] as const)]);
}
