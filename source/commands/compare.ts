/** `droprack compare`: two documents side by side, differences only. */
import {describeProblems, maxDocumentBytes, type Problem, readCar, readTrack} from '../documents/read.ts';
import {visible} from '../documents/visible.ts';
import {compare} from '../sharing/compare.ts';
import {readShared} from '../sharing/read-shared.ts';
import {text} from '../text/blocks.ts';
import {differenceTable} from '../text/plan-view.ts';
import type {CommandRun} from './command.ts';
import {inputOf} from './document-input.ts';
import {printJson, printText} from './print.ts';
import {type Input, readFileText} from './read-input.ts';
import {badInput, type Found, found, replyDone, replyRefused} from './reply.ts';
import type {Surroundings} from './surroundings.ts';

type Json = Record<string, unknown>;
type Document = {label: string; document: Json};

export const compareDocuments: CommandRun = async (request, around) => {
	const {argument, second} = request;
	if (argument === undefined || second === undefined)
		return replyRefused(badInput('droprack compare: which A and which B? Files, or names of tracks or cars.'));
	const [a, b] = [await documentOf(argument, around), await documentOf(second, around)];
	if (!a.ok) return replyRefused(a);
	if (!b.ok) return replyRefused(b);
	const pair = alike(a.value.document, b.value.document);
	if (pair === undefined)
		return replyRefused(
			badInput('droprack compare: a track and a car have nothing in common; two of a kind, or a plan beside one.'),
		);
	const differences = compare(...pair);
	if (request.json) return replyDone(printJson({differences}, request));
	const heading = text(`A: ${a.value.label}  ·  B: ${b.value.label}`, 'strong', 2);
	const result = differences.length === 0 ? text('They say the same.') : differenceTable(differences, 'A', 'B');
	return replyDone(printText([heading, result], request, around));
};

/** Two of a kind; beside a plan its track or its car. */
const alike = (a: Json, b: Json): [Json, Json] | undefined => {
	if (a.kind === b.kind) return [a, b];
	if (a.kind === 'plan') return [a[String(b.kind)] as Json, b];
	if (b.kind === 'plan') return [a, b[String(a.kind)] as Json];
	return undefined;
};

/** Text files of plans are named by their ending, too. */
const isTextFile = (asked: string): boolean => /\.(txt|text|md|eml)$/i.test(asked);

const textOf = async (asked: string, around: Surroundings): Promise<Found<Input>> =>
	isTextFile(asked) ? readFileText(asked, maxDocumentBytes) : inputOf(asked, ['track', 'car'], around);

const documentOf = async (asked: string, around: Surroundings): Promise<Found<Document>> => {
	const input = await textOf(asked, around);
	if (!input.ok) return input;
	const {label, text: content} = input.value;
	const reading = await readAnyOf(content);
	if (!reading.ok) return badInput(describeProblems(label, reading.problems));
	return found({label: visible(asked), document: reading.document});
};

type AnyReading = {ok: true; document: Json} | {ok: false; problems: Problem[]};

/** As the kind that it says it is; else as a message with a plan. */
const readAnyOf = async (content: string): Promise<AnyReading> => {
	const isJson = /^\ufeff?\s*[[{]/.test(content);
	const track = isJson ? await readTrack(content) : undefined;
	if (track?.ok) return track;
	const kind = track?.problems.find(({path}) => path === 'kind')?.found;
	if (kind === '"car"') return readCar(content);
	if (track !== undefined && kind !== '"plan"') return track;
	const shared = await readShared(content);
	if (!shared.ok) return shared;
	if (shared.form === 'plan') return {ok: true, document: shared.plan as unknown as Json};
	return {ok: false, problems: [{path: '', found: 'a short form', allowed: 'a plan, a track or a car'}]};
};
