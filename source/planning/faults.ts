/** Bad input that only the whole of car and track shows, in the reader's words. */
import type {Fault, Outcome} from './results.ts';

export function fault(document: Fault['document'], path: string, found: string, allowed: string): Fault {
	return {document, path, found, allowed};
}

export function unknownName(document: Fault['document'], path: string, name: string, known: readonly string[]): Fault {
	return fault(
		document,
		path,
		`"${name}"`,
		known.length === 0 ? 'nothing: there are none' : `one of ${known.join(', ')}`,
	);
}

export function failed<T>(faults: Fault[]): Outcome<T> {
	return {ok: false, faults};
}

export function done<T>(value: T): Outcome<T> {
	return {ok: true, value};
}
