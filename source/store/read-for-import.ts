/** One file of a directory as a document of the store. */
import {type Answer, done, failed} from './answer.ts';
import {
	type Documents,
	type KeptKind,
	keptKinds,
	type Preset,
	type SavedCar,
	shapeProblem,
	type Written,
} from './kept-documents.ts';
import {keptNamed} from './list-kept.ts';
import {broken, readContent, understood} from './read-kept.ts';

export type ImportChoice = {
	/** Whether a document of the store gives way to one that differs from it; it stays as `.bak`. */
	replace: boolean;
	/** ISO 8601; for documents that were not saved by Droprack. */
	now: string;
	/** What is wrong with the track or the car itself, in words. */
	judge: (kind: 'track' | 'car', document: Written) => Promise<string | undefined>;
};

/** The document that the file holds, or why it holds none. */
export const readForImport = async (
	home: string,
	file: string,
	choice: ImportChoice,
): Promise<Answer<Documents[KeptKind]>> => {
	const content = readContent(file);
	if (!content.ok) return content;
	const value = inEnvelope(home, content.value.value, choice.now);
	const kind = keptKinds.find(known => known === value.kind);
	if (!kind) return failed(broken(file, 'no track, car, preset or history'));
	const known = understood(file, kind, value);
	if (!known.ok) return known;
	const wrong = shapeProblem(kind, known.value);
	if (wrong !== undefined) return failed(broken(file, wrong));
	const document = known.value as Documents[KeptKind];
	const judged = await judge(document, choice);
	return judged === undefined ? done(document) : failed(broken(file, judged));
};

const judge = async (document: Documents[KeptKind], choice: ImportChoice): Promise<string | undefined> => {
	if (document.kind === 'preset') return choice.judge('track', document.track);
	return document.kind === 'saved-car' ? choice.judge('car', document.car) : undefined;
};

/** A bare track or car takes the place of the one in the store's document of that name, and leaves the rest of it. */
const inEnvelope = (home: string, value: Written, saved: string): Written => {
	const name = String(value.name);
	if (value.kind === 'track') {
		const present: Partial<Preset> | undefined = keptNamed(home, 'preset', name)?.document;
		return {...present, kind: 'preset', version: 1, track: value, saved};
	}
	if (value.kind === 'car') {
		const present: Partial<SavedCar> | undefined = keptNamed(home, 'saved-car', name)?.document;
		return {...present, kind: 'saved-car', version: 1, car: value, saved};
	}
	return value;
};
