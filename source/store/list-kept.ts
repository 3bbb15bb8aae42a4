/** Presets, cars and histories as they stand in the store. Loads nothing that writes. */
import {join} from 'node:path';
import {type StoreProblem, unreachable} from './answer.ts';
import {entriesOf} from './directory.ts';
import {fileNameOf, sameSpelling} from './file-name.ts';
import {type Documents, folders, type KeptKind} from './kept-documents.ts';
import {type Kept, readKept} from './read-kept.ts';

export type Shelf<D> = {
	/** By file name. */
	kept: Kept<D>[];
	/** The files that could not be read; they cost nothing but themselves. */
	problems: StoreProblem[];
};

export const folderOf = (home: string, kind: KeptKind): string => join(home, folders[kind]);

/** All documents of a kind in the store. */
export const listKept = <K extends KeptKind>(home: string, kind: K): Shelf<Documents[K]> => {
	const shelf: Shelf<Documents[K]> = {kept: [], problems: []};
	const folder = folderOf(home, kind);
	try {
		for (const {name, path} of entriesOf(folder)) {
			if (!name.endsWith('.json')) continue;
			const answer = readKept(path, kind);
			if (answer.ok) shelf.kept.push(answer.value);
			else shelf.problems.push(answer.problem);
		}
	} catch (error) {
		shelf.problems.push(unreachable(folder, error));
	}
	return shelf;
};

/** The document of that very name, in whatever file; of several the one whose file has the name's own file name. */
export const keptNamed = <K extends KeptKind>(home: string, kind: K, name: string): Kept<Documents[K]> | undefined => {
	const named = listKept(home, kind).kept.filter(kept => sameSpelling(kept.name) === sameSpelling(name));
	const own = join(folderOf(home, kind), fileNameOf(name));
	return named.find(kept => kept.file === own) ?? named[0];
};
