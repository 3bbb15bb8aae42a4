/** The track and the car that a command is asked about, read and checked. */
import {sep} from 'node:path';
import {describeProblems, maxDocumentBytes, type Reading, readCar, readTrack} from '../documents/read.ts';
import type {Car} from '../drivetrain/car.ts';
import type {Track} from '../drivetrain/track.ts';
import {homeDirectory} from '../store/home.ts';
import {readPreferences} from '../store/preferences.ts';
import {findDocument, isFileName} from './find-document.ts';
import {type Input, readFileText, readStandardInput} from './read-input.ts';
import {badInput, type Found, found} from './reply.ts';
import type {Request} from './request.ts';
import {demo, type Kind, shelf} from './shelf.ts';
import type {Surroundings} from './surroundings.ts';

export type Loaded = {
	track: Track;
	car: Car;
	/** As they were written. */
	documents: {track: Record<string, unknown>; car: Record<string, unknown>};
	/** What messages call the documents that the two came from. */
	labels: {track: string; car: string};
	/** What is worth knowing beside the result. */
	notes: string[];
};

/** Both documents of a request, or everything that is wrong with them. */
export const loadDocuments = async (request: Request, around: Surroundings): Promise<Found<Loaded>> => {
	const choice = chooseCar(request, around);
	const track = await load(request.argument ?? demo.track, 'track', readTrack, around);
	const car = await load(choice.car, 'car', readCar, around);
	if (!track.ok || !car.ok) {
		const refusals = [track, car].filter(one => !one.ok);
		const first = refusals[0]!;
		return {...first, message: [...refusals.map(one => one.message), ...choice.reasons].join('\n')};
	}
	const labels = {track: track.value.label, car: car.value.label};
	const documents = {track: track.value.document, car: car.value.document};
	return found({track: track.value.value, car: car.value.value, documents, labels, notes: choice.notes});
};

/** The car asked for, else the preferred one, else the demo car. */
const chooseCar = (request: Request, around: Surroundings): {car: string; notes: string[]; reasons: string[]} => {
	if (request.car !== undefined) return {car: request.car, notes: [], reasons: []};
	const preferences = readPreferences(homeDirectory(around.environment));
	if (!preferences.ok) return {car: demo.car, notes: [`${preferences.message} The demo car is used.`], reasons: []};
	const preferred = preferences.value.car;
	if (preferred === undefined) return {car: demo.car, notes: [], reasons: []};
	const reason = 'The car is the preferred one; droprack cars --prefer chooses another, --prefer none the demo car.';
	return {car: preferred, notes: [], reasons: [reason]};
};

type Read<T> = {label: string; value: T; document: Record<string, unknown>};

const load = async <T>(
	asked: string,
	kind: Kind,
	read: (text: string) => Promise<Reading<T>>,
	around: Surroundings,
): Promise<Found<Read<T>>> => {
	const input = await inputOf(asked, kind, around);
	if (!input.ok) return input;
	const {label, text} = input.value;
	const reading = await read(text);
	if (!reading.ok) return badInput(describeProblems(label, reading.problems));
	return found({label, value: reading.value, document: reading.document});
};

const inputOf = async (asked: string, kind: Kind, around: Surroundings): Promise<Found<Input>> => {
	if (asked === '-') return readStandardInput(around.standardInput(), maxDocumentBytes);
	if (isFileName(asked, sep)) return readFileText(asked, maxDocumentBytes);
	const entry = findDocument(asked, shelf(kind, around.shipped), kind);
	return entry.ok ? found({label: entry.value.file, text: entry.value.text}) : entry;
};
