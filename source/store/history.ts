/** What was run at a track, and what was seen. */
import {type Answer, done, failed} from './answer.ts';
import {canonical, type History, type HistoryEntry} from './kept-documents.ts';
import {keptNamed} from './list-kept.ts';
import type {Kept} from './read-kept.ts';
import {changeKept} from './save-kept.ts';

/** Adds entries to what is kept of the track, after all that others have added. */
export const addToHistory = (home: string, track: string, entries: readonly HistoryEntry[]): Answer<Kept<History>> =>
	extend(home, track, () => entries);

/** Adds the entries that are not kept yet, and gives their number. */
export const addMissing = (home: string, track: string, entries: readonly HistoryEntry[]): Answer<number> => {
	const present = keptNamed(home, 'history', track);
	if (present && missing(present.document.entries, entries).length === 0) return done(0);
	let added = 0;
	const answer = extend(home, track, kept => {
		const lacking = missing(kept, entries);
		added = lacking.length;
		return lacking;
	});
	return answer.ok ? done(added) : answer;
};

const missing = (kept: readonly HistoryEntry[], entries: readonly HistoryEntry[]): HistoryEntry[] => {
	const known = new Set(kept.map(canonical));
	return entries.filter(entry => !known.has(canonical(entry)));
};

const extend = (
	home: string,
	track: string,
	additions: (kept: readonly HistoryEntry[]) => readonly HistoryEntry[],
): Answer<Kept<History>> => {
	const answer = changeKept(home, 'history', track, 'any', present => {
		const kept = present?.entries ?? [];
		return {kind: 'history', version: 1, track, ...present, entries: [...kept, ...additions(kept)]};
	});
	if (answer.kind === 'saved') return done(answer.kept);
	if (answer.kind === 'failed') return failed(answer.problem);
	throw new Error('an addition has no base that could have changed');
};
