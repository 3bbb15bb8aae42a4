/** Starts further copies of the program: `child.ts`, bundled, because Node 20 reads no TypeScript. */
import {type ChildProcess, type SpawnOptions, spawn} from 'node:child_process';
import {chmodSync, mkdtempSync, rmSync} from 'node:fs';
import {tmpdir} from 'node:os';
import {join} from 'node:path';
import {rolldown} from 'rolldown';

export type Children = {
	start: (words: readonly string[], options?: SpawnOptions) => ChildProcess;
	/** Runs one to its end and gives what it printed. */
	run: (words: readonly string[], options?: SpawnOptions) => Promise<string>;
	/** One whose files may have at most so many blocks of 1024 bytes. */
	runLimited: (blocks: number, words: readonly string[]) => Promise<string>;
	remove: () => void;
};

export const bundleChild = async (): Promise<Children> => {
	const directory = mkdtempSync(join(tmpdir(), 'droprack-child-'));
	// For children that run as nobody.
	chmodSync(directory, 0o755);
	const file = join(directory, 'child.mjs');
	const bundle = await rolldown({input: join(import.meta.dirname, 'child.ts'), platform: 'node', external: ['conf']});
	await bundle.write({file, format: 'esm'});
	const start: Children['start'] = (words, options = {}) =>
		spawn(process.execPath, [file, ...words], {stdio: ['ignore', 'pipe', 'inherit'], ...options});
	return {
		start,
		run: (words, options) => printed(start(words, options)),
		runLimited: (blocks, words) =>
			printed(
				spawn('bash', ['-c', `ulimit -f ${blocks}; exec "$@"`, 'bash', process.execPath, file, ...words], {
					stdio: ['ignore', 'pipe', 'inherit'],
				}),
			),
		remove: () => rmSync(directory, {recursive: true}),
	};
};

const printed = async (child: ChildProcess): Promise<string> => {
	let text = '';
	child.stdout?.on('data', data => {
		text += data;
	});
	const code = await ended(child);
	if (code !== 0) throw new Error(`the child ended with ${code}: ${text}`);
	return text;
};

export const ended = (child: ChildProcess): Promise<number | NodeJS.Signals | null> =>
	new Promise(resolve => child.once('close', (code, signal) => resolve(code ?? signal)));

/** Resolves once the child has printed something. */
export const firstWords = (child: ChildProcess): Promise<string> =>
	new Promise(resolve => child.stdout?.once('data', data => resolve(String(data))));
