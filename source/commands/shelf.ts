/** The documents that have a name: the shipped ones, and later the saved ones before them. */
import {readdirSync, readFileSync} from 'node:fs';
import {fileURLToPath} from 'node:url';

export type Kind = 'track' | 'car';
export type Shelved = {
	kind: Kind;
	from: 'saved' | 'shipped';
	/** The name that the document gives itself. */
	name: string;
	/** The file's name without `.json`; also accepted as a name. */
	stem: string;
	file: string;
	text: string;
	/** As parsed, not checked: what is checked goes through the reader. */
	document: Record<string, unknown>;
};

/** The documents of a kind, saved ones first, by file name. Loads no reader, so that a listing starts at once. */
export const shelf = (kind: Kind, shipped: URL): Shelved[] =>
	readDirectory(kind, 'shipped', directoryOf(kind, shipped));

/** The track of the bare command, and the car that is taken where none is named. */
export const demo = {track: 'tarrowdale', car: 'demo'} as const;

const directoryOf = (kind: Kind, shipped: URL): string =>
	fileURLToPath(kind === 'car' ? new URL('cars/', shipped) : shipped);

const readDirectory = (kind: Kind, from: Shelved['from'], directory: string): Shelved[] =>
	readdirSync(directory)
		.filter(file => file.endsWith('.json'))
		.sort()
		.map(base => {
			const file = `${directory}${base}`;
			const text = readFileSync(file, 'utf8');
			const document = JSON.parse(text) as Record<string, unknown>;
			return {kind, from, name: String(document.name), stem: base.slice(0, -'.json'.length), file, text, document};
		});
