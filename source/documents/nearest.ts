import {distance} from 'fastest-levenshtein';

// A third of the letters wrong is still a typo; beyond that a suggestion misleads.
const wrongShare = 1 / 3;
// Longer than any name we know: no use in comparing.
const maxLength = 60;

/** The known name that `name` was most likely meant to be, ignoring case; undefined where none is near. */
export function nearest(name: string, known: Iterable<string>): string | undefined {
	if (name.length > maxLength) return undefined;
	const typed = name.toLowerCase();
	let best: string | undefined;
	let least = Math.max(1, Math.floor(name.length * wrongShare)) + 1;
	for (const candidate of known) {
		const meant = candidate.toLowerCase();
		const edits = sameLetters(typed, meant) ? Math.min(1, distance(typed, meant)) : distance(typed, meant);
		// One letter changed into another is no hint at all.
		if (edits < least && edits < Math.max(typed.length, candidate.length)) [best, least] = [candidate, edits];
	}
	return best;
}

/** `nearest` as a sentence, or undefined. */
export function didYouMean(name: string, known: Iterable<string>): string | undefined {
	const found = nearest(name, known);
	return found === undefined ? undefined : `Did you mean "${found}"?`;
}

/** Letters in the wrong order are one slip, not two. */
function sameLetters(a: string, b: string): boolean {
	return a.length === b.length && [...a].sort().join('') === [...b].sort().join('');
}
