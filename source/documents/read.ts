/** Reading of track and car documents: text in, SI out, or every problem at once. */
import * as z from 'zod/mini';
import type {Car} from '../drivetrain/car.ts';
import type {Track} from '../drivetrain/track.ts';
import type {Uncertainties} from '../drivetrain/uncertainties.ts';
import {carFields} from './car-fields.ts';
import {carFrom} from './car-from-document.ts';
import {type Problem, shown} from './problem.ts';
import {problemsFrom, type Unplaced, unknownUnitsIn} from './problems-from-issues.ts';
import {isPlaceable, readJson} from './read-json.ts';
import {documentVersion} from './shared-fields.ts';
import {trackFields} from './track-fields.ts';
import {trackFrom} from './track-from-document.ts';
import {uncertaintiesIn} from './uncertainties.ts';

export {describeProblems, type Problem} from './problem.ts';
export {maxDocumentBytes} from './read-json.ts';

export type Reading<T> =
	| {
			ok: true;
			value: T;
			/** The JSON as written. */
			document: Record<string, unknown>;
			/** By the path of the field, where the document states it. */
			uncertainties: Uncertainties;
	  }
	| {ok: false; problems: Problem[]};

/** The track that a text describes, or all that is wrong with it, in the order of the text. */
export async function readTrack(text: string): Promise<Reading<Track>> {
	return readDocument(text, 'track', trackFields(), trackFrom);
}

/** The car that a text describes, or all that is wrong with it, in the order of the text. */
export async function readCar(text: string): Promise<Reading<Car>> {
	return readDocument(text, 'car', carFields(), carFrom);
}

/**
 * As `readTrack`, of a document that is JSON already, and at once: the problems carry no line, and a unit that the table
 * lacks is known only if `learnUnits` has looked it up before.
 */
export function checkTrack(document: Record<string, unknown>): Reading<Track> {
	return checkDocument(document, 'track', trackFields(), trackFrom);
}

/** As `checkTrack`, of a car. */
export function checkCar(document: Record<string, unknown>): Reading<Car> {
	return checkDocument(document, 'car', carFields(), carFrom);
}

function checkDocument<S extends z.core.$ZodType, T>(
	document: Record<string, unknown>,
	kind: string,
	fields: S,
	build: (document: z.output<S>) => T,
): Reading<T> {
	const head = headProblem(document, kind);
	if (head !== undefined) return {ok: false, problems: [head.problem]};
	const checked = z.safeParse(fields, document);
	if (checked.success) return accepted(fields, build(checked.data), document);
	return {ok: false, problems: problemsFrom(checked.error.issues, document).map(({problem}) => problem)};
}

async function readDocument<S extends z.core.$ZodType, T>(
	text: string,
	kind: string,
	fields: S,
	build: (document: z.output<S>) => T,
): Promise<Reading<T>> {
	const json = await readJson(text);
	if (!json.ok) return json;
	const {document} = json;
	const head = headProblem(document, kind);
	if (head !== undefined) return {ok: false, problems: await placed(json.text, [head], json.problems)};
	const checked = await check(fields, document);
	if (checked.success && json.problems.length === 0) return accepted(fields, build(checked.data), document);
	const problems = checked.success ? [] : problemsFrom(checked.error.issues, document);
	return {ok: false, problems: await placed(json.text, problems, json.problems)};
}

const accepted = <T>(fields: z.core.$ZodType, value: T, document: Record<string, unknown>): Reading<T> => ({
	ok: true,
	value,
	document,
	uncertainties: uncertaintiesIn(fields, document),
});

/** Units that the table lacks are looked up once, and the document is read again. */
async function check<S extends z.core.$ZodType>(fields: S, document: unknown) {
	const first = z.safeParse(fields, document);
	const unknown = first.success ? [] : unknownUnitsIn(first.error.issues);
	if (unknown.length === 0) return first;
	const {learnUnits} = await import('./learn-units.ts');
	return (await learnUnits(unknown)) ? z.safeParse(fields, document) : first;
}

/** A document of another kind or time would only give a hundred problems that say nothing. */
function headProblem({kind, version}: Record<string, unknown>, expected: string): Unplaced | undefined {
	if (kind !== expected) {
		return {problem: {path: 'kind', found: shown(kind), allowed: `"${expected}"`}, path: ['kind']};
	}
	if (version === documentVersion) return undefined;
	const isNewer = typeof version === 'number' && version > documentVersion;
	const hint = isNewer ? `Version ${version} is newer than this program reads.` : undefined;
	const problem = {
		path: 'version',
		found: shown(version),
		allowed: String(documentVersion),
		...(hint !== undefined && {hint}),
	};
	return {problem, path: ['version']};
}

/** All problems in the order of the text, each with its place. */
async function placed(text: string, unplaced: readonly Unplaced[], repeated: readonly Problem[]): Promise<Problem[]> {
	if (!isPlaceable(text)) return [...unplaced.map(({problem}) => problem), ...repeated];
	const {placesIn} = await import('./json-problems.ts');
	const placeOf = placesIn(text);
	const withPlace = unplaced.map(({problem, path, key}) => {
		const {path: at, ...rest} = problem;
		const {line, column} = placeOf(path, key);
		return {path: at, line, column, ...rest};
	});
	return [...withPlace, ...repeated].sort((a, b) => (a.line ?? 0) - (b.line ?? 0) || (a.column ?? 0) - (b.column ?? 0));
}
