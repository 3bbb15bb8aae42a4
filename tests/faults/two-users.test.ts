/** Two accounts of one machine with one store between them, as on a computer of the team. */
import {chmodSync, mkdirSync, readdirSync} from 'node:fs';
import {join} from 'node:path';
import {afterAll, beforeAll, describe, expect, test} from 'vitest';
import {listKept} from '../../source/store/list-kept.ts';
import {saveKept} from '../../source/store/save-kept.ts';
import {keepSession, unsavedSessions} from '../../source/store/session.ts';
import {bundleChild, type Children, ended, firstWords} from '../store/children.ts';
import {preset} from '../store/documents.ts';
import {temporaryHome} from '../store/temporary-home.ts';

const home = temporaryHome();
let children: Children;
beforeAll(async () => {
	children = await bundleChild();
});
afterAll(() => children.remove());

const other = {uid: 65_534, gid: 65_534};
const asOther = async (...words: string[]) => JSON.parse(await children.run(words, other)) as unknown;

describe.runIf(process.getuid?.() === 0)('another account', () => {
	test('may read what is saved, and is told that it may not write', async () => {
		chmodSync(home(), 0o755);
		saveKept(home(), preset('Long'), undefined);
		expect(await asOther('saveOnce', home(), '1')).toMatchObject({
			kind: 'failed',
			problem: {reason: 'unreachable', found: 'no permission (EACCES)'},
		});
		expect(listKept(home(), 'preset').kept.map(({document}) => document)).toEqual([preset('Long')]);
	});

	test('waits for a lock that is held, and is told who holds it', async () => {
		mkdirSync(join(home(), 'tracks'));
		for (const folder of [home(), join(home(), 'tracks')]) chmodSync(folder, 0o777);
		const holder = children.start(['hold', home()]);
		await firstWords(holder);
		expect(await asOther('tryLock', home())).toMatchObject({
			ok: false,
			problem: {reason: 'locked', found: `another copy of Droprack (process ${holder.pid}) is saving`},
		});
		holder.kill('SIGKILL');
		await ended(holder);
		expect(saveKept(home(), preset('Mine'), undefined).kind).toBe('saved');
		expect(await asOther('saveOnce', home(), '1')).toMatchObject({kind: 'saved'});
	});

	test('does not take the unsaved work of a screen that still runs for left behind', async () => {
		mkdirSync(join(home(), 'sessions'));
		for (const folder of [home(), join(home(), 'sessions')]) chmodSync(folder, 0o777);
		keepSession(home(), {work: 'mine'}, '2026-01-01');
		expect(await asOther('keepSession', home(), 'theirs', '2')).toBe('kept');
		expect(readdirSync(join(home(), 'sessions'))).toHaveLength(2);
		expect(await asOther('unsaved', home())).toEqual([{work: 'theirs'}]);
		expect(unsavedSessions(home()).sessions.map(({document}) => document)).toEqual([{work: 'theirs'}]);
	});
});
