/** The documents of the command tests as a session has them, and what is often done with it. */
import {readFileSync} from 'node:fs';
import type {JsonObject} from '../../../source/documents/json.ts';
import type {Action} from '../../../source/screens/session/action.ts';
import type {Documents, OpenDocument} from '../../../source/screens/session/documents.ts';
import {reduce} from '../../../source/screens/session/reduce.ts';
import {type Session, startSession} from '../../../source/screens/session/session.ts';

export const fixture = (name: string): JsonObject =>
	JSON.parse(readFileSync(new URL(`../../fixtures/${name}.json`, import.meta.url), 'utf8'));

const shipped = (kind: 'track' | 'car', stem: string, json: JsonObject): OpenDocument => ({
	id: `${kind}:${stem}`,
	kind,
	from: 'shipped',
	json,
	saved: json,
	shipped: json,
	plan: undefined,
});

export const oval = shipped('track', 'oval', fixture('oval'));
export const car = shipped('car', 'car', fixture('car'));
export const other = shipped('track', 'other', {...fixture('oval'), name: 'Äußere Bahn'});
export const catalog = [oval, other, car];
export const documents: Documents = {open: {[oval.id]: oval, [car.id]: car}, track: oval.id, car: car.id};

export const session = (change: Partial<Session> = {}): Session => ({...startSession(documents, 'us'), ...change});

/** What the session is after these actions. */
export const after = (start: Session, ...actions: Action[]): Session => actions.reduce(reduce, start);

export const typed = (text: string): Action[] =>
	[...text].map(character => ({do: 'type', event: {kind: 'text', text: character}}));

/** The car with single gears to build from: those of its sets. */
export const withGears = (json: JsonObject): JsonObject => ({
	...json,
	gearInventory: {
		gears: [[2.9, 2.7], [2.04, 1.9], [1.58, 1.48], [1.24, 1.2], [1]].flatMap((ratios, i) =>
			ratios.map(ratio => ({gear: i + 1, ratio})),
		),
	},
});
