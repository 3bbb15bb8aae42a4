/** `droprack import`: the documents of a directory taken into the store. */
import {resolve} from 'node:path';
import {readCar, readTrack} from '../documents/read.ts';
import {visible} from '../documents/visible.ts';
import {problemText} from '../store/answer.ts';
import {homeDirectory} from '../store/home.ts';
import {type Imported, importStore} from '../store/import-store.ts';
import {textOf} from '../store/kept-documents.ts';
import type {ImportChoice} from '../store/read-for-import.ts';
import {cell, type Making, tableOf} from '../text/blocks.ts';
import type {CommandRun} from './command.ts';
import {printJson, printText} from './print.ts';
import {badInput, replyDone, replyRefused, status} from './reply.ts';
import {isOfTheDisk, replyProblem} from './store-reply.ts';

const judge: ImportChoice['judge'] = async (kind, document) => {
	const reading = await (kind === 'track' ? readTrack : readCar)(textOf(document));
	const first = reading.ok ? undefined : reading.problems[0];
	return first && `the ${kind} is not sound: ${first.path}: found ${first.found}; allowed ${first.allowed}`;
};

const kinds = {preset: 'track', 'saved-car': 'car', history: 'history'} as const;

const columns: readonly Making<Imported>[] = [
	{head: 'state', align: 'left', keep: 0, cell: ({state}) => cell(state, state === 'changed' ? 'near' : 'plain')},
	{head: 'kind', align: 'left', keep: 1, cell: ({kind}) => cell(kinds[kind])},
	{head: 'name', align: 'left', keep: 0, shortest: 16, cell: ({name}) => cell(name, 'strong')},
];

export const importAll: CommandRun = async (request, around) => {
	if (request.argument === undefined) return replyRefused(badInput('droprack import: from which DIR?'));
	const directory = resolve(request.argument);
	const choice = {replace: request.replace === true, now: around.now.toISOString(), judge};
	const answer = await importStore(homeDirectory(around.environment), directory, choice);
	if (!answer.ok) return replyProblem(answer);
	const {imported, problems} = answer.value;
	const differ = imported.filter(({state}) => state === 'changed').length;
	const notes = [
		...problems.map(problemText),
		...(differ > 0 ? [`${differ} differ from what is saved, which stays; --replace takes the imported ones.`] : []),
		...(imported.length + problems.length === 0 ? [`there is no document in ${visible(directory)}.`] : []),
	];
	const list = imported.map(({kind, ...one}) => ({kind: kinds[kind], ...one}));
	const out = request.json
		? printJson({imported: list}, request)
		: printText([tableOf(columns, imported)], request, around);
	const reply = replyDone(out, notes, request.strict && problems.length + differ > 0);
	return problems.some(isOfTheDisk) ? {...reply, status: status.unreachable} : reply;
};
