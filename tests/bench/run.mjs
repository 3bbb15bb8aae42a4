/** Bundles the benchmarks and runs them with plain Node, so that nothing but the code itself is timed. */
import {spawnSync} from 'node:child_process';
import {build} from 'vite';

const root = new URL('../..', import.meta.url).pathname;
const outDir = `${root}node_modules/.cache/droprack-bench`;

await build({
	root,
	configFile: false,
	logLevel: 'warn',
	build: {
		ssr: 'tests/bench/main.ts',
		target: 'node20',
		outDir,
		emptyOutDir: true,
		minify: false,
		rollupOptions: {output: {entryFileNames: 'main.mjs'}},
	},
});
const {status} = spawnSync(process.execPath, [`${outDir}/main.mjs`, ...process.argv.slice(2)], {
	cwd: root,
	stdio: 'inherit',
});
process.exitCode = status ?? 1;
