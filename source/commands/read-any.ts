/** A track or a car, whichever a word of the command line means, read and checked. */
import {type Reading, readCar, readTrack} from '../documents/read.ts';
import {readJson} from '../documents/read-json.ts';
import type {Named} from '../store/kept-documents.ts';
import {inputOf} from './document-input.ts';
import {load} from './load-documents.ts';
import {type Found, found} from './reply.ts';
import type {Kind, Shelved} from './shelf.ts';
import type {Surroundings} from './surroundings.ts';

export type AnyDocument = {
	kind: Kind;
	document: Named;
	from: Shelved['from'] | undefined;
	car: string | undefined;
	notes: string[];
};

/** The document, as it was written; only a sound one is found. */
export const readAny = async (
	asked: string,
	kinds: readonly Kind[],
	around: Surroundings,
): Promise<Found<AnyDocument>> => {
	const input = await inputOf(asked, kinds, around);
	if (!input.ok) return input;
	const {text, from, car, notes} = input.value;
	const kind = kinds.length === 1 ? kinds[0]! : await kindOf(text);
	const read: (text: string) => Promise<Reading<unknown>> = kind === 'car' ? readCar : readTrack;
	const loaded = await load(input, read);
	if (!loaded.ok) return loaded;
	// A document that the readers take has a name.
	return found({kind, document: loaded.value.document as Named, from, car, notes});
};

/** What a text says it is; of one that says nothing a track's reader tells what is missing. */
const kindOf = async (text: string): Promise<Kind> => {
	const json = await readJson(text);
	return json.ok && json.document.kind === 'car' ? 'car' : 'track';
};
