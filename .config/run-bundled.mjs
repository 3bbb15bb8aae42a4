/** Bundles a program of the tests and runs it with plain Node, without the test runner. */
import {spawnSync} from 'node:child_process';
import {mkdirSync, mkdtempSync, rmSync, symlinkSync} from 'node:fs';
import {basename} from 'node:path';
import {fileURLToPath} from 'node:url';
import {build} from 'vite';

const root = fileURLToPath(new URL('..', import.meta.url));
const cache = `${root}node_modules/.cache`;

/**
 * `also` are further programs, bundled beside it, that it starts; `beside` are files that it finds by its own place; `output` is
 * for the bundler. The exit status is the program's.
 */
export async function runBundled(program, words, {also = [], beside = [], output = {}} = {}) {
	mkdirSync(cache, {recursive: true});
	// Inside node_modules, so that the packages are found; a name of its own, so that two runs do not meet.
	const outDir = mkdtempSync(`${cache}/bundled-`);
	const nameOf = path => (output.preserveModules ? path.replace(/\.ts$/, '') : basename(path, '.ts'));
	try {
		await build({
			root,
			configFile: false,
			logLevel: 'warn',
			build: {
				ssr: true,
				target: 'node20',
				outDir,
				emptyOutDir: true,
				minify: false,
				rolldownOptions: {
					input: Object.fromEntries([program, ...also].map(path => [nameOf(path), path])),
					output: {entryFileNames: '[name].mjs', ...output},
				},
			},
		});
		for (const path of beside) symlinkSync(root + path, `${outDir}/${path}`);
		const file = `${outDir}/${nameOf(program)}.mjs`;
		const {status} = spawnSync(process.execPath, [file, ...words], {cwd: root, stdio: 'inherit'});
		process.exitCode = status ?? 1;
	} finally {
		rmSync(outDir, {recursive: true});
	}
}
