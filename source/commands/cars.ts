/** `droprack cars`: the cars there are, and which one is taken where none is named. */
import {homeDirectory} from '../store/home.ts';
import {type PreferencesWritten, preferCar, readPreferences} from '../store/preferences.ts';
import {carListView, type ListedCar} from '../text/list-view.ts';
import type {CommandRun} from './command.ts';
import {findDocument, isFileName} from './find-document.ts';
import {printJson, printText} from './print.ts';
import {badInput, type Reply, replyDone, replyRefused, unreachable} from './reply.ts';
import {type Shelved, shelf} from './shelf.ts';

const listOf = (value: unknown): unknown[] => (Array.isArray(value) ? value : []);

const listed = ({name, stem, from, document}: Shelved, preferred: string | undefined): ListedCar => ({
	name,
	file: stem,
	types: [...new Set(listOf(document.engines).flatMap(engine => listOf((engine as {for?: unknown}).for)))].map(String),
	gearboxes: listOf(document.gearboxes).length,
	pairs: listOf((document.rack as {pairs?: unknown} | undefined)?.pairs).length,
	from,
	preferred: name === preferred,
});

export const cars: CommandRun = async (request, around) => {
	const shelved = shelf('car', around);
	const home = homeDirectory(around.environment);
	if (request.prefer !== undefined) return prefer(request.prefer, shelved.entries, home);
	const preferences = readPreferences(home);
	const notes = [...shelved.notes, ...(preferences.ok ? [] : [preferences.message])];
	const list = shelved.entries.map(car => listed(car, preferences.ok ? preferences.value.car : undefined));
	if (request.json) return replyDone(printJson({cars: list}, request), notes);
	return replyDone(printText(carListView(list), request, around), notes);
};

/** Keeps the preference by the car's own name. Nothing is a result: what was done is said on standard error. */
const prefer = async (asked: string, shelved: readonly Shelved[], home: string): Promise<Reply> => {
	if (asked === 'none')
		return written(await preferCar(home, undefined), 'no car is preferred; the demo car is used where none is named.');
	if (isFileName(asked))
		return replyRefused(badInput('droprack: --prefer takes the name of a saved or shipped car, not a file.'));
	const car = findDocument(asked, shelved, 'car');
	if (!car.ok) return replyRefused(car);
	const {name} = car.value;
	return written(await preferCar(home, name), `${name} is used where no car is named.`);
};

const written = (result: PreferencesWritten, note: string): Reply => {
	if (result.ok) return replyDone('', [note]);
	return replyRefused(result.reason === 'broken' ? badInput(result.message) : unreachable(result.message));
};
