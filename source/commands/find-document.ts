/** Which document a name means. */
import {visible} from '../documents/visible.ts';
import {nearestNames} from './nearest.ts';
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

const unknown = (asked: string, shelved: readonly Named[], what: string): string => {
	const byName = nearestNames(
		asked,
		shelved.flatMap(entry => [entry.name, entry.stem]),
	);
	const near = shelved.filter(entry => byName.includes(entry.name) || byName.includes(entry.stem));
	const lines = near.length > 0 ? ['Nearest:', ...near.map(listed)] : ['There are:', ...shelved.map(listed)];
	const hint = 'A file is given with a slash or with the ending .json.';
	return [`droprack: there is no ${what} called ${visible(asked)}.`, ...lines, hint].join('\n');
};
