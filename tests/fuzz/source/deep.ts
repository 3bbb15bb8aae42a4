/** Stands for a reader of `source` in the tests of the fuzzer: coverage is taken of what lies in a folder of that name. */
import type {Answer} from '../reader.ts';

/** Throws for texts that begin with three letters, each behind a branch of its own. */
export function readDeep(text: string): Answer {
	if (text[0] !== 'D') return {accepted: true};
	if (text[1] !== 'R') return {accepted: true};
	if (text[2] !== 'P') return {accepted: true};
	throw new RangeError('deep down');
}

/** Takes as many steps as the square of the length. */
export function readSlowly(text: string): Answer {
	let pairs = 0;
	for (const one of text) for (const other of text) if (one === other) pairs++;
	return {accepted: pairs >= 0};
}
