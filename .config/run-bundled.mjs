/** Bundles a program of the tests and runs it with plain Node, without the test runner. */
import {spawnSync} from 'node:child_process';
import {mkdirSync, mkdtempSync, rmSync, symlinkSync} from 'node:fs';
import {fileURLToPath} from 'node:url';
import {build} from 'vite';

const root = fileURLToPath(new URL('..', import.meta.url));
const cache = `${root}node_modules/.cache`;

/** `output` is for the bundler, `beside` are files that the program finds by its own place; the exit status is the program's. */
export async function runBundled(program, words, {output = {}, beside = []} = {}) {
	mkdirSync(cache, {recursive: true});
	// Inside node_modules, so that the packages are found; a name of its own, so that two runs do not meet.
	const outDir = mkdtempSync(`${cache}/bundled-`);
	try {
		await build({
			root,
			configFile: false,
			logLevel: 'warn',
			build: {
				ssr: program,
				target: 'node20',
				outDir,
				emptyOutDir: true,
				minify: false,
				rolldownOptions: {output: {entryFileNames: '[name].mjs', ...output}},
			},
		});
		for (const path of beside) symlinkSync(root + path, `${outDir}/${path}`);
		const name = output.preserveModules ? program : program.slice(program.lastIndexOf('/') + 1);
		const file = `${outDir}/${name.replace(/\.ts$/, '.mjs')}`;
		const {status} = spawnSync(process.execPath, [file, ...words], {cwd: root, stdio: 'inherit'});
		process.exitCode = status ?? 1;
	} finally {
		rmSync(outDir, {recursive: true});
	}
}
