/** One text given to a reader, and which promise was broken. */
import type {Problem} from '../../source/documents/problem.ts';
import type {Answer, Reader} from './reader.ts';

/** `promise` is short and the same for all texts that break it in the same way. */
export type Broken = {promise: string; detail: string};
export type Judged = {accepted: boolean; broken: Broken | undefined};

export async function judge(reader: Reader, text: string): Promise<Judged> {
	try {
		const answer = await reader.read(text);
		return {accepted: answer.accepted, broken: brokenBy(answer)};
	} catch (error) {
		return {accepted: false, broken: thrown(error)};
	}
}

/** What moves a cursor, rings, or turns the direction of a line. A line end is no harm. */
const unsafe = /[^\P{Cc}\n]|[\u061c\u200e\u200f\u2028-\u202e\u2066-\u2069]/u;

function brokenBy({accepted, said = '', problems, broken}: Answer): Broken | undefined {
	const control = unsafe.exec(said);
	if (control) return {promise: 'no control character is said', detail: JSON.stringify(around(said, control.index))};
	if (broken !== undefined) return {promise: broken.split(':')[0]!, detail: broken};
	if (accepted || problems === undefined) return undefined;
	if (problems.length === 0) return {promise: 'what is rejected has a problem', detail: ''};
	const poor = problems.find(problem => !isComplete(problem));
	return poor && {promise: 'a problem says where, what was found and what is allowed', detail: JSON.stringify(poor)};
}

/** The document as a whole has an empty path. */
function isComplete({path, line, column, found, allowed}: Problem): boolean {
	const isPlace = (number: number | undefined) => number === undefined || (Number.isSafeInteger(number) && number >= 1);
	const isSaid = (words: unknown) =>
		typeof words === 'string' && words.trim() !== '' && !/\[object |Invalid input/.test(words);
	return typeof path === 'string' && isPlace(line) && isPlace(column) && isSaid(found) && isSaid(allowed);
}

function thrown(error: unknown): Broken {
	if (!(error instanceof Error)) return {promise: 'nothing is thrown', detail: String(error)};
	// Where it was thrown tells one fault from another.
	const place = /\n\s+at (\S+)/.exec(error.stack ?? '')?.[1] ?? '';
	return {promise: `nothing is thrown (${error.name} in ${place})`, detail: error.stack ?? error.message};
}

function around(text: string, at: number): string {
	return text.slice(Math.max(0, at - 40), at + 40);
}
