/** What the practice has done for it outside: a log read, the history written. */

import {isObject} from '../../documents/json.ts';
import {type AskedColumns, channelNames} from '../../logs/channels.ts';
import type {Sought} from '../../practice/find/steps.ts';
import {learnedEntry, takenBackEntry} from '../../text/learned-entry.ts';
import {editLine} from '../parts/edit-line.ts';
import {current, titleOf} from './documents.ts';
import type {ErrandEffect} from './effect.ts';
import type {Errandful} from './errand-effects.ts';
import type {LogJob} from './log-job.ts';
import {straightNames} from './practice-of.ts';
import {type Line, linesOf} from './taught.ts';

type Teaching = typeof import('./teaching.ts');
type PracticeEffect = Extract<
	ErrandEffect,
	'see it' | 'read log' | 'stop log' | 'accept this' | 'accept all' | 'take all back'
>;

export function practiceEffects(
	{state, dispatch, errands}: Errandful,
	{teaching, job}: {readonly teaching: () => Teaching | undefined; readonly job: LogJob},
): Record<PracticeEffect, () => void> {
	const tell = (notice: string) => dispatch({do: 'tell', notice});
	const typed = () => {
		const {over} = state().session;
		return over?.is === 'entry' ? over.line.text.trim() : '';
	};
	const documents = () => {
		const {present} = state().session.history;
		return {track: current(present, 'track').json, car: current(present, 'car').json};
	};
	const note = (entry: ReturnType<typeof takenBackEntry>) =>
		errands.addToHistory(titleOf(current(state().session.history.present, 'track')), entry);
	const lines = (): readonly Line[] => {
		const taught = state().scene.practice?.taught;
		return taught === undefined ? [] : linesOf(taught);
	};

	const change = (chosen: readonly Line[], isAll: boolean) => {
		const taught = state().scene.practice?.taught;
		const made = teaching();
		if (taught === undefined || made === undefined) return;
		const proposals = chosen.flatMap(one => (one.is === 'proposal' ? [one.proposal] : []));
		const taken = chosen.flatMap(one => (one.is === 'learned' ? one.taken : []));
		const {lesson} = taught;
		if (lesson !== undefined && proposals.length > 0) {
			if (made.isUnclear(lesson.findings))
				return tell(
					'The log fits another pair than the one in the car. Put the right one in the car (i in the ranking), and read the log again.',
				);
			const edits = made.acceptEdits(proposals, documents(), {from: lesson.learning.from, date: errands.now()});
			const {air} = documents().track;
			const entry = learnedEntry(lesson.learning, proposals, isObject(air) ? air : undefined, errands.today());
			const {ok, words} = note(entry);
			const what = isAll ? 'All of it is' : `${proposals.map(({name}) => name).join(', ')} is`;
			return dispatch({
				do: 'learn',
				edits,
				notice: `${what} in the documents. Ctrl+S saves, u undoes.${ok ? '' : ` ${words}`}`,
			});
		}
		if (taken.length === 0) return tell('There is nothing to accept, and nothing to take back.');
		note(takenBackEntry(taken, errands.today()));
		const names = [...new Set(taken.map(({name}) => name))].join(', ');
		const stays = taken.some(({untouched}) => !untouched) ? ' What was changed since stays.' : '';
		dispatch({
			do: 'learn',
			edits: made.takeBackEdits(taken, documents()),
			notice: `${names}: as it was before practice.${stays}`,
		});
	};

	/** The file's name is there to be typed on: what is asked for stands behind it. */
	const askFor = (channel: string, text: string, wrong: string) =>
		dispatch({
			do: 'cover',
			over: {is: 'entry', asks: 'log', line: editLine(`${text.replace(/[;\s]+$/, '')}; ${channel}=`), wrong},
		});

	return {
		'see it': () => {
			const {session} = state();
			const straight = straightNames(session)[session.place.at === 'practice' ? session.place.cursor : 0];
			const made = teaching();
			if (straight === undefined || made === undefined)
				return dispatch({do: 'refuse', wrong: 'a moment: it is being loaded'});
			const text = typed();
			const wrong = made.wrongWith(session, straight, text);
			if (wrong === undefined) dispatch({do: 'see', straight, text});
			else dispatch({do: 'refuse', wrong});
		},
		'read log': () => {
			const text = typed();
			const asked = askedIn(text);
			if (typeof asked === 'string') return dispatch({do: 'refuse', wrong: asked});
			const track = state().session.history.present.track;
			const car = titleOf(current(state().session.history.present, 'car'));
			dispatch({do: 'cover', over: undefined});
			const signal = job.begin();
			tell(`Reading ${asked.file} …`);
			const onProgress = (share: number | undefined) => {
				if (share !== undefined && !signal.aborted)
					tell(`Reading ${asked.file}: ${Math.floor(100 * share)} %. Esc stops.`);
			};
			void errands.readLog(asked.file, asked.columns, car, onProgress, signal).then(answer => {
				if (signal.aborted) return;
				if (!answer.ok) {
					job.end();
					return answer.channel === undefined ? tell(answer.words) : askFor(answer.channel, text, answer.words);
				}
				const label = fileName(answer.label);
				const {run, remarks} = answer.reading;
				const words = remarks.map(({text}) => text);
				const steps = teaching()!.logSteps(state().session, label, run, words);
				const onStep = (sought: Sought | undefined) => {
					if (sought !== undefined) tell(`${label}: finding ${sought} … Esc stops.`);
				};
				job.lookThrough(steps, onStep, shown => {
					const {session} = state();
					// Meanwhile another track may be looked at, or another place.
					if (session.history.present.track !== track || session.place.at !== 'practice')
						return tell(`${label} was read, but another track or place is looked at now.`);
					if (typeof shown === 'string') return tell(shown);
					dispatch({do: 'show log', log: shown});
				});
			});
		},
		'stop log': () => {
			if (job.stop()) tell('The log is left; nothing of it was taken.');
		},
		'accept this': () => {
			const {place} = state().session;
			const line = lines()[place.at === 'practice' ? place.cursor : 0];
			change(line === undefined ? [] : [line], false);
		},
		'accept all': () =>
			change(
				lines().filter(({is}) => is === 'proposal'),
				true,
			),
		'take all back': () =>
			change(
				lines().filter(({is}) => is === 'learned'),
				true,
			),
	};
}

const fileName = (label: string): string => label.slice(Math.max(label.lastIndexOf('/'), label.lastIndexOf('\\')) + 1);

/** "run.csv; speed=GPS Speed; rpm=Engine": the file, then columns where it does not say which they are. */
function askedIn(text: string): {file: string; columns: AskedColumns} | string {
	const [file = '', ...rest] = text.split(';').map(part => part.trim());
	const columns: Record<string, string> = {};
	for (const part of rest.filter(one => one !== '')) {
		const [channel = '', ...header] = part.split('=');
		const name = channel.trim().toLowerCase();
		if (header.length === 0 || !(channelNames as readonly string[]).includes(name))
			return `found "${part}"; allowed the file, then such as "; speed=GPS Speed"`;
		columns[name] = header.join('=').trim();
	}
	return {file, columns};
}
