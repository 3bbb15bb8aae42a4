/** Presets, cars and histories: saved and forgotten. */
import {lstatSync} from 'node:fs';
import {join} from 'node:path';
import {type Answer, done, failed, type StoreProblem, unreachable} from './answer.ts';
import {makeDirectory} from './directory.ts';
import {retire, sweepTemporaries, writeDurably} from './durable-write.ts';
import {fileNameOf} from './file-name.ts';
import {type Documents, type KeptKind, nameOf, textOf} from './kept-documents.ts';
import {folderOf, keptNamed} from './list-kept.ts';
import {withLock} from './lock.ts';
import {type Kept, readKept, revisionOf} from './read-kept.ts';

export type SaveAnswer<D> =
	| {kind: 'saved'; kept: Kept<D>}
	/** Somebody else saved or forgot it meanwhile; nothing was written. Ask, then save on the revision of theirs. */
	| {kind: 'changed'; theirs: Kept<D> | undefined}
	| {kind: 'failed'; problem: StoreProblem};

/**
 * Keeps a document under its name. `base` is the revision that it was made from, undefined where there was none: if the
 * file is another one by now, nothing is written.
 */
export const saveKept = <K extends KeptKind>(
	home: string,
	document: Documents[K] & {readonly kind: K},
	base: string | undefined,
): SaveAnswer<Documents[K]> => changeKept(home, document.kind, nameOf(document), base, () => document);

/**
 * Keeps what is made of the present document, which nobody else changes meanwhile. With a `base` it must be that
 * revision; `any` takes whatever is there.
 */
export const changeKept = <K extends KeptKind>(
	home: string,
	kind: K,
	name: string,
	base: string | 'any' | undefined,
	change: (present: Documents[K] | undefined) => Documents[K],
): SaveAnswer<Documents[K]> => {
	const answer = withLock(home, (): SaveAnswer<Documents[K]> => {
		const place = placeOf(home, kind, name);
		if (!place.ok) return {kind: 'failed', problem: place.problem};
		const {file, present} = place.value;
		if (base !== 'any' && present?.revision !== base) return {kind: 'changed', theirs: present};
		const document = change(present?.document);
		const text = textOf(document);
		const problem = writeDurably(file, text);
		if (problem) return {kind: 'failed', problem};
		return {kind: 'saved', kept: {name, file, revision: revisionOf(text), document}};
	});
	return answer.ok ? answer.value : {kind: 'failed', problem: answer.problem};
};

/** Takes the document away, to `.bak`; a shipped one of the same name is then seen again. */
export const forgetKept = (home: string, kind: KeptKind, kept: Kept<unknown>): Answer<'forgotten' | 'changed'> => {
	const answer = withLock(home, (): Answer<'forgotten' | 'changed'> => {
		const present = keptNamed(home, kind, kept.name);
		if (present?.revision !== kept.revision) return done('changed');
		const problem = retire(present.file);
		return problem ? failed(problem) : done('forgotten');
	});
	return answer.ok ? answer.value : answer;
};

type Place<D> = {file: string; present: Kept<D> | undefined};

/** Where the document of that name is or can be, with its folder made. Only for the holder of the lock. */
const placeOf = <K extends KeptKind>(home: string, kind: K, name: string): Answer<Place<Documents[K]>> => {
	const folder = folderOf(home, kind);
	const file = join(folder, fileNameOf(name));
	try {
		makeDirectory(folder);
		// Under the lock nobody writes, so what is left is of a writer who was killed.
		sweepTemporaries(folder);
		const present = keptNamed(home, kind, name);
		if (present) return done({file: present.file, present});
		const problem = inTheWay(file, kind);
		return problem ? failed(problem) : done({file, present});
	} catch (error) {
		return failed(unreachable(folder, error));
	}
};

/** What stands where a new file is to be: a broken file, a later version, a link. None of them is written over. */
const inTheWay = (file: string, kind: KeptKind): StoreProblem | undefined => {
	if (!lstatSync(file, {throwIfNoEntry: false})) return undefined;
	const answer = readKept(file, kind);
	if (!answer.ok) return answer.problem;
	const found = `holds ${JSON.stringify(answer.value.name)}, so it cannot take another name`;
	return {reason: 'inTheWay', file, found, remedy: 'Move it away and save again.'};
};
