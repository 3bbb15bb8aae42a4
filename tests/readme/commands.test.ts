/** What the README tells a newcomer to type, typed in its order in a home of its own. */
import {spawnSync} from 'node:child_process';
import {mkdtempSync, readFileSync, rmSync, symlinkSync} from 'node:fs';
import {tmpdir} from 'node:os';
import {join} from 'node:path';
import {fileURLToPath} from 'node:url';
import {afterAll, expect, test} from 'vitest';

const root = fileURLToPath(new URL('../..', import.meta.url));
const commands = readFileSync(join(root, 'README.md'), 'utf8')
	.split('\n')
	.filter(line => /^(\$ )?droprack /.test(line))
	.map(line => line.replace('$ ', '').replace(/\s+#.*$/, ''));

const place = mkdtempSync(join(tmpdir(), 'droprack-readme-'));
symlinkSync(join(root, 'tracks'), join(place, 'tracks'));
afterAll(() => rmSync(place, {recursive: true}));

test('the README has commands for every part of the work', () => {
	const names = new Set(commands.map(line => line.split(' ')[1]));
	for (const name of ['rank', 'learn', 'save', 'history', 'life', 'fuel', 'load', 'gearbox', 'share', 'read', 'card'])
		expect(names).toContain(name);
});

test.each(commands)('%s', line => {
	const script = `droprack() { "$NODE" "$ENTRY" "$@"; }; ${line}`;
	const {status, stderr} = spawnSync('sh', ['-c', script], {
		cwd: place,
		encoding: 'utf8',
		env: {
			...process.env,
			NODE: process.execPath,
			ENTRY: join(root, 'dist', 'droprack.js'),
			DROPRACK_HOME: join(place, 'home'),
		},
	});
	expect({status, stderr: status === 0 ? '' : stderr}).toEqual({status: 0, stderr: ''});
});
