/** A session that runs: its state, the answer that follows from it, and who is told when either changes. */
import type {OneTooth} from '../../odds/one-tooth.ts';
import {type Ranked, rowName} from '../../planning/rank-rack.ts';
import type {Keeper} from '../keeper.ts';
import {type ActionName, actionFor} from '../keys/key-table.ts';
import {type KeyEvent, keyName} from '../terminal/key-event.ts';
import type {Action} from './action.ts';
import type {AheadState} from './ahead.ts';
import {isAhead} from './ahead-place.ts';
import {type Answer, rankedIn} from './answer.ts';
import {type Choice, choicesFor} from './catalog.ts';
import {current, type Documents, isChanged, type OpenDocument, titleOf, unsaved} from './documents.ts';
import type {Effect, ErrandEffect} from './effect.ts';
import {type Errandful, errandEffects, readPlan} from './errand-effects.ts';
import {readTrackOf} from './forms.ts';
import {type Handed, rowToHandOver} from './hand-over.ts';
import {scopesOf, takesText} from './held-scopes.ts';
import {intend, type Scene} from './intend.ts';
import {seenEntry} from './intend-practice.ts';
import {LivePractice, type PracticeScene} from './live-practice.ts';
import {Odder} from './odder.ts';
import type {OddsShown, OddsSoFar} from './odds-asked.ts';
import {practiceEffects} from './practice-effects.ts';
import {type Clock, Ranker} from './ranker.ts';
import {reduce} from './reduce.ts';
import {cursorIn, type Filter, type Order, type Placed, placedRows, shownRows} from './rows.ts';
import type {Session} from './session.ts';
import {looksLikePlan} from './take-in.ts';

/** What only the terminal can do. */
export type Outside = {
	leave(): void;
	suspend(): void;
	redraw(): void;
};

export type State = {
	readonly session: Session;
	readonly answer: Answer;
	readonly scene: Scene & {
		readonly handed: Handed | undefined;
		readonly odds: OddsShown | undefined;
		readonly practice: PracticeScene | undefined;
		readonly ahead: AheadState | undefined;
	};
};

export class LiveSession {
	#state: State;
	readonly #ranker: Ranker;
	readonly #odder: Odder;
	readonly #catalog: readonly OpenDocument[];
	readonly #keeper: Keeper;
	readonly #outside: Outside;
	readonly #listeners = new Set<() => void>();
	readonly #errandful: Errandful;
	/** Loaded once there is something to hand over: most sessions never have. */
	#handing: typeof import('./handing.ts') | undefined;
	#handingLoad: Promise<void> | undefined;
	readonly #practice: LivePractice;
	/** Loaded when the tracks ahead are first looked at. */
	#ahead: import('./ahead.ts').Ahead | undefined;
	#aheadLoad: Promise<void> | undefined;
	readonly #clock: Clock;
	#placed: {readonly ranked: Ranked; readonly odds: OddsShown['odds']; readonly rows: Placed[]} | undefined;
	#shown:
		| {readonly all: readonly Placed[]; readonly order: Order; readonly filter: Filter; readonly rows: Placed[]}
		| undefined;

