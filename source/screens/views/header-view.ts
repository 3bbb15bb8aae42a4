/** The two lines at the top: whose numbers these are and for which day, and how they are looked at. */

import {visible} from '../../documents/visible.ts';
import type {Setting} from '../../planning/results.ts';
import {percent} from '../../text/chances-view.ts';
import {airWords} from '../../text/heading-view.ts';
import {rpm, rpmDown, seconds, unitsOf} from '../../text/units.ts';
import {type Piece, type Pieces, piece, spread} from '../parts/pieces.ts';
import type {Answer} from '../session/answer.ts';
import {current, isChanged, titleOf} from '../session/documents.ts';
import {limitMarginRpm} from '../session/figures.ts';
import {readTrackOf} from '../session/forms.ts';
import type {Placed} from '../session/rows.ts';
import type {Session} from '../session/session.ts';

export const settingOf = (answer: Answer): Setting | undefined => {
	if (answer.is === 'ready') return answer.ranked.ranking.setting;
	if (answer.is === 'working') return answer.first?.setting ?? answer.before?.ranking.setting;
	return answer.is === 'stopped' ? answer.before?.ranking.setting : undefined;
};

export type Counts = {readonly shown: number; readonly all: number};

/** `here` is the row under the cursor. */
export function headerView(
	session: Session,
	answer: Answer,
	counts: Counts,
	here: Placed | undefined,
	width: number,
): Pieces[] {
	const isForm = session.place.at === 'edit' && here !== undefined && answer.is !== 'faulty';
	const state = isForm ? rowLine(here, answer, width) : stateLine(session, answer, counts, width);
	return [trackLine(session, answer, width), state];
}

/** While the form is worked on, what it comes to for the row under the cursor. */
function rowLine({name, place, row}: Placed, answer: Answer, width: number): Pieces {
	const verdict = row.verdict === 'fail' ? 'FAIL' : row.verdict;
	const margin = `margin ${rpmDown(limitMarginRpm(row))} rpm`;
	const words = [
		place === undefined ? '' : ` place ${place}`,
		margin,
		`lap ${seconds(row.fastestS)} s`,
		visible(row.reason),
	].join(' · ');
	const pieces = [piece(name, 'strong'), piece(' '), piece(verdict, row.verdict), piece(words, 'muted')];
	return spread(pieces, progressPieces(answer), width);
}

function trackLine(session: Session, answer: Answer, width: number): Pieces {
	const documents = session.history.present;
	const [track, car] = [current(documents, 'track'), current(documents, 'car')];
	const setting = settingOf(answer);
	const reading = readTrackOf(track.json);
	const words = [
		String(track.json.type ?? 'no type'),
		...(setting
			? [`limit ${rpm(setting.rpmLimit)}`, `band ${rpm(setting.bandLowRpm)}-${rpm(setting.bandHighRpm)}`]
			: []),
		...(reading.ok ? [airWords(reading.value.air, unitsOf(session.units))] : []),
	];
	const mark = (document: typeof track) => (isChanged(document) ? ' (changed)' : '');
	const left = [piece(`${titleOf(track)}${mark(track)}`, 'strong'), piece(` · ${words.join(' · ')}`)];
	return spread(left, [piece(`${titleOf(car)}${mark(car)}`, 'strong')], width);
}

function stateLine(session: Session, answer: Answer, {shown, all}: Counts, width: number): Pieces {
	const {situation, order, filter, comparison, plan} = session;
	const words = [
		situation === undefined ? 'worst over all situations' : `only ${situation}`,
		...(order === 'place' ? [] : [`by ${order}`]),
		...(shown < all ? [`${shown} of ${all} rows`] : [`${all} rows`]),
		...(filter.hideFailing ? ['FAIL hidden'] : []),
		...(filter.gearbox === undefined ? [] : [`set ${filter.gearbox}`]),
		...(filter.leastMarginRpm === undefined ? [] : [`margin ${filter.leastMarginRpm} or more`]),
		...(session.risk === undefined ? [] : [`risk ${percent(session.risk)}`]),
		...(comparison === undefined ? [] : [`against ${comparison}`]),
		...(plan === undefined ? [] : [`plan ${plan}`]),
	];
	return spread([piece(words.join(' · '), 'muted')], progressPieces(answer), width);
}

function progressPieces(answer: Answer): Piece[] {
	if (answer.is === 'working') {
		const {done, total} = answer.progress;
		return [piece(total === 0 ? 'ranking the rack' : `ranking ${done} of ${total}, Esc stops`, 'strong')];
	}
	if (answer.is === 'stopped') return [piece('stopped, Ctrl+L ranks again', 'near')];
	return answer.is === 'faulty' ? [piece('not ranked', 'fail')] : [];
}
