/** States of a session on the fixtures, ranked, and their frames as text. */

import {mattersSteps} from '../../../source/odds/matters.ts';
import {oddsOf} from '../../../source/odds/odds-steps.ts';
import {oneTooth} from '../../../source/odds/one-tooth.ts';
import {type Ranked, rankSteps, rowName} from '../../../source/planning/rank-rack.ts';
import {finish} from '../../../source/planning/run-rack.ts';
import {painted} from '../../../source/screens/parts/theme.ts';
import {Ahead} from '../../../source/screens/session/ahead.ts';
import {isAhead} from '../../../source/screens/session/ahead-place.ts';
import type {Answer} from '../../../source/screens/session/answer.ts';
import {readBoth, wrongFromFault} from '../../../source/screens/session/answer.ts';
import {choicesFor} from '../../../source/screens/session/catalog.ts';
import {rowToHandOver} from '../../../source/screens/session/hand-over.ts';
import {handed} from '../../../source/screens/session/handing.ts';
import type {State} from '../../../source/screens/session/live.ts';
import {cursorIn, type Placed, placedRows, shownRows} from '../../../source/screens/session/rows.ts';
import type {Session} from '../../../source/screens/session/session.ts';
import {teachSteps} from '../../../source/screens/session/teaching.ts';
import {frameLines, frameOf, type Size} from '../../../source/screens/views/frame.ts';
import {displayWidth} from '../../../source/text/width.ts';
import {catalog} from '../session/documents.ts';

const esc = '\x1B';

export function stateOf(session: Session): State {
	const answer = answerTo(session);
	const ranked = answer.is === 'ready' ? answer.ranked : undefined;
	const all = ranked === undefined ? [] : placedRows(ranked.ranking.rows);
	const {place} = session;
	const documents = session.history.present;
	const choices =
		place.at === 'choose'
			? choicesFor(catalog, documents, place.kind, place.search.text)
			: isAhead(place)
				? choicesFor(catalog, documents, 'track', '')
				: [];
	const situations = ranked?.ground.plan.conditions.map(({name}) => name) ?? [];
	return {
		session,
		answer,
		scene: {
			ranked,
			all,
			shown: shownRows(all, session.order, session.filter),
			situations,
			choices,
			isWorking: false,
			practiceLines: 2,
			isReadingLog: false,
			ahead: isAhead(place) ? new Ahead(atOnce, () => {}).of(session, choices) : undefined,
			handed: handedIn(session, ranked, all),
			odds: oddsIn(session, ranked),
			practice:
				place.at === 'practice' ? {taught: finish(teachSteps(session)), effect: 'working', lines: 2} : undefined,
		},
	};
}

/** Nothing is put off. */
const atOnce = {
	now: () => 0,
	later: (act: () => void) => {
		act();
		return () => {};
	},
};

function handedIn(session: Session, ranked: Ranked | undefined, all: readonly Placed[]) {
	const {place} = session;
	const shown = shownRows([...all], session.order, session.filter);
	const row = rowToHandOver(session.plan, all, shown[cursorIn(shown, session.row)]);
	return place.at === 'hand over' && ranked && row ? handed(session, place, row.placed.name, ranked) : undefined;
}

/** Few draws: enough for every line to be there. */
function oddsIn(session: Session, ranked: Ranked | undefined): State['scene']['odds'] {
	const read = readBoth(session.history.present);
	if (session.place.at !== 'odds' || ranked === undefined || !read.ok) return undefined;
	const odds = oddsOf(read.car, read.track, {draws: 16, mostDraws: 16, risk: session.risk});
	if (!odds.ok) return undefined;
	const matters = finish(mattersSteps(read.car, read.track, odds.value, {points: 8}));
	const tooth = oneTooth(read.car, read.track, session.row ?? rowName(ranked.ranking.rows[0]!));
	return {odds: odds.value, matters, tooth, isDone: true};
}

function answerTo({history, situation}: Session): Answer {
	const read = readBoth(history.present);
	if (!read.ok) return {is: 'faulty', wrong: read.wrong};
	const ranked = finish(rankSteps(read.car, read.track, {situation}));
	return ranked.ok ? {is: 'ready', ranked: ranked.value} : {is: 'faulty', wrong: ranked.faults.map(wrongFromFault)};
}

/** A frame as its lines of text, without color. */
export const linesOf = (state: State, size: Size): string[] =>
	frameLines(frameOf(state, size, 0)).map(pieces => bare(painted(pieces, {color: false, ascii: size.ascii})).trimEnd());

/** Without what makes it bold or inverted. */
export const bare = (text: string): string => text.replace(new RegExp(`${esc}\\[[\\d;]*m`, 'g'), '');

export const widest = (lines: readonly string[]): number => Math.max(...lines.map(displayWidth));
