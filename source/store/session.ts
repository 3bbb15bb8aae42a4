/** The unsaved work of a running screen, kept so that a crash does not cost it. One file a process. */
import {join} from 'node:path';
import {type Answer, done, failed, type StoreProblem, unreachable} from './answer.ts';
import {entriesOf, makeDirectory} from './directory.ts';
import {isTemporary, removeIfPossible, writeDurably} from './durable-write.ts';
import {textOf} from './kept-documents.ts';
import {hasEnded, processIdentity} from './process-identity.ts';
import {broken, readContent, understood} from './read-kept.ts';

export type UnsavedSession = {file: string /** ISO 8601. */; saved: string; document: unknown};

export const sessionFolder = (home: string): string => join(home, 'sessions');
const ownFile = (home: string): string => join(sessionFolder(home), `${processIdentity()}.json`);

/** Keeps the state of this process's screen in place of the one before. */
export const keepSession = (home: string, document: unknown, saved: string): StoreProblem | undefined => {
	const folder = sessionFolder(home);
	try {
		makeDirectory(folder);
		sweepEnded(folder);
	} catch (error) {
		return unreachable(folder, error);
	}
	return writeDurably(ownFile(home), textOf({kind: 'session', version: 1, saved, document}), {keepPrevious: false});
};

/** The sessions whose process has ended without dropping them, newest first; with the files that are none. */
export const unsavedSessions = (home: string): {sessions: UnsavedSession[]; problems: StoreProblem[]} => {
	const answers: Answer<UnsavedSession>[] = [];
	try {
		for (const {name, path} of entriesOf(sessionFolder(home))) {
			if (hasEnded(name) && name.endsWith('.json')) answers.push(readSession(path));
		}
	} catch (error) {
		return {sessions: [], problems: [unreachable(sessionFolder(home), error)]};
	}
	const sessions = answers.flatMap(answer => (answer.ok ? [answer.value] : []));
	const problems = answers.flatMap(answer => (answer.ok ? [] : [answer.problem]));
	return {sessions: sessions.sort((a, b) => (a.saved < b.saved ? 1 : -1)), problems};
};

/** Drops this process's session, or one that was taken up or declined. */
export const dropSession = (home: string, file = ownFile(home)): void => removeIfPossible(file);

/** What processes that were killed in the middle of a write left. */
const sweepEnded = (folder: string): void => {
	for (const {name, path} of entriesOf(folder)) if (isTemporary(name) && hasEnded(name)) removeIfPossible(path);
};

const readSession = (file: string): Answer<UnsavedSession> => {
	const content = readContent(file);
	if (!content.ok) return content;
	const known = understood(file, 'session', content.value.value);
	if (!known.ok) return known;
	const {saved, document} = known.value;
	return typeof saved === 'string' ? done({file, saved, document}) : failed(broken(file, 'saved is not a date'));
};
