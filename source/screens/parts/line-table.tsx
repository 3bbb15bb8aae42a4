/** ink-table made compact: one Text a line, no rules between rows, display widths, the selected row inverted. */
import {Text} from 'ink';
import Table from 'ink-table';
import {memo, type ReactElement} from 'react';
import type {Pieces} from './pieces.ts';
import {type TableColumn, type TableRow, tableBar, tableHeading, tableLine} from './table-line.ts';
import {painted, type Theme} from './theme.ts';

type Props = {
	/** Numbers of the rows: ink-table hashes what it is given for every frame, so it is given little. */
	data: {row: number}[];
	columns: 'row'[];
	rows: readonly TableRow[];
	layout: readonly TableColumn[];
	theme: Theme;
	/** Of the rows; -1: none. */
	selected: number;
};
type Part = Parameters<Table<{row: number}>['data']>[0];

const Line = memo(({text}: {text: string}) => <Text wrap="truncate">{text}</Text>);

const nothing = null as unknown as ReactElement;

export class LineTable extends Table<{row: number}> {
	declare readonly props: Readonly<Props>;

	/** Widths and texts are ours: ink-table would count code units. */
	override getColumns() {
		return [];
	}

	override header = () => nothing;
	override footer = () => nothing;
	override separator = () => nothing;

	override heading = () => this.#line(tableHeading(this.props.layout));

	override data = ({data}: Part) => {
		const {rows, layout, selected} = this.props;
		const row = rows[data.row!]!;
		return this.#line(data.row === selected ? tableBar(row, layout) : tableLine(row, layout));
	};

	#line(pieces: Pieces) {
		return <Line text={painted(pieces, this.props.theme)} />;
	}
}