	constructor(session: Session, catalog: readonly OpenDocument[], keeper: Keeper, outside: Outside, clock: Clock) {
		this.#catalog = catalog;
		this.#keeper = keeper;
		this.#outside = outside;
		this.#clock = clock;
		this.#ranker = new Ranker(clock, () => this.#settle(this.#state.session));
		this.#odder = new Odder(clock, () => this.#settle(this.#state.session));
		this.#practice = new LivePractice(clock, () => this.#settle(this.#state.session));
		this.#ranker.start(inputsOf(session));
		this.#state = this.#stateOf(session);
		const {errands} = keeper;
		this.#errandful = {state: this.state, dispatch: action => this.dispatch(action), catalog, errands};
		this.#effects = {
			...this.#ownEffects,
			...errandEffects(this.#errandful),
			...practiceEffects(this.#errandful, {teaching: () => this.#practice.teaching, job: this.#practice.job}),
		};
	}

	readonly state = (): State => this.#state;

	readonly subscribe = (listener: () => void): (() => void) => {
		this.#listeners.add(listener);
		return () => this.#listeners.delete(listener);
	};

	/** A key or a paste; what means nothing here is passed over. */
	press(event: KeyEvent): void {
		const {session, scene} = this.#state;
		const key = keyName(event);
		const name = key === undefined ? undefined : actionFor(key, scopesOf(session));
		if (name !== undefined) this.#perform(intend(name, session, scene));
		else if (event.kind === 'paste' && this.#isPlan(event.text)) void readPlan('paste', event.text, this.#errandful);
		else if (takesText(session)) this.dispatch({do: 'type', event});
		else if (startsNumber(event) && session.place.at === 'edit') this.dispatch({do: 'open field', text: event.text});
		else if (startsNumber(event) && isAtNumbers(session)) this.dispatch(seenEntry(session, event.text));
		else if (event.kind === 'paste') this.dispatch({do: 'paste curve', text: event.text});
	}

	/** Whether a paste is a plan to be taken in. */
	#isPlan(text: string): boolean {
		const {place, over} = this.#state.session;
		return place.at === 'take in' && over === undefined && looksLikePlan(text);
	}

	/** As if its key had been pressed. */
	perform(name: ActionName): void {
		this.#perform(intend(name, this.#state.session, this.#state.scene));
	}

	dispatch(action: Action): void {
		const before = this.#state.session;
		const session = reduce(before, action);
		const documents = session.history.present;
		const edited = documents !== before.history.present;
		const isOther = session.situation !== before.situation || !sameContent(documents, before.history.present);
		if (isOther) this.#ranker.rank(inputsOf(session));
		// What 'saved' marks is no edit: `#save` keeps by itself.
		if (edited && action.do !== 'saved') this.#keep(session);
		if (action.do === 'recover') this.#keeper.dropEarlier();
		this.#settle(session);
	}

	#perform(intent: Action | Effect | undefined): void {
		if (intent === undefined) return;
		if (typeof intent !== 'string') this.dispatch(intent);
		else this.#effects[intent]();
	}

	readonly #effects: Record<Effect, () => void>;

	readonly #ownEffects: Record<Exclude<Effect, ErrandEffect>, () => void> = {
		leave: () => this.#outside.leave(),
		'discard and leave': () => {
			this.#keeper.drop();
			this.#outside.leave();
		},
		save: () => void this.#save(),
		'save and leave': () => {
			if (this.#save()) this.#outside.leave();
		},
		suspend: () => this.#outside.suspend(),
		redraw: () => {
			if (this.#state.answer.is === 'stopped') this.#ranker.rank(inputsOf(this.#state.session));
			this.#settle(this.#state.session);
			this.#outside.redraw();
		},
		stop: () => {
			this.#ranker.stop();
			this.#settle(this.#state.session);
		},
		'take choice': () => {
			const {session, scene} = this.#state;
			const choice = session.place.at === 'choose' ? scene.choices[session.place.cursor] : undefined;
			if (choice) this.dispatch({do: 'take', document: choice.document});
		},
		'forget recovery': () => {
			this.#keeper.dropEarlier();
			this.dispatch({do: 'cover', over: undefined});
		},
	};

	/** Everything that was changed, one document after the other; whether all of it was saved. */
	#save(): boolean {
		const {history, plan} = this.#state.session;
		const track = current(history.present, 'track');
		const changed = unsaved(history.present);
		const documents = plan === track.plan || changed.includes(track) ? changed : [...changed, track];
		const car = titleOf(current(history.present, 'car'));
		const savings = documents.map(document => {
			const chosen = document === track ? plan : document.plan;
			const saving = this.#keeper.save(document, {car, plan: chosen});
			if (saving.ok) this.dispatch({do: 'saved', document, plan: chosen});
			return saving;
		});
		this.#keep(this.#state.session);
		this.dispatch({do: 'cover', over: undefined});
		const words = savings.length === 0 ? ['Nothing has changed since it was saved.'] : savings.map(({words}) => words);
		this.dispatch({do: 'tell', notice: words.join(' ')});
		return savings.every(({ok}) => ok);
	}

