/** Does for the screen what the commands of sharing and the store do: clipboard, files, history, export. */
import {lstatSync} from 'node:fs';
import {homedir} from 'node:os';
import {resolve} from 'node:path';
import {maxDocumentBytes} from '../documents/read.ts';
import {visible} from '../documents/visible.ts';
import type {LogRefused, RememberedColumns} from '../logs/read-log.ts';
import type {Errands, LogAnswer, Saving, Writing} from '../screens/errands.ts';
import {codeOf, problemText} from '../store/answer.ts';
import {writeDurably} from '../store/durable-write.ts';
import {exportStore} from '../store/export-store.ts';
import {addToHistory} from '../store/history.ts';
import {keptNamed} from '../store/list-kept.ts';
import {readPreferences, rememberColumns} from '../store/preferences.ts';
import {forgetKept} from '../store/save-kept.ts';
import {localDay} from '../text/heading-view.ts';
import {copyText} from './copy.ts';
import {readFileText} from './read-input.ts';
import type {Surroundings} from './surroundings.ts';

/** `write` gets bytes for the terminal that draw nothing and move no cursor. */
export function screenErrands(
	home: string,
	environment: Surroundings['environment'],
	write: (bytes: string) => void,
): Omit<Errands, 'forget'> {
	return {
		now: () => new Date().toISOString().replace(/\.\d+Z$/, 'Z'),
		today: () => localDay(new Date()),
		copy: text => copyText(text, environment, write),
		write: (file, text, replace) => writeFile(pathOf(file), text, replace),
		read: async file => {
			const input = await readFileText(pathOf(file), maxDocumentBytes);
			return input.ok ? {ok: true, ...input.value} : {ok: false, words: input.message};
		},
		readLog: async (file, columns, car, onProgress, signal) => {
			// The reader of logs is not needed before there is one.
			const {refuseLog, tryLogFile} = await import('./read-log-file.ts');
			const preferences = readPreferences(home);
			const remembered = preferences.ok
				? (preferences.value.logColumns?.[car] as RememberedColumns | undefined)
				: undefined;
			const answer = await tryLogFile(pathOf(file), noInput, {
				columns,
				remembered,
				onProgress: seldom(onProgress),
				rest: () => new Promise(resolve => setImmediate(resolve)),
				signal,
			});
			if (!answer.ok) return {ok: false, words: answer.message};
			const {label, reading} = answer.value;
			if (!reading.ok)
				return columnAsked(label, reading.problems) ?? {ok: false, words: refuseLog(label, reading.problems).message};
			const kept = reading.remember as Parameters<typeof rememberColumns>[2];
			if (!signal.aborted) await rememberColumns(home, car, kept);
			return {ok: true, label, reading};
		},
		history: track => keptNamed(home, 'history', track)?.document.entries ?? [],
		addToHistory: (track, entry) => {
			const answer = addToHistory(home, track, [entry]);
			if (!answer.ok) return {ok: false, words: problemText(answer.problem)};
			return {ok: true, words: `Added to the history of ${visible(track)}.`};
		},
		exportTo: directory => exportAll(home, pathOf(directory)),
	};
}

/** What may be more than one column is asked for where the file's name is typed. */
function columnAsked(label: string, problems: LogRefused['problems']): LogAnswer | undefined {
	const problem = problems.find(({choice}) => choice !== undefined);
	if (problem?.choice === undefined) return undefined;
	const {channel, values} = problem.choice;
	const shown = values.slice(0, mostShown).map(value => `"; ${channel}=${visible(value)}"`);
	const words = `${label}: ${problem.where}: found ${problem.found}; type behind the name ${shown.join(' or ')}`;
	return {ok: false, words, channel};
}

const mostShown = 4;

/** A screen has no standard input to read a log from. */
const noInput = {
	standardInput: async function* (): AsyncGenerator<Uint8Array> {},
};

/** No eye follows more. */
const betweenMs = 120;

/** Tells the share that was read, and lets keys and drawing have their turn. */
function seldom(tell: (share: number | undefined) => void) {
	let nextMs = performance.now() + betweenMs;
	return (bytes: number, totalBytes: number | undefined) => {
		const now = performance.now();
		if (now < nextMs) return;
		nextMs = now + betweenMs;
		tell(totalBytes === undefined ? undefined : Math.min(1, bytes / totalBytes));
	};
}

/** No shell is there to know what `~` means. */
const pathOf = (typed: string): string => resolve(typed.replace(/^~(?=$|[/\\])/, homedir()));

function writeFile(file: string, text: string, replace: boolean): Writing {
	const shown = visible(file);
	try {
		const present = lstatSync(file, {throwIfNoEntry: false});
		if (present?.isDirectory()) return {ok: false, words: `${shown} is a directory; a file is needed.`};
		if (present && !present.isFile()) return {ok: false, words: `${shown} is no plain file; it stays as it is.`};
		if (present && !replace) return 'exists';
	} catch (error) {
		return {ok: false, words: `${shown}: cannot be looked at (${codeOf(error) ?? String(error)}).`};
	}
	const problem = writeDurably(file, text, {keepPrevious: false});
	return problem ? {ok: false, words: `${shown}: ${problem.found}.`} : {ok: true, words: `Written to ${shown}.`};
}

function exportAll(home: string, directory: string): Saving {
	const answer = exportStore(home, directory);
	if (!answer.ok) return {ok: false, words: problemText(answer.problem)};
	const {written, same, problems} = answer.value;
	const [first] = problems;
	const counts = `${written.length} written, ${same.length} as they were, in ${visible(directory)}.`;
	return {ok: first === undefined, words: first === undefined ? counts : `${counts} ${problemText(first)}`};
}

/** Takes a saved document away, when it is still the one that was read. */
export function forgetSaved(home: string, kind: 'track' | 'car', name: string, base: string | undefined): Saving {
	const keptKind = kind === 'track' ? 'preset' : 'saved-car';
	const kept = keptNamed(home, keptKind, name);
	const changed = `${visible(name)} was changed elsewhere meanwhile: nothing was taken away.`;
	if (!kept) return {ok: false, words: `${visible(name)} is not saved.`};
	if (kept.revision !== base) return {ok: false, words: changed};
	const answer = forgetKept(home, keptKind, kept);
	if (!answer.ok) return {ok: false, words: problemText(answer.problem)};
	if (answer.value === 'changed') return {ok: false, words: changed};
	return {ok: true, words: `${visible(name)} is forgotten; it stays in ${visible(`${kept.file}.bak`)}.`};
}
