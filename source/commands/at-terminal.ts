/** The bare command in a terminal: the screen, on the documents that the ranking would be printed of. */

import type {JsonObject} from '../documents/json.ts';
import {openScreen} from '../screens/open.ts';
import type {OpenDocument} from '../screens/session/documents.ts';
import {homeDirectory} from '../store/home.ts';
import {readPreferences, rememberTrack} from '../store/preferences.ts';
import {findDocument} from './find-document.ts';
import type {Request} from './request.ts';
import {screenErrands} from './screen-errands.ts';
import {screenKeeper} from './screen-keeper.ts';
import {demo, type Kind, type Shelved, shelf, shippedShelf} from './shelf.ts';
import type {Surroundings} from './surroundings.ts';

export async function openAtTerminal({units, ascii, car}: Request, around: Surroundings): Promise<void> {
	const home = homeDirectory(around.environment);
	const [tracks, cars] = [shelf('track', around), shelf('car', around)];
	const catalog = [...openDocuments('track', tracks.entries, around), ...openDocuments('car', cars.entries, around)];
	const first = trackToStartWith(tracks.entries, home);
	const track = catalog.find(({id}) => id === `track:${first}`)!;
	const savedWith = tracks.entries.find(({stem}) => stem === first)?.car;
	const chosen = chosenCar(car ?? savedWith, catalog, cars.entries, home);
	const left = await openScreen({
		documents: {open: {[track.id]: track, [chosen.id]: chosen}, track: track.id, car: chosen.id},
		catalog,
		units,
		theme: {color: around.color, ascii},
		keeper: screenKeeper(
			home,
			screenErrands(home, around.environment, bytes => process.stdout.write(bytes)),
		),
		// The name that Ink gave it.
		reader: around.environment.INK_SCREEN_READER === 'true',
		notice: [...tracks.notes, ...cars.notes][0],
	});
	const last = tracks.entries.find(({stem}) => `track:${stem}` === left.track)?.stem;
	// A convenience: where it cannot be kept, the next start is at the same track as this one.
	if (last !== undefined && last !== first) await rememberTrack(home, last);
}

/** The track that the screen was left at, else the demo's. */
function trackToStartWith(entries: readonly Shelved[], home: string): string {
	const preferences = readPreferences(home);
	const last = preferences.ok ? preferences.value.track : undefined;
	return entries.some(({stem}) => stem === last) ? last! : demo.track;
}

function openDocuments(kind: Kind, entries: readonly Shelved[], around: Surroundings): OpenDocument[] {
	const shipped = shippedShelf(kind, around.shipped);
	return entries.map(({stem, from, document, plan, notes}) => {
		const json = document as JsonObject;
		const original = from === 'shipped' ? json : shipped.find(one => one.stem === stem)?.document;
		return {
			id: `${kind}:${stem}`,
			kind,
			from,
			json,
			saved: json,
			shipped: original as JsonObject | undefined,
			plan,
			notes,
			savedNotes: notes,
		};
	});
}

/** The car asked for or saved with the track, else the preferred one, else the demo car. */
function chosenCar(
	asked: string | undefined,
	catalog: readonly OpenDocument[],
	entries: readonly Shelved[],
	home: string,
): OpenDocument {
	const preferences = readPreferences(home);
	const preferred = preferences.ok ? preferences.value.car : undefined;
	const found = [asked, preferred, demo.car]
		.filter(name => name !== undefined)
		.map(name => findDocument(name, entries, 'car'))
		.find(entry => entry.ok);
	const stem = found?.ok ? found.value.stem : demo.car;
	return catalog.find(({id}) => id === `car:${stem}`)!;
}
