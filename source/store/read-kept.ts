/** Reading one file of the store. It may have been changed by hand, cut, or made by a stranger. */
import {createHash} from 'node:crypto';
import {existsSync, lstatSync, readFileSync} from 'node:fs';
import {scanJson} from '../documents/json-scan.ts';
import {type Answer, done, failed, type StoreProblem, unreachable} from './answer.ts';
import {backupOf} from './durable-write.ts';
import {type Documents, type KeptKind, nameOf, shapeProblem, type Written} from './kept-documents.ts';
import {migrate, migrations} from './migrations.ts';

export type Kept<D> = {
	name: string;
	file: string;
	/** Stands for the bytes of the file: a save says which revision it began from. */
	revision: string;
	document: D;
};

/** A history of ten years has a hundredth of it. */
const largestBytes = 10_000_000;
const deepest = 64;

/** The document of this kind in the file. */
export const readKept = <K extends KeptKind>(file: string, kind: K): Answer<Kept<Documents[K]>> => {
	const content = readContent(file);
	if (!content.ok) return content;
	const {value, revision} = content.value;
	const known = understood(file, kind, value);
	if (!known.ok) return known;
	const wrong = shapeProblem(kind, known.value);
	if (wrong !== undefined) return failed(broken(file, wrong));
	const document = known.value as Documents[K];
	return done({name: nameOf(document), file, revision, document});
};

/** The object in the newest version of its kind. */
export const understood = (file: string, kind: KeptKind | 'session', value: Written): Answer<Written> => {
	if (value.kind !== kind) return failed(broken(file, `kind is ${shown(value.kind)}, expected "${kind}"`));
	const migrated = migrate(value, migrations[kind]);
	if (migrated.ok) return done(migrated.content);
	const found = `version is ${shown(value.version)}, expected 1 to ${migrated.newest}`;
	if (migrated.reason === 'broken') return failed(broken(file, found));
	const remedy = 'Written by a later Droprack and left as it is: use that one.';
	return failed({reason: 'newer', file, found, remedy});
};

export type Content = {value: Written; revision: string};

/** The JSON object in a plain file, whatever it says. */
export const readContent = (file: string): Answer<Content> => {
	let bytes: Buffer;
	try {
		const about = lstatSync(file);
		if (!about.isFile()) return failed(notPlain(file));
		if (about.size > largestBytes) return failed(broken(file, `larger than ${largestBytes / 1_000_000} MB`));
		bytes = readFileSync(file);
	} catch (error) {
		return failed(unreachable(file, error));
	}
	const value = parse(bytes);
	if (typeof value === 'string') return failed(broken(file, value));
	return done({value, revision: revisionOf(bytes)});
};

export const revisionOf = (bytes: Buffer | string): string =>
	createHash('sha256').update(bytes).digest('hex').slice(0, 32);

/** The object, or in words what there is instead. */
const parse = (bytes: Buffer): Written | string => {
	const text = bytes.toString('utf8').replace(/^\uFEFF/, '');
	if (text.trim() === '') return 'empty';
	if (scanJson(text, deepest).tooDeepAt !== undefined) return `nested more than ${deepest} deep`;
	try {
		const value: unknown = JSON.parse(text);
		return typeof value === 'object' && value !== null && !Array.isArray(value) ? (value as Written) : 'not an object';
	} catch (error) {
		if (error instanceof SyntaxError) return 'not valid JSON';
		throw error;
	}
};

export const broken = (file: string, found: string): StoreProblem => {
	const before = existsSync(backupOf(file)) ? ' The version before it is beside it, ending in .bak.' : '';
	return {reason: 'broken', file, found, remedy: `Left as it is: mend it or move it away.${before}`};
};

export const notPlain = (file: string): StoreProblem => ({
	reason: 'broken',
	file,
	found: 'not a plain file',
	remedy: 'Links and directories are not followed: put a file in its place or move it away.',
});

const shown = (value: unknown): string => (JSON.stringify(value) ?? 'missing').slice(0, 40);
