/** `droprack new`: a track or a car of one's own, begun as a copy. */
import {visible} from '../documents/visible.ts';
import {homeDirectory} from '../store/home.ts';
import type {Preset, SavedCar} from '../store/kept-documents.ts';
import {keptNamed} from '../store/list-kept.ts';
import type {CommandRun} from './command.ts';
import {readAny} from './read-any.ts';
import {badInput, replyRefused} from './reply.ts';
import {keep, shippedName} from './save.ts';
import {demo} from './shelf.ts';

export const newDocument: CommandRun = async (request, around) => {
	const {argument: kind, name} = request;
	if (kind !== 'track' && kind !== 'car')
		return replyRefused(badInput('droprack new: takes track or car: droprack new track --name "Half mile".'));
	if (name === undefined)
		return replyRefused(badInput(`droprack new: needs a name: droprack new ${kind} --name "Half mile".`));
	const read = await readAny(request.from ?? demo[kind], [kind], around);
	if (!read.ok) return replyRefused(read);
	const home = homeDirectory(around.environment);
	if (keptNamed(home, kind === 'track' ? 'preset' : 'saved-car', name))
		return replyRefused(badInput(`droprack new: there is a saved ${kind} called ${visible(name)} already.`));
	const common = {
		version: 1,
		basedOn: shippedName(kind, read.value.document.name, around),
		saved: around.now.toISOString(),
	} as const;
	const document = {...read.value.document, name};
	const made: Preset | SavedCar =
		kind === 'track'
			? {kind: 'preset', track: document, car: read.value.car, ...common}
			: {kind: 'saved-car', car: document, ...common};
	const quoted = JSON.stringify(visible(name));
	const how = `to change it: droprack show ${quoted} > my.json, edit, droprack save my.json --replace`;
	return keep(home, made, undefined, [how], request);
};
