/** A frame in the order in which it is read aloud: in the ranking what is selected first, with its reason; no rules, blanks or pictures. */
import {type Pieces, piece} from '../parts/pieces.ts';
import type {State} from '../session/live.ts';
import {type Frame, frameLines, frameOf} from './frame.ts';

/** Wide enough that no column is left out, and too narrow for two things beside each other. */
const size = {width: 119, height: 40, ascii: true} as const;

export function spokenLines(state: State): Pieces[] {
	const frame = frameOf(state, size, 0);
	const {place} = state.session;
	if (place.at === 'pictures') return pictureSpoken(frame);
	if (place.at === 'practice' && (place.pane === 'gears' || place.pane === 'lap')) return pictureSpoken(frame);
	if (frame.table === undefined) return frameLines(frame).filter(isSpoken);
	const rows = frame.table.rows.map(spokenRow(frame));
	const selected = rows[frame.table.selected];
	return [...(selected ? [selected] : []), ...frame.bottom, ...frame.top, ...rows].filter(isSpoken);
}

/** "selected, 1, pair 33/38, …": each number with the head of its column. */
const spokenRow =
	({table}: Frame) =>
	(row: Record<string, string>, index: number): Pieces => {
		const cells = table!.columns
			.filter(({head}) => head.trim() !== '' && (row[head] ?? '').trim() !== '')
			.map(({head}) => (head === '#' ? row[head]! : `${head} ${row[head]!}`));
		const marks = (row[' '] ?? '').replace('▸', '').trim();
		const words = [index === table!.selected ? 'selected' : '', marks.includes('*') ? 'in the car' : '', ...cells];
		return [piece(words.filter(word => word !== '').join(', '))];
	};

/** Lines of dots say nothing aloud. */
const pictureSpoken = ({top, bottom}: Frame): Pieces[] => [
	...top.slice(0, 2),
	[piece('Pictures are not read aloud. w tells the numbers behind them.')],
	...bottom.filter(isSpoken),
];

const isSpoken = (pieces: Pieces): boolean => {
	const text = pieces.map(part => part.text).join('');
	return text.trim() !== '' && !/^─+$/.test(text);
};
