/** From the format of every earlier version to the newest. */
import type {KeptKind, Written} from './kept-documents.ts';

/** From one version of a kind to the next; the version itself is counted by `migrate`. */
export type Migration = (content: Written) => Written;

/** Step n goes from version n + 1 to n + 2. Steps are kept for ever, and tested with files of every version. */
export const migrations: Readonly<Record<KeptKind | 'session', readonly Migration[]>> = {
	preset: [],
	'saved-car': [],
	history: [],
	session: [],
};

export type Migrated = {ok: true; content: Written} | {ok: false; reason: 'newer' | 'broken'; newest: number};

/** The content in the newest version, or why that cannot be had. */
export const migrate = (content: Written, steps: readonly Migration[]): Migrated => {
	const newest = steps.length + 1;
	const {version} = content;
	if (!Number.isSafeInteger(version) || (version as number) < 1) return {ok: false, reason: 'broken', newest};
	if ((version as number) > newest) return {ok: false, reason: 'newer', newest};
	const migrated = steps.slice((version as number) - 1).reduce((older, step) => step(older), content);
	return {ok: true, content: {...migrated, version: newest}};
};
