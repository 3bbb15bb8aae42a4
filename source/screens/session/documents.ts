/** The documents of a session: those that were opened, and which track and car are looked at. */
import {type JsonObject, sameJson} from '../../documents/json.ts';

export type Kind = 'track' | 'car';

export type OpenDocument = {
	/** `track:quillmere`; one that is new has a number. */
	readonly id: string;
	readonly kind: Kind;
	/** Where it came from, in words: "shipped", "saved", "new", or a file. */
	readonly from: string;
	readonly json: JsonObject;
	/** As it was last read or saved; undefined: never. */
	readonly saved: JsonObject | undefined;
	/** As the program ships it; undefined where it does not. */
	readonly shipped: JsonObject | undefined;
	/** Of a track: pair and set that were saved with it, "33/38 A". */
	readonly plan: string | undefined;
	/** Of a track: what to remember, as it stands and as it was last read or saved. */
	readonly notes?: string | undefined;
	readonly savedNotes?: string | undefined;
};

export type Documents = {
	readonly open: Readonly<Record<string, OpenDocument>>;
	/** Ids of what is looked at. */
	readonly track: string;
	readonly car: string;
};

export const current = (documents: Documents, kind: Kind): OpenDocument => documents.open[documents[kind]]!;

/** What is looked at, with another content. */
export function withJson(documents: Documents, kind: Kind, json: JsonObject): Documents {
	const document = current(documents, kind);
	if (json === document.json) return documents;
	return {...documents, open: {...documents.open, [document.id]: {...document, json}}};
}

/** The track that is looked at, with other notes; none where nothing is written. */
export function withNotes(documents: Documents, text: string): Documents {
	const track = current(documents, 'track');
	const notes = text.trim() === '' ? undefined : text.trim();
	if (notes === track.notes) return documents;
	return {...documents, open: {...documents.open, [track.id]: {...track, notes}}};
}

/** The document put in the place of the one of its id. */
export const withDocument = (documents: Documents, document: OpenDocument): Documents => ({
	...documents,
	open: {...documents.open, [document.id]: document},
});

/** Looks at another document; one that is open already is taken as it stands, with its changes. */
export function lookAt(documents: Documents, document: OpenDocument): Documents {
	const {id, kind} = document;
	const open = id in documents.open ? documents.open : {...documents.open, [id]: document};
	return {...documents, open, [kind]: id};
}

export const isChanged = ({json, saved, notes, savedNotes}: OpenDocument): boolean =>
	!sameJson(json, saved) || notes !== savedNotes;

/** Documents with changes that are not saved. */
export const unsaved = (documents: Documents): OpenDocument[] => Object.values(documents.open).filter(isChanged);

/** The name that a document gives itself. */
export const titleOf = ({json}: OpenDocument): string => (typeof json.name === 'string' ? json.name : 'no name');

/** A document with nothing in it but what no document lacks: what is needed is listed on the screen. */
export function newDocument(kind: Kind, open: Documents['open']): OpenDocument {
	const json = kind === 'track' ? emptyTrack : emptyCar;
	return {id: newId(kind, open), kind, from: 'new', json, saved: undefined, shipped: undefined, plan: undefined};
}

/** One that no open document has. */
export function newId(kind: Kind, open: Documents['open']): string {
	let number = 1;
	while (`${kind}:new ${number}` in open) number++;
	return `${kind}:new ${number}`;
}

const emptyTrack: JsonObject = {
	kind: 'track',
	version: 1,
	name: 'New track',
	type: 'short',
	straights: [{name: 'Front'}, {name: 'Back'}],
};

const emptyCar: JsonObject = {
	kind: 'car',
	version: 1,
	name: 'New car',
	engines: [{name: 'Engine', for: ['short', 'intermediate', 'superspeedway', 'road'], curve: []}],
	gearboxes: [{name: 'A'}],
	tires: {},
	rack: {pairs: []},
};

/** Whether a content says itself to be of a kind. */
export const describesKind = (json: JsonObject, kind: Kind): boolean => json.kind === kind;
