/** What a person prefers, kept in one small file. */
import {existsSync, readFileSync} from 'node:fs';
import {join} from 'node:path';

export type Preferences = {
	/** Name of the car that is taken where none is named. */
	car?: string;
	/** Name of the track that the screen was left at. */
	track?: string;
	/** By the name of the car: how the columns of its logs were read last. What is in it, the reader of logs knows. */
	logColumns?: Readonly<Record<string, LogColumns>>;
};
/** By channel: header and unit. */
export type LogColumns = Readonly<Record<string, {readonly header: string | null; readonly unit?: string}>>;
export type PreferencesRead =
	| {ok: true; value: Preferences}
	| {ok: false; reason: 'broken' | 'unreachable'; message: string};
export type PreferencesWritten = {ok: true} | {ok: false; reason: 'broken' | 'unreachable'; message: string};

const configName = 'preferences';
const formatVersion = 1;

export const preferencesFile = (home: string): string => join(home, `${configName}.json`);

/**
 * The preferences; none where there is no file. Read here and not by conf, which costs every start 30 ms and
 * writes a file anew whose content is not an object: a broken file is to stay as it is.
 */
export const readPreferences = (home: string): PreferencesRead => {
	const file = preferencesFile(home);
	if (!existsSync(file)) return {ok: true, value: {}};
	const broken = (what: string): PreferencesRead => ({
		ok: false,
		reason: 'broken',
		message: `${file}: ${what}; left as it is. Mend it or remove it.`,
	});
	let text: string;
	try {
		text = readFileSync(file, 'utf8');
	} catch (error) {
		return {ok: false, reason: 'unreachable', message: `${file}: cannot be read (${codeOf(error)}).`};
	}
	let content: unknown;
	try {
		content = JSON.parse(text);
	} catch {
		return broken('the preferences are not valid JSON');
	}
	if (typeof content !== 'object' || content === null || Array.isArray(content))
		return broken('the preferences are not an object');
	const {version, car, track, logColumns} = content as Partial<Record<keyof Preferences | 'version', unknown>>;
	if (version !== formatVersion)
		return broken(`the preferences have version ${JSON.stringify(version)}, expected ${formatVersion}`);
	if (car !== undefined && (typeof car !== 'string' || car === '')) return broken('the preferred car is not a name');
	const columns = understood(logColumns);
	return {
		ok: true,
		value: {
			...(car !== undefined && {car}),
			...(typeof track === 'string' && {track}),
			...(columns !== undefined && {logColumns: columns}),
		},
	};
};

/** What a person has made of it by hand is passed over where it is not of this shape: it is only a convenience. */
const understood = (logColumns: unknown): Preferences['logColumns'] => {
	if (!isRecord(logColumns)) return undefined;
	const cars = Object.entries(logColumns).filter(
		([, columns]) => isRecord(columns) && Object.values(columns).every(isColumn),
	);
	return cars.length === 0 ? undefined : (Object.fromEntries(cars) as Preferences['logColumns']);
};

const isRecord = (value: unknown): value is Record<string, unknown> =>
	typeof value === 'object' && value !== null && !Array.isArray(value);
const isColumn = (value: unknown): boolean =>
	isRecord(value) &&
	(value.header === null || typeof value.header === 'string') &&
	(value.unit === undefined || typeof value.unit === 'string');

/** Keeps the preferred car, or forgets it. Writes nothing over a file that cannot be read. */
export const preferCar = (home: string, car: string | undefined): Promise<PreferencesWritten> =>
	change(home, ({car: before, ...rest}) => (before === car ? undefined : {...rest, ...(car !== undefined && {car})}));

/** Keeps at which track the screen was left. */
export const rememberTrack = (home: string, track: string): Promise<PreferencesWritten> =>
	change(home, before => (before.track === track ? undefined : {...before, track}));

/** Keeps how the columns of a car's logs were read. */
export const rememberColumns = (home: string, car: string, columns: LogColumns): Promise<PreferencesWritten> =>
	change(home, before => {
		const isSame = JSON.stringify(before.logColumns?.[car] ?? {}) === JSON.stringify(columns);
		return isSame ? undefined : {...before, logColumns: {...before.logColumns, [car]: columns}};
	});

/** Undefined changes nothing. */
const change = async (
	home: string,
	make: (before: Preferences) => Preferences | undefined,
): Promise<PreferencesWritten> => {
	const before = readPreferences(home);
	if (!before.ok) return before;
	const made = make(before.value);
	if (made === undefined) return {ok: true};
	try {
		const {default: Conf} = await import('conf');
		const store = new Conf({projectName: 'droprack', cwd: home, configName, accessPropertiesByDotNotation: false});
		store.store = {version: formatVersion, ...made};
		return {ok: true};
	} catch (error) {
		return {
			ok: false,
			reason: 'unreachable',
			message: `${preferencesFile(home)}: cannot be written (${codeOf(error)}).`,
		};
	}
};

const codeOf = (error: unknown): string => (error as NodeJS.ErrnoException).code ?? String(error);
