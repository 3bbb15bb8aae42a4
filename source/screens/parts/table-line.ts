/** One line of a table: its cells in their columns, with their meaning. */
import {displayWidth, padTo} from '../../text/width.ts';
import {type Meaning, type Piece, type Pieces, piece} from './pieces.ts';

/** A row by the heads of its columns. */
export type TableRow = Readonly<Record<string, string>>;
export type TableColumn = {
	readonly head: string;
	readonly align: 'left' | 'right';
	readonly width: number;
	/** What the text of a row means; plain unless given. */
	readonly tone?: (row: TableRow) => Meaning;
};

const between = '  ';

export function tableLine(row: TableRow, columns: readonly TableColumn[]): Pieces {
	return columns.flatMap((column, index): Piece[] => {
		const cell = {text: cellText(row, column), tone: column.tone?.(row) ?? 'plain'};
		return index === 0 ? [cell] : [piece(between), ...tight(cell)];
	});
}

/** The selected row is a bar, inverted as a whole: colors inside would break it. */
export const tableBar = (row: TableRow, columns: readonly TableColumn[]): Pieces => [
	{text: columns.map(column => cellText(row, column)).join(between), tone: 'chosen'},
];

export const tableHeading = (columns: readonly TableColumn[]): Pieces => [
	{text: columns.map(column => cellText({[column.head]: column.head}, column)).join(between), tone: 'muted'},
];

/** What the columns take of a width. */
export const tableWidth = (columns: readonly TableColumn[]): number =>
	columns.reduce((sum, {width}) => sum + width + between.length, -between.length);

const cellText = (row: TableRow, {head, width, align}: TableColumn): string => padTo(row[head] ?? '', width, align);

/** Only the word itself is marked, not the blanks that fill its column. */
function tight({text, tone}: Piece): Piece[] {
	if (tone === 'plain') return [{text, tone}];
	const word = text.trim();
	const start = text.length - text.trimStart().length;
	const blanks = Math.max(0, displayWidth(text) - start - displayWidth(word));
	return [piece(' '.repeat(start)), {text: word, tone}, piece(' '.repeat(blanks))];
}
