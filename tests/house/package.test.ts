import {execFileSync} from 'node:child_process';
import {mkdtempSync, readdirSync, readFileSync, rmSync} from 'node:fs';
import {tmpdir} from 'node:os';
import {join, resolve} from 'node:path';
import {fileURLToPath} from 'node:url';
import {afterAll, beforeAll, describe, expect, test} from 'vitest';
import {Pty} from '../screens/pty.ts';

const root = fileURLToPath(new URL('../..', import.meta.url));
const place = mkdtempSync(join(tmpdir(), 'droprack-package-'));
const npm = (...words: string[]) => execFileSync('npm', words, {cwd: root, encoding: 'utf8', stdio: 'pipe'});

type Packed = {filename: string; files: {path: string; mode: number}[]};
let packed: Packed;

beforeAll(() => {
	// The build is there: every test run starts with it.
	[packed] = JSON.parse(npm('pack', '--ignore-scripts', '--json', '--pack-destination', place)) as [Packed];
});
afterAll(() => rmSync(place, {recursive: true}));

const isChunk = (path: string) => /^dist\/chunks\/[\w.-]+\.js$/.test(path);

test('the package holds the program, the shipped documents and what must go with them', () => {
	const paths = packed.files.map(file => file.path);
	expect(paths.filter(path => !isChunk(path)).toSorted()).toEqual([
		'LICENSE',
		'README.md',
		'dist/THIRD-PARTY.txt',
		'dist/droprack.js',
		'package.json',
		'tracks/brackenfold.json',
		'tracks/cars/demo.json',
		'tracks/cullamere.json',
		'tracks/hesper-ridge.json',
		'tracks/logs/hesper-ridge.csv',
		'tracks/logs/quillmere.csv',
		'tracks/ostrand-flats.json',
		'tracks/quillmere.json',
		'tracks/schemas/car.json',
		'tracks/schemas/track.json',
		'tracks/tarrowdale.json',
	]);
	expect(paths.some(isChunk)).toBe(true);
});

const notices = readFileSync(join(root, 'dist', 'THIRD-PARTY.txt'), 'utf8')
	.split(/^-{80}$/m)
	.slice(1)
	.map(notice => notice.trim());

test('every package in the bundle is there with a free license and its text', () => {
	expect(notices.map(notice => notice.split(' ')[0])).toEqual(
		// The bundler adds some lines of its own.
		expect.arrayContaining(['zod', 'mathjs', 'picocolors', 'rolldown']),
	);
	for (const notice of notices) {
		expect(notice).toMatch(/^License: (MIT|ISC|0BSD|BSD-[23]-Clause|Apache-2\.0)$/m);
		expect(notice).toMatch(/copyright|©/i);
	}
});

describe('installed from the package, without a network', () => {
	const prefix = join(place, 'prefix');
	/** A cache with nothing in it, and a registry that nobody answers at. */
	const nothing = ['--cache', join(place, 'cache'), '--registry', 'http://127.0.0.1:9/'];
	const droprack = (...words: string[]) =>
		execFileSync(join(prefix, 'bin', 'droprack'), words, {
			cwd: place,
			encoding: 'utf8',
			env: {...process.env, DROPRACK_HOME: join(place, 'home')},
		});

	beforeAll(() => {
		npm(
			'install',
			'--global',
			'--offline',
			...nothing,
			'--no-audit',
			'--no-fund',
			'--prefix',
			prefix,
			join(place, packed.filename),
		);
	});

	test('it ranks the demo track from another folder', () => {
		const {rows} = JSON.parse(droprack('rank', 'quillmere', '--top', '3', '--json')) as {rows: unknown[]};
		expect(rows.length).toBeGreaterThanOrEqual(3);
	});

	test('it opens the screen, also where React would look for its tools', async () => {
		const environment = {DROPRACK_HOME: join(place, 'home'), DEV: 'true'};
		const pty = new Pty(join(prefix, 'bin', 'droprack'), [], {environment});
		try {
			await pty.waitFor('Tarrowdale');
			await pty.waitFor('q quit');
			pty.press('q');
			expect(await pty.ended()).toMatchObject({exitCode: 0});
			expect(pty.written).not.toMatch(/devtools/i);
		} finally {
			pty.close();
		}
	});

	test('it lists the tracks that came with it', () => {
		expect(droprack('tracks')).toContain('Quillmere');
	});
});

describe('built anew', () => {
	// Elsewhere than in dist: other tests are reading that.
	const built = join(place, 'dist');
	let said: string;
	beforeAll(() => {
		said = npm('run', '--silent', 'build', '--', '--outDir', built, '--emptyOutDir', '--sourcemap');
	});

	test('the build before a start says nothing', () => {
		expect(said).toBe('');
	});

	test('the notices name every package that any of the code comes from', () => {
		const maps = readdirSync(join(built, 'chunks')).filter(name => name.endsWith('.map'));
		const sources = maps.flatMap(name =>
			(JSON.parse(readFileSync(join(built, 'chunks', name), 'utf8')) as {sources: string[]}).sources.map(source =>
				resolve(built, 'chunks', source),
			),
		);
		const packages = sources
			.map(source => /^(.*\/node_modules\/((?:@[^/]+\/)?[^/]+))\//.exec(source))
			.filter(match => match !== null);
		const named = packages.map(([, directory, name]) => {
			const {version} = JSON.parse(readFileSync(join(directory!, 'package.json'), 'utf8')) as {version: string};
			return `${name} ${version}`;
		});
		expect(new Set(named).size).toBeGreaterThan(30);
		expect([...new Set(named)].filter(name => !notices.some(notice => notice.startsWith(`${name}\n`)))).toEqual([]);
	});
});
