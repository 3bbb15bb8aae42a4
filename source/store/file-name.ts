/** Safe file names from any names. */
import {createHash} from 'node:crypto';

const longestPart = 48;
const hashLength = 16;
/** Names that Windows takes for devices, with any ending. */
const device = /^(con|prn|aux|nul|com\d|lpt\d)$/;

/** The name by which two spellings of the same characters are one. */
export const sameSpelling = (name: string): string => name.normalize('NFC');

/**
 * The file name for what bears this name: of `a-z`, `0-9`, `-`, `_` and `.json`, at most 70 characters. A name that is
 * such a word already is its own; any other gets a part of its hash, after a `_` that no plain word has, so that
 * names which differ in case or in stripped characters have different files.
 */
export const fileNameOf = (name: string): string => {
	const exact = sameSpelling(name);
	const word = wordOf(exact);
	if (word !== '' && word === exact && !device.test(word)) return `${word}.json`;
	// UTF-16, because halves of surrogate pairs are all one character in UTF-8.
	const hash = createHash('sha256').update(Buffer.from(exact, 'utf16le')).digest('hex').slice(0, hashLength);
	return `${word || 'name'}_${hash}.json`;
};

/** What a person recognizes of the name: letters without their marks, digits, and dashes for all else. */
const wordOf = (name: string): string =>
	name
		.normalize('NFKD')
		.toLowerCase()
		.replace(/\p{M}/gu, '')
		.replace(/[^a-z0-9]+/g, '-')
		.slice(0, longestPart)
		.replace(/^-+|-+$/g, '');
