/** What the tracks ahead ask for, worked out in slices while keys are answered. Loaded only where it is looked at. */

import type {JsonObject} from '../../documents/json.ts';
import type {Car} from '../../drivetrain/car.ts';
import type {Track} from '../../drivetrain/track.ts';
import {gearboxSteps} from '../../loading/choose-gearbox.ts';
import type {GearboxAnswer} from '../../loading/gearbox-results.ts';
import {loadList} from '../../loading/load-list.ts';
import {type RankedTrack, rankedTrack} from '../../loading/load-needs.ts';
import {defaultStepRatio, type LoadList} from '../../loading/load-results.ts';
import {rankSteps} from '../../planning/rank-rack.ts';
import type {Fault, Ranking} from '../../planning/results.ts';
import {type AheadPlace, aheadIn, isAhead} from './ahead-place.ts';
import type {Choice} from './catalog.ts';
import {current} from './documents.ts';
import {readCarOf, readTrackOf} from './forms.ts';
import type {Clock} from './ranker.ts';
import type {Session} from './session.ts';

export type AheadState =
	| {readonly is: 'empty'}
	/** How far it is, as a part of 1. */
	| {readonly is: 'working'; readonly part: number}
	| {readonly is: 'faulty'; readonly words: readonly string[]}
	| {readonly is: 'load'; readonly list: LoadList}
	| {readonly is: 'gears'; readonly answer: GearboxAnswer};

/** What an answer depends on: the place's choices, the car, the tracks. */
type Wanted = {readonly place: AheadPlace; readonly car: JsonObject; readonly tracks: readonly JsonObject[]};

type Steps = Generator<number, AheadState, void>;

/** Short enough that no key waits noticeably. */
const sliceMs = 12;
/** A drawing costs as much as a slice: progress is told no more often than this. */
const tellMs = 120;

/** The best and the next best ones. */
const toldSets = 3;

export class Ahead {
	readonly #clock: Clock;
	readonly #changed: () => void;
	#wanted: Wanted | undefined;
	#state: AheadState = {is: 'empty'};
	#cancel: (() => void) | undefined;
	#told = 0;
	/** By the content of the track; of one car. */
	#rankings = new WeakMap<JsonObject, Ranking>();

	constructor(clock: Clock, changed: () => void) {
		this.#clock = clock;
		this.#changed = changed;
	}

	/** What is known so far of what the session asks for; what is missing is begun. */
	of(session: Session, choices: readonly Choice[]): AheadState {
		const {place, history} = session;
		if (!isAhead(place)) return {is: 'empty'};
		const ids = aheadIn(session);
		const tracks = choices.filter(({document}) => ids.includes(document.id)).map(({document}) => document.json);
		const wanted = {place, car: current(history.present, 'car').json, tracks};
		if (this.#wanted === undefined || !isSame(wanted, this.#wanted)) this.#begin(wanted);
		return this.#state;
	}

	#begin(wanted: Wanted): void {
		this.#cancel?.();
		this.#cancel = undefined;
		if (wanted.car !== this.#wanted?.car) this.#rankings = new WeakMap();
		this.#wanted = wanted;
		if (wanted.tracks.length === 0) {
			this.#state = {is: 'empty'};
			return;
		}
		this.#state = {is: 'working', part: 0};
		this.#told = this.#clock.now();
		this.#later(this.#steps(wanted));
	}

	#later(steps: Steps): void {
		this.#cancel = this.#clock.later(() => {
			if (!this.#slice(steps)) this.#later(steps);
			const now = this.#clock.now();
			if (this.#state.is === 'working' && now - this.#told < tellMs) return;
			this.#told = now;
			this.#changed();
		});
	}

	/** At least one step; whether it was the last. */
	#slice(steps: Steps): boolean {
		const end = this.#clock.now() + sliceMs;
		do {
			const step = steps.next();
			this.#state = step.done ? step.value : {is: 'working', part: step.value};
			if (step.done) return true;
		} while (this.#clock.now() < end);
		return false;
	}

	*#steps({place, car: carJson, tracks: jsons}: Wanted): Steps {
		const car = readCarOf(carJson);
		const tracks = jsons.map(json => ({json, reading: readTrackOf(json)}));
		const unread = tracks
			.filter(({reading}) => !reading.ok)
			.map(({json}) => `${nameOf(json)}: has things to put right.`);
		if (!car.ok || unread.length > 0)
			return {is: 'faulty', words: [...(car.ok ? [] : ['The car has things to put right.']), ...unread]};
		const read = tracks.flatMap(({json, reading}) =>
			reading.ok ? [{json, name: nameAmong(jsons, json), track: reading.value}] : [],
		);
		return place.at === 'load' ? yield* this.#load(place, car.value, read) : yield* gears(place, car.value, read);
	}

	*#load({shorter, taller, eachSet}: AheadPlace & {at: 'load'}, car: Car, tracks: readonly Read[]): Steps {
		const ranked: RankedTrack[] = [];
		for (const [i, {json, name, track}] of tracks.entries()) {
			const known = this.#rankings.get(json);
			if (known === undefined) {
				const ranking = yield* rankingOf(car, track, i, tracks.length);
				if (!ranking.ok) return faulty(name, ranking.faults);
				this.#rankings.set(json, ranking.value);
			}
			ranked.push(rankedTrack(name, track, this.#rankings.get(json)!));
		}
		const options = {shorter, taller, eachSet, withinS: undefined, stepRatio: defaultStepRatio, gearbox: undefined};
		return {is: 'load', list: loadList(car, ranked, options)};
	}
}

type Read = {readonly json: JsonObject; readonly name: string; readonly track: Track};

function* rankingOf(car: Car, track: Track, index: number, count: number) {
	const steps = rankSteps(car, track);
	for (;;) {
		const step = steps.next();
		if (!step.done) yield (index + step.value.done / Math.max(1, step.value.total)) / count;
		else return step.value.ok ? {ok: true as const, value: step.value.value.ranking} : step.value;
	}
}

function* gears({together}: AheadPlace & {at: 'gears'}, car: Car, tracks: readonly Read[]): Steps {
	const answer = yield* gearboxSteps(car, tracks, {pair: undefined, together, count: toldSets});
	return answer.ok ? {is: 'gears', answer: answer.value} : faulty('', answer.faults);
}

const faulty = (name: string, faults: readonly Fault[]): AheadState => ({
	is: 'faulty',
	words: faults.map(
		({document, path, found, allowed}) =>
			`${[document === 'track' ? name : document, path].filter(Boolean).join(': ')}: found ${found}; allowed ${allowed}`,
	),
});

const nameOf = ({name}: JsonObject): string => (typeof name === 'string' ? name : 'no name');

/** Its name, with a number where several have the same. */
function nameAmong(all: readonly JsonObject[], one: JsonObject): string {
	const same = all.filter(other => nameOf(other) === nameOf(one));
	return same.length === 1 ? nameOf(one) : `${nameOf(one)} (${same.indexOf(one) + 1})`;
}

/** Cursor and scrolling change no answer. */
function isSame(one: Wanted, other: Wanted): boolean {
	const choices = ({place: {cursor: _, scroll: __, ...rest}}: Wanted) => JSON.stringify(rest);
	return (
		one.car === other.car &&
		choices(one) === choices(other) &&
		one.tracks.length === other.tracks.length &&
		one.tracks.every((track, i) => track === other.tracks[i])
	);
}
