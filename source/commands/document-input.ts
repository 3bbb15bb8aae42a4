/** The document that a word of the command line means: found, and read. */
import {sep} from 'node:path';
import {describeProblems, maxDocumentBytes, type Reading} from '../documents/read.ts';
import {visible} from '../documents/visible.ts';
import type {Uncertainties} from '../drivetrain/uncertainties.ts';
import {findDocument, isFileName} from './find-document.ts';
import {type Input, readFileText, readStandardInput} from './read-input.ts';
import {badInput, type Found, found} from './reply.ts';
import {type Kind, type Shelved, shelf} from './shelf.ts';
import type {Surroundings} from './surroundings.ts';

export type DocumentInput = Input & {
	/** Name of the car that was saved with a track. */
	car: string | undefined;
	/** Where it was found; undefined for a file and for standard input. */
	from: Shelved['from'] | undefined;
	/** What of the saved documents cannot be read. */
	notes: string[];
};

/** A file (with a slash or `.json`), `-` for standard input, or a name of a saved or shipped document of the kinds. */
export const inputOf = async (
	asked: string,
	kinds: Kind | readonly Kind[],
	around: Surroundings,
): Promise<Found<DocumentInput>> => {
	if (asked === '-') return unnamed(await readStandardInput(around.standardInput(), maxDocumentBytes));
	if (isFileName(asked, sep)) return unnamed(await readFileText(asked, maxDocumentBytes));
	const known = [kinds].flat();
	const shelves = known.map(kind => shelf(kind, around));
	const notes = shelves.flatMap(one => one.notes);
	const entry = findDocument(
		asked,
		shelves.flatMap(one => one.entries),
		known.join(' or '),
	);
	if (!entry.ok) return {...entry, message: [entry.message, ...notes].join('\n')};
	const {text, car, from} = entry.value;
	return found({label: labelOf(entry.value), text, car, from, notes});
};

const unnamed = (input: Found<Input>): Found<DocumentInput> =>
	input.ok ? found({...input.value, car: undefined, from: undefined, notes: []}) : input;

/** A saved document is a part of its file, whose lines count otherwise. */
const labelOf = ({from, kind, name, file}: Shelved): string =>
	from === 'saved' ? `the saved ${kind} ${visible(name)}` : file;

type Read<T> = {
	label: string;
	value: T;
	document: Record<string, unknown>;
	uncertainties: Uncertainties;
	notes: string[];
};

/** The document in a text that was found. */
export const load = async <T>(
	input: Found<DocumentInput>,
	read: (text: string) => Promise<Reading<T>>,
): Promise<Found<Read<T>>> => {
	if (!input.ok) return input;
	const {label, text, notes} = input.value;
	const reading = await read(text);
	if (!reading.ok) return badInput(describeProblems(label, reading.problems));
	return found({label, value: reading.value, document: reading.document, uncertainties: reading.uncertainties, notes});
};
