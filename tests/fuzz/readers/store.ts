/** Files of the store as anybody may have changed them. The first line says which; the rest are the bytes. */
import {mkdirSync, readFileSync, rmSync, writeFileSync} from 'node:fs';
import {dirname, join} from 'node:path';
import {isDeepStrictEqual} from 'node:util';
import {restored} from '../../../source/screens/session/restore.ts';
import {problemText, type Answer as StoreAnswer} from '../../../source/store/answer.ts';
import {checkStore} from '../../../source/store/check-store.ts';
import {type KeptKind, keptKinds, textOf} from '../../../source/store/kept-documents.ts';
import {preferencesFile, readPreferences} from '../../../source/store/preferences.ts';
import {processIdentity} from '../../../source/store/process-identity.ts';
import {type Kept, readKept} from '../../../source/store/read-kept.ts';
import {sessionFolder, unsavedSessions} from '../../../source/store/session.ts';
import {documents} from '../../screens/session/documents.ts';
import {newPlace} from '../place.ts';
import type {Answer, Reader} from '../reader.ts';

const home = newPlace();

const folders = {preset: 'tracks', 'saved-car': 'cars', history: 'history'} as const;
const endedProcess = processIdentity().replace(/^\d+/, '4194305');
const files: Record<string, string> = {
	...Object.fromEntries(keptKinds.map(kind => [kind, join(home, folders[kind], 'a.json')])),
	session: join(sessionFolder(home), `${endedProcess}.json`),
	preferences: preferencesFile(home),
};

function read(text: string): Answer {
	const end = text.indexOf('\n');
	const what = text.slice(0, end);
	const file = Object.hasOwn(files, what) ? files[what] : undefined;
	if (file === undefined) return {accepted: false};
	mkdirSync(dirname(file), {recursive: true});
	writeFileSync(file, Buffer.from(text.slice(end + 1), 'latin1'));
	try {
		const answer =
			what === 'session' ? session(file) : what === 'preferences' ? preferences() : kept(file, what as KeptKind);
		const findings = checkStore(home).map(({message}) => message);
		return {...answer, said: `${answer.said ?? ''}\n${findings.join('\n')}`};
	} finally {
		rmSync(file);
	}
}

function kept(file: string, kind: KeptKind): Answer {
	const answer: StoreAnswer<Kept<unknown>> = readKept(file, kind);
	if (!answer.ok) return refused(answer.problem);
	writeFileSync(file, textOf(answer.value.document));
	const again: StoreAnswer<Kept<unknown>> = readKept(file, kind);
	const isSame = again.ok && textOf(again.value.document) === textOf(answer.value.document);
	return {
		accepted: true,
		broken: isSame ? undefined : `written and read again it is the same: ${JSON.stringify(again)}`,
	};
}

function session(file: string): Answer {
	const {sessions, problems} = unsavedSessions(home);
	if (problems[0]) return refused(problems[0]);
	const [first] = sessions;
	if (first?.file !== file) return {accepted: false};
	const taken = restored(first.document);
	const written = JSON.parse(JSON.stringify(taken ?? null));
	const isSame = taken === undefined || isDeepStrictEqual(JSON.parse(JSON.stringify(restored(written))), written);
	return {
		accepted: taken !== undefined,
		broken: isSame ? undefined : `kept and restored again it is the same: ${JSON.stringify(taken)}`,
	};
}

function preferences(): Answer {
	const reading = readPreferences(home);
	return reading.ok ? {accepted: true} : {accepted: false, said: reading.message};
}

const refused = (problem: Parameters<typeof problemText>[0]): Answer => ({
	accepted: false,
	said: problemText(problem),
	problems: [{path: problem.file, found: problem.found, allowed: problem.remedy}],
});

const fixture = (name: string) => readFileSync(`tests/store/fixtures/${name}.json`, 'latin1');
/** As bytes. */
const inBytes = (document: unknown) => Buffer.from(JSON.stringify(document)).toString('latin1');

export const storeFiles: Reader = {
	name: 'store',
	examples: () => [
		`preset\n${fixture('preset-1')}`,
		`saved-car\n${fixture('saved-car-1')}`,
		`history\n${fixture('history-1')}`,
		`session\n${inBytes({kind: 'session', version: 1, saved: '2026-01-01T12:00:00.000Z', document: documents})}`,
		'preferences\n{"version": 1, "car": "Fixture car"}',
	],
	words: [
		'preset',
		'saved-car',
		'history',
		'session',
		'preferences',
		'"kind"',
		'"version"',
		'"track"',
		'"car"',
		'"name"',
		'"entries"',
		'"saved"',
		'"document"',
		'"open"',
		'"id"',
		'"json"',
		'1',
		'2',
		'{}',
		'[]',
		'null',
		'\u00ef\u00bb\u00bf',
		'\u00ff\u00fe',
		'\u0000',
	],
	longest: 6000,
	read,
};
