/** The history of a track, and the form of an entry for it. */
import {historyView} from '../../text/history-view.ts';
import {layOut} from '../../text/layout.ts';
import {blank, line, type Pieces, padded, piece} from '../parts/pieces.ts';
import type {Place} from '../session/session.ts';
import {type Draft, type DraftField, draftFields} from '../session/track-history.ts';
import {caretPieces} from './caret.ts';
import {scrolled} from './scrolled.ts';

type Given = {readonly place: Place & {at: 'history'}; readonly draft: Draft | undefined; readonly track: string};

export function trackHistoryView({place, draft, track}: Given, width: number, height: number): Pieces[] {
	if (place.adding && draft) return draftLines(draft, width);
	return scrolled(layOut(historyView(track, place.entries, place.entries.length), width), place.scroll, height);
}

const labels: Record<DraftField, string> = {
	date: 'date',
	session: 'session',
	pair: 'pair',
	gearbox: 'gearbox set',
	highestRpm: 'highest RPM seen',
	at: 'where',
	situation: 'situation',
	remark: 'remark',
};
const labelWidth = 18;

function draftLines({track, lines, field, wrong}: Draft, width: number): Pieces[] {
	const rows = draftFields.map((one): Pieces => {
		const isHere = one === field;
		const head = [piece(isHere ? '▸ ' : '  '), padded(labels[one], labelWidth, isHere ? 'strong' : 'plain')];
		return [...head, ...(isHere ? caretPieces(lines[one], width - labelWidth - 2) : [piece(lines[one].text)])];
	});
	const told = wrong === undefined ? [] : [[piece('Not taken: ', 'fail'), piece(wrong)]];
	return [
		line(`What was seen at ${track}`, 'strong'),
		blank,
		...rows,
		blank,
		...told,
		line("The day's air is added as the track has it. What is empty is left out.", 'muted'),
	];
}
