/** What a session at the screen holds: inputs only. What follows from them is in `answer.ts` and in the views. */

import type {HistoryEntry} from '../../store/kept-documents.ts';
import type {UnitSystem} from '../../text/units.ts';
import type {EditLine} from '../parts/edit-line.ts';
import {current, type Documents, type Kind} from './documents.ts';
import type {HandOver} from './hand-over.ts';
import {type History, startHistory} from './history.ts';
import type {Pane, Practice} from './practice.ts';
import {type Filter, noFilter, type Order} from './rows.ts';
import type {Incoming} from './take-in.ts';
import type {Draft} from './track-history.ts';

export const pictures = ['rpm', 'thrust', 'speed'] as const;
export type Picture = (typeof pictures)[number];

/** A field being typed into. */
export type Editing = {readonly line: EditLine /** Why it was not taken. */; readonly wrong: string | undefined};

/** A field of a form by its place in it. */
export type FieldPlace = {readonly section: number; readonly row: number; readonly column: number};

/** How many steps shorter and taller are carried, and whether for every gearbox set. */
export type LoadSteps = {readonly shorter: number; readonly taller: number; readonly eachSet: boolean};

export type Place =
	| {readonly at: 'ranking'}
	| {readonly at: 'why'; readonly scroll: number}
	| {readonly at: 'life'; readonly scroll: number}
	| {readonly at: 'odds'; readonly scroll: number}
	| {readonly at: 'pictures'; readonly picture: Picture; readonly straight: number}
	| ({readonly at: 'edit'; readonly kind: Kind; readonly editing: Editing | undefined} & FieldPlace)
	| {readonly at: 'choose'; readonly kind: Kind; readonly search: EditLine; readonly cursor: number}
	| ({readonly at: 'hand over'; readonly scroll: number} & HandOver)
	/** `incoming` is the plan once it was read. */
	| ({readonly at: 'take in'; readonly incoming: Incoming | undefined; readonly scroll: number} & Editing)
	/** `adding`: the draft is typed into. */
	| {
			readonly at: 'history';
			readonly entries: readonly HistoryEntry[];
			readonly adding: boolean;
			readonly scroll: number;
	  }
	/** `cursor` is the straight, or the line among what would change. */
	| {readonly at: 'practice'; readonly pane: Pane; readonly cursor: number; readonly scroll: number}
	| ({readonly at: 'load'; readonly cursor: number; readonly scroll: number} & LoadSteps)
	/** `together`: one set for all tracks besides. */
	| {readonly at: 'gears'; readonly cursor: number; readonly scroll: number; readonly together: boolean}
	/** From the saved and from the shipped document. */
	| {readonly at: 'differences'; readonly kind: Kind; readonly scroll: number};

/** What lies over the place until it is answered. */
export type Over =
	| {readonly is: 'help'; readonly scroll: number}
	| {readonly is: 'quitting'}
	/** An earlier session that ended without being saved. */
	| {readonly is: 'recovery'; readonly documents: Documents}
	| ({readonly is: 'margin'} & Editing)
	| ({readonly is: 'risk'} & Editing)
	| ({readonly is: 'entry'; readonly asks: Asked} & Editing)
	/** A file of that name is there already. */
	| {readonly is: 'overwriting'; readonly file: string}
	| {readonly is: 'forgetting'};

/** What an entry field asks for. */
export type Asked = 'file' | 'notes' | 'directory' | 'seen' | 'log';

export type Session = {
	readonly history: History<Documents>;
	readonly place: Place;
	readonly over: Over | undefined;
	/** The row under the cursor, by name; undefined: what is in the car. */
	readonly row: string | undefined;
	/** The row that the one under the cursor is compared with. */
	readonly comparison: string | undefined;
	/** The row that was chosen. */
	readonly plan: string | undefined;
	readonly order: Order;
	readonly filter: Filter;
	/** Undefined: the worst over all. */
	readonly situation: string | undefined;
	/** The chance of passing the RPM limit that is accepted, a share of 1; undefined: the ranking goes by the numbers as they are. */
	readonly risk: number | undefined;
	/** Ids of the tracks that lie ahead; undefined: the one that is looked at. */
	readonly ahead: readonly string[] | undefined;
	/** An entry of the history that was begun. */
	readonly draft: Draft | undefined;
	/** What was seen in practice, of the track that it names. */
	readonly practice: Practice | undefined;
	readonly units: UnitSystem;
	/** What the last key did, where the screen does not show it by itself. */
	readonly notice: string | undefined;
};

export const startSession = (documents: Documents, units: UnitSystem): Session => ({
	history: startHistory(documents),
	place: {at: 'ranking'},
	over: undefined,
	row: undefined,
	comparison: undefined,
	plan: current(documents, 'track').plan,
	order: 'place',
	filter: noFilter,
	situation: undefined,
	risk: undefined,
	ahead: undefined,
	draft: undefined,
	practice: undefined,
	units,
	notice: undefined,
});
