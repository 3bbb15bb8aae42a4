/** Which document a name means. */
import {nearest} from '../documents/nearest.ts';
import {visible} from '../documents/visible.ts';
import {badInput, type Found, found} from './reply.ts';

type Named = {name: string; stem: string; from: string; kind: string};

/** A file is a word with a slash (or the system's own separator) or with the ending. */
export const isFileName = (asked: string, separator = '/'): boolean =>
	asked.includes('/') || asked.includes(separator) || asked.toLowerCase().endsWith('.json');

/**
 * The document of that name: by exact name or file stem, else by case-folded ones; among those a saved document
 * comes before a shipped one. Several on the same level are ambiguous.
 */
export const findDocument = <T extends Named>(asked: string, shelved: readonly T[], what: string): Found<T> => {
	const fold = (text: string) => text.normalize('NFC').toLowerCase();
	const sameAs = (change: (text: string) => string) => (entry: Named) =>
		change(entry.name) === change(asked) || change(entry.stem) === change(asked);
	for (const same of [sameAs(text => text), sameAs(fold)]) {
		const matches = shelved.filter(same);
		const saved = matches.filter(entry => entry.from === 'saved');
		const [first, second] = saved.length > 0 ? saved : matches;
		if (first && !second) return found(first);
		if (first) return badInput(ambiguous(asked, matches));
	}
	return badInput(unknown(asked, shelved, what));
};

const listed = ({name, stem, kind}: Named): string => `  ${visible(name)} (${kind}, also called ${stem})`;

const ambiguous = (asked: string, matches: readonly Named[]): string =>
	[`droprack: ${visible(asked)} may mean:`, ...matches.map(listed), 'Write the name exactly, or the second one.'].join(
		'\n',
	);

/** As many as a message lists where none is near. */
const mostListed = 20;

const unknown = (asked: string, shelved: readonly Named[], what: string): string => {
	const near = nearestFew(asked, shelved);
	const all = shelved.slice(0, mostListed);
	const left = shelved.length > all.length ? [`  and ${shelved.length - all.length} more`] : [];
	const lines = near.length > 0 ? ['Nearest:', ...near.map(listed)] : ['There are:', ...all.map(listed), ...left];
	const hint = 'A file is given with a slash or with the ending .json.';
	return [`droprack: there is no ${what} called ${visible(asked)}.`, ...lines, hint].join('\n');
};

/** The nearest by name or stem, then the nearest of the others, and one more. */
const nearestFew = (asked: string, shelved: readonly Named[], most = 3): Named[] => {
	const name = nearest(
		asked,
		shelved.flatMap(entry => [entry.name, entry.stem]),
	);
	if (name === undefined || most === 0) return [];
	const same = (entry: Named) => entry.name === name || entry.stem === name;
	const others = shelved.filter(entry => !same(entry));
	return [...shelved.filter(same), ...nearestFew(asked, others, most - 1)];
};
