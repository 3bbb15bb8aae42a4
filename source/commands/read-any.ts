/** A track or a car, whichever a word of the command line means, read and checked. */
import {type Reading, readCar, readTrack} from '../documents/read.ts';
import type {Named} from '../store/kept-documents.ts';
import {inputOf, load} from './document-input.ts';
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
	const [kind = 'track', other] = kinds;
	const loaded = await load(input, other ? readEither : readers[kind]);
	if (!input.ok) return input;
	if (!loaded.ok) return loaded;
	const {from, car, notes} = input.value;
	// A document that the readers take has its kind and a name.
	const document = loaded.value.document as Named & {kind: Kind};
	return found({kind: document.kind, document, from, car, notes});
};

const readers: Record<Kind, (text: string) => Promise<Reading<unknown>>> = {track: readTrack, car: readCar};

/** As a track, unless it says that it is a car. */
const readEither = async (text: string): Promise<Reading<unknown>> => {
	const reading = await readTrack(text);
	const [first] = reading.ok ? [] : reading.problems;
	return first?.path === 'kind' && first.found === '"car"' ? readCar(text) : reading;
};
