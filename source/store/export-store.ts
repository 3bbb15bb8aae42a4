/** The whole store as files in a directory, such as a team's version control. Importing reads the same layout. */
import {readFileSync, realpathSync} from 'node:fs';
import {join, resolve} from 'node:path';
import {type Answer, codeOf, done, failed, type StoreProblem, unreachable} from './answer.ts';
import {entriesOf, isLink, makeDirectory} from './directory.ts';
import {writeDurably} from './durable-write.ts';
import {fileNameOf, sameSpelling} from './file-name.ts';
import {type KeptKind, keptKinds, textOf} from './kept-documents.ts';
import {folderOf, listKept} from './list-kept.ts';
import {type Kept, notPlain, readKept} from './read-kept.ts';

export type Exported = {
	/** Files that are new or have changed. */
	written: string[];
	same: string[];
	/** Files of an earlier export, or of others, that the store has no document for. They stay. */
	extra: string[];
	/** What could not be read or written. */
	problems: StoreProblem[];
};

/** Writes every document of the store to its own file below the directory; the same store gives the same bytes. */
export const exportStore = (home: string, directory: string): Answer<Exported> => {
	const exported: Exported = {written: [], same: [], extra: [], problems: []};
	try {
		makeDirectory(resolve(directory));
		if (isSameDirectory(home, directory)) return failed(isTheStore(directory));
		for (const kind of keptKinds) exportKind(home, directory, kind, exported);
	} catch (error) {
		return failed(unreachable(directory, error));
	}
	return done(exported);
};

const exportKind = (home: string, directory: string, kind: KeptKind, exported: Exported): void => {
	const {kept, problems} = listKept(home, kind);
	exported.problems.push(...problems);
	const folder = folderOf(directory, kind);
	if (isLink(folder)) {
		exported.problems.push(notPlain(folder));
		return;
	}
	if (kept.length > 0) makeDirectory(folder);
	const seen = new Set<string>();
	for (const document of kept) {
		const file = join(folder, fileNameOf(document.name));
		if (seen.has(file)) exported.problems.push(twice(document));
		else exportOne(file, kind, document, exported);
		seen.add(file);
	}
	for (const {path} of entriesOf(folder)) if (path.endsWith('.json') && !seen.has(path)) exported.extra.push(path);
};

const exportOne = (file: string, kind: KeptKind, {name, document}: Kept<unknown>, exported: Exported): void => {
	const text = textOf(document);
	const present = textIn(file);
	if (present === text) {
		exported.same.push(file);
		return;
	}
	const problem =
		(present === undefined ? undefined : notOurs(file, kind, name)) ?? writeDurably(file, text, {keepPrevious: false});
	if (problem) exported.problems.push(problem);
	else exported.written.push(file);
};

/** Why a file may not be written over: it is no earlier export of the same document. */
const notOurs = (file: string, kind: KeptKind, name: string): StoreProblem | undefined => {
	const answer = readKept(file, kind);
	if (!answer.ok) return answer.problem;
	if (sameSpelling(answer.value.name) === sameSpelling(name)) return undefined;
	const found = `holds ${JSON.stringify(answer.value.name)}, not ${JSON.stringify(name)}`;
	return {reason: 'inTheWay', file, found, remedy: 'Move it away and export again.'};
};

/** Undefined where there is nothing; of what cannot be read, `notOurs` says why. */
const textIn = (file: string): string | undefined => {
	try {
		return readFileSync(file, 'utf8');
	} catch (error) {
		return codeOf(error) === 'ENOENT' ? undefined : '';
	}
};

export const isSameDirectory = (one: string, other: string): boolean => {
	try {
		return realpathSync(one) === realpathSync(other);
	} catch (error) {
		if (codeOf(error) === 'ENOENT') return false;
		throw error;
	}
};

export const isTheStore = (directory: string): StoreProblem => ({
	reason: 'inTheWay',
	file: directory,
	found: 'this is the store itself',
	remedy: 'Name another directory.',
});

const twice = ({file, name}: Kept<unknown>): StoreProblem => ({
	reason: 'inTheWay',
	file,
	found: `${JSON.stringify(name)} is the name of another file too (${fileNameOf(name)})`,
	remedy: 'Only the other one is used: rename or remove one.',
});
