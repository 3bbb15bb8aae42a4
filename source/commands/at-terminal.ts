/** The bare command in a terminal: the screen, on the documents that the ranking would be printed of. */
import type {Keeper} from '../screens/keeper.ts';
import type {OpenDocument} from '../screens/session/documents.ts';
import type {JsonObject} from '../screens/session/json.ts';
import {homeDirectory} from '../store/home.ts';
import {readPreferences} from '../store/preferences.ts';
import {findDocument} from './find-document.ts';
import type {Request} from './request.ts';
import {demo, type Kind, type Shelved, shelf} from './shelf.ts';
import type {Surroundings} from './surroundings.ts';

export async function openAtTerminal({units, ascii, car}: Request, around: Surroundings): Promise<void> {
	const {openScreen} = await import('../screens/open.tsx');
	const catalog = [...shelf('track', around.shipped), ...shelf('car', around.shipped)].map(openDocument);
	const track = catalog.find(({id}) => id === `track:${demo.track}`)!;
	const chosen = chosenCar(car, catalog, around);
	await openScreen({
		documents: {open: {[track.id]: track, [chosen.id]: chosen}, track: track.id, car: chosen.id},
		catalog,
		units,
		theme: {color: around.color, ascii},
		keeper: noKeeper,
	});
}

const openDocument = ({kind, stem, from, document}: Shelved): OpenDocument => ({
	id: `${kind}:${stem}`,
	kind,
	from,
	json: document as JsonObject,
	saved: document as JsonObject,
	shipped: from === 'shipped' ? (document as JsonObject) : undefined,
});

function chosenCar(asked: string | undefined, catalog: readonly OpenDocument[], around: Surroundings): OpenDocument {
	const preferences = readPreferences(homeDirectory(around.environment));
	const name = asked ?? (preferences.ok ? preferences.value.car : undefined) ?? demo.car;
	const entry = findDocument(name, shelf('car' satisfies Kind, around.shipped), 'car');
	const id = `car:${entry.ok ? entry.value.stem : demo.car}`;
	return catalog.find(one => one.id === id)!;
}

const noKeeper: Keeper = {
	keep() {},
	drop() {},
	earlier: undefined,
	dropEarlier() {},
	save: async () => ({ok: false, words: 'There is no store yet.'}),
	where: () => undefined,
};
