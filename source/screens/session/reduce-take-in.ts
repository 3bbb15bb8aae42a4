/** What may happen where a plan is taken in. */

import type {JsonObject} from '../../documents/json.ts';
import {edited, editLine} from '../parts/edit-line.ts';
import type {KeyEvent} from '../terminal/key-event.ts';
import type {Action} from './action.ts';
import {lookAt, newId, type OpenDocument, withDocument} from './documents.ts';
import {recorded} from './history.ts';
import type {Place, Session} from './session.ts';
import type {Incoming} from './take-in.ts';

type TakeIn = Place & {at: 'take in'};

export const takeInPlace: TakeIn = {
	at: 'take in',
	line: editLine(''),
	wrong: undefined,
	incoming: undefined,
	scroll: 0,
};

export function reduceTakeIn(session: Session, place: TakeIn, action: Action): Session {
	const at = (next: Partial<TakeIn>): Session => ({...session, place: {...place, ...next}});
	switch (action.do) {
		case 'refuse':
			return at({wrong: action.wrong, incoming: undefined});
		case 'show incoming':
			return at({incoming: action.incoming, wrong: undefined, scroll: 0});
		case 'read another':
			return at({incoming: undefined});
		case 'take over':
			return place.incoming?.form === 'plan' ? withPlanTaken(session, place.incoming) : session;
		default:
			return session;
	}
}

/** The name of a file, typed. */
export function typedInTakeIn(session: Session, place: TakeIn, event: KeyEvent): Session {
	const line = edited(place.line, event);
	return line === undefined ? session : {...session, place: {...place, line, wrong: undefined}};
}

/** The plan's track in place of the one of its name, with its pair, set and notes; and the car of its name where there is one. */
function withPlanTaken(session: Session, {plan, own, differences}: Incoming & {form: 'plan'}): Session {
	const {present} = session.history;
	const before = own.track && (present.open[own.track.id] ?? own.track);
	// What says the same is the same object: only what differs counts as a change.
	const json = before && differences.track?.length === 0 ? before.json : (plan.track as JsonObject);
	const fresh = {
		id: newId('track', present.open),
		kind: 'track',
		from: 'plan',
		saved: undefined,
		shipped: undefined,
	} as const;
	const track: OpenDocument = {...(before ?? {...fresh, plan: undefined}), json, notes: plan.notes ?? before?.notes};
	const withTrack = lookAt(withDocument(present, track), track);
	const documents = own.car ? lookAt(withTrack, own.car) : withTrack;
	const name = `${plan.pair} ${plan.gearbox}`;
	const car = own.car ? '' : ` You have no car called ${String(plan.car.name)}: the one in use stays.`;
	return {
		...session,
		history: recorded(session.history, documents),
		place: {at: 'ranking'},
		plan: name,
		row: name,
		situation: undefined,
		notice: `Taken over: ${name} at ${String(plan.track.name)}. Ctrl+S saves it, u undoes it.${car}`,
	};
}
