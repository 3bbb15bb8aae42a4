/** What is to be said of the cells and rows as they stood in the file. */
import type {UsedColumn} from './decide-units.ts';
import type {RemarkData} from './reading.ts';
import type {Rows} from './row-reader.ts';
import type {CellCounts} from './row-table.ts';

const sparseShare = 0.5;

export function rowRemarks(rows: Rows, columns: readonly UsedColumn[]): RemarkData[] {
	const {wrongCells, longLines, cutLine} = rows;
	const remarks = columns.flatMap((column, slot) => cellRemarks(column, rows.cells[slot]!, rows.samples));
	if (wrongCells.count > 0) remarks.push({kind: 'wrongCells', rows: wrongCells.count, firstLine: wrongCells.firstLine});
	if (longLines.count > 0) remarks.push({kind: 'longLines', lines: longLines.count, firstLine: longLines.firstLine});
	if (cutLine !== undefined) remarks.push({kind: 'cutRow', line: cutLine});
	return remarks;
}

function cellRemarks({channel, unit}: UsedColumn, {empty, text, units}: CellCounts, samples: number): RemarkData[] {
	const remarks: RemarkData[] = [];
	const {count, firstLine, first} = text;
	if (count > 0) remarks.push({kind: 'textCells', channel, cells: count, firstLine, first});
	const stated = new Set([...units, ...(unit ? [unit.name] : [])]);
	if (units.size > 0 && stated.size > 1) remarks.push({kind: 'cellUnits', channel, units: [...stated]});
	if (empty > sparseShare * samples) remarks.push({kind: 'sparse', channel, share: empty / samples});
	return remarks;
}
