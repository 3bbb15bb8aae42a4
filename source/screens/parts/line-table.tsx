/** ink-table made compact: one Text a line, no rules between rows, display widths, the selected row inverted. */
import {Text} from 'ink';
import Table from 'ink-table';
import {memo, type ReactElement} from 'react';
import {displayWidth, padTo} from '../../commands/text/width.ts';
import {type Meaning, type Piece, piece} from './pieces.ts';
import {painted, type Theme} from './theme.ts';

/** A row by the heads of its columns. */
export type TableRow = Record<string, string>;
export type TableColumn = {
	readonly head: string;
	readonly align: 'left' | 'right';
	readonly width: number;
	/** What the text of a row means; plain unless given. */
	readonly tone?: (row: TableRow) => Meaning;
};

type Props = {
	data: TableRow[];
	columns: string[];
	layout: readonly TableColumn[];
	theme: Theme;
	selected: number;
};
type Part = Parameters<Table<TableRow>['data']>[0];

const Line = memo(({text}: {text: string}) => <Text wrap="truncate">{text}</Text>);

const nothing = null as unknown as ReactElement;

export class LineTable extends Table<TableRow> {
	declare readonly props: Readonly<Props>;

	/** Widths are given: ink-table would count code units. */
	override getColumns() {
		return this.props.layout.map(({head, width}) => ({column: head, key: head, width}));
	}

	override header = () => nothing;
	override footer = () => nothing;
	override separator = () => nothing;

	override heading = ({data}: Part) => <Line text={this.#line(data, () => 'muted')} />;

	override data = ({data}: Part) => {
		if (data === this.props.data[this.props.selected]) return <Line text={this.#bar(data)} />;
		return <Line text={this.#line(data, column => column.tone?.(data as TableRow) ?? 'plain')} />;
	};

	/** The selected row is inverted as a whole: colors inside would break the bar. */
	#bar(data: Partial<TableRow>): string {
		const text = this.props.layout.map(({head, width, align}) => padTo(data[head] ?? '', width, align)).join('  ');
		return painted([{text, tone: 'chosen'}], this.props.theme);
	}

	#line(data: Partial<TableRow>, toneOf: (column: TableColumn) => Meaning): string {
		const pieces = this.props.layout.flatMap((column, index): Piece[] => {
			const cell = {text: padTo(data[column.head] ?? '', column.width, column.align), tone: toneOf(column)};
			return index === 0 ? [cell] : [piece('  '), ...tight(cell)];
		});
		return painted(pieces, this.props.theme);
	}
}

/** Only the word itself is marked, not the blanks that fill its column. */
function tight({text, tone}: Piece): Piece[] {
	if (tone === 'plain') return [{text, tone}];
	const word = text.trim();
	const start = text.length - text.trimStart().length;
	const blanks = displayWidth(text) - start - displayWidth(word);
	return [piece(' '.repeat(start)), {text: word, tone}, piece(' '.repeat(Math.max(0, blanks)))];
}
