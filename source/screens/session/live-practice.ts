/** The practice of a running session: what it teaches, and what the ranking would be with it, worked out beside the keys. */
import type {Ranked} from '../../planning/rank-rack.ts';
import {type Effect, effectOf} from '../../practice/learn/effect.ts';
import type {Documents} from './documents.ts';
import {straightNames} from './practice-of.ts';
import {type Clock, Ranker} from './ranker.ts';
import type {Session} from './session.ts';
import {linesOf, type Taught} from './taught.ts';

type Teaching = typeof import('./teaching.ts');

export type PracticeScene = {
	/** Undefined until it is loaded, and where the documents cannot be read. */
	readonly taught: Taught | undefined;
	/** What accepting all does to the ranking; `working` while it is worked out, undefined where nothing would change. */
	readonly effect: Effect | 'working' | undefined;
	/** Lines that the cursor moves over. */
	readonly lines: number;
};

export class LivePractice {
	readonly #clock: Clock;
	readonly #changed: () => void;
	#loaded: Teaching | undefined;
	#loading: Promise<void> | undefined;
	/** Ranks the documents with what was learned in them. */
	#ranker: Ranker | undefined;
	#ranks: {readonly documents: Documents; readonly situation: string | undefined} | undefined;

	constructor(clock: Clock, changed: () => void) {
		this.#clock = clock;
		this.#changed = changed;
	}

	get teaching(): Teaching | undefined {
		return this.#loaded;
	}

	/** `ranked` is the ranking as it stands, `isReady` whether it is of these very documents. */
	scene(session: Session, ranked: Ranked | undefined, isReady: boolean): PracticeScene | undefined {
		const {place} = session;
		if (place.at !== 'practice') return undefined;
		this.#loading ??= import('./teaching.ts').then(teaching => {
			this.#loaded = teaching;
			this.#changed();
		});
		const taught = this.#loaded?.taughtIn(session);
		const straights = straightNames(session).length;
		const lines = place.pane === 'changes' && taught ? linesOf(taught).length : straights;
		if (taught?.after === undefined) return {taught, effect: undefined, lines};
		this.#rank(taught.after, session.situation);
		const answer = this.#ranker!.answer;
		const effect =
			answer.is === 'ready' && isReady && ranked ? effectOf(ranked.ranking, answer.ranked.ranking) : 'working';
		return {taught, effect: answer.is === 'faulty' ? undefined : effect, lines};
	}

	#rank(documents: Documents, situation: string | undefined): void {
		if (this.#ranks?.documents === documents && this.#ranks.situation === situation) return;
		this.#ranks = {documents, situation};
		this.#ranker ??= new Ranker(this.#clock, this.#changed);
		this.#ranker.start(this.#ranks);
	}
}
