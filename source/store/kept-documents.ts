/** What the store keeps. Every file has its kind and the version of its format. */

/** A document as a person wrote it; whether it is a good one is for `source/documents` to say. */
export type Written = {readonly [field: string]: unknown};
export type Named = Written & {readonly name: string};

export type Preset = {
	readonly kind: 'preset';
	readonly version: 1;
	readonly track: Named;
	/** Name of the car used. */
	readonly car?: string | undefined;
	readonly pair?: string | undefined;
	readonly gearbox?: string | undefined;
	readonly notes?: string | undefined;
	/** Name of the shipped track that this one began as a copy of. */
	readonly basedOn?: string | undefined;
	/** ISO 8601. */
	readonly saved: string;
};

export type SavedCar = {
	readonly kind: 'saved-car';
	readonly version: 1;
	readonly car: Named;
	readonly notes?: string | undefined;
	readonly basedOn?: string | undefined;
	readonly saved: string;
};

export type HistoryEntry = {
	/** ISO 8601. */
	readonly date: string;
	readonly session?: string | undefined;
	readonly pair?: string | undefined;
	readonly gearbox?: string | undefined;
	/** The day's air, as in a track document. */
	readonly air?: Written | undefined;
	readonly highestRpm?: number | undefined;
	/** Where on the track the highest RPM was seen. */
	readonly at?: string | undefined;
	readonly situation?: string | undefined;
	readonly remark?: string | undefined;
};

/** One file a track. */
export type History = {
	readonly kind: 'history';
	readonly version: 1;
	/** Name of the track. */
	readonly track: string;
	readonly entries: readonly HistoryEntry[];
};

export type Documents = {preset: Preset; 'saved-car': SavedCar; history: History};
export type KeptKind = keyof Documents;
export const keptKinds: readonly KeptKind[] = ['preset', 'saved-car', 'history'];

export const folders: Readonly<Record<KeptKind, string>> = {preset: 'tracks', 'saved-car': 'cars', history: 'history'};

export const nameOf = (document: Documents[KeptKind]): string => {
	if (document.kind === 'preset') return document.track.name;
	return document.kind === 'saved-car' ? document.car.name : document.track;
};

const isObject = (value: unknown): value is Written =>
	typeof value === 'object' && value !== null && !Array.isArray(value);
const isName = (value: unknown): value is string => typeof value === 'string' && value !== '';
const isTextOrNone = (value: unknown): boolean => value === undefined || typeof value === 'string';

/** What keeps the content from being a document of this kind in the newest version; undefined where nothing does. */
export const shapeProblem = (kind: KeptKind, content: Written): string | undefined => {
	if (kind === 'history') {
		if (!isName(content.track)) return 'track is not a name';
		return Array.isArray(content.entries) && content.entries.every(isObject) ? undefined : 'entries is not a list';
	}
	const field = kind === 'preset' ? 'track' : 'car';
	const inner = content[field];
	if (!isObject(inner) || !isName(inner.name)) return `${field} is not a document with a name`;
	const texts = ['pair', 'gearbox', 'notes', 'basedOn', 'saved', ...(kind === 'preset' ? ['car'] : [])];
	const wrong = texts.find(text => !isTextOrNone(content[text]));
	return wrong === undefined ? undefined : `${wrong} is not text`;
};

/** The bytes of a document, the same for the same content: two blanks a level, fields in the order they were written. */
export const textOf = (document: unknown): string => `${JSON.stringify(document, null, 2)}\n`;

/** A text that is the same for the same content in whatever order of fields. */
export const canonical = (value: unknown): string =>
	JSON.stringify(value, (_, inner: unknown) =>
		isObject(inner) ? Object.fromEntries(Object.entries(inner).sort(byName)) : inner,
	);

const byName = ([a]: [string, unknown], [b]: [string, unknown]): number => (a < b ? -1 : 1);
