import {readFileSync} from 'node:fs';
import {exampleOf} from '../../../source/documents/quantity.ts';
import {
	checkCar,
	checkTrack,
	describeProblems,
	type Problem,
	type Reading,
	readCar,
	readTrack,
} from '../../../source/documents/read.ts';
import {carSchema, trackSchema} from '../../../source/documents/schema.ts';
import {dimensions} from '../../../source/documents/units.ts';
import {completeCar, completeTrack} from '../../documents/complete.ts';
import {nudged} from '../mutate.ts';
import type {Answer, Reader} from '../reader.ts';

export const shippedText = (name: string): string => readFileSync(`tracks/${name}.json`, 'utf8');
export const fixtureText = (name: string): string => readFileSync(`tests/fixtures/${name}.json`, 'utf8');

type Kind = 'track' | 'car';
const readers = {track: readTrack, car: readCar} satisfies Record<Kind, (text: string) => Promise<Reading<unknown>>>;
const checkers = {track: checkTrack, car: checkCar};

async function read(kind: Kind, text: string): Promise<Answer> {
	const reading = await readers[kind](text);
	if (!reading.ok) return {...rejected(reading.problems), broken: await atOnceToo(kind, text, reading.problems)};
	const again = await readers[kind](JSON.stringify(reading.document));
	const isSame = again.ok && JSON.stringify(again.value) === JSON.stringify(reading.value);
	const atOnce = checkers[kind](reading.document);
	return {
		accepted: true,
		broken: !isSame
			? 'printed and read again it is the same'
			: atOnce.ok
				? undefined
				: `what is read from text is read from JSON: ${JSON.stringify(atOnce.problems)}`,
	};
}

/** The same problems for the screen, which has the document as JSON: unless the text itself was at fault. */
async function atOnceToo(kind: Kind, text: string, problems: readonly Problem[]): Promise<string | undefined> {
	let document: unknown;
	try {
		document = JSON.parse(text);
	} catch {
		return undefined;
	}
	const isOfText = problems.some(
		({path, found}) => path === '' || found.endsWith('a second time') || found.includes('too long'),
	);
	if (typeof document !== 'object' || document === null || Array.isArray(document) || isOfText) return undefined;
	const atOnce = checkers[kind](document as Record<string, unknown>);
	const paths = (list: readonly Problem[]) => JSON.stringify(list.map(({path, found}) => `${path} ${found}`).sort());
	if (!atOnce.ok && paths(atOnce.problems) === paths(problems)) return undefined;
	return `what is wrong in text is wrong in JSON: ${paths(problems)} ${atOnce.ok ? 'nothing' : paths(atOnce.problems)}`;
}

export function rejected(problems: readonly Problem[]): Answer {
	return {accepted: false, said: describeProblems('file.json', problems), problems};
}

/** All names of fields, kinds and choices, and a quantity of every dimension. */
function wordsOf(kind: Kind): string[] {
	const schema = JSON.stringify(kind === 'track' ? trackSchema() : carSchema());
	const names = [...schema.matchAll(/"([A-Za-z$][\w$]*)":/g)].map(([, name]) => name!);
	return [
		...new Set(names),
		...dimensions.map(dimension => JSON.stringify(exampleOf(dimension))),
		'"+2 mph"',
		'"-3 %"',
		'"33/38"',
		'null',
		'[]',
		'{}',
	];
}

export const tracks: Reader = {
	name: 'tracks',
	examples: () => [
		JSON.stringify(completeTrack()),
		fixtureText('oval'),
		shippedText('tarrowdale'),
		shippedText('hesper-ridge'),
	],
	words: wordsOf('track'),
	mutators: [nudged],
	longest: 12_000,
	read: text => read('track', text),
};

export const cars: Reader = {
	name: 'cars',
	examples: () => [JSON.stringify(completeCar()), fixtureText('car'), shippedText('cars/demo')],
	words: wordsOf('car'),
	mutators: [nudged],
	longest: 12_000,
	read: text => read('car', text),
};
