import {mkdtempSync, rmSync} from 'node:fs';
import {tmpdir} from 'node:os';
import {join} from 'node:path';
import {afterEach, beforeEach} from 'vitest';

/** A fresh empty directory for each test of the file. */
export const temporaryHome = (): (() => string) => {
	let home = '';
	beforeEach(() => {
		home = mkdtempSync(join(tmpdir(), 'droprack-'));
	});
	afterEach(() => rmSync(home, {recursive: true, force: true}));
	return () => home;
};
