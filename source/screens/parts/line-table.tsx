/** ink-table made compact: one Text a line, no rules between rows, display widths, the selected row inverted. */
import {Text} from 'ink';
import Table from 'ink-table';
import {memo, type ReactElement} from 'react';
import type {Pieces} from './pieces.ts';
import {type TableColumn, type TableRow, tableBar, tableHeading, tableLine} from './table-line.ts';
import {painted, type Theme} from './theme.ts';

type Props = {
	data: Record<string, string>[];
	columns: string[];
	layout: readonly TableColumn[];
	theme: Theme;
	/** Of the rows here; -1: none. */
	selected: number;
};
type Part = Parameters<Table<Record<string, string>>['data']>[0];

const Line = memo(({text}: {text: string}) => <Text wrap="truncate">{text}</Text>);

const nothing = null as unknown as ReactElement;

export class LineTable extends Table<Record<string, string>> {
	declare readonly props: Readonly<Props>;

	/** Widths are given: ink-table would count code units. */
	override getColumns() {
		return this.props.layout.map(({head, width}) => ({column: head, key: head, width}));
	}

	override header = () => nothing;
	override footer = () => nothing;
	override separator = () => nothing;

	override heading = () => this.#line(tableHeading(this.props.layout));

	override data = ({data}: Part) => {
		const {layout, selected} = this.props;
		const isSelected = data === this.props.data[selected];
		return this.#line(isSelected ? tableBar(data as TableRow, layout) : tableLine(data as TableRow, layout));
	};

	#line(pieces: Pieces) {
		return <Line text={painted(pieces, this.props.theme)} />;
	}
}
