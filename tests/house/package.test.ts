import {execFileSync} from 'node:child_process';
import {mkdtempSync, readFileSync, rmSync} from 'node:fs';
import {tmpdir} from 'node:os';
import {join} from 'node:path';
import {fileURLToPath} from 'node:url';
import {afterAll, beforeAll, describe, expect, test} from 'vitest';

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

test('every package in the bundle is there with a free license and its text', () => {
	const notices = readFileSync(join(root, 'dist', 'THIRD-PARTY.txt'), 'utf8')
		.split(/^-{80}$/m)
		.slice(1);
	expect(notices.map(notice => notice.trim().split(' ')[0])).toEqual(
		expect.arrayContaining(['zod', 'mathjs', 'picocolors']),
	);
	for (const notice of notices) {
		expect(notice).toMatch(/^License: (MIT|ISC|0BSD|BSD-[23]-Clause|Apache-2\.0)$/m);
		expect(notice).toMatch(/copyright|©/i);
	}
});

describe('installed from the package, without a network', () => {
	const prefix = join(place, 'prefix');
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

	test('it lists the tracks that came with it', () => {
		expect(droprack('tracks')).toContain('Quillmere');
	});
});

test('the build before a start says nothing', () => {
	// Elsewhere than in dist: other tests are reading that.
	expect(npm('run', '--silent', 'build', '--', '--outDir', join(place, 'dist'), '--emptyOutDir')).toBe('');
});
