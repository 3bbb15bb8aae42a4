/** What the session has done for it outside: each asks an errand, and tells what came of it. */

import {isObject} from '../../documents/json.ts';
import type {Errands, Writing} from '../errands.ts';
import type {Action} from './action.ts';
import {current, type OpenDocument, titleOf} from './documents.ts';
import type {ErrandEffect} from './effect.ts';
import {type Handed, items} from './hand-over.ts';
import type {Scene} from './intend.ts';
import type {PracticeScene} from './live-practice.ts';
import {cursorIn} from './rows.ts';
import type {Session} from './session.ts';
import {ownAmong} from './take-in.ts';
import {entryOf, startDraft} from './track-history.ts';

/** The running session, as far as errands need it. */
export type Errandful = {
	state(): {
		readonly session: Session;
		readonly scene: Scene & {readonly handed: Handed | undefined; readonly practice: PracticeScene | undefined};
	};
	dispatch(action: Action): void;
	readonly catalog: readonly OpenDocument[];
	readonly errands: Errands;
};

type OwnEffect = Exclude<
	ErrandEffect,
	'see it' | 'read log' | 'stop log' | 'accept this' | 'accept all' | 'take all back'
>;

export function errandEffects({state, dispatch, catalog, errands}: Errandful): Record<OwnEffect, () => void> {
	const tell = (notice: string) => dispatch({do: 'tell', notice});
	const trackName = () => titleOf(current(state().session.history.present, 'track'));
	const entry = () => {
		const {over} = state().session;
		return over?.is === 'entry' ? over.line.text.trim() : undefined;
	};

	const written = (file: string, writing: Writing) => {
		if (writing === 'exists') dispatch({do: 'cover', over: {is: 'overwriting', file}});
		else finish(writing.ok, writing.words);
	};
	/** An entry field stays open with what is wrong. */
	const finish = (ok: boolean, words: string) => {
		if (!ok && state().session.over?.is === 'entry') return dispatch({do: 'refuse', wrong: words});
		dispatch({do: 'cover', over: undefined});
		tell(words);
	};
	const withText = (act: (text: string) => void) => {
		const {handed} = state().scene;
		if (handed === undefined) tell('There is nothing to hand over yet.');
		else act(handed.text);
	};

	return {
		'hand over': () =>
			dispatch({
				do: 'go',
				place: {at: 'hand over', item: items[0], scroll: 0, date: errands.now(), day: errands.today()},
			}),
		'copy it': () => withText(text => tell(sentence(errands.copy(text)))),
		'write it': () =>
			withText(text => {
				const file = entry();
				if (file !== undefined) written(file, errands.write(file, text, false));
			}),
		'write over': () =>
			withText(text => {
				const {over} = state().session;
				if (over?.is === 'overwriting') written(over.file, errands.write(over.file, text, true));
			}),
		export: () => {
			const directory = entry();
			if (directory === undefined) return;
			const {ok, words} = errands.exportTo(directory);
			finish(ok, words);
		},
		'track history': () =>
			dispatch({
				do: 'go',
				place: {at: 'history', entries: errands.history(trackName()), adding: false, scroll: 0},
			}),
		'add to history': () => {
			const {session, scene} = state();
			const inCar = scene.all.find(({row}) => row.installed) ?? scene.shown[cursorIn(scene.shown, session.row)];
			const begun = session.draft?.track === trackName() ? session.draft : undefined;
			const fresh = () => startDraft(trackName(), errands.today(), session.plan ?? inCar?.name);
			dispatch({do: 'draft', draft: begun ?? fresh()});
		},
		'keep entry': () => {
			const {draft, history} = state().session;
			if (draft === undefined) return;
			const {air} = current(history.present, 'track').json;
			const reading = entryOf(draft, isObject(air) ? air : undefined);
			if (!reading.ok) return dispatch({do: 'refuse draft', field: reading.field, wrong: reading.wrong});
			const {ok, words} = errands.addToHistory(draft.track, reading.entry);
			if (!ok) return dispatch({do: 'refuse draft', field: draft.field, wrong: words});
			dispatch({do: 'show history', entries: errands.history(draft.track)});
			tell(words);
		},
		'read file': () => {
			const {place} = state().session;
			const file = place.at === 'take in' ? place.line.text.trim() : '';
			if (file === '') return dispatch({do: 'refuse', wrong: 'a name is needed; or paste the plan itself'});
			void errands.read(file).then(input => {
				if (input.ok) void readPlan(input.label, input.text, {state, dispatch, catalog, errands});
				else dispatch({do: 'refuse', wrong: input.words});
			});
		},
		'forget saved': () => {
			const {place, history} = state().session;
			const document = place.at === 'differences' ? current(history.present, place.kind) : undefined;
			const name = document?.saved?.name;
			if (document === undefined || typeof name !== 'string') return;
			const {ok, words} = errands.forget(document.kind, name);
			if (ok) dispatch({do: 'forgotten', document});
			finish(ok, words);
		},
	};
}

const sentence = (words: string): string => words.charAt(0).toUpperCase() + words.slice(1);

/** Reads the plan in a text, and shows it where a plan is taken in. */
export async function readPlan(label: string, text: string, {state, dispatch, catalog}: Errandful): Promise<void> {
	const {readIncoming} = await import('./incoming.ts');
	const {present} = state().session.history;
	const reading = await readIncoming(label, text, (track, car) => ownAmong(catalog, present, {track, car}));
	if (reading.ok) dispatch({do: 'show incoming', incoming: reading.incoming});
	else dispatch({do: 'refuse', wrong: reading.words});
}
