import {mkdirSync, readdirSync, writeFileSync} from 'node:fs';
import {join} from 'node:path';
import {afterAll, beforeAll, expect, test} from 'vitest';
import {processIdentity} from '../../source/store/process-identity.ts';
import {dropSession, keepSession, unsavedSessions} from '../../source/store/session.ts';
import {bundleChild, type Children} from './children.ts';
import {temporaryHome} from './temporary-home.ts';

const home = temporaryHome();
let children: Children;
beforeAll(async () => {
	children = await bundleChild();
});
afterAll(() => children.remove());

test('a running screen keeps one session, offers none, and drops it', () => {
	expect(keepSession(home(), {step: 1}, '2026-01-01')).toBe(undefined);
	expect(keepSession(home(), {step: 2}, '2026-01-02')).toBe(undefined);
	expect(readdirSync(join(home(), 'sessions'))).toEqual([`${processIdentity()}.json`]);
	expect(unsavedSessions(home())).toEqual({sessions: [], problems: []});
	dropSession(home());
	expect(readdirSync(join(home(), 'sessions'))).toEqual([]);
	dropSession(home());
});

test('the sessions of ended processes are offered, newest first, each until it is dropped', async () => {
	await Promise.all([children.run(['keepSession', home(), 'a', '1']), children.run(['keepSession', home(), 'b', '2'])]);
	keepSession(home(), {work: 'own'}, '2026-01-03');
	const {sessions} = unsavedSessions(home());
	expect(sessions).toMatchObject([
		{saved: '2026-01-02', document: {work: 'b'}},
		{saved: '2026-01-01', document: {work: 'a'}},
	]);
	dropSession(home(), sessions[0]!.file);
	expect(unsavedSessions(home()).sessions).toEqual([sessions[1]]);
});

const ended = processIdentity().replace(/^\d+/, '4194305');

test('a broken session is named, and the others are offered', async () => {
	await children.run(['keepSession', home(), 'a', '1']);
	const file = join(home(), 'sessions', `${ended}.json`);
	writeFileSync(file, '{');
	const {sessions, problems} = unsavedSessions(home());
	expect(sessions).toHaveLength(1);
	expect(problems).toMatchObject([{reason: 'broken', file, found: 'not valid JSON'}]);
});

test('what ended processes were writing is cleared away, and what running ones write stays', () => {
	mkdirSync(join(home(), 'sessions'));
	const names = [ended, processIdentity()].map(who => `${who}.json.0123456789ab.tmp`);
	for (const name of names) writeFileSync(join(home(), 'sessions', name), '');
	keepSession(home(), {}, '2026-01-01');
	expect(readdirSync(join(home(), 'sessions')).filter(name => name.endsWith('.tmp'))).toEqual([names[1]]);
});

test('a home that cannot be made is a problem in words', () => {
	writeFileSync(join(home(), 'file'), '');
	expect(keepSession(join(home(), 'file'), {}, '2026-01-01')).toMatchObject({reason: 'unreachable'});
	expect(unsavedSessions(join(home(), 'file'))).toMatchObject({sessions: [], problems: [{reason: 'unreachable'}]});
});
