/** The column that a person means: its header with or without its unit, or its number as in `#3`. */
import {nameKey} from './header-names.ts';
import {type Header, headerOf} from './headers.ts';

export type FoundAsked =
	| {readonly kind: 'one'; readonly header: Header; readonly unitText: string | undefined}
	/** The channel is to be left out. */
	| {readonly kind: 'none'}
	| {readonly kind: 'several'; readonly headers: readonly Header[]}
	| {readonly kind: 'nothing'};

const byNumber = /^#\s*(\d{1,5})$/;

export function findAsked(text: string, headers: readonly Header[]): FoundAsked {
	const asked = text.trim();
	const {name, unitText} = headerOf(asked, 0);
	const sameAs = (wanted: string, change: (name: string) => string) =>
		headers.filter(header => [header.written, header.name].some(own => change(own) === change(wanted)));
	const written = headers.filter(header => header.written === asked);
	const looks = [
		{found: written, unitText: undefined},
		{found: sameAs(asked, plain => plain), unitText: undefined},
		{found: numbered(asked, headers), unitText: undefined},
		{found: numbered(name, headers), unitText},
		{found: sameAs(name, plain => plain), unitText},
		{found: nameKey(asked) === '' ? [] : sameAs(asked, nameKey), unitText: undefined},
		{found: nameKey(name) === '' ? [] : sameAs(name, nameKey), unitText},
	];
	const look = looks.find(({found}) => found.length > 0);
	if (look === undefined) return {kind: asked.toLowerCase() === 'none' ? 'none' : 'nothing'};
	const [header, other] = look.found;
	if (other !== undefined) return {kind: 'several', headers: look.found};
	return {kind: 'one', header: header!, unitText: look.unitText};
}

function numbered(text: string, headers: readonly Header[]): readonly Header[] {
	const number = Number(byNumber.exec(text)?.[1]);
	return headers.filter(({column}) => column === number);
}
