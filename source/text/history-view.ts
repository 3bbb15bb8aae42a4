/** The history of a track: one line an entry, the latest first. */
import type {HistoryEntry} from '../store/kept-documents.ts';
import {type Block, cell, gap, type Making, tableOf, text} from './blocks.ts';

/** Entries may have been written by hand. */
const words = (value: unknown): string => (value === undefined ? '' : String(value));

const columns: readonly Making<HistoryEntry>[] = [
	{head: 'date', align: 'left', keep: 0, cell: ({date}) => cell(words(date), 'strong')},
	{head: 'session', align: 'left', keep: 3, cell: ({session}) => cell(words(session))},
	{head: 'pair', align: 'left', keep: 0, cell: ({pair}) => cell(words(pair))},
	{head: 'set', align: 'left', keep: 2, cell: ({gearbox}) => cell(words(gearbox))},
	{head: 'RPM', align: 'right', keep: 0, cell: ({highestRpm}) => cell(words(highestRpm))},
	{head: 'at', align: 'left', keep: 4, cell: ({at}) => cell(words(at))},
	{head: 'situation', align: 'left', keep: 5, cell: ({situation}) => cell(words(situation))},
];

export const historyView = (track: string, entries: readonly HistoryEntry[], most: number): Block[] => {
	if (entries.length === 0) return [text(`${track}: nothing is kept of it yet.`)];
	const latestFirst = [...entries].reverse().sort((a, b) => (words(a.date) < words(b.date) ? 1 : -1));
	const shown = latestFirst.slice(0, most);
	const remarks = shown.filter(({remark}) => remark !== undefined).map(remarkOf);
	const left = entries.length - shown.length;
	return [
		text(track, 'strong'),
		gap,
		tableOf(columns, shown),
		...(remarks.length > 0 ? [gap, ...remarks] : []),
		...(left > 0 ? [gap, text(`and ${left} earlier; --top N shows more.`, 'muted')] : []),
	];
};

/** Below the table, where it is read in full. */
const remarkOf = ({date, session, remark}: HistoryEntry): Block =>
	text(`${[date, session].filter(part => part !== undefined).join(' ')}: ${words(remark)}`, 'plain', 2);
