/** Figures of one pair beside those of another, with what changes. */
import {type Block, type Cell, cell, type Making, tableOf, text} from './blocks.ts';
import {absent, fixed} from './units.ts';

/** One figure of every pair: the number by pair, and how it is written. */
export type Figure<T> = {
	name: string;
	value: (pair: T) => number | null;
	write: (value: number) => string;
	/** The change in percent rather than as a number. */
	inPercent?: boolean;
};

type Named = {pair: string; gearbox: string; installed: boolean};

/** "33/35 A", with a mark for what is in the car. */
export const pairWords = ({pair, gearbox, installed}: Named): string => `${pair} ${gearbox}${installed ? '*' : ''}`;

/** Explains the mark where it stands. */
export const installedView = (pairs: readonly Named[]): Block[] =>
	pairs.some(({installed}) => installed) ? [text('* in the car', 'muted')] : [];

/** A line a figure; a change is the first pair's less the second's. Figures that no pair has are left out. */
export const comparisonView = <T extends Named>(pairs: readonly T[], figures: readonly Figure<T>[]): Block => {
	const [one, other] = pairs;
	const told = figures.filter(({value}) => pairs.some(pair => value(pair) !== null));
	const columns: Making<Figure<T>>[] = [
		{head: '', align: 'left', keep: 0, shortest: 14, cell: ({name}) => cell(name)},
		...pairs.map(
			(pair, i): Making<Figure<T>> => ({
				head: pairWords(pair),
				align: 'right',
				keep: i === 0 ? 0 : 2,
				cell: ({value, write}) => numberCell(value(pair), write, i === 0 ? 'strong' : 'plain'),
			}),
		),
	];
	if (one !== undefined && other !== undefined) {
		const change: Making<Figure<T>> = {
			head: 'difference',
			align: 'right',
			keep: 1,
			cell: ({value, write, inPercent}) => changeCell(value(one), value(other), write, inPercent === true),
		};
		columns.push(change);
	}
	return tableOf(columns, told);
};

const numberCell = (value: number | null, write: (value: number) => string, tone: Cell['tone']): Cell =>
	cell(value === null ? absent : write(value), tone);

const changeCell = (
	one: number | null,
	other: number | null,
	write: (value: number) => string,
	inPercent: boolean,
): Cell => {
	if (one === null || other === null) return cell(absent);
	const percent = (100 * (one - other)) / other;
	const difference =
		inPercent && Number.isFinite(percent) ? `${fixed(Math.abs(percent), 1)} %` : write(Math.abs(one - other));
	const isZero = Number.parseFloat(difference.replaceAll(',', '')) === 0;
	return cell(`${isZero ? '' : one < other ? '-' : '+'}${difference}`);
};
