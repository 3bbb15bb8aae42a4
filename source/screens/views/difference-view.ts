/** A row beside the one it is compared with. */

import type {Row} from '../../planning/results.ts';
import {type Block, cell, type Making, tableOf} from '../../text/blocks.ts';
import {fixed, rpm, rpmUp, seconds, signed} from '../../text/units.ts';
import {highestRpm, limitMarginRpm, lowestExitRpm, shiftsPerLap} from '../session/figures.ts';

type Figure = {
	readonly name: string;
	readonly of: (row: Row) => number | null;
	readonly text: (value: number | null) => string;
	readonly digits: number;
};

const count = (value: number | null) => (value === null ? '-' : String(value));

const figures: readonly Figure[] = [
	{name: 'pair ratio', of: row => row.pairRatio, text: value => fixed(value ?? 0, 4), digits: 4},
	{name: 'lap, fastest gears s', of: row => row.fastestS, text: seconds, digits: 3},
	{name: 'lap, as driven s', of: row => row.timeS, text: seconds, digits: 3},
	{name: 'highest rpm', of: highestRpm, text: rpmUp, digits: 0},
	{name: 'margin to limit rpm', of: limitMarginRpm, text: rpm, digits: 0},
	{name: 'lowest exit rpm', of: lowestExitRpm, text: rpm, digits: 0},
	{name: 'shifts a lap', of: shiftsPerLap, text: count, digits: 0},
	{name: 'pit road rpm', of: row => row.pitRoad?.rpm ?? null, text: rpm, digits: 0},
];

export function differenceView(row: Row, other: Row, names: {row: string; other: string}): Block {
	const difference = ({of, digits}: Figure) => {
		const [mine, its] = [of(row), of(other)];
		return signed(mine === null || its === null ? null : mine - its, digits);
	};
	const columns: Making<Figure>[] = [
		{head: '', align: 'left', keep: 0, cell: ({name}) => cell(name)},
		{head: names.row, align: 'right', keep: 0, cell: ({of, text}) => cell(text(of(row)), 'strong')},
		{head: names.other, align: 'right', keep: 0, cell: ({of, text}) => cell(text(of(other)))},
		{head: '±', align: 'right', keep: 0, cell: figure => cell(difference(figure))},
	];
	return tableOf(columns, figures);
}
