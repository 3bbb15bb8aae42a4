/** The track and the car that a command is asked about, read and checked. */
import {readCar, readTrack} from '../documents/read.ts';
import type {Car} from '../drivetrain/car.ts';
import type {Track} from '../drivetrain/track.ts';
import type {Uncertainties} from '../drivetrain/uncertainties.ts';
import {homeDirectory} from '../store/home.ts';
import {readPreferences} from '../store/preferences.ts';
import {type DocumentInput, inputOf, load} from './document-input.ts';
import {type Found, found} from './reply.ts';
import type {Request} from './request.ts';
import {demo} from './shelf.ts';
import type {Surroundings} from './surroundings.ts';

/** `file` and `input` as they were asked for; the others by name. */
export type Origin = {from: 'file' | 'input' | 'saved' | 'shipped'; asked: string; text: string};

export type Loaded = {
	track: Track;
	car: Car;
	/** As they were written. */
	documents: {track: Record<string, unknown>; car: Record<string, unknown>};
	/** What messages call the documents that the two came from. */
	labels: {track: string; car: string};
	/** Where each came from, for a command that writes it back. */
	origins: {track: Origin; car: Origin};
	/** What both state of how well their numbers are known. */
	uncertainties: {track: Uncertainties; car: Uncertainties};
	/** What is worth knowing beside the result. */
	notes: string[];
};

/** Both documents of a request, or everything that is wrong with them. */
export const loadDocuments = async (request: Request, around: Surroundings): Promise<Found<Loaded>> => {
	const trackInput = await inputOf(request.argument ?? demo.track, 'track', around);
	const choice = chooseCar(request, trackInput.ok ? trackInput.value.car : undefined, around);
	const track = await load(trackInput, readTrack);
	const carInput = await inputOf(choice.car, 'car', around);
	const car = await load(carInput, readCar);
	if (!track.ok || !car.ok) {
		const refusals = [track, car].filter(one => !one.ok);
		const first = refusals[0]!;
		return {...first, message: [...refusals.map(one => one.message), ...choice.reasons].join('\n')};
	}
	const labels = {track: track.value.label, car: car.value.label};
	const documents = {track: track.value.document, car: car.value.document};
	const origins = {
		track: originOf(request.argument ?? demo.track, trackInput),
		car: originOf(choice.car, carInput),
	};
	const uncertainties = {track: track.value.uncertainties, car: car.value.uncertainties};
	const notes = [...new Set([...choice.notes, ...track.value.notes, ...car.value.notes])];
	return found({track: track.value.value, car: car.value.value, documents, labels, origins, uncertainties, notes});
};

const originOf = (asked: string, input: Found<DocumentInput>): Origin => {
	const {from, text} = input.ok ? input.value : {from: undefined, text: ''};
	return {from: from ?? (asked === '-' ? 'input' : 'file'), asked, text};
};

type CarChoice = {car: string; notes: string[]; reasons: string[]};

/** The car asked for, else the one saved with the track, else the preferred one, else the demo car. */
export const chooseCar = (
	request: Pick<Request, 'car'>,
	savedWithTrack: string | undefined,
	around: Surroundings,
): CarChoice => {
	if (request.car !== undefined) return {car: request.car, notes: [], reasons: []};
	if (savedWithTrack !== undefined) {
		const reason = 'The car is the one that was saved with the track; --car names another.';
		return {car: savedWithTrack, notes: [], reasons: [reason]};
	}
	const preferences = readPreferences(homeDirectory(around.environment));
	if (!preferences.ok) return {car: demo.car, notes: [`${preferences.message} The demo car is used.`], reasons: []};
	const preferred = preferences.value.car;
	if (preferred === undefined) return {car: demo.car, notes: [], reasons: []};
	const reason = 'The car is the preferred one; droprack cars --prefer chooses another, --prefer none the demo car.';
	return {car: preferred, notes: [], reasons: [reason]};
};
