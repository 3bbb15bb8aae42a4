/** What is wrong in a store, each with what to do. Changes nothing. */
import {basename} from 'node:path';
import {problemText, type StoreProblem, unreachable} from './answer.ts';
import {type Entry, entriesOf} from './directory.ts';
import {isTemporary} from './durable-write.ts';
import {sameSpelling} from './file-name.ts';
import {keptKinds} from './kept-documents.ts';
import {folderOf, listKept} from './list-kept.ts';
import {isPreparedLock, lockHolder, lockName} from './lock.ts';
import {preferencesFile, readPreferences} from './preferences.ts';
import {hasEnded} from './process-identity.ts';
import type {Kept} from './read-kept.ts';
import {sessionFolder, type UnsavedSession, unsavedSessions} from './session.ts';

export type Finding = {file: string /** Names the file too. */; message: string};

/** The findings; none where all is well. */
export const checkStore = (home: string): Finding[] => {
	const shelves = keptKinds.map(kind => listKept(home, kind));
	const {sessions, problems} = unsavedSessions(home);
	const preferences = readPreferences(home);
	return [
		...[
			...shelves.flatMap(shelf => shelf.problems),
			...shelves.flatMap(({kept}) => likeNames(kept)),
			...problems,
			...sessions.map(unsaved),
			...leftovers(home),
		].map(problem => ({file: problem.file, message: problemText(problem)})),
		...(preferences.ok ? [] : [{file: preferencesFile(home), message: preferences.message}]),
	];
};

/** Documents that a person may take for each other: of the same name, or of names that differ only in case. */
const likeNames = (kept: readonly Kept<unknown>[]): StoreProblem[] => {
	const first = new Map<string, Kept<unknown>>();
	return kept.flatMap(one => {
		const folded = sameSpelling(one.name).toLowerCase();
		const other = first.get(folded);
		if (!other) first.set(folded, one);
		return other ? [alike(one, other)] : [];
	});
};

const alike = (one: Kept<unknown>, other: Kept<unknown>): StoreProblem => {
	const where = basename(other.file);
	const isSame = sameSpelling(one.name) === sameSpelling(other.name);
	const found = isSame ? `has the same name as ${where}` : `has the name of ${where} but for upper and lower case`;
	const remedy = isSame ? 'Only one of them is used: rename or remove one.' : 'Write the name exactly, or rename one.';
	return {reason: 'inTheWay', file: one.file, found: `${JSON.stringify(one.name)} ${found}`, remedy};
};

const unsaved = ({file, saved}: UnsavedSession): StoreProblem => ({
	reason: 'inTheWay',
	file,
	found: `unsaved work of ${saved}, of a screen that ended without saving`,
	remedy: 'Open the screen to take it up, or remove the file.',
});

/** What killed processes left. While a live one holds the lock, temporary files are its own. */
const leftovers = (home: string): StoreProblem[] => {
	const isBusy = lockHolder(home) !== undefined;
	const isLeft = ({name}: Entry) => isTemporary(name) && !isBusy;
	try {
		const inHome = entriesOf(home);
		return [
			...inHome.filter(({name}) => name === lockName && !isBusy).map(left),
			...inHome.filter(({name}) => confTemporary.test(name)).map(leftByConf),
			...inHome.filter(({name}) => isPreparedLock(name) && hasEnded(name.slice(lockName.length + 1))).map(left),
			...keptKinds.flatMap(kind => entriesOf(folderOf(home, kind)).filter(isLeft)).map(left),
			...entriesOf(sessionFolder(home))
				.filter(({name}) => isTemporary(name) && hasEnded(name))
				.map(left),
		];
	} catch (error) {
		return [unreachable(home, error)];
	}
};

/** What conf leaves of preferences that it was ended in writing, and never clears away. */
const confTemporary = /^preferences\.json\.tmp-/;

const leftByConf = (entry: Entry): StoreProblem => ({...left(entry), remedy: 'Nothing is lost. Remove it.'});

const left = ({path}: Entry): StoreProblem => ({
	reason: 'inTheWay',
	file: path,
	found: 'left by a process that was ended while it was saving',
	remedy: 'Nothing is lost. The next save clears it away.',
});
