import {readdirSync, readFileSync} from 'node:fs';
import {join} from 'node:path';
import {afterEach, expect, test, vi} from 'vitest';
import {checkStore} from '../../source/store/check-store.ts';
import {addToHistory} from '../../source/store/history.ts';
import {keptNamed, listKept} from '../../source/store/list-kept.ts';
import {forgetKept, saveKept} from '../../source/store/save-kept.ts';
import {keepSession, unsavedSessions} from '../../source/store/session.ts';
import {full} from '../runs.ts';
import {preset} from './documents.ts';
import {temporaryHome} from './temporary-home.ts';

/** Which call of the file system fails next, and as what. */
const fault = vi.hoisted(() => ({countdown: Number.POSITIVE_INFINITY, code: 'EIO', only: ''}));

vi.mock('node:fs', async original => {
	const fs = await original<Record<string, unknown>>();
	const failing = (name: string, call: (...words: unknown[]) => unknown) =>
		Object.assign((...words: unknown[]) => {
			if (fault.only === '' || fault.only === name) {
				if (--fault.countdown === 0) throw Object.assign(new Error(`${name}: ${fault.code}`), {code: fault.code});
			}
			return call(...words);
		}, call);
	// existsSync never throws.
	const wrapped = Object.entries(fs).map(([name, call]) =>
		name.endsWith('Sync') && name !== 'existsSync' && typeof call === 'function'
			? [name, failing(name, call as never)]
			: [name, call],
	);
	return Object.fromEntries(wrapped);
});

const home = temporaryHome();
afterEach(() => {
	fault.only = '';
});

/** Does it with the call of that number failing. */
const disturbed = <T>(number: number, act: () => T): {result: T; isDisturbed: boolean} => {
	fault.countdown = number;
	try {
		const result = act();
		return {result, isDisturbed: fault.countdown <= 0};
	} finally {
		fault.countdown = Number.POSITIVE_INFINITY;
	}
};

/** Does it with its first, second … call failing, each in a store of its own, until one is done undisturbed. */
const withEachFault = <T>(
	prepare: (store: string) => void,
	act: (store: string) => T,
	judge: (store: string, result: T) => void,
) => {
	for (let number = 1; ; number++) {
		const store = join(home(), `${fault.code}-${number}`);
		prepare(store);
		const {result, isDisturbed} = disturbed(number, () => act(store));
		judge(store, result);
		if (!isDisturbed) return number - 1;
	}
};

const codes = full ? ['EIO', 'ENOSPC', 'EACCES', 'EROFS'] : ['EIO', 'EACCES'];
const old = preset('Oval', {notes: 'old'});
const fresh = preset('Oval', {notes: 'new'});
const prepare = (store: string) => expect(saveKept(store, old, undefined).kind).toBe('saved');
const present = (store: string) => keptNamed(store, 'preset', 'Oval');
/** What a save of these bytes is based on, wherever it was saved. */
const revisionOf = (document: typeof old) => {
	const store = join(home(), 'revision');
	const answer = saveKept(store, document, present(store)?.revision);
	return answer.kind === 'saved' ? answer.kept.revision : '';
};

test.each(codes)(
	'whichever step of a save fails with %s, the file is the old or the new one and the answer is true',
	code => {
		fault.code = code;
		const revision = revisionOf(old);
		const steps = withEachFault(
			prepare,
			store => saveKept(store, fresh, revision),
			(store, answer) => {
				const notes = present(store)?.document.notes;
				expect(['old', 'new']).toContain(notes);
				if (answer.kind === 'saved') expect(notes).toBe('new');
				if (answer.kind === 'changed') expect(notes).toBe('old');
			},
		);
		expect(steps).toBeGreaterThan(20);
	},
);

test.each(codes)(
	'whichever step of an addition fails with %s, no entry is lost and none is said to be kept that is not',
	code => {
		fault.code = code;
		const [first, second] = [{date: '2026-03-01'}, {date: '2026-03-02'}];
		withEachFault(
			store => addToHistory(store, 'Oval', [first]),
			store => addToHistory(store, 'Oval', [second]),
			(store, answer) => {
				const entries = keptNamed(store, 'history', 'Oval')?.document.entries;
				if (answer.ok) expect(entries).toEqual([first, second]);
				else expect([[first], [first, second]]).toContainEqual(entries);
			},
		);
	},
);

test.each(codes)('whichever step of forgetting fails with %s, the document is there or in .bak', code => {
	fault.code = code;
	const revision = revisionOf(old);
	withEachFault(
		prepare,
		store => forgetKept(store, 'preset', {name: 'Oval', file: '', revision, document: old}),
		(store, answer) => {
			const kept = present(store);
			if (answer.ok && answer.value === 'forgotten') expect(kept).toBe(undefined);
			const [backup] = readdirSync(join(store, 'tracks')).filter(name => name.endsWith('.bak'));
			if (!kept) expect(JSON.parse(readFileSync(join(store, 'tracks', backup!), 'utf8'))).toEqual(old);
		},
	);
});

test.each(codes)('whichever step of keeping a session fails with %s, it is the old or the new one', code => {
	fault.code = code;
	const works = (store: string) =>
		readdirSync(join(store, 'sessions'))
			.filter(name => name.endsWith('.json'))
			.map(name => JSON.parse(readFileSync(join(store, 'sessions', name), 'utf8')).document.work);
	withEachFault(
		store => keepSession(store, {work: 'old'}, '2026-01-01'),
		store => keepSession(store, {work: 'new'}, '2026-01-02'),
		(store, problem) => {
			if (problem) expect([['old'], ['new']]).toContainEqual(works(store));
			else expect(works(store)).toEqual(['new']);
		},
	);
});

test.each(codes)('whichever step of a look fails with %s, it is told, and nothing is thrown', code => {
	fault.code = code;
	withEachFault(
		prepare,
		store => ({shelf: listKept(store, 'preset'), findings: checkStore(store), sessions: unsavedSessions(store)}),
		(_, {shelf}) => expect(shelf.kept.length + shelf.problems.length).toBeGreaterThan(0),
	);
});

test('where the disk knows no second names the previous is kept as a copy', () => {
	prepare(home());
	fault.only = 'linkSync';
	fault.code = 'EPERM';
	const {result, isDisturbed} = disturbed(1, () => saveKept(home(), fresh, present(home())?.revision));
	expect([result.kind, isDisturbed]).toEqual(['saved', true]);
	const folder = join(home(), 'tracks');
	const [file, backup, ...others] = readdirSync(folder).map(name => join(folder, name));
	expect(others).toEqual([]);
	expect([file!, backup!].map(name => JSON.parse(readFileSync(name, 'utf8')).notes)).toEqual(['new', 'old']);
});
