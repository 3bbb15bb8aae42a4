/** Documents of a directory taken into the store. Names and texts in the files are data: only the store is written. */
import {lstatSync, readdirSync} from 'node:fs';
import {join} from 'node:path';
import {type Answer, done, failed, type StoreProblem, unreachable} from './answer.ts';
import {entriesOf, isLink} from './directory.ts';
import {isSameDirectory, isTheStore} from './export-store.ts';
import {sameSpelling} from './file-name.ts';
import {addMissing} from './history.ts';
import {
	canonical,
	folders,
	type History,
	type KeptKind,
	keptKinds,
	nameOf,
	type Preset,
	type SavedCar,
} from './kept-documents.ts';
import {keptNamed} from './list-kept.ts';
import {type ImportChoice, readForImport} from './read-for-import.ts';
import type {Kept} from './read-kept.ts';
import {saveKept} from './save-kept.ts';

export type Imported = {
	file: string;
	kind: KeptKind;
	name: string;
	/** changed: the store has another one, which stays; merged: entries that the store's history lacked were added. */
	state: 'new' | 'changed' | 'replaced' | 'merged' | 'same';
};
export type ImportAnswer = {imported: Imported[]; problems: StoreProblem[]};

/** Takes in the store that was exported to the directory, and the track and car documents that lie in it. */
export const importStore = async (
	home: string,
	directory: string,
	choice: ImportChoice,
): Promise<Answer<ImportAnswer>> => {
	const answer: ImportAnswer = {imported: [], problems: []};
	const taken = new Set<string>();
	try {
		readdirSync(directory);
		if (isSameDirectory(home, directory)) return failed(isTheStore(directory));
		for (const file of candidates(directory)) {
			const one = await importOne(home, file, choice, taken);
			if (one.ok) answer.imported.push(one.value);
			else answer.problems.push(one.problem);
		}
	} catch (error) {
		return failed(unreachable(directory, error));
	}
	return done(answer);
};

/** The files that may hold a document, in a fixed order. Folders that are links are not entered. */
const candidates = (directory: string): string[] =>
	[directory, ...keptKinds.map(kind => join(directory, folders[kind])).filter(folder => !isLink(folder))]
		.flatMap(entriesOf)
		.filter(({name, path}) => name.endsWith('.json') && !lstatSync(path).isDirectory())
		.map(({path}) => path);

const importOne = async (
	home: string,
	file: string,
	choice: ImportChoice,
	taken: Set<string>,
): Promise<Answer<Imported>> => {
	const read = await readForImport(home, file, choice);
	if (!read.ok) return read;
	const document = read.value;
	const name = nameOf(document);
	const key = `${document.kind} ${sameSpelling(name)}`;
	if (taken.has(key)) return failed(twice(file, name));
	taken.add(key);
	if (document.kind === 'history') return importHistory(home, file, document);
	return importDocument(home, file, document, choice.replace);
};

const importHistory = (home: string, file: string, {track, entries}: History): Answer<Imported> => {
	const isNew = keptNamed(home, 'history', track) === undefined;
	const answer = addMissing(home, track, entries);
	if (!answer.ok) return answer;
	const merged = answer.value === 0 ? 'same' : 'merged';
	return done({file, kind: 'history', name: track, state: isNew ? 'new' : merged});
};

const importDocument = (
	home: string,
	file: string,
	document: Preset | SavedCar,
	replace: boolean,
): Answer<Imported> => {
	const one = {file, kind: document.kind, name: nameOf(document)};
	const present: Kept<Preset | SavedCar> | undefined = keptNamed(home, one.kind, one.name);
	if (present && isSame(present.document, document)) return done({...one, state: 'same'});
	if (present && !replace) return done({...one, state: 'changed'});
	const answer = saveKept(home, document, present?.revision);
	if (answer.kind === 'failed') return failed(answer.problem);
	if (answer.kind === 'changed') return done({...one, state: 'changed'});
	return done({...one, state: present ? 'replaced' : 'new'});
};

/** When they were saved makes no difference. */
const isSame = (one: Preset | SavedCar, other: Preset | SavedCar): boolean =>
	canonical({...one, saved: ''}) === canonical({...other, saved: ''});

const twice = (file: string, name: string): StoreProblem => ({
	reason: 'inTheWay',
	file,
	found: `${JSON.stringify(name)} is the name of another file of this directory too`,
	remedy: 'Only the other one was looked at: rename or remove one.',
});
