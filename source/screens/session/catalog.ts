/** The documents that can be chosen: what is open, saved or shipped. */
import type {Documents, Kind, OpenDocument} from './documents.ts';
import {isChanged, titleOf} from './documents.ts';

export type Choice = {
	readonly document: OpenDocument;
	readonly title: string;
	readonly isChanged: boolean;
	readonly isCurrent: boolean;
};

/** All of a kind, those that are open as they stand. */
function all(catalog: readonly OpenDocument[], documents: Documents, kind: Kind): Choice[] {
	const known = catalog.filter(one => one.kind === kind).map(one => documents.open[one.id] ?? one);
	const others = Object.values(documents.open).filter(one => one.kind === kind && !known.includes(one));
	return [...known, ...others].map(document => ({
		document,
		title: titleOf(document),
		isChanged: isChanged(document),
		isCurrent: documents[kind] === document.id,
	}));
}

/** Those with every typed word in their name, those that start with what was typed first. */
export function choicesFor(
	catalog: readonly OpenDocument[],
	documents: Documents,
	kind: Kind,
	typed: string,
): Choice[] {
	const words = folded(typed)
		.split(/\s+/)
		.filter(word => word !== '');
	const start = words.join(' ');
	const nameOf = ({title, document}: Choice) => `${folded(title)} ${folded(document.id.replace(/^.*?:/, ''))}`;
	const fitting = all(catalog, documents, kind).filter(choice => words.every(word => nameOf(choice).includes(word)));
	const startsWith = (choice: Choice) => Number(nameOf(choice).startsWith(start));
	return fitting.sort((a, b) => startsWith(b) - startsWith(a));
}

/** Case and accents make no difference. */
const folded = (text: string): string =>
	text
		.normalize('NFKD')
		.replace(/\p{Mark}/gu, '')
		.toLowerCase();
