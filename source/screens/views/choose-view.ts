/** Tracks or cars to choose from, found by typing part of a name; beside them what is known of the one under the cursor. */

import {planFor, settingOf} from '../../planning/plan.ts';
import {airWords} from '../../text/heading-view.ts';
import {rpm, type UnitSystem, unitsOf} from '../../text/units.ts';
import {listWindow} from '../parts/list-window.ts';
import {blank, line, type Piece, type Pieces, padded, piece} from '../parts/pieces.ts';
import type {Choice} from '../session/catalog.ts';
import {current, type Documents, type OpenDocument} from '../session/documents.ts';
import {readCarOf, readTrackOf} from '../session/forms.ts';
import type {Place} from '../session/session.ts';
import {caretPieces} from './caret.ts';

const typeWidth = 14;

export type ChooseGiven = {
	readonly place: Place & {at: 'choose'};
	readonly choices: readonly Choice[];
	readonly documents: Documents;
	readonly units: UnitSystem;
};

export function chooseView({place, choices, documents, units}: ChooseGiven, width: number, height: number): Pieces[] {
	const what = place.kind === 'track' ? 'track' : 'car';
	const cursor = Math.min(place.cursor, choices.length - 1);
	const details = choices[cursor] ? detailLines(choices[cursor].document, documents, units) : [];
	const head: Pieces[] = [
		[piece(`Choose a ${what}; type part of its name: `, 'strong'), ...caretPieces(place.search)],
		blank,
	];
	const room = Math.max(3, height - head.length - details.length - 1);
	const {start, end} = listWindow(choices.length, Math.max(0, cursor), room);
	const list = choices.slice(start, end).map((choice, i) => choiceLine(choice, start + i === cursor, width));
	const none = line(`No ${what} has that in its name. Esc goes back, Ctrl+N starts one from nothing.`, 'muted');
	return [...head, ...(list.length > 0 ? list : [none]), blank, ...details];
}

function choiceLine({document, title, isChanged, isCurrent}: Choice, isCursor: boolean, width: number): Pieces {
	const from = `${document.from}${isChanged && document.saved ? ', changed' : ''}${isCurrent ? ', in use' : ''}`;
	const nameWidth = Math.max(12, width - typeWidth - 24);
	const type = document.kind === 'track' ? String(document.json.type ?? '') : '';
	const pieces: Piece[] = [
		piece(isCursor ? '▸ ' : '  '),
		padded(title, nameWidth, isCursor ? 'chosen' : 'plain'),
		padded(` ${type}`, typeWidth),
		piece(` ${from}`, 'muted'),
	];
	return pieces;
}

function detailLines(document: OpenDocument, documents: Documents, units: UnitSystem): Pieces[] {
	if (document.kind === 'car') return carLines(document);
	const track = readTrackOf(document.json);
	if (!track.ok) return [line(`${track.problems.length} things to put right before it can be ranked.`, 'near')];
	const {straights, situations, air} = track.value;
	const car = readCarOf(current(documents, 'car').json);
	const plan = car.ok ? planFor(car.value, track.value) : undefined;
	const setting = plan?.ok ? settingOf(plan.value, false) : undefined;
	return [
		line(`${straights.length} straights: ${straights.map(({name}) => name).join(', ')}`),
		line(`situations: ${situations.map(({name}) => name).join(', ')}`),
		line(`day: ${airWords(air, unitsOf(units))}`),
		setting === undefined
			? line('not with this car: no engine for this type of track', 'near')
			: line(
					`limit ${rpm(setting.rpmLimit)} rpm (${setting.limitFrom}), band ${rpm(setting.bandLowRpm)}-${rpm(setting.bandHighRpm)}, engine ${setting.engine}`,
				),
	];
}

function carLines(document: OpenDocument): Pieces[] {
	const car = readCarOf(document.json);
	if (!car.ok) return [line(`${car.problems.length} things to put right before it can be ranked.`, 'near')];
	const {engines, gearboxes, rack} = car.value;
	return [
		line(`${rack.pairs.length} pairs, gearbox sets ${gearboxes.map(({name}) => name).join(', ')}`),
		...engines.map(engine =>
			line(`engine ${engine.name} for ${engine.for.join(', ')}, limit ${rpm(engine.rpmLimit)} rpm`),
		),
	];
}
