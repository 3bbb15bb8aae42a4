/** In which units the numbers of the chosen columns are: asked for, stated in the log, remembered, or seen in the first rows. */
import type {ChannelName} from './channels.ts';
import type {ChosenColumn} from './choose-columns.ts';
import {clockS} from './clock.ts';
import {type ColumnProblem, unknownUnit, withoutUnit} from './column-problems.ts';
import type {Table} from './find-table.ts';
import {unitOf} from './headers.ts';
import {isNoUnit, type LogUnit, logUnit, needsUnit} from './log-units.ts';
import {type Decimals, readCell} from './read-cell.ts';
import type {ColumnUse} from './reading.ts';
import {timeUnitFromSteps} from './time-unit.ts';

export type UsedColumn = ChosenColumn & {
	readonly unit: LogUnit | undefined;
	readonly unitBy: ColumnUse['unitBy'];
	/** To SI, for a number without a unit of its own; undefined where each cell has its own. */
	readonly factor: number | undefined;
};

export type Units = {
	readonly columns: readonly UsedColumn[];
	/** Columns whose numbers say nothing, where the run can be read without them. */
	readonly leftOut: readonly ChosenColumn[];
	readonly problems: readonly ColumnProblem[];
};

export function decideUnits(chosen: readonly ChosenColumn[], table: Table, decimals: Decimals): Units {
	const [columns, leftOut, problems]: [UsedColumn[], ChosenColumn[], ColumnProblem[]] = [[], [], []];
	const hasTime = chosen.some(({channel}) => channel === 'time');
	for (const column of chosen) {
		const {channel, header} = column;
		const decided = decide(column, table, decimals);
		if (decided === 'unknown' || decided === 'none') {
			const canDoWithout = channel === 'throttle' || (channel === 'distance' && hasTime && column.by !== 'asked');
			if (canDoWithout) leftOut.push(column);
			else if (decided === 'none') problems.push(withoutUnit(channel, header, table.headers));
			else problems.push(unknownUnit(channel, header, saidUnit(column, table), table.headers));
		} else {
			columns.push({...column, ...decided});
		}
	}
	return {columns, leftOut, problems};
}

/** The unit that `decide` did not know. */
const saidUnit = (column: ChosenColumn, table: Table): string =>
	(column.by === 'asked' ? column.unitText : undefined) ?? statedUnit(column, table) ?? column.unitText ?? '';

type Decided = Pick<UsedColumn, 'unit' | 'unitBy' | 'factor'>;

/** Channels of which only the changes or the share of the highest count: any unit will do. */
const anyUnit: ReadonlySet<ChannelName> = new Set(['gear', 'lap', 'brake', 'steering']);

function decide(column: ChosenColumn, table: Table, decimals: Decimals): Decided | 'unknown' | 'none' {
	const {channel, header, by, unitText} = column;
	if (by === 'asked' && unitText !== undefined) return stated(unitText, channel, 'asked');
	const ofHeader = unitOf(header, channel);
	if (ofHeader) return {unit: ofHeader, unitBy: 'log', factor: ofHeader.factor};
	const written = statedUnit(column, table);
	if (written !== undefined && !(channel === 'time' && isClockFormat(written))) return stated(written, channel, 'log');
	if (unitText !== undefined) return stated(unitText, channel, 'remembered');
	return fromCells(column, table, decimals);
}

function stated(text: string, channel: ChannelName, unitBy: 'asked' | 'log' | 'remembered'): Decided | 'unknown' {
	const unit = logUnit(text, channel);
	if (unit) return {unit, unitBy, factor: unit.factor};
	return anyUnit.has(channel) ? {unit: {name: text, factor: 1}, unitBy, factor: 1} : 'unknown';
}

/** What the header or the row under it says; undefined where they say nothing. */
function statedUnit({header}: ChosenColumn, {units}: Table): string | undefined {
	const written = header.unitText ?? units?.[header.column - 1] ?? '';
	return isNoUnit(written) ? undefined : written;
}

const isClockFormat = (text: string): boolean => /^[[(]?\W*[hm]{1,2}:/i.test(text);

function fromCells({channel, header}: ChosenColumn, table: Table, decimals: Decimals): Decided | 'none' {
	const plain = {unit: undefined, unitBy: null, factor: 1};
	const cells = table.sample.map(row => row[header.column - 1] ?? '');
	if (channel === 'time') return timeFromCells(cells, decimals);
	if (!needsUnit(channel)) return plain;
	const hasUnits = cells.some(cell => {
		const read = readCell(cell, {channel, factor: undefined}, {...decimals});
		return read.kind === 'value';
	});
	return hasUnits ? {unit: undefined, unitBy: 'log', factor: undefined} : 'none';
}

function timeFromCells(cells: readonly string[], decimals: Decimals): Decided | 'none' {
	const filled = cells.filter(cell => cell !== '');
	const own = {unit: undefined, unitBy: 'log' as const, factor: undefined};
	if (filled.some(cell => !Number.isNaN(clockS(cell)))) return own;
	if (filled.some(cell => readCell(cell, {channel: 'time', factor: undefined}, {...decimals}).kind === 'value'))
		return own;
	const unit = timeUnitFromSteps(cells, decimals);
	return unit ? {unit, unitBy: 'numbers', factor: unit.factor} : 'none';
}
