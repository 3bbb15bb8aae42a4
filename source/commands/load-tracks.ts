/** Several tracks and the one car that they are asked about. */
import {readCar, readTrack} from '../documents/read.ts';
import {visible} from '../documents/visible.ts';
import type {Car} from '../drivetrain/car.ts';
import type {Track} from '../drivetrain/track.ts';
import {inputOf, load} from './document-input.ts';
import {chooseCar} from './load-documents.ts';
import {badInput, type Found, found} from './reply.ts';
import type {Request} from './request.ts';
import type {Surroundings} from './surroundings.ts';

export type NamedTrack = {
	/** The track's own name, with the word that it was asked for by where two have the same. */
	name: string;
	track: Track;
	/** What messages call its document. */
	label: string;
};

export type LoadedTracks = {tracks: NamedTrack[]; car: Car; carLabel: string; notes: string[]};

/** Every track once, in the order asked, or everything that is wrong with any of the documents. */
export const loadTracks = async (request: Request, around: Surroundings): Promise<Found<LoadedTracks>> => {
	const asked = [...new Set([request.argument, ...(request.more ?? [])].filter(word => word !== undefined))];
	const inputs = [];
	for (const word of asked) inputs.push(await inputOf(word, 'track', around));
	const saved = [
		...new Set(inputs.flatMap(input => (input.ok && input.value.car !== undefined ? [input.value.car] : []))),
	];
	if (request.car === undefined && saved.length > 1) return badInput(severalCars(saved));
	const choice = chooseCar(request, saved[0], around);
	const tracks = [];
	for (const input of inputs) tracks.push(await load(input, readTrack));
	const car = await load(await inputOf(choice.car, 'car', around), readCar);
	const refusals = [...tracks, car].filter(one => !one.ok);
	const [first] = refusals;
	if (first !== undefined || !car.ok)
		return {...first!, message: [...refusals.map(one => one.message), ...choice.reasons].join('\n')};
	const read = tracks.flatMap(one => (one.ok ? [one.value] : []));
	const named = read.map(({value, label}, i) => ({name: nameAmong(read, i, asked[i]!), track: value, label}));
	const notes = [...new Set([...choice.notes, ...[...read, car.value].flatMap(one => one.notes)])];
	return found({tracks: named, car: car.value.value, carLabel: car.value.label, notes});
};

const nameAmong = (read: readonly {value: Track}[], index: number, asked: string): string => {
	const {name} = read[index]!.value;
	const isAlone = read.filter(({value}) => value.name === name).length === 1;
	return isAlone ? name : `${name} (${visible(asked)})`;
};

const severalCars = (names: readonly string[]): string =>
	`The tracks were saved with different cars: ${names.map(visible).join(', ')}. --car says which one is meant.`;
