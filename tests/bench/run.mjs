/** Builds the program, bundles the benchmarks and runs them with plain Node, so that nothing but the code itself is timed. */
import {spawnSync} from 'node:child_process';
import {mkdirSync, mkdtempSync, rmSync} from 'node:fs';
import {fileURLToPath} from 'node:url';
import {build} from 'vite';

const root = fileURLToPath(new URL('../..', import.meta.url));
const cache = `${root}node_modules/.cache`;

await build({configFile: `${root}.config/vite.config.ts`, mode: 'production', logLevel: 'warn'});
mkdirSync(cache, {recursive: true});
// Inside node_modules, so that the packages are found; a name of its own, so that two runs do not meet.
const outDir = mkdtempSync(`${cache}/bench-`);
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
				// The other one runs as a process of its own.
				input: {main: 'tests/bench/main.ts', 'read-log': 'tests/bench/read-log.ts'},
				output: {entryFileNames: '[name].mjs'},
			},
		},
	});
	const words = [`${outDir}/main.mjs`, ...process.argv.slice(2)];
	const {status} = spawnSync(process.execPath, words, {cwd: root, stdio: 'inherit'});
	process.exitCode = status ?? 1;
} finally {
	rmSync(outDir, {recursive: true});
}
