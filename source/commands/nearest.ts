import {distance} from 'fastest-levenshtein';

/** How many edits, as a share of the longer word, still count as a slip of the hand. */
const slip = 0.4;

/** The names that `word` may have meant, nearest first; a beginning of a name counts as near. */
export const nearestNames = (word: string, names: readonly string[], most = 3): string[] => {
	const folded = word.toLowerCase();
	const scored = names.map(name => {
		const other = name.toLowerCase();
		const share = distance(folded, other) / Math.max(folded.length, other.length, 1);
		return {name, share: folded.length >= 3 && other.includes(folded) ? 0 : share};
	});
	const near = scored.filter(({share}) => share <= slip).sort((a, b) => a.share - b.share);
	return near.slice(0, most).map(({name}) => name);
};

/** "Did you mean x?" with a blank before it, or nothing. */
export const didYouMean = (word: string, names: readonly string[]): string => {
	const [name] = nearestNames(word, names, 1);
	return name === undefined ? '' : ` Did you mean ${name}?`;
};
