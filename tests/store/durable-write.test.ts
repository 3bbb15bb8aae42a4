import {execFileSync} from 'node:child_process';
import {chmodSync, chownSync, existsSync, linkSync, mkdirSync, readdirSync, readFileSync, writeFileSync} from 'node:fs';
import {join} from 'node:path';
import {afterAll, beforeAll, describe, expect, test} from 'vitest';
import {problemText, type StoreProblem} from '../../source/store/answer.ts';
import {writeDurably} from '../../source/store/durable-write.ts';
import {bundleChild, type Children} from './children.ts';
import {temporaryHome} from './temporary-home.ts';

const home = temporaryHome();
let children: Children;
beforeAll(async () => {
	children = await bundleChild();
});
afterAll(() => children.remove());

type Said = {kind: string; problem?: StoreProblem};
const said = (text: string): Said => JSON.parse(text) as Said;
const isRoot = process.getuid?.() === 0;
const nobody = {uid: 65534, gid: 65534};

test('the new text is in the file, the previous one in .bak, and nothing else is left', () => {
	const file = join(home(), 'a.json');
	for (const text of ['one', 'two', 'three — ünï']) expect(writeDurably(file, text)).toBe(undefined);
	expect(readFileSync(file, 'utf8')).toBe('three — ünï');
	expect(readFileSync(`${file}.bak`, 'utf8')).toBe('two');
	expect(readdirSync(home())).toEqual(['a.json', 'a.json.bak']);
});

test('a .bak that is a second name of the file itself, as after a kill, is no trouble', () => {
	const file = join(home(), 'a.json');
	writeFileSync(file, 'one');
	linkSync(file, `${file}.bak`);
	expect(writeDurably(file, 'two')).toBe(undefined);
	expect([file, `${file}.bak`].map(name => readFileSync(name, 'utf8'))).toEqual(['two', 'one']);
	expect(readdirSync(home())).toHaveLength(2);
});

test('without keeping the previous there is no .bak', () => {
	const file = join(home(), 'a.json');
	for (const text of ['one', 'two']) writeDurably(file, text, {keepPrevious: false});
	expect(readdirSync(home())).toEqual(['a.json']);
});

test('a directory that is a file is a problem in words', () => {
	writeFileSync(join(home(), 'file'), '');
	expect(problemText(writeDurably(join(home(), 'file', 'a.json'), 'text')!)).toBe(
		`${join(home(), 'file', 'a.json')}: a part of its path is not a directory (ENOTDIR). Name a directory, or set DROPRACK_HOME to one.`,
	);
});

test('a home below /proc is a problem at once', async () => {
	expect(said(await children.run(['saveOnce', '/proc/droprack/home']))).toMatchObject({
		kind: 'failed',
		problem: {reason: 'unreachable'},
	});
});

/** Saves a long preset once, then again where it cannot be done. */
const expectNothingLost = async (place: string, again: () => Promise<string>, problem: Partial<StoreProblem>) => {
	expect(said(await children.run(['saveOnce', place, '1'])).kind).toBe('saved');
	const folder = join(place, 'tracks');
	const before = readdirSync(folder).map(name => readFileSync(join(folder, name), 'utf8'));
	expect(said(await again())).toMatchObject({kind: 'failed', problem});
	expect(readdirSync(folder).map(name => readFileSync(join(folder, name), 'utf8'))).toEqual(before);
	expect(existsSync(join(place, 'lock'))).toBe(false);
};

test('a limit on the size of files: a message, and nothing is lost', async () => {
	const again = () => children.runLimited(64, ['saveOnce', home(), '2']);
	await expectNothingLost(home(), again, {
		reason: 'unreachable',
		found: 'the file is larger than this account may write (EFBIG)',
	});
});

describe.runIf(isRoot)('as root', () => {
	const mounted: string[] = [];
	const mount = (options: string): string | undefined => {
		const place = join(home(), 'disk');
		mkdirSync(place);
		try {
			execFileSync('mount', ['-t', 'tmpfs', '-o', options, 'tmpfs', place], {stdio: 'pipe'});
		} catch {
			return undefined;
		}
		mounted.push(place);
		return place;
	};
	const unmount = () => {
		for (const place of mounted.splice(0)) execFileSync('umount', [place]);
	};

	test('a full disk: a message, and nothing is lost', async context => {
		const place = mount('size=300k') ?? context.skip('this system lets nobody mount');
		try {
			await expectNothingLost(place, () => children.run(['saveOnce', place, '2']), {
				reason: 'unreachable',
				found: 'the disk is full (ENOSPC)',
				remedy: 'Make room and save again.',
			});
		} finally {
			unmount();
		}
	});

	test('a read-only disk: a message, and nothing is lost', async context => {
		const place = mount('size=2m') ?? context.skip('this system lets nobody mount');
		try {
			const again = () => {
				execFileSync('mount', ['-o', 'remount,ro', place]);
				return children.run(['saveOnce', place, '2']);
			};
			await expectNothingLost(place, again, {reason: 'unreachable', found: 'the disk is read-only (EROFS)'});
		} finally {
			unmount();
		}
	});

	test.each(['', 'tracks'])('a directory without permission to write (home/%s): a message, at once', async folder => {
		chmodSync(home(), 0o755);
		const again = async () => {
			if (folder) chownSync(home(), nobody.uid, nobody.gid);
			const begun = performance.now();
			const text = await children.run(['saveOnce', home(), '2'], nobody);
			expect(performance.now() - begun).toBeLessThan(2000);
			return text;
		};
		await expectNothingLost(home(), again, {reason: 'unreachable', found: 'no permission (EACCES)'});
	});
});
