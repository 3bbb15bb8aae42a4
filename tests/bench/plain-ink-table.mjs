/** What the screen is measured against: a table of as many rows and columns, as one writes it in Ink, with Ink's own renderer. */
import {Box, render, Text, useInput} from 'ink';
import {createElement as h, useState} from 'react';

const [rows, columns] = [30, 8];
const cell = (row, column) => (row === 0 ? `head ${column}` : `${((row * 7919 + column * 104729) % 10000) / 10}`);

function Table() {
	const [selected, select] = useState(1);
	useInput(input => {
		if (input === 'j') select(now => Math.min(rows - 1, now + 1));
		if (input === 'k') select(now => Math.max(1, now - 1));
	});
	const lines = Array.from({length: rows}, (_, row) =>
		h(
			Box,
			{key: row},
			Array.from({length: columns}, (_, column) =>
				h(Box, {key: column, width: 12}, h(Text, {inverse: row === selected}, cell(row, column))),
			),
		),
	);
	return h(Box, {flexDirection: 'column'}, ...lines, h(Text, null, `selected ${selected}`));
}

render(h(Table));
