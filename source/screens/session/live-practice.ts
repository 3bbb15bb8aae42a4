/** The practice of a running session: what it teaches, and what the ranking would be with it, worked out beside the keys. */

import type {JsonObject} from '../../documents/json.ts';
import type {Ranked} from '../../planning/rank-rack.ts';
import {type Effect, effectOf} from '../../practice/learn/effect.ts';
import {current, type Documents} from './documents.ts';
import {LogJob} from './log-job.ts';
import type {Practice} from './practice.ts';
import {practiceOf, straightNames} from './practice-of.ts';
import {type Clock, Ranker} from './ranker.ts';
import type {Session} from './session.ts';
import {Slices} from './slices.ts';
import {linesOf, type Taught} from './taught.ts';

type Teaching = typeof import('./teaching.ts');

export type PracticeScene = {
	/** Undefined until it is loaded and worked out, and where the documents cannot be read. */
	readonly taught: Taught | undefined;
	/** What accepting all does to the ranking; `working` while it is worked out, undefined where nothing would change. */
	readonly effect: Effect | 'working' | undefined;
	/** Lines that the cursor moves over. */
	readonly lines: number;
};

/** What a lesson depends on. */
type Inputs = {
	readonly track: JsonObject;
	readonly car: JsonObject;
	readonly practice: Practice;
	readonly units: Session['units'];
};

/** What is worked out within this is shown in the same frame as the key. */
const firstSliceMs = 20;

export class LivePractice {
	readonly #clock: Clock;
	readonly #changed: () => void;
	/** The log that is being read. */
	readonly job: LogJob;
	readonly #teaching: Slices;
	#inputs: Inputs | undefined;
	#taught: Taught | undefined;
	#loaded: Teaching | undefined;
	#loading: Promise<void> | undefined;
	/** Ranks the documents with what was learned in them. */
	#ranker: Ranker | undefined;
	#ranks: {readonly documents: Documents; readonly situation: string | undefined} | undefined;

	constructor(clock: Clock, changed: () => void) {
		this.#clock = clock;
		this.#changed = changed;
		this.job = new LogJob(clock);
		this.#teaching = new Slices(clock);
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
		const taught = this.#loaded && this.#taughtIn(session, this.#loaded);
		const straights = straightNames(session).length;
		const lines = place.pane === 'changes' && taught ? linesOf(taught).length : straights;
		if (taught?.after === undefined) return {taught, effect: undefined, lines};
		this.#rank(taught.after, session.situation);
		const answer = this.#ranker!.answer;
		const effect =
			answer.is === 'ready' && isReady && ranked ? effectOf(ranked.ranking, answer.ranked.ranking) : 'working';
		return {taught, effect: answer.is === 'faulty' ? undefined : effect, lines};
	}

	/** Undefined while it is being worked out; once for the same content. */
	#taughtIn(session: Session, {teachSteps}: Teaching): Taught | undefined {
		const {present} = session.history;
		const [track, car] = [current(present, 'track').json, current(present, 'car').json];
		const inputs = {track, car, practice: practiceOf(session), units: session.units};
		if (this.#inputs !== undefined && isSame(this.#inputs, inputs)) return this.#taught;
		this.#inputs = inputs;
		this.#taught = undefined;
		this.#teaching.start(
			teachSteps(session),
			firstSliceMs,
			() => {},
			(taught, atOnce) => {
				this.#taught = taught;
				if (!atOnce) this.#changed();
			},
		);
		return this.#taught;
	}

	#rank(documents: Documents, situation: string | undefined): void {
		if (this.#ranks?.documents === documents && this.#ranks.situation === situation) return;
		this.#ranks = {documents, situation};
		this.#ranker ??= new Ranker(this.#clock, this.#changed);
		this.#ranker.start(this.#ranks);
	}
}

const isSame = (one: Inputs, other: Inputs): boolean =>
	one.track === other.track &&
	one.car === other.car &&
	one.units === other.units &&
	one.practice.log === other.practice.log &&
	one.practice.held === other.practice.held &&
	one.practice.grip === other.practice.grip &&
	JSON.stringify(one.practice.seen) === JSON.stringify(other.practice.seen);
