import {mkdirSync, readdirSync, writeFileSync} from 'node:fs';
import {join} from 'node:path';
import {afterAll, beforeAll, expect, test} from 'vitest';
import {checkStore} from '../../source/store/check-store.ts';
import {processIdentity} from '../../source/store/process-identity.ts';
import {saveKept} from '../../source/store/save-kept.ts';
import {bundleChild, type Children, ended, firstWords} from './children.ts';
import {preset} from './documents.ts';
import {temporaryHome} from './temporary-home.ts';

const home = temporaryHome();
let children: Children;
beforeAll(async () => {
	children = await bundleChild();
});
afterAll(() => children.remove());

const put = (file: string, content: string) => {
	mkdirSync(join(home(), file, '..'), {recursive: true});
	writeFileSync(join(home(), file), content);
};
/** The messages without the home's path. */
const found = () => checkStore(home()).map(({message}) => message.replaceAll(home(), 'HOME'));
const identityOf = (pid: string) => processIdentity().replace(/^\d+/, pid);

test('in a sound store, and where there is none, nothing is found', () => {
	expect(found()).toEqual([]);
	saveKept(home(), preset('Oval'), undefined);
	expect(found()).toEqual([]);
	expect(checkStore(join(home(), 'none'))).toEqual([]);
});

test('everything wrong is named with what to do, and nothing is changed', () => {
	put('tracks/a.json', JSON.stringify(preset('Oval')));
	put('tracks/b.json', JSON.stringify(preset('Oval')));
	put('tracks/c.json', JSON.stringify(preset('OVAL')));
	put('tracks/broken.json', '{');
	put('tracks/newer.json', '{"kind": "preset", "version": 9}');
	put('tracks/a.json.0123456789ab.tmp', '{');
	put('cars/kind.json', JSON.stringify(preset('Oval')));
	put('history/empty.json', '');
	put('preferences.json', '[]');
	put('preferences.json.tmp-1', '{');
	const session = `sessions/${identityOf('4194305')}.json`;
	put(session, '{"kind": "session", "version": 1, "saved": "2026-01-01", "document": {}}');
	mkdirSync(join(home(), 'lock'));
	const before = readdirSync(home(), {recursive: true});
	const mend = 'Left as it is: mend it or move it away.';
	const clear = 'left by a process that was ended while it was saving. Nothing is lost. The next save clears it away.';
	expect(found()).toEqual([
		`HOME/tracks/broken.json: not valid JSON. ${mend}`,
		'HOME/tracks/newer.json: version is 9, expected 1 to 1. Written by a later Droprack and left as it is: use that one.',
		`HOME/cars/kind.json: kind is "preset", expected "saved-car". ${mend}`,
		`HOME/history/empty.json: empty. ${mend}`,
		'HOME/tracks/b.json: "Oval" has the same name as a.json. Only one of them is used: rename or remove one.',
		'HOME/tracks/c.json: "OVAL" has the name of a.json but for upper and lower case. Write the name exactly, or rename one.',
		`HOME/${session}: unsaved work of 2026-01-01, of a screen that ended without saving. Open the screen to take it up, or remove the file.`,
		`HOME/lock: ${clear}`,
		'HOME/preferences.json.tmp-1: left by a process that was ended while it was saving. Nothing is lost. Remove it.',
		`HOME/tracks/a.json.0123456789ab.tmp: ${clear}`,
		'HOME/preferences.json: the preferences are not an object; left as it is. Mend it or remove it.',
	]);
	expect(readdirSync(home(), {recursive: true})).toEqual(before);
});

test('what a live process is writing is not called left behind', async () => {
	const holder = children.start(['hold', home()]);
	await firstWords(holder);
	put('tracks/a.json.0123456789ab.tmp', '');
	expect(found()).toEqual([]);
	holder.kill('SIGKILL');
	await ended(holder);
	expect(found()).toHaveLength(2);
	saveKept(home(), preset('Oval'), undefined);
	expect(found()).toEqual([]);
});

test('control characters in names do not reach the terminal', () => {
	put('tracks/a.json', JSON.stringify(preset('A\u001b[2J\u202e')));
	put('tracks/b.json', JSON.stringify(preset('A\u001b[2J\u202e')));
	put('tracks/\u001b[2J.json', '{');
	expect(found()).toHaveLength(2);
	expect(found().join('')).not.toMatch(/[\p{Cc}\u202e]/u);
});
