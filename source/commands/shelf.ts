/** The documents that have a name: the saved ones, and the shipped ones that no saved one stands before. */
import {readdirSync, readFileSync} from 'node:fs';
import {basename} from 'node:path';
import {fileURLToPath} from 'node:url';
import {problemText} from '../store/answer.ts';
import {sameSpelling} from '../store/file-name.ts';
import {homeDirectory} from '../store/home.ts';
import {type Named, textOf} from '../store/kept-documents.ts';
import {listKept} from '../store/list-kept.ts';
import type {Surroundings} from './surroundings.ts';

export type Kind = 'track' | 'car';
export type Shelved = {
	kind: Kind;
	from: 'saved' | 'shipped';
	/** The name that the document gives itself. */
	name: string;
	/** The file's name without `.json`; also accepted as a name. */
	stem: string;
	file: string;
	text: string;
	/** As parsed, not checked: what is checked goes through the reader. */
	document: Record<string, unknown>;
	/** Name of the car that was saved with a track. */
	car?: string | undefined;
	/** Pair and set that were saved with a track: "33/38 A". */
	plan?: string | undefined;
};

export type Shelf = {
	/** Saved ones first, by file name. */
	entries: Shelved[];
	/** The saved files that cannot be read. */
	notes: string[];
};

type Place = Pick<Surroundings, 'shipped' | 'environment'>;

/** The documents of a kind. Loads no reader, so that a listing starts at once. */
export const shelf = (kind: Kind, {shipped, environment}: Place): Shelf => {
	const fromShip = shippedShelf(kind, shipped);
	const {entries, notes} = savedShelf(kind, homeDirectory(environment));
	const stemFor = ({name, stem}: Shelved) => {
		// A saved copy answers to all the names of the shipped document that it stands before.
		const like = fromShip.find(entry => sameName(entry.name, name));
		const short = stem.replace(hashOfName, '');
		const isTaken = [...fromShip, ...entries].some(
			entry => entry.name !== name && entry.stem.replace(hashOfName, '') === short,
		);
		return like?.stem ?? (isTaken ? stem : short);
	};
	const saved = entries.map(entry => ({...entry, stem: stemFor(entry)}));
	const unseen = fromShip.filter(({name}) => !saved.some(entry => sameName(entry.name, name)));
	return {entries: [...saved, ...unseen], notes};
};

/** The track of the bare command, and the car that is taken where none is named. */
export const demo = {track: 'tarrowdale', car: 'demo'} as const;

export const shippedShelf = (kind: Kind, shipped: URL): Shelved[] => {
	const directory = fileURLToPath(kind === 'car' ? new URL('cars/', shipped) : shipped);
	return readdirSync(directory)
		.filter(file => file.endsWith('.json'))
		.sort()
		.map(base => {
			const file = `${directory}${base}`;
			const text = readFileSync(file, 'utf8');
			const document = JSON.parse(text) as Record<string, unknown>;
			return {kind, from: 'shipped', name: String(document.name), stem: stemOf(base), file, text, document};
		});
};

const savedShelf = (kind: Kind, home: string): Shelf => {
	const entry = (file: string, document: Named, car?: string, plan?: string): Shelved => {
		const {name} = document;
		const stem = stemOf(basename(file));
		return {kind, from: 'saved', name, stem, file, text: textOf(document), document, car, plan};
	};
	const noted = <T>(
		{kept, problems}: {kept: T[]; problems: Parameters<typeof problemText>[0][]},
		make: (one: T) => Shelved,
	) => ({
		entries: kept.map(make),
		notes: problems.map(problemText),
	});
	if (kind === 'car') return noted(listKept(home, 'saved-car'), ({file, document}) => entry(file, document.car));
	return noted(listKept(home, 'preset'), ({file, document: {track, car, pair, gearbox}}) =>
		entry(file, track, car, pair && gearbox && `${pair} ${gearbox}`),
	);
};

/** What tells the files of like names apart, see `fileNameOf`. */
const hashOfName = /_[0-9a-f]{16}$/;

const stemOf = (base: string): string => base.slice(0, -'.json'.length);
const sameName = (one: string, other: string): boolean => sameSpelling(one) === sameSpelling(other);
