/** The tracks ahead beside what they ask for: the pairs to load, or the gears to build. */

import {text} from '../../text/blocks.ts';
import {gearboxBlocks} from '../../text/gearbox-view.ts';
import {caution} from '../../text/heading-view.ts';
import {layOut} from '../../text/layout.ts';
import {loadBlocks} from '../../text/load-view.ts';
import {unitsOf} from '../../text/units.ts';
import {listWindow} from '../parts/list-window.ts';
import {beside, line, type Pieces, padded, piece, tall} from '../parts/pieces.ts';
import type {AheadState} from '../session/ahead.ts';
import {type AheadPlace, aheadIn} from '../session/ahead-place.ts';
import type {State} from '../session/live.ts';
import {scrolled} from './scrolled.ts';

const listShare = 0.26;
const [narrowestList, widestList] = [18, 30];

/** `height` lines under the heading. */
export function aheadView(state: State, place: AheadPlace, width: number, height: number): Pieces[] {
	const listWidth = Math.min(widestList, Math.max(narrowestList, Math.round(width * listShare)));
	const right = width - listWidth - 3;
	const content = contentLines(state, right);
	return tall(
		beside(listLines(state, place, listWidth, height), listWidth, scrolled(content, place.scroll, height), '│'),
		height,
	);
}

function listLines({session, scene}: State, place: AheadPlace, width: number, height: number): Pieces[] {
	const ids = aheadIn(session);
	const head = [line(`${place.at === 'load' ? 'Load' : 'Gears'} for the tracks`, 'strong'), ...settingLines(place)];
	const {start, end} = listWindow(scene.choices.length, place.cursor, height - head.length);
	const list = scene.choices.slice(start, end).map(({document, title}, i): Pieces => {
		const isCursor = start + i === place.cursor;
		const mark = ids.includes(document.id) ? '[x] ' : '[ ] ';
		return [piece(isCursor ? '▸ ' : '  '), piece(mark), padded(title, width - 6, isCursor ? 'chosen' : 'plain')];
	});
	return [...head, ...list];
}

/** What can be set here, as it is. */
function settingLines(place: AheadPlace): Pieces[] {
	if (place.at === 'gears') return [line(place.together ? 'one set for all' : 'each by itself', 'muted')];
	const sets = place.eachSet ? ', each set' : '';
	return [line(`${place.taller} taller, ${place.shorter} shorter${sets}`, 'muted')];
}

function contentLines({session, scene}: State, width: number): Pieces[] {
	const ahead: AheadState = scene.ahead ?? {is: 'working', part: 0};
	const units = unitsOf(session.units);
	switch (ahead.is) {
		case 'empty':
			return [line('No track lies ahead. Space chooses the one under the cursor.', 'muted')];
		case 'working':
			return [line(`Working, ${Math.floor(100 * ahead.part)} % done.`, 'muted')];
		case 'faulty':
			return layOut(
				ahead.words.map(words => text(`! ${words}`, 'fail', 2)),
				width,
			);
		case 'load':
			return layOut([...loadBlocks(ahead.list, units), text(caution, 'muted')], width);
		case 'gears':
			return layOut([...gearboxBlocks(ahead.answer, units), text(caution, 'muted')], width);
	}
}
