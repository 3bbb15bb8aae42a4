/** The odds of the rows that are shown: a table around the cursor, then what they come to. */

import type {OddsRow} from '../../odds/results.ts';
import {rowName} from '../../planning/rank-rack.ts';
import {type Block, cell, gap, tableOf, text} from '../../text/blocks.ts';
import {decisionSentences, inputLines, mattersSentences, rowText} from '../../text/chances-view.ts';
import {layOut} from '../../text/layout.ts';
import {oddsColumns, toothView} from '../../text/odds-view.ts';
import {type UnitSystem, unitsOf} from '../../text/units.ts';
import {listWindow} from '../parts/list-window.ts';
import {line, type Pieces} from '../parts/pieces.ts';
import type {OddsShown} from '../session/odds-asked.ts';
import type {Placed} from '../session/rows.ts';
import {marks} from './marks.ts';

export type OddsGiven = {
	readonly shown: OddsShown | undefined;
	readonly rows: readonly Placed[];
	readonly cursor: number;
	readonly units: UnitSystem;
};

const waiting = line('Drawing: chances come in a moment.', 'muted');

/** How far it is; then the rows around the cursor. `height` lines at most. */
export function oddsRows({shown, rows, cursor}: OddsGiven, width: number, height: number): Pieces[] {
	const odds = shown?.odds;
	if (odds === undefined) return [waiting];
	const byName = new Map(odds.rows.map(row => [rowText(row), row]));
	const window = listWindow(rows.length, cursor, Math.max(1, height - 2));
	const visible = rows.slice(window.start, window.end).flatMap((placed, i) => {
		const row = byName.get(rowName(placed.row));
		return row === undefined ? [] : [{place: placed.place ?? 0, row, risk: odds.risk, at: window.start + i}];
	});
	const mark = {
		head: ' ',
		align: 'left',
		keep: 0,
		cell: ({at}: Line) => cell(at === cursor ? marks.cursor : ' '),
	} as const;
	const table = tableOf<Line>([mark, ...oddsColumns], visible);
	return [progress(shown!), ...layOut([table], width)];
}

type Line = {place: number; row: OddsRow; risk: number | null; at: number};

function progress({odds, isDone}: OddsShown): Pieces {
	const words = `${odds!.draws} draws, the same for every row · ± is one standard error of a chance`;
	return isDone ? line(words, 'muted') : line(`refining · ${words}`, 'strong');
}

/** What is decided, what matters most, one tooth of the row under the cursor, and what is assumed. */
export function oddsTold({shown, units}: OddsGiven, width: number): Pieces[] {
	const odds = shown?.odds;
	if (odds === undefined) return [];
	const told = (sentences: readonly string[]): Block[] => sentences.map(one => text(one, 'plain', 2));
	const tooth = shown?.tooth;
	return layOut(
		[
			...told(decisionSentences(odds)),
			gap,
			...(shown?.matters === undefined
				? [text(shown!.isDone ? '' : 'What matters most comes next.', 'muted')]
				: told(mattersSentences(shown.matters))),
			gap,
			...(tooth === undefined
				? [text('What one tooth is worth comes after that.', 'muted')]
				: tooth.of.row === ''
					? []
					: toothView(tooth, odds.rpmLimit, unitsOf(units))),
			gap,
			text(
				'How well each number is taken to be known, one standard deviation (± in a field says it better):',
				'muted',
				2,
			),
			...inputLines(odds.inputs, units).map(one => text(`- ${one}.`, 'muted', 2)),
			...(odds.notDrawn.length > 0 ? [text(`- Stated, but not drawn: ${odds.notDrawn.join(', ')}.`, 'near', 2)] : []),
		],
		width,
	);
}
