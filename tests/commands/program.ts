/** The built program in a directory of its own, with the fixtures as its shipped documents. */
import {execFileSync, type SpawnOptions, spawn} from 'node:child_process';
import {chmodSync, copyFileSync, mkdirSync, mkdtempSync, readdirSync, rmSync} from 'node:fs';
import {tmpdir} from 'node:os';
import {join} from 'node:path';
import {fileURLToPath} from 'node:url';
import {demo} from '../../source/commands/shelf.ts';

const root = fileURLToPath(new URL('../..', import.meta.url));
export const fixture = (name: string): string => join(root, 'tests', 'fixtures', name);

/** The user that may read and write little: the tests may run as root, who may everything. */
export const asNobody = process.getuid?.() === 0 ? {uid: 65_534, gid: 65_534} : {};

export type Ended = {status: number | null; out: string; err: string};
export type Run = {
	input?: string | Uint8Array;
	environment?: Record<string, string>;
	node?: string[];
	spawn?: SpawnOptions;
};

export const makeProgram = () => {
	const place = mkdtempSync(join(tmpdir(), 'droprack-program-'));
	// Readable by the user that some tests become.
	chmodSync(place, 0o755);
	const dist = join(place, 'dist');
	const vite = join(root, 'node_modules', 'vite', 'bin', 'vite.js');
	const words = [
		'build',
		'--config',
		'.config/vite.config.ts',
		'--logLevel',
		'warn',
		'--outDir',
		dist,
		'--emptyOutDir',
	];
	const said = execFileSync(process.execPath, [vite, ...words], {
		cwd: root,
		encoding: 'utf8',
		stdio: ['ignore', 'pipe', 'inherit'],
	});
	mkdirSync(join(place, 'tracks', 'cars'), {recursive: true});
	copyFileSync(fixture('oval.json'), join(place, 'tracks', `${demo.track}.json`));
	copyFileSync(fixture('car.json'), join(place, 'tracks', 'cars', `${demo.car}.json`));
	const home = join(place, 'home');
	const entry = join(dist, 'droprack.js');

	/** Starts it with the words, an empty home and nothing of the caller's colors. */
	const start = (words: readonly string[], {environment = {}, node = [], spawn: options = {}}: Run = {}) => {
		const {FORCE_COLOR: _, NO_COLOR: __, ...inherited} = process.env;
		const env = {...inherited, DROPRACK_HOME: home, ...environment};
		return spawn(process.execPath, [...node, entry, ...words], {cwd: root, env, ...options});
	};
	const run = (words: readonly string[], how: Run = {}): Promise<Ended> =>
		new Promise((resolve, reject) => {
			const child = start(words, how);
			const ended: Ended = {status: null, out: '', err: ''};
			child.stdout?.setEncoding('utf8').on('data', text => {
				ended.out += text;
			});
			child.stderr?.setEncoding('utf8').on('data', text => {
				ended.err += text;
			});
			// A child that refuses early closes its end.
			child.stdin?.on('error', () => {});
			child.stdin?.end(how.input ?? '');
			child.on('error', reject);
			child.on('close', status => resolve({...ended, status}));
		});
	const chunks = () => readdirSync(join(dist, 'chunks')).map(name => join(dist, 'chunks', name));
	return {place, home, dist, entry, said, start, run, chunks, remove: () => rmSync(place, {recursive: true})};
};