	#keep({history}: Session): void {
		if (Object.values(history.present.open).some(isChanged)) this.#keeper.keep(history.present);
		else this.#keeper.drop();
	}

	#settle(session: Session): void {
		this.#state = this.#stateOf(session);
		for (const listener of this.#listeners) listener();
	}

	#stateOf(session: Session): State {
		const {answer} = this.#ranker;
		const ranked = rankedIn(answer);
		const odds = answer.is === 'ready' ? this.#oddsOf(session, answer.ranked) : undefined;
		const all = ranked === undefined ? firstRow(answer) : this.#placedIn(ranked, session.risk, odds);
		const documents = session.history.present;
		const track = readTrackOf(documents.open[documents.track]!.json);
		const scene: Scene = {
			ranked,
			all,
			shown: this.#shownOf(all, session),
			situations: track.ok ? track.value.situations.map(({name}) => name) : [],
			choices: this.#choicesIn(session),
			isWorking: answer.is === 'working',
			practiceLines: 0,
			isReadingLog: this.#practice.job.isUnderWay,
		};
		const practice = this.#practice.scene(session, rankedIn(answer), answer.is === 'ready');
		const handed = answer.is === 'ready' ? this.#handed(session, scene, answer.ranked) : undefined;
		const ahead = this.#aheadOf(session, scene.choices);
		const oddsShown = odds && {...odds, tooth: this.#toothOf(scene.shown, session)};
		const practiceLines = practice?.lines ?? 0;
		return {session, answer, scene: {...scene, practiceLines, handed, odds: oddsShown, practice, ahead}};
	}

	#choicesIn({place, history}: Session): Choice[] {
		if (place.at === 'choose') return choicesFor(this.#catalog, history.present, place.kind, place.search.text);
		return isAhead(place) ? choicesFor(this.#catalog, history.present, 'track', '') : [];
	}

	#aheadOf(session: Session, choices: readonly Choice[]): AheadState | undefined {
		if (!isAhead(session.place)) return undefined;
		this.#aheadLoad ??= import('./ahead.ts').then(({Ahead}) => {
			this.#ahead = new Ahead(this.#clock, () => this.#settle(this.#state.session));
			this.#settle(this.#state.session);
		});
		return this.#ahead?.of(session, choices);
	}

	/** Of an answer that is of a moment ago nothing is handed over. */
	#handed(session: Session, {all, shown}: Pick<Scene, 'all' | 'shown'>, ranked: Ranked): Handed | undefined {
		const {place} = session;
		if (place.at !== 'hand over') return undefined;
		this.#handingLoad ??= import('./handing.ts').then(handing => {
			this.#handing = handing;
			this.#settle(this.#state.session);
		});
		const row = rowToHandOver(session.plan, all, shown[cursorIn(shown, session.row)]);
		return row && this.#handing?.handed(session, place, row.placed.name, ranked);
	}

	/** The same list as long as nothing about it has changed: what is made of it is kept with it. */
	#shownOf(all: readonly Placed[], {order, filter}: Session): Placed[] {
		const known = this.#shown;
		if (known?.all === all && known.order === order && known.filter === filter) return known.rows;
		this.#shown = {all, order, filter, rows: shownRows(all, order, filter)};
		return this.#shown.rows;
	}

	/** In the order of the risk once its odds are complete: rows do not move while they are refined. */
	#placedIn(ranked: Ranked, risk: number | undefined, shown: OddsSoFar | undefined): Placed[] {
		const odds = risk !== undefined && shown?.odds?.isComplete === true ? shown.odds : undefined;
		if (this.#placed?.ranked !== ranked || this.#placed.odds !== odds) {
			const byRisk = odds && this.#odder.work?.placedByRisk(ranked, odds, risk!);
			this.#placed = {ranked, odds, rows: byRisk ?? placedRows(ranked.ranking.rows)};
		}
		return this.#placed.rows;
	}

	/** Where they are looked at, or order the ranking. */
	#oddsOf({history, situation, risk, place}: Session, ranked: Ranked): OddsSoFar | undefined {
		if (place.at !== 'odds' && risk === undefined) return undefined;
		return this.#odder.soFar({documents: history.present, situation, risk, ranked});
	}

	/** Of the row under the cursor, where it is looked at. */
	#toothOf(shown: readonly Placed[], {place, row}: Session): OneTooth | undefined {
		const here = shown[cursorIn(shown, row)];
		return place.at === 'odds' && here !== undefined ? this.#odder.tooth(here.name) : undefined;
	}
}

/** A number typed on a field takes the place of what stood there. */
const startsNumber = (event: KeyEvent): event is KeyEvent & {kind: 'text'} =>
	event.kind === 'text' && /^[\d.]$/.test(event.text);

const isAtNumbers = ({place, over}: Session): boolean =>
	place.at === 'practice' && place.pane === 'numbers' && over === undefined;

/** Before the rack has been ranked there is the pair in the car. */
const firstRow = (answer: Answer): Placed[] =>
	answer.is === 'working' && answer.first !== undefined
		? [{place: undefined, name: rowName(answer.first.row), row: answer.first.row}]
		: [];

/** Whether there is nothing to rank anew. */
const sameContent = (one: Documents, other: Documents): boolean =>
	(['track', 'car'] as const).every(
		kind => one[kind] === other[kind] && current(one, kind).json === current(other, kind).json,
	);

const inputsOf = ({history, situation}: Session) => ({documents: history.present, situation});
