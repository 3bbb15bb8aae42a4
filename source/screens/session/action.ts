/** What may happen to a session, named by intention. */

import type {Edit} from '../../documents/edits.ts';
import type {Held} from '../../practice/learn/seen.ts';
import type {HistoryEntry} from '../../store/kept-documents.ts';
import type {UnitSystem} from '../../text/units.ts';
import type {KeyEvent} from '../terminal/key-event.ts';
import type {Documents, Kind, OpenDocument} from './documents.ts';
import type {Item} from './hand-over.ts';
import type {Pane, PracticeLog} from './practice.ts';
import type {Filter, Order} from './rows.ts';
import type {Over, Place} from './session.ts';
import type {Incoming} from './take-in.ts';
import type {Draft, DraftField} from './track-history.ts';

export type Action =
	| {readonly do: 'go'; readonly place: Place}
	| {readonly do: 'cover'; readonly over: Over | undefined}
	| {readonly do: 'tell'; readonly notice: string}
	| {readonly do: 'selectRow'; readonly row: string}
	| {readonly do: 'compareWith'; readonly row: string | undefined}
	| {readonly do: 'plan'; readonly row: string | undefined}
	| {readonly do: 'install'; readonly pair: string; readonly gearbox: string}
	| {readonly do: 'order'; readonly order: Order}
	| {readonly do: 'filter'; readonly filter: Filter}
	| {readonly do: 'situate'; readonly situation: string | undefined}
	| {readonly do: 'read in'; readonly units: UnitSystem}
	| {readonly do: 'take'; readonly document: OpenDocument}
	| {readonly do: 'start new'; readonly kind: Kind}
	| {readonly do: 'recover'; readonly documents: Documents}
	/** As it was written, and with which plan. */
	| {readonly do: 'saved'; readonly document: OpenDocument; readonly plan: string | undefined}
	| {readonly do: 'undo'}
	| {readonly do: 'redo'}
	/** Typed into whatever takes text: a field, the search, the least margin. */
	| {readonly do: 'type'; readonly event: KeyEvent}
	| {readonly do: 'move in form'; readonly sections: number; readonly rows: number; readonly columns: number}
	/** With what stands there, or with what was typed in its place. */
	| {readonly do: 'open field'; readonly text?: string}
	/** And then on by so many rows or columns. */
	| {readonly do: 'accept field'; readonly rows: number; readonly columns: number}
	| {readonly do: 'put back'}
	| {readonly do: 'clear field'}
	| {readonly do: 'to shipped'}
	| {readonly do: 'add entry'}
	| {readonly do: 'remove entry'}
	| {readonly do: 'move entry'; readonly by: 1 | -1}
	| {readonly do: 'paste curve'; readonly text: string}
	| {readonly do: 'move choice'; readonly by: number}
	| {readonly do: 'accept margin'}
	| {readonly do: 'accept risk'}
	| {readonly do: 'show item'; readonly item: Item}
	| {readonly do: 'scroll'; readonly by: number}
	| {readonly do: 'note'; readonly text: string}
	/** What was typed into an entry field, or as the name of a plan's file, does not do. */
	| {readonly do: 'refuse'; readonly wrong: string}
	| {readonly do: 'show incoming'; readonly incoming: Incoming}
	| {readonly do: 'read another'}
	| {readonly do: 'take over'}
	| {readonly do: 'show history'; readonly entries: readonly HistoryEntry[]}
	/** On with the draft of this track, else with a new one. */
	| {readonly do: 'draft'; readonly draft: Draft}
	| {readonly do: 'move in draft'; readonly by: 1 | -1}
	| {readonly do: 'leave draft'}
	| {readonly do: 'refuse draft'; readonly field: DraftField; readonly wrong: string}
	/** A number seen on a straight; undefined takes it away. */
	| {readonly do: 'see'; readonly straight: string; readonly text: string | undefined}
	| {readonly do: 'hold'; readonly held: Held}
	| {readonly do: 'learn grip'; readonly grip: boolean}
	| {readonly do: 'show log'; readonly log: PracticeLog | undefined}
	| {readonly do: 'show pane'; readonly pane: Pane}
	| {readonly do: 'move in practice'; readonly by: number; readonly count: number}
	/** Edits of both documents, with the words that say what they were. */
	| {readonly do: 'learn'; readonly edits: Readonly<Record<Kind, readonly Edit[]>>; readonly notice: string}
	| {readonly do: 'whole to'; readonly which: 'saved' | 'shipped'}
	/** The track of that id lies ahead, or no longer. */
	| {readonly do: 'toggle ahead'; readonly id: string}
	/** A saved document is no more. */
	| {readonly do: 'forgotten'; readonly document: OpenDocument};
