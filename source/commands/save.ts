/** `droprack save`: a track or a car kept under its name, with what was chosen for it. */
import {visible} from '../documents/visible.ts';
import {homeDirectory} from '../store/home.ts';
import {canonical, type Preset, type SavedCar} from '../store/kept-documents.ts';
import {keptNamed} from '../store/list-kept.ts';
import type {Kept} from '../store/read-kept.ts';
import {saveKept} from '../store/save-kept.ts';
import type {CommandRun} from './command.ts';
import {findDocument, isFileName} from './find-document.ts';
import {type AnyDocument, readAny} from './read-any.ts';
import {badInput, type Found, found, type Reply, replyRefused} from './reply.ts';
import type {Request} from './request.ts';
import {shelf, shippedShelf} from './shelf.ts';
import {refusalOf, replyChanged, replyWritten} from './store-reply.ts';
import type {Surroundings} from './surroundings.ts';

type Keepable = Preset | SavedCar;

export const save: CommandRun = async (request, around) => {
	if (request.argument === undefined)
		return replyRefused(badInput('droprack save: which DOCUMENT? A file, - for standard input, or a name.'));
	const read = await readAny(request.argument, ['track', 'car'], around);
	return read.ok ? keepDocument(read.value, request, around) : replyRefused(read);
};

/** Keeps a document with what the request says of it; one that is saved and differs gives way only to `--replace`. */
export const keepDocument = (read: AnyDocument, request: Request, around: Surroundings): Reply => {
	const home = homeDirectory(around.environment);
	const {kind, document, notes} = read;
	const present: Kept<Keepable> | undefined = keptNamed(home, kind === 'track' ? 'preset' : 'saved-car', document.name);
	const made = toKeep(read, present?.document, request, around);
	if (!made.ok) return replyRefused(made);
	const refusal = present && differing(present, made.value, request);
	if (refusal !== undefined) return replyRefused(badInput(refusal));
	if (present && isSame(present.document, made.value))
		return replyWritten(
			{name: present.name, file: present.file},
			['it is saved already; nothing was changed.'],
			request,
		);
	return keep(home, made.value, present?.revision, notes, request);
};

/** Saves on a revision, and says where. */
export const keep = (
	home: string,
	document: Keepable,
	base: string | undefined,
	notes: readonly string[],
	request: Request,
): Reply => {
	const answer = document.kind === 'preset' ? saveKept(home, document, base) : saveKept(home, document, base);
	if (answer.kind === 'failed') return replyRefused(refusalOf(answer.problem));
	const name = visible(nameIn(document));
	if (answer.kind === 'changed') return replyChanged(name);
	const {file} = answer.kept;
	return replyWritten({name: answer.kept.name, file}, [`${name} is saved in ${visible(file)}.`, ...notes], request);
};

/** The name of a shipped document of that name, which a saved one is then a copy of. */
export const shippedName = (kind: 'track' | 'car', name: string, around: Surroundings): string | undefined =>
	shippedShelf(kind, around.shipped).find(entry => entry.name === name)?.name;

const toKeep = (
	{kind, document}: AnyDocument,
	present: Keepable | undefined,
	request: Request,
	around: Surroundings,
): Found<Keepable> => {
	const saved = around.now.toISOString();
	const basedOn = present?.basedOn ?? shippedName(kind, document.name, around);
	const notes = request.notes ?? present?.notes;
	if (kind === 'car') {
		if (request.car ?? request.pair ?? request.gearbox)
			return badInput('droprack save: --car, --pair and --gearbox go with a track; this is a car.');
		return found({kind: 'saved-car', version: 1, car: document, notes, basedOn, saved});
	}
	const car = request.car === undefined ? found(carOf(present)) : carNamed(request.car, around);
	if (!car.ok) return car;
	const before = present?.kind === 'preset' ? present : undefined;
	const pair = request.pair ? `${request.pair.driving}/${request.pair.driven}` : before?.pair;
	const gearbox = request.gearbox ?? before?.gearbox;
	return found({kind: 'preset', version: 1, track: document, car: car.value, pair, gearbox, notes, basedOn, saved});
};

const carOf = (present: Keepable | undefined): string | undefined =>
	present?.kind === 'preset' ? present.car : undefined;

const carNamed = (asked: string, around: Surroundings): Found<string> => {
	if (isFileName(asked)) return badInput('droprack save: --car takes a name here; save the car first.');
	const entry = findDocument(asked, shelf('car', around).entries, 'car');
	return entry.ok ? found(entry.value.name) : entry;
};

/** What a person is asked before a saved document gives way: which fields differ. */
const differing = (present: Kept<Keepable>, made: Keepable, {replace}: Request): string | undefined => {
	const [before, after] = [innerOf(present.document), innerOf(made)];
	if (replace || canonical(before) === canonical(after)) return undefined;
	const fields = [...new Set([...Object.keys(before), ...Object.keys(after)])]
		.filter(field => canonical(before[field] ?? null) !== canonical(after[field] ?? null))
		.join(', ');
	const name = visible(present.name);
	return `droprack: ${name} is saved already and differs in: ${visible(fields)}.\n--replace takes the new one; the saved one stays as ${visible(present.file)}.bak.`;
};

const innerOf = (document: Keepable) => (document.kind === 'preset' ? document.track : document.car);
const nameIn = (document: Keepable): string => innerOf(document).name;
const isSame = (one: Keepable, other: Keepable): boolean =>
	canonical({...one, saved: ''}) === canonical({...other, saved: ''});
