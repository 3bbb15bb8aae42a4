/** Keeps for the screen what was changed there: the unsaved session after every change, documents when they are saved. */
import {visible} from '../documents/visible.ts';
import type {Saving} from '../screens/errands.ts';
import type {Chosen, Keeper} from '../screens/keeper.ts';
import type {Documents, OpenDocument} from '../screens/session/documents.ts';
import {restored} from '../screens/session/restore.ts';
import {problemText, type StoreProblem} from '../store/answer.ts';
import {sameSpelling} from '../store/file-name.ts';
import type {Named, Preset, SavedCar} from '../store/kept-documents.ts';
import {keptNamed, listKept} from '../store/list-kept.ts';
import {type SaveAnswer, saveKept} from '../store/save-kept.ts';
import {dropSession, keepSession, sessionFolder, unsavedSessions} from '../store/session.ts';
import {forgetSaved, type screenErrands} from './screen-errands.ts';

/** `errands` are those that need no knowledge of what was read when. */
export function screenKeeper(home: string, errands: ReturnType<typeof screenErrands>): Keeper {
	const earlier = unsavedSessions(home)
		.sessions.map(({file, document}) => ({file, documents: restored(document)}))
		.find(({documents}) => documents !== undefined);
	const bases = new Bases(home);
	const session = new KeptSession(home);
	// A write that waits is made before the process ends.
	process.on('exit', () => session.write());
	return {
		keep: documents => session.keep(documents),
		drop: () => session.drop(),
		earlier: earlier?.documents,
		dropEarlier: () => earlier && dropSession(home, earlier.file),
		save: (document, chosen) => save(home, bases, document, chosen),
		errands: {
			...errands,
			forget: (kind, name) => {
				const saving = forgetSaved(home, kind, name, bases.get(kind, name));
				if (saving.ok) bases.forget(kind, name);
				return saving;
			},
		},
		where: () => {
			session.write();
			return session.isKept ? sessionFolder(home) : undefined;
		},
	};
}

/** The session of this process. It is written once the frame is out; of several changes until then the last one counts. */
class KeptSession {
	isKept = false;
	readonly #home: string;
	#waiting: Documents | undefined;

	constructor(home: string) {
		this.#home = home;
	}

	keep(documents: Documents): void {
		if (this.#waiting === undefined) setImmediate(() => this.write());
		this.#waiting = documents;
	}

	drop(): void {
		this.#waiting = undefined;
		if (this.isKept) dropSession(this.#home);
		this.isKept = false;
	}

	write(): void {
		if (this.#waiting === undefined) return;
		// Where there is no room for it, the session goes on in memory; saving will say why.
		this.isKept = keepSession(this.#home, this.#waiting, new Date().toISOString()) === undefined;
		this.#waiting = undefined;
	}
}

/** From which revision of its file each document was read: another copy may have saved since. */
class Bases {
	readonly #revisions = new Map<string, string>();

	constructor(home: string) {
		for (const {name, revision} of listKept(home, 'preset').kept) this.set('track', name, revision);
		for (const {name, revision} of listKept(home, 'saved-car').kept) this.set('car', name, revision);
	}

	get(kind: string, name: string): string | undefined {
		return this.#revisions.get(`${kind} ${sameSpelling(name)}`);
	}

	forget(kind: string, name: string): void {
		this.#revisions.delete(`${kind} ${sameSpelling(name)}`);
	}

	set(kind: string, name: string, revision: string): void {
		this.#revisions.set(`${kind} ${sameSpelling(name)}`, revision);
	}
}

function save(
	home: string,
	bases: Bases,
	{kind, json, saved: before, shipped, notes}: OpenDocument,
	{car, plan}: Chosen,
): Saving {
	const document = json as unknown as Named;
	const {name} = document;
	if (typeof name !== 'string' || name.trim() === '')
		return {ok: false, words: `A ${kind} without a name cannot be saved.`};
	const saved = new Date().toISOString();
	const basedOn = typeof shipped?.name === 'string' ? shipped.name : undefined;
	const base = bases.get(kind, name);
	const answer: SaveAnswer<Preset> | SaveAnswer<SavedCar> =
		kind === 'track'
			? saveKept(home, presetOf(home, document, {car, plan, notes, isNew: before === undefined, saved, basedOn}), base)
			: saveKept(home, carOf(home, document, saved, basedOn), base);
	if (answer.kind === 'saved') bases.set(kind, name, answer.kept.revision);
	if (answer.kind === 'changed' && answer.theirs) bases.set(kind, name, answer.theirs.revision);
	return savingOf(visible(name), answer);
}

/** Of a document that is new here the notes of a saved one of its name stay, where it has none itself. */
type Beside = Chosen & {notes: string | undefined; isNew: boolean; saved: string; basedOn: string | undefined};

function presetOf(home: string, track: Named, {car, plan, notes, isNew, saved, basedOn}: Beside): Preset {
	const before = keptNamed(home, 'preset', track.name)?.document;
	// "33/38 Set A": the name of a set may hold blanks, a pair does not.
	const [, pair, gearbox] = /^(\S+) (.*)$/.exec(plan ?? '') ?? [];
	return {
		kind: 'preset',
		version: 1,
		track,
		car,
		pair,
		gearbox,
		notes: notes ?? (isNew ? before?.notes : undefined),
		basedOn: before?.basedOn ?? basedOn,
		saved,
	};
}

function carOf(home: string, car: Named, saved: string, basedOn: string | undefined): SavedCar {
	const before = keptNamed(home, 'saved-car', car.name)?.document;
	return {kind: 'saved-car', version: 1, car, notes: before?.notes, basedOn: before?.basedOn ?? basedOn, saved};
}

function savingOf(
	name: string,
	answer: {kind: 'saved'} | {kind: 'changed'} | {kind: 'failed'; problem: StoreProblem},
): Saving {
	if (answer.kind === 'saved') return {ok: true, words: `${name} is saved.`};
	if (answer.kind === 'failed') return {ok: false, words: problemText(answer.problem)};
	return {
		ok: false,
		words: `${name} was saved elsewhere meanwhile: nothing was written. Ctrl+S again takes yours, theirs stays beside it as .bak.`,
	};
}
